import { pino, type DestinationStream, type Logger as PinoLogger } from 'pino';

export type Logger = Pick<PinoLogger, 'debug' | 'info' | 'warn' | 'error'>;

/** Members that never belong in a log, on a record or one step inside it. */
const secrets = [
  'password', 'newPassword', 'secret', 'token', 'cookie', 'authorization', 'set-cookie', 'url', 'headers', 'body', 'text', 'html', 'secretAccessKey',
];

interface LoggedError { type: string; message: string; code?: unknown; stack?: string; cause?: LoggedError }

/** What helps to find a fault, and nothing an error of a library carries besides: requests with their headers, values of rows. */
function serializeError(error: unknown): LoggedError {
  if (!(error instanceof Error)) return { type: typeof error, message: String(error) };
  const { code } = error as Error & { code?: unknown };
  return {
    type: error.name, message: error.message, stack: error.stack,
    ...(code === undefined ? {} : { code }), ...(error.cause === undefined ? {} : { cause: serializeError(error.cause) }),
  };
}

/** One JSON line a record, on standard output unless told otherwise, in Coordinated Universal Time. */
export function createLogger(process: 'web' | 'worker', level: string, destination?: DestinationStream): Logger {
  const options = {
    level, base: { process }, timestamp: pino.stdTimeFunctions.isoTime, serializers: { err: serializeError },
    redact: { paths: secrets.flatMap((name) => [`["${name}"]`, `*["${name}"]`]), censor: '(left out)' },
  };
  return destination ? pino(options, destination) : pino(options);
}

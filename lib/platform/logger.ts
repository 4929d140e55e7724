import { pino, type Logger as PinoLogger } from 'pino';

export type Logger = Pick<PinoLogger, 'debug' | 'info' | 'warn' | 'error'>;

/** One JSON line a record on standard output, in Coordinated Universal Time. */
export function createLogger(process: 'web' | 'worker', level: string): Logger {
  return pino({ level, base: { process }, timestamp: pino.stdTimeFunctions.isoTime });
}

/** Every error the product answers with: its HTTP status and the title a person reads. */
export const errorTable = {
  'bad-request': { status: 400, title: 'The request cannot be read' },
  'organisation-needed': { status: 400, title: 'Name the organisation' },
  'not-signed-in': { status: 401, title: 'Not signed in' },
  'wrong-credentials': { status: 401, title: 'E-mail and password do not match' },
  'not-allowed': { status: 403, title: 'Not allowed' },
  'foreign-origin': { status: 403, title: 'Sent from another site' },
  'not-found': { status: 404, title: 'Not found' },
  'too-slow': { status: 408, title: 'Sent too slowly' },
  'wrong-state': { status: 409, title: 'Not possible in this state' },
  'already-exists': { status: 409, title: 'Already there' },
  'request-in-flight': { status: 409, title: 'The same request is still being answered' },
  'stale-revision': { status: 412, title: 'Changed in the meantime' },
  'too-large': { status: 413, title: 'Too large' },
  'no-room': { status: 413, title: 'No room left' },
  invalid: { status: 422, title: 'Not valid' },
  'wrong-password': { status: 422, title: 'The password does not match' },
  'not-available': { status: 422, title: 'Not available yet' },
  'key-reused': { status: 422, title: 'Idempotency key used for something else' },
  'revision-needed': { status: 428, title: 'Say which revision you read' },
  'too-many-requests': { status: 429, title: 'Too many requests' },
  unexpected: { status: 500, title: 'Something went wrong' },
  unavailable: { status: 503, title: 'A service is not reachable' },
} as const;

export type ErrorCode = keyof typeof errorTable;
export interface FieldProblem { path: string; message: string }

interface AppErrorOptions { fields?: FieldProblem[]; cause?: unknown; retryAfter?: number }

/** An error with a place in the table; `detail` is written for the person who reads it. */
export class AppError extends Error {
  readonly fields: FieldProblem[];
  readonly retryAfter: number | undefined;

  constructor(readonly code: ErrorCode, detail: string, options: AppErrorOptions = {}) {
    super(detail, { cause: options.cause });
    this.name = 'AppError';
    this.fields = options.fields ?? [];
    this.retryAfter = options.retryAfter;
  }

  get status(): number {
    return errorTable[this.code].status;
  }

  get title(): string {
    return errorTable[this.code].title;
  }
}

/** The one refusal of what another issue of the plan brings: 422 naming the member that asks for it. */
export function notAvailable(path: string, what: string): AppError {
  return new AppError('not-available', `${what} is not available yet.`, { fields: [{ path, message: `${what} is not available yet.` }] });
}

import { ApiProblem } from '@/app/_components/api/api-problem';
import { mostTries, waitBefore } from './retry-plan';
import { SendFault } from './send-fault';

export interface PartAddress { number: number; url: string; expiresAt: string }
export interface PartAnswer { status: number; etag: string | null }

/** What a file is sent over: the API, storage, and the network there is or is not. */
export interface Line {
  sign(upload: string, numbers: number[]): Promise<PartAddress[]>;
  /** Status 0 where there was no answer. Rejects only when aborted. */
  put(url: string, part: Blob, options: { signal: AbortSignal; onSent: (bytes: number) => void }): Promise<PartAnswer>;
  isOnline(): boolean;
  /** Resolves after the time, or at once when the network comes back. */
  wait(milliseconds: number, signal: AbortSignal): Promise<void>;
  now(): number;
  random(): number;
}

export type Waiting = Pick<Line, 'isOnline' | 'wait' | 'random'>;

const offlineCheck = 5000;

/** Waits after so many failures in a row; without a network that is no failure, and is waited out. */
export async function waitForNextTry(line: Waiting, failures: number, signal: AbortSignal): Promise<void> {
  if (line.isOnline()) await line.wait(waitBefore(failures, line.random), signal);
  while (!line.isOnline()) await line.wait(offlineCheck, signal);
  signal.throwIfAborted();
}

/** A refusal of the server as a fault, null where it is worth another try. */
function refusalOf(error: unknown): SendFault | null {
  if (!(error instanceof ApiProblem)) return null;
  const { status, detail } = error.problem;
  if (status === 404) return new SendFault('gone', 'This upload was given up or replaced. Retry sends the file anew.');
  if (status >= 500 || status === 429 || status === 408) return null;
  if (status === 401) return new SendFault('refused', 'You are no longer signed in. Sign in in another tab, then retry.');
  return new SendFault('refused', detail);
}

/** A call of the API, tried again while the network or the server fails. */
export async function callAgain<T>(line: Waiting, signal: AbortSignal, call: () => Promise<T>): Promise<T> {
  for (let failures = 0; ;) {
    try {
      return await call();
    } catch (error) {
      signal.throwIfAborted();
      const refusal = refusalOf(error);
      if (refusal) throw refusal;
      if (line.isOnline()) failures += 1;
      if (failures >= mostTries) throw new SendFault('line', 'The server could not be reached. What is stored stays; retry goes on from there.');
      await waitForNextTry(line, Math.max(1, failures), signal);
    }
  }
}

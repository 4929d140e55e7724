import { createStore } from './create-store';

/** The session is there; it has ended and signing in is asked for; that was put off. */
export type SessionStanding = 'there' | 'asked' | 'put-off';

export const sessionStanding = createStore<SessionStanding>('there');

let isAttended = false;
let waiting: ((isSignedIn: boolean) => void)[] = [];

/** Says that this page can ask for signing in; until the answer is called, calls wait for it. */
export function attendSession(): () => void {
  isAttended = true;
  return () => {
    isAttended = false;
    settleSession('there', false);
  };
}

/**
 * Waits until the same person is signed in again: true then, and the call may be repeated. Once put off, readings are
 * refused without asking; what somebody sends asks anew.
 */
export function signedInAgain(isWrite: boolean, signal?: AbortSignal): Promise<boolean> {
  if (!isAttended || signal?.aborted || (!isWrite && sessionStanding.get() === 'put-off')) return Promise.resolve(false);
  sessionStanding.set('asked');
  return new Promise((resolve) => {
    waiting.push(resolve);
    signal?.addEventListener('abort', () => resolve(false), { once: true });
  });
}

/** Lets every call that waits go on, or gives it up. */
export function settleSession(standing: SessionStanding, isSignedIn: boolean): void {
  const given = waiting;
  waiting = [];
  sessionStanding.set(standing);
  for (const resolve of given) resolve(isSignedIn);
}

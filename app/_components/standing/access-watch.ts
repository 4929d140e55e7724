import { createStore } from './create-store';

/** Counts what may mean that somebody's rights have changed. */
export const doubts = createStore(0);

/** Asks anew who is signed in, and with which roles. */
export function askAccess(): void {
  doubts.set(doubts.get() + 1);
}

/** 403 and 404 of a call within an organisation: whether it is still open to the person is asked anew. */
export function noteRefusal(status: number, access: 'public' | 'signed-in' | 'organisation'): void {
  if (access === 'organisation' && (status === 403 || status === 404)) askAccess();
}

import { createStore } from './create-store';

/** Whether a call was answered that a service behind Fourfold is not reachable, or not answered at all. */
export const serviceTrouble = createStore(false);

export function noteTrouble(): void {
  serviceTrouble.set(true);
}

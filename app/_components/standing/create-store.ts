import { useSyncExternalStore } from 'react';

/** A value of this page that calls change and components show. */
export interface Store<Value> {
  get: () => Value;
  set: (value: Value) => void;
  subscribe: (listener: () => void) => () => void;
}

export function createStore<Value>(initial: Value): Store<Value> {
  let present = initial;
  const listeners = new Set<() => void>();
  return {
    get: () => present,
    set(value) {
      if (Object.is(value, present)) return;
      present = value;
      for (const listener of listeners) listener();
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}

/** What the store holds; `onServer` is what a page is made with before it runs in a browser. */
export function useStore<Value>(store: Store<Value>, onServer: Value): Value {
  return useSyncExternalStore(store.subscribe, store.get, () => onServer);
}

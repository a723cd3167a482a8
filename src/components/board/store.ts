import { useSyncExternalStore } from 'react';

/** A value outside React that changes many times a second; only those that look at it draw again. */
export interface Store<T> {
  readonly get: () => T;
  readonly set: (value: T) => void;
  readonly subscribe: (listener: () => void) => () => void;
}

export function createStore<T>(initial: T): Store<T> {
  let value = initial;
  const listeners = new Set<() => void>();
  return {
    get: () => value,
    set: (next) => {
      if (Object.is(next, value)) return;
      value = next;
      for (const listener of [...listeners]) listener();
    },
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}

/** Part of a store's value; draws again only when that part changes. */
export function useStore<T, P>(store: Store<T>, part: (value: T) => P): P {
  return useSyncExternalStore(store.subscribe, () => part(store.get()));
}

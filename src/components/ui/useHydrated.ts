import { useSyncExternalStore } from 'react';

const never = () => () => undefined;

/** False on the server and until the page's scripts have taken hold: a form sent before that would go past them. */
export const useHydrated = (): boolean =>
  useSyncExternalStore(
    never,
    () => true,
    () => false,
  );

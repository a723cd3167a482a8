import { useState } from 'react';

/** The value as it was when `frozen` became true, for as long as that lasts. */
export function useFrozen<T>(value: T, frozen: boolean): T {
  const [shown, setShown] = useState(value);
  if (!frozen && !Object.is(shown, value)) setShown(value);
  return frozen ? shown : value;
}

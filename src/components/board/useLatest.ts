import { useLayoutEffect, useRef, type RefObject } from 'react';

/** The newest value, for callbacks that stay the same. */
export function useLatest<T>(value: T): RefObject<T> {
  const ref = useRef(value);
  useLayoutEffect(() => {
    ref.current = value;
  });
  return ref;
}

import { useLayoutEffect, useRef, useState, type RefObject } from 'react';

/** The width of an element as it is laid out, followed as it changes; `first` until it is known. [px] */
export function useWidth<T extends HTMLElement>(first: number): readonly [RefObject<T | null>, number] {
  const ref = useRef<T>(null);
  const [width, setWidth] = useState(first);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const measure = (): void => setWidth(Math.max(1, Math.floor(element.clientWidth)));
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, width];
}

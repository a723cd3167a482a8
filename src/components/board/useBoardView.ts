import { useCallback, useEffect, useLayoutEffect, useMemo, useRef, useState, type RefObject } from 'react';
import { scaleFor, scrollToSpan, xOf, type TimeScale, type Zoom } from './timeScale';

export interface BoardView {
  readonly scrollRef: RefObject<HTMLDivElement | null>;
  readonly headRef: RefObject<HTMLDivElement | null>;
  readonly scale: TimeScale;
  readonly zoom: Zoom;
  readonly setZoom: (zoom: Zoom) => void;
  /** Brings a span of time, and a row by its top, to view. */
  readonly reveal: (span: { readonly from: number; readonly to: number }, top: number | null) => void;
  readonly toMinute: (minute: number) => void;
}

const ROW_ROOM_PX = 60;
/** Part of the view before the moment that is kept in place: more is to come than has been. */
const KEPT_AT = 0.35;

/** Zoom and scroll of the board. A change of zoom keeps a moment where it was in the view. */
export function useBoardView(horizonMin: number, firstMinute: number): BoardView {
  const scrollRef = useRef<HTMLDivElement>(null);
  const headRef = useRef<HTMLDivElement>(null);
  const [zoom, setZoomState] = useState<Zoom>('shift');
  const [viewPx, setViewPx] = useState(900);
  const keepMinute = useRef<number | null>(firstMinute);
  const scale = useMemo(() => scaleFor(zoom, viewPx, horizonMin), [zoom, viewPx, horizonMin]);

  // Before the first paint, so that nothing moves once it is seen.
  useLayoutEffect(() => {
    const scroller = scrollRef.current;
    if (!scroller) return;
    const measure = (): void => setViewPx(Math.max(200, scroller.clientWidth - labelPx(headRef.current)));
    const observer = new ResizeObserver(measure);
    observer.observe(scroller);
    measure();
    return () => observer.disconnect();
  }, []);

  useLayoutEffect(() => {
    const scroller = scrollRef.current;
    if (!scroller || keepMinute.current === null) return;
    const view = scroller.clientWidth - labelPx(headRef.current);
    scroller.scrollLeft = xOf(scale, keepMinute.current) - view * KEPT_AT;
  }, [scale]);

  useEffect(() => {
    const scroller = scrollRef.current;
    if (!scroller) return;
    const keep = (): void => {
      const view = scroller.clientWidth - labelPx(headRef.current);
      keepMinute.current = (scroller.scrollLeft + view * KEPT_AT) / scale.pxPerMin;
    };
    scroller.addEventListener('scroll', keep, { passive: true });
    return () => scroller.removeEventListener('scroll', keep);
  }, [scale]);

  const setZoom = useCallback((next: Zoom) => setZoomState(next), []);
  const reveal = useCallback<BoardView['reveal']>(
    (span, top) => {
      const scroller = scrollRef.current;
      if (!scroller) return;
      const width = scroller.clientWidth - labelPx(headRef.current);
      const left = scrollToSpan(
        { left: scroller.scrollLeft, width },
        { from: xOf(scale, span.from), to: xOf(scale, span.to) },
      );
      scroller.scrollTo({ left, top: scrollTop(scroller, headRef.current, top) });
    },
    [scale],
  );
  const toMinute = useCallback(
    (minute: number) => {
      const scroller = scrollRef.current;
      if (scroller) scroller.scrollLeft = Math.max(0, xOf(scale, minute) - 40);
    },
    [scale],
  );
  return { scrollRef, headRef, scale, zoom, setZoom, reveal, toMinute };
}

/** Width of the names at the left, which lie over the scrolled content. [px] */
function labelPx(head: HTMLElement | null): number {
  return head?.querySelector<HTMLElement>('.board-label')?.offsetWidth ?? 0;
}

function scrollTop(scroller: HTMLElement, head: HTMLElement | null, top: number | null): number {
  if (top === null) return scroller.scrollTop;
  const room = scroller.clientHeight - (head?.offsetHeight ?? 0);
  if (top < scroller.scrollTop) return Math.max(0, top - 8);
  if (top + ROW_ROOM_PX > scroller.scrollTop + room) return top + ROW_ROOM_PX - room;
  return scroller.scrollTop;
}

import { MouseSensor, TouchSensor, useSensor, useSensors, type DragStartEvent } from '@dnd-kit/core';
import { useCallback, useEffect, useRef, type RefObject } from 'react';
import type { Activity } from '../../core/plant/activity';
import type { Pointer } from './carry';
import type { TimeScale } from './timeScale';
import type { CarryControl } from './useCarry';
import { useLatest } from './useLatest';

interface Ground {
  readonly carry: CarryControl;
  readonly scale: TimeScale;
  readonly activityOf: (id: string) => Activity | undefined;
  readonly rowsRef: RefObject<HTMLDivElement | null>;
  readonly scrollRef: RefObject<HTMLDivElement | null>;
  readonly headRef: RefObject<HTMLDivElement | null>;
}

interface Hand {
  readonly clientX: number;
  readonly clientY: number;
  readonly fine: boolean;
}

const UNPLACED_HOLD_MIN = 4;

/** Leads the hand's movements to the carried activity. The row is found from the pointer, not from drop targets. */
export function useHandDrag(ground: Ground) {
  const latestRef = useLatest(ground);
  const hand = useRef<Hand | null>(null);
  const sensors = useSensors(
    useSensor(MouseSensor, { activationConstraint: { distance: 4 } }),
    useSensor(TouchSensor, { activationConstraint: { delay: 220, tolerance: 6 } }),
  );

  const follow = useCallback(() => {
    const { carry } = latestRef.current;
    if (carry.store.get()?.carry.by === 'hand' && hand.current)
      carry.moveTo(pointerOf(latestRef.current, hand.current));
  }, [latestRef]);

  useEffect(() => {
    const onMove = (event: PointerEvent | TouchEvent): void => {
      const at = 'touches' in event ? event.touches[0] : event;
      if (at) hand.current = { clientX: at.clientX, clientY: at.clientY, fine: event.altKey };
      follow();
    };
    const onKey = (event: KeyboardEvent): void => {
      if (event.key !== 'Alt' || !hand.current || latestRef.current.carry.store.get() === null) return;
      event.preventDefault();
      hand.current = { ...hand.current, fine: event.type === 'keydown' };
      follow();
    };
    const scroller = latestRef.current.scrollRef.current;
    window.addEventListener('pointermove', onMove);
    window.addEventListener('touchmove', onMove, { passive: true });
    window.addEventListener('keydown', onKey);
    window.addEventListener('keyup', onKey);
    scroller?.addEventListener('scroll', follow, { passive: true });
    return () => {
      window.removeEventListener('pointermove', onMove);
      window.removeEventListener('touchmove', onMove);
      window.removeEventListener('keydown', onKey);
      window.removeEventListener('keyup', onKey);
      scroller?.removeEventListener('scroll', follow);
    };
  }, [follow, latestRef]);

  const start = useCallback(
    (event: DragStartEvent) => {
      const { carry, activityOf } = latestRef.current;
      const activity = activityOf(String(event.active.id));
      if (!activity) return;
      const begun = handOf(event.activatorEvent);
      if (begun) hand.current = begun;
      carry.lift(activity, 'hand', { heldAtMin: begun ? heldAt(latestRef.current, activity, begun) : 0 });
      follow();
    },
    [latestRef, follow],
  );
  return { sensors, start };
}

function handOf(event: Event): Hand | null {
  if (event instanceof MouseEvent) return { clientX: event.clientX, clientY: event.clientY, fine: event.altKey };
  const touch = 'touches' in event ? (event as TouchEvent).touches[0] : undefined;
  return touch ? { clientX: touch.clientX, clientY: touch.clientY, fine: false } : null;
}

function heldAt(ground: Ground, activity: Activity, hand: Hand): number {
  const rows = ground.rowsRef.current;
  if (!rows || !activity.placement) return UNPLACED_HOLD_MIN;
  return (hand.clientX - trackLeft(ground, rows)) / ground.scale.pxPerMin - activity.placement.start;
}

function trackLeft(ground: Ground, rows: HTMLElement): number {
  const label = ground.headRef.current?.querySelector<HTMLElement>('.board-label')?.offsetWidth ?? 0;
  return rows.getBoundingClientRect().left + label;
}

/** Where the hand is over the rows; null where it is over anything else. */
function pointerOf(ground: Ground, hand: Hand): Pointer | null {
  const [rows, scroller, head] = [ground.rowsRef.current, ground.scrollRef.current, ground.headRef.current];
  if (!rows || !scroller || !head) return null;
  const view = scroller.getBoundingClientRect();
  const left = trackLeft(ground, rows);
  const overRows =
    hand.clientX >= view.left &&
    hand.clientX <= view.right &&
    hand.clientY >= view.top + head.offsetHeight &&
    hand.clientY <= view.bottom;
  if (!overRows) return null;
  return { x: hand.clientX - left, y: hand.clientY - rows.getBoundingClientRect().top, fine: hand.fine };
}

import type { Stage } from '@/core/plant/activity';
import { FLOOR_EVENTS, type FloorEventKind } from '@/core/shift/floorEvent';

/** What the floor says of each event. */
export const EVENT_WORDS: Readonly<Record<FloorEventKind, string>> = {
  cratesIn: 'crates in',
  steamOn: 'steam on',
  ventsClosed: 'vents closed',
  timingStarted: 'process timing started',
  steamOff: 'steam off',
  cooled: 'cooled',
  empty: 'empty',
};

const WITHOUT_VENTS: readonly FloorEventKind[] = ['cratesIn', 'steamOn', 'steamOff', 'empty'];

/** The events that an activity can have, in the order of its cycle: a retort's whole cycle, other units without vents. */
export function eventsOf(stage: Stage | null): readonly FloorEventKind[] {
  return stage === 'retort' ? FLOOR_EVENTS : WITHOUT_VENTS;
}

/** An event that was recorded. */
export interface Recorded {
  readonly event: FloorEventKind;
  readonly happenedAt: Date;
}

/** Why an event can't follow what was recorded; null where it can. */
export type OrderProblem =
  | { readonly kind: 'alreadyPast'; readonly recorded: Recorded }
  | { readonly kind: 'needsSteamOn' }
  | { readonly kind: 'beforePrevious'; readonly recorded: Recorded };

/**
 * Events come in the order of the cycle; some may be left out, but a retort's later ones not without steam on. None
 * happened before the one that precedes it.
 */
export function orderProblem(
  stage: Stage | null,
  recorded: readonly Recorded[],
  event: FloorEventKind,
  at: Date,
): OrderProblem | null {
  const place = (kind: FloorEventKind): number => FLOOR_EVENTS.indexOf(kind);
  const last = [...recorded].sort((a, b) => place(a.event) - place(b.event)).at(-1);
  if (last && place(last.event) >= place(event)) return { kind: 'alreadyPast', recorded: last };
  const steamIsOn = recorded.some((r) => r.event === 'steamOn');
  const needsSteam = event === 'steamOff' || (stage === 'retort' && place(event) > place('steamOn'));
  if (needsSteam && !steamIsOn) return { kind: 'needsSteamOn' };
  return last && at < last.happenedAt ? { kind: 'beforePrevious', recorded: last } : null;
}

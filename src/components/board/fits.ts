import type { Phase } from '../../core/plant/activity';
import type { Interval } from '../../core/time/interval';

/** A header that a unit draws on, without the activity that is to be placed. [kg/h per minute] */
export interface RoomOnHeader {
  readonly loadKgPerH: ArrayLike<number>;
  readonly limitKgPerH: ArrayLike<number>;
}

const ROUNDING_KG_PER_H = 1e-3;

/** Marks the starts at which a steady draw would pass the limit somewhere: one walk of the week for each phase. */
function refuseStarts(refused: Uint8Array, phase: Phase, room: RoomOnHeader): void {
  const { loadKgPerH, limitKgPerH } = room;
  const horizon = refused.length;
  let nextOver = Number.POSITIVE_INFINITY;
  for (let t = horizon - 1; t >= 0; t--) {
    const spare = (limitKgPerH[t] as number) - (loadKgPerH[t] as number);
    if (phase.steamKgPerH > spare + ROUNDING_KG_PER_H) nextOver = t;
    const start = t - phase.offsetMin;
    if (start >= 0 && nextOver < t + phase.minutes) refused[start] = 1;
  }
}

/**
 * Spans of starts at which phases fit under the limits of every header they draw on, from the first minute to the last;
 * overlapping phases are judged together where they are given as spells of one rate. Starts that run past the week's
 * end are left out.
 */
export function fittingStarts(
  phases: readonly Phase[],
  minutes: number,
  rooms: readonly RoomOnHeader[],
  horizonMin: number,
): Interval[] {
  const refused = new Uint8Array(horizonMin);
  refused.fill(1, Math.max(0, horizonMin - minutes + 1));
  for (const room of rooms) {
    for (const phase of phases) if (phase.steamKgPerH > 0) refuseStarts(refused, phase, room);
  }
  const spans: Interval[] = [];
  let from = -1;
  for (let t = 0; t <= horizonMin; t++) {
    const fits = t < horizonMin && refused[t] === 0;
    if (fits && from < 0) from = t;
    if (!fits && from >= 0) {
      spans.push({ from, to: t });
      from = -1;
    }
  }
  return spans;
}

/** True where a start lies in one of the spans. */
export function fitsAt(spans: readonly Interval[], start: number): boolean {
  return spans.some((span) => span.from <= start && start < span.to);
}

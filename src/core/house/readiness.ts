/** From a fire that is lit to steam that can leave: the purge, then up to pressure. */
import { mergeIntervals, type Interval } from '../time/interval';
import { combineSteps, stepsFromSpans } from '../time/stepMath';
import type { Step, StepFunction } from '../time/stepFunction';

/** A boiler that was at pressure less than this ago comes up warm: common practice, no source. [min] */
export const WARM_WITHIN_MIN = 12 * 60;

/** How long before the week's first instant a firing still bears on what is ready in it. [min] */
export const LOOK_BACK_MIN = 2 * 1_440;

/** What a boiler needs until it exports. [min] */
export interface ReadyTimes {
  readonly purgeMinutes: number;
  readonly warmReadyMinutes: number;
  readonly coldReadyMinutes: number;
}

export type FireStart = 'warm' | 'cold';

/** One spell in fire, from lit to out. */
export interface Fire {
  readonly litMin: number;
  readonly outMin: number;
  /** From here on it exports; at or after `outMin` where the fire goes out before. */
  readonly readyMin: number;
  /** null: in fire since before anything was looked at. */
  readonly start: FireStart | null;
}

/** From lit to export: purge, then to pressure. [min] */
export function minutesToReady(times: ReadyTimes, start: FireStart): number {
  return times.purgeMinutes + (start === 'warm' ? times.warmReadyMinutes : times.coldReadyMinutes);
}

/** Warm where the boiler was last at pressure less than half a day before it is lit; `lastReadyMin` null: never. */
export function startOf(litMin: number, lastReadyMin: number | null): FireStart {
  return lastReadyMin !== null && litMin - lastReadyMin < WARM_WITHIN_MIN ? 'warm' : 'cold';
}

/**
 * A boiler's spells in fire up to `endMin`, in order, from its share of full export (0 is shut). One that is in fire
 * where the looking back begins has been so for long.
 */
export function firesOf(share: StepFunction, times: ReadyTimes, endMin: number): Fire[] {
  const inFire = mergeIntervals(
    share.flatMap((step, i) => {
      const to = Math.min(endMin, share[i + 1]?.from ?? endMin);
      return step.value > 0 ? [{ from: step.from, to }] : [];
    }),
  );
  let lastReadyMin: number | null = null;
  return inFire.map(({ from, to }) => {
    const start = from <= -LOOK_BACK_MIN ? null : startOf(from, lastReadyMin);
    const readyMin = start === null ? from : from + minutesToReady(times, start);
    if (readyMin < to) lastReadyMin = to;
    return { litMin: from, outMin: to, readyMin, start };
  });
}

/** Spans in which a boiler can export. */
export function readySpans(fires: readonly Fire[]): Interval[] {
  return fires.flatMap(({ readyMin, outMin }) => (readyMin < outMin ? [{ from: readyMin, to: outMin }] : []));
}

/** Spans in which a fire burns and nothing can leave yet. */
export function comingUpSpans(fires: readonly Fire[]): Interval[] {
  return fires.flatMap(({ litMin, readyMin, outMin }) => {
    const to = Math.min(readyMin, outMin);
    return litMin < to ? [{ from: litMin, to }] : [];
  });
}

/** The share of full export that can really leave: the share that is set, 0 while coming up. */
export function readyShare(share: StepFunction, fires: readonly Fire[]): Step[] {
  const ready = stepsFromSpans(
    readySpans(fires).map((span) => ({ ...span, value: 1 })),
    0,
  );
  return combineSteps([share, ready], ([set = 0, is = 0]) => set * is);
}

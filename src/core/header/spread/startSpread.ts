import { fail, ok, problem, type Result } from '../../result';

/** A start so many whole minutes after (less than 0: before) its planned minute, and its chance. */
export interface StartOutcome {
  readonly deviationMin: number;
  /** More than 0, at most 1. */
  readonly chance: number;
}

/** How early or late starts on a unit are: ascending in deviation, each once, chances adding up to 1. Plain JSON. */
export interface StartSpread {
  readonly outcomes: readonly StartOutcome[];
}

/** Every start on its planned minute. */
export const ON_TIME: StartSpread = { outcomes: [{ deviationMin: 0, chance: 1 }] };

/** Furthest early or late that a spread is taken with: a day. [min] */
export const GREATEST_DEVIATION_MIN = 1440;

/**
 * Every whole minute from `earlyMin` before to `lateMin` after the planned start equally likely. Both are whole
 * minutes from 0 to {@link GREATEST_DEVIATION_MIN}; INPUT-SPREAD otherwise.
 */
export function uniformSpread(earlyMin: number, lateMin: number): Result<StartSpread> {
  if (![earlyMin, lateMin].every((minutes) => Number.isInteger(minutes) && minutes >= 0 && within(minutes))) {
    return fail(problem('INPUT-SPREAD', `Give early and late as whole minutes from 0 to ${GREATEST_DEVIATION_MIN}.`));
  }
  const count = earlyMin + lateMin + 1;
  return ok({ outcomes: Array.from({ length: count }, (_, i) => ({ deviationMin: i - earlyMin, chance: 1 / count })) });
}

/**
 * The spread of recorded starts, each given as minutes after (less than 0: before) the planned start and rounded to
 * whole minutes; every record counts alike. INPUT-SPREAD where there are none or one is further than a day out.
 */
export function recordedSpread(deviationsMin: readonly number[]): Result<StartSpread> {
  if (deviationsMin.length === 0) return fail(problem('INPUT-SPREAD', 'Give at least one recorded start.'));
  if (!deviationsMin.every(within)) {
    return fail(problem('INPUT-SPREAD', `A recorded start is more than ${GREATEST_DEVIATION_MIN} minutes out.`));
  }
  const counts = new Map<number, number>();
  for (const minutes of deviationsMin) {
    const whole = Math.round(minutes) + 0;
    counts.set(whole, (counts.get(whole) ?? 0) + 1);
  }
  const outcomes = [...counts].map(([deviationMin, count]) => ({ deviationMin, chance: count / deviationsMin.length }));
  return ok({ outcomes: outcomes.sort((a, b) => a.deviationMin - b.deviationMin) });
}

/** The deviation below or at which the part `u` (from 0 to below 1) of the starts lies. [min] */
export function deviationAt(spread: StartSpread, u: number): number {
  let sum = 0;
  for (const { deviationMin, chance } of spread.outcomes) {
    sum += chance;
    if (u < sum) return deviationMin;
  }
  return spread.outcomes.at(-1)?.deviationMin ?? 0;
}

/** Mean deviation. [min] */
export function meanDeviationMin(spread: StartSpread): number {
  return spread.outcomes.reduce((sum, { deviationMin, chance }) => sum + deviationMin * chance, 0);
}

/** A span of draw planned in the week, and how its start is spread. */
export interface SpreadSpan {
  readonly from: number;
  readonly minutes: number;
  readonly spread: StartSpread;
}

/**
 * The chance, 0 to 1, that two spans of draw with independent starts share a minute: the sum over all pairs of
 * deviations of the product of their chances where the shifted spans overlap.
 */
export function overlapChance(a: SpreadSpan, b: SpreadSpan): number {
  let chance = 0;
  for (const one of a.spread.outcomes) {
    for (const other of b.spread.outcomes) {
      const apart = b.from + other.deviationMin - a.from - one.deviationMin;
      if (apart < a.minutes && -apart < b.minutes) chance += one.chance * other.chance;
    }
  }
  return Math.min(1, chance);
}

function within(minutes: number): boolean {
  return Math.abs(minutes) <= GREATEST_DEVIATION_MIN;
}

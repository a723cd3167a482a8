import type { StartOutcome, StartSpread } from '../../core/header/spread/startSpread';

/** Minutes early and late that a drawing shows. */
export interface SpreadSpan {
  readonly fromMin: number;
  readonly toMin: number;
}

/** A bar: deviations of [from, to) minutes and the part of the starts that lies there. */
export interface Bar {
  readonly fromMin: number;
  readonly toMin: number;
  readonly chance: number;
}

const LEAST_SPAN: SpreadSpan = { fromMin: -10, toMin: 15 };
const MOST_BARS = 60;
const WIDTHS_MIN = [1, 2, 5, 10, 15, 30, 60, 120];

/** A span that holds all outcomes of some spreads, planned start included; never so narrow that a minute looks like an hour. */
export function spanOf(spreads: readonly (readonly StartOutcome[])[]): SpreadSpan {
  const minutes = spreads.flatMap((outcomes) => outcomes.map(({ deviationMin }) => deviationMin));
  return {
    fromMin: Math.min(LEAST_SPAN.fromMin, ...minutes),
    toMin: Math.max(LEAST_SPAN.toMin, ...minutes) + 1,
  };
}

/** Outcomes counted into bars of equal width, as narrow as the span lets them be; a bar begins at the planned start. */
export function barsOf(outcomes: readonly StartOutcome[], { fromMin, toMin }: SpreadSpan): Bar[] {
  const width = WIDTHS_MIN.find((minutes) => (toMin - fromMin) / minutes <= MOST_BARS) ?? 240;
  const chances = new Map<number, number>();
  for (const { deviationMin, chance } of outcomes) {
    const bar = Math.floor(deviationMin / width);
    chances.set(bar, (chances.get(bar) ?? 0) + chance);
  }
  return [...chances]
    .sort(([a], [b]) => a - b)
    .map(([bar, chance]) => ({ fromMin: bar * width, toMin: (bar + 1) * width, chance }));
}

const said = (minutes: number): string =>
  minutes === 0 ? 'on time' : `${Math.abs(minutes)} min ${minutes < 0 ? 'early' : 'late'}`;

/** '3 min early to 8 min late', 'on time', 'always 4 min late'. */
export function spreadText(spread: Pick<StartSpread, 'outcomes'> | null): string {
  const first = spread?.outcomes[0]?.deviationMin ?? 0;
  const last = spread?.outcomes.at(-1)?.deviationMin ?? 0;
  if (first === last) return first === 0 ? 'on time' : `always ${said(first)}`;
  return `${said(first)} to ${said(last)}`;
}

/** Minutes early and late that a spread from experience was typed with; null for one that is not even. */
export function evenMinutes(
  spread: StartSpread | null,
): { readonly earlyMin: number; readonly lateMin: number } | null {
  if (!spread) return null;
  const { outcomes } = spread;
  const [first, last] = [outcomes[0]?.deviationMin ?? 0, outcomes.at(-1)?.deviationMin ?? 0];
  const even = outcomes.every(({ chance }) => Math.abs(chance - 1 / outcomes.length) < 1e-9);
  if (!even || last - first + 1 !== outcomes.length || first > 0 || last < 0) return null;
  return { earlyMin: 0 - first, lateMin: last };
}

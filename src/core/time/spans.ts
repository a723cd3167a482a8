import { mergeIntervals, type Interval } from './interval';

/** What is left of `spans` without `cuts`, sorted and joined. */
export function subtractIntervals(spans: readonly Interval[], cuts: readonly Interval[]): Interval[] {
  let left = mergeIntervals(spans);
  for (const cut of mergeIntervals(cuts)) {
    left = left.flatMap((span) => [
      { from: span.from, to: Math.min(span.to, cut.from) },
      { from: Math.max(span.from, cut.to), to: span.to },
    ]);
    left = left.filter((span) => span.to > span.from);
  }
  return left;
}

/** The span that a minute lies in; undefined outside all. */
export function spanAt(spans: readonly Interval[], minute: number): Interval | undefined {
  return spans.find((span) => span.from <= minute && minute < span.to);
}

/** Spans moved by so many minutes. */
export function shiftIntervals(spans: readonly Interval[], byMinutes: number): Interval[] {
  return spans.map((span) => ({ from: span.from + byMinutes, to: span.to + byMinutes }));
}

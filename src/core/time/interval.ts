/** A half-open span of whole minutes [from, to), counted from the week's first instant. */
export interface Interval {
  readonly from: number;
  readonly to: number;
}

/** Minutes that two spans share; 0 where they only touch. */
export function overlapMinutes(a: Interval, b: Interval): number {
  return Math.max(0, Math.min(a.to, b.to) - Math.max(a.from, b.from));
}

/** True where `inner` lies wholly within `outer`; equal ends count as within. */
export function contains(outer: Interval, inner: Interval): boolean {
  return outer.from <= inner.from && inner.to <= outer.to;
}

/** Sorts spans and joins those that touch or overlap; empty spans are dropped. */
export function mergeIntervals(spans: readonly Interval[]): Interval[] {
  const merged: Interval[] = [];
  for (const span of [...spans].filter((s) => s.to > s.from).sort((a, b) => a.from - b.from)) {
    const last = merged.at(-1);
    if (last && span.from <= last.to) merged[merged.length - 1] = { from: last.from, to: Math.max(last.to, span.to) };
    else merged.push(span);
  }
  return merged;
}

import type { Interval } from '../time/interval';
import { valueAt, type StepFunction } from '../time/stepFunction';

/** Something used for a while by an activity. */
export interface Use extends Interval {
  readonly activityId: string;
  readonly amount: number;
}

/** A span in which more is used than there is. */
export interface UsageOver extends Interval {
  /** Used where the excess is greatest. */
  readonly found: number;
  /** What there is at that place. */
  readonly limit: number;
  /** Those that take part, first come first. */
  readonly activityIds: readonly string[];
}

/** Excess below this is rounding. */
const SAME = 1e-9;

/** Spans in which the uses together pass a capacity; touching spans are one. Half-open: a use that ends frees at once. */
export function usageOver(uses: readonly Use[], capacity: StepFunction): UsageOver[] {
  const real = uses.filter((use) => use.to > use.from && use.amount > 0).sort(byTime);
  const last = real.reduce((end, use) => Math.max(end, use.to), 0);
  const moments = new Set(real.flatMap((use) => [use.from, use.to]));
  for (const step of capacity) if (step.from < last) moments.add(step.from);
  const ordered = [...moments].sort((a, b) => a - b);
  const spans: UsageOver[] = [];
  let active: Use[] = [];
  let next = 0;
  ordered.forEach((from, i) => {
    active = active.filter((use) => use.to > from);
    for (let use = real[next]; use && use.from <= from; use = real[++next]) active.push(use);
    const found = active.reduce((sum, use) => sum + use.amount, 0);
    const limit = valueAt(capacity, from);
    const to = ordered[i + 1];
    if (to === undefined || found <= limit + SAME) return;
    appendOver(spans, { from, to, found, limit, activityIds: active.map((use) => use.activityId) });
  });
  return spans;
}

function appendOver(spans: UsageOver[], part: UsageOver): void {
  const last = spans.at(-1);
  if (last?.to !== part.from) {
    spans.push(part);
    return;
  }
  const worst = part.found - part.limit > last.found - last.limit ? part : last;
  spans[spans.length - 1] = {
    from: last.from,
    to: part.to,
    found: worst.found,
    limit: worst.limit,
    activityIds: [...new Set([...last.activityIds, ...part.activityIds])],
  };
}

function byTime(a: Use, b: Use): number {
  return a.from - b.from || (a.activityId < b.activityId ? -1 : 1);
}

import { drawnMode, type Activity } from '../plant/activity';
import type { SharedLimit } from '../plant/plant';
import { toMinutes, valueAt, type StepFunction } from '../time/stepFunction';
import { usageOver, type UsageOver, type Use } from './usage';

/** The uses of every shared limit by placed activities, by limit id. Minutes of the week. */
export function usesByLimit(activities: readonly Activity[]): Map<string, Use[]> {
  const byLimit = new Map<string, Use[]>();
  for (const activity of activities) {
    const start = activity.placement?.start;
    if (start === undefined) continue;
    for (const { limitId, offsetMin, minutes, amount } of drawnMode(activity)?.uses ?? []) {
      const from = start + offsetMin;
      const use = { activityId: activity.id, from, to: from + minutes, amount };
      const list = byLimit.get(limitId);
      if (list) list.push(use);
      else byLimit.set(limitId, [use]);
    }
  }
  return byLimit;
}

/** A shared limit over the week, in the limit's own unit. Arrays are per minute and to be read only. */
export interface LimitUsage {
  readonly limitId: string;
  readonly used: Float64Array;
  readonly limit: Float64Array;
  /** Where most is used, the first such minute; null where nothing uses it. */
  readonly greatest: { readonly minute: number; readonly amount: number; readonly limit: number } | null;
  /** Spans in which more is used than there is. */
  readonly over: readonly UsageOver[];
}

const limitMinutes = new WeakMap<StepFunction, Float64Array>();

function minutesOf(capacity: StepFunction, horizonMin: number): Float64Array {
  const known = limitMinutes.get(capacity);
  if (known?.length === horizonMin) return known;
  const minutes = toMinutes(capacity, horizonMin);
  limitMinutes.set(capacity, minutes);
  return minutes;
}

/** What is used of a shared limit, minute by minute, by activities as drawn: cleanings that follow are among them. */
export function limitUsage(limit: SharedLimit, uses: readonly Use[], horizonMin: number): LimitUsage {
  const used = new Float64Array(horizonMin);
  for (const { from, to, amount } of uses) {
    const end = Math.min(horizonMin, to);
    for (let t = Math.max(0, from); t < end; t++) used[t] = (used[t] as number) + amount;
  }
  let at = 0;
  for (let t = 1; t < horizonMin; t++) if ((used[t] as number) > (used[at] as number)) at = t;
  const amount = used[at] ?? 0;
  return {
    limitId: limit.id,
    used,
    limit: minutesOf(limit.capacity, horizonMin),
    greatest: amount > 0 ? { minute: at, amount, limit: valueAt(limit.capacity, at) } : null,
    over: usageOver(uses, limit.capacity),
  };
}

/** What an activity uses of a limit at a minute. */
export interface UseShare {
  readonly activityId: string;
  readonly amount: number;
}

/** Who uses a limit at a minute, greatest first, by the uses that `usesByLimit` gives. */
export function whoUses(uses: readonly Use[], minute: number): UseShare[] {
  const shares = new Map<string, number>();
  for (const { activityId, from, to, amount } of uses) {
    if (from <= minute && minute < to) shares.set(activityId, (shares.get(activityId) ?? 0) + amount);
  }
  return [...shares]
    .map(([activityId, amount]) => ({ activityId, amount }))
    .sort((a, b) => b.amount - a.amount || (a.activityId < b.activityId ? -1 : 1));
}

import { drawnMode } from '../plant/activity';
import type { SharedBreach } from './breach';
import type { JudgedWeek } from './judged';
import { usageOver, type Use } from './usage';

/** Shared limits that the activities together pass. */
export function sharedBreaches(judged: JudgedWeek): SharedBreach[] {
  const uses = usesByLimit(judged);
  return judged.week.plant.sharedLimits.flatMap((limit) =>
    usageOver(uses.get(limit.id) ?? [], limit.capacity).map((span) => ({
      id: `sharedLimitOver:${limit.id}:${span.from}`,
      class: 'shared' as const,
      code: 'sharedLimitOver' as const,
      from: span.from,
      to: span.to,
      activityIds: span.activityIds,
      limitId: limit.id,
      found: span.found,
      limit: span.limit,
    })),
  );
}

function usesByLimit(judged: JudgedWeek): Map<string, Use[]> {
  const byLimit = new Map<string, Use[]>();
  for (const activity of judged.drawn) {
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

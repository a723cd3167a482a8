import type { SharedBreach } from './breach';
import type { JudgedWeek } from './judged';
import { usesByLimit } from './limitUse';
import { usageOver } from './usage';

/** Shared limits that the activities together pass. */
export function sharedBreaches(judged: JudgedWeek): SharedBreach[] {
  const uses = usesByLimit(judged.drawn);
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

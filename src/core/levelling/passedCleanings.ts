import type { Activity } from '../plant/activity';
import type { CleaningRule } from '../plant/plant';
import { changeovers } from '../schedule/changeovers';
import type { Week } from '../schedule/week';
import { indexOf } from '../schedule/weekIndex';

/** A cleaning that follows a run although something else comes before the next run. */
export interface PassedCleaning {
  readonly rule: CleaningRule;
  /** From the run's start. [min] */
  readonly offsetMin: number;
}

/** What levelling keeps where it is, and what it lets runs draw besides their own. */
export interface PassedCleanings {
  /** By the id of the run that the cleaning follows. */
  readonly after: ReadonlyMap<string, PassedCleaning>;
  readonly still: ReadonlySet<string>;
}

/**
 * Levelling knows cleanings between neighbours on a unit. Where a planned clean that does not stand in for the one that
 * follows, or a run of no family, lies between the two runs, all of them stay where they are, with what takes the first
 * run off, and the cleaning's draws go with the first run.
 */
export function passedCleanings(week: Week): PassedCleanings {
  const after = new Map<string, PassedCleaning>();
  const still = new Set<string>();
  const { activities, links } = indexOf(week);
  for (const { rule, unitId, previousId, nextId, from } of changeovers(week)) {
    const previous = activities.get(previousId);
    const between = spanOnUnit(week, unitId, previousId, nextId);
    if (!previous?.placement || between.length <= 2) continue;
    after.set(previousId, { rule, offsetMin: from - previous.placement.start });
    for (const { id } of between) still.add(id);
    const taker = previous.occupiesUntil === 'end' ? undefined : links.get(previous.occupiesUntil.linkId);
    if (taker) still.add(taker.to.activityId);
  }
  return { after, still };
}

/** What a unit does from one activity to another, both included, in order of start. */
function spanOnUnit(week: Week, unitId: string, firstId: string, lastId: string): Activity[] {
  const order = week.activities
    .filter((activity) => activity.placement?.unitId === unitId)
    .sort((a, b) => startOf(a) - startOf(b) || (a.id < b.id ? -1 : 1));
  const at = (id: string): number => order.findIndex((activity) => activity.id === id);
  return order.slice(at(firstId), at(lastId) + 1);
}

const startOf = ({ placement }: Activity): number => placement?.start ?? 0;

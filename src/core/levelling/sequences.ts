/** A plan as it stands on the units: who follows whom, what is cleaned between, when a unit is free. */
import type {
  Plan,
  Problem,
  ProblemActivity,
  ProblemCleaning,
  ProblemLink,
  ProblemMode,
  ProblemUnit,
  Use,
} from './problem';

/** The mode an activity runs in under a plan. */
export function modeIn(activity: ProblemActivity, plan: Plan, index: number): ProblemMode {
  const mode = activity.modes.find((m) => m.unitId === plan.units[index]);
  return mode ?? { unitId: plan.units[index] ?? '', minutes: 0, uses: [] };
}

/** A cleaning between two consecutive activities on a unit. */
export interface Changeover {
  readonly unitId: string;
  readonly after: number;
  readonly before: number;
  readonly from: number;
  readonly minutes: number;
  readonly uses: readonly Use[];
}

/** Cleanings that the plan's sequences call for, each as soon as its unit is free. */
export function changeovers(problem: Problem, plan: Plan): Changeover[] {
  const { cleaning } = lookupIn(problem);
  return sequences(problem, plan).flatMap(({ unitId, order }) =>
    order.slice(1).flatMap((before, k) => {
      const after = order[k] as number;
      const first = problem.activities[after] as ProblemActivity;
      const second = problem.activities[before] as ProblemActivity;
      const rule = cleaning.get(cleaningKey(unitId, first.familyId, second.familyId));
      if (!rule) return [];
      const from = freeAt(problem, plan, after) + first.cleanAfterMin;
      return [{ unitId, after, before, from, minutes: rule.minutes, uses: rule.uses }];
    }),
  );
}

/** Activities of each unit in order of start. */
export function sequences(problem: Problem, plan: Plan): { unitId: string; order: number[] }[] {
  const byUnit = new Map<string, number[]>(problem.units.map((u) => [u.id, []]));
  problem.activities.forEach((_, i) => byUnit.get(plan.units[i] as string)?.push(i));
  const start = (i: number): number => plan.starts[i] as number;
  return [...byUnit].map(([unitId, order]) => ({ unitId, order: order.sort((a, b) => start(a) - start(b) || a - b) }));
}

/** When a unit is free of an activity: at its end, or when it has been taken off if that is later. */
export function freeAt(problem: Problem, plan: Plan, index: number): number {
  const activity = problem.activities[index] as ProblemActivity;
  const end = endOf(activity, plan, index);
  const link = activity.takenOffBy === null ? undefined : lookupIn(problem).links.get(activity.takenOffBy);
  return link ? Math.max(end, momentOf(problem, plan, link.to)) : end;
}

/** The minute of a link's end in a plan: start or end of its activity, and the offset. [min] */
export function momentOf(problem: Problem, plan: Plan, end: ProblemLink['from']): number {
  const index = indexById(problem).get(end.activityId) as number;
  const activity = problem.activities[index] as ProblemActivity;
  const start = plan.starts[index] as number;
  return (end.anchor === 'end' ? endOf(activity, plan, index) : start) + end.offsetMin;
}

/** What is looked up again and again in one problem. */
interface Lookup {
  readonly index: ReadonlyMap<string, number>;
  readonly links: ReadonlyMap<string, ProblemLink>;
  readonly units: ReadonlyMap<string, ProblemUnit>;
  readonly cleaning: ReadonlyMap<string, ProblemCleaning>;
}

const lookups = new WeakMap<Problem, Lookup>();

/** The problem's parts by id, worked out once. */
export function lookupIn(problem: Problem): Lookup {
  let lookup = lookups.get(problem);
  if (!lookup) {
    lookup = {
      index: new Map(problem.activities.map((a, i) => [a.id, i])),
      links: new Map(problem.links.map((l) => [l.id, l])),
      units: new Map(problem.units.map((u) => [u.id, u])),
      cleaning: new Map(
        problem.cleaning.flatMap((c) =>
          c.unitIds.map((u) => [cleaningKey(u, c.fromFamilyId, c.toFamilyId), c] as const),
        ),
      ),
    };
    lookups.set(problem, lookup);
  }
  return lookup;
}

const cleaningKey = (unitId: string, from: string | null, to: string | null): string => `${unitId}\n${from}\n${to}`;

/** Positions of the activities by id. */
export function indexById(problem: Problem): ReadonlyMap<string, number> {
  return lookupIn(problem).index;
}

/** When an activity ends by itself. */
export function endOf(activity: ProblemActivity, plan: Plan, index: number): number {
  return (plan.starts[index] as number) + modeIn(activity, plan, index).minutes;
}

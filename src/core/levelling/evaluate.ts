import { toMinutes } from '../time/stepFunction';
import type {
  Plan,
  Problem,
  ProblemActivity,
  ProblemCleaning,
  ProblemLink,
  ProblemMode,
  ProblemResource,
  ProblemUnit,
  Use,
} from './problem';

/** A plan judged from the plain problem, without anything that the search keeps. */
export interface Judgement {
  /** By resource: load less capacity by minute. */
  readonly excess: readonly Float64Array[];
  readonly processOver: number;
  readonly sharedOver: number;
  readonly steamKg: number;
  readonly lateMin: number;
  /** Minutes late times weight, by activity. */
  readonly late: readonly number[];
  readonly change: number;
  /** Minutes by which rules of time are broken: units, waits, shifts, bounds. */
  readonly broken: number;
}

/** Judges a plan from scratch. */
export function judge(problem: Problem, plan: Plan): Judgement {
  const excess = excessOf(problem, plan);
  const sums = { steam: 0, process: 0, shared: 0 };
  problem.resources.forEach((r, i) => {
    sums[r.class] += overOf(excess[i] as Float64Array) / divisorOf(r, problem.horizonMin);
  });
  const lateMin = problem.activities.map((a, i) => Math.max(0, endOf(a, plan, i) - (a.due ?? Infinity)));
  return {
    excess,
    processOver: sums.process,
    sharedOver: sums.shared,
    steamKg: sums.steam,
    lateMin: lateMin.reduce((x, y) => x + y, 0),
    late: lateMin.map((l, i) => l * (problem.activities[i] as ProblemActivity).weight),
    change: changeOf(problem, plan),
    broken: brokenMinutes(problem, plan),
  };
}

/** The mode an activity runs in under a plan. */
export function modeIn(activity: ProblemActivity, plan: Plan, index: number): ProblemMode {
  const mode = activity.modes.find((m) => m.unitId === plan.units[index]);
  return mode ?? { unitId: plan.units[index] ?? '', minutes: 0, uses: [] };
}

/** A draw as it stands under a plan, with the activity that moves it. */
export interface PlacedUse extends Use {
  readonly activity: number;
  readonly start: number;
  readonly isCleaning: boolean;
}

/** Every draw of the plan, that of cleaning included. */
export function placedUses(problem: Problem, plan: Plan): PlacedUse[] {
  const own = problem.activities.flatMap((a, i) =>
    modeIn(a, plan, i).uses.map((u) => ({
      ...u,
      activity: i,
      start: (plan.starts[i] as number) + u.offsetMin,
      isCleaning: false,
    })),
  );
  const cleaning = changeovers(problem, plan).flatMap((c) =>
    c.uses.map((u) => ({ ...u, activity: c.after, start: c.from + u.offsetMin, isCleaning: true })),
  );
  return [...own, ...cleaning];
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

function lookupIn(problem: Problem): Lookup {
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

function endOf(activity: ProblemActivity, plan: Plan, index: number): number {
  return (plan.starts[index] as number) + modeIn(activity, plan, index).minutes;
}

function excessOf(problem: Problem, plan: Plan): Float64Array[] {
  const at = new Map(problem.resources.map((r, i) => [r.id, i]));
  const excess = problem.resources.map((r) => toMinutes(r.capacity, problem.horizonMin).map((v) => -v));
  for (const use of placedUses(problem, plan)) {
    const load = excess[at.get(use.resourceId) ?? -1];
    if (!load) continue;
    const to = Math.min(problem.horizonMin, use.start + use.minutes);
    for (let t = Math.max(0, use.start); t < to; t++) load[t] = (load[t] as number) + use.amount;
  }
  return excess;
}

/** Sum of what is over; a trace of rounding is not over. */
function overOf(excess: Float64Array): number {
  let sum = 0;
  for (const e of excess) if (e > 1e-6) sum += e;
  return sum;
}

/** Steam is summed in kg, shared limits as shares of their greatest capacity. */
function divisorOf(resource: ProblemResource, horizonMin: number): number {
  if (resource.class === 'steam') return 60;
  if (resource.class === 'process') return 1;
  return Math.max(1e-3, ...toMinutes(resource.capacity, horizonMin));
}

function changeOf(problem: Problem, plan: Plan): number {
  const { batchMoved, minuteMoved, unitChanged } = problem.prices;
  const moved = new Set<string>();
  let sum = 0;
  problem.activities.forEach((a, i) => {
    const minutes = Math.abs((plan.starts[i] as number) - a.plan.start);
    const changed = plan.units[i] !== a.plan.unitId;
    sum += a.weight * (minuteMoved * minutes + (changed ? unitChanged : 0));
    if (minutes > 0 || changed) moved.add(a.batchId);
  });
  return sum + batchMoved * moved.size;
}

/** Minutes by which anything of the plan runs into something else, out of its shift, or past a wait or a bound. */
function brokenMinutes(problem: Problem, plan: Plan): number {
  let sum = 0;
  problem.activities.forEach((a, i) => {
    const start = plan.starts[i] as number;
    sum += Math.max(0, a.earliestStart - start) + Math.max(0, start - a.latestStart);
    if (!a.movable && (start !== a.plan.start || plan.units[i] !== a.plan.unitId)) sum += 1;
    if (!a.modes.some((m) => m.unitId === plan.units[i])) sum += 1;
    sum += outsideShift(problem, plan, i);
  });
  for (const link of problem.links) {
    const wait = momentOf(problem, plan, link.to) - momentOf(problem, plan, link.from);
    sum += Math.max(0, link.leastMin - wait) + Math.max(0, wait - (link.greatestMin ?? Infinity));
  }
  return sum + clashMinutes(problem, plan);
}

function outsideShift(problem: Problem, plan: Plan, i: number): number {
  const unit = lookupIn(problem).units.get(plan.units[i] as string);
  const start = plan.starts[i] as number;
  const end = freeAt(problem, plan, i);
  if (!unit) return 0;
  const within = unit.open.map((o) => Math.max(0, o.from - start) + Math.max(0, end - o.to));
  return Math.min(end - start, ...within);
}

function clashMinutes(problem: Problem, plan: Plan): number {
  const cleaning = new Map(changeovers(problem, plan).map((c) => [c.after, c]));
  let sum = 0;
  for (const { order } of sequences(problem, plan)) {
    let busy = -Infinity;
    order.forEach((i, k) => {
      if (k > 0) sum += Math.max(0, busy - (plan.starts[i] as number));
      const clean = cleaning.get(i);
      const free = clean ? clean.from + clean.minutes : freeAt(problem, plan, i);
      busy = Math.max(busy, free);
    });
  }
  return sum;
}

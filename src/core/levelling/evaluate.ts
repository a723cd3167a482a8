import { toMinutes } from '../time/stepFunction';
import { placedUses } from './placedUses';
import type { Plan, Problem, ProblemActivity, ProblemResource } from './problem';
import { changeovers, endOf, freeAt, lookupIn, momentOf, sequences } from './sequences';

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

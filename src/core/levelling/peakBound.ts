import { toMinutes } from '../time/stepFunction';
import {
  planOf,
  type Problem,
  type ProblemActivity,
  type ProblemMode,
  type ProblemResource,
  type Use,
} from './problem';
import { modeIn } from './sequences';

/** What no plan of a problem can bring the greatest load of a header below, and what that rests on. */
export interface PeakBound {
  /** [kg/h] */
  readonly kgPerH: number;
  /**
   * `fixed`: what is fixed or running and the base load alone; `single`: one activity beside them, at its best start;
   * `energy`: the steam of what must run within a span, spread evenly over it.
   */
  readonly kind: 'fixed' | 'single' | 'energy';
  /** Where it bites. [min] */
  readonly from: number;
  readonly to: number;
  /** The activity that it rests on, where it is one. */
  readonly activityId: string | null;
}

/**
 * The strongest of three bounds on the greatest load of a header, base load included. [kg/h] Cleaning and warming up
 * are left out, which can only make it lower: it stays a bound.
 */
export function peakBound(problem: Problem, resource: ProblemResource): PeakBound {
  const ground = groundLoad(problem, resource);
  const bounds = [fixedBound(ground), energyBound(problem, resource, ground)];
  for (const activity of problem.activities) {
    if (activity.movable) bounds.push(singleBound(activity, resource, ground));
  }
  return bounds.reduce((best, bound) => (bound.kgPerH > best.kgPerH ? bound : best));
}

/** Base load and the least that what can't move draws, by minute. [kg/h] */
function groundLoad(problem: Problem, resource: ProblemResource): Float64Array {
  const load = toMinutes(resource.baseLoad, problem.horizonMin);
  const plan = planOf(problem);
  problem.activities.forEach((activity, i) => {
    if (activity.movable) return;
    leastOf(profilesOf(modeIn(activity, plan, i), resource.id)).forEach((amount, minute) => {
      const t = activity.plan.start + minute;
      if (t >= 0 && t < load.length) load[t] = (load[t] as number) + amount;
    });
  });
  return load;
}

/** The least at each minute; a profile that has ended draws nothing. */
function leastOf(profiles: readonly Float64Array[]): Float64Array {
  const [first, ...more] = profiles;
  return (first ?? new Float64Array()).map((amount, t) => Math.min(amount, ...more.map((one) => one[t] ?? 0)));
}

function fixedBound(ground: Float64Array): PeakBound {
  let at = 0;
  for (let t = 1; t < ground.length; t++) if ((ground[t] as number) > (ground[at] as number)) at = t;
  return { kgPerH: ground[at] ?? 0, kind: 'fixed', from: at, to: at + 1, activityId: null };
}

/** The least greatest load that an activity makes with the ground alone, over its modes and starts. */
function singleBound(activity: ProblemActivity, resource: ProblemResource, ground: Float64Array): PeakBound {
  let least = Infinity;
  for (const own of activity.modes.flatMap((mode) => profilesOf(mode, resource.id))) {
    if (own.length === 0) least = 0;
    for (let start = activity.earliestStart; start <= activity.latestStart && least > 0; start++) {
      least = Math.min(least, greatestFrom(own, ground, start, least));
    }
  }
  const { id, earliestStart: from, latestStart: to } = activity;
  return { kgPerH: Number.isFinite(least) ? least : 0, kind: 'single', from, to, activityId: id };
}

/** The uses that a mode can have: of a cold machine, and of one that is still warm. */
const usesOf = (mode: ProblemMode): readonly (readonly Use[])[] => [
  mode.uses,
  ...(mode.warm ?? []).map(({ uses }) => uses),
];

/** What a mode can draw on a resource, by minute after its start. */
function profilesOf(mode: ProblemMode, resourceId: string): Float64Array[] {
  return usesOf(mode).map((all) => {
    const uses = all.filter((use) => use.resourceId === resourceId && use.offsetMin >= 0);
    const own = new Float64Array(Math.max(0, ...uses.map((use) => use.offsetMin + use.minutes)));
    for (const use of uses) {
      for (let t = use.offsetMin; t < use.offsetMin + use.minutes; t++) own[t] = (own[t] as number) + use.amount;
    }
    return own;
  });
}

/** Stops as soon as it is no better than `enough`. */
function greatestFrom(own: Float64Array, ground: Float64Array, start: number, enough: number): number {
  let greatest = 0;
  for (let t = 0; t < own.length && greatest < enough; t++) {
    greatest = Math.max(greatest, (own[t] as number) + (ground[start + t] ?? 0));
  }
  return greatest;
}

interface Confined {
  readonly from: number;
  readonly to: number;
  readonly kg: number;
}

/** Steam that must be drawn within a span, over its length: the greatest over all spans from an earliest to a latest. */
function energyBound(problem: Problem, resource: ProblemResource, ground: Float64Array): PeakBound {
  const confined = problem.activities.filter((a) => a.movable).map((a) => confinedTo(a, resource.id));
  const byEnd = confined.filter(({ kg }) => kg > 0).sort((a, b) => a.to - b.to);
  const groundKg = runningKg(ground);
  let best: PeakBound = { kgPerH: 0, kind: 'energy', from: 0, to: 0, activityId: null };
  for (const from of new Set(byEnd.map((c) => c.from))) {
    let kg = 0;
    for (const [i, c] of byEnd.entries()) {
      if (c.from >= from) kg += c.kg;
      if (byEnd[i + 1]?.to === c.to || c.to <= from) continue;
      const all = kg + kgBetween(groundKg, from, c.to);
      const kgPerH = (60 * all) / (c.to - from);
      if (kgPerH > best.kgPerH) best = { ...best, kgPerH, from, to: c.to };
    }
  }
  return best;
}

/** The span that an activity draws in wherever it starts, and the least that it draws. */
function confinedTo(activity: ProblemActivity, resourceId: string): Confined {
  const profiles = activity.modes.flatMap(usesOf).map((uses) => uses.filter((use) => use.resourceId === resourceId));
  const kgs = profiles.map((uses) => uses.reduce((kg, use) => kg + (use.amount * use.minutes) / 60, 0));
  const drawn = profiles.flat();
  return {
    from: activity.earliestStart + Math.min(...drawn.map((use) => use.offsetMin), Infinity),
    to: activity.latestStart + Math.max(...drawn.map((use) => use.offsetMin + use.minutes), -Infinity),
    kg: Math.min(...kgs),
  };
}

function runningKg(load: Float64Array): Float64Array {
  const sums = new Float64Array(load.length + 1);
  for (let t = 0; t < load.length; t++) sums[t + 1] = (sums[t] as number) + (load[t] as number) / 60;
  return sums;
}

function kgBetween(sums: Float64Array, from: number, to: number): number {
  const at = (t: number): number => sums[Math.min(sums.length - 1, Math.max(0, t))] as number;
  return at(to) - at(from);
}

/** The greatest load of a resource under a plan's judgement, base load included. [kg/h] */
export function loadPeak(problem: Problem, resource: ProblemResource, excess: Float64Array): number {
  const capacity = toMinutes(resource.capacity, problem.horizonMin);
  const base = toMinutes(resource.baseLoad, problem.horizonMin);
  let peak = 0;
  for (let t = 0; t < excess.length; t++) {
    peak = Math.max(peak, (excess[t] as number) + (capacity[t] as number) + (base[t] as number));
  }
  return peak;
}

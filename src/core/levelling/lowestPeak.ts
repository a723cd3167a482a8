import { combineSteps } from '../time/stepMath';
import { judge, type Judgement } from './evaluate';
import { solveProblem, type LevellingEnv, type Solved } from './levelWeek';
import type { FullOptions } from './options';
import { loadPeak, peakBound, type PeakBound } from './peakBound';
import { planOf, type Plan, type Problem, type ProblemResource } from './problem';
import { headerResource } from './uses';

/** The lowest greatest load found, and what it can't be below. */
export interface LowestPeak extends Solved {
  readonly headerId: string;
  /** [kg/h] */
  readonly peakBefore: number;
  readonly peakFound: number;
  readonly cantBeBelow: PeakBound;
}

/** Targets tried, each with an equal part of the budget; one that is reached early leaves its rest to the others. */
const ROUNDS = 8;
/** Near enough to the bound to stop: finer than any load is known. */
const CLOSE = 1.005;
const TRACE = 1e-6;

/**
 * Looks for the lowest greatest load of the header that has the greatest: the search is run under a limit that is
 * halved towards the bound while it is reached. Nothing else may get worse than in the planner's plan.
 * @returns null where the problem has no header.
 */
export function solveLowestPeak(problem: Problem, options: FullOptions, env: LevellingEnv): LowestPeak | null {
  const header = busiestHeader(problem);
  if (!header) return null;
  const { resource, peak: peakBefore } = header;
  const cantBeBelow = peakBound(problem, resource);
  const before = judge(problem, planOf(problem));
  let plan = planOf(problem);
  let peakFound = peakBefore;
  let floor = cantBeBelow.kgPerH;
  let iterations = 0;
  let cancelled = false;
  for (let round = 0; round < ROUNDS && peakFound > CLOSE * floor && !cancelled; round++) {
    const target = (floor + peakFound) / 2;
    const solved = tryTarget(problem, resource, target, plan, partOf(options, ROUNDS), env);
    iterations += solved.iterations;
    cancelled = env.cancelled?.() ?? false;
    const found = judge(problem, solved.plan);
    const peak = peakOf(problem, resource, found);
    if (peak < peakFound - TRACE && isNoWorse(found, before)) {
      plan = solved.plan;
      peakFound = peak;
    }
    if (peakFound > target + TRACE) floor = target;
  }
  const { sourceId: headerId } = resource;
  return { plan, iterations, cancelled, withheld: false, headerId, peakBefore, peakFound, cantBeBelow };
}

/** The search under a lower limit, from the best plan so far; it ends as soon as the limit is kept. */
function tryTarget(
  problem: Problem,
  resource: ProblemResource,
  target: number,
  from: Plan,
  options: FullOptions,
  env: LevellingEnv,
): Solved {
  let reached = false;
  return solveProblem(underLimit(problem, resource, target, from), options, {
    ...env,
    cancelled: () => reached || (env.cancelled?.() ?? false),
    onProgress: (progress) => {
      reached = progress.overKg + progress.limitsOver + progress.lateMin === 0;
      env.onProgress?.(progress);
    },
  });
}

function underLimit(problem: Problem, resource: ProblemResource, target: number, from: Plan): Problem {
  const capacity = combineSteps([resource.capacity, resource.baseLoad], ([limit = 0, base = 0]) =>
    Math.min(limit, target - base),
  );
  const resources = problem.resources.map((r) => (r === resource ? { ...r, capacity } : r));
  const activities = problem.activities.map((a, i) => ({
    ...a,
    plan: { unitId: from.units[i] as string, start: from.starts[i] as number },
  }));
  return { ...problem, resources, activities };
}

function partOf(options: FullOptions, parts: number): FullOptions {
  const { iterations, ms } = options.budget;
  return {
    ...options,
    budget: {
      ...(iterations === undefined ? {} : { iterations: Math.ceil(iterations / parts) }),
      ...(ms === undefined ? {} : { ms: ms / parts }),
    },
  };
}

function busiestHeader(problem: Problem): { resource: ProblemResource; peak: number } | null {
  const judged = judge(problem, planOf(problem));
  const headers = problem.resources.filter((r) => r.class === 'steam' && r.id === headerResource(r.sourceId));
  const peaks = headers.map((resource) => ({ resource, peak: peakOf(problem, resource, judged) }));
  return peaks.reduce<(typeof peaks)[number] | null>((best, one) => (best && best.peak >= one.peak ? best : one), null);
}

function peakOf(problem: Problem, resource: ProblemResource, judged: Judgement): number {
  return loadPeak(problem, resource, judged.excess[problem.resources.indexOf(resource)] as Float64Array);
}

function isNoWorse(found: Judgement, before: Judgement): boolean {
  const parts = ['broken', 'processOver', 'sharedOver', 'steamKg', 'lateMin'] as const;
  return parts.every((part) => found[part] <= before[part] + TRACE);
}

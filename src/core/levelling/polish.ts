import { judge, type Judgement } from './evaluate';
import type { Plan, Problem } from './problem';
import type { SolveLp } from './solverPort';
import { solveTiming, timingSystem } from './timing';

/** Free activities in one linear program: the package keeps a dense table, whose cost grows with the cube. */
const GREATEST_WINDOW = 120;
const SAME = 1e-6;

/**
 * Retimes a plan with its orders kept, window by window until nothing more is gained. An answer is kept only where
 * judging it from scratch finds it no worse in anything.
 */
export function polish(problem: Problem, plan: Plan, solve: SolveLp, stop: () => boolean): Plan {
  let best = plan;
  let judged = judge(problem, plan);
  for (let round = 0; round < 4; round++) {
    const before = judged.change;
    for (const window of windows(problem, best)) {
      if (stop()) return best;
      const system = timingSystem(problem, best, new Set(window));
      const timed = solveTiming(problem, best, system, solve);
      if (!timed) continue;
      const found = judge(problem, timed.plan);
      if (!isNoWorse(found, judged)) continue;
      best = timed.plan;
      judged = found;
    }
    if (judged.change > before - SAME) break;
  }
  return best;
}

/** True where nothing is over, broken or late by more, and the change costs no more. */
export function isNoWorse(a: Judgement, b: Judgement): boolean {
  const parts = ['processOver', 'sharedOver', 'steamKg', 'broken', 'change'] as const;
  const lateWorse = a.late.some((late, i) => late > (b.late[i] as number) + SAME);
  return !lateWorse && parts.every((p) => a[p] <= b[p] + SAME);
}

/**
 * Activities to retime together, in order of time. Where a moved batch has a price, only activities of batches that
 * move already.
 */
function windows(problem: Problem, plan: Plan): number[][] {
  const moved = movedBatches(problem, plan);
  const free = problem.activities
    .map((a, i) => ({ a, i }))
    .filter(({ a }) => a.movable && (problem.prices.batchMoved === 0 || moved.has(a.batchId)))
    .map(({ i }) => i)
    .sort((x, y) => (plan.starts[x] as number) - (plan.starts[y] as number) || x - y);
  if (free.length <= GREATEST_WINDOW) return free.length === 0 ? [] : [free];
  const step = Math.floor(GREATEST_WINDOW / 2);
  const found: number[][] = [];
  for (let from = 0; from < free.length - step; from += step) found.push(free.slice(from, from + GREATEST_WINDOW));
  return found;
}

/** Batches that are anywhere but in the planner's plan. */
export function movedBatches(problem: Problem, plan: Plan): Set<string> {
  const moved = problem.activities.filter((a, i) => plan.starts[i] !== a.plan.start || plan.units[i] !== a.plan.unitId);
  return new Set(moved.map((a) => a.batchId));
}

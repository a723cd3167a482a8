import type { Plan, Problem, ProblemActivity } from './problem';
import { changeovers, freeAt, sequences } from './sequences';

/** The time before an activity on its unit. Less than 0 where the two overlap. */
export interface GapBefore {
  /** Since the unit was free of the run before, cleanings passed over; null: there is none. [min] */
  readonly sinceRun: number | null;
  /** Since it was free of whatever came before, and clean. [min] */
  readonly sinceReady: number;
}

/** The gap before each activity that has one or is the first on its unit. */
export function gapsBefore(problem: Problem, plan: Plan): Map<number, GapBefore> {
  const clean = new Map(changeovers(problem, plan).map((c) => [c.before, c.from + c.minutes]));
  const gaps = new Map<number, GapBefore>();
  for (const { order } of sequences(problem, plan)) {
    let freeOfRun: number | null = null;
    let free = 0;
    for (const i of order) {
      const start = plan.starts[i] as number;
      const sinceRun = freeOfRun === null ? null : start - freeOfRun;
      gaps.set(i, { sinceRun, sinceReady: start - (clean.get(i) ?? free) });
      free = freeAt(problem, plan, i);
      if (!(problem.activities[i] as ProblemActivity).isCleaning) freeOfRun = free;
    }
  }
  return gaps;
}

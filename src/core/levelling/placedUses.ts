import { gapsBefore, type GapBefore } from './gapsBefore';
import type { Plan, Problem, ProblemMode, Use } from './problem';
import { changeovers, modeIn } from './sequences';

/** A draw as it stands under a plan, with the activity that moves it. */
export interface PlacedUse extends Use {
  readonly activity: number;
  readonly start: number;
  /** It follows from the sequence on the unit: a cleaning, an idle spell, a warm-up. */
  readonly follows: boolean;
}

/** Every draw of the plan, those included that follow from its sequences on the units. */
export function placedUses(problem: Problem, plan: Plan): PlacedUse[] {
  const gaps = gapsBefore(problem, plan);
  const own = problem.activities.flatMap((a, i) => {
    const mode = modeIn(a, plan, i);
    const place = (follows: boolean) => (use: Use) => {
      return { ...use, activity: i, start: (plan.starts[i] as number) + use.offsetMin, follows };
    };
    const gap = gaps.get(i);
    return [...usesAfter(mode, gap).map(place(false)), ...usesBefore(mode, gap).map(place(true))];
  });
  const cleaning = changeovers(problem, plan).flatMap((c) =>
    c.uses.map((u) => ({ ...u, activity: c.after, start: c.from + u.offsetMin, follows: true })),
  );
  return [...own, ...cleaning];
}

/** A run's own uses: those of a warm machine after a short gap. */
function usesAfter(mode: ProblemMode, gap: GapBefore | undefined): readonly Use[] {
  const since = gap?.sinceRun ?? null;
  if (!mode.warm || since === null || since < 0) return mode.uses;
  return mode.warm.find(({ gapUpToMin }) => since <= gapUpToMin)?.uses ?? mode.uses;
}

/** What is drawn before a run, offsets from its start. */
function usesBefore(mode: ProblemMode, gap: GapBefore | undefined): readonly Use[] {
  if (!mode.before || !gap) return [];
  if (gap.sinceRun === null) return mode.before.warmUp;
  const { sinceReady } = gap;
  if (sinceReady <= 0) return [];
  if (sinceReady > mode.before.idleUpToMin) return mode.before.warmUp;
  return mode.before.idle.map(({ resourceId, amount }) => {
    return { resourceId, amount, offsetMin: -sinceReady, minutes: sinceReady, phase: 'idle' };
  });
}

import { evaluateWeek, withPlacements, type WeekEvaluation } from '../pipeline';
import type { PlantModel } from '../plant/plant';
import { plainNetwork } from '../header/network';
import { newlyBroken } from '../schedule/newlyBroken';
import type { Week } from '../schedule/week';
import { movedBatches } from './polish';
import type { Plan, Problem } from './problem';

/**
 * Takes moves of a plan back until it newly breaks none of the rules that the search does not know: time between cleans,
 * standing dirty, pressure to vent at, allergens of runs further back. Whole batches go back to where the planner has
 * them: first those that a breach names, then those that no longer fit beside them. At the worst nothing is moved.
 */
export function keepRules(week: Week, problem: Problem, plan: Plan): Plan {
  if (!hasFurtherRules(week.plant)) return plan;
  const plain = { ...week, plant: plainNetwork(week.plant) };
  const before = evaluateWeek(plain);
  let kept = plan;
  for (;;) {
    const moved = movedBatches(problem, kept);
    if (moved.size === 0) return kept;
    const named = namedBy(before, evaluateWeek(withPlan(plain, problem, kept)));
    if (named.size === 0) return kept;
    const back = problem.activities.filter((a) => named.has(a.id) && moved.has(a.batchId)).map((a) => a.batchId);
    kept = takenBack(problem, kept, new Set(back.length > 0 ? back : moved));
  }
}

/** True where the plant has a rule that the search does not price; of allergens it knows the pair, not the state. */
function hasFurtherRules({ rules: { practice }, ventGroups, cleaning }: PlantModel): boolean {
  const isSet = (limit: number | null | undefined) => (limit ?? null) !== null;
  return (
    isSet(practice?.greatestRunningMin) ||
    isSet(practice?.greatestStandingDirtyMin) ||
    ventGroups.some((group) => isSet(group.leastHeaderBarG)) ||
    cleaning.some((rule) => rule.kind === 'allergen')
  );
}

/** Activities named by what is newly broken: a hard limit, or a matter of time that a move taken back has led to. */
function namedBy(before: WeekEvaluation, after: WeekEvaluation): Set<string> {
  const known = new Set(before.breaches.map(({ id }) => id));
  const time = after.breaches.filter((breach) => breach.class === 'time' && !known.has(breach.id));
  return new Set([...newlyBroken(before.breaches, after.breaches), ...time].flatMap(({ activityIds }) => activityIds));
}

function withPlan(week: Week, problem: Problem, plan: Plan): Week {
  const placements = new Map(week.activities.map((a) => [a.id, a.placement]));
  return withPlacements(
    week,
    problem.activities.map(({ id }, i) => {
      const to = { unitId: plan.units[i] as string, start: plan.starts[i] as number };
      return { activityId: id, placement: { ...placements.get(id), ...to } };
    }),
  );
}

function takenBack(problem: Problem, plan: Plan, batches: ReadonlySet<string>): Plan {
  const at = <T>(moved: readonly T[], home: (i: number) => T) =>
    problem.activities.map((a, i) => (batches.has(a.batchId) ? home(i) : (moved[i] as T)));
  return {
    starts: at(plan.starts, (i) => problem.activities[i]?.plan.start ?? 0),
    units: at(plan.units, (i) => problem.activities[i]?.plan.unitId ?? ''),
  };
}

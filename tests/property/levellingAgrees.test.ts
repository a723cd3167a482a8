import fc from 'fast-check';
import { expect, it } from 'vitest';
import { judge } from '@/core/levelling/evaluate';
import { planOf } from '@/core/levelling/problem';
import { toProblem } from '@/core/levelling/toProblem';
import { evaluateWeek } from '@/core/pipeline';
import type { Week } from '@/core/schedule/week';
import { weeks } from '../support/arbitraryWeeks';

const LIMIT = 1500;

/** The week with every run of some family, and of those that start together on a unit only the first. */
function withoutTies(week: Week): Week {
  const seen = new Set<string>();
  const activities = week.activities
    .filter(({ placement }) => {
      if (!placement) return true;
      const at = `${placement.unitId} ${placement.start}`;
      return !seen.has(at) && seen.add(at);
    })
    .map((activity) => ({ ...activity, familyId: activity.familyId ?? 'A' }));
  const kept = new Set(activities.map(({ id }) => id));
  return {
    ...week,
    activities,
    links: week.links.filter((l) => kept.has(l.from.activityId) && kept.has(l.to.activityId)),
  };
}

it('levelling states the load that the pipeline judges, minute by minute', () => {
  const seen = { idle: 0, warmUp: 0, cleanings: 0 };
  fc.assert(
    fc.property(weeks, (any) => {
      const week = withoutTies(any);
      const { headers, gapDraws, cleanings } = evaluateWeek(week);
      const problem = toProblem(week);
      const main = problem.resources.findIndex(({ id }) => id === 'header:main');
      const load = headers.find(({ headerId }) => headerId === 'main')?.loadKgPerH ?? [];
      const stated = judge(problem, planOf(problem)).excess[main] ?? new Float64Array();
      const apart = [...stated].map((excess, t) => Math.abs(excess + LIMIT - (load[t] ?? NaN)));
      expect(Math.max(...apart)).toBeLessThan(1e-3);
      for (const { activity } of gapDraws) seen[activity.kind as 'idle' | 'warmUp'] += 1;
      seen.cleanings += cleanings.length;
    }),
    { numRuns: 150, seed: 20_260 },
  );
  expect(Math.min(seen.idle, seen.warmUp, seen.cleanings)).toBeGreaterThan(15);
});

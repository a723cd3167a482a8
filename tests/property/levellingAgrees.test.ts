import fc from 'fast-check';
import { expect, it } from 'vitest';
import { judge } from '@/core/levelling/evaluate';
import { passedCleanings } from '@/core/levelling/passedCleanings';
import { planOf } from '@/core/levelling/problem';
import { toProblem } from '@/core/levelling/toProblem';
import { evaluateWeek } from '@/core/pipeline';
import type { Week } from '@/core/schedule/week';
import type { Activity, CleaningKind } from '@/core/plant/activity';
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
    .map((activity) => ({ ...activity, familyId: activity.kind === 'cleaning' ? null : (activity.familyId ?? 'A') }));
  const kept = new Set(activities.map(({ id }) => id));
  return {
    ...week,
    activities,
    links: week.links.filter((l) => kept.has(l.from.activityId) && kept.has(l.to.activityId)),
  };
}

/** Levelling's load on the main header against what the pipeline judges. [kg/h] */
function loadsApart(week: Week): number {
  const problem = toProblem(week);
  const main = problem.resources.findIndex(({ id }) => id === 'header:main');
  const load = evaluateWeek(week).headers.find(({ headerId }) => headerId === 'main')?.loadKgPerH ?? [];
  const stated = judge(problem, planOf(problem)).excess[main] ?? new Float64Array();
  return Math.max(...[...stated].map((excess, t) => Math.abs(excess + LIMIT - (load[t] ?? NaN))));
}

it('levelling states the load that the pipeline judges, minute by minute', () => {
  const seen = { idle: 0, warmUp: 0, cleanings: 0 };
  fc.assert(
    fc.property(weeks, (any) => {
      const week = withoutTies(any);
      const { gapDraws, cleanings } = evaluateWeek(week);
      expect(loadsApart(week)).toBeLessThan(1e-3);
      for (const { activity } of gapDraws) seen[activity.kind as 'idle' | 'warmUp'] += 1;
      seen.cleanings += cleanings.length;
    }),
    { numRuns: 150, seed: 20_260 },
  );
  expect(Math.min(seen.idle, seen.warmUp, seen.cleanings)).toBeGreaterThan(15);
});

/** One after the other on a kettle: a run, mostly a planned clean as long as a run, a run of the other family. */
function withCleans(week: Week, kinds: readonly CleaningKind[]): Week {
  const activities = week.activities.map((run, i): Activity => {
    const placement = run.placement && { unitId: 'k1', start: 100 * i + (run.placement.start % 50) };
    const cleaning = i % 3 === 1 ? kinds[i] : undefined;
    if (!cleaning) return { ...run, placement, familyId: i % 3 === 0 ? 'B' : 'A' };
    const modes = run.modes.map(({ between: _between, warm: _warm, ...mode }) => mode);
    return { ...run, kind: 'cleaning', cleaning, stage: null, familyId: null, modes, placement };
  });
  return withoutTies({ ...week, activities, links: [] });
}

const kindOrRun = fc.constantFrom(undefined, undefined, 'rinse', 'wash', 'allergen') as fc.Arbitrary<CleaningKind>;

it('levelling states the same load with planned cleans among the runs, whether they stand in or not', () => {
  const seen = { cleans: 0, short: 0, movable: 0 };
  fc.assert(
    fc.property(weeks, fc.array(kindOrRun, { minLength: 14, maxLength: 14 }), (any, kinds) => {
      const week = withCleans(any, kinds);
      const { activities } = toProblem(week);
      expect(loadsApart(week)).toBeLessThan(1e-3);
      seen.cleans += activities.filter(({ isCleaning }) => isCleaning).length;
      seen.movable += activities.filter(({ isCleaning, movable }) => isCleaning && movable).length;
      seen.short += passedCleanings(week).after.size;
    }),
    { numRuns: 100, seed: 20_261 },
  );
  expect(Math.min(seen.cleans, seen.short, seen.movable)).toBeGreaterThan(15);
});

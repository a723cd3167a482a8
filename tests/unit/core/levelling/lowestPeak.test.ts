import { describe, expect, it } from 'vitest';
import { solveLowestPeak } from '@/core/levelling/lowestPeak';
import { fullOptions } from '@/core/levelling/options';
import { peakBound } from '@/core/levelling/peakBound';
import type { Problem, ProblemActivity, ProblemResource } from '@/core/levelling/problem';
import { solveLp } from '@/solver/lpSolver';

const HEADER: ProblemResource = {
  id: 'header:main',
  class: 'steam',
  sourceId: 'main',
  capacity: [{ from: 0, value: 10_000 }],
  baseLoad: [{ from: 0, value: 100 }],
};

/** One draw of an even rate on a unit of its own. */
function draw(id: string, start: number, minutes: number, amount: number, reach = 60): ProblemActivity {
  const use = { resourceId: HEADER.id, offsetMin: 0, minutes, amount, phase: null };
  return {
    id,
    batchId: id,
    familyId: null,
    modes: [{ unitId: id, minutes, uses: [use] }],
    plan: { unitId: id, start },
    movable: reach > 0,
    takenOffBy: null,
    cleanAfterMin: 0,
    earliestStart: Math.max(0, start - reach),
    latestStart: start + reach,
    due: null,
    weight: 1,
  };
}

const problemOf = (activities: ProblemActivity[]): Problem => ({
  version: 1,
  horizonMin: 240,
  units: activities.map(({ id }) => ({ id, open: [{ from: 0, to: 240 }] })),
  cleaning: [],
  resources: [HEADER],
  activities,
  links: [],
  prices: { batchMoved: 0, minuteMoved: 1, unitChanged: 0 },
});

const lowest = (problem: Problem) =>
  solveLowestPeak(problem, fullOptions({ budget: { iterations: 4_000 } }), { solveLp });

describe('the lowest greatest load', () => {
  it('lays four equal draws side by side: a perfect packing that the bound knows', () => {
    // Each may start from 0 to 60 and runs 20 min: all must run within [0, 80): 4 x 20 min of 600 kg/h fill it.
    const four = ['a', 'b', 'c', 'd'].map((id) => ({
      ...draw(id, 30, 20, 600, 30),
      earliestStart: 0,
      latestStart: 60,
    }));
    const found = lowest(problemOf(four));
    expect(found?.peakBefore).toBe(2_500);
    expect(found?.peakFound).toBe(700);
    expect(found?.cantBeBelow.kgPerH).toBeCloseTo(700, 9);
  });

  it('says that what is fixed decides', () => {
    const found = lowest(problemOf([draw('a', 30, 20, 900, 0), draw('b', 40, 20, 300)]));
    expect(found?.peakFound).toBe(1_000);
    expect(found?.cantBeBelow).toMatchObject({ kgPerH: 1_000, kind: 'fixed', from: 30 });
  });

  it('says that one activity decides, wherever it starts', () => {
    const bound = peakBound(problemOf([draw('a', 0, 240, 500, 0), draw('b', 60, 20, 300)]), HEADER);
    expect(bound).toMatchObject({ kgPerH: 900, kind: 'single', activityId: 'b' });
  });

  it('never finds less than the bound, and nothing where there is no header', () => {
    const found = lowest(problemOf([draw('a', 30, 20, 600, 5), draw('b', 30, 20, 500, 5), draw('c', 33, 20, 400, 5)]));
    expect(found && found.peakFound).toBeGreaterThanOrEqual(found?.cantBeBelow.kgPerH ?? Infinity);
    expect(lowest({ ...problemOf([]), resources: [] })).toBeNull();
  });
});

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fullOptions } from '@/core/levelling/options';
import { judge } from '@/core/levelling/evaluate';
import { solveProblem } from '@/core/levelling/levelWeek';
import { toModel } from '@/core/levelling/model';
import { placedUses } from '@/core/levelling/placedUses';
import { planOf, type Plan, type Problem } from '@/core/levelling/problem';
import { seededRandom, shuffle } from '@/core/levelling/random';
import { Search } from '@/core/levelling/search';
import { solveLp } from '@/solver/lpSolver';
import { smallProblem } from '../support/levellingProblems';

const RUNS = 60;
/** Where cases are counted the draws are the same each time. */
const COUNTED = 20_260;
const seeds = fc.integer({ min: 1, max: 100_000 });
const options = fullOptions({ budget: { iterations: 200 } });
const solve = (problem: Problem): Plan => solveProblem(problem, options, { solveLp }).plan;

describe('levelling, for any small problem', () => {
  it.each([false, true])(
    'keeps the overload it works with equal to one worked out from scratch, gaps %s',
    (gapDraws) => {
      let steps = 0;
      const seen = { idle: 0, warmUp: 0, warm: 0 };
      fc.assert(
        fc.property(seeds, (seed) => {
          const problem = smallProblem(seed, { cleaningDraws: true, gapDraws });
          const search = new Search(toModel(problem), seededRandom(seed));
          if (!problem.activities.some((a) => a.movable)) return;
          for (let i = 0; i < 300; i++) search.step(i / 300);
          steps += search.iterations;
          const { state } = search;
          const units = problem.activities.map((a, i) => a.modes[state.modes[i] ?? 0]?.unitId ?? '');
          const judged = judge(problem, { starts: [...state.starts], units });
          const uses = placedUses(problem, { starts: [...state.starts], units });
          seen.idle += uses.filter(({ phase, follows }) => follows && phase === 'idle').length;
          seen.warmUp += uses.filter(({ phase, offsetMin }) => phase !== 'idle' && offsetMin < 0).length;
          seen.warm += uses.filter(({ amount }) => amount === 15 || amount === 18).length;
          judged.excess.forEach((excess, r) => {
            const from0 = [...excess].reduce((sum, e) => sum + Math.max(0, e), 0);
            expect(state.over[r]).toBeCloseTo(from0, 6);
            excess.forEach((e, t) => expect(Math.abs(e - (state.excess[r]?.[t] ?? NaN))).toBeLessThan(1e-6));
          });
          expect(state.change).toBeCloseTo(judged.change, 6);
          expect(state.late).toBeCloseTo(
            judged.late.reduce((a, b) => a + b, 0),
            6,
          );
          expect(judged.broken).toBeLessThanOrEqual(judge(problem, planOf(problem)).broken);
        }),
        { numRuns: RUNS, seed: COUNTED },
      );
      expect(steps).toBeGreaterThan(RUNS * 150);
      expect(Math.min(seen.idle, seen.warmUp, seen.warm)).toBeGreaterThanOrEqual(gapDraws ? 15 : 0);
    },
  );

  it.each([false, true])(
    'never answers with a plan that breaks or passes more than the planner’s, gaps %s',
    (gapDraws) => {
      let improved = 0;
      fc.assert(
        fc.property(seeds, (seed) => {
          const problem = smallProblem(seed, { cleaningDraws: true, gapDraws });
          const { plan, withheld } = solveProblem(problem, options, { solveLp });
          const before = judge(problem, planOf(problem));
          const after = judge(problem, plan);
          expect(withheld).toBe(false);
          expect(after.broken).toBeLessThanOrEqual(before.broken);
          expect(after.processOver).toBeLessThanOrEqual(before.processOver + 1e-9);
          expect(after.sharedOver).toBeLessThanOrEqual(before.sharedOver + 1e-9);
          if (after.processOver === before.processOver)
            expect(after.steamKg).toBeLessThanOrEqual(before.steamKg + 1e-9);
          if (after.steamKg < before.steamKg) improved++;
        }),
        { numRuns: RUNS, seed: COUNTED },
      );
      expect(improved).toBeGreaterThan(gapDraws ? RUNS / 5 : RUNS / 4);
    },
  );

  it('gives the identical plan for the same seed and iterations', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        expect(solve(smallProblem(seed))).toEqual(solve(smallProblem(seed)));
      }),
      { numRuns: 20 },
    );
  });

  it('shifts its answer when all times, limits and shifts are shifted', () => {
    fc.assert(
      fc.property(seeds, fc.integer({ min: 1, max: 500 }), (seed, by) => {
        const problem = smallProblem(seed);
        const judged = judge(problem, solve(problem));
        const later = judge(shifted(problem, by), solve(shifted(problem, by)));
        expect(later.steamKg).toBeCloseTo(judged.steamKg, 6);
        expect(later.processOver).toBe(judged.processOver);
      }),
      { numRuns: 20 },
    );
  });

  it('is left as it is by a batch that can’t interfere', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const problem = smallProblem(seed);
        const alone = solve(problem);
        const withOther = solve(withIdleRun(problem));
        expect(judge(problem, { starts: withOther.starts.slice(0, -1), units: withOther.units.slice(0, -1) })).toEqual(
          expect.objectContaining({ steamKg: judge(problem, alone).steamKg }),
        );
        expect(withOther.starts.at(-1)).toBe(10);
      }),
      { numRuns: 20 },
    );
  });
});

function shifted(problem: Problem, by: number): Problem {
  return {
    ...problem,
    horizonMin: problem.horizonMin + by,
    units: problem.units.map((u) => ({ ...u, open: u.open.map((o) => ({ from: o.from + by, to: o.to + by })) })),
    resources: problem.resources.map((r) => ({
      ...r,
      capacity: r.capacity.map((s, i) => ({ from: i === 0 ? 0 : s.from + by, value: s.value })),
    })),
    activities: problem.activities.map((a) => ({
      ...a,
      plan: { ...a.plan, start: a.plan.start + by },
      earliestStart: a.earliestStart + by,
      latestStart: a.latestStart + by,
      due: a.due === null ? null : a.due + by,
    })),
  };
}

/** A fixed run without any draw, on a unit of its own. */
function withIdleRun(problem: Problem): Problem {
  return {
    ...problem,
    units: [...problem.units, { id: 'zz', open: [{ from: 0, to: problem.horizonMin }] }],
    activities: [
      ...problem.activities,
      {
        id: 'zz',
        batchId: 'zz',
        familyId: null,
        modes: [{ unitId: 'zz', minutes: 5, uses: [] }],
        plan: { unitId: 'zz', start: 10 },
        movable: false,
        takenOffBy: null,
        cleanAfterMin: 0,
        earliestStart: 10,
        latestStart: 10,
        due: null,
        weight: 1,
      },
    ],
  };
}

describe('shuffling', () => {
  it('keeps every value', () => {
    fc.assert(
      fc.property(seeds, fc.array(fc.integer(), { maxLength: 30 }), (seed, values) => {
        const shuffled = [...values];
        shuffle(seededRandom(seed), shuffled);
        expect(shuffled.sort((a, b) => a - b)).toEqual([...values].sort((a, b) => a - b));
      }),
    );
  });
});

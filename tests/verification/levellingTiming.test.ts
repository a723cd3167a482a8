import loadHighs from 'highs';
import { describe, expect, it } from 'vitest';
import { judge } from '@/core/levelling/evaluate';
import { isNoWorse } from '@/core/levelling/polish';
import { toModel } from '@/core/levelling/model';
import type { Plan, Problem } from '@/core/levelling/problem';
import { seededRandom, wholeBelow } from '@/core/levelling/random';
import { Ripple } from '@/core/levelling/ripple';
import { Search } from '@/core/levelling/search';
import type { LpModel } from '@/core/levelling/solverPort';
import { solveTiming, timingModel, timingSystem } from '@/core/levelling/timing';
import { solveLp } from '@/solver/lpSolver';
import { smallProblem } from '../support/levellingProblems';

/** The program in the text form that HiGHS reads. */
function asText(model: LpModel): string {
  const term = (coefficient: number, v: number): string =>
    `${coefficient < 0 ? '-' : '+'} ${Math.abs(coefficient)} x${v}`;
  const rows = model.rows.map((row, i) => {
    const sign = { atLeast: '>=', atMost: '<=', equal: '=' }[row.sense];
    return ` r${i}: ${row.terms.map(([v, c]) => term(c, v)).join(' ')} ${sign} ${row.value}`;
  });
  return ['Minimize', ` obj: ${model.costs.map(term).join(' ')}`, 'Subject To', ...rows, 'End'].join('\n');
}

/** A searched plan that was then pushed about at random: orders kept, times with something to gain. */
function roughPlan(problem: Problem, seed: number): Plan {
  const random = seededRandom(seed);
  const search = new Search(toModel(problem), random);
  for (let i = 0; i < 40 && !search.idle; i++) search.step(0.1);
  const { state } = search;
  const ripple = new Ripple(state);
  for (let i = 0; i < 12; i++) {
    const push = ripple.push(wholeBelow(random, problem.activities.length), wholeBelow(random, 21) - 10);
    if (push) state.shift(push.list, push.starts);
  }
  return {
    starts: [...state.starts],
    units: problem.activities.map((a, i) => a.modes[state.modes[i] ?? 0]?.unitId ?? a.plan.unitId),
  };
}

describe('timing on fixed orders', () => {
  it('has the objective that HiGHS finds, in whole minutes, and is no worse than what it started from', async () => {
    const highs = await loadHighs();
    let windows = 0;
    let gained = 0;
    for (let seed = 1; windows < 100; seed++) {
      const problem = { ...smallProblem(seed), prices: { batchMoved: 0, minuteMoved: 1, unitChanged: 7 } };
      const plan = roughPlan(problem, seed);
      const random = seededRandom(seed);
      const free = problem.activities.flatMap((a, i) => (a.movable && wholeBelow(random, 4) > 0 ? [i] : []));
      if (free.length < 2) continue;
      const system = timingSystem(problem, plan, new Set(free));
      const model = timingModel(problem, system, plan);
      const timed = solveTiming(problem, plan, system, solveLp);
      const reference = highs.solve(asText(model), { output_flag: false });
      expect(reference.Status).toBe('Optimal');
      expect(timed?.objective).toBeCloseTo(reference.ObjectiveValue, 6);
      const found = judge(problem, timed?.plan ?? plan);
      expect(isNoWorse({ ...found, change: 0, late: [] }, { ...judge(problem, plan), change: 0, late: [] })).toBe(true);
      if (timed && found.change < judge(problem, plan).change) gained++;
      windows++;
    }
    expect(gained).toBeGreaterThan(10);
  });
});

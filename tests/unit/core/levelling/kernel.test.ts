import { describe, expect, it } from 'vitest';
import { judge, type Judgement } from '@/core/levelling/evaluate';
import { Kernel } from '@/core/levelling/kernel';
import { toModel, type Group, type Model } from '@/core/levelling/model';
import { planOf, type Problem } from '@/core/levelling/problem';
import { LATE_PRICE, State } from '@/core/levelling/state';
import { smallProblem } from '../../../support/levellingProblems';

const PRICES = [3, 500, 100];
const RADIUS = 3;

/** The price of a whole plan, worked out from scratch. */
function priceOf(found: Judgement): number {
  const late = found.late.reduce((a, b) => a + b, 0);
  const over = found.excess.map((e) => e.reduce((sum, v) => sum + Math.max(0, v), 0));
  return found.change + LATE_PRICE * late + over.reduce((sum, o, r) => sum + o * (PRICES[r] ?? 0), 0);
}

/** The least price of all ways to place the group within the radius, every combination tried. */
function bruteForce(problem: Problem, model: Model, group: Group): number {
  const home = planOf(problem);
  const allowed = judge(problem, home).broken;
  const starts = [...home.starts];
  const units = [...home.units];
  let least = Infinity;
  const tryFrom = (k: number): void => {
    const member = group.members[k];
    if (!member) {
      const found = judge(problem, { starts, units });
      if (found.broken <= allowed) least = Math.min(least, priceOf(found));
      return;
    }
    const activity = model.activities[member.activity];
    const centre = activity?.home.start ?? 0;
    for (const mode of problem.activities[member.activity]?.modes ?? []) {
      units[member.activity] = mode.unitId;
      const { earliest = 0, latest = 0 } = activity ?? {};
      for (let t = Math.max(earliest, centre - RADIUS); t <= Math.min(latest, centre + RADIUS); t++) {
        starts[member.activity] = t;
        tryFrom(k + 1);
      }
    }
  };
  tryFrom(0);
  return least;
}

function stateOf(model: Model): State {
  const state = new State(model);
  PRICES.forEach((price, r) => (state.prices[r] = price));
  state.load(
    model.activities.map((a) => a.home.start),
    model.activities.map((a) => a.home.mode),
  );
  return state;
}

describe('placement kernel', () => {
  it('finds the price that trying every combination finds', () => {
    let cases = 0;
    let moved = 0;
    let pairs = 0;
    let takenOff = 0;
    for (let seed = 1; cases < 500 && seed < 2000; seed++) {
      const problem = smallProblem(seed);
      if (judge(problem, planOf(problem)).broken > 0) continue;
      const model = toModel(problem);
      const group = model.groups[seed % model.groups.length];
      if (!group || (group.members.length > 1 && pairs === 60)) continue;
      const state = stateOf(model);
      expect(state.cost()).toBeCloseTo(priceOf(judge(problem, planOf(problem))), 6);
      for (let k = group.members.length - 1; k >= 0; k--) state.remove(group.members[k]?.activity ?? -1);
      const placing = new Kernel(state).best(group, { radius: RADIUS, centres: null, push: 0 });
      if (!placing) throw new Error('the plan itself is a place');
      const before = state.cost();
      group.members.forEach((m, k) => state.insert(m.activity, placing.starts[k] ?? 0, placing.modes[k] ?? 0));
      const least = bruteForce(problem, model, group);
      expect(state.cost(), `seed ${seed}`).toBeCloseTo(least, 6);
      expect(before + placing.cost, `seed ${seed}`).toBeCloseTo(least, 6);
      cases++;
      if (group.members.length > 1) pairs++;
      if (group.members.some((m) => model.activities[m.activity]?.takenOffBy !== -1)) takenOff++;
      if (group.members.some((m) => state.isMoved(m.activity))) moved++;
    }
    expect(cases).toBe(500);
    expect(moved).toBeGreaterThan(50);
    expect(pairs).toBe(60);
    expect(takenOff).toBeGreaterThan(10);
  }, 120_000);
});

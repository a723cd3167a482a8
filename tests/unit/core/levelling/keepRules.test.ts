import { describe, expect, it } from 'vitest';
import { evaluateWeek, withPlacements } from '@/core/pipeline';
import type { Activity } from '@/core/plant/activity';
import type { PracticeLimits } from '@/core/plant/plant';
import { levelWeek } from '@/solver/levelWeek';
import { activity, capacity, flatMode, plant, unit, week } from '../../../support/builders';

const KETTLES = ['kettle1', 'kettle2', 'kettle3', 'kettle4'];
const NONE: PracticeLimits = { greatestRunningMin: null, greatestStandingDirtyMin: null, allergenReleaseMin: null };

const run = (id: string, unitId: string, start: number, changes: Partial<Activity> = {}) =>
  activity(id, {
    familyId: 'soup',
    batchId: id,
    modes: [flatMode(unitId, 60, 600)],
    placement: { unitId, start },
    earliestStart: start,
    ...changes,
  });

/**
 * Limit 1000 kg/h, each run 600 kg/h for an hour, nothing may start earlier. At 200 `dirty` must wait for `other`, which
 * leaves its kettle standing dirty; at 2000 two runs on kettles without a run before are over too.
 */
const activities = [
  run('before', 'kettle1', 0, { fixing: 'fixed' }),
  run('dirty', 'kettle1', 200),
  run('other', 'kettle2', 200, { fixing: 'fixed' }),
  run('free', 'kettle3', 2000),
  run('fixed', 'kettle4', 2000, { fixing: 'fixed' }),
];

function levelled(practice: Partial<PracticeLimits>) {
  const bare = plant({ units: KETTLES.map((id) => unit(id, { kind: 'kettle' })) });
  const source = week({
    plant: { ...bare, rules: { ...bare.rules, practice: { ...NONE, ...practice } } },
    capacities: [capacity('main', 1000)],
    activities,
  });
  const { proposal, withheld } = levelWeek(source, { budget: { iterations: 600 } }, { now: undefined });
  const placements = proposal.moves.map(({ activityId, to }) => ({ activityId, placement: to }));
  const { breaches } = evaluateWeek(withPlacements(source, placements));
  return { moves: proposal.moves.map((move) => [move.activityId, move.to.start]), proposal, withheld, breaches };
}

describe('a rule that the search does not price', () => {
  it('is no concern where it is not set', () => {
    expect(levelled({}).moves).toEqual([
      ['dirty', 260],
      ['free', 2060],
    ]);
  });

  it('takes the batches back that would break it, and keeps the others', () => {
    const { moves, proposal, withheld, breaches } = levelled({ greatestStandingDirtyMin: 180 });
    expect(moves).toEqual([['free', 2060]]);
    expect(withheld).toBe(false);
    expect(breaches.map(({ code }) => code)).toEqual(['overLimit']);
    expect(proposal.after.overKg).toBeCloseTo(200, 6);
    expect(proposal.unresolved).toMatchObject([{ from: 200, to: 260, kg: 200 }]);
  });

  it('may stay passed where the planner has it so already', () => {
    const { moves, breaches } = levelled({ greatestStandingDirtyMin: 100 });
    expect(moves).toEqual([['free', 2060]]);
    expect(breaches.map(({ code }) => code)).toEqual(['standingDirty', 'overLimit']);
  });
});

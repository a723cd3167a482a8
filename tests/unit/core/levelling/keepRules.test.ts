import { describe, expect, it } from 'vitest';
import { evaluateWeek, withPlacements } from '@/core/pipeline';
import type { Activity } from '@/core/plant/activity';
import type { CleaningRule, PracticeLimits } from '@/core/plant/plant';
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
  const wash = { unitKind: 'kettle', fromFamilyId: 'soup', toFamilyId: 'sauce', minutes: 20, kind: 'wash' } as const;
  const cleaning = [{ ...wash, phases: [], uses: [] }];
  const bare = plant({ units: KETTLES.map((id) => unit(id, { kind: 'kettle' })), cleaning });
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

describe('allergens of runs further back', () => {
  const rinse = { unitKind: 'kettle', minutes: 10, kind: 'rinse', phases: [], uses: [] } as const;
  const cleaning = (kind: CleaningRule['kind']): CleaningRule[] => [
    { ...rinse, fromFamilyId: 'nut', toFamilyId: 'plain' },
    { ...rinse, fromFamilyId: 'plain', toFamilyId: 'nutFree' },
    { ...rinse, fromFamilyId: 'nut', toFamilyId: 'nutFree', minutes: 90, kind },
  ];
  // Only between the run with nuts and the one free of them finds `plain` a time without `other`: with 70 min to clean.
  const plain = run('plain', 'kettle2', 100, {
    familyId: 'plain',
    modes: ['kettle1', 'kettle2'].map((id) => flatMode(id, 60, 600)),
    earliestStart: 0,
    latestStart: 100,
  });
  const fixed = { fixing: 'fixed' } as const;
  const runs = [
    run('nut', 'kettle1', 0, { ...fixed, familyId: 'nut' }),
    plain,
    run('nutFree', 'kettle1', 200, { ...fixed, familyId: 'nutFree' }),
    run('taken', 'kettle2', 0, { ...fixed, familyId: null, modes: [flatMode('kettle2', 100, 0)] }),
    run('other', 'kettle3', 130, fixed),
  ];
  const movesOf = (kind: CleaningRule['kind']) => {
    const kettles = plant({ units: KETTLES.map((id) => unit(id, { kind: 'kettle' })), cleaning: cleaning(kind) });
    const source = week({ plant: kettles, capacities: [capacity('main', 1000)], activities: runs });
    const { proposal, withheld } = levelWeek(source, { budget: { iterations: 400 } }, { now: undefined });
    return [withheld, ...proposal.moves.map(({ activityId, to }) => [activityId, to.unitId, to.start])];
  };

  it('keep a run out from between that would leave a rinse where an allergen clean is due', () => {
    expect(movesOf('wash')).toEqual([false, ['plain', 'kettle1', 70]]);
    expect(movesOf('allergen')).toEqual([false]);
  });
});

describe('a planned clean', () => {
  /** Soup to 60 and from 400 on; the wash between draws 600 kg/h beside `other`, over the limit of 1000 kg/h. */
  const plan = (fixing: 'free' | 'fixed', practice: Partial<PracticeLimits>, earliestStart = 0) => {
    const clean = activity('c1', {
      ...({ kind: 'cleaning', stage: null, cleaning: 'wash', code: 'C1', title: 'Wash of kettle1', fixing } as const),
      modes: [flatMode('kettle1', 30, 600)],
      placement: { unitId: 'kettle1', start: 100 },
      earliestStart,
    });
    const wash = { unitKind: 'kettle', fromFamilyId: 'soup', toFamilyId: 'sauce', minutes: 20, kind: 'wash' } as const;
    const bare = plant({
      units: KETTLES.map((id) => unit(id, { kind: 'kettle' })),
      cleaning: [{ ...wash, phases: [], uses: [] }],
    });
    const source = week({
      plant: { ...bare, rules: { ...bare.rules, practice: { ...NONE, ...practice } } },
      capacities: [capacity('main', 1000)],
      activities: [
        run('before', 'kettle1', 0, { fixing: 'fixed' }),
        clean,
        run('after', 'kettle1', 400, { fixing: 'fixed' }),
        run('other', 'kettle2', 90, { fixing: 'fixed' }),
      ],
    });
    const { proposal, withheld } = levelWeek(source, { budget: { iterations: 600 } }, { now: undefined });
    const placements = proposal.moves.map(({ activityId, to }) => ({ activityId, placement: to }));
    const { breaches, over } = evaluateWeek(withPlacements(source, placements));
    const codes = breaches.map(({ code }) => code);
    return { moves: proposal.moves.map((move) => [move.activityId, move.to.start]), withheld, codes, kg: over.kg };
  };

  it('moves like any other activity so that its steam fits, and judging agrees', () => {
    const clear = { withheld: false, codes: [], kg: 0 };
    expect(plan('free', { greatestRunningMin: 100 })).toEqual({ moves: [['c1', 60]], ...clear });
  });

  it('stays where it is fixed', () => {
    const { kg, ...fixed } = plan('fixed', {});
    expect(fixed).toEqual({ moves: [], withheld: false, codes: ['overLimit'] });
    // 30 min at 200 kg/h over.
    expect(kg).toBeCloseTo(100, 9);
  });

  it('is not moved to where it would no longer cure what it was added for', () => {
    expect(plan('free', {}, 100).moves).toEqual([['c1', 150]]);
    expect(plan('free', { greatestStandingDirtyMin: 90 }, 100).moves).toEqual([['c1', 150]]);
    const kept = plan('free', { greatestStandingDirtyMin: 89 }, 100);
    expect(kept).toMatchObject({ moves: [], withheld: false, codes: ['overLimit'] });
  });
});

import { describe, expect, it } from 'vitest';
import { toProblem } from '@/core/levelling/toProblem';
import { activity, link, mode, phase, unit, ventGroup, week } from '../../../support/levellingCases';

const vents = [phase('vent', 5, 4, 900), phase('vent', 9, 1, 450), phase('process', 10, 20, 100)];
const plan = week({
  horizonMin: 600,
  limitKgPerH: 2000,
  ventGroups: [ventGroup({ marginMinutes: 2, steamOnMinutes: 3 })],
  units: [
    unit('R2', 'retort', { ventGroupId: 'group' }),
    unit('R1', 'retort', { ventGroupId: 'group' }),
    unit('K', 'kettle'),
  ],
  activities: [
    activity('b', { modes: [mode('R1', 40, vents), mode('R2', 40, vents)], placement: { unitId: 'R2', start: 100 } }),
    activity('a', { stage: 'cook', modes: [mode('K', 30)], placement: { unitId: 'K', start: 50 }, fixing: 'started' }),
    activity('c', { modes: [mode('R1', 40, vents)] }),
  ],
  links: [link('l', 'a', 'b', 0, 10), link('m', 'a', 'c', 0, null)],
});

describe('toProblem', () => {
  const problem = toProblem(plan, { greatestShiftMin: 60 });
  const byId = (id: string) => problem.activities.find((a) => a.id === id);

  it('sorts by id and leaves out what is not placed, with its links', () => {
    expect(problem.activities.map((a) => a.id)).toEqual(['a', 'b']);
    expect(problem.units.map((u) => u.id)).toEqual(['K', 'R1', 'R2']);
    expect(problem.links.map((l) => l.id)).toEqual(['l']);
  });

  it('counts touching vent phases as one vent, with its margin, and the first steam as a steam on', () => {
    const uses = byId('b')?.modes[0]?.uses.filter((u) => u.amount === 1);
    expect(uses).toEqual([
      { resourceId: 'vents:group', offsetMin: 5, minutes: 7, amount: 1, phase: 'vent' },
      { resourceId: 'steamOns:group', offsetMin: 5, minutes: 3, amount: 1, phase: null },
    ]);
  });

  it('keeps running activities where they are and bounds the others by the greatest shift', () => {
    expect(byId('a')).toMatchObject({ movable: false, earliestStart: 50, latestStart: 50 });
    expect(byId('b')).toMatchObject({ movable: true, earliestStart: 40, latestStart: 160 });
  });

  it('widens a wait that the plan passes to what it has, so that it can’t get worse', () => {
    expect(problem.links[0]).toMatchObject({ leastMin: 0, greatestMin: 20 });
  });

  it('keeps the unit where it may not change, and lets only the span move', () => {
    const kept = toProblem(plan, { mayChangeUnit: false }).activities.find((a) => a.id === 'b');
    expect(kept?.modes.map((m) => m.unitId)).toEqual(['R2']);
    const span = toProblem(plan, { span: { from: 200, to: 400 } }).activities.find((a) => a.id === 'b');
    expect(span?.movable).toBe(false);
  });

  it('does not judge a header without a limit', () => {
    const open = toProblem({ ...plan, capacities: [] });
    expect(open.resources.find((r) => r.id === 'header:main')?.capacity).toEqual([{ from: 0, value: 1e12 }]);
  });

  it('leaves a cooker that takes hours to heat up where it is', () => {
    const cooker = activity('d', {
      modes: [{ ...mode('K', 40), neverMoved: true }],
      placement: { unitId: 'K', start: 200 },
    });
    expect(toProblem({ ...plan, activities: [cooker], links: [] }).activities[0]?.movable).toBe(false);
  });

  it('states what hangs on the gap before a run: idling, a warm-up that ends at its start, and warm phases', () => {
    const warmUp = [phase('warmUp', 0, 10, 300), phase('warmUp', 10, 2, 100)];
    const between = { idleKgPerH: 80, idleUpToMin: 25, warmUp };
    const warm = [{ gapUpToMin: 15, phases: [phase('vent', 5, 3, 800)] }];
    const run = activity('d', {
      modes: [{ ...mode('R1', 40, vents), between, warm }],
      placement: { unitId: 'R1', start: 200 },
    });
    const stated = toProblem({ ...plan, activities: [run], links: [] }).activities[0]?.modes[0];
    expect(stated?.before).toMatchObject({
      idle: [{ resourceId: 'header:main', amount: 80 }],
      idleUpToMin: 25,
      warmUp: [
        { offsetMin: -12, minutes: 10, amount: 300 },
        { offsetMin: -2, minutes: 2, amount: 100 },
      ],
    });
    expect(
      stated?.warm?.map(({ gapUpToMin, uses }) => [gapUpToMin, uses.map((u) => [u.resourceId, u.minutes])]),
    ).toEqual([
      [
        15,
        [
          ['header:main', 3],
          ['vents:group', 5],
          ['steamOns:group', 3],
        ],
      ],
    ]);
  });

  it('keeps a unit from the next run until an allergen clean is released', () => {
    const rule = { unitKind: 'kettle', fromFamilyId: 'nut', toFamilyId: 'nutFree', phases: [], uses: [] } as const;
    const cleaning = [
      { ...rule, minutes: 30, kind: 'allergen' } as const,
      { ...rule, fromFamilyId: 'soup', minutes: 20, kind: 'wash' } as const,
    ];
    const practice = { greatestRunningMin: null, greatestStandingDirtyMin: null, allergenReleaseMin: 45 };
    const rules = { ...plan.plant.rules, practice };
    const stated = toProblem({ ...plan, plant: { ...plan.plant, cleaning, rules } }).cleaning;
    expect(stated.map(({ fromFamilyId, minutes }) => [fromFamilyId, minutes])).toEqual([
      ['nut', 75],
      ['soup', 20],
    ]);
  });
});

import { describe, expect, it } from 'vitest';
import { levelWeek } from '@/solver/levelWeek';
import { evaluateWeek, withPlacements } from '@/core/pipeline';
import type { LevellingOptions } from '@/core/levelling/options';
import type { Activity } from '@/core/plant/activity';
import type { Week } from '@/core/schedule/week';
import { activity, link, MAIN, mode, phase, unit, week } from '../support/levellingCases';

const OPTIONS: LevellingOptions = { budget: { iterations: 1200 }, prices: { batchMoved: 0 } };

function solve(plan: Week, options: LevellingOptions = OPTIONS) {
  const { proposal } = levelWeek(plan, options, { now: undefined });
  const moves = proposal.moves.map((m) => ({ activityId: m.activityId, placement: m.to }));
  const moved = withPlacements(plan, moves);
  const start = (id: string): number => moved.activities.find((a) => a.id === id)?.placement?.start ?? NaN;
  return { proposal, start, evaluation: evaluateWeek(moved) };
}

const at = (unitId: string, start: number): Pick<Activity, 'placement'> => ({ placement: { unitId, start } });
const steady = (minutes: number, kgPerH: number) => [phase('run', 0, minutes, kgPerH)];

describe('a filler run that feeds two retort loads', () => {
  // The fixed kettle holds 700 of 1,000 kg/h until 120; each load's vent of 500 kg/h for 10 min has to wait for that or
  // stay within 60 min of its own filling; the filler may start later and its loads go with it.
  const plan = week({
    horizonMin: 480,
    limitKgPerH: 1000,
    units: [unit('F', 'filler'), unit('R1', 'retort'), unit('R2', 'retort'), unit('K', 'kettle')],
    activities: [
      activity('kettle', { stage: 'cook', fixing: 'fixed', modes: [mode('K', 120, steady(120, 700))], ...at('K', 0) }),
      activity('filling', { stage: 'fill', modes: [mode('F', 40)], ...at('F', 20) }),
      activity('load1', { modes: [mode('R1', 60, [phase('vent', 0, 10, 500)])], ...at('R1', 45) }),
      activity('load2', { modes: [mode('R2', 60, [phase('vent', 0, 10, 500)])], ...at('R2', 65) }),
    ],
    links: [
      { ...link('l1', 'filling', 'load1', -20, 40), from: { activityId: 'filling', anchor: 'start', offsetMin: 20 } },
      link('l2', 'filling', 'load2', 0, 40),
    ],
  });

  it('moves as a whole where its loads alone can’t wait so long', () => {
    const { start, evaluation, proposal } = solve(plan);
    expect(evaluation.over.kg).toBe(0);
    expect(evaluation.breaches).toEqual([]);
    // load1 may start 60 min after the filling's start: at 120 the filling must start at 60 or later.
    expect(start('load1')).toBe(120);
    expect(start('load2')).toBe(120);
    expect(start('filling')).toBe(60);
    expect(proposal.after.peakKgPerH['main']).toBe(1000);
  });
});

describe('a kettle that is taken off by the filler', () => {
  it('holds its unit until then, so that the next batch waits for it and its cleaning', () => {
    const plan = week({
      horizonMin: 480,
      limitKgPerH: 600,
      units: [unit('K', 'kettle'), unit('F', 'filler'), unit('R', 'retort')],
      cleaning: [
        { unitKind: 'kettle', fromFamilyId: 'a', toFamilyId: 'b', minutes: 15, kind: 'wash', phases: [], uses: [] },
      ],
      activities: [
        activity('vent', { fixing: 'fixed', modes: [mode('R', 30, steady(30, 400))], ...at('R', 60) }),
        activity('cook', {
          stage: 'cook',
          familyId: 'a',
          modes: [mode('K', 30, steady(30, 300))],
          occupiesUntil: { linkId: 'l' },
          ...at('K', 40),
        }),
        activity('fill', { stage: 'fill', familyId: 'a', modes: [mode('F', 20)], ...at('F', 75) }),
        activity('next', { stage: 'cook', familyId: 'b', modes: [mode('K', 30, steady(30, 200))], ...at('K', 90) }),
      ],
      links: [link('l', 'cook', 'fill', 5, 30)],
    });
    const { start, evaluation } = solve(plan);
    expect(evaluation.over.kg).toBe(0);
    expect(evaluation.breaches).toEqual([]);
    // 300 beside 400 is over 600: cooking ends by 60, ten minutes earlier; filling then starts by 90 and need not move.
    expect([start('cook'), start('fill'), start('next')]).toEqual([30, 75, 90]);
  });
});

describe('cleaning that draws steam', () => {
  it('moves with the batch before it', () => {
    const plan = week({
      horizonMin: 480,
      limitKgPerH: 900,
      units: [unit('K', 'kettle'), unit('R', 'retort')],
      cleaning: [
        {
          unitKind: 'kettle',
          fromFamilyId: 'a',
          toFamilyId: 'b',
          minutes: 10,
          kind: 'wash',
          phases: [phase('wash', 0, 10, 694.1)],
          uses: [],
        },
      ],
      activities: [
        activity('vent', { fixing: 'fixed', modes: [mode('R', 60, [phase('vent', 0, 6, 500)])], ...at('R', 105) }),
        activity('first', { stage: 'cook', familyId: 'a', modes: [mode('K', 40)], ...at('K', 60) }),
        activity('second', { stage: 'cook', familyId: 'b', modes: [mode('K', 40)], ...at('K', 200) }),
      ],
    });
    expect(evaluateWeek(plan).over.kg).toBeGreaterThan(0);
    const { start, evaluation } = solve(plan);
    expect(evaluation.over.kg).toBe(0);
    // The wash of 100 to 110 meets the vent of 105 to 111: five minutes earlier or eleven later.
    expect([start('first'), start('second')]).toEqual([55, 200]);
  });
});

describe('a header behind a letdown', () => {
  it('keeps the letdown’s greatest flow and the limit of the header above', () => {
    const low = {
      ...MAIN,
      id: 'low',
      name: 'Low',
      pressureBarG: 2,
      feed: { kind: 'letdown', fromHeaderId: 'main', greatestKgPerH: 500 },
    } as const;
    const none = { exportKgPerH: null, greatestRiseKgPerHPerMin: null, storedKgPerBar: null };
    const plan = week({
      horizonMin: 480,
      headers: [MAIN, low],
      capacities: [
        {
          ...none,
          headerId: 'main',
          limitKgPerH: [{ from: 0, value: 900 }],
          baseLoadKgPerH: [{ from: 0, value: 100 }],
        },
        { ...none, headerId: 'low', limitKgPerH: null, baseLoadKgPerH: [] },
      ],
      units: [
        unit('K1', 'kettle', { headerId: 'low' }),
        unit('K2', 'kettle', { headerId: 'low' }),
        unit('R', 'retort'),
      ],
      activities: [
        activity('vent', { fixing: 'fixed', modes: [mode('R', 20, steady(20, 450))], ...at('R', 100) }),
        activity('one', { stage: 'cook', modes: [mode('K1', 30, steady(30, 300))], ...at('K1', 95), fixing: 'fixed' }),
        activity('two', { stage: 'cook', modes: [mode('K2', 30, steady(30, 300))], ...at('K2', 120) }),
      ],
    });
    const { start, evaluation } = solve(plan);
    // One alone with the vent and the base load draws 850 of 900. Two beside one passes the letdown's 500 until 125.
    expect(start('two')).toBe(125);
    expect(evaluation.breaches.filter((b) => b.class === 'steam')).toEqual([]);
  });
});

describe('a shared limit', () => {
  it('is kept, and the reason for the move names it', () => {
    const use = { limitId: 'hoist', offsetMin: 0, minutes: 8, amount: 1 };
    const plan = week({
      horizonMin: 480,
      limitKgPerH: 5000,
      sharedLimits: [{ id: 'hoist', name: 'Hoist', unit: 'hoists', capacity: [{ from: 0, value: 1 }] }],
      units: [unit('R1', 'retort'), unit('R2', 'retort')],
      activities: [
        activity('a', { fixing: 'fixed', modes: [{ ...mode('R1', 60), uses: [use] }], ...at('R1', 100) }),
        activity('b', { modes: [{ ...mode('R2', 60), uses: [use] }], ...at('R2', 105) }),
      ],
    });
    const { start, evaluation, proposal } = solve(plan);
    expect(start('b')).toBe(108);
    expect(evaluation.breaches).toEqual([]);
    expect(proposal.moves).toEqual([
      {
        activityId: 'b',
        revision: 3,
        from: { unitId: 'R2', start: 105 },
        to: { unitId: 'R2', start: 108 },
        reason: { kind: 'sharedLimit', activityId: 'a', minute: 108 },
      },
    ]);
  });
});

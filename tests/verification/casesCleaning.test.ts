import { describe, expect, it } from 'vitest';
import { phasesKg } from '@/core/demand/activityLoad';
import { workMode } from '@/core/demand/workMode';
import { evaluateWeek } from '@/core/pipeline';
import type { Activity } from '@/core/plant/activity';
import type { CleaningRule } from '@/core/plant/plant';
import { activity, flatMode, phase, plant, unit, week } from '../support/builders';
import { cannery, canneryWeek, KETTLE_PEAK_KG_PER_H, retortLoad } from '../support/workedBatches';
import { blancherA, supply } from './dutyWorkedBatches';
import { valueOf } from './outcome';

function rule(
  fromFamilyId: string,
  toFamilyId: string,
  minutes: number,
  changes: Partial<CleaningRule> = {},
): CleaningRule {
  return { unitKind: 'kettle', fromFamilyId, toFamilyId, minutes, kind: 'wash', phases: [], uses: [], ...changes };
}

function run(id: string, familyId: string, start: number): Activity {
  return activity(id, { familyId, modes: [flatMode('kettle1', 60, 0)], placement: { unitId: 'kettle1', start } });
}

function kettleWeek(cleaning: readonly CleaningRule[], activities: readonly Activity[]) {
  return week({ plant: plant({ units: [unit('kettle1', { kind: 'kettle' })], cleaning }), activities });
}

describe('cleaning between families on one kettle (invented plant)', () => {
  const rules = [
    rule('A', 'B', 15),
    rule('B', 'A', 60),
    rule('A', 'C', 10),
    rule('C', 'A', 20),
    rule('B', 'C', 60),
    rule('C', 'B', 15),
  ];
  const minutesOf = (order: string) => {
    const runs = [...order].map((family, i) => run(`run${i}`, family, i * 120));
    const { cleanings, breaches } = evaluateWeek(kettleWeek(rules, runs));
    expect(breaches).toEqual([]);
    return cleanings.reduce((sum, cleaning) => sum + (cleaning.modes[0]?.minutes ?? 0), 0);
  };

  it('takes 25 minutes in the order A, C, B and 75 in A, B, C', () => {
    expect(minutesOf('ACB')).toBe(25);
    expect(minutesOf('ABC')).toBe(75);
    const all = ['ABC', 'ACB', 'BAC', 'BCA', 'CAB', 'CBA'].map((order) => ({ order, minutes: minutesOf(order) }));
    expect(all.sort((a, b) => a.minutes - b.minutes)[0]).toEqual({ order: 'ACB', minutes: 25 });
  });
});

describe('cleaning draws steam (invented plant)', () => {
  // 115.683 kg of steam heat 1 000 kg of water from 15 to 82 degC; in 10 minutes that is x 6 kg/h.
  const wash = rule('A', 'B', 10, { phases: [phase(0, 10, 115.683 * 6, 'wash')] });
  const runs = [run('a', 'A', 300), run('b', 'B', 400)];
  const judge = (activities: readonly Activity[]) =>
    evaluateWeek(
      canneryWeek([...runs, retortLoad('load1', 'retort1', 360), ...activities], 0, {
        plant: cannery({ cleaning: [wash] }),
      }),
    );

  it('with two blanchers and one vent leaves 67.73 kg/h to spare', () => {
    const { headers, over } = judge([]);
    // 1229.87 + 1555.24 + 694.10
    expect(headers[0]?.peak).toEqual({ kgPerH: expect.closeTo(3479.21, 1), minute: 360 });
    expect(headers[0]?.leastSpare).toEqual({ kgPerH: expect.closeTo(67.73, 1), minute: 360 });
    expect(over.minutes).toBe(0);
  });

  it('with a kettle starting as well is over by 273.20 kg/h at that minute', () => {
    const kettle = activity('kettle', {
      modes: [flatMode('retort4', 1, KETTLE_PEAK_KG_PER_H)],
      placement: { unitId: 'retort4', start: 360 },
    });
    const { breaches } = judge([kettle]);
    expect(breaches).toMatchObject([
      {
        code: 'overLimit',
        from: 360,
        to: 361,
        overKgPerH: expect.closeTo(273.2, 1),
        activityIds: ['load1', 'blanch', 'clean:a', 'kettle'],
      },
    ]);
  });
});

describe('cleanliness is a state since the last full clean (invented plant)', () => {
  const rules = [
    rule('nut', 'plain', 10, { kind: 'rinse' }),
    rule('plain', 'nutFree', 10, { kind: 'rinse' }),
    rule('nut', 'nutFree', 90, { kind: 'allergen' }),
  ];
  const sequence = (nutFreeStart: number) => [
    run('first', 'nut', 0),
    run('second', 'plain', 70),
    run('third', 'nutFree', nutFreeStart),
  ];

  it('refuses allergen, short rinse, plain, short rinse, "free from"', () => {
    expect(evaluateWeek(kettleWeek(rules, sequence(140))).breaches).toMatchObject([
      {
        class: 'process',
        code: 'allergenCleaning',
        found: 10,
        limit: 90,
        activityIds: ['third', 'second', 'clean:second'],
      },
    ]);
  });

  it('takes it with the allergen clean between, and asks for none a second time', () => {
    const again = [...sequence(220), run('fourth', 'plain', 280), run('fifth', 'nutFree', 350)];
    const { breaches, cleanings } = evaluateWeek(kettleWeek(rules, again));
    expect(breaches).toEqual([]);
    expect(cleanings.map(({ id, modes }) => [id, modes[0]?.minutes])).toEqual([
      ['clean:first', 10],
      ['clean:second', 90],
      ['clean:fourth', 10],
    ]);
  });
});

describe('a blancher between two runs (invented plant)', () => {
  // Worked batch A: idling 75.005 kg/h, warming up again 37.949 kg in 15 min: even at 30.4 min.
  const mode = valueOf(
    workMode({
      unitId: 'unit1',
      dutyId: 'carrots',
      duty: { model: 'steamBlancher', inputs: { ...blancherA, runMin: 60 } },
      supply,
      leadMin: 0,
      afterMin: 0,
      minutes: 0,
      uses: [],
    }),
  );
  const runs = (gapMin: number) =>
    week({
      activities: [
        activity('first', { modes: [mode], placement: { unitId: 'unit1', start: 300 } }),
        activity('second', { modes: [mode], placement: { unitId: 'unit1', start: 360 + gapMin } }),
      ],
    });
  const drawsBefore = (gapMin: number) =>
    evaluateWeek(runs(gapMin))
      .gapDraws.filter(({ runId }) => runId === 'second')
      .map(({ activity: one }) => [one.kind, one.placement?.start, phasesKg(one.modes[0]?.phases ?? [])]);

  it('idles through 25 minutes with 31.25 kg, and no warm-up is charged', () => {
    expect(drawsBefore(25)).toEqual([['idle', 360, expect.closeTo(31.25, 2)]]);
    const runKg = 2 * phasesKg(mode.phases);
    // The first run of the week is warmed up before it.
    expect(evaluateWeek(runs(25)).headers[0]?.steamKg).toBeCloseTo(37.949 + runKg + 31.252, 2);
  });

  it('idles up to the break-even of 30.4 minutes and warms up again after a longer gap', () => {
    expect(drawsBefore(30)).toEqual([['idle', 360, expect.closeTo(37.5, 1)]]);
    expect(drawsBefore(31)).toEqual([['warmUp', 376, expect.closeTo(37.949, 2)]]);
    expect(drawsBefore(0)).toEqual([]);
  });
});

import { describe, expect, it } from 'vitest';
import { evaluateWeek } from '@/core/pipeline';
import type { Activity } from '@/core/plant/activity';
import type { CleaningRule } from '@/core/plant/plant';
import { activity, flatMode, phase, plant, unit, week } from '../support/builders';
import { cannery, canneryWeek, KETTLE_PEAK_KG_PER_H, retortLoad } from '../support/workedBatches';

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

describe('idling over a gap (invented plant)', () => {
  it('25 minutes of idling draw 31.25 kg, less than re-warming with 37.949', () => {
    const idle = activity('gap', {
      kind: 'idle',
      modes: [{ unitId: 'unit1', minutes: 25, phases: [phase(0, 25, 75.0049, 'idle')], uses: [], dutyId: null }],
    });
    const steamKg = evaluateWeek(week({ activities: [idle] })).headers[0]?.steamKg;
    expect(steamKg).toBeCloseTo(31.25, 2);
  });
});

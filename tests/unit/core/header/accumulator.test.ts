import { describe, expect, it } from 'vitest';
import { accumulatorBetween, accumulatorFigures, placedAccumulators } from '@/core/header/accumulator';
import { NOT_JUDGED_KG_PER_H } from '@/core/header/capacity';
import { headerSteam } from '@/core/header/headerSteam';
import { evaluateWeek } from '@/core/pipeline';
import type { Accumulator, HeaderCapacity } from '@/core/plant/plant';
import { activity, capacity, flatMode, header, plant, unit, week } from '../../../support/builders';
import { expectRelative, failureOf, valueOf } from '../../../verification/steamSupport';

const vessel: Accumulator = {
  id: 'acc',
  name: 'Accumulator',
  chargedFromHeaderId: 'main',
  feedsHeaderId: 'low',
  waterTonnes: 5,
  highBarG: 10,
  lowBarG: 5,
  greatestChargeKgPerH: 600,
  greatestDischargeKgPerH: 900,
  shareAtWeekStart: 0.5,
};
const steam = (dryness: number) => valueOf(headerSteam({ pressureBarG: 10, dryness, superheatK: null }, 1.01325));

describe('what an accumulator holds', () => {
  // 0.052426 of the water from 10 to 5 bar g; h_f 732.39995, h_g 2770.82327 at 7.5 bar g (python3-iapws 1.5.3).
  const figures = valueOf(accumulatorFigures(vessel, steam(1), 1.01325));

  it('is the steam between its two pressures', () => {
    expectRelative(figures.capacityKg, 262.13, 1e-5);
  });

  it('is charged by the heat of the steam, wet steam more of it', () => {
    expectRelative(figures.chargePerKg, 0.99517274, 1e-7);
    expect(valueOf(accumulatorFigures(vessel, steam(0.97), 1.01325)).chargePerKg).toBeGreaterThan(1.02);
  });

  it('keeps heat and mass: charged steam is steam to give up, and water', () => {
    for (const dryness of [0.9, 0.97, 1]) {
      const { chargePerKg, dischargedH, waterH } = valueOf(accumulatorFigures(vessel, steam(dryness), 1.01325));
      const given = 1 / chargePerKg;
      expectRelative(given * dischargedH + (1 - given) * waterH, steam(dryness).h, 1e-12);
    }
  });

  it('refuses what cannot be, at its field', () => {
    const of = (changes: Partial<Accumulator>) =>
      failureOf(accumulatorFigures({ ...vessel, ...changes }, steam(1), 1.01325));
    expect(of({ lowBarG: 10 })).toMatchObject({ code: 'DUTY-ORDER', field: 'lowBarG' });
    expect(of({ waterTonnes: -1 })).toMatchObject({ code: 'DUTY-RANGE', field: 'waterTonnes' });
    expect(of({ shareAtWeekStart: 1.2 })).toMatchObject({ code: 'DUTY-RANGE', field: 'shareAtWeekStart' });
    expect(placedAccumulators(plant({ accumulators: [{ ...vessel, lowBarG: 11 }] }))).toEqual([]);
  });
});

describe('an accumulator between two headers', () => {
  const between = (fromBarG: number, intoBarG: number) =>
    accumulatorBetween(
      vessel,
      header('main', { pressureBarG: fromBarG }),
      header('low', { pressureBarG: intoBarG }),
      1.01325,
    );

  it('is charged no higher than the one and discharged no lower than the other', () => {
    expect(between(10, 5).ok).toBe(true);
    expect(failureOf(between(9.5, 4))).toMatchObject({ code: 'DUTY-ORDER', field: 'highBarG' });
    expect(failureOf(between(10, 5.5))).toMatchObject({ code: 'DUTY-ORDER', field: 'lowBarG' });
  });

  it('carries nothing where it does not fit', () => {
    const unfit = { ...works, headers: works.headers.map((one) => ({ ...one, pressureBarG: 8 })) };
    const [main] = evaluateWeek(week({ plant: unfit, capacities: [capacity('main', 1000)] })).headers;
    expect(main?.carried).toBeNull();
  });
});

const works = plant({
  headers: [
    header('main', { pressureBarG: 10, dryness: 1 }),
    header('low', { pressureBarG: 4, feed: { kind: 'letdown', fromHeaderId: 'main', greatestKgPerH: 800 } }),
  ],
  units: [unit('kettle'), unit('vent', { headerId: 'low' })],
  accumulators: [vessel],
});
const draw = (id: string, unitId: string, start: number, minutes: number, kgPerH: number) =>
  activity(id, { modes: [flatMode(unitId, minutes, kgPerH)], placement: { unitId, start } });
const judged = (main: HeaderCapacity, ...activities: ReturnType<typeof draw>[]) =>
  evaluateWeek(week({ plant: works, capacities: [main], activities })).headers;
const at = (values: ArrayLike<number> | undefined, minute: number) => values?.[minute] ?? NaN;

describe('charging', () => {
  it('takes what is to spare under the limit, up to its greatest charge and its room', () => {
    const [main, low] = judged(capacity('main', 1000), draw('a', 'kettle', 0, 5, 700));
    expect(at(main?.carried?.chargeKgPerH, 0)).toBeCloseTo(300, 9);
    expect(at(main?.loadKgPerH, 0)).toBeCloseTo(1000, 9);
    expect(at(main?.carried?.chargeKgPerH, 6)).toBeCloseTo(600, 9);
    expect(at(low?.carried?.chargeKgPerH, 6)).toBe(0);
    const full = main?.carried;
    expect(at(full?.storeKg, 0)).toBeCloseTo((full?.capacityKg ?? 0) / 2, 9);
    expect(at(full?.storeKg, 60)).toBeCloseTo(full?.capacityKg ?? 0, 9);
    expect(at(full?.chargeKgPerH, 60)).toBeCloseTo(0, 9);
  });

  it('rises no faster than the boilers, so that it makes no step', () => {
    const slow = capacity('main', 1000, {
      greatestRiseKgPerHPerMin: [{ from: 0, value: 100 }],
      storedKgPerBar: [{ from: 0, value: 20 }],
    });
    const [main] = judged(slow);
    expect([0, 1, 2, 5, 7].map((t) => Math.round(at(main?.carried?.chargeKgPerH, t)))).toEqual([
      100, 200, 300, 600, 600,
    ]);
    expect(main?.steps).toEqual([]);
  });

  it('waits where no limit is known', () => {
    const [main] = judged(capacity('main', null));
    expect(main?.carried?.chargeKgPerH.every((value) => value === 0)).toBe(true);
    const [later] = judged(
      capacity('main', null, {
        limitKgPerH: [
          { from: 0, value: NOT_JUDGED_KG_PER_H },
          { from: 9, value: 700 },
        ],
      }),
    );
    expect([8, 9].map((t) => at(later?.carried?.chargeKgPerH, t))).toEqual([0, 600]);
  });
});

describe('discharging', () => {
  it('covers what the boilers cannot send, as far as the lower header draws it', () => {
    const [main, low] = judged(capacity('main', 1000), draw('a', 'kettle', 0, 5, 1200), draw('b', 'vent', 0, 5, 100));
    expect(at(main?.carried?.dischargeKgPerH, 0)).toBeCloseTo(100, 9);
    expect(at(low?.loadKgPerH, 0)).toBe(0);
    expect(at(main?.loadKgPerH, 0)).toBeCloseTo(1200, 9);
    expect(main?.over?.peakOverKgPerH).toBeCloseTo(200, 9);
  });

  it('covers what the letdown cannot pass, up to the greatest discharge', () => {
    const [main, low] = judged(capacity('main', 5000), draw('b', 'vent', 10, 4, 1800));
    expect(low?.letdown).toMatchObject({ minutes: 4 });
    expect(low?.letdown?.peakOverKgPerH).toBeCloseTo(100, 9);
    expect(at(main?.loadKgPerH, 10)).toBeCloseTo(900, 9);
    expect(at(main?.drawnKgPerH, 10)).toBe(1800);
  });
});

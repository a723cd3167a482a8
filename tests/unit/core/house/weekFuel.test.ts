import { describe, expect, it } from 'vitest';
import { weekFuel, type FuelBoiler } from '@/core/house/weekFuel';
import { failureOf, valueOf } from '../../../verification/steamSupport';

/** Worked boiler (invented plant): net 3546.94 kg/h, 2526.49 kW into the water, fuel 3081.08 kW, 557.82 kg CO2/h. */
const boiler = (changes: Partial<FuelBoiler> = {}): FuelBoiler => ({
  id: 'one',
  name: 'Boiler 1',
  netKgPerH: 3_546.94,
  heatToWaterKW: 2_526.49,
  efficiency: 0.82,
  fuel: 'naturalGasUs',
  readyShare: [{ from: 0, value: 1 }],
  ...changes,
});
const steady = (kgPerH: number, minutes = 600) => new Float64Array(minutes).fill(kgPerH);

describe('fuel of a week', () => {
  it('is that of the boiler at full export for a load at full export', () => {
    const week = valueOf(weekFuel(steady(3_546.94), [boiler()], 0.04));
    expect(week.steamKg).toBeCloseTo(35_469.4, 6);
    expect(week.heatToWaterKWh).toBeCloseTo(25_264.9, 6);
    expect(week.fuelKWh).toBeCloseTo(30_810.8, 0);
    expect(week.co2Kg).toBeCloseTo(5_578.2, 0);
    expect(week.cost).toBeCloseTo(week.fuelKWh * 0.04, 9);
    expect(week.unverified).toEqual([]);
  });

  it('takes feed tank and blowdown in proportion at part load', () => {
    const half = valueOf(weekFuel(steady(3_546.94 / 2), [boiler()], null));
    expect(half.heatToWaterKWh).toBeCloseTo(25_264.9 / 2, 6);
    expect(half.cost).toBeNull();
  });

  it('is shared by what each boiler in fire can send, and fires for nothing while all are out', () => {
    const pair = [
      boiler(),
      boiler({ id: 'two', efficiency: 0.9, fuel: 'naturalGasIpcc', readyShare: [{ from: 300, value: 0.5 }] }),
    ];
    const week = valueOf(weekFuel(steady(3_000), pair, null));
    // 15 t by the first alone, then 15 t shared 2 to 1.
    const perKg = 2_526.49 / 3_546.94;
    expect(week.fuelKWh).toBeCloseTo((perKg * 25_000) / 0.82 + (perKg * 5_000) / 0.9, 6);
    expect(week.unverified).toEqual(['Natural gas, net heating value']);
    const late = valueOf(weekFuel(steady(3_000), [boiler({ readyShare: [{ from: 400, value: 1 }] })], null));
    expect([late.steamKg, late.withoutFireKg]).toEqual([expect.closeTo(10_000, 6), expect.closeTo(20_000, 6)]);
  });

  it('shows how each figure came about, the factor with its source', () => {
    const { working } = valueOf(weekFuel(steady(1_000), [boiler()], 0.05));
    expect(working.steps.map(({ symbol }) => symbol)).toEqual(['Q', 'q', 'q_fuel', 'ṁ_CO2', 'K']);
    expect(working.steps.find(({ symbol }) => symbol === 'ṁ_CO2')?.source).toBe('53.06 kg/MMBtu: 40 CFR 98, Table C-1');
    expect(working.totals.map(({ name }) => name)).toEqual(['Steam of the week', 'Fuel', 'Carbon dioxide']);
  });

  it('refuses an efficiency that no boiler has', () => {
    expect(failureOf(weekFuel(steady(1_000), [boiler({ efficiency: 1.2 })], null))).toMatchObject({
      code: 'DUTY-RANGE',
      field: 'efficiency',
    });
  });
});

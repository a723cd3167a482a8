import { describe, expect, it } from 'vitest';
import { blowdown, BLOWDOWN_DEFAULTS, BLOWDOWN_RANGES, type BlowdownInput } from '@/core/duty/blowdown';
import { boilerExport, type BoilerHouseInputs } from '@/core/duty/boilerExport';
import { EMISSION_FACTORS, fuelFor } from '@/core/duty/fuel';
import { STANDARD_ATMOSPHERE } from '@/core/quantity/pressure';
import { barAbsolute } from '@/core/quantity/units';
import { steamTemperature, waterTemperature } from '@/core/steam/fluid';
import { supply } from '../../../verification/dutyWorkedBatches';
import { failureOf, valueOf } from '../../../verification/steamSupport';

const water: BlowdownInput = {
  steamKgPerH: 4000,
  feedSolidsPpm: 150,
  boilerSolidsPpm: 3000,
  boilerPressureBarG: 10,
  makeUpC: 15,
};

describe('blowdown', () => {
  it.each(Object.entries(BLOWDOWN_RANGES))('refuses %s out of its range', (field, { min, max }) => {
    for (const value of [min - 1, max + 1, Number.NaN]) {
      expect(failureOf(blowdown({ ...water, [field]: value }, supply))).toMatchObject({ code: 'DUTY-RANGE', field });
    }
  });

  it('refuses a feed as salty as the boiler may be', () => {
    const salty = failureOf(blowdown({ ...water, feedSolidsPpm: 3000 }, supply));
    expect(salty).toMatchObject({ code: 'DUTY-ORDER', field: 'boilerSolidsPpm' });
  });

  it('is nothing from pure water, and opens to its working', () => {
    const none = valueOf(blowdown({ ...water, feedSolidsPpm: 0 }, supply));
    expect(none).toMatchObject({ blowdownKgPerH: 0, feedKgPerH: 4000, heatLostKW: 0 });
    expect(none.working.steps.map(({ symbol }) => symbol)).toEqual(['ṁ_b', 'q_b']);
  });

  it('starts a form from figures that work', () => {
    expect(blowdown({ ...water, ...BLOWDOWN_DEFAULTS.values }, supply).ok).toBe(true);
  });
});

describe('feed tank vent', () => {
  const house: BoilerHouseInputs = {
    ratingFromAndAtKgPerH: 4000,
    boilerPressureBarG: 10,
    feedTankPressureBarG: 0.2,
    blowdownFraction: 0.05,
    condensateReturnFraction: 0.6,
    condensateC: 90,
    makeUpC: 15,
  };

  it('changes nothing when it is left out or closed', () => {
    expect(boilerExport({ ...house, feedTankVentFraction: 0 }, supply)).toEqual(boilerExport(house, supply));
  });

  it('takes from what is sent out', () => {
    const vented = valueOf(boilerExport({ ...house, feedTankVentFraction: 0.001 }, supply));
    expect(vented.netKgPerH).toBeLessThan(valueOf(boilerExport(house, supply)).netKgPerH);
  });

  it.each([-0.001, 0.06, Number.NaN])('refuses a share of %d', (feedTankVentFraction) => {
    const refused = failureOf(boilerExport({ ...house, feedTankVentFraction }, supply));
    expect(refused).toMatchObject({ code: 'DUTY-RANGE', field: 'feedTankVentFraction' });
  });
});

describe('fuel', () => {
  it.each([
    [{ heatToWaterKW: -1, efficiency: 0.8 }, 'heatToWaterKW'],
    [{ heatToWaterKW: 1000, efficiency: 0.4 }, 'efficiency'],
    [{ heatToWaterKW: 1000, efficiency: 1.1 }, 'efficiency'],
  ])('refuses %o', (input, field) => {
    expect(failureOf(fuelFor(input, EMISSION_FACTORS.naturalGasUs))).toMatchObject({ code: 'DUTY-RANGE', field });
  });

  it('says which heating value it counts in, and where the factor is from', () => {
    const { working } = valueOf(fuelFor({ heatToWaterKW: 1000, efficiency: 0.8 }, EMISSION_FACTORS.naturalGasUs));
    expect(working.steps[0]?.name).toContain('gross');
    expect(working.steps[1]?.source).toContain('40 CFR 98');
  });
});

describe('temperature from enthalpy', () => {
  it('refuses water that would boil or freeze, steam that would condense, and pressures off the map', () => {
    expect(failureOf(waterTemperature(STANDARD_ATMOSPHERE, 420)).code).toBe('STEAM-RANGE');
    expect(failureOf(waterTemperature(STANDARD_ATMOSPHERE, -1)).code).toBe('STEAM-RANGE');
    expect(failureOf(waterTemperature(barAbsolute(1001), 420)).code).toBe('STEAM-RANGE');
    expect(failureOf(waterTemperature(barAbsolute(Number.NaN), 420)).code).toBe('STEAM-RANGE');
    expect(failureOf(steamTemperature(STANDARD_ATMOSPHERE, 2600)).code).toBe('STEAM-RANGE');
    expect(failureOf(steamTemperature(STANDARD_ATMOSPHERE, 4200)).code).toBe('STEAM-RANGE');
    expect(failureOf(steamTemperature(STANDARD_ATMOSPHERE, Number.NaN)).code).toBe('STEAM-RANGE');
  });

  it('takes the ends of the range', () => {
    expect(valueOf(waterTemperature(STANDARD_ATMOSPHERE, 418.9907))).toBeCloseTo(99.9743, 3);
    expect(valueOf(steamTemperature(STANDARD_ATMOSPHERE, 2675.54))).toBeCloseTo(99.9743, 1);
  });
});

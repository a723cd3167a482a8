/** From-and-at rating to net export: factors, published evaporations, worked boiler chain (invented plant). */
import { describe, expect, it } from 'vitest';
import { boilerExport, fromAndAtFactor, type BoilerHouseInputs } from '@/core/duty/boilerExport';
import { toAbsolute } from '@/core/quantity/pressure';
import { barAbsolute, barGauge } from '@/core/quantity/units';
import { supply } from './dutyWorkedBatches';
import { expectPrinted, expectRelative, valueOf } from './steamSupport';

const FEED_C = [15, 40, 60, 80, 85, 90, 100, 105];
/** bar g; factor at each feed temperature. Computed with an independent implementation of IAPWS-IF97. */
const FACTORS = [
  ['6', '0.83601', '0.86968', '0.89863', '0.92963', '0.93773', '0.94599', '0.96298', '0.97173'],
  ['7', '0.83433', '0.86786', '0.89668', '0.92754', '0.93561', '0.94383', '0.96074', '0.96945'],
  ['8', '0.83290', '0.86631', '0.89503', '0.92577', '0.93381', '0.94200', '0.95884', '0.96752'],
  ['10', '0.83063', '0.86385', '0.89239', '0.92295', '0.93094', '0.93907', '0.95581', '0.96443'],
  ['12', '0.82891', '0.86199', '0.89040', '0.92082', '0.92877', '0.93687', '0.95352', '0.96210'],
  ['16', '0.82659', '0.85947', '0.88771', '0.91793', '0.92583', '0.93387', '0.95042', '0.95894'],
];

describe('factor from and at 100 degC', () => {
  it.each(FACTORS)('%s bar g', (barG, ...printed) => {
    const pressure = toAbsolute(barGauge(Number(barG)));
    expectPrinted(
      FEED_C.map((feedC) => valueOf(fromAndAtFactor(pressure, feedC))),
      printed,
    );
  });

  /** Energy tip of a boiler house supplier: 10 t/h, 6 bar g by its 660 kcal/kg; old round figures, so 0.3 %. */
  it.each([
    [40, 8.71],
    [100, 9.64],
  ])('10 t/h with feed at %d degC evaporates %d t/h', (feedC, tonnes) => {
    expectRelative(10 * valueOf(fromAndAtFactor(toAbsolute(barGauge(6)), feedC)), tonnes, 0.003);
  });

  /** Factor-of-evaporation table: degF, psig, lb/h per boiler horsepower (34.5 lb/h from and at 212 degF). */
  it.each([
    [100, 10, 30.6],
    [100, 0, 30.9],
    [100, 100, 29.8],
    [60, 100, 28.8],
    [60, 150, 28.6],
    [120, 100, 30.4],
    [130, 200, 30.4],
    [140, 20, 31.6],
  ])('boiler horsepower, feed %d degF, %d psig', (feedF, psig, lbPerH) => {
    const pressure = barAbsolute((psig + 14.696) * 0.0689476);
    const factor = valueOf(fromAndAtFactor(pressure, (feedF - 32) / 1.8));
    expect(Math.abs(34.5 * factor - lbPerH)).toBeLessThan(0.1);
  });
});

const house: BoilerHouseInputs = {
  ratingFromAndAtKgPerH: 4000,
  boilerPressureBarG: 10,
  feedTankPressureBarG: 0.2,
  blowdownFraction: 0.05,
  condensateReturnFraction: 0.6,
  condensateC: 90,
  makeUpC: 15,
};

describe('worked boiler chain', () => {
  it('with 60 % condensate back exports 3546.94 kg/h', () => {
    const out = valueOf(boilerExport(house, supply));
    expectPrinted(
      [out.grossKgPerH, out.feedKgPerH, out.feedTankSteamKgPerH, out.netKgPerH, out.heatToWaterKW],
      ['3857.217', '4060.228', '310.277', '3546.94', '2526.49'],
    );
    const named = Object.fromEntries(out.working.steps.map(({ symbol, value }) => [symbol, value]));
    expectPrinted([named['f'] ?? Number.NaN, named['h_mix'] ?? Number.NaN], ['0.964304', '251.427']);
  });

  it('with 20 % condensate back exports 3365.95 kg/h', () => {
    const out = valueOf(boilerExport({ ...house, condensateReturnFraction: 0.2 }, supply));
    expectPrinted([out.feedTankSteamKgPerH, out.netKgPerH], ['491.27', '3365.95']);
    const mix = out.working.steps.find(({ symbol }) => symbol === 'h_mix');
    expectPrinted([mix?.value ?? Number.NaN], ['125.86']);
  });

  it('5000 kg/h of feed takes 7.64186 % in a deaerator at 0.2 bar g', () => {
    const out = valueOf(boilerExport(house, supply));
    expectPrinted([(100 * out.feedTankSteamKgPerH) / out.feedKgPerH], ['7.64186']);
  });
});

/** Steam stored in hot water, and steam through openings, against listed and published figures. */
import { describe, it } from 'vitest';
import { ambientAtAltitude, STANDARD_ATMOSPHERE, toAbsolute, toGauge } from '@/core/quantity/pressure';
import { barAbsolute, barGauge, celsius, type BarAbsolute } from '@/core/quantity/units';
import { accumulatorReleaseKg, storedSteamKgPerBar } from '@/core/steam/flash';
import { boreAreaMm2, openingAt, openingFlowKgPerH } from '@/core/steam/opening';
import { saturationAtPressure, saturationAtTemperature } from '@/core/steam/saturation';
import { expectPrinted, expectRelative, valueOf } from './steamSupport';

/** kg/h to the standard atmosphere. */
const flow = (inside: BarAbsolute, areaMm2: number, discharge = 1) =>
  openingFlowKgPerH(valueOf(openingAt(inside, STANDARD_ATMOSPHERE, areaMm2, discharge)));

const absolute = (barG: number) => toAbsolute(barGauge(barG));

/** Figures computed with an independent implementation of IAPWS-IF97. */
describe('steam stored in boiler water', () => {
  it.each([
    [5, '13.49'],
    [7, '11.03'],
    [8, '10.17'],
    [10, '8.876'],
    [12, '7.948'],
  ])('at %d bar g: %s kg per bar and tonne', (barG, printed) => {
    expectPrinted([valueOf(storedSteamKgPerBar(absolute(barG), 1000))], [printed]);
  });

  it.each([
    [16, 8, '0.062768'],
    [12, 6, '0.056222'],
    [10, 7, '0.029113'],
    [10, 6, '0.040254'],
    [10, 5, '0.052426'],
    [10, 4, '0.065956'],
    [10, 3, '0.081365'],
    [8, 4, '0.048073'],
    [7, 3, '0.053818'],
  ])('falling from %d to %d bar g gives off %s of it', (from, to, printed) => {
    expectPrinted([valueOf(accumulatorReleaseKg(absolute(from), absolute(to), 1))], [printed]);
  });

  it('8 t from 10 to 7 bar g give off 232.906 kg: 9.3163 min of 1500 kg/h', () => {
    const kg = valueOf(accumulatorReleaseKg(absolute(10), absolute(7), 8000));
    expectPrinted([kg, (60 * kg) / 1500], ['232.906', '9.3163']);
  });
});

describe('flow through openings', () => {
  it.each([
    [2, '1.5824'],
    [3, '2.1076'],
    [5, '3.1579'],
    [7, '4.2082'],
    [8, '4.7333'],
    [10, '5.7837'],
    [16, '8.9346'],
  ])('Napier at %d bar g: %s kg/h per mm2', (barG, printed) => {
    expectPrinted([flow(absolute(barG), 1)], [printed]);
  });

  it('is within 1.3 % of an ideal nozzle from 5 to 10 bar g', () => {
    for (const [barG, ideal] of [
      [5, 3.1681],
      [7, 4.1891],
      [8, 4.6976],
      [10, 5.7115],
    ] as const) {
      expectRelative(flow(absolute(barG), 1), ideal, 0.013);
    }
  });

  it('1/8 in bleeder at 121.1 degC: 8.5521 kg/h', () => {
    const inside = valueOf(saturationAtTemperature(celsius(121.1))).pressure;
    expectRelative(flow(inside, boreAreaMm2(3.175)), 8.5521, 2e-5);
  });

  /** US DOE Steam Tip 1: inches, psig, lb/h; the table is Napier with a coefficient of 0.728. */
  it.each([
    [1 / 8, 150, 75.8],
    [1 / 16, 15, 3.4],
    [1 / 16, 100, 13.2],
    [1 / 32, 15, 0.85],
    [1 / 32, 100, 3.3],
    [1 / 32, 150, 4.8],
  ])('trap orifice of %d in at %d psig', (inches, psig, lbPerH) => {
    const kgPerH = flow(barAbsolute((psig + 14.7) * 0.0689476), boreAreaMm2(inches * 25.4), 0.728);
    expectRelative(kgPerH / 0.45359237, lbPerH, 0.016);
  });

  it('a vent at 0.15 bar g passes Cd A sqrt(2 rho dp), not Napier', () => {
    const inside = absolute(0.15);
    const rho = 1 / valueOf(saturationAtPressure(inside)).vg;
    expectPrinted([rho], ['0.679990']);
    const areaMm2 = 4 * boreAreaMm2(26.645);
    expectPrinted([areaMm2, flow(inside, areaMm2, 0.6) / 3600], ['2230.39', '0.191137']);
  });
});

describe('altitude', () => {
  it('takes 1500 m to 0.8456 bar a (ICAO standard atmosphere table)', () => {
    expectPrinted([valueOf(ambientAtAltitude(0)), valueOf(ambientAtAltitude(1500))], ['1.01325', '0.8456']);
  });

  it('makes 121.1 degC read 1.212 bar g at 0.845 bar a, 1.044 at sea level', () => {
    const inside = valueOf(saturationAtTemperature(celsius(121.1))).pressure;
    expectPrinted([toGauge(inside, barAbsolute(0.845)), toGauge(inside)], ['1.212', '1.044']);
  });
});

import { describe, expect, it } from 'vitest';
import { boilerExport } from '@/core/duty/boilerExport';
import { steamOfPhases, type SteamSupply } from '@/core/duty/duty';
import { jacketedKettle } from '@/core/duty/jacketedKettle';
import { steamBlancher } from '@/core/duty/steamBlancher';
import { stillRetort } from '@/core/duty/stillRetort';
import { headerSteam } from '@/core/header/headerSteam';
import { toGauge } from '@/core/quantity/pressure';
import { barAbsolute, celsius } from '@/core/quantity/units';
import { saturationAtTemperature } from '@/core/steam/saturation';
import { blancherA, kettleB, retortC } from './dutyWorkedBatches';
import { expectRelative, valueOf } from './steamSupport';

/**
 * Worked batches A, B, C and their boiler (invented plant) taken to 0.845 bar a, about 1 500 m: gauges read the same,
 * all of them stand on the plant's own air. Expected figures by python3-iapws 1.5.3 and the formulas of each duty.
 */
const AMBIENT = barAbsolute(0.845);
const header = valueOf(headerSteam({ pressureBarG: 7, dryness: 0.98, superheatK: null }, AMBIENT));
const supply: SteamSupply = { header, ambient: AMBIENT };
const TOLERANCE = 1e-6;

describe('at 0.845 bar a of air', () => {
  it('121.1 degC reads 1.212 bar g, not 1.044', () => {
    const { pressure } = valueOf(saturationAtTemperature(celsius(121.1)));
    expect(toGauge(pressure, AMBIENT)).toBeCloseTo(1.212, 3);
    expect(toGauge(pressure)).toBeCloseTo(1.044, 3);
  });

  it('a header of 7 bar g is colder', () => {
    expectRelative(header.temperature, 169.603914764, 1e-8);
    expectRelative(header.h, 2726.49968209, 1e-8);
  });

  it('a boiler’s chain stands on it from feed tank to header', () => {
    const chain = valueOf(
      boilerExport(
        {
          ratingFromAndAtKgPerH: 4000,
          boilerPressureBarG: 10,
          feedTankPressureBarG: 0.2,
          blowdownFraction: 0.05,
          condensateReturnFraction: 0.6,
          condensateC: 90,
          makeUpC: 15,
        },
        supply,
      ),
    );
    expectRelative(chain.grossKgPerH, 3828.70109176, TOLERANCE);
    expectRelative(chain.feedTankSteamKgPerH, 278.803067661, TOLERANCE);
    expectRelative(chain.netKgPerH, 3549.8980241, TOLERANCE);
  });

  it('a retort’s vent blows against thinner air: 1507.10 instead of 1555.24 kg/h', () => {
    const vent = valueOf(stillRetort(retortC, supply)).phases.filter(({ kind }) => kind === 'vent');
    // 83.0800 kg condensed, 3.6684 in the void, 63.9614 out of the vents.
    expectRelative(10 * steamOfPhases(vent), 1507.09746, 1e-5);
  });

  it('a kettle’s jacket is colder, and its peak lower: 335.08 instead of 340.94 kg/h', () => {
    const { working } = valueOf(jacketedKettle(kettleB, supply));
    const peak = working.steps.find(({ symbol }) => symbol === 'ṁ_0')?.value ?? NaN;
    expectRelative(peak, 335.083669, 1e-5);
  });

  it('a blancher takes a little more', () => {
    const run = valueOf(steamBlancher(blancherA, supply)).phases.find(({ kind }) => kind === 'run');
    expectRelative(run?.steamKgPerH ?? NaN, 615.179777, 1e-5);
  });
});

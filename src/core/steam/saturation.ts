/** Saturated water and steam: IAPWS R7-97(2012), regions 1 and 2 on the line of region 4. */
import { toBar, toMegapascal } from '../quantity/pressure';
import { checkRange, type Range } from '../quantity/range';
import {
  toCelsius,
  toKelvin,
  type BarAbsolute,
  type Celsius,
  type Kelvin,
  type MegapascalAbs,
} from '../quantity/units';
import { fail, ok, type Result } from '../result';
import { LIQUID_TEMPERATURE, STEAM_RANGE } from './fluid';
import { region1 } from './region1';
import { region2 } from './region2';
import { saturationPressure, saturationTemperature } from './region4';

/** Both phases at saturation; h in kJ/kg, v in m3/kg; f liquid, g vapour, fg the difference. */
export interface Saturation {
  readonly pressure: BarAbsolute;
  readonly temperature: Celsius;
  readonly hf: number;
  readonly hfg: number;
  readonly hg: number;
  readonly vf: number;
  readonly vg: number;
}

/** psat at 0 and 350 degC, rounded inwards. */
const PRESSURE: Range = { name: 'Saturation pressure', unit: 'bar a', min: 0.00611213, max: 165.29 };

function bothPhases(p: MegapascalAbs, t: Kelvin): Saturation {
  const liquid = region1(p, t);
  const vapour = region2(p, t);
  return {
    pressure: toBar(p),
    temperature: toCelsius(t),
    hf: liquid.h,
    hfg: vapour.h - liquid.h,
    hg: vapour.h,
    vf: liquid.v,
    vg: vapour.v,
  };
}

/** @returns the saturated phases, or STEAM-RANGE outside 0.00611213 to 165.29 bar a. */
export function saturationAtPressure(pressure: BarAbsolute): Result<Saturation> {
  const bad = checkRange(STEAM_RANGE, PRESSURE, pressure, 'pressure');
  if (bad) return fail(bad);
  const p = toMegapascal(pressure);
  return ok(bothPhases(p, saturationTemperature(p)));
}

/** @returns the saturated phases, or STEAM-RANGE outside 0 to 350 degC. */
export function saturationAtTemperature(temperature: Celsius): Result<Saturation> {
  const bad = checkRange(STEAM_RANGE, LIQUID_TEMPERATURE, temperature, 'temperature');
  if (bad) return fail(bad);
  const t = toKelvin(temperature);
  return ok(bothPhases(saturationPressure(t), t));
}

/** Water and steam with the region checked: the doors to IAPWS-IF97 regions 1 and 2. */
import { toBar, toMegapascal, STANDARD_ATMOSPHERE } from '../quantity/pressure';
import { checkRange, type Range } from '../quantity/range';
import { barAbsolute, toKelvin, type BarAbsolute, type Celsius, type Kelvin } from '../quantity/units';
import { fail, ok, type Result } from '../result';
import type { FluidProperties } from './gibbs';
import { region1 } from './region1';
import { boundary23, region2 } from './region2';
import { saturationPressure } from './region4';

export const STEAM_RANGE = 'STEAM-RANGE';

/** Region 1 ends, and saturated states by regions 1 and 2 end, at 623.15 K. */
export const LIQUID_TEMPERATURE: Range = { name: 'Water temperature', unit: '°C', min: 0, max: 350 };
const STEAM_TEMPERATURE: Range = { name: 'Steam temperature', unit: '°C', min: 0, max: 800 };
/** A saturated state is accepted on both sides of the line: rounding must not refuse it. */
const ROUNDING = 1e-9;

/** Greatest pressure of region 2 at a temperature [bar a]. */
function steamPressureLimit(t: Kelvin): number {
  if (t <= 623.15) return toBar(saturationPressure(t));
  return t < 863.15 ? boundary23(t) * 10 : 1000;
}

/**
 * Liquid water, region 1.
 * @returns STEAM-RANGE outside 0 to 350 degC, or from saturation pressure to 1000 bar a.
 */
export function waterAt(p: BarAbsolute, t: Celsius): Result<FluidProperties> {
  const badT = checkRange(STEAM_RANGE, LIQUID_TEMPERATURE, t, 'temperature');
  if (badT) return fail(badT);
  const min = toBar(saturationPressure(toKelvin(t))) * (1 - ROUNDING);
  const badP = checkRange(STEAM_RANGE, { name: 'Water pressure', unit: 'bar a', min, max: 1000 }, p, 'pressure');
  return badP ? fail(badP) : ok(region1(toMegapascal(p), toKelvin(t)));
}

/**
 * Steam, region 2.
 * @returns STEAM-RANGE outside 0 to 800 degC, or above saturation pressure (the boundary to region 3 when hotter).
 */
export function steamAt(p: BarAbsolute, t: Celsius): Result<FluidProperties> {
  const badT = checkRange(STEAM_RANGE, STEAM_TEMPERATURE, t, 'temperature');
  if (badT) return fail(badT);
  const max = steamPressureLimit(toKelvin(t)) * (1 + ROUNDING);
  const badP = checkRange(STEAM_RANGE, { name: 'Steam pressure', unit: 'bar a', min: 1e-6, max }, p, 'pressure');
  return badP ? fail(badP) : ok(region2(toMegapascal(p), toKelvin(t)));
}

/**
 * Enthalpy of hot or cold water [kJ/kg], h_w(T): region 1 at the standard atmosphere, at saturation when hotter.
 * @returns STEAM-RANGE outside 0 to 350 degC.
 */
export function liquidEnthalpy(t: Celsius): Result<number> {
  const bad = checkRange(STEAM_RANGE, LIQUID_TEMPERATURE, t, 'temperature');
  if (bad) return fail(bad);
  const p = barAbsolute(Math.max(STANDARD_ATMOSPHERE, toBar(saturationPressure(toKelvin(t)))));
  return ok(region1(toMegapascal(p), toKelvin(t)).h);
}

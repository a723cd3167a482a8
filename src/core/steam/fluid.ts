/** Water and steam with the region checked: the doors to IAPWS-IF97 regions 1 and 2. */
import { toBar, toMegapascal, STANDARD_ATMOSPHERE } from '../quantity/pressure';
import { checkRange, shortNumber, type Range } from '../quantity/range';
import { barAbsolute, celsius, kelvin, toCelsius, toKelvin } from '../quantity/units';
import type { BarAbsolute, Celsius, Kelvin } from '../quantity/units';
import { fail, ok, type Result } from '../result';
import type { FluidProperties } from './gibbs';
import { region1 } from './region1';
import { boundary23, region2 } from './region2';
import { saturationPressure, saturationTemperature } from './region4';

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

/**
 * Temperature of liquid water from pressure and enthalpy [kJ/kg], to a nanokelvin: Newton on region 1, not the release's
 * backward equation (off by up to 25 mK).
 * @returns STEAM-RANGE when the pressure is out of range, or the enthalpy is not that of liquid water at it.
 */
export function waterTemperature(p: BarAbsolute, h: number): Result<Celsius> {
  const pressure = { name: 'Water pressure', unit: 'bar a', min: 0.00611213, max: 1000 };
  const badP = checkRange(STEAM_RANGE, pressure, p, 'pressure');
  if (badP) return fail(badP);
  const mpa = toMegapascal(p);
  const hottestK = mpa < 16.529 ? saturationTemperature(mpa) : kelvin(623.15);
  const coldestK = kelvin(273.15);
  const min = region1(mpa, coldestK).h;
  const max = region1(mpa, hottestK).h;
  const range = { name: `Water enthalpy at ${shortNumber(p)} bar a`, unit: 'kJ/kg', min, max };
  const badH = checkRange(STEAM_RANGE, range, h, 'h');
  if (badH) return fail(badH);
  let t = kelvin(coldestK + ((h - min) / (max - min)) * (hottestK - coldestK));
  for (let step = 0; step < 50; step += 1) {
    const at = region1(mpa, t);
    const change = (h - at.h) / at.cp;
    t = kelvin(Math.min(Math.max(t + change, coldestK), hottestK));
    if (Math.abs(change) < 1e-9) return ok(toCelsius(t));
  }
  throw new Error(`no temperature found for ${p} bar a, ${h} kJ/kg`);
}

/**
 * Temperature of dry or superheated steam from pressure and enthalpy [kJ/kg], to a nanokelvin: Newton on region 2.
 * @returns STEAM-RANGE when there is no steam of that enthalpy at that pressure between saturation and 800 degC.
 */
export function steamTemperature(p: BarAbsolute, h: number): Result<Celsius> {
  const mpa = toMegapascal(p);
  let t = toKelvin(celsius(STEAM_TEMPERATURE.max));
  for (let step = 0; step < 100; step += 1) {
    const at = region2(mpa, t);
    const change = (h - at.h) / at.cp;
    if (Math.abs(change) < 1e-9) break;
    t = kelvin(Math.max(t + change, 273.15));
  }
  const found = steamAt(p, toCelsius(t));
  return found.ok ? ok(toCelsius(t)) : found;
}

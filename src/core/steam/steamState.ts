/** Wet, dry and superheated steam in a header, and after a reducing valve. */
import { checkAmbient, STANDARD_ATMOSPHERE, toAbsolute, toMegapascal } from '../quantity/pressure';
import { checkRange, shortNumber, type Range } from '../quantity/range';
import { celsius, toCelsius, toKelvin } from '../quantity/units';
import type { BarAbsolute, BarGauge, Celsius } from '../quantity/units';
import { fail, ok, problem, type Result } from '../result';
import { STEAM_RANGE } from './fluid';
import { region2 } from './region2';
import { saturationAtPressure, type Saturation } from './saturation';

/** How dry: a dryness fraction (1 is dry saturated), or kelvin above saturation. */
export type SteamQuality =
  { readonly kind: 'wet'; readonly dryness: number } | { readonly kind: 'superheated'; readonly superheatK: number };

/** A header as the plant knows it. */
export interface HeaderSpec {
  readonly pressure: BarGauge;
  readonly quality: SteamQuality;
  /** Ambient pressure at the plant; the standard atmosphere unless given. */
  readonly ambient?: BarAbsolute;
}

interface AtPressure {
  readonly pressure: BarAbsolute;
  readonly temperature: Celsius;
  /** Specific enthalpy of the steam as it is [kJ/kg]. */
  readonly h: number;
  /** Specific volume of the steam as it is [m3/kg]. */
  readonly v: number;
  /** Saturated liquid, evaporation and dry saturated steam at this pressure [kJ/kg]. */
  readonly hf: number;
  readonly hfg: number;
  readonly hg: number;
}
export interface WetSteam extends AtPressure {
  readonly kind: 'wet';
  readonly dryness: number;
}
export interface SuperheatedSteam extends AtPressure {
  readonly kind: 'superheated';
  readonly superheatK: number;
}
export type SteamState = WetSteam | SuperheatedSteam;

const DRYNESS: Range = { name: 'Dryness fraction', unit: '', min: 0.5, max: 1 };
const HOTTEST_C = 800;

const atSaturation = ({ pressure, hf, hfg, hg }: Saturation) => ({ pressure, hf, hfg, hg });

function wetSteam(sat: Saturation, dryness: number): WetSteam {
  const h = sat.hf + dryness * sat.hfg;
  const v = sat.vf + dryness * (sat.vg - sat.vf);
  return { kind: 'wet', dryness, temperature: sat.temperature, h, v, ...atSaturation(sat) };
}

function superheatedSteam(sat: Saturation, temperature: Celsius): SuperheatedSteam {
  const { h, v } = region2(toMegapascal(sat.pressure), toKelvin(temperature));
  return { kind: 'superheated', superheatK: temperature - sat.temperature, temperature, h, v, ...atSaturation(sat) };
}

/**
 * The steam of a header from gauge pressure and dryness or superheat. No superheat is dry saturated steam.
 * @returns STEAM-RANGE when pressure, dryness (0.5 to 1) or superheat is out of range, AMBIENT-RANGE.
 */
export function steamState(header: HeaderSpec): Result<SteamState> {
  const ambient = checkAmbient(header.ambient ?? STANDARD_ATMOSPHERE);
  if (!ambient.ok) return ambient;
  const sat = saturationAtPressure(toAbsolute(header.pressure, ambient.value));
  if (!sat.ok) return sat;
  const { quality } = header;
  if (quality.kind === 'wet') {
    const bad = checkRange(STEAM_RANGE, DRYNESS, quality.dryness, 'dryness');
    return bad ? fail(bad) : ok(wetSteam(sat.value, quality.dryness));
  }
  const superheat = { name: 'Superheat', unit: 'K', min: 0, max: HOTTEST_C - sat.value.temperature };
  const bad = checkRange(STEAM_RANGE, superheat, quality.superheatK, 'superheatK');
  if (bad) return fail(bad);
  if (quality.superheatK === 0) return ok(wetSteam(sat.value, 1));
  return ok(superheatedSteam(sat.value, celsius(sat.value.temperature + quality.superheatK)));
}

/** Newton on region 2; cp is the slope, so it converges in a handful of steps from any point of the region. */
function superheatedTemperature(sat: Saturation, h: number): Celsius {
  const p = toMegapascal(sat.pressure);
  let t = toKelvin(sat.temperature);
  for (let step = 0; step < 50; step += 1) {
    const at = region2(p, t);
    const change = (h - at.h) / at.cp;
    t = toKelvin(celsius(toCelsius(t) + change));
    if (Math.abs(change) < 1e-9) return toCelsius(t);
  }
  throw new Error(`no temperature found for ${sat.pressure} bar a, ${h} kJ/kg`);
}

/**
 * The state of steam from pressure and enthalpy [kJ/kg]: wet up to hg, superheated above.
 * The inverse is exact to a nanokelvin, not the release's backward equation (off by up to 25 mK).
 * @returns STEAM-RANGE when the pressure is out of range, or h is not between hf and 800 degC steam.
 */
export function stateFromEnthalpy(pressure: BarAbsolute, h: number): Result<SteamState> {
  const sat = saturationAtPressure(pressure);
  if (!sat.ok) return sat;
  const max = region2(toMegapascal(pressure), toKelvin(celsius(HOTTEST_C))).h;
  const range = { name: `Steam enthalpy at ${shortNumber(pressure)} bar a`, unit: 'kJ/kg', min: sat.value.hf, max };
  const bad = checkRange(STEAM_RANGE, range, h, 'h');
  if (bad) return fail(bad);
  if (h <= sat.value.hg) return ok(wetSteam(sat.value, (h - sat.value.hf) / sat.value.hfg));
  return ok(superheatedSteam(sat.value, superheatedTemperature(sat.value, h)));
}

/**
 * Steam after a reducing valve: same enthalpy, lower pressure; wet or superheated as it comes out.
 * @returns STEAM-THROTTLE when the pressure would have to rise, else as {@link stateFromEnthalpy}.
 */
export function throttle(from: SteamState, to: BarAbsolute): Result<SteamState> {
  if (to > from.pressure) {
    const pressures = `${shortNumber(from.pressure)} bar a up to ${shortNumber(to)} bar a`;
    return fail(problem('STEAM-THROTTLE', `A valve cannot take steam from ${pressures}; lower the pressure after it.`));
  }
  return stateFromEnthalpy(to, from.h);
}

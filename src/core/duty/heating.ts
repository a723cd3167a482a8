/** How steam heats: blown into the water, or through an exchanger whose condensate drains at its own temperature. */
import { toAbsolute } from '../quantity/pressure';
import { shortNumber } from '../quantity/range';
import { barGauge, celsius, type BarAbsolute } from '../quantity/units';
import { fail, ok, problem, type Problem, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import { saturationAtPressure } from '../steam/saturation';
import { throttle } from '../steam/steamState';
import type { DutyPhase, SteamSupply } from './duty';
import { range } from './inputs';

export interface Heating {
  readonly heating: 'direct' | 'exchanger';
  /** Steam side of the exchanger; not looked at when steam is blown in. */
  readonly exchangerPressureBarG: number;
}

export const EXCHANGER_PRESSURE = range('Pressure on the steam side of the exchanger', 'bar g', 0, 15);

/** Where the steam's water ends up: its temperature [degC] and enthalpy [kJ/kg]. */
export interface Condensate {
  readonly celsius: number;
  readonly h: number;
}

/** Least difference that still heats [K]. */
const LEAST_DIFFERENCE_K = 1;

/**
 * The condensate of steam that heats water to a temperature [degC]: at that temperature when blown in, saturated at
 * the exchanger's pressure otherwise.
 * @returns DUTY-EXCHANGER when the exchanger is too cold, STEAM-THROTTLE when its pressure is above the header's,
 * STEAM-RANGE.
 */
export function condensateOf(heating: Heating, heatedToC: number, supply: SteamSupply): Result<Condensate> {
  if (heating.heating === 'direct') {
    const water = liquidEnthalpy(celsius(heatedToC));
    return water.ok ? ok({ celsius: heatedToC, h: water.value }) : water;
  }
  return exchangerCondensate(heating.exchangerPressureBarG, heatedToC, supply);
}

/** As {@link condensateOf} for an exchanger, jacket, coil or calandria at a gauge pressure [bar g]. */
export function exchangerCondensate(pressureBarG: number, heatedToC: number, supply: SteamSupply): Result<Condensate> {
  const pressure = toAbsolute(barGauge(pressureBarG), supply.ambient);
  const steam = throttle(supply.header, pressure);
  if (!steam.ok) return steam;
  const sat = saturationAtPressure(pressure);
  if (!sat.ok) return sat;
  const { temperature, hf } = sat.value;
  if (temperature - heatedToC >= LEAST_DIFFERENCE_K) return ok({ celsius: temperature, h: hf });
  const need = shortNumber(heatedToC + LEAST_DIFFERENCE_K);
  const text = `The exchanger condenses at ${shortNumber(temperature)} °C; it must be at least ${need} °C to heat.`;
  return fail(problem('DUTY-EXCHANGER', `${text} Raise its pressure.`, 'exchangerPressureBarG'));
}

/** @returns DUTY-BOILING when an open vessel would boil at the plant's air pressure, naming both temperatures. */
export function checkOpenVessel(name: string, tC: number, ambient: BarAbsolute, field: string): Problem | undefined {
  const sat = saturationAtPressure(ambient);
  if (!sat.ok) return sat.error;
  if (tC <= sat.value.temperature) return undefined;
  const boils = `water boils at ${shortNumber(sat.value.temperature)} °C at this plant's air pressure`;
  return problem('DUTY-BOILING', `${name} is ${shortNumber(tC)} °C, but ${boils}; lower it.`, field);
}

/** A spell at an even rate [kg/h]; nothing is worked out for a spell of no length. */
export function spell(kind: DutyPhase['kind'], minutes: number, rate: () => number): DutyPhase[] {
  return minutes > 0 ? [{ kind, minutes, steamKgPerH: rate() }] : [];
}

/** Steam through an opening: bleeders, vents, blown seals. */
import { checkRange, shortNumber, type Range } from '../quantity/range';
import type { BarAbsolute } from '../quantity/units';
import { fail, ok, problem, type Result } from '../result';
import { saturationAtPressure } from './saturation';

/** Napier's rule 51.5 lb/h per in2 and psi a, in kg/h per mm2 and bar a (Valve Selection Handbook, steam sizing). */
const NAPIER_KG_PER_H_MM2_BAR = 0.525154;

const AREA: Range = { name: 'Opening', unit: 'mm²', min: 0, max: 1e6 };
const DISCHARGE: Range = { name: 'Discharge coefficient', unit: '', min: 0, max: 1 };

/** Area of a round bore [mm2] from its diameter [mm]. */
export const boreAreaMm2 = (diameterMm: number): number => (Math.PI / 4) * diameterMm ** 2;

/** What drives steam through an opening. */
export interface Opening {
  readonly areaMm2: number;
  readonly discharge: number;
  /** Pressure inside [bar a], its fall to outside [bar], density of the steam inside [kg/m3]. */
  readonly insideBarA: number;
  readonly fallBar: number;
  readonly kgPerM3: number;
}

/**
 * Flow of dry saturated steam through an opening [kg/h]: Cd A sqrt(2 rho dp) while the fall is small, never above
 * Napier's choked flow. Unchecked.
 */
export function openingFlowKgPerH({ areaMm2, discharge, insideBarA, fallBar, kgPerM3 }: Opening): number {
  const incompressible = Math.sqrt(2 * kgPerM3 * fallBar * 1e5) * 3600e-6;
  return discharge * areaMm2 * Math.min(incompressible, NAPIER_KG_PER_H_MM2_BAR * insideBarA);
}

/**
 * An opening of a vessel full of saturated steam.
 * @returns OPENING-RANGE for area or coefficient, OPENING-ORDER when the steam would flow inwards, STEAM-RANGE.
 */
export function openingAt(
  inside: BarAbsolute,
  outside: BarAbsolute,
  areaMm2: number,
  discharge: number,
): Result<Opening> {
  const bad =
    checkRange('OPENING-RANGE', AREA, areaMm2, 'areaMm2') ??
    checkRange('OPENING-RANGE', DISCHARGE, discharge, 'discharge');
  if (bad) return fail(bad);
  const sat = saturationAtPressure(inside);
  if (!sat.ok) return sat;
  if (!(outside <= inside)) {
    const pressures = `${shortNumber(inside)} bar a inside, ${shortNumber(outside)} bar a outside`;
    return fail(problem('OPENING-ORDER', `Steam flows out only to a lower pressure: ${pressures}.`));
  }
  return ok({ areaMm2, discharge, insideBarA: inside, fallBar: inside - outside, kgPerM3: 1 / sat.value.vg });
}

/** Steam through an opening: bleeders, vents, blown seals. */
import { checkRange, shortNumber, type Range } from '../quantity/range';
import type { BarAbsolute } from '../quantity/units';
import { fail, ok, problem, type Result } from '../result';
import { saturationAtPressure } from './saturation';

/** Napier's rule 51.5 lb/h per in2 and psi a, in kg/h per mm2 and bar a (Valve Selection Handbook, steam sizing). */
export const NAPIER_KG_PER_H_MM2_BAR = 0.525154;

const AREA: Range = { name: 'Opening', unit: 'mm²', min: 0, max: 1e6 };
const DISCHARGE: Range = { name: 'Discharge coefficient', unit: '', min: 0, max: 1 };

/** Area of a round bore [mm2] from its diameter [mm]. */
export const boreAreaMm2 = (diameterMm: number): number => (Math.PI / 4) * diameterMm ** 2;

/** Choked flow of saturated steam by Napier's rule [kg/h]; ideal where discharge is 1. Unchecked. */
export function napierKgPerH(upstream: BarAbsolute, areaMm2: number, discharge = 1): number {
  return NAPIER_KG_PER_H_MM2_BAR * areaMm2 * upstream * discharge;
}

/**
 * Flow of dry saturated steam through an opening [kg/h]: Cd A sqrt(2 rho dp) while the fall is small, never above
 * Napier's choked flow.
 * @returns OPENING-RANGE for area or coefficient, OPENING-ORDER when the steam would flow inwards, STEAM-RANGE.
 */
export function openingFlowKgPerH(
  upstream: BarAbsolute,
  downstream: BarAbsolute,
  areaMm2: number,
  discharge: number,
): Result<number> {
  const bad =
    checkRange('OPENING-RANGE', AREA, areaMm2, 'areaMm2') ??
    checkRange('OPENING-RANGE', DISCHARGE, discharge, 'discharge');
  if (bad) return fail(bad);
  const sat = saturationAtPressure(upstream);
  if (!sat.ok) return sat;
  if (!(downstream <= upstream)) {
    const pressures = `${shortNumber(upstream)} bar a inside, ${shortNumber(downstream)} bar a outside`;
    return fail(problem('OPENING-ORDER', `Steam flows out only to a lower pressure: ${pressures}.`));
  }
  const pascal = (upstream - downstream) * 1e5;
  const kgPerSM2 = Math.sqrt((2 * pascal) / sat.value.vg);
  const incompressible = discharge * areaMm2 * 1e-6 * kgPerSM2 * 3600;
  return ok(Math.min(incompressible, napierKgPerH(upstream, areaMm2, discharge)));
}

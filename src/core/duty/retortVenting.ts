/**
 * A vent drawn in steps: the metal takes most of its heat at first, the outflow grows with the pressure, the rest runs
 * evenly. The kg of every part stay those of the whole vent.
 * Source: shares by lumped heating and orifice flow; the time constants are common practice, no source.
 */
import * as balance from './balance';
import type { DutyPhase } from './duty';
import type { WorkingSheet } from './working';

/** The metal has come within 5 % of the steam by the end of the vent: three time constants. */
const METAL_TIME_CONSTANTS = 3;

/** Parts of the steam of a whole vent [kg]. */
export interface VentParts {
  /** Condensed on shell, baskets and containers. */
  readonly metalKg: number;
  /** Condensed by contents and losses, and filling the void. */
  readonly evenKg: number;
  /** Leaving by the vents. */
  readonly outKg: number;
}

/** Share of the metal's heat taken by a share of the vent, 0 to 1: (1 - e^-3s) / (1 - e^-3). */
const metalBy = (share: number): number =>
  (1 - Math.exp(-METAL_TIME_CONSTANTS * share)) / (1 - Math.exp(-METAL_TIME_CONSTANTS));

/** Share gone out by a share of the vent, the flow growing as the root of a pressure that rises evenly: s^1.5. */
const outBy = (share: number): number => share ** 1.5;

/** The vent of `minutes` in `steps` equal spells, under sections of their own. */
export function ventInSteps(sheet: WorkingSheet, parts: VentParts, minutes: number, steps: number): DutyPhase[] {
  return Array.from({ length: steps }, (_, index) => {
    const from = index / steps;
    const to = (index + 1) / steps;
    sheet.section(`Vent, step ${index + 1}`);
    const kg = sheet.step({
      symbol: 'm',
      name: 'Steam of this step',
      formula: 'm_metal · s_metal + m_even · s_even + m_out · s_out',
      unit: 'kg',
      source: 'Mass balance; shares by lumped heating and orifice flow, common practice, no source',
      inputs: {
        m_metal: [parts.metalKg, 'kg'],
        s_metal: [metalBy(to) - metalBy(from), ''],
        m_even: [parts.evenKg, 'kg'],
        s_even: [to - from, ''],
        m_out: [parts.outKg, 'kg'],
        s_out: [outBy(to) - outBy(from), ''],
      },
      value: ({ m_metal, s_metal, m_even, s_even, m_out, s_out }) =>
        m_metal * s_metal + m_even * s_even + m_out * s_out,
    });
    return { kind: 'vent', minutes: minutes / steps, steamKgPerH: balance.averageRate(sheet, kg, minutes / steps) };
  });
}

/** The vessel of a still retort: its surface, its void and what leaves by its openings, as steps of a working. */
import { openingFlowKgPerH, type Opening } from '../steam/opening';
import type { StillRetortInput } from './stillRetortInput';
import type { WorkingSheet } from './working';

const STEEL_KG_PER_M3 = 7850;

/** Void volume [m3]: shell less containers and baskets; negative when they do not fit. */
export function voidVolume(sheet: WorkingSheet, input: StillRetortInput): number {
  return sheet.step({
    symbol: 'V_0',
    name: 'Void that steam fills',
    formula: 'π/4 · D² · L − n · V_c − m_b / ρ',
    unit: 'm³',
    source: 'Geometry',
    inputs: {
      D: [input.shellDiameterM, 'm'],
      L: [input.shellLengthM, 'm'],
      n: [input.containers, ''],
      V_c: [input.containerVolumeM3, 'm³'],
      m_b: [input.basketsKg, 'kg'],
      ρ: [STEEL_KG_PER_M3, 'kg/m³'],
    },
    value: ({ D, L, n, V_c, m_b, ρ }) => (Math.PI / 4) * D ** 2 * L - n * V_c - m_b / ρ,
  });
}

/** Bare surface of the shell [m2]. */
export function surfaceArea(sheet: WorkingSheet, input: StillRetortInput): number {
  return sheet.step({
    symbol: 'A',
    name: 'Bare surface, flat ends',
    formula: 'π · D · L + 2 · π/4 · D²',
    unit: 'm²',
    source: 'Geometry',
    inputs: { D: [input.shellDiameterM, 'm'], L: [input.shellLengthM, 'm'] },
    value: ({ D, L }) => Math.PI * D * L + (Math.PI / 2) * D ** 2,
  });
}

/** Steam leaving by an opening [kg/h]. */
export function openingFlow(sheet: WorkingSheet, name: string, opening: Opening): number {
  return sheet.step({
    symbol: 'ṁ_o',
    name,
    formula: 'C_d · A · min(3600e-6 · √(2 · ρ · 10⁵ · Δp), 0.525154 · p)',
    unit: 'kg/h',
    source: "Incompressible flow, at most Napier's rule for choked flow",
    inputs: {
      C_d: [opening.discharge, ''],
      A: [opening.areaMm2, 'mm²'],
      p: [opening.insideBarA, 'bar a'],
      Δp: [opening.fallBar, 'bar'],
      ρ: [opening.kgPerM3, 'kg/m³'],
    },
    value: ({ C_d, A, p, Δp, ρ }) =>
      openingFlowKgPerH({ discharge: C_d, areaMm2: A, insideBarA: p, fallBar: Δp, kgPerM3: ρ }),
  });
}

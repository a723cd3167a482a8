/** The few lines that every heat balance repeats, as steps of a working. */
import type { SpecificHeat } from './specificHeat';
import type { WorkingSheet } from './working';

export const ENERGY_BALANCE = 'Energy balance';
export const IF97 = 'IAPWS R7-97(2012)';

/** Carbon steel and stainless steel alike, near 0.12 Btu/lbF. Energy-management handbook, kettle example. */
export const STEEL_KJ_PER_KG_K = 0.5;

/** Heat to warm a mass [kJ]: m c (T2 - T1). */
export function sensibleHeat(
  sheet: WorkingSheet,
  what: { readonly symbol: string; readonly name: string },
  kg: number,
  kJPerKgK: number,
  fromC: number,
  toC: number,
): number {
  return sheet.step({
    ...what,
    formula: 'm · c · (T_2 − T_1)',
    unit: 'kJ',
    source: ENERGY_BALANCE,
    inputs: { m: [kg, 'kg'], c: [kJPerKgK, 'kJ/kgK'], T_1: [fromC, '°C'], T_2: [toC, '°C'] },
    value: ({ m, c, T_1, T_2 }) => m * c * (T_2 - T_1),
  });
}

/** Heat lost from a bare surface [kW]: U A (T - T_ambient). */
export function surfaceLoss(
  sheet: WorkingSheet,
  wPerM2K: number,
  areaM2: number,
  surfaceC: number,
  ambientC: number,
): number {
  return sheet.step({
    symbol: 'q_loss',
    name: 'Heat lost from the bare surface',
    formula: 'k · A · (T_s − T_a) / 1000',
    unit: 'kW',
    source: 'About 14 W/m²K for bare steel near 120 °C: heat-loss rule, common practice',
    inputs: { k: [wPerM2K, 'W/m²K'], A: [areaM2, 'm²'], T_s: [surfaceC, '°C'], T_a: [ambientC, '°C'] },
    value: ({ k, A, T_s, T_a }) => (k * A * (T_s - T_a)) / 1000,
  });
}

/** Heat that a kilogram of header steam gives up, condensate leaving at h_c [kJ/kg]: h - h_c. */
export function heatGivenUp(sheet: WorkingSheet, headerH: number, condensateH: number, condensateC: number): number {
  return sheet.step({
    symbol: 'Δh',
    name: `Heat given up per kg of header steam, condensate leaving at ${Number(condensateC.toFixed(1))} °C`,
    formula: 'h − h_c',
    unit: 'kJ/kg',
    source: IF97,
    inputs: { h: [headerH, 'kJ/kg'], h_c: [condensateH, 'kJ/kg'] },
    value: ({ h, h_c }) => h - h_c,
  });
}

/** Writes down the specific heat used [kJ/kgK]. */
export function writeSpecificHeat(sheet: WorkingSheet, cp: SpecificHeat): number {
  return sheet.step({
    symbol: 'c_p',
    name: 'Specific heat of the product',
    formula: cp.formula,
    unit: 'kJ/kgK',
    source: cp.source,
    inputs: cp.inputs,
    value: () => cp.value,
  });
}

/** Writes down the specific heat of containers' contents, and their heat capacity [kJ/K]: n m c. */
export function contentsCapacity(
  sheet: WorkingSheet,
  { containers, contentsKgEach }: { readonly containers: number; readonly contentsKgEach: number },
  specific: SpecificHeat,
): number {
  const cp = writeSpecificHeat(sheet, specific);
  return sheet.step({
    symbol: 'C_p',
    name: 'Heat capacity of the contents',
    formula: 'n · m_c · c_p',
    unit: 'kJ/K',
    source: ENERGY_BALANCE,
    inputs: { n: [containers, ''], m_c: [contentsKgEach, 'kg'], c_p: [cp, 'kJ/kgK'] },
    value: ({ n, m_c, c_p }) => n * m_c * c_p,
  });
}

/** Steam for an amount of heat [kg]: Q / dh. */
export function steamForHeat(sheet: WorkingSheet, symbol: string, name: string, heatKJ: number, dh: number): number {
  return sheet.step({
    symbol,
    name,
    formula: 'Q / Δh',
    unit: 'kg',
    source: ENERGY_BALANCE,
    inputs: { Q: [heatKJ, 'kJ'], Δh: [dh, 'kJ/kg'] },
    value: ({ Q, Δh }) => Q / Δh,
  });
}

/** Steam rate for a heat rate [kg/h]: 3600 q / dh. */
export function steamForPower(sheet: WorkingSheet, symbol: string, name: string, kW: number, dh: number): number {
  return sheet.step({
    symbol,
    name,
    formula: '3600 · q / Δh',
    unit: 'kg/h',
    source: ENERGY_BALANCE,
    inputs: { q: [kW, 'kW'], Δh: [dh, 'kJ/kg'] },
    value: ({ q, Δh }) => (3600 * q) / Δh,
  });
}

/** Average rate of a spell [kg/h]. */
export function averageRate(sheet: WorkingSheet, kg: number, minutes: number): number {
  return sheet.step({
    symbol: 'ṁ',
    name: 'Average steam rate',
    formula: '60 · m / t',
    unit: 'kg/h',
    source: ENERGY_BALANCE,
    inputs: { m: [kg, 'kg'], t: [minutes, 'min'] },
    value: ({ m, t }) => (60 * m) / t,
  });
}

/** Heat into what passes through [kW]: m c (T_out - T_in) / 3600. */
export function throughPower(
  sheet: WorkingSheet,
  what: { readonly symbol: string; readonly name: string },
  kgPerH: number,
  kJPerKgK: number,
  inC: number,
  outC: number,
): number {
  return sheet.step({
    ...what,
    formula: 'ṁ_p · c_p · (T_out − T_in) / 3600',
    unit: 'kW',
    source: ENERGY_BALANCE,
    inputs: { ṁ_p: [kgPerH, 'kg/h'], c_p: [kJPerKgK, 'kJ/kgK'], T_in: [inC, '°C'], T_out: [outC, '°C'] },
    value: ({ ṁ_p, c_p, T_in, T_out }) => (ṁ_p * c_p * (T_out - T_in)) / 3600,
  });
}

/** Heat into the product on its way through [kW]. */
export const productPower = (sheet: WorkingSheet, kgPerH: number, cp: number, inC: number, outC: number): number =>
  throughPower(sheet, { symbol: 'q_product', name: 'Heat into the product' }, kgPerH, cp, inC, outC);

/** Heat to bring a stream from one enthalpy to another [kW]: m (h_2 - h_1) / 3600. */
export function streamPower(
  sheet: WorkingSheet,
  what: { readonly symbol: string; readonly name: string },
  kgPerH: number,
  fromKJPerKg: number,
  toKJPerKg: number,
): number {
  return sheet.step({
    ...what,
    formula: 'ṁ · (h_2 − h_1) / 3600',
    unit: 'kW',
    source: IF97,
    inputs: { ṁ: [kgPerH, 'kg/h'], h_1: [fromKJPerKg, 'kJ/kg'], h_2: [toKJPerKg, 'kJ/kg'] },
    value: ({ ṁ, h_1, h_2 }) => (ṁ * (h_2 - h_1)) / 3600,
  });
}

/** Heat to bring a mass of water from one enthalpy to another [kJ]: m (h_2 - h_1). */
export function waterHeat(
  sheet: WorkingSheet,
  what: { readonly symbol: string; readonly name: string },
  kg: number,
  fromKJPerKg: number,
  toKJPerKg: number,
): number {
  return sheet.step({
    ...what,
    formula: 'm · (h_2 − h_1)',
    unit: 'kJ',
    source: IF97,
    inputs: { m: [kg, 'kg'], h_1: [fromKJPerKg, 'kJ/kg'], h_2: [toKJPerKg, 'kJ/kg'] },
    value: ({ m, h_1, h_2 }) => m * (h_2 - h_1),
  });
}

/** Heat lost over a spell [kJ]: 60 q t. */
export function lostHeat(sheet: WorkingSheet, name: string, kW: number, minutes: number): number {
  return sheet.step({
    symbol: 'Q_loss',
    name,
    formula: '60 · q_loss · t',
    unit: 'kJ',
    source: ENERGY_BALANCE,
    inputs: { q_loss: [kW, 'kW'], t: [minutes, 'min'] },
    value: ({ q_loss, t }) => 60 * q_loss * t,
  });
}

/** Adds up parts that were worked out above, by their symbols. */
export function sumOf(
  sheet: WorkingSheet,
  what: { readonly symbol: string; readonly name: string; readonly unit: string },
  parts: Readonly<Record<string, number>>,
): number {
  const entries = Object.entries(parts);
  return sheet.step({
    ...what,
    formula: entries.map(([symbol]) => symbol).join(' + '),
    source: ENERGY_BALANCE,
    inputs: Object.fromEntries(entries.map(([symbol, value]) => [symbol, [value, what.unit] as const])),
    value: (values) => entries.reduce((sum, [symbol]) => sum + (values[symbol] ?? 0), 0),
  });
}

/** Steam supplied when a share of it escapes uncondensed [kg/h]: m_c / (1 - e). */
export function withEscape(
  sheet: WorkingSheet,
  name: string,
  condensingKgPerH: number,
  escapeFraction: number,
): number {
  return sheet.step({
    symbol: 'ṁ',
    name,
    formula: 'ṁ_c / (1 − e)',
    unit: 'kg/h',
    source: 'Mass balance; escape is a figure of the plant',
    inputs: { ṁ_c: [condensingKgPerH, 'kg/h'], e: [escapeFraction, ''] },
    value: ({ ṁ_c, e }) => ṁ_c / (1 - e),
  });
}

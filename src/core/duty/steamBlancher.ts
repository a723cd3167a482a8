/**
 * Continuous steam blancher: warm-up, run, idling between runs. Steam condenses on the product and drains at its
 * temperature; part of what is supplied blows out at the ends.
 * Source: heat balance; specific heat after Choi and Okos (1986); enthalpies IAPWS R7-97(2012).
 */
import { celsius } from '../quantity/units';
import { fail, ok, problem, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type DutyPhase, type SteamSupply } from './duty';
import { allOf, checkInputs, plantDefaults, range, type InputRanges } from './inputs';
import { specificHeat, type SpecificHeat, type SpecificHeatBasis } from './specificHeat';
import { warnOfLittleSteam } from './steamPerKg';
import { openWorking, type WorkingSheet } from './working';

export interface SteamBlancherInput {
  readonly productKgPerH: number;
  readonly productInC: number;
  readonly productOutC: number;
  readonly product: SpecificHeatBasis;
  /** A length of 0 leaves the phase out. */
  readonly warmUpMin: number;
  readonly runMin: number;
  readonly idleMin: number;
  readonly steelKg: number;
  readonly sumpWaterKg: number;
  readonly coldC: number;
  /** Inside the tunnel; sump and shell come to it. */
  readonly chamberC: number;
  readonly shellAreaM2: number;
  readonly ambientC: number;
  readonly surfaceLossWPerM2K: number;
  /** Share of the supplied steam that leaves at the ends while product runs. */
  readonly escapeFraction: number;
  readonly idleEscapeKgPerH: number;
}

export const STEAM_BLANCHER_RANGES: InputRanges<SteamBlancherInput> = {
  productKgPerH: range('Product rate', 'kg/h', 0, 50_000),
  productInC: range('Product temperature in', '°C', 0, 99),
  productOutC: range('Product temperature out', '°C', 1, 100),
  warmUpMin: range('Warm-up', 'min', 0, 240),
  runMin: range('Run', 'min', 0, 10_080),
  idleMin: range('Idling', 'min', 0, 10_080),
  steelKg: range('Steel', 'kg', 0, 20_000),
  sumpWaterKg: range('Sump water', 'kg', 0, 10_000),
  coldC: range('Temperature when cold', '°C', 0, 99),
  chamberC: range('Chamber temperature', '°C', 1, 100),
  shellAreaM2: range('Shell surface', 'm²', 0, 500),
  ambientC: range('Room temperature', '°C', 0, 50),
  surfaceLossWPerM2K: range('Surface loss', 'W/m²K', 0, 40),
  escapeFraction: range('Share escaping at the ends', '', 0, 0.95),
  idleEscapeKgPerH: range('Escaping while idling', 'kg/h', 0, 5000),
};

/** The escape has no default: it is the figure that decides, and only the plant knows it. */
export const STEAM_BLANCHER_DEFAULTS = plantDefaults<SteamBlancherInput>({
  productInC: 15,
  productOutC: 90,
  warmUpMin: 15,
  idleMin: 10,
  steelKg: 850,
  sumpWaterKg: 180,
  coldC: 20,
  chamberC: 95,
  shellAreaM2: 9.5,
  ambientC: 22,
  surfaceLossWPerM2K: 14,
  idleEscapeKgPerH: 60,
});

interface Enthalpies {
  readonly cp: SpecificHeat;
  readonly cold: number;
  readonly chamber: number;
  readonly productIn: number;
  readonly productOut: number;
}

function checkOrder(input: SteamBlancherInput) {
  if (input.productOutC <= input.productInC) {
    const span = `${input.productInC} °C in, ${input.productOutC} °C out`;
    return problem('DUTY-ORDER', `Product must leave hotter than it comes in: ${span}.`, 'productOutC');
  }
  if (input.chamberC < Math.max(input.coldC, input.ambientC, input.productOutC)) {
    const hottest = Math.max(input.coldC, input.ambientC, input.productOutC);
    const text = `Chamber temperature is ${input.chamberC} °C; it must be at least ${hottest} °C, the hottest it heats.`;
    return problem('DUTY-ORDER', text, 'chamberC');
  }
  return undefined;
}

const meanC = (input: SteamBlancherInput): number => (input.productInC + input.productOutC) / 2;

function warmUp(sheet: WorkingSheet, input: SteamBlancherInput, h: number, at: Enthalpies): DutyPhase {
  const { warmUpMin, steelKg, coldC, chamberC, sumpWaterKg } = input;
  if (warmUpMin === 0) return { kind: 'warmUp', minutes: 0, steamKgPerH: 0 };
  sheet.section('Warm-up');
  const steel = { symbol: 'Q_steel', name: 'Heat in the steel' };
  const steelKJ = balance.sensibleHeat(sheet, steel, steelKg, balance.STEEL_KJ_PER_KG_K, coldC, chamberC);
  const heatKJ = sheet.step({
    symbol: 'Q',
    name: 'Heat in steel and sump water',
    formula: 'Q_steel + m_sump · (h_2 − h_1)',
    unit: 'kJ',
    source: balance.IF97,
    inputs: {
      Q_steel: [steelKJ, 'kJ'],
      m_sump: [sumpWaterKg, 'kg'],
      h_1: [at.cold, 'kJ/kg'],
      h_2: [at.chamber, 'kJ/kg'],
    },
    value: ({ Q_steel, m_sump, h_1, h_2 }) => Q_steel + m_sump * (h_2 - h_1),
  });
  const dh = balance.heatGivenUp(sheet, h, at.chamber, chamberC);
  const kg = balance.steamForHeat(sheet, 'm', 'Steam to warm up', heatKJ, dh);
  return { kind: 'warmUp', minutes: warmUpMin, steamKgPerH: balance.averageRate(sheet, kg, warmUpMin) };
}

function run(sheet: WorkingSheet, input: SteamBlancherInput, h: number, at: Enthalpies, lossKW: number): DutyPhase {
  if (input.runMin === 0) return { kind: 'run', minutes: 0, steamKgPerH: 0 };
  sheet.section('Run');
  const cp = balance.writeSpecificHeat(sheet, at.cp);
  const { productKgPerH, productInC, productOutC } = input;
  const heatKW = balance.productPower(sheet, productKgPerH, cp, productInC, productOutC);
  const dh = balance.heatGivenUp(sheet, h, at.productOut, input.productOutC);
  const condensing = balance.steamForPower(sheet, 'ṁ_c', 'Steam condensing', heatKW + lossKW, dh);
  const name = 'Steam supplied, with what escapes at the ends';
  const supplied = balance.withEscape(sheet, name, condensing, input.escapeFraction);
  warnOfLittleSteam(sheet, supplied, productKgPerH, 'the share escaping at the ends');
  const useful = (heatKW * 3600) / (supplied * (h - at.productIn));
  if (supplied > 0) sheet.total('Heat in product / heat in steam while running', useful, '');
  return { kind: 'run', minutes: input.runMin, steamKgPerH: supplied };
}

function idle(sheet: WorkingSheet, input: SteamBlancherInput, h: number, at: Enthalpies, lossKW: number): DutyPhase {
  if (input.idleMin === 0) return { kind: 'idle', minutes: 0, steamKgPerH: 0 };
  sheet.section('Idling');
  const dh = balance.heatGivenUp(sheet, h, at.chamber, input.chamberC);
  const condensing = balance.steamForPower(sheet, 'ṁ_c', 'Steam condensing on the shell', lossKW, dh);
  const steamKgPerH = sheet.step({
    symbol: 'ṁ',
    name: 'Steam while idling',
    formula: 'ṁ_c + ṁ_e',
    unit: 'kg/h',
    source: 'Mass balance; escape is a figure of the plant',
    inputs: { ṁ_c: [condensing, 'kg/h'], ṁ_e: [input.idleEscapeKgPerH, 'kg/h'] },
    value: ({ ṁ_c, ṁ_e }) => ṁ_c + ṁ_e,
  });
  return { kind: 'idle', minutes: input.idleMin, steamKgPerH };
}

/**
 * Steam of a blancher's warm-up, run and idling.
 * @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; STEAM-RANGE.
 */
export function steamBlancher(input: SteamBlancherInput, { header }: SteamSupply): Result<Duty> {
  const bad = checkInputs(input, STEAM_BLANCHER_RANGES) ?? checkOrder(input);
  if (bad) return fail(bad);
  const at = allOf<Enthalpies>({
    cp: specificHeat(input.product, meanC(input)),
    cold: liquidEnthalpy(celsius(input.coldC)),
    chamber: liquidEnthalpy(celsius(input.chamberC)),
    productIn: liquidEnthalpy(celsius(input.productInC)),
    productOut: liquidEnthalpy(celsius(input.productOutC)),
  });
  if (!at.ok) return at;
  const sheet = openWorking('Steam blancher', [ESTIMATE_CAUTION]);
  sheet.section('Losses');
  const { surfaceLossWPerM2K, shellAreaM2, chamberC, ambientC } = input;
  const lossKW = balance.surfaceLoss(sheet, surfaceLossWPerM2K, shellAreaM2, chamberC, ambientC);
  const phases = [
    warmUp(sheet, input, header.h, at.value),
    run(sheet, input, header.h, at.value, lossKW),
    idle(sheet, input, header.h, at.value, lossKW),
  ];
  return ok(closeDuty(sheet, phases));
}

/**
 * Continuous water blancher: an open tank of hot water that product passes through. Steam is blown in or heats by an
 * exchanger; fresh water is let in and the tank overflows; its open surface evaporates; some of the steam escapes.
 * Source: heat balance round the tank; specific heat after Choi and Okos (1986); enthalpies IAPWS R7-97(2012).
 */
import { celsius } from '../quantity/units';
import { fail, ok, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import { saturationAtTemperature, type Saturation } from '../steam/saturation';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type SteamSupply } from './duty';
import { checkOpenVessel, condensateOf, EXCHANGER_PRESSURE, spell, type Condensate, type Heating } from './heating';
import { allOf, checkInputs, checkCold, checkRising, plantDefaults, range, type InputRanges } from './inputs';
import { warmUpRate } from './machine';
import { specificHeat, type SpecificHeat, type SpecificHeatBasis } from './specificHeat';
import { warnOfLittleSteam } from './steamPerKg';
import { openWorking, type WorkingSheet } from './working';

export interface WaterBlancherInput extends Heating {
  readonly productKgPerH: number;
  readonly productInC: number;
  readonly productOutC: number;
  readonly product: SpecificHeatBasis;
  /** A length of 0 leaves the phase out. */
  readonly warmUpMin: number;
  readonly runMin: number;
  readonly idleMin: number;
  readonly steelKg: number;
  readonly tankWaterKg: number;
  readonly coldC: number;
  readonly bathC: number;
  /** Fresh water let in while product runs, as much leaving by the overflow. */
  readonly makeUpKgPerH: number;
  readonly makeUpC: number;
  readonly openAreaM2: number;
  readonly evaporationKgPerM2H: number;
  readonly shellAreaM2: number;
  readonly ambientC: number;
  readonly surfaceLossWPerM2K: number;
  /** Share of the supplied steam that leaves uncondensed while running or idling. */
  readonly escapeFraction: number;
}

export const WATER_BLANCHER_RANGES: InputRanges<WaterBlancherInput> = {
  exchangerPressureBarG: EXCHANGER_PRESSURE,
  productKgPerH: range('Product rate', 'kg/h', 0, 50_000),
  productInC: range('Product temperature in', '°C', 0, 98),
  productOutC: range('Product temperature out', '°C', 1, 99),
  warmUpMin: range('Warm-up', 'min', 0, 240),
  runMin: range('Run', 'min', 0, 10_080),
  idleMin: range('Idling', 'min', 0, 10_080),
  steelKg: range('Steel', 'kg', 0, 20_000),
  tankWaterKg: range('Water in the tank', 'kg', 0, 50_000),
  coldC: range('Temperature when cold', '°C', 0, 98),
  bathC: range('Bath temperature', '°C', 30, 99),
  makeUpKgPerH: range('Fresh water while running', 'kg/h', 0, 50_000),
  makeUpC: range('Fresh water temperature', '°C', 0, 98),
  openAreaM2: range('Open water surface', 'm²', 0, 100),
  evaporationKgPerM2H: range('Evaporation', 'kg/m²h', 0, 60),
  shellAreaM2: range('Shell surface', 'm²', 0, 500),
  ambientC: range('Room temperature', '°C', 0, 50),
  surfaceLossWPerM2K: range('Surface loss', 'W/m²K', 0, 40),
  escapeFraction: range('Share escaping uncondensed', '', 0, 0.95),
};

/** The escape has no default: it is the figure that decides, and only the plant knows it. Evaporation from memory. */
export const WATER_BLANCHER_DEFAULTS = plantDefaults<WaterBlancherInput>({
  heating: 'direct',
  exchangerPressureBarG: 3,
  productInC: 15,
  productOutC: 90,
  warmUpMin: 30,
  idleMin: 10,
  steelKg: 1500,
  tankWaterKg: 2000,
  coldC: 15,
  bathC: 93,
  makeUpKgPerH: 600,
  makeUpC: 15,
  openAreaM2: 2,
  evaporationKgPerM2H: 15,
  shellAreaM2: 20,
  ambientC: 20,
  surfaceLossWPerM2K: 14,
});

interface Conditions {
  readonly cp: SpecificHeat;
  readonly condensate: Condensate;
  readonly bath: Saturation;
  readonly bathH: number;
  readonly coldH: number;
  readonly makeUpH: number;
}

/** Losses of the hot tank [kW]; a vapour of an open surface takes its heat of evaporation along. */
interface Losses {
  readonly shellKW: number;
  readonly evaporationKW: number;
  readonly evaporationKgPerH: number;
}

function losses(sheet: WorkingSheet, input: WaterBlancherInput, at: Conditions): Losses {
  sheet.section('Losses');
  const { surfaceLossWPerM2K, shellAreaM2, bathC, ambientC } = input;
  const shellKW = balance.surfaceLoss(sheet, surfaceLossWPerM2K, shellAreaM2, bathC, ambientC);
  const evaporationKgPerH = sheet.step({
    symbol: 'ṁ_v',
    name: 'Evaporating from the open surface',
    formula: 'A · e_v',
    unit: 'kg/h',
    source: 'Figure of the plant',
    inputs: { A: [input.openAreaM2, 'm²'], e_v: [input.evaporationKgPerM2H, 'kg/m²h'] },
    value: ({ A, e_v }) => A * e_v,
  });
  const vapour = { symbol: 'q_vapour', name: 'Heat leaving with the vapour' };
  const evaporationKW = balance.streamPower(sheet, vapour, evaporationKgPerH, at.bathH, at.bath.hg);
  return { shellKW, evaporationKW, evaporationKgPerH };
}

function runRate(sheet: WorkingSheet, input: WaterBlancherInput, at: Conditions, lost: Losses, dh: number): number {
  sheet.section('Run');
  const { productKgPerH, productInC, productOutC } = input;
  const cp = balance.writeSpecificHeat(sheet, at.cp);
  const fresh = { symbol: 'q_fresh', name: 'Heat into the fresh water that replaces the overflow' };
  const heatKW = balance.sumOf(
    sheet,
    { symbol: 'q', name: 'Heat wanted', unit: 'kW' },
    {
      q_product: balance.productPower(sheet, productKgPerH, cp, productInC, productOutC),
      q_fresh: balance.streamPower(sheet, fresh, input.makeUpKgPerH, at.makeUpH, at.bathH),
      q_vapour: lost.evaporationKW,
      q_loss: lost.shellKW,
    },
  );
  const condensing = balance.steamForPower(sheet, 'ṁ_c', 'Steam condensing', heatKW, dh);
  const supplied = balance.withEscape(sheet, 'Steam supplied while running', condensing, input.escapeFraction);
  warnOfLittleSteam(sheet, supplied, productKgPerH, 'fresh water, evaporation and escape');
  return supplied;
}

function idleRate(sheet: WorkingSheet, input: WaterBlancherInput, at: Conditions, lost: Losses, dh: number): number {
  sheet.section('Idling');
  const fresh = { symbol: 'q_fresh', name: 'Heat into the water that replaces what evaporates' };
  const heatKW = balance.sumOf(
    sheet,
    { symbol: 'q', name: 'Heat wanted', unit: 'kW' },
    {
      q_fresh: balance.streamPower(sheet, fresh, lost.evaporationKgPerH, at.makeUpH, at.bathH),
      q_vapour: lost.evaporationKW,
      q_loss: lost.shellKW,
    },
  );
  const condensing = balance.steamForPower(sheet, 'ṁ_c', 'Steam condensing', heatKW, dh);
  return balance.withEscape(sheet, 'Steam supplied while idling', condensing, input.escapeFraction);
}

const check = (input: WaterBlancherInput, { ambient }: SteamSupply) =>
  checkInputs(input, WATER_BLANCHER_RANGES) ??
  checkRising([
    ['Product temperature in', 'productInC', input.productInC],
    ['Product temperature out', 'productOutC', input.productOutC],
    ['Bath temperature', 'bathC', input.bathC],
  ]) ??
  checkCold(input.coldC, 'Bath temperature', 'bathC', input.bathC) ??
  checkRising([
    ['Fresh water temperature', 'makeUpC', input.makeUpC],
    ['Bath temperature', 'bathC', input.bathC],
  ]) ??
  checkRising([
    ['Room temperature', 'ambientC', input.ambientC],
    ['Bath temperature', 'bathC', input.bathC],
  ]) ??
  checkOpenVessel('Bath temperature', input.bathC, ambient, 'bathC');

/**
 * Steam of a water blancher's warm-up, run and idling.
 * @returns DUTY-RANGE, DUTY-ORDER or DUTY-BOILING naming field, value and range; DUTY-EXCHANGER, STEAM-THROTTLE,
 * STEAM-RANGE.
 */
export function waterBlancher(input: WaterBlancherInput, supply: SteamSupply): Result<Duty> {
  const bad = check(input, supply);
  if (bad) return fail(bad);
  const conditions = allOf<Conditions>({
    cp: specificHeat(input.product, (input.productInC + input.productOutC) / 2),
    condensate: condensateOf(input, input.bathC, supply),
    bath: saturationAtTemperature(celsius(input.bathC)),
    bathH: liquidEnthalpy(celsius(input.bathC)),
    coldH: liquidEnthalpy(celsius(input.coldC)),
    makeUpH: liquidEnthalpy(celsius(input.makeUpC)),
  });
  if (!conditions.ok) return conditions;
  const at = conditions.value;
  const sheet = openWorking('Water blancher', [ESTIMATE_CAUTION]);
  sheet.section('Steam');
  const dh = balance.heatGivenUp(sheet, supply.header.h, at.condensate.h, at.condensate.celsius);
  const lost = losses(sheet, input, at);
  const { warmUpMin, runMin, idleMin } = input;
  const phases = [
    ...spell('warmUp', warmUpMin, () => warmUp(sheet, input, at, lost, dh)),
    ...spell('run', runMin, () => runRate(sheet, input, at, lost, dh)),
    ...spell('idle', idleMin, () => idleRate(sheet, input, at, lost, dh)),
  ];
  return ok(closeDuty(sheet, phases));
}

function warmUp(sheet: WorkingSheet, input: WaterBlancherInput, at: Conditions, lost: Losses, dh: number): number {
  sheet.section('Warm-up');
  const { steelKg, tankWaterKg: waterKg, coldC, bathC: hotC, warmUpMin: minutes } = input;
  const lossKW = lost.shellKW + lost.evaporationKW;
  return warmUpRate(sheet, { steelKg, waterKg, coldC, hotC, coldH: at.coldH, hotH: at.bathH, lossKW, minutes }, dh);
}

/**
 * Plate pasteuriser: product warmed by its own heat in a regeneration section, then by steam through an exchanger.
 * Source: heat balance Q = m c (T_p - T_in) (1 - R) (FAO, X6541E, chapter 2); enthalpies IAPWS R7-97(2012).
 */
import { celsius } from '../quantity/units';
import { fail, ok, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, PROCESS_CAUTION, type Duty, type SteamSupply } from './duty';
import { EXCHANGER_PRESSURE, exchangerCondensate, spell, type Condensate } from './heating';
import { allOf, checkInputs, checkCold, checkRising, plantDefaults, range, type InputRanges } from './inputs';
import { warmUpRate } from './machine';
import { specificHeat, type SpecificHeat, type SpecificHeatBasis } from './specificHeat';
import { openWorking, type WorkingSheet } from './working';

export interface PlatePasteuriserInput {
  readonly productKgPerH: number;
  readonly product: SpecificHeatBasis;
  readonly inC: number;
  readonly pasteuriseC: number;
  /** (T after regeneration - T in) / (T pasteurising - T in). */
  readonly regeneration: number;
  readonly exchangerPressureBarG: number;
  /** Start on water, then product, then water going round while product waits; 0 leaves a phase out. */
  readonly warmUpMin: number;
  readonly runMin: number;
  readonly idleMin: number;
  readonly steelKg: number;
  readonly waterKg: number;
  readonly coldC: number;
  readonly lossKW: number;
}

export const PLATE_PASTEURISER_RANGES: InputRanges<PlatePasteuriserInput> = {
  productKgPerH: range('Product rate', 'kg/h', 0, 100_000),
  inC: range('Product temperature in', '°C', 0, 99),
  pasteuriseC: range('Pasteurising temperature', '°C', 50, 145),
  regeneration: range('Regeneration', '', 0, 0.97),
  exchangerPressureBarG: EXCHANGER_PRESSURE,
  warmUpMin: range('Start on water', 'min', 0, 240),
  runMin: range('Run', 'min', 0, 10_080),
  idleMin: range('Going round on water', 'min', 0, 10_080),
  steelKg: range('Steel', 'kg', 0, 20_000),
  waterKg: range('Water in the plant at the start', 'kg', 0, 20_000),
  coldC: range('Temperature when cold', '°C', 0, 99),
  lossKW: range('Losses', 'kW', 0, 200),
};

export const PLATE_PASTEURISER_DEFAULTS = plantDefaults<PlatePasteuriserInput>({
  inC: 4,
  regeneration: 0.85,
  exchangerPressureBarG: 2,
  warmUpMin: 20,
  idleMin: 0,
  steelKg: 800,
  waterKg: 400,
  coldC: 20,
  lossKW: 3,
});

interface Conditions {
  readonly cp: SpecificHeat;
  readonly condensate: Condensate;
  readonly coldH: number;
  readonly hotH: number;
}

/** Heat that product still wants after regeneration [kW]. */
function heatAfterRegeneration(sheet: WorkingSheet, input: PlatePasteuriserInput, cp: number): number {
  return sheet.step({
    symbol: 'q_product',
    name: 'Heat into the product after regeneration',
    formula: 'ṁ_p · c_p · (T_p − T_in) · (1 − R) / 3600',
    unit: 'kW',
    source: 'FAO, X6541E, chapter 2',
    inputs: {
      ṁ_p: [input.productKgPerH, 'kg/h'],
      c_p: [cp, 'kJ/kgK'],
      T_p: [input.pasteuriseC, '°C'],
      T_in: [input.inC, '°C'],
      R: [input.regeneration, ''],
    },
    value: ({ ṁ_p, c_p, T_p, T_in, R }) => (ṁ_p * c_p * (T_p - T_in) * (1 - R)) / 3600,
  });
}

function runRate(sheet: WorkingSheet, input: PlatePasteuriserInput, specific: SpecificHeat, dh: number): number {
  sheet.section('Run');
  const cp = balance.writeSpecificHeat(sheet, specific);
  const q_product = heatAfterRegeneration(sheet, input, cp);
  const wanted = { symbol: 'q', name: 'Heat wanted', unit: 'kW' };
  const heatKW = balance.sumOf(sheet, wanted, { q_product, q_loss: input.lossKW });
  return balance.steamForPower(sheet, 'ṁ', 'Steam while running', heatKW, dh);
}

const check = (input: PlatePasteuriserInput) =>
  checkInputs(input, PLATE_PASTEURISER_RANGES) ??
  checkRising([
    ['Product temperature in', 'inC', input.inC],
    ['Pasteurising temperature', 'pasteuriseC', input.pasteuriseC],
  ]) ??
  checkCold(input.coldC, 'Pasteurising temperature', 'pasteuriseC', input.pasteuriseC);

/**
 * Steam of a plate pasteuriser's start on water, run, and going round on water (losses only: the water keeps its heat
 * by regeneration).
 * @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; DUTY-EXCHANGER, STEAM-THROTTLE, STEAM-RANGE.
 */
export function platePasteuriser(input: PlatePasteuriserInput, supply: SteamSupply): Result<Duty> {
  const bad = check(input);
  if (bad) return fail(bad);
  const { pasteuriseC, coldC, steelKg, waterKg, lossKW } = input;
  const conditions = allOf<Conditions>({
    cp: specificHeat(input.product, (input.inC + pasteuriseC) / 2),
    condensate: exchangerCondensate(input.exchangerPressureBarG, pasteuriseC, supply),
    coldH: liquidEnthalpy(celsius(coldC)),
    hotH: liquidEnthalpy(celsius(pasteuriseC)),
  });
  if (!conditions.ok) return conditions;
  const { cp, condensate, coldH, hotH } = conditions.value;
  const sheet = openWorking('Plate pasteuriser', [PROCESS_CAUTION, ESTIMATE_CAUTION]);
  sheet.section('Steam');
  const dh = balance.heatGivenUp(sheet, supply.header.h, condensate.h, condensate.celsius);
  const cold = { steelKg, waterKg, coldC, hotC: pasteuriseC, coldH, hotH, lossKW, minutes: input.warmUpMin };
  const phases = [
    ...spell('warmUp', input.warmUpMin, () => {
      sheet.section('Start on water');
      return warmUpRate(sheet, cold, dh);
    }),
    ...spell('run', input.runMin, () => runRate(sheet, input, cp, dh)),
    ...spell('idle', input.idleMin, () => {
      sheet.section('Going round on water');
      return balance.steamForPower(sheet, 'ṁ', 'Steam while going round', lossKW, dh);
    }),
  ];
  return ok(closeDuty(sheet, phases));
}

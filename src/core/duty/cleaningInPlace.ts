/**
 * Cleaning in place: a tank of solution heated to its set point, then sent round a cold circuit, then a hot rinse. The
 * reheat of the tank is the peak; it can be an activity of its own and be moved.
 * Source: heat balance M c dT + m_metal c dT + losses; enthalpies IAPWS R7-97(2012), solution taken as water.
 */
import { celsius } from '../quantity/units';
import { fail, ok, problem, type Problem, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type DutyPhase, type SteamSupply } from './duty';
import { checkOpenVessel, condensateOf, EXCHANGER_PRESSURE, spell, type Condensate, type Heating } from './heating';
import { allOf, checkInputs, checkRising, plantDefaults, range, type InputRanges } from './inputs';
import { openWorking, type WorkingSheet } from './working';

export interface CleaningInPlaceInput extends Heating {
  /** The whole, or one of the two activities that it can be split into. */
  readonly part: 'whole' | 'tank' | 'circuit';
  readonly solutionKg: number;
  /** As the tank stands before it is heated. */
  readonly tankC: number;
  readonly setC: number;
  readonly reheatMin: number;
  readonly tankLossKW: number;
  readonly circuitSteelKg: number;
  readonly circuitC: number;
  /** The circuit's metal comes to the set point in the first minutes of the wash. */
  readonly warmingMin: number;
  readonly washMin: number;
  readonly circuitLossKW: number;
  /** A length of 0 leaves the hot rinse out. */
  readonly rinseMin: number;
  readonly rinseKg: number;
  readonly coldWaterC: number;
  readonly rinseC: number;
}

export const CLEANING_IN_PLACE_RANGES: InputRanges<CleaningInPlaceInput> = {
  exchangerPressureBarG: EXCHANGER_PRESSURE,
  solutionKg: range('Solution in the tank', 'kg', 1, 100_000),
  tankC: range('Tank before it is heated', '°C', 0, 98),
  setC: range('Set point', '°C', 1, 99),
  reheatMin: range('Time to heat the tank', 'min', 0.1, 1440),
  tankLossKW: range('Losses of the tank', 'kW', 0, 200),
  circuitSteelKg: range('Steel of the circuit', 'kg', 0, 50_000),
  circuitC: range('Circuit before it is cleaned', '°C', 0, 98),
  warmingMin: range('Warming of the circuit', 'min', 0.1, 240),
  washMin: range('Wash', 'min', 0.1, 480),
  circuitLossKW: range('Losses of the circuit', 'kW', 0, 200),
  rinseMin: range('Hot rinse', 'min', 0, 240),
  rinseKg: range('Water of the hot rinse', 'kg', 0, 100_000),
  coldWaterC: range('Cold water', '°C', 0, 98),
  rinseC: range('Hot rinse temperature', '°C', 1, 99),
};

/** Set points of caustic 70 to 85 degC, acid 60 to 70, hot rinse 85 to 95: from memory. */
export const CLEANING_IN_PLACE_DEFAULTS = plantDefaults<CleaningInPlaceInput>({
  part: 'whole',
  heating: 'exchanger',
  exchangerPressureBarG: 3,
  tankC: 40,
  setC: 80,
  reheatMin: 20,
  tankLossKW: 3,
  circuitSteelKg: 500,
  circuitC: 20,
  warmingMin: 5,
  washMin: 20,
  circuitLossKW: 5,
  rinseMin: 0,
  rinseKg: 0,
  coldWaterC: 15,
  rinseC: 85,
});

interface Conditions {
  readonly condensate: Condensate;
  readonly rinseCondensate: Condensate;
  readonly tankH: number;
  readonly setH: number;
  readonly coldH: number;
  readonly rinseH: number;
}

const rateOf = (sheet: WorkingSheet, name: string, heatKJ: number, minutes: number, dh: number): number =>
  balance.averageRate(sheet, balance.steamForHeat(sheet, 'm', name, heatKJ, dh), minutes);

function tankReheat(sheet: WorkingSheet, input: CleaningInPlaceInput, at: Conditions, h: number): DutyPhase[] {
  return spell('heatUp', input.reheatMin, () => {
    sheet.section('Heating the tank');
    const dh = balance.heatGivenUp(sheet, h, at.condensate.h, at.condensate.celsius);
    const solution = { symbol: 'Q_solution', name: 'Heat into the solution, taken as water' };
    const all = { symbol: 'Q', name: 'Heat into the tank', unit: 'kJ' };
    const heatKJ = balance.sumOf(sheet, all, {
      Q_solution: balance.waterHeat(sheet, solution, input.solutionKg, at.tankH, at.setH),
      Q_loss: balance.lostHeat(sheet, 'Lost while heating', input.tankLossKW, input.reheatMin),
    });
    return rateOf(sheet, 'Steam to heat the tank: the peak', heatKJ, input.reheatMin, dh);
  });
}

function wash(sheet: WorkingSheet, input: CleaningInPlaceInput, at: Conditions, h: number): DutyPhase[] {
  sheet.section('Wash');
  const { circuitSteelKg, circuitC, setC, circuitLossKW, warmingMin, washMin } = input;
  const dh = balance.heatGivenUp(sheet, h, at.condensate.h, at.condensate.celsius);
  const metal = { symbol: 'Q_metal', name: 'Heat into the metal of the circuit' };
  const all = { symbol: 'Q', name: 'Heat while the circuit warms', unit: 'kJ' };
  const heatKJ = balance.sumOf(sheet, all, {
    Q_metal: balance.sensibleHeat(sheet, metal, circuitSteelKg, balance.STEEL_KJ_PER_KG_K, circuitC, setC),
    Q_loss: balance.lostHeat(sheet, 'Lost in this time', circuitLossKW, warmingMin),
  });
  const first = rateOf(sheet, 'Steam while the circuit warms', heatKJ, warmingMin, dh);
  const later = balance.steamForPower(sheet, 'ṁ', 'Steam for the rest of the wash', circuitLossKW, dh);
  return [...spell('wash', warmingMin, () => first), ...spell('wash', washMin - warmingMin, () => later)];
}

function rinse(sheet: WorkingSheet, input: CleaningInPlaceInput, at: Conditions, h: number): DutyPhase[] {
  return spell('rinse', input.rinseMin, () => {
    sheet.section('Hot rinse');
    const dh = balance.heatGivenUp(sheet, h, at.rinseCondensate.h, at.rinseCondensate.celsius);
    const water = { symbol: 'Q', name: 'Heat into the rinse water' };
    const heatKJ = balance.waterHeat(sheet, water, input.rinseKg, at.coldH, at.rinseH);
    return rateOf(sheet, 'Steam for the hot rinse', heatKJ, input.rinseMin, dh);
  });
}

function checkLengths({ warmingMin, washMin }: CleaningInPlaceInput): Problem | undefined {
  if (warmingMin <= washMin) return undefined;
  const text = `The circuit warms in ${warmingMin} min; the wash is only ${washMin} min long.`;
  return problem('DUTY-ORDER', text, 'warmingMin');
}

const check = (input: CleaningInPlaceInput, { ambient }: SteamSupply): Problem | undefined =>
  checkInputs(input, CLEANING_IN_PLACE_RANGES) ??
  checkLengths(input) ??
  checkRising([
    ['Tank before it is heated', 'tankC', input.tankC],
    ['Set point', 'setC', input.setC],
  ]) ??
  checkRising([
    ['Circuit before it is cleaned', 'circuitC', input.circuitC],
    ['Set point', 'setC', input.setC],
  ]) ??
  checkRising([
    ['Cold water', 'coldWaterC', input.coldWaterC],
    ['Hot rinse temperature', 'rinseC', input.rinseC],
  ]) ??
  checkOpenVessel('Set point', input.setC, ambient, 'setC') ??
  checkOpenVessel('Hot rinse temperature', input.rinseC, ambient, 'rinseC');

/**
 * Steam of a cleaning in place, whole or one part of it; the parts add up to the whole.
 * @returns DUTY-RANGE, DUTY-ORDER or DUTY-BOILING naming field, value and range; DUTY-EXCHANGER, STEAM-THROTTLE,
 * STEAM-RANGE.
 */
export function cleaningInPlace(input: CleaningInPlaceInput, supply: SteamSupply): Result<Duty> {
  const bad = check(input, supply);
  if (bad) return fail(bad);
  const conditions = allOf<Conditions>({
    condensate: condensateOf(input, input.setC, supply),
    rinseCondensate: condensateOf(input, input.rinseC, supply),
    tankH: liquidEnthalpy(celsius(input.tankC)),
    setH: liquidEnthalpy(celsius(input.setC)),
    coldH: liquidEnthalpy(celsius(input.coldWaterC)),
    rinseH: liquidEnthalpy(celsius(input.rinseC)),
  });
  if (!conditions.ok) return conditions;
  const at = conditions.value;
  const sheet = openWorking('Cleaning in place', [ESTIMATE_CAUTION]);
  const { h } = supply.header;
  const phases: DutyPhase[] = [];
  if (input.part !== 'circuit') phases.push(...tankReheat(sheet, input, at, h));
  if (input.part !== 'tank') phases.push(...wash(sheet, input, at, h), ...rinse(sheet, input, at, h));
  return ok(closeDuty(sheet, phases));
}

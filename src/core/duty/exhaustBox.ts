/**
 * Exhaust box: open containers pass through a steam-filled tunnel before they are closed. Part of the steam blows out
 * at the ends.
 * Source: heat balance; specific heat after Choi and Okos (1986); enthalpies IAPWS R7-97(2012).
 */
import { celsius } from '../quantity/units';
import { fail, ok, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import * as balance from './balance';
import {
  checkContainerFlow,
  CONTAINER_FLOW_RANGES,
  containerHeat,
  contentsKgPerH,
  type ContainerFlow,
} from './containerFlow';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type SteamSupply } from './duty';
import { checkOpenVessel, spell } from './heating';
import { allOf, checkInputs, checkCold, checkRising, plantDefaults, range, type InputRanges } from './inputs';
import { warmUpRate } from './machine';
import { specificHeat, type SpecificHeat } from './specificHeat';
import { openWorking, type WorkingSheet } from './working';

export interface ExhaustBoxInput extends ContainerFlow {
  /** A length of 0 leaves the phase out. */
  readonly warmUpMin: number;
  readonly runMin: number;
  readonly idleMin: number;
  readonly steelKg: number;
  readonly coldC: number;
  readonly chamberC: number;
  readonly shellAreaM2: number;
  readonly ambientC: number;
  readonly surfaceLossWPerM2K: number;
  /** Share of the supplied steam that leaves at the ends while containers pass. */
  readonly escapeFraction: number;
  readonly idleEscapeKgPerH: number;
}

export const EXHAUST_BOX_RANGES: InputRanges<ExhaustBoxInput> = {
  ...CONTAINER_FLOW_RANGES,
  warmUpMin: range('Warm-up', 'min', 0, 240),
  runMin: range('Run', 'min', 0, 10_080),
  idleMin: range('Idling', 'min', 0, 10_080),
  steelKg: range('Steel', 'kg', 0, 20_000),
  coldC: range('Temperature when cold', '°C', 0, 98),
  chamberC: range('Chamber temperature', '°C', 40, 100),
  shellAreaM2: range('Shell surface', 'm²', 0, 500),
  ambientC: range('Room temperature', '°C', 0, 50),
  surfaceLossWPerM2K: range('Surface loss', 'W/m²K', 0, 40),
  escapeFraction: range('Share escaping at the ends', '', 0, 0.95),
  idleEscapeKgPerH: range('Escaping while idling', 'kg/h', 0, 5000),
};

/** The escape has no default: it is the figure that decides, and only the plant knows it. */
export const EXHAUST_BOX_DEFAULTS = plantDefaults<ExhaustBoxInput>({
  containerKJPerKgK: 0.5,
  inC: 40,
  outC: 75,
  warmUpMin: 10,
  idleMin: 10,
  steelKg: 600,
  coldC: 20,
  chamberC: 95,
  shellAreaM2: 12,
  ambientC: 22,
  surfaceLossWPerM2K: 14,
  idleEscapeKgPerH: 60,
});

interface Conditions {
  readonly cp: SpecificHeat;
  readonly coldH: number;
  readonly chamberH: number;
}

function runRate(sheet: WorkingSheet, input: ExhaustBoxInput, specific: SpecificHeat, lossKW: number, dh: number) {
  sheet.section('Run');
  const cp = balance.writeSpecificHeat(sheet, specific);
  const wanted = { symbol: 'q', name: 'Heat wanted', unit: 'kW' };
  const heatKW = balance.sumOf(sheet, wanted, { ...containerHeat(sheet, input, cp), q_loss: lossKW });
  const condensing = balance.steamForPower(sheet, 'ṁ_c', 'Steam condensing', heatKW, dh);
  const name = 'Steam supplied, with what escapes at the ends';
  const supplied = balance.withEscape(sheet, name, condensing, input.escapeFraction);
  const perHour = contentsKgPerH(input);
  if (perHour > 0) sheet.total('Steam per kg of contents', supplied / perHour, 'kg/kg');
  return supplied;
}

function idleRate(sheet: WorkingSheet, input: ExhaustBoxInput, lossKW: number, dh: number): number {
  sheet.section('Idling');
  const ṁ_c = balance.steamForPower(sheet, 'ṁ_c', 'Steam condensing on the shell', lossKW, dh);
  const all = { symbol: 'ṁ', name: 'Steam while idling', unit: 'kg/h' };
  return balance.sumOf(sheet, all, { ṁ_c, ṁ_e: input.idleEscapeKgPerH });
}

const check = (input: ExhaustBoxInput, { ambient }: SteamSupply) =>
  checkInputs(input, EXHAUST_BOX_RANGES) ??
  checkContainerFlow(input, 'Chamber temperature', 'chamberC', input.chamberC) ??
  checkCold(input.coldC, 'Chamber temperature', 'chamberC', input.chamberC) ??
  checkRising([
    ['Room temperature', 'ambientC', input.ambientC],
    ['Chamber temperature', 'chamberC', input.chamberC],
  ]) ??
  checkOpenVessel('Chamber temperature', input.chamberC, ambient, 'chamberC');

/**
 * Steam of an exhaust box's warm-up, run and idling.
 * @returns DUTY-RANGE, DUTY-ORDER or DUTY-BOILING naming field, value and range; STEAM-RANGE.
 */
export function exhaustBox(input: ExhaustBoxInput, supply: SteamSupply): Result<Duty> {
  const bad = check(input, supply);
  if (bad) return fail(bad);
  const conditions = allOf<Conditions>({
    cp: specificHeat(input.product, (input.inC + input.outC) / 2),
    coldH: liquidEnthalpy(celsius(input.coldC)),
    chamberH: liquidEnthalpy(celsius(input.chamberC)),
  });
  if (!conditions.ok) return conditions;
  const { cp, coldH, chamberH } = conditions.value;
  const { surfaceLossWPerM2K, shellAreaM2, chamberC, ambientC, steelKg, coldC } = input;
  const sheet = openWorking('Exhaust box', [ESTIMATE_CAUTION]);
  sheet.section('Steam and losses');
  const dh = balance.heatGivenUp(sheet, supply.header.h, chamberH, chamberC);
  const lossKW = balance.surfaceLoss(sheet, surfaceLossWPerM2K, shellAreaM2, chamberC, ambientC);
  const cold = { steelKg, waterKg: 0, coldC, hotC: chamberC, coldH, hotH: chamberH, lossKW, minutes: input.warmUpMin };
  const phases = [
    ...spell('warmUp', input.warmUpMin, () => {
      sheet.section('Warm-up');
      return warmUpRate(sheet, cold, dh);
    }),
    ...spell('run', input.runMin, () => runRate(sheet, input, cp, lossKW, dh)),
    ...spell('idle', input.idleMin, () => idleRate(sheet, input, lossKW, dh)),
  ];
  return ok(closeDuty(sheet, phases));
}

/**
 * Continuous cookers, hydrostatic and rotary: hours of heating up tens of tonnes of steel and water, then a steady draw
 * for as long as containers pass. Once hot they are neither moved nor stopped: an empty one still draws.
 * Source: heat balance; specific heat after Choi and Okos (1986); enthalpies IAPWS R7-97(2012).
 */
import { celsius } from '../quantity/units';
import { fail, ok, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import { saturationAtTemperature, type Saturation } from '../steam/saturation';
import * as balance from './balance';
import {
  checkContainerFlow,
  CONTAINER_FLOW_RANGES,
  containerHeat,
  contentsKgPerH,
  type ContainerFlow,
} from './containerFlow';
import { closeDuty, ESTIMATE_CAUTION, PROCESS_CAUTION, type Duty, type DutyPhase, type SteamSupply } from './duty';
import { spell } from './heating';
import { allOf, checkInputs, checkCold, checkRising, plantDefaults, range, type InputRanges } from './inputs';
import { specificHeat, type SpecificHeat } from './specificHeat';
import { openWorking, type WorkingSheet } from './working';

export interface ContinuousCookerInput extends ContainerFlow {
  readonly kind: 'hydrostatic' | 'rotary';
  /** A length of 0 leaves the phase out. */
  readonly heatUpMin: number;
  readonly runMin: number;
  /** Hot, without containers. */
  readonly idleMin: number;
  readonly steelKg: number;
  /** Water of the legs; 0 for a rotary cooker. */
  readonly waterKg: number;
  readonly coldC: number;
  readonly processC: number;
  /** Water let in to the legs while it runs, heated to their temperature. */
  readonly legWaterKgPerH: number;
  readonly legWaterInC: number;
  readonly legWaterOutC: number;
  /** Bleeders and valves at the rotors, open all the time. */
  readonly bleedKgPerH: number;
  readonly surfaceAreaM2: number;
  readonly ambientC: number;
  readonly surfaceLossWPerM2K: number;
}

export const CONTINUOUS_COOKER_RANGES: InputRanges<ContinuousCookerInput> = {
  ...CONTAINER_FLOW_RANGES,
  heatUpMin: range('Heating up', 'min', 0, 1440),
  runMin: range('Run', 'min', 0, 10_080),
  idleMin: range('Hot without containers', 'min', 0, 10_080),
  steelKg: range('Steel', 'kg', 0, 300_000),
  waterKg: range('Water in the legs', 'kg', 0, 200_000),
  coldC: range('Temperature when cold', '°C', 0, 99),
  processC: range('Process temperature', '°C', 90, 140),
  legWaterKgPerH: range('Water let in to the legs', 'kg/h', 0, 50_000),
  legWaterInC: range('Leg water before', '°C', 0, 99),
  legWaterOutC: range('Leg water when heated', '°C', 0, 110),
  bleedKgPerH: range('Steam by bleeders', 'kg/h', 0, 5000),
  surfaceAreaM2: range('Surface', 'm²', 0, 2000),
  ambientC: range('Room temperature', '°C', 0, 50),
  surfaceLossWPerM2K: range('Surface loss', 'W/m²K', 0, 40),
};

export const CONTINUOUS_COOKER_DEFAULTS = plantDefaults<ContinuousCookerInput>({
  kind: 'hydrostatic',
  containerKJPerKgK: 0.5,
  inC: 70,
  heatUpMin: 180,
  idleMin: 0,
  steelKg: 40_000,
  waterKg: 20_000,
  coldC: 20,
  processC: 121.1,
  legWaterKgPerH: 1000,
  legWaterInC: 20,
  legWaterOutC: 85,
  bleedKgPerH: 60,
  surfaceAreaM2: 150,
  ambientC: 25,
  surfaceLossWPerM2K: 6,
});

interface Conditions {
  readonly cp: SpecificHeat;
  readonly process: Saturation;
  readonly coldH: number;
  readonly legInH: number;
  readonly legOutH: number;
}

/** Losses grow as the machine gets hot; in so many pieces the greatest draw is kept. */
const HEAT_UP_PIECES = 6;

function heatUp(sheet: WorkingSheet, input: ContinuousCookerInput, at: Conditions, lossKW: number, dh: number) {
  if (input.heatUpMin === 0) return [];
  sheet.section('Heating up');
  const { steelKg, waterKg, coldC, processC, heatUpMin } = input;
  const minutes = heatUpMin / HEAT_UP_PIECES;
  const steel = { symbol: 'Q_steel', name: 'Heat in the steel' };
  const water = { symbol: 'Q_water', name: 'Heat in the water of the legs' };
  const heatKJ = balance.sumOf(
    sheet,
    { symbol: 'Q', name: 'Heat in steel and water', unit: 'kJ' },
    {
      Q_steel: balance.sensibleHeat(sheet, steel, steelKg, balance.STEEL_KJ_PER_KG_K, coldC, processC),
      Q_water: balance.waterHeat(sheet, water, waterKg, at.coldH, at.process.hf),
    },
  );
  const even = balance.steamForHeat(sheet, 'm', 'Steam into steel and water', heatKJ, dh);
  const evenKgPerH = balance.averageRate(sheet, even, heatUpMin);
  return Array.from({ length: HEAT_UP_PIECES }, (_, piece): DutyPhase => {
    const share = (piece + 0.5) / HEAT_UP_PIECES;
    return { kind: 'heatUp', minutes, steamKgPerH: pieceRate(sheet, evenKgPerH, share, lossKW, input.bleedKgPerH, dh) };
  });
}

/** An even rise: at a share of the heat-up the losses have grown to that share. */
const pieceRate = (
  sheet: WorkingSheet,
  even: number,
  share: number,
  lossKW: number,
  bleedKgPerH: number,
  dh: number,
): number =>
  sheet.step({
    symbol: 'ṁ',
    name: 'Steam, with the losses of this piece and the bleeders',
    formula: 'ṁ_m + s · 3600 · q_loss / Δh + ṁ_o',
    unit: 'kg/h',
    source: balance.ENERGY_BALANCE,
    inputs: {
      ṁ_m: [even, 'kg/h'],
      s: [share, ''],
      q_loss: [lossKW, 'kW'],
      Δh: [dh, 'kJ/kg'],
      ṁ_o: [bleedKgPerH, 'kg/h'],
    },
    value: ({ ṁ_m, s, q_loss, Δh, ṁ_o }) => ṁ_m + (s * 3600 * q_loss) / Δh + ṁ_o,
  });

function hotRate(sheet: WorkingSheet, heatKW: number, bleedKgPerH: number, dh: number): number {
  const ṁ_c = balance.steamForPower(sheet, 'ṁ_c', 'Steam condensing', heatKW, dh);
  const all = { symbol: 'ṁ', name: 'Steam, with the bleeders', unit: 'kg/h' };
  return balance.sumOf(sheet, all, { ṁ_c, ṁ_o: bleedKgPerH });
}

function runRate(sheet: WorkingSheet, input: ContinuousCookerInput, at: Conditions, lossKW: number, dh: number) {
  sheet.section('Run');
  const cp = balance.writeSpecificHeat(sheet, at.cp);
  const leg = { symbol: 'q_legs', name: 'Heat into the water of the legs' };
  const heatKW = balance.sumOf(
    sheet,
    { symbol: 'q', name: 'Heat wanted', unit: 'kW' },
    {
      ...containerHeat(sheet, input, cp),
      q_legs: balance.streamPower(sheet, leg, input.legWaterKgPerH, at.legInH, at.legOutH),
      q_loss: lossKW,
    },
  );
  const rate = hotRate(sheet, heatKW, input.bleedKgPerH, dh);
  const perHour = contentsKgPerH(input);
  if (perHour > 0) sheet.total('Steam per kg of contents', rate / perHour, 'kg/kg');
  return rate;
}

const check = (input: ContinuousCookerInput) =>
  checkInputs(input, CONTINUOUS_COOKER_RANGES) ??
  checkContainerFlow(input, 'Process temperature', 'processC', input.processC) ??
  checkCold(input.coldC, 'Process temperature', 'processC', input.processC) ??
  checkRising([
    ['Leg water before', 'legWaterInC', input.legWaterInC],
    ['Leg water when heated', 'legWaterOutC', input.legWaterOutC],
    ['Process temperature', 'processC', input.processC],
  ]);

/**
 * Steam of a continuous cooker's heating up, run, and standing hot without containers.
 * @returns a duty that is never moved; DUTY-RANGE or DUTY-ORDER naming field, value and range; STEAM-RANGE.
 */
export function continuousCooker(input: ContinuousCookerInput, { header }: SteamSupply): Result<Duty> {
  const bad = check(input);
  if (bad) return fail(bad);
  const conditions = allOf<Conditions>({
    cp: specificHeat(input.product, (input.inC + input.outC) / 2),
    process: saturationAtTemperature(celsius(input.processC)),
    coldH: liquidEnthalpy(celsius(input.coldC)),
    legInH: liquidEnthalpy(celsius(input.legWaterInC)),
    legOutH: liquidEnthalpy(celsius(input.legWaterOutC)),
  });
  if (!conditions.ok) return conditions;
  const at = conditions.value;
  const title = input.kind === 'hydrostatic' ? 'Hydrostatic cooker' : 'Rotary cooker';
  const sheet = openWorking(title, [PROCESS_CAUTION, ESTIMATE_CAUTION]);
  sheet.section('Steam and losses');
  const { surfaceLossWPerM2K, surfaceAreaM2, processC, ambientC, bleedKgPerH } = input;
  const dh = balance.heatGivenUp(sheet, header.h, at.process.hf, processC);
  const lossKW = balance.surfaceLoss(sheet, surfaceLossWPerM2K, surfaceAreaM2, processC, ambientC);
  const phases = [
    ...heatUp(sheet, input, at, lossKW, dh),
    ...spell('run', input.runMin, () => runRate(sheet, input, at, lossKW, dh)),
    ...spell('idle', input.idleMin, () => {
      sheet.section('Hot without containers');
      return hotRate(sheet, lossKW, bleedKgPerH, dh);
    }),
  ];
  return ok({ ...closeDuty(sheet, phases), neverMoved: true });
}

/**
 * Evaporator of one or more effects: feed brought to the boil, water boiled off, each effect heated by the vapour of
 * the one before. How much of the ideal economy is reached is a figure of the plant.
 * Source: heat and solids balance of the first effect; enthalpies IAPWS R7-97(2012).
 */
import { celsius } from '../quantity/units';
import { checkRange } from '../quantity/range';
import { fail, ok, problem, type Problem, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import { saturationAtTemperature, type Saturation } from '../steam/saturation';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type SteamSupply } from './duty';
import { EXCHANGER_PRESSURE, exchangerCondensate, spell, type Condensate } from './heating';
import {
  allOf,
  checkInputs,
  checkCold,
  checkRising,
  DUTY_RANGE,
  plantDefaults,
  range,
  type InputRanges,
} from './inputs';
import { warmUpRate } from './machine';
import { specificHeat, type SpecificHeat, type SpecificHeatBasis } from './specificHeat';
import { openWorking, type WorkingSheet } from './working';

export interface EvaporatorInput {
  readonly feedKgPerH: number;
  readonly feedC: number;
  readonly product: SpecificHeatBasis;
  /** Mass fractions of solids in feed and concentrate. */
  readonly solidsIn: number;
  readonly solidsOut: number;
  /** Boiling temperature of the first effect. */
  readonly boilingC: number;
  readonly effects: number;
  /** Water boiled off / (effects times what the first effect boils off). */
  readonly economyShare: number;
  readonly exchangerPressureBarG: number;
  /** A length of 0 leaves the phase out. */
  readonly warmUpMin: number;
  readonly runMin: number;
  readonly idleMin: number;
  readonly steelKg: number;
  readonly waterKg: number;
  readonly coldC: number;
  readonly lossKW: number;
}

export const EVAPORATOR_RANGES: InputRanges<EvaporatorInput> = {
  feedKgPerH: range('Feed', 'kg/h', 0, 200_000),
  feedC: range('Feed temperature', '°C', 0, 120),
  solidsIn: range('Solids in the feed', '', 0.005, 0.9),
  solidsOut: range('Solids in the concentrate', '', 0.01, 0.95),
  boilingC: range('Boiling temperature of the first effect', '°C', 35, 120),
  effects: range('Effects', '', 1, 8),
  economyShare: range('Share of the ideal economy', '', 0.3, 1),
  exchangerPressureBarG: EXCHANGER_PRESSURE,
  warmUpMin: range('Warm-up', 'min', 0, 480),
  runMin: range('Run', 'min', 0, 10_080),
  idleMin: range('Going round on water', 'min', 0, 10_080),
  steelKg: range('Steel', 'kg', 0, 100_000),
  waterKg: range('Water in the plant at the start', 'kg', 0, 100_000),
  coldC: range('Temperature when cold', '°C', 0, 99),
  lossKW: range('Losses', 'kW', 0, 500),
};

/** A share of 0.85 of the ideal economy: from memory. */
export const EVAPORATOR_DEFAULTS = plantDefaults<EvaporatorInput>({
  feedC: 60,
  boilingC: 95,
  effects: 2,
  economyShare: 0.85,
  exchangerPressureBarG: 1,
  warmUpMin: 30,
  idleMin: 0,
  steelKg: 4000,
  waterKg: 1500,
  coldC: 20,
  lossKW: 10,
});

interface Conditions {
  readonly cp: SpecificHeat;
  readonly condensate: Condensate;
  readonly boiling: Saturation;
  readonly coldH: number;
  readonly hotH: number;
}

/** Water boiled off by all effects [kg/h]: what the solids balance leaves. */
const boiledOff = (sheet: WorkingSheet, input: EvaporatorInput): number =>
  sheet.step({
    symbol: 'ṁ_w',
    name: 'Water boiled off',
    formula: 'ṁ_f · (1 − x_in / x_out)',
    unit: 'kg/h',
    source: 'Solids balance',
    inputs: {
      ṁ_f: [input.feedKgPerH, 'kg/h'],
      x_in: [input.solidsIn, ''],
      x_out: [input.solidsOut, ''],
    },
    value: ({ ṁ_f, x_in, x_out }) => ṁ_f * (1 - x_in / x_out),
  });

function runRate(sheet: WorkingSheet, input: EvaporatorInput, at: Conditions, dh: number): number {
  sheet.section('Run');
  const water = boiledOff(sheet, input);
  const q_boil = sheet.step({
    symbol: 'q_boil',
    name: 'Heat to boil off the share of the first effect',
    formula: 'ṁ_w / (n · k) · h_fg / 3600',
    unit: 'kW',
    source: balance.IF97,
    inputs: {
      ṁ_w: [water, 'kg/h'],
      n: [input.effects, ''],
      k: [input.economyShare, ''],
      h_fg: [at.boiling.hfg, 'kJ/kg'],
    },
    value: ({ ṁ_w, n, k, h_fg }) => ((ṁ_w / (n * k)) * h_fg) / 3600,
  });
  const cp = balance.writeSpecificHeat(sheet, at.cp);
  const q_product = balance.productPower(sheet, input.feedKgPerH, cp, input.feedC, input.boilingC);
  const wanted = { symbol: 'q', name: 'Heat wanted', unit: 'kW' };
  const heatKW = balance.sumOf(sheet, wanted, { q_product, q_boil, q_loss: input.lossKW });
  const rate = balance.steamForPower(sheet, 'ṁ', 'Steam while running', heatKW, dh);
  if (rate > 0) sheet.total('Water boiled off per kg of steam', water / rate, 'kg/kg');
  return rate;
}

function checkSolids({ solidsIn, solidsOut }: EvaporatorInput): Problem | undefined {
  if (solidsOut > solidsIn) return undefined;
  const text = `Concentrate must hold more solids than the feed: ${solidsIn} in, ${solidsOut} out.`;
  return problem('DUTY-ORDER', text, 'solidsOut');
}

const check = (input: EvaporatorInput) =>
  checkInputs(input, EVAPORATOR_RANGES) ??
  checkRange(
    DUTY_RANGE,
    { ...EVAPORATOR_RANGES.effects, name: 'Whole number of effects' },
    Number.isInteger(input.effects) ? input.effects : Number.NaN,
    'effects',
  ) ??
  checkSolids(input) ??
  checkRising([
    ['Feed temperature', 'feedC', input.feedC],
    ['Boiling temperature of the first effect', 'boilingC', input.boilingC],
  ]) ??
  checkCold(input.coldC, 'Boiling temperature of the first effect', 'boilingC', input.boilingC);

/**
 * Steam of an evaporator's warm-up, run, and going round on water without boiling (losses only).
 * @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; DUTY-EXCHANGER, STEAM-THROTTLE, STEAM-RANGE.
 */
export function evaporator(input: EvaporatorInput, supply: SteamSupply): Result<Duty> {
  const bad = check(input);
  if (bad) return fail(bad);
  const { boilingC, coldC, steelKg, waterKg, lossKW, warmUpMin } = input;
  const conditions = allOf<Conditions>({
    cp: specificHeat(input.product, (input.feedC + boilingC) / 2),
    condensate: exchangerCondensate(input.exchangerPressureBarG, boilingC, supply),
    boiling: saturationAtTemperature(celsius(boilingC)),
    coldH: liquidEnthalpy(celsius(coldC)),
    hotH: liquidEnthalpy(celsius(boilingC)),
  });
  if (!conditions.ok) return conditions;
  const at = conditions.value;
  const sheet = openWorking('Evaporator', [ESTIMATE_CAUTION]);
  sheet.section('Steam');
  const dh = balance.heatGivenUp(sheet, supply.header.h, at.condensate.h, at.condensate.celsius);
  const cold = { steelKg, waterKg, coldC, hotC: boilingC, coldH: at.coldH, hotH: at.hotH, lossKW, minutes: warmUpMin };
  const phases = [
    ...spell('warmUp', warmUpMin, () => {
      sheet.section('Warm-up');
      return warmUpRate(sheet, cold, dh);
    }),
    ...spell('run', input.runMin, () => runRate(sheet, input, at, dh)),
    ...spell('idle', input.idleMin, () => {
      sheet.section('Going round on water');
      return balance.steamForPower(sheet, 'ṁ', 'Steam while going round', lossKW, dh);
    }),
  ];
  return ok(closeDuty(sheet, phases));
}

/**
 * Tunnel pasteuriser: closed containers under sprays, zone by zone; cooling zones warm the entering containers. Steam
 * heats what that regeneration leaves over, the water that overflows, and the losses.
 * Source: heat balance; specific heat after Choi and Okos (1986); enthalpies IAPWS R7-97(2012).
 */
import { celsius } from '../quantity/units';
import { fail, ok, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import * as balance from './balance';
import { checkContainerFlow, CONTAINER_FLOW_RANGES, containerHeat, type ContainerFlow } from './containerFlow';
import { closeDuty, ESTIMATE_CAUTION, PROCESS_CAUTION, type Duty, type SteamSupply } from './duty';
import { checkOpenVessel, condensateOf, EXCHANGER_PRESSURE, spell, type Condensate, type Heating } from './heating';
import { allOf, checkInputs, checkCold, checkRising, plantDefaults, range, type InputRanges } from './inputs';
import { warmUpRate } from './machine';
import { specificHeat, type SpecificHeat } from './specificHeat';
import { openWorking, type WorkingSheet } from './working';

/** `outC` of the flow is the contents' temperature on leaving the hottest zone. */
export interface TunnelPasteuriserInput extends ContainerFlow, Heating {
  /** Share of the containers' heat that cooling zones give back to entering ones. */
  readonly regeneration: number;
  /** A length of 0 leaves the phase out. */
  readonly warmUpMin: number;
  readonly runMin: number;
  readonly idleMin: number;
  readonly steelKg: number;
  readonly waterKg: number;
  readonly coldC: number;
  /** Hottest spray zone. */
  readonly sprayC: number;
  readonly overflowKgPerH: number;
  readonly makeUpC: number;
  readonly shellAreaM2: number;
  readonly ambientC: number;
  readonly surfaceLossWPerM2K: number;
}

export const TUNNEL_PASTEURISER_RANGES: InputRanges<TunnelPasteuriserInput> = {
  ...CONTAINER_FLOW_RANGES,
  exchangerPressureBarG: EXCHANGER_PRESSURE,
  regeneration: range('Regeneration', '', 0, 0.9),
  warmUpMin: range('Warm-up', 'min', 0, 480),
  runMin: range('Run', 'min', 0, 10_080),
  idleMin: range('Idling', 'min', 0, 10_080),
  steelKg: range('Steel', 'kg', 0, 100_000),
  waterKg: range('Water in the zones', 'kg', 0, 100_000),
  coldC: range('Temperature when cold', '°C', 0, 90),
  sprayC: range('Spray temperature', '°C', 40, 99),
  overflowKgPerH: range('Overflow', 'kg/h', 0, 50_000),
  makeUpC: range('Fresh water temperature', '°C', 0, 90),
  shellAreaM2: range('Shell surface', 'm²', 0, 1000),
  ambientC: range('Room temperature', '°C', 0, 50),
  surfaceLossWPerM2K: range('Surface loss', 'W/m²K', 0, 40),
};

export const TUNNEL_PASTEURISER_DEFAULTS = plantDefaults<TunnelPasteuriserInput>({
  heating: 'exchanger',
  exchangerPressureBarG: 3,
  containerKJPerKgK: 0.84,
  regeneration: 0.4,
  warmUpMin: 60,
  idleMin: 0,
  steelKg: 12_000,
  waterKg: 8000,
  coldC: 20,
  overflowKgPerH: 500,
  makeUpC: 15,
  shellAreaM2: 100,
  ambientC: 22,
  surfaceLossWPerM2K: 10,
});

interface Conditions {
  readonly cp: SpecificHeat;
  readonly condensate: Condensate;
  readonly coldH: number;
  readonly sprayH: number;
  readonly makeUpH: number;
}

function runRate(sheet: WorkingSheet, input: TunnelPasteuriserInput, at: Conditions, lossKW: number, dh: number) {
  sheet.section('Run');
  const cp = balance.writeSpecificHeat(sheet, at.cp);
  const { q_product, q_container } = containerHeat(sheet, input, cp);
  const q_load = sheet.step({
    symbol: 'q_load',
    name: 'Heat into the containers after regeneration',
    formula: '(q_product + q_container) · (1 − R)',
    unit: 'kW',
    source: balance.ENERGY_BALANCE,
    inputs: { q_product: [q_product, 'kW'], q_container: [q_container, 'kW'], R: [input.regeneration, ''] },
    value: (of) => (of.q_product + of.q_container) * (1 - of.R),
  });
  const fresh = { symbol: 'q_fresh', name: 'Heat into the water that replaces the overflow' };
  const q_fresh = balance.streamPower(sheet, fresh, input.overflowKgPerH, at.makeUpH, at.sprayH);
  const wanted = { symbol: 'q', name: 'Heat wanted', unit: 'kW' };
  const heatKW = balance.sumOf(sheet, wanted, { q_load, q_fresh, q_loss: lossKW });
  return balance.steamForPower(sheet, 'ṁ', 'Steam while running', heatKW, dh);
}

const check = (input: TunnelPasteuriserInput, { ambient }: SteamSupply) =>
  checkInputs(input, TUNNEL_PASTEURISER_RANGES) ??
  checkContainerFlow(input, 'Spray temperature', 'sprayC', input.sprayC) ??
  checkCold(input.coldC, 'Spray temperature', 'sprayC', input.sprayC) ??
  checkRising([
    ['Fresh water temperature', 'makeUpC', input.makeUpC],
    ['Spray temperature', 'sprayC', input.sprayC],
  ]) ??
  checkRising([
    ['Room temperature', 'ambientC', input.ambientC],
    ['Spray temperature', 'sprayC', input.sprayC],
  ]) ??
  checkOpenVessel('Spray temperature', input.sprayC, ambient, 'sprayC');

/**
 * Steam of a tunnel pasteuriser's warm-up, run and idling.
 * @returns DUTY-RANGE, DUTY-ORDER or DUTY-BOILING naming field, value and range; DUTY-EXCHANGER, STEAM-THROTTLE,
 * STEAM-RANGE.
 */
export function tunnelPasteuriser(input: TunnelPasteuriserInput, supply: SteamSupply): Result<Duty> {
  const bad = check(input, supply);
  if (bad) return fail(bad);
  const conditions = allOf<Conditions>({
    cp: specificHeat(input.product, (input.inC + input.outC) / 2),
    condensate: condensateOf(input, input.sprayC, supply),
    coldH: liquidEnthalpy(celsius(input.coldC)),
    sprayH: liquidEnthalpy(celsius(input.sprayC)),
    makeUpH: liquidEnthalpy(celsius(input.makeUpC)),
  });
  if (!conditions.ok) return conditions;
  const at = conditions.value;
  const { surfaceLossWPerM2K, shellAreaM2, sprayC: hotC, ambientC, steelKg, waterKg, coldC, warmUpMin } = input;
  const sheet = openWorking('Tunnel pasteuriser', [PROCESS_CAUTION, ESTIMATE_CAUTION]);
  sheet.section('Steam and losses');
  const dh = balance.heatGivenUp(sheet, supply.header.h, at.condensate.h, at.condensate.celsius);
  const lossKW = balance.surfaceLoss(sheet, surfaceLossWPerM2K, shellAreaM2, hotC, ambientC);
  const phases = [
    ...spell('warmUp', warmUpMin, () => {
      sheet.section('Warm-up');
      const cold = { steelKg, waterKg, coldC, hotC, coldH: at.coldH, hotH: at.sprayH, lossKW, minutes: warmUpMin };
      return warmUpRate(sheet, cold, dh);
    }),
    ...spell('run', input.runMin, () => runRate(sheet, input, at, lossKW, dh)),
    ...spell('idle', input.idleMin, () => {
      sheet.section('Idling');
      return balance.steamForPower(sheet, 'ṁ', 'Steam while idling', lossKW, dh);
    }),
  ];
  return ok(closeDuty(sheet, phases));
}

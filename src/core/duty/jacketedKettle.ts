/**
 * Steam-jacketed kettle: heat-up of a well-stirred batch by a jacket at constant temperature, boiling off, holding.
 * The draw is greatest when the steam is turned on and falls exponentially.
 * Source: lumped heat balance, confirmed by the kettle table of Oklahoma State University Extension, "Steam Kettle
 * Hookup"; enthalpies IAPWS R7-97(2012).
 */
import { toAbsolute } from '../quantity/pressure';
import { shortNumber } from '../quantity/range';
import { barGauge, celsius } from '../quantity/units';
import { fail, ok, problem, type Result } from '../result';
import { saturationAtPressure, saturationAtTemperature, type Saturation } from '../steam/saturation';
import { throttle, type SteamState } from '../steam/steamState';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type DutyPhase, type SteamSupply } from './duty';
import { fallingRate, heatUpPieces, pieceSteamKg, type FallingRate } from './fallingRate';
import { allOf } from './inputs';
import { checkJacketedKettle, type JacketedKettleInput } from './jacketedKettleInput';
import { specificHeat, type SpecificHeat } from './specificHeat';
import { openWorking, type WorkingSheet } from './working';

interface Conditions {
  readonly cp: SpecificHeat;
  readonly jacket: SteamState;
  readonly jacketSaturation: Saturation;
  readonly boiling: Saturation;
}

/** Least difference that still heats [K]: closer, the heat-up would take for ever. */
const LEAST_DIFFERENCE_K = 1;

function conditionsOf(input: JacketedKettleInput, supply: SteamSupply): Result<Conditions> {
  const jacketPressure = toAbsolute(barGauge(input.jacketPressureBarG), supply.ambient);
  const conditions = allOf<Conditions>({
    cp: specificHeat(input.product, (input.startC + input.endC) / 2),
    jacket: throttle(supply.header, jacketPressure),
    jacketSaturation: saturationAtPressure(jacketPressure),
    boiling: saturationAtTemperature(celsius(input.endC)),
  });
  if (!conditions.ok) return conditions;
  const { temperature } = conditions.value.jacketSaturation;
  if (temperature - input.endC >= LEAST_DIFFERENCE_K) return conditions;
  const need = shortNumber(input.endC + LEAST_DIFFERENCE_K);
  const text = `The jacket condenses at ${shortNumber(temperature)} °C; it must be at least ${need} °C to heat the batch.`;
  return fail(problem('DUTY-JACKET', `${text} Raise the jacket pressure.`, 'jacketPressureBarG'));
}

/** What all phases share, written down as it is worked out. */
interface Common {
  readonly capacityKJPerK: number;
  readonly uaKWPerK: number;
  readonly jacketC: number;
  /** Given up per kg of header steam. */
  readonly dh: number;
}

function common(sheet: WorkingSheet, input: JacketedKettleInput, header: SteamState, at: Conditions): Common {
  sheet.section('Kettle and jacket');
  const cp = balance.writeSpecificHeat(sheet, at.cp);
  const capacityKJPerK = sheet.step({
    symbol: 'C',
    name: 'Heat capacity of batch and kettle',
    formula: 'M · c_p + m_steel · c_steel',
    unit: 'kJ/K',
    source: balance.ENERGY_BALANCE,
    inputs: {
      M: [input.batchKg, 'kg'],
      c_p: [cp, 'kJ/kgK'],
      m_steel: [input.kettleSteelKg, 'kg'],
      c_steel: [balance.STEEL_KJ_PER_KG_K, 'kJ/kgK'],
    },
    value: ({ M, c_p, m_steel, c_steel }) => M * c_p + m_steel * c_steel,
  });
  const uaKWPerK = sheet.step({
    symbol: 'UA',
    name: 'Heat transfer of the jacket',
    formula: 'U · A / 1000',
    unit: 'kW/K',
    source: 'Figure of the plant',
    inputs: { U: [input.heatTransferWPerM2K, 'W/m²K'], A: [input.jacketAreaM2, 'm²'] },
    value: ({ U, A }) => (U * A) / 1000,
  });
  const jacketC = at.jacketSaturation.temperature;
  const dh = balance.heatGivenUp(sheet, header.h, at.jacketSaturation.hf, jacketC);
  if (at.jacket.kind === 'wet') sheet.total('Dryness of the steam in the jacket', at.jacket.dryness, '');
  return { capacityKJPerK, uaKWPerK, jacketC, dh };
}

function heatUpMinutes(sheet: WorkingSheet, input: JacketedKettleInput, { capacityKJPerK, uaKWPerK, jacketC }: Common) {
  return sheet.step({
    symbol: 't',
    name: 'Time to heat up',
    formula: 'C / UA · ln((T_j − T_1) / (T_j − T_2)) / 60',
    unit: 'min',
    source: 'Lumped heat balance, jacket at constant temperature',
    inputs: {
      C: [capacityKJPerK, 'kJ/K'],
      UA: [uaKWPerK, 'kW/K'],
      T_j: [jacketC, '°C'],
      T_1: [input.startC, '°C'],
      T_2: [input.endC, '°C'],
    },
    value: ({ C, UA, T_j, T_1, T_2 }) => ((C / UA) * Math.log((T_j - T_1) / (T_j - T_2))) / 60,
  });
}

/** Steam rate [kg/h] while the batch is at a temperature. */
function rateAt(sheet: WorkingSheet, symbol: string, name: string, batchC: number, lossKW: number, at: Common): number {
  return sheet.step({
    symbol,
    name,
    formula: '3600 · (UA · (T_j − T) + q_loss) / Δh',
    unit: 'kg/h',
    source: balance.ENERGY_BALANCE,
    inputs: {
      UA: [at.uaKWPerK, 'kW/K'],
      T_j: [at.jacketC, '°C'],
      T: [batchC, '°C'],
      q_loss: [lossKW, 'kW'],
      Δh: [at.dh, 'kJ/kg'],
    },
    value: ({ UA, T_j, T, q_loss, Δh }) => (3600 * (UA * (T_j - T) + q_loss)) / Δh,
  });
}

/**
 * The draw of a kettle from steam on until its batch is hot: peak and fall.
 * @returns as {@link jacketedKettle}.
 */
export function kettleHeatUp(input: JacketedKettleInput, supply: SteamSupply): Result<FallingRate> {
  const bad = checkJacketedKettle(input);
  if (bad) return fail(bad);
  const at = conditionsOf(input, supply);
  if (!at.ok) return at;
  const sheet = openWorking('', []);
  const shared = common(sheet, input, supply.header, at.value);
  return ok(curveOf(sheet, input, shared));
}

function curveOf(sheet: WorkingSheet, input: JacketedKettleInput, shared: Common): FallingRate {
  const minutes = heatUpMinutes(sheet, input, shared);
  const peak = rateAt(sheet, 'ṁ_0', 'Steam when it is turned on: the peak', input.startC, input.heatingLossKW, shared);
  const end = rateAt(sheet, 'ṁ_1', 'Steam at the end', input.endC, input.heatingLossKW, shared);
  const lossKgPerH = (3600 * input.heatingLossKW) / shared.dh;
  return fallingRate({ peakKgPerH: peak, endKgPerH: end, floorKgPerH: lossKgPerH, minutes });
}

function heatUp(sheet: WorkingSheet, input: JacketedKettleInput, shared: Common): DutyPhase[] {
  sheet.section('Heat-up');
  const curve = curveOf(sheet, input, shared);
  const heatKJ = sheet.step({
    symbol: 'Q',
    name: 'Heat into batch, kettle and losses',
    formula: 'C · (T_2 − T_1) + 60 · q_loss · t',
    unit: 'kJ',
    source: balance.ENERGY_BALANCE,
    inputs: {
      C: [shared.capacityKJPerK, 'kJ/K'],
      T_1: [input.startC, '°C'],
      T_2: [input.endC, '°C'],
      q_loss: [input.heatingLossKW, 'kW'],
      t: [curve.minutes, 'min'],
    },
    value: ({ C, T_1, T_2, q_loss, t }) => C * (T_2 - T_1) + 60 * q_loss * t,
  });
  const kg = balance.steamForHeat(sheet, 'm', 'Steam to heat up', heatKJ, shared.dh);
  balance.averageRate(sheet, kg, curve.minutes);
  return heatUpPieces(curve).map(({ startMin, endMin }) => ({
    kind: 'heatUp',
    minutes: endMin - startMin,
    steamKgPerH: (60 * pieceSteamKg(curve, startMin, endMin)) / (endMin - startMin),
  }));
}

function boilOff(sheet: WorkingSheet, input: JacketedKettleInput, shared: Common, boiling: Saturation): DutyPhase[] {
  if (input.boilOffKg === 0) return [];
  sheet.section('Boiling off');
  const minutes = sheet.step({
    symbol: 't',
    name: 'Time to boil off',
    formula: 'm_w · h_fg / (UA · (T_j − T)) / 60',
    unit: 'min',
    source: balance.IF97,
    inputs: {
      m_w: [input.boilOffKg, 'kg'],
      h_fg: [boiling.hfg, 'kJ/kg'],
      UA: [shared.uaKWPerK, 'kW/K'],
      T_j: [shared.jacketC, '°C'],
      T: [input.endC, '°C'],
    },
    value: ({ m_w, h_fg, UA, T_j, T }) => (m_w * h_fg) / (UA * (T_j - T)) / 60,
  });
  const steamKgPerH = rateAt(sheet, 'ṁ', 'Steam while boiling off', input.endC, input.heatingLossKW, shared);
  return [{ kind: 'boilOff', minutes, steamKgPerH }];
}

function hold(sheet: WorkingSheet, input: JacketedKettleInput, { dh }: Common): DutyPhase[] {
  if (input.holdMin === 0) return [];
  sheet.section('Holding');
  const steamKgPerH = balance.steamForPower(sheet, 'ṁ', 'Steam while holding', input.holdLossKW, dh);
  return [{ kind: 'hold', minutes: input.holdMin, steamKgPerH }];
}

/**
 * Steam of a kettle's heat-up (in pieces that keep the kg and the peak), boiling off and hold.
 * @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; DUTY-JACKET when the jacket is too cold;
 * STEAM-THROTTLE when the header's pressure is below the jacket's; STEAM-RANGE.
 */
export function jacketedKettle(input: JacketedKettleInput, supply: SteamSupply): Result<Duty> {
  const bad = checkJacketedKettle(input);
  if (bad) return fail(bad);
  const at = conditionsOf(input, supply);
  if (!at.ok) return at;
  const sheet = openWorking('Jacketed kettle', [ESTIMATE_CAUTION]);
  const shared = common(sheet, input, supply.header, at.value);
  return ok(
    closeDuty(sheet, [
      ...heatUp(sheet, input, shared),
      ...boilOff(sheet, input, shared, at.value.boiling),
      ...hold(sheet, input, shared),
    ]),
  );
}

/**
 * Heating water for cleaning by blowing steam into it; the steam stays in it as water.
 * Source: heat balance M c (T2 - T1) = m_s (h - h_w(T2)); enthalpies IAPWS R7-97(2012).
 */
import { celsius } from '../quantity/units';
import { fail, ok, problem, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type SteamSupply } from './duty';
import { checkInputs, plantDefaults, range, type InputRanges } from './inputs';
import { openWorking } from './working';

export interface WaterHeatingInput {
  readonly kind: 'rinse' | 'wash';
  readonly waterKg: number;
  readonly fromC: number;
  readonly toC: number;
  /** Time in which the steam is drawn. */
  readonly minutes: number;
}

export const WATER_HEATING_RANGES: InputRanges<WaterHeatingInput> = {
  waterKg: range('Water', 'kg', 1, 100_000),
  fromC: range('Water temperature before', '°C', 0, 99),
  toC: range('Water temperature after', '°C', 1, 99),
  minutes: range('Heating time', 'min', 0.1, 1440),
};

export const WATER_HEATING_DEFAULTS = plantDefaults<WaterHeatingInput>({
  kind: 'wash',
  fromC: 15,
  toC: 82,
  minutes: 10,
});

/** Mean over 10 to 90 degC at atmospheric pressure, in round figures. */
const WATER_KJ_PER_KG_K = 4.187;

/**
 * Steam to heat water by direct injection at an even rate.
 * @returns DUTY-RANGE or DUTY-ORDER naming field, value and range; STEAM-RANGE.
 */
export function waterHeating(input: WaterHeatingInput, { header }: SteamSupply): Result<Duty> {
  const bad = checkInputs(input, WATER_HEATING_RANGES);
  if (bad) return fail(bad);
  const { kind, waterKg, fromC, toC, minutes } = input;
  if (toC <= fromC) {
    return fail(problem('DUTY-ORDER', `Water must end hotter than it starts: ${fromC} to ${toC} °C.`, 'toC'));
  }
  const hot = liquidEnthalpy(celsius(toC));
  if (!hot.ok) return hot;
  const sheet = openWorking('Heating water by direct steam', [ESTIMATE_CAUTION]);
  const water = { symbol: 'Q', name: 'Heat into the water' };
  const heatKJ = balance.sensibleHeat(sheet, water, waterKg, WATER_KJ_PER_KG_K, fromC, toC);
  const dh = balance.heatGivenUp(sheet, header.h, hot.value, toC);
  const kg = balance.steamForHeat(sheet, 'm', 'Steam blown in', heatKJ, dh);
  sheet.total('Steam added / water', kg / waterKg, '');
  return ok(closeDuty(sheet, [{ kind, minutes, steamKgPerH: balance.averageRate(sheet, kg, minutes) }]));
}

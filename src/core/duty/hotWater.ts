/**
 * Hot water for make-up and wash-down, from a store and a heater: what the store holds is heated again afterwards,
 * over hours if need be; what is drawn beyond it is heated as it flows.
 * Source: heat balance; enthalpies IAPWS R7-97(2012).
 */
import { celsius, type BarAbsolute } from '../quantity/units';
import { fail, ok, type Problem, type Result } from '../result';
import { liquidEnthalpy } from '../steam/fluid';
import * as balance from './balance';
import { closeDuty, ESTIMATE_CAUTION, type Duty, type SteamSupply } from './duty';
import { checkOpenVessel, condensateOf, EXCHANGER_PRESSURE, spell, type Condensate, type Heating } from './heating';
import { allOf, checkInputs, checkRising, plantDefaults, range, type InputRanges } from './inputs';
import { openWorking, type WorkingSheet } from './working';

export interface HotWaterInput extends Heating {
  readonly use: 'makeUp' | 'washDown';
  readonly waterKg: number;
  readonly coldC: number;
  readonly hotC: number;
  /** Time in which the water is drawn. */
  readonly drawMin: number;
  /** Hot in store when the draw begins; 0 for a heater without a store. */
  readonly storeKg: number;
  /** Time in which the water taken from the store is heated again. */
  readonly reheatMin: number;
  readonly lossKW: number;
}

export const HOT_WATER_RANGES: InputRanges<HotWaterInput> = {
  exchangerPressureBarG: EXCHANGER_PRESSURE,
  waterKg: range('Water drawn', 'kg', 1, 500_000),
  coldC: range('Cold water', '°C', 0, 98),
  hotC: range('Hot water', '°C', 1, 99),
  drawMin: range('Time of the draw', 'min', 0.1, 1440),
  storeKg: range('Water in store', 'kg', 0, 500_000),
  reheatMin: range('Time to heat the store again', 'min', 0.1, 2880),
  lossKW: range('Losses', 'kW', 0, 200),
};

export const HOT_WATER_DEFAULTS = plantDefaults<HotWaterInput>({
  use: 'washDown',
  heating: 'exchanger',
  exchangerPressureBarG: 3,
  coldC: 15,
  hotC: 60,
  drawMin: 30,
  storeKg: 0,
  reheatMin: 120,
  lossKW: 2,
});

interface Conditions {
  readonly condensate: Condensate;
  readonly coldH: number;
  readonly hotH: number;
}

function heatingRate(sheet: WorkingSheet, kg: number, minutes: number, lossKW: number, at: Conditions, dh: number) {
  const water = { symbol: 'Q_water', name: 'Heat into the water' };
  const heatKJ = balance.sumOf(
    sheet,
    { symbol: 'Q', name: 'Heat into the water, and lost', unit: 'kJ' },
    {
      Q_water: balance.waterHeat(sheet, water, kg, at.coldH, at.hotH),
      Q_loss: balance.lostHeat(sheet, 'Lost in this time', lossKW, minutes),
    },
  );
  const steamKg = balance.steamForHeat(sheet, 'm', 'Steam', heatKJ, dh);
  return balance.averageRate(sheet, steamKg, minutes);
}

const check = (input: HotWaterInput, ambient: BarAbsolute): Problem | undefined =>
  checkInputs(input, HOT_WATER_RANGES) ??
  checkRising([
    ['Cold water', 'coldC', input.coldC],
    ['Hot water', 'hotC', input.hotC],
  ]) ??
  checkOpenVessel('Hot water', input.hotC, ambient, 'hotC');

/**
 * Steam for a draw of hot water, and for heating its store again.
 * @returns DUTY-RANGE, DUTY-ORDER or DUTY-BOILING naming field, value and range; DUTY-EXCHANGER, STEAM-THROTTLE,
 * STEAM-RANGE.
 */
export function hotWater(input: HotWaterInput, supply: SteamSupply): Result<Duty> {
  const bad = check(input, supply.ambient);
  if (bad) return fail(bad);
  const conditions = allOf<Conditions>({
    condensate: condensateOf(input, input.hotC, supply),
    coldH: liquidEnthalpy(celsius(input.coldC)),
    hotH: liquidEnthalpy(celsius(input.hotC)),
  });
  if (!conditions.ok) return conditions;
  const at = conditions.value;
  const { use, waterKg, storeKg, drawMin, lossKW } = input;
  const sheet = openWorking(use === 'makeUp' ? 'Hot make-up water' : 'Wash-down', [ESTIMATE_CAUTION]);
  sheet.section('Steam');
  const dh = balance.heatGivenUp(sheet, supply.header.h, at.condensate.h, at.condensate.celsius);
  const fromStoreKg = Math.min(waterKg, storeKg);
  const reheatMin = fromStoreKg > 0 ? input.reheatMin : 0;
  const phases = [
    ...spell(use === 'makeUp' ? 'run' : 'wash', drawMin, () => {
      sheet.section('While water is drawn');
      return heatingRate(sheet, waterKg - fromStoreKg, drawMin, lossKW, at, dh);
    }),
    ...spell('heatUp', reheatMin, () => {
      sheet.section('Heating the store again');
      return heatingRate(sheet, fromStoreKg, reheatMin, lossKW, at, dh);
    }),
  ];
  return ok(closeDuty(sheet, phases));
}

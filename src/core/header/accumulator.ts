/**
 * Hot water under pressure that takes steam in and gives it up as the pressure slides between two figures.
 * Source: heat balance of saturated water at equilibrium, dm/m = (dh_f − v_f dp) / h_fg integrated; IAPWS R7-97(2012).
 */
import type { Accumulator, Header, PlantModel } from '../plant/plant';
import { ENERGY_BALANCE, IF97 } from '../duty/balance';
import { ESTIMATE_CAUTION } from '../duty/duty';
import { allOf, checkInputs, range, type InputRanges } from '../duty/inputs';
import { openWorking, type Working } from '../duty/working';
import { toAbsolute } from '../quantity/pressure';
import { barAbsolute, barGauge } from '../quantity/units';
import { fail, ok, problem, type Result } from '../result';
import { accumulatorReleaseKg } from '../steam/flash';
import { saturationAtPressure, type Saturation } from '../steam/saturation';
import type { SteamState } from '../steam/steamState';
import { headerSteam } from './headerSteam';
import { feedPath } from './network';

/** What of an accumulator makes its store. */
export type AccumulatorStore = Pick<
  Accumulator,
  'waterTonnes' | 'highBarG' | 'lowBarG' | 'greatestChargeKgPerH' | 'greatestDischargeKgPerH' | 'shareAtWeekStart'
>;

export const ACCUMULATOR_RANGES: InputRanges<AccumulatorStore> = {
  waterTonnes: range('Water', 't', 0.1, 1000),
  highBarG: range('Charged up to', 'bar g', 0.1, 40),
  lowBarG: range('Discharged down to', 'bar g', 0, 39),
  greatestChargeKgPerH: range('Greatest charge', 'kg/h', 0, 200_000),
  greatestDischargeKgPerH: range('Greatest discharge', 'kg/h', 0, 200_000),
  shareAtWeekStart: range('In store at the start of the week', '', 0, 1),
};

export interface AccumulatorFigures {
  /** What it gives up from its high to its low pressure. [kg] */
  readonly capacityKg: number;
  /** Steam taken in for each kg that it can give up again. [kg/kg] */
  readonly chargePerKg: number;
  /** What it gives up, and its water, at the mean of the two pressures. [kJ/kg] */
  readonly dischargedH: number;
  readonly waterH: number;
  readonly working: Working;
}

/**
 * What an accumulator holds, charged with steam of a state. A kg of charging steam leaves 1 / chargePerKg kg to give up
 * and the rest as water (drained, or made up where it is less than nothing), by the heat at the mean pressure.
 * @returns DUTY-RANGE naming field, value and range; DUTY-ORDER where low is not below high; STEAM-RANGE.
 */
export function accumulatorFigures(
  store: AccumulatorStore,
  charging: SteamState,
  ambientBarA: number,
): Result<AccumulatorFigures> {
  const bad = checkInputs(store, ACCUMULATOR_RANGES) ?? checkPressures(store);
  if (bad) return fail(bad);
  const pressureOf = (barG: number) => toAbsolute(barGauge(barG), barAbsolute(ambientBarA));
  const meanBarG = (store.highBarG + store.lowBarG) / 2;
  const at = allOf<{ released: number; mean: Saturation }>({
    released: accumulatorReleaseKg(pressureOf(store.highBarG), pressureOf(store.lowBarG), 1),
    mean: saturationAtPressure(pressureOf(meanBarG)),
  });
  if (!at.ok) return at;
  const sheet = openWorking('Accumulator', [ESTIMATE_CAUTION]);
  const { released, mean } = at.value;
  sheet.section('Steam in store');
  const capacityKg = writeCapacity(sheet, store, released);
  sheet.section('Charging');
  const chargePerKg = writeCharge(sheet, mean, charging);
  sheet.total('Steam in store when full', capacityKg, 'kg');
  return ok({ capacityKg, chargePerKg, dischargedH: mean.hg, waterH: mean.hf, working: sheet.finish() });
}

function checkPressures({ highBarG, lowBarG }: AccumulatorStore) {
  if (lowBarG < highBarG) return undefined;
  const text = `Discharged down to ${lowBarG} bar g and charged up to ${highBarG}; the first must be lower.`;
  return problem('DUTY-ORDER', text, 'lowBarG');
}

function writeCapacity(sheet: ReturnType<typeof openWorking>, store: AccumulatorStore, released: number): number {
  const share = sheet.step({
    symbol: 'y',
    name: `Share of the water that is given up as steam from ${store.highBarG} to ${store.lowBarG} bar g`,
    formula: '1 − exp(−∫ (dh_f − v_f dp) / h_fg)',
    unit: '',
    source: `Heat balance of saturated water at equilibrium; ${IF97}`,
    inputs: { p_1: [store.highBarG, 'bar g'], p_2: [store.lowBarG, 'bar g'] },
    value: () => released,
  });
  return sheet.step({
    symbol: 'm_s',
    name: 'Steam that it can give up when full',
    formula: '1000 · M · y',
    unit: 'kg',
    source: 'Mass balance',
    inputs: { M: [store.waterTonnes, 't'], y: [share, ''] },
    value: ({ M, y }) => 1000 * M * y,
  });
}

function writeCharge(sheet: ReturnType<typeof openWorking>, mean: Saturation, charging: SteamState): number {
  return sheet.step({
    symbol: 'k',
    name: 'Steam to take in for each kg given up, at the mean pressure',
    formula: '(h_g − h_f) / (h − h_f)',
    unit: 'kg/kg',
    source: ENERGY_BALANCE,
    inputs: { h_g: [mean.hg, 'kJ/kg'], h_f: [mean.hf, 'kJ/kg'], h: [charging.h, 'kJ/kg'] },
    value: ({ h_g, h_f, h }) => (h_g - h_f) / (h - h_f),
  });
}

/** An accumulator that works on the plant, with the headers that it loads and relieves, its own first. */
export interface PlacedAccumulator {
  readonly accumulator: Accumulator;
  readonly figures: AccumulatorFigures;
  readonly charges: readonly string[];
  readonly relieves: readonly string[];
}

/** A header at an end of an accumulator. */
type End = Pick<Header, 'name' | 'pressureBarG' | 'dryness' | 'superheatK'>;

/**
 * An accumulator between two headers of the plant.
 * @returns as {@link accumulatorFigures}; DUTY-ORDER under `highBarG` or `lowBarG` where a header's pressure does not reach
 * the one or is above the other.
 */
export function accumulatorBetween(
  store: AccumulatorStore,
  from: End,
  into: End,
  ambientBarA: number,
): Result<AccumulatorFigures> {
  if (store.highBarG > from.pressureBarG) {
    const text = `Charged up to ${store.highBarG} bar g; ${from.name} has ${from.pressureBarG} bar g.`;
    return fail(problem('DUTY-ORDER', text, 'highBarG'));
  }
  if (store.lowBarG < into.pressureBarG) {
    const text = `Discharged down to ${store.lowBarG} bar g; ${into.name} has ${into.pressureBarG} bar g.`;
    return fail(problem('DUTY-ORDER', text, 'lowBarG'));
  }
  const steam = headerSteam(from, ambientBarA);
  return steam.ok ? accumulatorFigures(store, steam.value, ambientBarA) : steam;
}

/** The accumulators that can be worked out; one whose headers or pressures do not fit carries nothing. */
export function placedAccumulators(plant: PlantModel): PlacedAccumulator[] {
  return (plant.accumulators ?? []).flatMap((accumulator) => {
    const { chargedFromHeaderId, feedsHeaderId } = accumulator;
    const from = plant.headers.find(({ id }) => id === chargedFromHeaderId);
    const into = plant.headers.find(({ id }) => id === feedsHeaderId);
    const figures = from && into && accumulatorBetween(accumulator, from, into, plant.ambientBarA);
    if (!figures?.ok) return [];
    const charges = feedPath(plant, chargedFromHeaderId);
    return [{ accumulator, figures: figures.value, charges, relieves: feedPath(plant, feedsHeaderId) }];
  });
}

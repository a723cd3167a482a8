/** Fuel, cost and carbon dioxide of a week from the steam that its plan draws. */
import { ENERGY_BALANCE } from '../duty/balance';
import { ESTIMATE_CAUTION } from '../duty/duty';
import { EMISSION_FACTORS, fuelFor, type FuelKey } from '../duty/fuel';
import { openWorking, type Working, type WorkingStep } from '../duty/working';
import { fail, ok, type Result } from '../result';
import { toMinutes, type StepFunction } from '../time/stepFunction';

/** A boiler as far as its fuel is concerned. */
export interface FuelBoiler {
  readonly id: string;
  readonly name: string;
  /** Net export when fully lit, and the heat into its water then: feed tank and blowdown are in the ratio. */
  readonly netKgPerH: number;
  readonly heatToWaterKW: number;
  readonly efficiency: number;
  readonly fuel: FuelKey;
  /** Share of full export that can leave, 0 where not ready. */
  readonly readyShare: StepFunction;
}

export interface WeekFuel {
  /** Steam that the boilers in fire send out. [kg] */
  readonly steamKg: number;
  /** Steam that is asked for while nothing is in fire: not fired for. [kg] */
  readonly withoutFireKg: number;
  readonly heatToWaterKWh: number;
  readonly fuelKWh: number;
  readonly co2Kg: number;
  /** In the currency of the price; null: no price is set. */
  readonly cost: number | null;
  /** Factors from memory, not yet checked against their source, by name. */
  readonly unverified: readonly string[];
  readonly working: Working;
}

const NOT_COUNTED = 'Heating boilers up, purging and standing by are not counted: the meter will read more.';

/**
 * Fuel of a load per minute [kg/h], shared among the boilers that are ready by what each can send at that minute.
 * `pricePerKWh` is on the heating value of the factors; null: no cost.
 * @returns DUTY-RANGE naming field, value and range.
 */
export function weekFuel(
  load: ArrayLike<number>,
  boilers: readonly FuelBoiler[],
  pricePerKWh: number | null,
): Result<WeekFuel> {
  const hours = load.length / 60;
  const { byBoiler, withoutFireKg } = shareOut(load, boilers);
  const parts: BoilerFuel[] = [];
  for (const [i, boiler] of boilers.entries()) {
    const part = boilerFuel(boiler, byBoiler[i] ?? 0, hours);
    if (!part.ok) return fail(part.error);
    parts.push(part.value);
  }
  const sum = (of: (part: BoilerFuel) => number) => parts.reduce((total, part) => total + of(part), 0);
  const fuelKWh = sum((part) => part.fuelKWh);
  const figures = {
    steamKg: byBoiler.reduce((total, kg) => total + kg, 0),
    withoutFireKg,
    heatToWaterKWh: sum((part) => part.heatKWh),
    fuelKWh,
    co2Kg: sum((part) => part.co2Kg),
    cost: pricePerKWh === null ? null : fuelKWh * pricePerKWh,
  };
  return ok({ ...figures, unverified: unverified(boilers), working: workingOf(parts, figures, pricePerKWh) });
}

interface BoilerFuel {
  readonly heatKWh: number;
  readonly fuelKWh: number;
  readonly co2Kg: number;
  readonly steps: readonly WorkingStep[];
}

/** Steam of each boiler over the week. [kg] */
function shareOut(load: ArrayLike<number>, boilers: readonly FuelBoiler[]) {
  const can = boilers.map(({ readyShare, netKgPerH }) => {
    return toMinutes(readyShare, load.length).map((share) => share * netKgPerH);
  });
  const byBoiler = boilers.map(() => 0);
  let withoutFireKg = 0;
  for (let t = 0; t < load.length; t++) {
    const together = can.reduce((sum, minutes) => sum + (minutes[t] as number), 0);
    const kg = (load[t] as number) / 60;
    if (together <= 0) withoutFireKg += kg;
    else can.forEach((minutes, i) => (byBoiler[i] = (byBoiler[i] ?? 0) + (kg * (minutes[t] as number)) / together));
  }
  return { byBoiler, withoutFireKg };
}

function boilerFuel(boiler: FuelBoiler, steamKg: number, hours: number): Result<BoilerFuel> {
  const sheet = openWorking(boiler.name, []);
  const heatKWh = sheet.step({
    symbol: 'Q',
    name: 'Heat into the water over the week, feed tank and blowdown in proportion',
    formula: 'm · q / ṁ_net',
    unit: 'kWh',
    source: ENERGY_BALANCE,
    inputs: { m: [steamKg, 'kg'], q: [boiler.heatToWaterKW, 'kW'], ṁ_net: [boiler.netKgPerH, 'kg/h'] },
    value: ({ m, q, ṁ_net }) => (m * q) / ṁ_net,
  });
  const heatToWaterKW = sheet.step({
    symbol: 'q',
    name: 'Mean of it',
    formula: 'Q / t',
    unit: 'kW',
    source: ENERGY_BALANCE,
    inputs: { Q: [heatKWh, 'kWh'], t: [hours, 'h'] },
    value: ({ Q, t }) => (t > 0 ? Q / t : 0),
  });
  const use = fuelFor({ heatToWaterKW, efficiency: boiler.efficiency }, EMISSION_FACTORS[boiler.fuel]);
  if (!use.ok) return use;
  const steps = [...sheet.finish().steps, ...use.value.working.steps].map((s) => ({ ...s, section: boiler.name }));
  return ok({ heatKWh, fuelKWh: use.value.fuelKW * hours, co2Kg: use.value.co2KgPerH * hours, steps });
}

function unverified(boilers: readonly FuelBoiler[]): string[] {
  const factors = [...new Set(boilers.map(({ fuel }) => fuel))].map((fuel) => EMISSION_FACTORS[fuel]);
  return factors.filter(({ source }) => source.includes('from memory')).map(({ name }) => name);
}

type Figures = Pick<WeekFuel, 'steamKg' | 'withoutFireKg' | 'fuelKWh' | 'co2Kg' | 'cost'>;

function workingOf(parts: readonly BoilerFuel[], figures: Figures, pricePerKWh: number | null): Working {
  const sheet = openWorking('Fuel, cost and carbon dioxide of the week', [ESTIMATE_CAUTION, NOT_COUNTED]);
  if (pricePerKWh !== null) {
    sheet.section('Cost');
    sheet.step({
      symbol: 'K',
      name: 'Cost of the fuel',
      formula: 'F · p',
      unit: '',
      source: 'Price as set for the plant',
      inputs: { F: [figures.fuelKWh, 'kWh'], p: [pricePerKWh, ''] },
      value: ({ F, p }) => F * p,
    });
  }
  sheet.total('Steam of the week', figures.steamKg, 'kg');
  if (figures.withoutFireKg > 0) sheet.total('Asked for while nothing is in fire', figures.withoutFireKg, 'kg');
  sheet.total('Fuel', figures.fuelKWh, 'kWh');
  sheet.total('Carbon dioxide', figures.co2Kg, 'kg');
  const page = sheet.finish();
  return { ...page, steps: [...parts.flatMap((part) => part.steps), ...page.steps] };
}

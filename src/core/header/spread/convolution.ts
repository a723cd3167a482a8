import { OVER_TOLERANCE_KG_PER_H } from '../over';
import type { SpreadDraw, SpreadHeader } from './spreadDraws';
import { deviationAt } from './startSpread';

/** How the convolution is done. */
export interface ConvolutionOptions {
  /** Step of the grid of rates, more than 0. [kg/h] */
  readonly gridKgPerH: number;
  /** Part of the outcomes that the confident load covers, more than 0, at most 1. */
  readonly confidence: number;
}

/** A header under spread starts, per minute, with what the grid can have put wrong. */
export interface ConvolvedSpread {
  /** null: not judged. Chance of being over the limit, 0 to 1. */
  readonly overChance: Float64Array | null;
  /** The chance is at least this. */
  readonly leastOverChance: Float64Array | null;
  /** The chance is at most this. */
  readonly greatestOverChance: Float64Array | null;
  /** Least load that is not passed with the confidence asked for, to within `gridErrorKgPerH`. [kg/h] */
  readonly confidentKgPerH: Float64Array;
  /** Mean load; free of grid errors. [kg/h] */
  readonly expectedKgPerH: Float64Array;
  /** Greatest error of a load: half the grid's step for each group of draws whose rate is not certain, or less. [kg/h] */
  readonly gridErrorKgPerH: Float64Array;
}

/**
 * Chance of being over and confident load of a header, minute by minute, by convolution: per minute each independent
 * group of draws has a distribution of rates; what is certain adds up exactly, the rest is rounded to the grid and
 * convolved. The minutes are taken one by one, so it tells nothing of the chance of being over at any time of a span.
 */
export function convolveSpread(
  header: SpreadHeader,
  draws: readonly SpreadDraw[],
  options: ConvolutionOptions,
): ConvolvedSpread {
  const { horizonMin, baseKgPerH: base, limitKgPerH: limit } = header;
  const groups = groupRates(draws, horizonMin);
  const perMinute = () => new Float64Array(horizonMin);
  const judged = () => (limit ? perMinute() : null);
  const result = {
    overChance: judged(),
    leastOverChance: judged(),
    greatestOverChance: judged(),
    confidentKgPerH: perMinute(),
    expectedKgPerH: perMinute(),
    gridErrorKgPerH: perMinute(),
  };
  for (let t = 0; t < horizonMin; t++) {
    const active = groups.filter(({ from, to }) => from <= t && t < to);
    const load = minuteLoad(base[t] as number, active, t, options.gridKgPerH);
    result.expectedKgPerH[t] = load.expectedKgPerH;
    result.gridErrorKgPerH[t] = load.errorKgPerH;
    result.confidentKgPerH[t] = confident(load, options);
    const bound = (limit?.[t] ?? 0) + OVER_TOLERANCE_KG_PER_H;
    if (result.overChance) result.overChance[t] = chanceAbove(load, bound, options);
    if (result.leastOverChance) result.leastOverChance[t] = chanceAbove(load, bound + load.errorKgPerH, options);
    if (result.greatestOverChance) result.greatestOverChance[t] = chanceAbove(load, bound - load.errorKgPerH, options);
  }
  return result;
}

/** Draws that shift together: a rate per minute for each part of the shared random number. */
interface GroupRates {
  readonly from: number;
  readonly to: number;
  readonly chances: readonly number[];
  /** One array per chance, from `from` on. [kg/h] */
  readonly kgPerH: readonly Float64Array[];
}

function groupRates(draws: readonly SpreadDraw[], horizonMin: number): GroupRates[] {
  const byKey = new Map<string, SpreadDraw[]>();
  for (const draw of draws) {
    const members = byKey.get(draw.key);
    if (members) members.push(draw);
    else byKey.set(draw.key, [draw]);
  }
  return [...byKey.values()].map((members) => ratesOf(members, horizonMin)).filter(({ from, to }) => to > from);
}

function ratesOf(members: readonly SpreadDraw[], horizonMin: number): GroupRates {
  const cells = jointCells(members);
  let from = horizonMin;
  let to = 0;
  for (const { draws, spread } of members) {
    for (const draw of draws) {
      from = Math.min(from, Math.max(0, draw.from + (spread.outcomes[0]?.deviationMin ?? 0)));
      to = Math.max(to, Math.min(horizonMin, draw.to + (spread.outcomes.at(-1)?.deviationMin ?? 0)));
    }
  }
  const kgPerH = cells.map(({ middle }) => {
    const rates = new Float64Array(Math.max(0, to - from));
    for (const { draws, spread } of members) {
      const shift = deviationAt(spread, middle) - from;
      for (const draw of draws) {
        const end = Math.min(rates.length, draw.to + shift);
        for (let i = Math.max(0, draw.from + shift); i < end; i++) rates[i] = (rates[i] as number) + draw.kgPerH;
      }
    }
    return rates;
  });
  return { from, to, chances: cells.map(({ chance }) => chance), kgPerH };
}

/** The parts of [0, 1) in which no member's deviation changes. */
function jointCells(members: readonly SpreadDraw[]): { chance: number; middle: number }[] {
  const ends = new Set<number>([1]);
  for (const spread of new Set(members.map((member) => member.spread))) {
    let sum = 0;
    for (const { chance } of spread.outcomes.slice(0, -1)) ends.add((sum += chance));
  }
  let start = 0;
  return [...ends]
    .sort((a, b) => a - b)
    .map((end) => {
      const cell = { chance: end - start, middle: (start + end) / 2 };
      start = end;
      return cell;
    });
}

/** The distribution of a load: `chances[j]` at `leastKgPerH` + j grid steps. */
interface MinuteLoad {
  readonly leastKgPerH: number;
  readonly chances: Float64Array;
  readonly errorKgPerH: number;
  readonly expectedKgPerH: number;
}

function minuteLoad(baseKgPerH: number, active: readonly GroupRates[], t: number, grid: number): MinuteLoad {
  let leastKgPerH = baseKgPerH;
  let expectedKgPerH = baseKgPerH;
  let errorKgPerH = 0;
  let chances: Float64Array = Float64Array.of(1);
  for (const group of active) {
    const rates = group.kgPerH.map((rate) => rate[t - group.from] as number);
    const least = rates.reduce((a, b) => Math.min(a, b));
    leastKgPerH += least;
    expectedKgPerH += least;
    let error = 0;
    const parts = new Map<number, number>();
    rates.forEach((rate, cell) => {
      const chance = group.chances[cell] as number;
      const steps = Math.round((rate - least) / grid);
      error = Math.max(error, Math.abs(rate - least - steps * grid));
      expectedKgPerH += chance * (rate - least);
      parts.set(steps, (parts.get(steps) ?? 0) + chance);
    });
    errorKgPerH += error;
    if (parts.size > 1 || !parts.has(0)) chances = convolved(chances, parts);
  }
  return { leastKgPerH, chances, errorKgPerH, expectedKgPerH };
}

function convolved(chances: Float64Array, parts: ReadonlyMap<number, number>): Float64Array {
  const result = new Float64Array(chances.length + Math.max(...parts.keys()));
  for (const [steps, chance] of parts) {
    for (let j = 0; j < chances.length; j++) {
      result[j + steps] = (result[j + steps] as number) + chance * (chances[j] as number);
    }
  }
  return result;
}

function chanceAbove({ leastKgPerH, chances }: MinuteLoad, bound: number, { gridKgPerH }: ConvolutionOptions): number {
  let above = 0;
  let below = 0;
  for (let j = 0; j < chances.length; j++) {
    if (leastKgPerH + j * gridKgPerH > bound) above += chances[j] as number;
    else below += chances[j] as number;
  }
  return below === 0 ? 1 : Math.min(1, above);
}

/** Sums of chances carry rounding errors up to this. */
const ROUNDING = 1e-12;

function confident({ leastKgPerH, chances }: MinuteLoad, { confidence, gridKgPerH }: ConvolutionOptions): number {
  let sum = 0;
  for (let j = 0; j < chances.length; j++) {
    sum += chances[j] as number;
    if (sum >= confidence - ROUNDING) return leastKgPerH + j * gridKgPerH;
  }
  return leastKgPerH + (chances.length - 1) * gridKgPerH;
}

import { NOT_JUDGED_KG_PER_H } from './capacity';

/** A rate and where in the week it stands. */
export interface RateAt {
  readonly kgPerH: number;
  readonly minute: number;
}

/** Mean load over mean limit, and over the greatest load. */
export interface LoadFactor {
  /** null: not judged. */
  readonly meanOfLimit: number | null;
  /** null: no load at all. */
  readonly meanOfPeak: number | null;
}

/** Limit less load per minute; negative where over. [kg/h] */
export function steamToSpare(load: ArrayLike<number>, limit: ArrayLike<number>): Float64Array {
  return Float64Array.from({ length: load.length }, (_, t) => (limit[t] as number) - (load[t] as number));
}

/** Where the least steam is to spare while any is drawn; null for a span without draw or one not judged. [kg/h] */
export function leastSpare(load: ArrayLike<number>, limit: ArrayLike<number>): RateAt | null {
  let least: RateAt | null = null;
  for (let t = 0; t < load.length; t++) {
    const bound = limit[t] as number;
    const drawn = load[t] as number;
    const kgPerH = bound - drawn;
    if (drawn > 0 && bound < NOT_JUDGED_KG_PER_H && (!least || kgPerH < least.kgPerH)) least = { kgPerH, minute: t };
  }
  return least;
}

/** The greatest load and the first minute that it stands at. [kg/h] */
export function peakLoad(load: ArrayLike<number>): RateAt {
  let peak: RateAt = { kgPerH: load[0] ?? 0, minute: 0 };
  for (let t = 1; t < load.length; t++) {
    if ((load[t] as number) > peak.kgPerH) peak = { kgPerH: load[t] as number, minute: t };
  }
  return peak;
}

/** Steam of a load per minute. [kg] */
export function loadKg(load: ArrayLike<number>): number {
  let sum = 0;
  for (let t = 0; t < load.length; t++) sum += load[t] as number;
  return sum / 60;
}

/** Mean load against the limit (over the minutes that have one) and against the peak. */
export function loadFactor(load: ArrayLike<number>, limit: ArrayLike<number> | null): LoadFactor {
  const peak = peakLoad(load).kgPerH;
  const mean = load.length === 0 ? 0 : (loadKg(load) * 60) / load.length;
  return { meanOfLimit: limit && meanOfLimit(load, limit), meanOfPeak: peak > 0 ? mean / peak : null };
}

function meanOfLimit(load: ArrayLike<number>, limit: ArrayLike<number>): number | null {
  let loads = 0;
  let limits = 0;
  for (let t = 0; t < load.length; t++) {
    if ((limit[t] as number) >= NOT_JUDGED_KG_PER_H) continue;
    loads += load[t] as number;
    limits += limit[t] as number;
  }
  return limits > 0 ? loads / limits : null;
}

import type { ConvolvedSpread } from './convolution';
import type { SpreadHeader } from './spreadDraws';

/** How well confident loads agree with the distribution of the load. */
export interface QuantileFit {
  /** Furthest that the confidence lies outside the chances below and up to a load, 0 where it lies within at every minute. */
  readonly greatestMissedChance: number;
  /** Where that is. */
  readonly minute: number;
}

/** Next to a load without being it. [kg/h] */
const BESIDE_KG_PER_H = 0.01;

/**
 * Holds confident loads [kg/h per minute] against the distribution that `convolve` gives. A load is discrete: where its
 * distribution jumps, two right estimates of one quantile can be a whole vent apart, but every right one, q, has
 * P(load < q) <= confidence <= P(load <= q), within the chance's own error. Both bounds are widened by the grid's error.
 */
export function quantileFit(
  header: SpreadHeader,
  confidentKgPerH: Float64Array,
  confidence: number,
  convolve: (header: SpreadHeader) => ConvolvedSpread,
): QuantileFit {
  const passing = convolve({ ...header, limitKgPerH: confidentKgPerH.map((kgPerH) => kgPerH + BESIDE_KG_PER_H) });
  const reaching = convolve({ ...header, limitKgPerH: confidentKgPerH.map((kgPerH) => kgPerH - BESIDE_KG_PER_H) });
  let fit: QuantileFit = { greatestMissedChance: 0, minute: 0 };
  for (let t = 0; t < header.horizonMin; t++) {
    const upTo = 1 - (passing.leastOverChance?.[t] ?? 0);
    const below = 1 - (reaching.greatestOverChance?.[t] ?? 1);
    const missed = Math.max(confidence - upTo, below - confidence);
    if (missed > fit.greatestMissedChance) fit = { greatestMissedChance: missed, minute: t };
  }
  return fit;
}

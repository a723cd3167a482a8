import { OVER_TOLERANCE_KG_PER_H } from '../over';
import { nthSmallest } from './nthSmallest';
import type { PlannedDraw, SpreadDraw, SpreadHeader } from './spreadDraws';
import { deviationAt } from './startSpread';

/** How starts are sampled. */
export interface SamplingOptions {
  /** Number of sampled weeks, 1 or more. A chance p is met within about sqrt(p (1 - p) / samples). */
  readonly samples: number;
  /** Uniform numbers in [0, 1); the same sequence gives the same answer. */
  readonly random: () => number;
  /** Part of the sampled weeks that the confident load covers, more than 0, at most 1; 0.95 unless given. */
  readonly confidence?: number;
}

/** A header under sampled starts, per minute. */
export interface SampledSpread {
  /** null: not judged. Part of the sampled weeks over the limit, 0 to 1. */
  readonly overChance: Float64Array | null;
  /** Least sampled load that the part `confidence` of the samples does not pass. [kg/h] */
  readonly confidentKgPerH: Float64Array;
  /** Mean load. [kg/h] */
  readonly expectedKgPerH: Float64Array;
  /** null: not judged. Part of the sampled weeks that are over at any minute, 0 to 1. */
  readonly anyOverChance: number | null;
  /** null: not judged. Mean minutes over in a week. [min] */
  readonly expectedOverMin: number | null;
}

/** The loads of all samples, minute by minute, and the figures drawn from them; figures follow at `refresh`. Every key draws its numbers here. */
export class SampledLoads {
  readonly #samples: number;
  readonly #horizonMin: number;
  readonly #rank: number;
  readonly #limit: Float64Array | null;
  /** Load of sample k at minute t at index t x samples + k. [kg/h] */
  readonly #kgPerH: Float64Array;
  readonly #numbers = new Map<string, Float64Array>();
  readonly #stale: Uint8Array;
  readonly #over: Uint8Array;
  readonly #overMinutes: Int32Array;
  readonly #overCount: Int32Array;
  readonly #confident: Float64Array;
  readonly #expected: Float64Array;
  readonly #scratch: Float64Array;

  constructor(header: SpreadHeader, keys: ReadonlySet<string>, options: SamplingOptions) {
    const { samples, random, confidence = 0.95 } = options;
    const { horizonMin } = header;
    this.#samples = samples;
    this.#horizonMin = horizonMin;
    this.#rank = Math.min(samples, Math.max(1, Math.ceil(confidence * samples - 1e-9))) - 1;
    this.#limit = header.limitKgPerH;
    this.#kgPerH = new Float64Array(horizonMin * samples);
    this.#stale = new Uint8Array(horizonMin).fill(1);
    this.#over = new Uint8Array(horizonMin * samples);
    this.#overMinutes = new Int32Array(samples);
    this.#overCount = new Int32Array(horizonMin);
    this.#confident = new Float64Array(horizonMin);
    this.#expected = new Float64Array(horizonMin);
    this.#scratch = new Float64Array(samples);
    header.baseKgPerH.forEach((kgPerH, t) => this.#kgPerH.fill(kgPerH, t * samples, (t + 1) * samples));
    for (const key of [...keys].sort()) {
      this.#numbers.set(key, Float64Array.from({ length: samples }, random));
    }
  }

  /** Adds (1) or takes out (-1) an activity's draw in every sample, exactly: rates are in addable parts. */
  pour(draw: SpreadDraw, sign: 1 | -1): void {
    const numbers = this.#numbers.get(draw.key) as Float64Array;
    const shifts = Int32Array.from(numbers, (u) => deviationAt(draw.spread, u));
    for (let k = 0; k < this.#samples; k++) {
      for (const planned of draw.draws) this.#pourOne(planned, shifts[k] as number, k, sign);
    }
  }

  #pourOne({ from, to, kgPerH }: PlannedDraw, shift: number, k: number, sign: 1 | -1): void {
    const end = Math.min(this.#horizonMin, to + shift);
    const change = sign * kgPerH;
    for (let t = Math.max(0, from + shift); t < end; t++) {
      const at = t * this.#samples + k;
      this.#kgPerH[at] = (this.#kgPerH[at] as number) + change;
      this.#stale[t] = 1;
    }
  }

  /** Brings the figures of the minutes that were poured into up to date. */
  refresh(): void {
    for (let t = 0; t < this.#horizonMin; t++) if (this.#stale[t]) this.#refreshMinute(t);
    this.#stale.fill(0);
  }

  #refreshMinute(t: number): void {
    const first = t * this.#samples;
    const bound = this.#limit ? (this.#limit[t] as number) : Infinity;
    let sum = 0;
    let overCount = 0;
    for (let k = 0; k < this.#samples; k++) {
      const kgPerH = this.#kgPerH[first + k] as number;
      const over = kgPerH - bound > OVER_TOLERANCE_KG_PER_H ? 1 : 0;
      this.#overMinutes[k] = (this.#overMinutes[k] as number) + over - (this.#over[first + k] as number);
      this.#over[first + k] = over;
      this.#scratch[k] = kgPerH;
      sum += kgPerH;
      overCount += over;
    }
    this.#overCount[t] = overCount;
    this.#expected[t] = sum / this.#samples;
    this.#confident[t] = nthSmallest(this.#scratch, this.#rank);
  }

  /** A copy of the figures. */
  figures(): SampledSpread {
    const samples = this.#samples;
    const overWeeks = this.#overMinutes.reduce((count, minutes) => count + (minutes > 0 ? 1 : 0), 0);
    const overMinutes = this.#overMinutes.reduce((sum, minutes) => sum + minutes, 0);
    return {
      overChance: this.#limit && Float64Array.from(this.#overCount, (count) => count / samples),
      confidentKgPerH: this.#confident.slice(),
      expectedKgPerH: this.#expected.slice(),
      anyOverChance: this.#limit && overWeeks / samples,
      expectedOverMin: this.#limit && overMinutes / samples,
    };
  }
}

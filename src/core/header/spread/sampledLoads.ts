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

interface Figures {
  /** Per sample. */
  readonly overMinutes: Int32Array;
  /** Samples over, per minute. */
  readonly overCount: Int32Array;
  readonly confident: Float64Array;
  readonly expected: Float64Array;
}

/** The loads of all samples, minute by minute, and the figures drawn from them; Every key draws its numbers here. */
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
  readonly #standing: Figures;
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
    this.#standing = {
      overMinutes: new Int32Array(samples),
      overCount: new Int32Array(horizonMin),
      confident: new Float64Array(horizonMin),
      expected: new Float64Array(horizonMin),
    };
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

  /** Takes the loads as they are for the week as it stands. */
  settle(): void {
    this.#refreshStale(this.#standing, true);
    this.restored();
  }

  /** Figures of the loads as they are; those of the week as it stands are kept. */
  tried(): SampledSpread {
    const { overMinutes, overCount, confident, expected } = this.#standing;
    const tried = {
      overMinutes: overMinutes.slice(),
      overCount: overCount.slice(),
      confident: confident.slice(),
      expected: expected.slice(),
    };
    this.#refreshStale(tried, false);
    return this.#spreadOf(tried);
  }

  /** To be called when the loads are those of the week as it stands again. */
  restored(): void {
    this.#stale.fill(0);
  }

  #refreshStale(figures: Figures, keep: boolean): void {
    for (let t = 0; t < this.#horizonMin; t++) if (this.#stale[t]) this.#refreshMinute(t, figures, keep);
  }

  #refreshMinute(t: number, figures: Figures, keep: boolean): void {
    const first = t * this.#samples;
    const bound = this.#limit ? (this.#limit[t] as number) : Infinity;
    let sum = 0;
    let overCount = 0;
    for (let k = 0; k < this.#samples; k++) {
      const kgPerH = this.#kgPerH[first + k] as number;
      const over = kgPerH - bound > OVER_TOLERANCE_KG_PER_H ? 1 : 0;
      figures.overMinutes[k] = (figures.overMinutes[k] as number) + over - (this.#over[first + k] as number);
      if (keep) this.#over[first + k] = over;
      this.#scratch[k] = kgPerH;
      sum += kgPerH;
      overCount += over;
    }
    figures.overCount[t] = overCount;
    figures.expected[t] = sum / this.#samples;
    figures.confident[t] = nthSmallest(this.#scratch, this.#rank);
  }

  #spreadOf({ overMinutes, overCount, confident, expected }: Figures): SampledSpread {
    const samples = this.#samples;
    const overWeeks = overMinutes.reduce((count, minutes) => count + (minutes > 0 ? 1 : 0), 0);
    return {
      overChance: this.#limit && Float64Array.from(overCount, (count) => count / samples),
      confidentKgPerH: confident,
      expectedKgPerH: expected,
      anyOverChance: this.#limit && overWeeks / samples,
      expectedOverMin: this.#limit && overMinutes.reduce((sum, minutes) => sum + minutes, 0) / samples,
    };
  }
}

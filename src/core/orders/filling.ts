/** When which container of an order is filled, counted from the start of the fill run. */

/** A kettle's batch at the filler. */
export interface Emptied {
  /** It must be ready by then. [min] */
  readonly neededMin: number;
  /** The filler has taken it off by then. [min] */
  readonly takenOffMin: number;
}

export interface Filling {
  /** How long the run lasts. Whole. [min] */
  readonly minutes: number;
  /** The container after so many is filled no earlier. Whole. [min] */
  readonly firstMin: (piecesBefore: number) => number;
  /** So many are filled by then. Whole. [min] */
  readonly doneMin: (pieces: number) => number;
  readonly emptied: readonly Emptied[];
}

/** Rounding noise on a whole minute. */
const NOISE = 1e-6;
const down = (minutes: number): number => Math.floor(minutes + NOISE);
const up = (minutes: number): number => Math.ceil(minutes - NOISE);

/** Containers straight from a machine at a steady pace. `pieces` in all; `perMin` [1/min]. */
export function steadyFilling(pieces: number, perMin: number): Filling {
  return {
    minutes: up(pieces / perMin),
    firstMin: (before) => down(before / perMin),
    doneMin: (done) => up(done / perMin),
    emptied: [],
  };
}

/**
 * Containers out of kettles: the filler empties each at its own rate, the kettles follow at theirs.
 * @param batches containers that each kettle fills; `ownPerMin` the filler's rate, `perMin` what is kept up [1/min].
 */
export function kettleFilling(batches: readonly number[], ownPerMin: number, perMin: number): Filling {
  const before: number[] = [];
  batches.forEach((pieces, k) => before.push(k === 0 ? 0 : (before[k - 1] ?? 0) + (batches[k - 1] ?? pieces)));
  const needed = before.map((pieces) => down(pieces / perMin));
  const at = (batch: number, pieces: number): number =>
    (needed[batch] ?? 0) + (pieces - (before[batch] ?? 0)) / ownPerMin;
  const holding = (pieces: number, isFirst: boolean): number => {
    const after = before.findIndex((start) => (isFirst ? start > pieces + NOISE : start >= pieces - NOISE));
    return after < 0 ? before.length - 1 : Math.max(0, after - 1);
  };
  const doneMin = (pieces: number): number => up(at(holding(pieces, false), pieces));
  const total = batches.reduce((sum, pieces) => sum + pieces, 0);
  return {
    minutes: doneMin(total),
    firstMin: (pieces) => down(at(holding(pieces, true), pieces)),
    doneMin,
    emptied: batches.map((pieces, k) => ({
      neededMin: needed[k] ?? 0,
      takenOffMin: doneMin((before[k] ?? 0) + pieces),
    })),
  };
}

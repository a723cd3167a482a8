/**
 * A steam rate that falls exponentially from a peak, and its cutting into pieces of constant rate.
 * Source: solution of the lumped heat balance of a jacketed vessel, q = q0 exp(-UA t / C).
 */

/** rate(t) = floor + (peak - floor) exp(-k t) from 0 to `minutes`. */
export interface FallingRate {
  readonly peakKgPerH: number;
  /** What it would fall to in the end: losses. */
  readonly floorKgPerH: number;
  readonly decayPerMin: number;
  readonly minutes: number;
}

/** A piece of it, in minutes from the start. */
export interface Piece {
  readonly startMin: number;
  readonly endMin: number;
}

/** The curve through a peak and an end rate above a floor [kg/h] in a time [min]. */
export function fallingRate(through: {
  readonly peakKgPerH: number;
  readonly endKgPerH: number;
  readonly floorKgPerH: number;
  readonly minutes: number;
}): FallingRate {
  const { peakKgPerH, endKgPerH, floorKgPerH, minutes } = through;
  const decayPerMin = Math.log((peakKgPerH - floorKgPerH) / (endKgPerH - floorKgPerH)) / minutes;
  return { peakKgPerH, floorKgPerH, decayPerMin, minutes };
}

/** The rate at a moment [kg/h]. */
export function rateKgPerH({ peakKgPerH, floorKgPerH, decayPerMin }: FallingRate, atMin: number): number {
  return floorKgPerH + (peakKgPerH - floorKgPerH) * Math.exp(-decayPerMin * atMin);
}

/** Minutes until the rate has fallen to a value [kg/h]; 0 when it starts below, null when it ends above. */
export function minutesUntilRate(curve: FallingRate, kgPerH: number): number | null {
  if (kgPerH >= curve.peakKgPerH) return 0;
  if (kgPerH < rateKgPerH(curve, curve.minutes)) return null;
  const ratio = (curve.peakKgPerH - curve.floorKgPerH) / (kgPerH - curve.floorKgPerH);
  return Math.log(ratio) / curve.decayPerMin;
}

/** Steam between two moments [kg]: the exact integral. */
export function pieceSteamKg(curve: FallingRate, startMin: number, endMin: number): number {
  const { peakKgPerH, floorKgPerH, decayPerMin } = curve;
  const fallen = (Math.exp(-decayPerMin * startMin) - Math.exp(-decayPerMin * endMin)) / decayPerMin;
  return (floorKgPerH * (endMin - startMin) + (peakKgPerH - floorKgPerH) * fallen) / 60;
}

/** A piece k t long averages about k t / 2 below its start: 2 % for the first, which holds the peak, then 4 %. */
const FIRST_FALL = 0.04;
const LATER_FALL = 0.08;

/** Whole minutes where a piece is that long, because the load on a header is summed by the minute. */
const pieceMinutes = (fall: number, decayPerMin: number): number => {
  const minutes = fall / decayPerMin;
  return minutes >= 1 ? Math.floor(minutes) : minutes;
};

/** Cuts the curve so that the first piece averages within 2 % of the peak and none starts more than 4 % above its mean. */
export function heatUpPieces({ decayPerMin, minutes }: FallingRate): Piece[] {
  const pieces: Piece[] = [];
  let startMin = 0;
  while (startMin < minutes) {
    const length = pieceMinutes(pieces.length === 0 ? FIRST_FALL : LATER_FALL, decayPerMin);
    const endMin = Math.min(startMin + length, minutes);
    pieces.push({ startMin, endMin });
    startMin = endMin;
  }
  return pieces;
}

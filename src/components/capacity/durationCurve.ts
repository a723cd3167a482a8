/** A point of a load-duration curve: for so many hours of the week the load stands at least so high. */
export interface DurationPoint {
  readonly hours: number;
  readonly loadKgPerH: number;
}

/**
 * The load sorted from the greatest down, as corners of steps: one point per hour kept and rounded minute values
 * joined, so that a week of minutes becomes some hundreds of points. [kg/h, h]
 */
export function durationCurve(loadKgPerH: Float64Array): DurationPoint[] {
  const sorted = Float64Array.from(loadKgPerH).sort().reverse();
  const points: DurationPoint[] = [];
  let last = Number.NaN;
  sorted.forEach((value, minute) => {
    const rounded = Math.round(value);
    if (rounded !== last) points.push({ hours: minute / 60, loadKgPerH: rounded });
    last = rounded;
  });
  if (sorted.length > 0) points.push({ hours: sorted.length / 60, loadKgPerH: last });
  return points;
}

/** Hours for which a load stands above a rate. [h] */
export function hoursAbove(loadKgPerH: Float64Array, kgPerH: number): number {
  return loadKgPerH.reduce((minutes, value) => (value > kgPerH ? minutes + 1 : minutes), 0) / 60;
}

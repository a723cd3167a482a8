import type { Units } from '../units';

/** A stretch of the strip. [min] */
export interface StripView {
  readonly from: number;
  readonly to: number;
}

/** Minutes and kg/h to px of the strip; y grows downwards. */
export interface StripScale {
  readonly pxPerMin: number;
  readonly topKgPerH: number;
  readonly heightPx: number;
}

const round = (v: number): number => Math.round(v * 10) / 10;

export function yOfRate(scale: StripScale, kgPerH: number): number {
  const share = Math.min(Math.max(kgPerH, 0), scale.topKgPerH) / scale.topKgPerH;
  return round(scale.heightPx * (1 - share));
}

/** Runs of equal value within the view: [from, to, value]. */
function runs(values: ArrayLike<number>, view: StripView): [number, number, number][] {
  const out: [number, number, number][] = [];
  const to = Math.min(view.to, values.length);
  let from = Math.max(0, view.from);
  while (from < to) {
    const value = values[from] as number;
    let end = from + 1;
    while (end < to && values[end] === value) end++;
    out.push([from, end, value]);
    from = end;
  }
  return out;
}

/** The line of rates per minute. [SVG path] */
export function linePath(values: ArrayLike<number>, view: StripView, scale: StripScale): string {
  return runs(values, view)
    .map(([from, to, value], i) => {
      const y = yOfRate(scale, value);
      return `${i === 0 ? `M${round(from * scale.pxPerMin)} ${y}` : `V${y}`}H${round(to * scale.pxPerMin)}`;
    })
    .join('');
}

/** The area between the bottom and the rates per minute. [SVG path] */
export function areaPath(values: ArrayLike<number>, view: StripView, scale: StripScale): string {
  const line = linePath(values, view, scale);
  if (line === '') return '';
  const left = round(Math.max(0, view.from) * scale.pxPerMin);
  return `M${left} ${scale.heightPx}${line.replace(/^M\S+ /, 'V')}V${scale.heightPx}Z`;
}

/** The areas between two rates wherever `upper` passes `lower` by more than rounding. [SVG path] */
export function betweenPath(
  upper: ArrayLike<number>,
  lower: ArrayLike<number>,
  view: StripView,
  scale: StripScale,
): string {
  const to = Math.min(view.to, upper.length, lower.length);
  let path = '';
  let from = Math.max(0, view.from);
  while (from < to) {
    const high = upper[from] as number;
    const low = lower[from] as number;
    let end = from + 1;
    while (end < to && upper[end] === high && lower[end] === low) end++;
    if (high > low + 1e-3) {
      const [x0, x1] = [round(from * scale.pxPerMin), round(end * scale.pxPerMin)];
      path += `M${x0} ${yOfRate(scale, low)}V${yOfRate(scale, high)}H${x1}V${yOfRate(scale, low)}Z`;
    }
    from = end;
  }
  return path;
}

/** The strip's top: above the greatest load and limit by a little, on a round number of the units shown. [kg/h] */
export function stripTop(greatestKgPerH: number, units: Units): number {
  const greatest = units.shown('steamRate', greatestKgPerH);
  const step = greatest > 4000 ? 1000 : greatest > 800 ? 200 : 50;
  return units.inside('steamRate', Math.max(step, Math.ceil((greatest * 1.06) / step) * step));
}

/** Three or four rates to mark along the strip, round in the units shown. [kg/h] */
export function rateMarks(topKgPerH: number, units: Units): number[] {
  const steps = [25, 50, 100, 200, 500, 1000, 2000, 5000, 10_000, 20_000];
  const top = units.shown('steamRate', topKgPerH) * (1 - 1e-9);
  const step = steps.find((s) => top / s <= 4.6) ?? 50_000;
  const marks: number[] = [];
  for (let mark = step; mark < top; mark += step) marks.push(units.inside('steamRate', mark));
  return marks;
}

/** Greatest value that counts, leaving "no limit known" out. [kg/h] */
export function greatestOf(values: ArrayLike<number>, below = 1e9): number {
  let greatest = 0;
  for (let t = 0; t < values.length; t++) {
    const value = values[t] as number;
    if (value > greatest && value < below) greatest = value;
  }
  return greatest;
}

import type { StepFunction } from '@/core/time/stepFunction';
import type { Units } from '../units';

/** Where minutes of the week and kg/h stand on the desk. */
export interface DeskScale {
  readonly from: number;
  readonly to: number;
  readonly width: number;
  readonly height: number;
  readonly topKgPerH: number;
}

export const xOf = (scale: DeskScale, minute: number): number =>
  ((minute - scale.from) / (scale.to - scale.from)) * scale.width;

export const yOf = (scale: DeskScale, kgPerH: number): number =>
  scale.height - (Math.max(0, Math.min(kgPerH, scale.topKgPerH * 1.5)) / scale.topKgPerH) * scale.height;

/** The minute under a place across, kept within what is shown. */
export function minuteAtX(scale: DeskScale, x: number): number {
  const minute = scale.from + (x / scale.width) * (scale.to - scale.from);
  return Math.max(scale.from, Math.min(scale.to, minute));
}

/**
 * A round number of the units shown at or above a rate, so that a small change of the load does not move the whole
 * drawing. [kg/h]
 */
export function roundTop(kgPerH: number, units: Units): number {
  const shown = units.shown('steamRate', kgPerH);
  const step = shown > 20_000 ? 5_000 : shown > 5_000 ? 1_000 : 500;
  return units.inside('steamRate', Math.max(step, Math.ceil((shown * 1.06) / step) * step));
}

/** Rates to write at the side: four to six, round in the units shown. [kg/h] */
export function rateTicks(topKgPerH: number, units: Units): number[] {
  const top = units.shown('steamRate', topKgPerH) * (1 + 1e-9);
  const step = [250, 500, 1_000, 2_000, 5_000, 10_000, 20_000].find((s) => top / s <= 6) ?? 50_000;
  return Array.from({ length: Math.floor(top / step) }, (_, i) => units.inside('steamRate', (i + 1) * step));
}

/** The step in which a limit is drawn: 50 kg/h or 100 lb/h. [kg/h] */
export const limitSnap = (units: Units): number => units.inside('steamRate', units.system === 'si' ? 50 : 100);

interface Segment {
  readonly from: number;
  readonly to: number;
  readonly value: number;
}

/** The pieces of a step function within a span, from the span's start to its end. */
export function segments(fn: StepFunction, from: number, to: number): Segment[] {
  const found: Segment[] = [];
  const first = fn[0];
  if (!first || first.from > from) found.push({ from, to: Math.min(to, first?.from ?? to), value: 0 });
  fn.forEach((step, i) => {
    const start = Math.max(from, step.from);
    const end = Math.min(to, fn[i + 1]?.from ?? to);
    if (end > start) found.push({ from: start, to: end, value: step.value });
  });
  return found;
}

const fixed = (value: number): string => (Math.round(value * 10) / 10).toString();

/** The outline of a step function as an open path. */
export function linePath(scale: DeskScale, fn: StepFunction): string {
  return segments(fn, scale.from, scale.to)
    .map(
      (s, i) =>
        `${i === 0 ? `M${fixed(xOf(scale, s.from))} ` : 'V'}${fixed(yOf(scale, s.value))}H${fixed(xOf(scale, s.to))}`,
    )
    .join('');
}

/** The ground under a step function as a closed path. */
export function areaPath(scale: DeskScale, fn: StepFunction): string {
  const bottom = fixed(scale.height);
  const tops = segments(fn, scale.from, scale.to)
    .map((s) => `V${fixed(yOf(scale, s.value))}H${fixed(xOf(scale, s.to))}`)
    .join('');
  return `M0 ${bottom}${tops}V${bottom}Z`;
}

/** Geometry of a draw over time. Pure. */
import type { Phase } from '@/core/plant/activity';

export interface OutlineBox {
  readonly width: number;
  readonly height: number;
  /** Greatest value drawn, in the scale's unit. */
  readonly top: number;
  readonly minutes: number;
}

/** The draw as filled steps, each phase closed on the base line; y grows downwards. */
export function outlinePath(grid: readonly Phase[], { width, height, top, minutes }: OutlineBox): string {
  const x = (minute: number): string => ((minute / Math.max(1, minutes)) * width).toFixed(1);
  const y = (kgPerH: number): string => (height - (kgPerH / Math.max(1e-9, top)) * height).toFixed(1);
  return grid
    .filter(({ steamKgPerH }) => steamKgPerH > 0)
    .map((p) => `M${x(p.offsetMin)} ${height}V${y(p.steamKgPerH)}H${x(p.offsetMin + p.minutes)}V${height}Z`)
    .join('');
}

const STEPS = [1, 2, 2.5, 5, 10];

/** Round values from 0 up to at least `top`, at most `most` of them beside the 0. */
export function roundTicks(top: number, most = 4): number[] {
  if (!(top > 0)) return [0, 1];
  const raw = top / most;
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = (STEPS.find((factor) => factor * power >= raw * (1 - 1e-9)) ?? 10) * power;
  const count = Math.ceil(top / step - 1e-9);
  return Array.from({ length: count + 1 }, (_, i) => Number((i * step).toPrecision(12)));
}

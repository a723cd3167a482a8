import type { LevellingProgressDto } from '../../contracts/levelling';

interface Frame {
  readonly widthPx: number;
  readonly heightPx: number;
  readonly seconds: number;
  /** What the top stands for. [kg] */
  readonly most: number;
}

/** The kg over the limit against time, in steps: a better plan holds from when it was found. null before the first. */
export function progressPath(
  progress: readonly LevellingProgressDto[],
  frame: Frame,
): { readonly line: string } | null {
  const first = progress[0];
  if (!first) return null;
  const { widthPx, heightPx, seconds } = frame;
  const most = Math.max(frame.most, 1);
  const x = (ms: number): number => Math.round(Math.min(1, ms / (seconds * 1000)) * widthPx * 10) / 10;
  const y = (kg: number): number => Math.round((1 - Math.min(1, kg / most)) * heightPx * 10) / 10;
  const steps = progress.map((at) => `H${x(at.ms)}V${y(at.overKg)}`).join('');
  return { line: `M0 ${y(first.overKg)}${steps}` };
}

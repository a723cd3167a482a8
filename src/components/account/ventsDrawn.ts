/** The drawing beside the sign-in form: the steam of the same retorts, started by habit and started apart. */

interface Draw {
  readonly minutes: number;
  readonly kgPerH: number;
}

/** A retort's steam in round numbers: vent, come-up, then little. */
const RETORT: readonly Draw[] = [
  { minutes: 7, kgPerH: 1_500 },
  { minutes: 5, kgPerH: 950 },
  { minutes: 16, kgPerH: 260 },
  { minutes: 26, kgPerH: 120 },
];
const BASE_KG_PER_H = 420;

export const DRAWN_MINUTES = 192;
export const DRAWN_LIMIT_KG_PER_H = 2_900;
export const BY_HABIT: readonly number[] = [12, 15, 19, 66, 68, 71, 120, 123, 125];
export const APART: readonly number[] = [3, 15, 27, 56, 68, 80, 111, 123, 135];

/** The summed load per minute. [kg/h] */
export function drawnLoad(starts: readonly number[]): number[] {
  const load = Array.from({ length: DRAWN_MINUTES }, () => BASE_KG_PER_H);
  for (const start of starts) {
    let minute = start;
    for (const draw of RETORT)
      for (let end = minute + draw.minutes; minute < end; minute++)
        if (minute < DRAWN_MINUTES) load[minute] = (load[minute] ?? 0) + draw.kgPerH;
  }
  return load;
}

/** The load as a closed path, `width` by `height`, the top at `topKgPerH`. */
export function stepPath(load: readonly number[], width: number, height: number, topKgPerH: number): string {
  const x = (minute: number): string => ((minute / load.length) * width).toFixed(1);
  const y = (kgPerH: number): string => (height - (kgPerH / topKgPerH) * height).toFixed(1);
  const tops = load.map((kgPerH, minute) => `V${y(kgPerH)}H${x(minute + 1)}`).join('');
  return `M0 ${height}${tops}V${height}Z`;
}

/** Minutes of a load over the limit of the drawing. */
export function minutesOver(load: readonly number[]): number {
  return load.filter((kgPerH) => kgPerH > DRAWN_LIMIT_KG_PER_H).length;
}

/** Furthest that a start was moved from the first list to the second. [min] */
export function furthestMove(from: readonly number[], to: readonly number[]): number {
  return from.reduce((most, start, i) => Math.max(most, Math.abs((to[i] ?? start) - start)), 0);
}

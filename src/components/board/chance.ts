/** Parts of the weeks whose load may be shown. */
export const CONFIDENCES = [0.9, 0.95, 0.99] as const;
export type Confidence = (typeof CONFIDENCES)[number];

/** Chances closer than this are one: counts of sampled weeks. */
const SAME = 1e-9;

/** Where a chance is greatest from a minute on, the first such minute; null where it is 0 all along. */
export function greatestChance(
  chances: ArrayLike<number>,
  fromMin = 0,
): { readonly chance: number; readonly minute: number } | null {
  let at = fromMin;
  for (let t = fromMin; t < chances.length; t++) if ((chances[t] as number) > (chances[at] as number)) at = t;
  const chance = chances[at] ?? 0;
  return chance > 0 ? { chance, minute: at } : null;
}

/** px of a row of chances: nothing at the bottom, certainty at the top. */
interface ChanceScale {
  readonly pxPerMin: number;
  readonly heightPx: number;
}

/** What is likelier than the confidence leaves room for is never drawn lower than this, any other chance not below a hair. */
const LEAST_PX = { tooLikely: 6, any: 1 } as const;

const round = (v: number): number => Math.round(v * 10) / 10;

/** The area below the chances that are greater than `above`; nothing where they are not. [SVG path] */
export function chancePath(chances: ArrayLike<number>, above: number, { pxPerMin, heightPx }: ChanceScale): string {
  const leastPx = above > 0 ? LEAST_PX.tooLikely : LEAST_PX.any;
  let path = '';
  let from = 0;
  while (from < chances.length) {
    const chance = chances[from] as number;
    let to = from + 1;
    while (to < chances.length && chances[to] === chance) to++;
    if (chance > above + SAME) {
      const y = round(heightPx - Math.max(leastPx, Math.min(1, chance) * heightPx));
      path += `M${round(from * pxPerMin)} ${heightPx}V${y}H${round(to * pxPerMin)}V${heightPx}Z`;
    }
    from = to;
  }
  return path;
}

/** '34 %'; what is neither never nor always does not read as such. */
export function percentText(chance: number): string {
  const percent = 100 * chance;
  if (percent > 0 && percent < 0.5) return '< 0.5\u00a0%';
  if (percent < 100 && percent > 99.5) return '> 99.5\u00a0%';
  return `${Math.round(percent)}\u00a0%`;
}

/** Standard error of a chance found from so many samples. */
export const standardError = (chance: number, samples: number): number => Math.sqrt((chance * (1 - chance)) / samples);

/** '± 2 %', with a decimal below 2 %; of what never or always came, how often it was tried. */
export function errorText(chance: number, samples: number): string {
  if (chance === 0) return `in none of ${samples}`;
  if (chance === 1) return `in all ${samples}`;
  const percent = 100 * standardError(chance, samples);
  return `± ${percent < 1.95 ? percent.toFixed(1) : Math.round(percent)}\u00a0%`;
}

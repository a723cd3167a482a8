import type { Activity, Phase } from '../../core/plant/activity';

/** A spell of one rate within an activity. [min, kg/h] */
export interface Spell {
  readonly from: number;
  readonly to: number;
  readonly kgPerH: number;
}

/** Rates over an activity's minutes: phases that overlap are added, gaps are 0. */
export function spellsOf(phases: readonly Phase[], minutes: number): Spell[] {
  const edges = new Set([0, minutes]);
  for (const phase of phases) {
    for (const edge of [phase.offsetMin, phase.offsetMin + phase.minutes]) {
      if (edge > 0 && edge < minutes) edges.add(edge);
    }
  }
  const sorted = [...edges].sort((a, b) => a - b);
  const spells: Spell[] = [];
  for (let i = 0; i + 1 < sorted.length; i++) {
    const from = sorted[i] as number;
    const to = sorted[i + 1] as number;
    const kgPerH = phases.reduce(
      (sum, p) => (p.offsetMin <= from && from < p.offsetMin + p.minutes ? sum + p.steamKgPerH : sum),
      0,
    );
    const last = spells.at(-1);
    if (last && last.kgPerH === kgPerH) spells[spells.length - 1] = { ...last, to };
    else spells.push({ from, to, kgPerH });
  }
  return spells;
}

/** Greatest rate that any activity could draw on any of its units, at least 1. One scale for the whole board. [kg/h] */
export function boardPeakKgPerH(activities: readonly Activity[]): number {
  let peak = 1;
  for (const activity of activities) {
    for (const mode of activity.modes) for (const phase of mode.phases) peak = Math.max(peak, phase.steamKgPerH);
  }
  return peak;
}

/**
 * SVG path of the demand: x in minutes, y downwards from 0 (the scale's top) to `height` (nothing drawn). A rate above
 * nothing is never thinner than `leastPx`, so that a simmer stays visible below a vent.
 */
export function outlinePath(spells: readonly Spell[], kgPerHAtTop: number, height: number, leastPx = 1.5): string {
  if (spells.every((spell) => spell.kgPerH <= 0)) return '';
  const yOf = (kgPerH: number): number => {
    if (kgPerH <= 0) return height;
    const rise = Math.max(leastPx, (Math.min(kgPerH, kgPerHAtTop) / kgPerHAtTop) * height);
    return Math.round((height - rise) * 100) / 100;
  };
  const first = spells[0] as Spell;
  const steps = spells.map((spell) => `V${yOf(spell.kgPerH)}H${spell.to}`).join('');
  return `M${first.from} ${height}${steps}V${height}Z`;
}

export interface TitleSlot {
  readonly leftPx: number;
  readonly widthPx: number;
}

/**
 * The widest stretch over which the demand stays below `clearKgPerH`, so that words above it touch no steam; null where
 * there is none. [px]
 */
export function titleSlot(spells: readonly Spell[], clearKgPerH: number, pxPerMin: number): TitleSlot | null {
  let best: TitleSlot | null = null;
  let from: number | null = null;
  const consider = (to: number): void => {
    if (from === null) return;
    const slot = { leftPx: from * pxPerMin, widthPx: (to - from) * pxPerMin };
    if (!best || slot.widthPx > best.widthPx) best = slot;
    from = null;
  };
  for (const spell of spells) {
    if (spell.kgPerH <= clearKgPerH) from = from ?? spell.from;
    else consider(spell.from);
  }
  consider(spells.at(-1)?.to ?? 0);
  return best;
}

/** Roughly how wide words are set at the board's size. [px] */
export function textWidthPx(text: string, fontPx = 11.5): number {
  return text.length * fontPx * 0.535;
}

/** The fullest words that fit: the title, the code, or nothing. */
export function fittingWords(title: string, code: string, widthPx: number): string {
  return [title, code].find((words) => textWidthPx(words) <= widthPx) ?? '';
}

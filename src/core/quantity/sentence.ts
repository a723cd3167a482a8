import {
  DISPLAY_QUANTITIES,
  displaySymbol,
  quantityOfUnit,
  toDisplay,
  type DisplayQuantity,
  type UnitSystem,
} from './display';
import { shortEnd, shortNumber } from './range';

const NUMBER = String.raw`[-\u2212]?\d+(?:[ \u2009\u00a0]\d{3})*(?:\.\d+)?`;
const escaped = (text: string): string => text.replace(/[.*+?^${}()|[\]\\/]/g, String.raw`\$&`);
/** Longest first, so that kg/h is not read as kg. */
const UNITS = DISPLAY_QUANTITIES.map((quantity) => displaySymbol(quantity, 'si'))
  .sort((a, b) => b.length - a.length)
  .map(escaped)
  .join('|');
/** "5.5 bar g", "at least 60 °C", "0 to 50000 kg/h", "0 or 1 to 480 kW": numbers that share the unit after the last. */
const FIGURES = new RegExp(
  String.raw`(?<![\w.])([Aa]t least |[Aa]t most )?(${NUMBER}(?:(?: to | or | and )${NUMBER})*)([ \u00a0])(${UNITS})(?![\p{L}\p{N}²³/])`,
  'gu',
);

const plain = (text: string): number => Number(text.replace('\u2212', '-').replace(/[ \u2009\u00a0]/g, ''));

/** As many digits as were given, at least three: a rate rounded for a screen does not come out with six. */
function digitsOf(text: string): number {
  const bare = text.replace(/[-\u2212 \u2009\u00a0]/g, '');
  const given = (bare.includes('.') ? bare.replace('.', '') : bare.replace(/0+$/, '')).replace(/^0+/, '').length;
  return given > 4 ? 6 : Math.max(3, given);
}

type End = 'least' | 'most' | null;

/** Which end of a range each figure of a list is; null for a figure that is only told. */
function endsOf(before: string, count: number, isSpan: boolean): End[] {
  if (before !== '') return Array.from({ length: count }, () => (before.endsWith('least ') ? 'least' : 'most'));
  return Array.from({ length: count }, (_, i) => (!isSpan ? null : i === count - 1 ? 'most' : 'least'));
}

/**
 * A sentence whose figures are in SI units, with each figure in the units of the system: "Product rate is 60000 kg/h; it
 * must be 0 to 50000 kg/h." becomes "Product rate is 132000 lb/h; it must be 0 to 110231 lb/h." Ends of ranges are
 * rounded into the range; quantities in `left` stay as they are.
 */
export function sentenceIn(system: UnitSystem, sentence: string, left: readonly DisplayQuantity[] = []): string {
  if (system === 'si') return sentence;
  return sentence.replace(FIGURES, (whole, before: string | undefined, figures: string, gap: string, unit: string) => {
    const quantity = quantityOfUnit(unit);
    if (!quantity || left.includes(quantity)) return whole;
    const numbers = figures.match(new RegExp(NUMBER, 'gu')) ?? [];
    const ends = endsOf(before ?? '', numbers.length, figures.includes(' to '));
    let index = 0;
    const shown = figures.replace(new RegExp(NUMBER, 'gu'), (text) => {
      const value = toDisplay(quantity, plain(text), system);
      const end = ends[index++] ?? null;
      return end === null ? shortNumber(Number(value.toPrecision(digitsOf(text)))) : shortEnd(value, end);
    });
    return `${before ?? ''}${shown}${gap}${displaySymbol(quantity, system)}`;
  });
}

import { DISPLAY_QUANTITIES, displaySymbol, quantityOfUnit, toDisplay, type UnitSystem } from './display';
import { shortNumber } from './range';

const NUMBER = String.raw`[-\u2212]?\d+(?:[ \u2009\u00a0]\d{3})*(?:\.\d+)?`;
const escaped = (text: string): string => text.replace(/[.*+?^${}()|[\]\\/]/g, String.raw`\$&`);
/** Longest first, so that kg/h is not read as kg. */
const UNITS = DISPLAY_QUANTITIES.map((quantity) => displaySymbol(quantity, 'si'))
  .sort((a, b) => b.length - a.length)
  .map(escaped)
  .join('|');
/** "5.5 bar g", "0 to 50000 kg/h", "0 or 1 to 480 kW": numbers that share the unit after the last. */
const FIGURES = new RegExp(
  String.raw`(?<![\w.])(${NUMBER}(?:(?: to | or | and )${NUMBER})*)([ \u00a0])(${UNITS})(?![\p{L}\p{N}²³/])`,
  'gu',
);

const plain = (text: string): number => Number(text.replace('\u2212', '-').replace(/[ \u2009\u00a0]/g, ''));

/**
 * A sentence whose figures are in SI units, with each figure in the units of the system: "Product rate is 60000 kg/h; it
 * must be 0 to 50000 kg/h." becomes "Product rate is 132277 lb/h; it must be 0 to 110231 lb/h." Six digits are kept.
 */
export function sentenceIn(system: UnitSystem, sentence: string): string {
  if (system === 'si') return sentence;
  return sentence.replace(FIGURES, (whole, figures: string, gap: string, unit: string) => {
    const quantity = quantityOfUnit(unit);
    if (!quantity) return whole;
    const shown = figures.replace(new RegExp(NUMBER, 'gu'), (text) =>
      shortNumber(toDisplay(quantity, plain(text), system)),
    );
    return `${shown}${gap}${displaySymbol(quantity, system)}`;
  });
}

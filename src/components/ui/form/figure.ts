import { quantityOfUnit, type DisplayQuantity } from '../../../core/quantity/display';
import { shortEnd, shortNumber } from '../../../core/quantity/range';
import { readNumber, type Units } from '../../units';

/** A figure of a form: a quantity that converts, or a unit that is the same to everybody. */
export interface FigureKind {
  readonly quantity?: DisplayQuantity | undefined;
  /** An SI unit as ranges carry it; converts where it stands for a quantity. */
  readonly unit?: string | undefined;
}

const quantityOf = ({ quantity, unit }: FigureKind): DisplayQuantity | undefined =>
  quantity ?? (unit === undefined ? undefined : quantityOfUnit(unit));

/** The unit that stands inside the field. */
export function unitShown(units: Units, kind: FigureKind): string {
  const quantity = quantityOf(kind);
  return quantity ? units.symbol(quantity) : (kind.unit ?? '');
}

/** The text of a value [SI] in its field: six digits, in the units shown; nothing for a missing figure. */
export function figureText(units: Units, kind: FigureKind, value: number | null | undefined): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return '';
  const quantity = quantityOf(kind);
  return shortNumber(quantity ? units.shown(quantity, value) : value);
}

/** What was typed, in SI: null for nothing, NaN for what can't be read. */
export function figureValue(units: Units, kind: FigureKind, text: string): number | null {
  if (text.trim() === '') return null;
  const quantity = quantityOf(kind);
  return (quantity ? units.parse(quantity, text) : readNumber(text)) ?? Number.NaN;
}

/** '0.5 to 16 bar g', 'at least 0 kg'; nothing where no end is known. Ends in SI, spoken in the units shown. */
export function spanSaid(units: Units, kind: FigureKind, min?: number, max?: number): string {
  const unit = unitShown(units, kind);
  const quantity = quantityOf(kind);
  const said = (value: number, end: 'least' | 'most'): string =>
    quantity ? shortEnd(units.shown(quantity, value), end) : shortNumber(value);
  const behind = unit === '' ? '' : ` ${unit}`;
  if (min !== undefined && max !== undefined) return `${said(min, 'least')} to ${said(max, 'most')}${behind}`;
  if (min !== undefined) return `at least ${said(min, 'least')}${behind}`;
  return max === undefined ? '' : `at most ${said(max, 'most')}${behind}`;
}

/** Orders in the words of screens. */
import type { OrderDto, OrderStateDto } from '../../contracts/orders';
import { STAGE_NAMES } from '../../contracts/products';
import type { OrderSplit } from '../../core/orders/split';
import type { StagePace } from '../../core/orders/pace';
import type { PartLoad } from '../../core/orders/amounts';
import { groupDigits } from '../time';
import type { Units } from '../units';

const DAYS = ['Sun', 'Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat'];
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** 'Fri 4 Dec 14:00' of 2026-12-04T14:00; a dash of null. */
export function wallText(wall: string | null): string {
  if (wall === null) return '–';
  const date = new Date(`${wall}:00Z`);
  const day = `${DAYS[date.getUTCDay()]} ${date.getUTCDate()} ${MONTHS[date.getUTCMonth()]}`;
  return `${day} ${wall.slice(11)}`;
}

export function stateText({ kind, placed, total }: OrderStateDto): string {
  if (kind === 'notPlanned') return 'not planned';
  return kind === 'onFloor' ? 'on the floor' : `planned, ${placed} of ${total} placed`;
}

const count = (value: number): string => groupDigits(Math.round(value));

/** '1 200 cases' or '12 240 kg', as it was typed. */
export function quantityText({ quantity, unit, quantityKg }: OrderDto, units: Units): string {
  if (unit === 'kg') return units.text('mass', quantityKg);
  const cases = Number.isInteger(quantity) ? count(quantity) : String(Number(quantity.toFixed(2)));
  return `${cases} ${quantity === 1 ? 'case' : 'cases'}`;
}

/** '18 loads of 1 600', '17 loads of 1 680 and one of 240'. */
export function loadsText({ loads }: OrderSplit): string {
  const sizes = [...new Set(loads.map(({ pieces }) => pieces))];
  const parts = sizes.map((size, i) => {
    const many = loads.filter(({ pieces }) => pieces === size).length;
    const loadWord = i > 0 ? '' : many === 1 ? ' load' : ' loads';
    return `${many === 1 && i > 0 ? 'one' : many}${loadWord} of ${count(size)}`;
  });
  return parts.join(' and ');
}

export const OFFER_NAMES: Readonly<Record<PartLoad, string>> = {
  levelled: 'Levelled: all loads alike',
  remainder: 'Full loads, and the rest as a part load',
  carried: 'Full loads only, the rest carried over',
};

/** What an offer makes of the loads. */
export function offerText(split: OrderSplit): string {
  const loads = split.loads.length > 0 ? loadsText(split) : 'no retort loads';
  const { carriedPieces } = split;
  return carriedPieces === 0 ? loads : `${loads}; ${count(carriedPieces)} containers go into an order of their own`;
}

/** '6 at 80 min with 1 680 each: 126 a minute'. */
export function paceText({ units, piecesEach, minutesEach, piecesPerMin }: StagePace): string {
  const rate = `${piecesPerMin < 10 ? piecesPerMin.toFixed(1) : count(piecesPerMin)} containers a minute`;
  if (piecesEach === null || minutesEach === null) return rate;
  return `${units} at ${count(minutesEach)} min with ${count(piecesEach)} each: ${rate}`;
}

export const paceTitle = ({ stage }: StagePace): string => `The pace is set by: ${STAGE_NAMES[stage]}`;

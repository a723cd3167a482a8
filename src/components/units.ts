import {
  displaySymbol,
  fromDisplay,
  quantityOfUnit,
  toDisplay,
  UNIT_SYSTEMS,
  type DisplayQuantity,
  type UnitSystem,
} from '../core/quantity/display';
import { sentenceIn } from '../core/quantity/sentence';
import { groupDigits } from './time';

/** Figures as the person reads and types them. Inside, every value is SI: bar g, kg/h, kg, degC, K, kW, m. */
export interface Units {
  readonly system: UnitSystem;
  /** '1 555 kg/h', '3 430 lb/h'; `digits` after the point, else as screens round the quantity. */
  readonly text: (quantity: DisplayQuantity, value: number, digits?: number) => string;
  /** The figure alone, with thin spaces in thousands. */
  readonly number: (quantity: DisplayQuantity, value: number, digits?: number) => string;
  readonly symbol: (quantity: DisplayQuantity) => string;
  /** What was typed, in SI; null where it can't be read. A unit typed after the figure counts, of either system. */
  readonly parse: (quantity: DisplayQuantity, text: string) => number | null;
  /** A steam rate as screens round it: '1 555 kg/h', '3 430 lb/h'. */
  readonly rate: (kgPerH: number) => string;
  /** Steam or goods: '2 128 kg'; below 10 with one decimal. */
  readonly mass: (kg: number) => string;
  /** Unrounded, in the units shown: for scales and axes. */
  readonly shown: (quantity: DisplayQuantity, value: number) => number;
  /** The inverse of `shown`. */
  readonly inside: (quantity: DisplayQuantity, shown: number) => number;
  /** A sentence with figures in SI units, spoken in the units shown. */
  readonly sentence: (text: string) => string;
  /** The same for a message that may name products: '2.5 kg' in a name stays. */
  readonly message: (text: string) => string;
}

/** How screens round: to so many digits after the point, or to the nearest step. */
interface Rounding {
  readonly digits: number;
  readonly step?: number;
}

const whole: Rounding = { digits: 0 };
const one: Rounding = { digits: 1 };
const two: Rounding = { digits: 2 };
const three: Rounding = { digits: 3 };
const both = (rounding: Rounding) => ({ si: rounding, usCustomary: rounding });

/** Inputs are good to 20 % at best: more digits of a rate would only look exact. */
const ROUNDINGS: Readonly<Record<DisplayQuantity, Readonly<Record<UnitSystem, Rounding>>>> = {
  gaugePressure: { si: one, usCustomary: whole },
  absolutePressure: { si: three, usCustomary: two },
  pressureDifference: { si: one, usCustomary: one },
  steamRate: { si: { digits: 0, step: 5 }, usCustomary: { digits: 0, step: 10 } },
  steamRateRise: { si: { digits: 0, step: 5 }, usCustomary: { digits: 0, step: 10 } },
  mass: both(whole),
  largeMass: { si: one, usCustomary: { digits: 0, step: 10 } },
  temperature: both(one),
  temperatureDifference: both(one),
  temperatureRise: both(one),
  heatRate: { si: whole, usCustomary: { digits: 0, step: 100 } },
  boilerPower: both(whole),
  heat: both(whole),
  energy: { si: whole, usCustomary: one },
  energyPrice: { si: three, usCustomary: two },
  emissionFactor: { si: three, usCustomary: one },
  length: both(one),
  shortLength: { si: whole, usCustomary: two },
  area: both(one),
  shortArea: { si: whole, usCustomary: two },
  volume: { si: two, usCustomary: one },
  liquidVolume: both(whole),
  liquidRate: both(one),
  density: both(whole),
  specificHeat: both(three),
  enthalpy: { si: whole, usCustomary: one },
  heatCapacity: both(whole),
  heatTransferCoefficient: both(whole),
  heatConductance: { si: three, usCustomary: whole },
  massFlux: both(two),
  massPerMass: both(two),
  share: both(one),
};

const grouped = (value: number, digits: number): string => {
  const text = Math.abs(value).toFixed(digits);
  const [front = '0', behind] = text.split('.');
  const sign = value < 0 && Number(text) !== 0 ? '\u2212' : '';
  return `${sign}${groupDigits(Number(front))}${behind === undefined ? '' : `.${behind}`}`;
};

/** Temperatures and the like drop a zero after the point: 121.1 but 250. */
const trimmed = (text: string): string => (text.includes('.') ? text.replace(/\.?0+$/, '') : text);
const KEEPS_ZEROS: ReadonlySet<DisplayQuantity> = new Set(['gaugePressure', 'absolutePressure', 'pressureDifference']);

function screenNumber(quantity: DisplayQuantity, shown: number, system: UnitSystem, digits?: number): string {
  if (!Number.isFinite(shown)) return '\u2013';
  if (digits !== undefined) return grouped(shown, digits);
  const { digits: usual, step = 0 } = ROUNDINGS[quantity][system];
  const small = quantity === 'mass' && shown > 0 && shown < 10;
  const low = quantity === 'gaugePressure' && usual === 0 && Math.abs(shown) < 20;
  if (small || low) return grouped(shown, 1);
  const text = grouped(step > 0 ? Math.round(shown / step) * step : shown, usual);
  return KEEPS_ZEROS.has(quantity) ? text : trimmed(text);
}

/** Digits, spaces or commas between full groups of three, a point: '1 500', '1,500.5'; '1,5' can't be read safely. */
const READABLE = /^[-\u2212+]?(\d{1,3}([ \u2009\u00a0,])\d{3}(\2\d{3})*|\d+)?(\.\d*)?$/;

/** A typed number; null for what is empty, half typed or may be read in two ways. */
export function readNumber(text: string): number | null {
  const bare = text.trim();
  if (!/\d/.test(bare) || !READABLE.test(bare)) return null;
  const value = Number(bare.replace(/[ \u2009\u00a0,+]/g, '').replace('\u2212', '-'));
  return Number.isFinite(value) ? value : null;
}

const squeezed = (text: string): string => text.replace(/[\s°]/g, '').toLowerCase();

function parseTyped(quantity: DisplayQuantity, text: string, system: UnitSystem): number | null {
  const [, figure = '', unit = ''] = /^([-\u2212+\d.,\s\u2009\u00a0]*)(.*)$/su.exec(text.trim()) ?? [];
  const said = UNIT_SYSTEMS.find((each) => squeezed(displaySymbol(quantity, each)) === squeezed(unit));
  const typed = readNumber(figure);
  if (typed === null || (unit !== '' && said === undefined)) return null;
  const matches = unit === '' || squeezed(displaySymbol(quantity, system)) === squeezed(unit);
  return fromDisplay(quantity, typed, matches ? system : (said ?? system));
}

function makeUnits(system: UnitSystem): Units {
  const symbol = (quantity: DisplayQuantity): string => displaySymbol(quantity, system);
  const shown = (quantity: DisplayQuantity, value: number): number => toDisplay(quantity, value, system);
  const number = (quantity: DisplayQuantity, value: number, digits?: number): string =>
    screenNumber(quantity, shown(quantity, value), system, digits);
  const text = (quantity: DisplayQuantity, value: number, digits?: number): string =>
    `${number(quantity, value, digits)}\u00a0${symbol(quantity)}`;
  return {
    system,
    symbol,
    shown,
    number,
    rate: (kgPerH) => text('steamRate', kgPerH),
    mass: (kg) => text('mass', kg),
    inside: (quantity, value) => fromDisplay(quantity, value, system),
    text,
    parse: (quantity, text) => parseTyped(quantity, text, system),
    sentence: (text) => sentenceIn(system, text),
    message: (text) => sentenceIn(system, text, ['mass']),
  };
}

const UNITS: Readonly<Record<UnitSystem, Units>> = { si: makeUnits('si'), usCustomary: makeUnits('usCustomary') };

/** The units of a system; always the same object. */
export const unitsOf = (system: UnitSystem): Units => UNITS[system];

/** A figure given in an SI unit by its symbol, as ranges and workings carry it; an unknown unit stays as it is. */
export function inUnits(
  units: Units,
  value: number,
  siUnit: string,
): { readonly value: number; readonly unit: string } {
  const quantity = quantityOfUnit(siUnit);
  return quantity ? { value: units.shown(quantity, value), unit: units.symbol(quantity) } : { value, unit: siUnit };
}

/** Units on screens and prints: SI inside, always; a plant shows either system. */
export type UnitSystem = 'si' | 'usCustomary';
export type DisplayQuantity =
  'gaugePressure' | 'steamRate' | 'mass' | 'temperature' | 'temperatureDifference' | 'heatRate';

/** value shown = value inside * factor + offset. */
interface Scale {
  readonly symbol: string;
  readonly factor: number;
  readonly offset: number;
}

/** Exact by definition: international pound, standard gravity and inch (NIST SP 811, B.8); International Table Btu. */
const KG_PER_LB = 0.45359237;
const BAR_PER_PSI = (KG_PER_LB * 9.80665) / 0.0254 ** 2 / 1e5;
const KJ_PER_BTU = 1.05505585262;

const scale = (symbol: string, factor = 1, offset = 0): Scale => ({ symbol, factor, offset });

const SCALES: Readonly<Record<DisplayQuantity, Readonly<Record<UnitSystem, Scale>>>> = {
  gaugePressure: { si: scale('bar g'), usCustomary: scale('psig', 1 / BAR_PER_PSI) },
  steamRate: { si: scale('kg/h'), usCustomary: scale('lb/h', 1 / KG_PER_LB) },
  mass: { si: scale('kg'), usCustomary: scale('lb', 1 / KG_PER_LB) },
  temperature: { si: scale('°C'), usCustomary: scale('°F', 1.8, 32) },
  temperatureDifference: { si: scale('K'), usCustomary: scale('°F', 1.8) },
  heatRate: { si: scale('kW'), usCustomary: scale('BTU/h', 3600 / KJ_PER_BTU) },
};

/** The unit's symbol in a system: kg/h or lb/h, bar g or psig. */
export const displaySymbol = (quantity: DisplayQuantity, system: UnitSystem): string => SCALES[quantity][system].symbol;

/** A value in bar g, kg/h, kg, degC, K or kW as the system shows it, unrounded. */
export function toDisplay(quantity: DisplayQuantity, value: number, system: UnitSystem): number {
  const { factor, offset } = SCALES[quantity][system];
  return value * factor + offset;
}

/** The inverse of {@link toDisplay}: what a person typed, back to bar g, kg/h, kg, degC, K or kW. */
export function fromDisplay(quantity: DisplayQuantity, shown: number, system: UnitSystem): number {
  const { factor, offset } = SCALES[quantity][system];
  return (shown - offset) / factor;
}

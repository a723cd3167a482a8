/** Units on screens and prints: SI inside, always; a plant and a person show either system. */
export const UNIT_SYSTEMS = ['si', 'usCustomary'] as const;
export type UnitSystem = (typeof UNIT_SYSTEMS)[number];

/** value shown = value inside * factor + offset. */
interface Scale {
  readonly symbol: string;
  readonly factor: number;
  readonly offset: number;
}

/** Exact by definition: international pound, standard gravity and inch (NIST SP 811, B.8); International Table Btu. */
const KG_PER_LB = 0.45359237;
const M_PER_IN = 0.0254;
const M_PER_FT = 12 * M_PER_IN;
const BAR_PER_PSI = (KG_PER_LB * 9.80665) / M_PER_IN ** 2 / 1e5;
const KJ_PER_BTU = 1.05505585262;
/** US gallon of 231 cubic inches, exact: NIST Handbook 44, appendix C. */
const M3_PER_GAL = 231 * M_PER_IN ** 3;

/**
 * Boiler horsepower [kW]. By definition 34.5 lb/h of water evaporated from and at 212 degF; the trade's round figure of
 * 33 475 BTU/h (34.5 x 970.3 BTU/lb) is taken as exact here, with the International Table Btu. NIST SP 811, B.8 gives
 * 9.8095 kW, which is 0.011 % less.
 */
const KW_PER_BOILER_HP = (33_475 * KJ_PER_BTU) / 3600;
/** A boiler's rating from and at 212 degF [kg/h] in boiler horsepower: 34.5 lb/h each, exact. */
export const boilerHorsepower = (fromAndAtKgPerH: number): number => fromAndAtKgPerH / (34.5 * KG_PER_LB);

const scale = (symbol: string, factor = 1, offset = 0): Scale => ({ symbol, factor, offset });
const pair = (si: string, usCustomary: string, factor: number, offset = 0) => ({
  si: scale(si),
  usCustomary: scale(usCustomary, factor, offset),
});

const PER_LB = 1 / KG_PER_LB;
const PER_FT = 1 / M_PER_FT;
const PER_PSI = 1 / BAR_PER_PSI;

const SCALES = {
  gaugePressure: pair('bar g', 'psig', PER_PSI),
  absolutePressure: pair('bar a', 'psia', PER_PSI),
  pressureDifference: pair('bar', 'psi', PER_PSI),
  steamRate: pair('kg/h', 'lb/h', PER_LB),
  steamRateRise: pair('kg/h per min', 'lb/h per min', PER_LB),
  mass: pair('kg', 'lb', PER_LB),
  largeMass: pair('t', 'lb', 1000 * PER_LB),
  temperature: pair('°C', '°F', 1.8, 32),
  temperatureDifference: pair('K', '°F', 1.8),
  temperatureRise: pair('K/min', '°F/min', 1.8),
  heatRate: pair('kW', 'BTU/h', 3600 / KJ_PER_BTU),
  boilerPower: pair('kW', 'boiler hp', 1 / KW_PER_BOILER_HP),
  heat: pair('kJ', 'BTU', 1 / KJ_PER_BTU),
  energy: pair('kWh', 'million BTU', 3600 / KJ_PER_BTU / 1e6),
  energyPrice: pair('per kWh', 'per million BTU', (KJ_PER_BTU / 3600) * 1e6),
  emissionFactor: pair('kg/kWh', 'lb per million BTU', (PER_LB * KJ_PER_BTU * 1e6) / 3600),
  length: pair('m', 'ft', PER_FT),
  shortLength: pair('mm', 'in', 0.001 / M_PER_IN),
  area: pair('m²', 'ft²', PER_FT ** 2),
  shortArea: pair('mm²', 'in²', 1e-6 / M_PER_IN ** 2),
  volume: pair('m³', 'ft³', PER_FT ** 3),
  liquidVolume: pair('L', 'gal', 0.001 / M3_PER_GAL),
  liquidRate: pair('m³/h', 'gal/min', 1 / (60 * M3_PER_GAL)),
  density: pair('kg/m³', 'lb/ft³', PER_LB * M_PER_FT ** 3),
  specificHeat: pair('kJ/kgK', 'BTU/lb°F', KG_PER_LB / KJ_PER_BTU / 1.8),
  enthalpy: pair('kJ/kg', 'BTU/lb', KG_PER_LB / KJ_PER_BTU),
  heatCapacity: pair('kJ/K', 'BTU/°F', 1 / KJ_PER_BTU / 1.8),
  heatTransferCoefficient: pair('W/m²K', 'BTU/h ft²°F', (3.6 / KJ_PER_BTU) * (M_PER_FT ** 2 / 1.8)),
  heatConductance: pair('kW/K', 'BTU/h°F', 3600 / KJ_PER_BTU / 1.8),
  massFlux: pair('kg/m²h', 'lb/ft²h', PER_LB * M_PER_FT ** 2),
  massPerMass: pair('kg/kg', 'lb/lb', 1),
  /** A fraction inside, per cent on screens. */
  share: { si: scale('%', 100), usCustomary: scale('%', 100) },
} as const;

export type DisplayQuantity = keyof typeof SCALES;
export const DISPLAY_QUANTITIES = Object.keys(SCALES) as DisplayQuantity[];

/** The unit's symbol in a system: kg/h or lb/h, bar g or psig. */
export const displaySymbol = (quantity: DisplayQuantity, system: UnitSystem): string => SCALES[quantity][system].symbol;

/** A value in the quantity's SI unit (bar g, kg/h, kg, degC, K, kW ...) as the system shows it, unrounded. */
export function toDisplay(quantity: DisplayQuantity, value: number, system: UnitSystem): number {
  const { factor, offset } = SCALES[quantity][system];
  return value * factor + offset;
}

/** The inverse of {@link toDisplay}: what a person typed, back to the quantity's SI unit. */
export function fromDisplay(quantity: DisplayQuantity, shown: number, system: UnitSystem): number {
  const { factor, offset } = SCALES[quantity][system];
  return (shown - offset) / factor;
}

/** kW is a heat rate unless a form says boiler power; a figure in % is one already. */
const NOT_BY_SYMBOL: readonly DisplayQuantity[] = ['boilerPower', 'share'];
const BY_SYMBOL: ReadonlyMap<string, DisplayQuantity> = new Map(
  DISPLAY_QUANTITIES.filter((quantity) => !NOT_BY_SYMBOL.includes(quantity)).map((quantity) => [
    SCALES[quantity].si.symbol,
    quantity,
  ]),
);

/** The quantity that an SI unit in a range or a working stands for; undefined for minutes, counts and shares. */
export const quantityOfUnit = (siUnit: string): DisplayQuantity | undefined => BY_SYMBOL.get(siUnit);

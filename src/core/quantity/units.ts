/** Units the compiler keeps apart. A brand is only a type: at run time each is a plain number. */
declare const unit: unique symbol;
type Unit<Name extends string> = number & { readonly [unit]: Name };

/** Temperature [degC]. */
export type Celsius = Unit<'degC'>;
/** Thermodynamic temperature [K]. */
export type Kelvin = Unit<'K'>;
/** Pressure above ambient, as a plant's gauges read it [bar g]. */
export type BarGauge = Unit<'bar g'>;
/** Absolute pressure [bar a]. */
export type BarAbsolute = Unit<'bar a'>;
/** Absolute pressure as IAPWS-IF97 takes it [MPa a]. */
export type MegapascalAbs = Unit<'MPa a'>;

/** Marks a number as degC. */
export const celsius = (value: number): Celsius => value as Celsius;
/** Marks a number as K. */
export const kelvin = (value: number): Kelvin => value as Kelvin;
/** Marks a number as bar g. */
export const barGauge = (value: number): BarGauge => value as BarGauge;
/** Marks a number as bar a. */
export const barAbsolute = (value: number): BarAbsolute => value as BarAbsolute;
/** Marks a number as MPa a. */
export const megapascalAbs = (value: number): MegapascalAbs => value as MegapascalAbs;

/** Zero of the Celsius scale [K], exact: BIPM, The International System of Units, 9th edition, 2.3.1. */
const CELSIUS_ZERO_K = 273.15;

/** degC to K, exact. */
export const toKelvin = (t: Celsius): Kelvin => kelvin(t + CELSIUS_ZERO_K);
/** K to degC, exact. */
export const toCelsius = (t: Kelvin): Celsius => celsius(t - CELSIUS_ZERO_K);

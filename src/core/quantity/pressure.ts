import { fail, ok, type Result } from '../result';
import { checkRange } from './range';
import { barAbsolute, barGauge, megapascalAbs, type BarAbsolute, type BarGauge, type MegapascalAbs } from './units';

/** Standard atmosphere [bar a], exact: 10th CGPM (1954), resolution 4. */
export const STANDARD_ATMOSPHERE: BarAbsolute = barAbsolute(1.01325);

/** Gauge to absolute pressure; with {@link toGauge} the only door between the two. */
export function toAbsolute(gauge: BarGauge, ambient: BarAbsolute = STANDARD_ATMOSPHERE): BarAbsolute {
  return barAbsolute(gauge + ambient);
}

/** Absolute to gauge pressure. */
export function toGauge(absolute: BarAbsolute, ambient: BarAbsolute = STANDARD_ATMOSPHERE): BarGauge {
  return barGauge(absolute - ambient);
}

/** bar a to MPa a. */
export const toMegapascal = (p: BarAbsolute): MegapascalAbs => megapascalAbs(p / 10);

/** MPa a to bar a. */
export const toBar = (p: MegapascalAbs): BarAbsolute => barAbsolute(p * 10);

/**
 * Mean ambient pressure at an altitude [m above sea level], troposphere.
 * p = p0 (1 - 0.0065 H / 288.15)^5.25588. Source: ICAO Doc 7488, Manual of the ICAO Standard Atmosphere (also ISO 2533).
 * @returns ALTITUDE-RANGE outside -500 to 5000 m, where no plant stands.
 */
export function ambientAtAltitude(altitudeM: number): Result<BarAbsolute> {
  const range = { name: 'Altitude', unit: 'm', min: -500, max: 5000 };
  const bad = checkRange('ALTITUDE-RANGE', range, altitudeM, 'altitudeM');
  if (bad) return fail(bad);
  return ok(barAbsolute(STANDARD_ATMOSPHERE * (1 - (0.0065 * altitudeM) / 288.15) ** 5.25588));
}

/**
 * Checks an ambient pressure.
 * @returns AMBIENT-RANGE outside 0.5 to 1.1 bar a; a gauge pressure passed by mistake is caught here.
 */
export function checkAmbient(ambient: BarAbsolute): Result<BarAbsolute> {
  const range = { name: 'Ambient pressure', unit: 'bar a', min: 0.5, max: 1.1 };
  const bad = checkRange('AMBIENT-RANGE', range, ambient, 'ambient');
  return bad ? fail(bad) : ok(ambient);
}

/**
 * IAPWS-IF97 region 4: the saturation line, both ways.
 * Source: IAPWS R7-97(2012), equations 29 to 31, table 34.
 */
import { kelvin, megapascalAbs, type Kelvin, type MegapascalAbs } from '../quantity/units';

/** Table 34: n1 to n10. */
const [N1, N2, N3, N4, N5, N6, N7, N8, N9, N10] = [
  1167.0521452767, -724213.16703206, -17.073846940092, 12020.82470247, -3232555.0322333, 14.91510861353,
  -4823.2657361591, 405113.40542057, -0.23855557567849, 650.17534844798,
] as const;

/** psat(T), equation 30. Unchecked: valid from 273.15 to 647.096 K. */
export function saturationPressure(t: Kelvin): MegapascalAbs {
  const theta = t + N9 / (t - N10);
  const a = theta ** 2 + N1 * theta + N2;
  const b = N3 * theta ** 2 + N4 * theta + N5;
  const c = N6 * theta ** 2 + N7 * theta + N8;
  return megapascalAbs(((2 * c) / (-b + Math.sqrt(b ** 2 - 4 * a * c))) ** 4);
}

/** Tsat(p), equation 31. Unchecked: valid from 611.213e-6 to 22.064 MPa. */
export function saturationTemperature(p: MegapascalAbs): Kelvin {
  const beta = p ** 0.25;
  const e = beta ** 2 + N3 * beta + N6;
  const f = N1 * beta ** 2 + N4 * beta + N7;
  const g = N2 * beta ** 2 + N5 * beta + N8;
  const d = (2 * g) / (-f - Math.sqrt(f ** 2 - 4 * e * g));
  return kelvin((N10 + d - Math.sqrt((N10 + d) ** 2 - 4 * (N9 + N10 * d))) / 2);
}

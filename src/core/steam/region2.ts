/**
 * IAPWS-IF97 region 2: steam, 273.15 to 1073.15 K, up to saturation or to the boundary with region 3.
 * Source: IAPWS R7-97(2012), equations 15 to 17, tables 10 and 11; derivatives as in tables 13 and 14.
 */
import type { Kelvin, MegapascalAbs } from '../quantity/units';
import { propertiesFromGibbs, type FluidProperties } from './gibbs';

/** Table 10, ideal-gas part: exponent J, coefficient n. */
const TABLE_10: readonly (readonly [J: number, n: number])[] = [
  [0, -9.6927686500217],
  [1, 10.086655968018],
  [-5, -0.005608791128302],
  [-4, 0.071452738081455],
  [-3, -0.40710498223928],
  [-2, 1.4240819171444],
  [-1, -4.383951131945],
  [2, -0.28408632460772],
  [3, 0.021268463753307],
];

/** Table 11, residual part: exponents I and J, coefficient n. */
const TABLE_11: readonly (readonly [I: number, J: number, n: number])[] = [
  [1, 0, -0.0017731742473213],
  [1, 1, -0.017834862292358],
  [1, 2, -0.045996013696365],
  [1, 3, -0.057581259083432],
  [1, 6, -0.05032527872793],
  [2, 1, -3.3032641670203e-5],
  [2, 2, -0.00018948987516315],
  [2, 4, -0.0039392777243355],
  [2, 7, -0.043797295650573],
  [2, 36, -2.6674547914087e-5],
  [3, 0, 2.0481737692309e-8],
  [3, 1, 4.3870667284435e-7],
  [3, 3, -3.227767723857e-5],
  [3, 6, -0.0015033924542148],
  [3, 35, -0.040668253562649],
  [4, 1, -7.8847309559367e-10],
  [4, 2, 1.2790717852285e-8],
  [4, 3, 4.8225372718507e-7],
  [5, 7, 2.2922076337661e-6],
  [6, 3, -1.6714766451061e-11],
  [6, 16, -0.0021171472321355],
  [6, 35, -23.895741934104],
  [7, 0, -5.905956432427e-18],
  [7, 11, -1.2621808899101e-6],
  [7, 25, -0.038946842435739],
  [8, 8, 1.1256211360459e-11],
  [8, 36, -8.2311340897998],
  [9, 13, 1.9809712802088e-8],
  [10, 4, 1.0406965210174e-19],
  [10, 10, -1.0234747095929e-13],
  [10, 14, -1.0018179379511e-9],
  [16, 29, -8.0882908646985e-11],
  [16, 50, 0.10693031879409],
  [18, 57, -0.33662250574171],
  [20, 20, 8.9185845355421e-25],
  [20, 35, 3.0629316876232e-13],
  [20, 48, -4.2002467698208e-6],
  [21, 21, -5.9056029685639e-26],
  [22, 53, 3.7826947613457e-6],
  [23, 39, -1.2768608934681e-15],
  [24, 26, 7.3087610595061e-29],
  [24, 40, 5.5414715350778e-17],
  [24, 58, -9.436970724121e-7],
];

/** Properties of steam. Unchecked: outside region 2 the numbers mean nothing. */
export function region2(p: MegapascalAbs, t: Kelvin): FluidProperties {
  const pi = p;
  const tau = 540 / t;
  const b = tau - 0.5;
  const g = { value: Math.log(pi), pi: 1 / pi, piPi: -1 / pi ** 2, tau: 0, tauTau: 0, piTau: 0 };
  for (const [j, n] of TABLE_10) {
    const term = n * tau ** j;
    g.value += term;
    g.tau += (j * term) / tau;
    g.tauTau += (j * (j - 1) * term) / tau ** 2;
  }
  for (const [i, j, n] of TABLE_11) {
    const term = n * pi ** i * b ** j;
    g.value += term;
    g.pi += (i * term) / pi;
    g.piPi += (i * (i - 1) * term) / pi ** 2;
    g.tau += (j * term) / b;
    g.tauTau += (j * (j - 1) * term) / b ** 2;
    g.piTau += (i * j * term) / (pi * b);
  }
  return propertiesFromGibbs(p, t, pi, tau, g);
}

/** Pressure on the boundary between regions 2 and 3 [MPa a]: equation 5, table 1. For 623.15 to 863.15 K. */
export function boundary23(t: Kelvin): number {
  return 348.05185628969 - 1.1671859879975 * t + 0.0010192970039326 * t ** 2;
}

/**
 * IAPWS-IF97 region 1: liquid water, 273.15 to 623.15 K from saturation to 100 MPa.
 * Source: IAPWS R7-97(2012), equation 7, table 2; derivatives as in table 4.
 */
import type { Kelvin, MegapascalAbs } from '../quantity/units';
import { propertiesFromGibbs, type FluidProperties } from './gibbs';

/** Table 2: exponents I and J, coefficient n. */
const TABLE_2: readonly (readonly [I: number, J: number, n: number])[] = [
  [0, -2, 0.14632971213167],
  [0, -1, -0.84548187169114],
  [0, 0, -3.756360367204],
  [0, 1, 3.3855169168385],
  [0, 2, -0.95791963387872],
  [0, 3, 0.15772038513228],
  [0, 4, -0.016616417199501],
  [0, 5, 0.00081214629983568],
  [1, -9, 0.00028319080123804],
  [1, -7, -0.00060706301565874],
  [1, -1, -0.018990068218419],
  [1, 0, -0.032529748770505],
  [1, 1, -0.021841717175414],
  [1, 3, -5.283835796993e-5],
  [2, -3, -0.00047184321073267],
  [2, 0, -0.00030001780793026],
  [2, 1, 4.7661393906987e-5],
  [2, 3, -4.4141845330846e-6],
  [2, 17, -7.2694996297594e-16],
  [3, -4, -3.1679644845054e-5],
  [3, 0, -2.8270797985312e-6],
  [3, 6, -8.5205128120103e-10],
  [4, -5, -2.2425281908e-6],
  [4, -2, -6.5171222895601e-7],
  [4, 10, -1.4341729937924e-13],
  [5, -8, -4.0516996860117e-7],
  [8, -11, -1.2734301741641e-9],
  [8, -6, -1.7424871230634e-10],
  [21, -29, -6.8762131295531e-19],
  [23, -31, 1.4478307828521e-20],
  [29, -38, 2.6335781662795e-23],
  [30, -39, -1.1947622640071e-23],
  [31, -40, 1.8228094581404e-24],
  [32, -41, -9.3537087292458e-26],
];

/** Properties of liquid water. Unchecked: outside region 1 the numbers mean nothing. */
export function region1(p: MegapascalAbs, t: Kelvin): FluidProperties {
  const pi = p / 16.53;
  const tau = 1386 / t;
  const a = 7.1 - pi;
  const b = tau - 1.222;
  const g = { value: 0, pi: 0, piPi: 0, tau: 0, tauTau: 0, piTau: 0 };
  for (const [i, j, n] of TABLE_2) {
    const term = n * a ** i * b ** j;
    g.value += term;
    g.pi -= (i * term) / a;
    g.piPi += (i * (i - 1) * term) / a ** 2;
    g.tau += (j * term) / b;
    g.tauTau += (j * (j - 1) * term) / b ** 2;
    g.piTau -= (i * j * term) / (a * b);
  }
  return propertiesFromGibbs(p, t, pi, tau, g);
}

/** From a dimensionless Gibbs free energy to properties: IAPWS R7-97(2012), tables 3 and 12. */
import type { Kelvin, MegapascalAbs } from '../quantity/units';

/** Properties of water or steam at one pressure and temperature. */
export interface FluidProperties {
  /** Specific volume [m3/kg]. */
  readonly v: number;
  /** Specific enthalpy [kJ/kg]. */
  readonly h: number;
  /** Specific internal energy [kJ/kg]. */
  readonly u: number;
  /** Specific entropy [kJ/kgK]. */
  readonly s: number;
  /** Specific isobaric heat capacity [kJ/kgK]. */
  readonly cp: number;
  /** Speed of sound [m/s]. */
  readonly w: number;
}

/** gamma and its partial derivatives by reduced pressure pi and inverse reduced temperature tau. */
export interface Gibbs {
  readonly value: number;
  readonly pi: number;
  readonly piPi: number;
  readonly tau: number;
  readonly tauTau: number;
  readonly piTau: number;
}

/** Specific gas constant of water [kJ/kgK]: IAPWS R7-97(2012), equation 1. */
const R = 0.461526;

/** Table 3; with gamma = ideal + residual part, table 12 reads the same. */
export function propertiesFromGibbs(p: MegapascalAbs, t: Kelvin, pi: number, tau: number, g: Gibbs): FluidProperties {
  const rt = R * t;
  const soundDivisor = (g.pi - tau * g.piTau) ** 2 / (tau ** 2 * g.tauTau) - g.piPi;
  return {
    v: (rt * pi * g.pi) / (1000 * p),
    h: rt * tau * g.tau,
    u: rt * (tau * g.tau - pi * g.pi),
    s: R * (tau * g.tau - g.value),
    cp: -R * tau ** 2 * g.tauTau,
    w: Math.sqrt((1000 * rt * g.pi ** 2) / soundDivisor),
  };
}

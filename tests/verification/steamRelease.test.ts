/** The computer-program verification values of IAPWS R7-97(2012), to the nine digits printed. */
import { describe, it } from 'vitest';
import { kelvin, megapascalAbs } from '@/core/quantity/units';
import type { FluidProperties } from '@/core/steam/gibbs';
import { region1 } from '@/core/steam/region1';
import { boundary23, region2 } from '@/core/steam/region2';
import { saturationPressure, saturationTemperature } from '@/core/steam/region4';
import { expectRelative } from './steamSupport';

const TOLERANCE = 1e-8;

type Row = readonly [t: number, p: number, v: number, h: number, u: number, s: number, cp: number, w: number];

const TABLE_5: readonly Row[] = [
  [300, 3, 0.100215168e-2, 0.115331273e3, 0.112324818e3, 0.392294792, 0.417301218e1, 0.150773921e4],
  [300, 80, 0.971180894e-3, 0.184142828e3, 0.106448356e3, 0.368563852, 0.401008987e1, 0.163469054e4],
  [500, 3, 0.1202418e-2, 0.975542239e3, 0.971934985e3, 0.258041912e1, 0.465580682e1, 0.124071337e4],
];

const TABLE_15: readonly Row[] = [
  [300, 0.0035, 0.394913866e2, 0.254991145e4, 0.24116916e4, 0.852238967e1, 0.191300162e1, 0.427920172e3],
  [700, 0.0035, 0.923015898e2, 0.333568375e4, 0.301262819e4, 0.101749996e2, 0.208141274e1, 0.644289068e3],
  [700, 30, 0.542946619e-2, 0.263149474e4, 0.246861076e4, 0.517540298e1, 0.103505092e2, 0.480386523e3],
];

function expectRow(at: FluidProperties, [, , v, h, u, s, cp, w]: Row): void {
  for (const [value, expected] of [
    [at.v, v],
    [at.h, h],
    [at.u, u],
    [at.s, s],
    [at.cp, cp],
    [at.w, w],
  ] as const) {
    expectRelative(value, expected, TOLERANCE);
  }
}

describe('region 1', () => {
  it.each(TABLE_5)('Table 5: %d K, %d MPa', (...row) => {
    expectRow(region1(megapascalAbs(row[1]), kelvin(row[0])), row);
  });
});

describe('region 2', () => {
  it.each(TABLE_15)('Table 15: %d K, %d MPa', (...row) => {
    expectRow(region2(megapascalAbs(row[1]), kelvin(row[0])), row);
  });

  it('meets region 3 at 623.15 K and 16.5291643 MPa (section 4, equation 5)', () => {
    expectRelative(boundary23(kelvin(623.15)), 16.5291643, TOLERANCE);
  });
});

describe('region 4', () => {
  it.each([
    [300, 0.353658941e-2],
    [500, 0.263889776e1],
    [600, 0.123443146e2],
  ])('Table 35: psat(%d K)', (t, p) => {
    expectRelative(saturationPressure(kelvin(t)), p, TOLERANCE);
  });

  it.each([
    [0.1, 0.372755919e3],
    [1, 0.453035632e3],
    [10, 0.584149488e3],
  ])('Table 36: Tsat(%d MPa)', (p, t) => {
    expectRelative(saturationTemperature(megapascalAbs(p)), t, TOLERANCE);
  });
});

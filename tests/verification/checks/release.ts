/** The computer-program verification values of the IAPWS-IF97 release, to the nine digits printed. */
import { barAbsolute, kelvin, megapascalAbs, toKelvin } from '@/core/quantity/units';
import { steamTemperature, waterTemperature } from '@/core/steam/fluid';
import type { FluidProperties } from '@/core/steam/gibbs';
import { region1 } from '@/core/steam/region1';
import { boundary23, region2 } from '@/core/steam/region2';
import { saturationPressure, saturationTemperature } from '@/core/steam/region4';
import { valueOf } from '../outcome';
import { absolute, relative, within, type Check, type Table } from './check';

const RELEASE = 'IAPWS R7-97(2012)';
const NINE_DIGITS = relative(1e-8);
const table = (name: string): Table => ({ group: 'IF97 release', source: `${RELEASE}, ${name}`, mark: 'published' });

const PROPERTIES = [
  ['v', 'm³/kg'],
  ['h', 'kJ/kg'],
  ['u', 'kJ/kg'],
  ['s', 'kJ/kgK'],
  ['cp', 'kJ/kgK'],
  ['w', 'm/s'],
] as const;

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

type Region = (p: ReturnType<typeof megapascalAbs>, t: ReturnType<typeof kelvin>) => FluidProperties;

const properties = (name: string, rows: readonly Row[], region: Region): Check[] =>
  rows.flatMap(([t, p, ...figures]) =>
    PROPERTIES.map(([property, unit], i) => {
      const computed = () => region(megapascalAbs(p), kelvin(t))[property];
      return within(
        table(name),
        `${property} at ${t} K, ${p} MPa`,
        unit,
        figures[i] ?? Number.NaN,
        NINE_DIGITS,
        computed,
      );
    }),
  );

const TABLE_35 = [
  [300, 0.353658941e-2],
  [500, 0.263889776e1],
  [600, 0.123443146e2],
] as const;
const TABLE_36 = [
  [0.1, 0.372755919e3],
  [1, 0.453035632e3],
  [10, 0.584149488e3],
] as const;

/** The release's backward equations are off by up to 25 mK in regions 1 and 2; ours are exact inverses. */
const BACKWARD = absolute(0.025);
const TABLE_7 = [
  [3, 500, 0.391798509e3],
  [80, 500, 0.378108626e3],
  [80, 1500, 0.611041229e3],
] as const;
const TABLE_24 = [
  [0.001, 3000, 0.534433241e3],
  [3, 3000, 0.57537337e3],
  [3, 4000, 0.101077577e4],
  [5, 3500, 0.801299102e3],
  [5, 4000, 0.101531583e4],
  [25, 3500, 0.875279054e3],
  [40, 2700, 0.743056411e3],
  [60, 2700, 0.791137067e3],
  [60, 3200, 0.88275686e3],
] as const;

export const releaseChecks: readonly Check[] = [
  ...properties('Table 5', TABLE_5, region1),
  ...properties('Table 15', TABLE_15, region2),
  within(table('section 4, equation 5'), 'p between regions 2 and 3 at 623.15 K', 'MPa', 16.5291643, NINE_DIGITS, () =>
    boundary23(kelvin(623.15)),
  ),
  ...TABLE_35.map(([t, p]) =>
    within(table('Table 35'), `psat at ${t} K`, 'MPa', p, NINE_DIGITS, () => saturationPressure(kelvin(t))),
  ),
  ...TABLE_36.map(([p, t]) =>
    within(table('Table 36'), `Tsat at ${p} MPa`, 'K', t, NINE_DIGITS, () => saturationTemperature(megapascalAbs(p))),
  ),
  ...TABLE_7.map(([p, h, t]) =>
    within(table('Table 7'), `T of water at ${p} MPa, ${h} kJ/kg`, 'K', t, BACKWARD, () =>
      toKelvin(valueOf(waterTemperature(barAbsolute(10 * p), h))),
    ),
  ),
  ...TABLE_24.map(([p, h, t]) =>
    within(table('Table 24'), `T of steam at ${p} MPa, ${h} kJ/kg`, 'K', t, BACKWARD, () =>
      toKelvin(valueOf(steamTemperature(barAbsolute(10 * p), h))),
    ),
  ),
];

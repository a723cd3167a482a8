/** Flash steam, steam stored in hot water, accumulators. */
import { toAbsolute } from '@/core/quantity/pressure';
import { barAbsolute, barGauge, celsius, type BarAbsolute } from '@/core/quantity/units';
import { accumulatorReleaseKg, flashFraction, storedSteamKgPerBar } from '@/core/steam/flash';
import { waterAt } from '@/core/steam/fluid';
import { saturationAtPressure, saturationAtTemperature } from '@/core/steam/saturation';
import { valueOf } from '../outcome';
import { absolute, printed, relative, within, type Check, type Table } from './check';

const INDEPENDENT = 'Computed with an independent implementation of IAPWS-IF97 (python3-iapws 1.5.3)';
const independent = (group: string): Table => ({ group, source: INDEPENDENT, mark: 'independent' });
const published = (group: string, source: string): Table => ({ group, source, mark: 'published' });
const gauge = (barG: number) => toAbsolute(barGauge(barG));
const percentFlashed = (from: BarAbsolute, to: BarAbsolute) => 100 * valueOf(flashFraction(from, to));

/** from, to [bar a]; per cent. */
const FLASHED: readonly (readonly [number, number, string])[] = [
  [8.01325, 1.01325, '13.3978'],
  [6.01325, 1.01325, '11.1624'],
  [11.5, 1.0133, '16.441'],
  [8, 1.0133, '13.384'],
  [8, 1.7, '10.734'],
  [15, 4, '11.250'],
  [4.01325, 1.01325, '8.25360'],
  [11.01325, 1.01325, '16.0619'],
  [11.01325, 2.01325, '12.5337'],
  [8.01325, 1.51325, '11.3745'],
];

/** Old steam tables: 0.1 of a percentage point. */
const FLASH_PUBLISHED: readonly (readonly [what: string, from: number, to: number, percent: number, source: string])[] =
  [
    ['7 to 0 bar g', 8.01325, 1.01325, 13.4, 'Steam trap manufacturer, flash steam formulas (metric)'],
    [
      '5 to 0 bar g: (670.9 - 419.0) / 2257',
      6.01325,
      1.01325,
      11.16,
      'Engineering tool collection, flash steam generation',
    ],
    ['100 to 0 psig', 7.90796, 1.01325, 13.3, 'Laundry trade hot tip 19, flash steam'],
    ['1150 to 101.33 kPa a', 11.5, 1.0133, 16.5, 'Engineering tool collection, flash steam table'],
    ['800 to 101.33 kPa a', 8, 1.0133, 13.4, 'Engineering tool collection, flash steam table'],
    ['800 to 170 kPa a', 8, 1.7, 10.8, 'Engineering tool collection, flash steam table'],
    ['1500 to 400 kPa a', 15, 4, 11.3, 'Engineering tool collection, flash steam table'],
  ];

const flash = [
  ...FLASHED.map(([from, to, figure]) =>
    printed(independent('Flash steam'), `${from} to ${to} bar a`, '%', figure, () =>
      percentFlashed(barAbsolute(from), barAbsolute(to)),
    ),
  ),
  ...FLASH_PUBLISHED.map(([what, from, to, percent, source]) =>
    within(published('Flash steam', source), what, '%', percent, absolute(0.1), () =>
      percentFlashed(barAbsolute(from), barAbsolute(to)),
    ),
  ),
];

const STORED = [
  [5, '13.49'],
  [7, '11.03'],
  [8, '10.17'],
  [10, '8.876'],
  [12, '7.948'],
] as const;

/** from, to [bar g]; density [kg/m3]; end-state share and kg/m3; integrated share and kg/m3. */
const ACCUMULATORS = [
  [16, 8, '859.536', '0.0635735', '54.644', '0.062768', '53.951'],
  [12, 6, '874.224', '0.0568894', '49.734', '0.056222', '49.150'],
  [10, 7, '882.561', '0.0293671', '25.918', '0.029113', '25.694'],
  [10, 6, '882.561', '0.0406508', '35.877', '0.040254', '35.527'],
  [10, 5, '882.561', '0.0530166', '46.790', '0.052426', '46.269'],
  [10, 4, '882.561', '0.0668141', '58.967', '0.065956', '58.210'],
  [10, 3, '882.561', '0.0826069', '72.906', '0.081365', '71.809'],
  [8, 4, '891.848', '0.0485779', '43.324', '0.048073', '42.873'],
  [7, 3, '896.961', '0.0544227', '48.815', '0.053818', '48.273'],
] as const;

const density = (barG: number) => 1 / valueOf(saturationAtPressure(gauge(barG))).vf;
const endState = (from: number, to: number) => valueOf(flashFraction(gauge(from), gauge(to)));
const released = (from: number, to: number, kg: number) => valueOf(accumulatorReleaseKg(gauge(from), gauge(to), kg));

const accumulators = ACCUMULATORS.flatMap(([from, to, rho, x, kg, xIntegrated, kgIntegrated]) => {
  const of = independent('Accumulator');
  const at = `${from} to ${to} bar g`;
  return [
    printed(of, `water before, ${at}`, 'kg/m³', rho, () => density(from)),
    printed(of, `end-state share, ${at}`, '', x, () => endState(from, to)),
    printed(of, `end-state steam, ${at}`, 'kg/m³', kg, () => endState(from, to) * density(from)),
    printed(of, `integrated share, ${at}`, '', xIntegrated, () => released(from, to, 1)),
    printed(of, `integrated steam, ${at}`, 'kg/m³', kgIntegrated, () => released(from, to, 1) * density(from)),
  ];
});

const ENCYCLOPAEDIA = published(
  'Accumulator',
  'Encyclopaedia article quoting a steam manufacturer’s accumulator guide',
);
const store = [
  ...STORED.map(([barG, figure]) =>
    printed(independent('Stored steam'), `per bar and tonne at ${barG} bar g`, 'kg', figure, () =>
      valueOf(storedSteamKgPerBar(gauge(barG), 1000)),
    ),
  ),
  printed(independent('Stored steam'), '8 t from 10 to 7 bar g', 'kg', '232.906', () => released(10, 7, 8000)),
  printed(
    independent('Stored steam'),
    '… against 1500 kg/h too much',
    'min',
    '9.3163',
    () => (60 * released(10, 7, 8000)) / 1500,
  ),
  within(
    ENCYCLOPAEDIA,
    '66 000 kg, 10 to 6 bar g: enough for 2650 kg',
    'kg',
    2650,
    relative(0.013),
    () => 66_000 * endState(10, 6),
  ),
  printed(
    independent('Accumulator'),
    '66 000 kg, 10 to 6 bar g, end state',
    'kg',
    '2682.95',
    () => 66_000 * endState(10, 6),
  ),
  printed(independent('Accumulator'), 'least water for 2650 kg', 'kg', '65189', () => 2650 / endState(10, 6)),
  printed(independent('Accumulator'), '… as volume', 'm³', '73.86', () => 2650 / endState(10, 6) / density(10)),
];

const heatDensity = (
  [
    [150, '1.098'],
    [170, '1.089'],
    [184, '1.084'],
  ] as const
).map(([t, figure]) =>
  printed(independent('Accumulator'), `ρ · cp of water at ${t} °C`, 'kWh/m³K', figure, () => {
    const { pressure } = valueOf(saturationAtTemperature(celsius(t)));
    const { cp, v } = valueOf(waterAt(pressure, celsius(t)));
    return cp / v / 3600;
  }),
);

export const storageChecks: readonly Check[] = [...flash, ...store, ...accumulators, ...heatDensity];

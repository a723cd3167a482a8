/** Openings, altitude and unit conversions. */
import { fromDisplay, toDisplay } from '@/core/quantity/display';
import { ambientAtAltitude, STANDARD_ATMOSPHERE, toAbsolute, toGauge } from '@/core/quantity/pressure';
import { barAbsolute, barGauge, celsius, type BarAbsolute } from '@/core/quantity/units';
import { boreAreaMm2, openingAt, openingFlowKgPerH } from '@/core/steam/opening';
import { saturationAtPressure, saturationAtTemperature } from '@/core/steam/saturation';
import { valueOf } from '../outcome';
import { printed, relative, within, type Check, type Table } from './check';

const INDEPENDENT = 'Computed with an independent implementation of IAPWS-IF97 (python3-iapws 1.5.3)';
const independent = (group: string): Table => ({ group, source: INDEPENDENT, mark: 'independent' });
const published = (group: string, source: string): Table => ({ group, source, mark: 'published' });
const gauge = (barG: number) => toAbsolute(barGauge(barG));

const flow = (inside: BarAbsolute, areaMm2: number, discharge = 1) =>
  openingFlowKgPerH(valueOf(openingAt(inside, STANDARD_ATMOSPHERE, areaMm2, discharge)));

/** bar g; Napier and ideal isentropic equilibrium nozzle [kg/h per mm2]. */
const CHOKED = [
  [1.0436, '1.0802', 1.1183, 0.036],
  [2, '1.5824', 1.6196, 0.024],
  [3, '2.1076', 2.1389, 0.016],
  [5, '3.1579', 3.1681, 0.013],
  [7, '4.2082', 4.1891, 0.013],
  [8, '4.7333', 4.6976, 0.013],
  [10, '5.7837', 5.7115, 0.014],
  [16, '8.9346', 8.7403, 0.023],
] as const;

const choked = CHOKED.flatMap(([barG, napier, ideal, off]) => [
  printed(independent('Choked flow'), `Napier at ${barG} bar g`, 'kg/h per mm²', napier, () => flow(gauge(barG), 1)),
  within(independent('Choked flow'), `ideal nozzle at ${barG} bar g`, 'kg/h per mm²', ideal, relative(off), () =>
    flow(gauge(barG), 1),
  ),
]);

const TIP_1 = 'US DOE Steam Tip 1, Inspect and Repair Steam Traps (Napier with a coefficient of 0.728)';
const psi = (psig: number, ambientPsi: number) => barAbsolute((psig + ambientPsi) * 0.0689476);
const lbPerH = (kgPerH: number) => toDisplay('steamRate', kgPerH, 'usCustomary');

/** inches, psig; published and by Napier [lb/h]. */
const TRAPS = [
  [1 / 32, 15, 0.85, '1.1732'],
  [1 / 32, 100, 3.3, '4.5307'],
  [1 / 32, 150, 4.8, '6.5057'],
  [1 / 16, 15, 3.4, '4.6926'],
  [1 / 16, 100, 13.2, '18.123'],
  [1 / 8, 150, 75.8, '104.09'],
] as const;

const traps = TRAPS.flatMap(([inches, psig, lb, napier]) => {
  const through = (discharge: number) => lbPerH(flow(psi(psig, 14.7), boreAreaMm2(25.4 * inches), discharge));
  const at = `${inches} in at ${psig} psig`;
  return [
    within(published('Trap orifice', TIP_1), at, 'lb/h', lb, relative(0.016), () => through(0.728)),
    within(independent('Trap orifice'), `Napier, ${at}`, 'lb/h', Number(napier), relative(1e-4), () => through(1)),
  ];
});

const VALVES = 'Valve Selection Handbook, steam sizing: 51.5 lb/h per in² and psi a';
const API = 'API RP 520 part I, steam example: 69 615 kg/h at 12 236 kPa through 1103.5 mm², Kd 0.975, KN 1.01';
const PIPES = [
  [26.645, 2347, '1 in'],
  [35.05, 4060, '1.25 in'],
  [40.89, 5526, '1.5 in'],
  [52.5, 9110, '2 in'],
] as const;

const openings = [
  within(
    published('Napier', VALVES),
    'constant in SI',
    'kg/h per mm² and bar a',
    0.525154,
    relative(2e-6),
    () => flow(gauge(7), 1) / gauge(7),
  ),
  within(
    published('Napier', 'A · P / 70 lb/s: the rule’s older form, 51.43'),
    'constant',
    'lb/h per in² and psi a',
    51.43,
    relative(0.002),
    () => (lbPerH(flow(gauge(7), 645.16)) / gauge(7)) * 0.0689476,
  ),
  within(published('Relief valve', API), 'steam passed', 'kg/h', 69_615, relative(0.005), () =>
    flow(barAbsolute(122.36), 1103.5, 0.975 * 1.01),
  ),
  ...PIPES.map(([bore, kgPerH, name]) =>
    within(
      independent('Steam inlet'),
      `upper bound of a ${name} schedule 40 pipe, 7 bar g`,
      'kg/h',
      kgPerH,
      relative(0.002),
      () => flow(gauge(7), boreAreaMm2(bore)),
    ),
  ),
  within(independent('Bleeder'), '1/8 in at 121.1 °C', 'kg/h', 8.5521, relative(2e-5), () =>
    flow(valueOf(saturationAtTemperature(celsius(121.1))).pressure, boreAreaMm2(3.175)),
  ),
  printed(
    independent('Vent'),
    'density of steam at 0.15 bar g',
    'kg/m³',
    '0.679990',
    () => 1 / valueOf(saturationAtPressure(gauge(0.15))).vg,
  ),
  printed(independent('Vent'), 'four bores of 26.645 mm', 'mm²', '2230.39', () => 4 * boreAreaMm2(26.645)),
  printed(
    independent('Vent'),
    'Cd 0.60 at 0.15 bar g',
    'kg/s',
    '0.191137',
    () => flow(gauge(0.15), 4 * boreAreaMm2(26.645), 0.6) / 3600,
  ),
];

const ICAO: Table = {
  group: 'Altitude',
  source: 'ICAO Doc 7488 (standard atmosphere); table value from memory',
  mark: 'memory',
};
const inside121 = () => valueOf(saturationAtTemperature(celsius(121.1))).pressure;
const altitude = [
  printed(published('Altitude', '10th CGPM (1954), resolution 4'), 'sea level', 'bar a', '1.01325', () =>
    valueOf(ambientAtAltitude(0)),
  ),
  printed(ICAO, '1500 m', 'bar a', '0.8456', () => valueOf(ambientAtAltitude(1500))),
  printed(independent('Altitude'), '121.1 °C at 0.845 bar a ambient', 'bar g', '1.212', () =>
    toGauge(inside121(), barAbsolute(0.845)),
  ),
  printed(independent('Altitude'), '121.1 °C at sea level', 'bar g', '1.044', () => toGauge(inside121())),
];

const CFR = (rule: string) => published('Units', `Vent schedule, ${rule}`);
const DOE_2 = published(
  'Bare steam line',
  'US DOE Steam Tip 2, Insulate Steam Distribution: million Btu a year per 100 ft',
);
const BARE = [
  ['1 in at 150 psig', 285, 312.8],
  ['2 in at 150 psig', 480, 526.9],
  ['4 in at 15 psig', 415, 455.5],
] as const;

const celsiusOf = (f: number) => fromDisplay('temperature', f, 'usCustomary');
const units = [
  printed(CFR('17 CCR 12760'), '225 °F', '°C', '107.2222', () => celsiusOf(225)),
  printed(CFR('17 CCR 12760'), '220 °F', '°C', '104.4444', () => celsiusOf(220)),
  printed(CFR('21 CFR 113.40(a)'), '230 °F', '°C', '110', () => celsiusOf(230)),
  ...BARE.map(([what, mmBtu, wattPerM]) =>
    within(
      DOE_2,
      `${what}: ${mmBtu} in W/m`,
      'W/m',
      wattPerM,
      relative(0.001),
      () => (1000 * fromDisplay('heatRate', (mmBtu * 1e6) / 8760, 'usCustomary')) / 30.48,
    ),
  ),
];

export const openingChecks: readonly Check[] = [...choked, ...traps, ...openings, ...altitude, ...units];

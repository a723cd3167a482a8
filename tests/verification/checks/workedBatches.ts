/** Worked batches A, B and C (invented plant): blancher, kettle, retort, and retorts one after another. */
import { betweenRatesOf, betweenRuns } from '@/core/duty/betweenRuns';
import type { Duty } from '@/core/duty/duty';
import { minutesUntilRate, pieceSteamKg, rateKgPerH } from '@/core/duty/fallingRate';
import { jacketedKettle, kettleHeatUp } from '@/core/duty/jacketedKettle';
import { specificHeat } from '@/core/duty/specificHeat';
import { steamBlancher } from '@/core/duty/steamBlancher';
import { stillRetort } from '@/core/duty/stillRetort';
import { toGrid } from '@/core/demand/grid';
import { blancherA, kettleB, retortC, supply } from '../dutyWorkedBatches';
import { valueOf } from '../outcome';
import { relative, within, type Check, type Table } from './check';

const SOURCE = 'Worked by hand on an independent implementation of IAPWS-IF97 (python3-iapws 1.5.3)';
const batch = (name: string): Table => ({
  group: `Worked batch ${name} (invented plant)`,
  source: SOURCE,
  mark: 'independent',
});
const TOLERANCE = relative(0.0005);

const blancher = () => valueOf(steamBlancher(blancherA, supply));
const kettle = () => valueOf(jacketedKettle(kettleB, supply));
const curve = () => valueOf(kettleHeatUp(kettleB, supply));
const retort = () => valueOf(stillRetort(retortC, supply));

/** A line of working: section, symbol, unit, figure. */
type Line = readonly [section: string, symbol: string, unit: string, figure: number];

const lines = (of: Table, duty: () => Duty, listed: readonly Line[]): Check[] =>
  listed.map(([section, symbol, unit, figure]) =>
    within(of, `${section}: ${symbol}`, unit, figure, TOLERANCE, () => {
      const step = duty().working.steps.find((each) => each.section === section && each.symbol === symbol);
      return step?.value ?? Number.NaN;
    }),
  );

const rates = (
  of: Table,
  duty: () => Duty,
  listed: readonly (readonly [kind: string, nth: number, kgPerH: number])[],
) =>
  listed.map(([kind, nth, kgPerH]) =>
    within(of, `rate of ${kind}${nth === 0 ? '' : `, piece ${nth + 1}`}`, 'kg/h', kgPerH, TOLERANCE, () => {
      return duty().phases.filter((phase) => phase.kind === kind)[nth]?.steamKgPerH ?? Number.NaN;
    }),
  );

const totalOf = (duty: Duty, name: string) =>
  duty.working.totals.find((total) => total.name === name)?.value ?? Number.NaN;
const kgOf = ({ phases }: Duty, kind: string) =>
  phases.filter((phase) => phase.kind === kind).reduce((kg, each) => kg + (each.minutes * each.steamKgPerH) / 60, 0);

const A = batch('A');
const between = (gapMin: number) => valueOf(betweenRuns(gapMin, valueOf(betweenRatesOf(blancher()))));
const batchA: readonly Check[] = [
  within(A, 'header at 7 bar g, x = 0.98', 'kJ/kg', 2727.4291, relative(1e-7), () => supply.header.h),
  ...rates(A, blancher, [
    ['warmUp', 0, 151.7959],
    ['run', 0, 614.9366],
    ['idle', 0, 75.0049],
  ]),
  ...lines(A, blancher, [
    ['Warm-up', 'Q_steel', 'kJ', 31_875],
    ['Warm-up', 'Q', 'kJ', 88_398.28],
    ['Warm-up', 'Δh', 'kJ/kg', 2329.3978],
    ['Warm-up', 'm', 'kg', 37.94898],
    ['Run', 'q_product', 'kW', 291.4096],
    ['Losses', 'q_loss', 'kW', 9.709],
    ['Run', 'ṁ_c', 'kg/h', 461.2025],
  ]),
  within(
    A,
    'specific heat at 52.5 °C',
    'kJ/kgK',
    3.885462,
    relative(1e-6),
    () => valueOf(specificHeat(blancherA.product, 52.5)).value,
  ),
  within(A, 'steam of the run', 'kg', 1229.873, TOLERANCE, () => kgOf(blancher(), 'run')),
  within(A, 'steam of the idling', 'kg', 12.50082, TOLERANCE, () => kgOf(blancher(), 'idle')),
  within(A, 'steam', 'kg', 1280.323, TOLERANCE, () => blancher().steamKg),
  within(A, 'steam per kg of product', 'kg/kg', 0.1708157, TOLERANCE, () =>
    totalOf(blancher(), 'Steam per kg of product'),
  ),
  within(A, 'heat in product / heat in steam', '', 0.6403019, TOLERANCE, () =>
    totalOf(blancher(), 'Heat in product / heat in steam while running'),
  ),
  within(
    A,
    'gap at which idling and re-warming break even',
    'min',
    30.4,
    relative(0.002),
    () => between(25).breakEvenMin ?? Number.NaN,
  ),
  within(A, 'steam of a gap of 25 min, idled', 'kg', 31.25, TOLERANCE, () => between(25).steamKg),
];

const B = batch('B');
const batchB: readonly Check[] = [
  ...lines(B, kettle, [
    ['Kettle and jacket', 'C', 'kJ/K', 3562.6872],
    ['Kettle and jacket', 'UA', 'kW/K', 1.68],
    ['Kettle and jacket', 'Δh', 'kJ/kg', 2142.5481],
    ['Heat-up', 't', 'min', 39.4325],
    ['Heat-up', 'ṁ_0', 'kg/h', 340.9365],
    ['Heat-up', 'ṁ_1', 'kg/h', 115.1119],
    ['Heat-up', 'm', 'kg', 136.339],
    ['Heat-up', 'ṁ', 'kg/h', 207.4517],
    ['Boiling off', 't', 'min', 34.4452],
  ]),
  within(
    B,
    'specific heat at 60 °C',
    'kJ/kgK',
    3.74743,
    relative(1e-6),
    () => valueOf(specificHeat(kettleB.product, 60)).value,
  ),
  within(B, 'dryness in the jacket', '', 0.997807, TOLERANCE, () =>
    totalOf(kettle(), 'Dryness of the steam in the jacket'),
  ),
  within(B, 'rate at half time', 'kg/h', 197.3229, TOLERANCE, () => rateKgPerH(curve(), curve().minutes / 2)),
  within(B, 'first 5 min', 'kg', 26.5216, TOLERANCE, () => pieceSteamKg(curve(), 0, 5)),
  within(B, 'first 10 min', 'kg', 49.6, TOLERANCE, () => pieceSteamKg(curve(), 0, 10)),
  within(B, 'average of the first 5 min', 'kg/h', 318.2593, TOLERANCE, () => 12 * pieceSteamKg(curve(), 0, 5)),
  within(
    B,
    'until it has fallen to 253.94 kg/h',
    'min',
    10.59,
    TOLERANCE,
    () => minutesUntilRate(curve(), 253.94) ?? Number.NaN,
  ),
  within(
    B,
    'until it has fallen to 135.71 kg/h',
    'min',
    33.37,
    TOLERANCE,
    () => minutesUntilRate(curve(), 135.71) ?? Number.NaN,
  ),
  within(B, 'steam of the heat-up, in its pieces', 'kg', 136.339, TOLERANCE, () => kgOf(kettle(), 'heatUp')),
  within(
    B,
    'first piece against the peak',
    'kg/h',
    340.9365,
    relative(0.02),
    () => kettle().phases[0]?.steamKgPerH ?? Number.NaN,
  ),
  ...rates(B, kettle, [
    ['boilOff', 0, 115.1119],
    ['hold', 0, 7.56109],
  ]),
  within(B, 'steam boiling off', 'kg', 66.0842, TOLERANCE, () => kgOf(kettle(), 'boilOff')),
  within(B, 'steam of the hold', 'kg', 3.78055, TOLERANCE, () => kgOf(kettle(), 'hold')),
  within(B, 'steam', 'kg', 206.2037, TOLERANCE, () => kettle().steamKg),
];

const C = batch('C');
const openSteps = () => retort().working.steps;
const atVent = (symbol: string) =>
  openSteps().find((s) => s.section === 'Vent' && s.symbol === symbol)?.value ?? Number.NaN;
const batchC: readonly Check[] = [
  ...rates(C, retort, [
    ['vent', 0, 1555.237],
    ['comeUp', 0, 359.2303],
    ['process', 0, 217.2079],
    ['process', 1, 119.811],
  ]),
  ...lines(C, retort, [
    ['Retort and load', 'A', 'm²', 21.1115],
    ['Retort and load', 'V_0', 'm³', 4.84461],
    ['Retort and load', 'ṁ_o', 'kg/h', 42.7604],
    ['Vent', 'Q_shell', 'kJ', 131_555.6],
    ['Vent', 'Q_baskets', 'kJ', 14_800],
    ['Vent', 'Q_cans', 'kJ', 2181.67],
    ['Vent', 'q_loss', 'kW', 12.15084],
    ['Vent', 'Q', 'kJ', 189_164.02],
    ['Vent', 'Δh', 'kJ/kg', 2277.8205],
    ['Vent', 'm_c', 'kg', 83.0461],
    ['Vent', 'm_v', 'kg', 3.66837],
    ['Vent', 'm', 'kg', 155.5237],
    ['Come-up', 'Q', 'kJ', 65_904.08],
    ['Come-up', 'm_c', 'kg', 29.7003],
    ['Come-up', 'm_v', 'kg', 1.94665],
    ['Come-up', 'm', 'kg', 35.923],
    ['Process time, piece 1', 'q_loss', 'kW', 28.40342],
    ['Process time, piece 1', 'Q', 'kJ', 77_418.66],
    ['Process time, piece 1', 'm', 'kg', 43.4416],
    ['Process time, piece 2', 'Q', 'kJ', 74_088.16],
    ['Process time, piece 2', 'm', 'kg', 51.9181],
  ]),
  within(
    C,
    'specific heat at 90 °C',
    'kJ/kgK',
    3.6267,
    relative(1e-6),
    () => valueOf(specificHeat(retortC.contents, 90)).value,
  ),
  within(C, 'steam leaving by the vents', 'kg', 68.8093, TOLERANCE, () => atVent('ṁ_o') / 10),
  within(C, 'steam', 'kg', 286.806, TOLERANCE, () => retort().steamKg),
  within(C, 'steam per kg of contents', 'kg/kg', 0.40169, TOLERANCE, () => retort().steamKg / 714),
  within(
    C,
    'header enthalpy per kg of contents',
    'MJ/kg',
    1.09558,
    TOLERANCE,
    () => (retort().steamKg * supply.header.h) / 714_000,
  ),
  within(C, 'average rate', 'kg/h', 344.168, TOLERANCE, () => totalOf(retort(), 'Average steam rate')),
  within(C, 'average rate in process time', 'kg/h', 150.568, TOLERANCE, () => (60 * kgOf(retort(), 'process')) / 38),
  within(C, 'peak / average', '', 4.519, TOLERANCE, () => {
    return (retort().phases[0]?.steamKgPerH ?? Number.NaN) / totalOf(retort(), 'Average steam rate');
  }),
];

const STAGGERED: readonly (readonly [what: string, offsets: readonly number[], peak: number])[] = [
  ['one', [0], 1555.237],
  ['two together', [0, 0], 3110.474],
  ['two, 6 min apart', [0, 6], 1914.467],
  ['two, 12 min apart', [0, 12], 1772.445],
  ['two, 24 min apart', [0, 24], 1675.048],
  ['three together', [0, 0, 0], 4665.711],
  ['three, 6 min apart', [0, 6, 12], 2131.675],
  ['three, 12 min apart', [0, 12, 24], 1892.256],
  ['four, 12 min apart', [0, 12, 24, 36], 2012.067],
];

/** Greatest minute of several retorts, on the grid of whole minutes. */
function greatest(offsets: readonly number[]): number {
  const minutes = new Array<number>(200).fill(0);
  for (const { offsetMin, minutes: length, steamKgPerH } of toGrid(retort().phases)) {
    for (const start of offsets) {
      for (let t = start + offsetMin; t < start + offsetMin + length; t += 1)
        minutes[t] = (minutes[t] ?? 0) + steamKgPerH;
    }
  }
  return Math.max(...minutes);
}

const staggered = STAGGERED.map(([what, offsets, peak]) =>
  within(C, `greatest draw of ${what}`, 'kg/h', peak, TOLERANCE, () => greatest(offsets)),
);

export const workedBatchChecks: readonly Check[] = [...batchA, ...batchB, ...batchC, ...staggered];

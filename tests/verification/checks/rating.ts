/** From the rating on a boiler's plate to what it evaporates: from and at, boiler horsepower. */
import { fromAndAtFactor } from '@/core/duty/boilerExport';
import { toAbsolute, toMegapascal } from '@/core/quantity/pressure';
import { barAbsolute, barGauge, celsius, toKelvin } from '@/core/quantity/units';
import { region1 } from '@/core/steam/region1';
import { saturationAtPressure } from '@/core/steam/saturation';
import { valueOf } from '../outcome';
import { absolute, printed, relative, within, type Check, type Table } from './check';

const INDEPENDENT = 'Computed with an independent implementation of IAPWS-IF97 (python3-iapws 1.5.3)';
const independent = (group: string): Table => ({ group, source: INDEPENDENT, mark: 'independent' });
const published = (group: string, source: string): Table => ({ group, source, mark: 'published' });
const gauge = (barG: number) => toAbsolute(barGauge(barG));

const FEED_C = [15, 40, 60, 80, 85, 90, 100, 105];
/** bar g; factor at each feed temperature. */
const FACTORS = [
  ['6', '0.83601', '0.86968', '0.89863', '0.92963', '0.93773', '0.94599', '0.96298', '0.97173'],
  ['7', '0.83433', '0.86786', '0.89668', '0.92754', '0.93561', '0.94383', '0.96074', '0.96945'],
  ['8', '0.83290', '0.86631', '0.89503', '0.92577', '0.93381', '0.94200', '0.95884', '0.96752'],
  ['10', '0.83063', '0.86385', '0.89239', '0.92295', '0.93094', '0.93907', '0.95581', '0.96443'],
  ['12', '0.82891', '0.86199', '0.89040', '0.92082', '0.92877', '0.93687', '0.95352', '0.96210'],
  ['16', '0.82659', '0.85947', '0.88771', '0.91793', '0.92583', '0.93387', '0.95042', '0.95894'],
];

const factors = FACTORS.flatMap(([barG = '', ...figures]) =>
  FEED_C.map((feedC, i) =>
    printed(independent('From and at'), `factor at ${barG} bar g, feed ${feedC} °C`, '', figures[i] ?? '', () =>
      valueOf(fromAndAtFactor(gauge(Number(barG)), feedC)),
    ),
  ),
);

const TIP = published('From and at', 'Energy tip of a boiler house supplier, 660 kcal/kg (6 bar g), round 540 kcal/kg');
const EVAPORATION = published('Boiler horsepower', 'Factor-of-evaporation table, 34.5 lb/h from and at 212 °F');
const FACTOR = published('From and at', 'Boiler maker, factor of evaporation ((338 - 225) + 881) / 970.3');

/** Feed in degF, psig, lb/h per boiler horsepower. */
const HORSEPOWER = [
  [100, 10, 30.6],
  [100, 0, 30.9],
  [100, 100, 29.8],
  [60, 100, 28.8],
  [60, 150, 28.6],
  [120, 100, 30.4],
  [130, 200, 30.4],
  [140, 20, 31.6],
] as const;
const HORSEPOWER_COMPUTED = ['30.649', '30.933', '29.846', '28.820', '28.675', '30.386', '30.398', '31.612'];

const psi = (psig: number) => barAbsolute((psig + 14.69595) * 0.06894757);
const lbPerHorsepower = (feedF: number, psig: number) => 34.5 * valueOf(fromAndAtFactor(psi(psig), (feedF - 32) / 1.8));
/** The table goes below the freezing point; so does region 1, a degree outside its range. */
const lbBelowFreezing = (feedF: number, psig: number) => {
  const feed = region1(toMegapascal(psi(psig)), toKelvin(celsius((feedF - 32) / 1.8)));
  return (34.5 * valueOf(saturationAtPressure(gauge(0))).hfg) / (valueOf(saturationAtPressure(psi(psig))).hg - feed.h);
};

const horsepower = [
  ...HORSEPOWER.map(([feedF, psig, lb]) =>
    within(EVAPORATION, `feed ${feedF} °F, ${psig} psig`, 'lb/h', lb, absolute(0.1), () =>
      lbPerHorsepower(feedF, psig),
    ),
  ),
  ...HORSEPOWER.map(([feedF, psig], i) =>
    within(
      independent('Boiler horsepower'),
      `feed ${feedF} °F, ${psig} psig`,
      'lb/h',
      Number(HORSEPOWER_COMPUTED[i]),
      absolute(0.01),
      () => lbPerHorsepower(feedF, psig),
    ),
  ),
  within(EVAPORATION, 'feed 30 °F, 240 psig', 'lb/h', 27.8, absolute(0.1), () => lbBelowFreezing(30, 240)),
  within(independent('Boiler horsepower'), 'feed 30 °F, 240 psig', 'lb/h', 27.825, absolute(0.01), () =>
    lbBelowFreezing(30, 240),
  ),
  within(
    EVAPORATION,
    '3060 lb/h at 10 psig, feed 100 °F',
    'boiler hp',
    100,
    relative(0.003),
    () => 3060 / lbPerHorsepower(100, 10),
  ),
  within(TIP, '10 t/h, feed 40 °C', 't/h', 8.71, relative(0.003), () => 10 * valueOf(fromAndAtFactor(gauge(6), 40))),
  within(TIP, '10 t/h, feed 100 °C', 't/h', 9.64, relative(0.003), () => 10 * valueOf(fromAndAtFactor(gauge(6), 100))),
  printed(
    independent('From and at'),
    '10 t/h at 6 bar g, feed 40 °C',
    't/h',
    '8.6968',
    () => 10 * valueOf(fromAndAtFactor(gauge(6), 40)),
  ),
  printed(
    independent('From and at'),
    '10 t/h at 6 bar g, feed 100 °C',
    't/h',
    '9.6298',
    () => 10 * valueOf(fromAndAtFactor(gauge(6), 100)),
  ),
  within(
    FACTOR,
    'feed 225 °F, 100 psi: factor of evaporation',
    '',
    1.02,
    relative(0.008),
    () => 1 / valueOf(fromAndAtFactor(psi(100), (225 - 32) / 1.8)),
  ),
  within(independent('From and at'), 'cold feed on a Monday: 15 °C, 10 bar g', '', 0.8306, absolute(0.00005), () =>
    valueOf(fromAndAtFactor(gauge(10), 15)),
  ),
];

export const ratingChecks: readonly Check[] = [...factors, ...horsepower];

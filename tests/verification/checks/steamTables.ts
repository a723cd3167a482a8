/** Steam tables to the digits given, each compared as printed: within half a unit of its last digit. */
import { toAbsolute } from '@/core/quantity/pressure';
import { barAbsolute, barGauge, celsius } from '@/core/quantity/units';
import { steamAt } from '@/core/steam/fluid';
import { saturationPressure, saturationTemperature } from '@/core/steam/region4';
import { saturationAtPressure, saturationAtTemperature } from '@/core/steam/saturation';
import { steamState, throttle } from '@/core/steam/steamState';
import { toKelvin } from '@/core/quantity/units';
import { valueOf } from '../outcome';
import { absolute, printed, within, type Check, type Table } from './check';

const INDEPENDENT = 'Computed with an independent implementation of IAPWS-IF97 (python3-iapws 1.5.3)';
const table = (group: string): Table => ({ group, source: INDEPENDENT, mark: 'independent' });

/** bar g; degC, hf, hfg, hg [kJ/kg], vf, vg [m3/kg]. */
const BY_PRESSURE = [
  ['0', '99.9743', '418.991', '2256.54', '2675.53', '0.00104344', '1.67330'],
  ['0.35', '108.505', '455.037', '2233.75', '2688.79', '0.00105033', '1.26780'],
  ['0.5', '111.614', '468.200', '2225.31', '2693.51', '0.00105295', '1.14986'],
  ['1', '120.420', '505.572', '2200.97', '2706.54', '0.00106071', '0.880277'],
  ['1.5', '127.588', '536.093', '2180.65', '2716.74', '0.00106739', '0.715146'],
  ['2', '133.676', '562.099', '2163.00', '2725.09', '0.00107333', '0.603287'],
  ['2.5', '138.994', '584.881', '2147.26', '2732.14', '0.00107872', '0.522339'],
  ['3', '143.732', '605.236', '2132.97', '2738.21', '0.00108369', '0.460957'],
  ['4', '151.936', '640.617', '2107.61', '2748.23', '0.00109267', '0.373871'],
  ['5', '158.919', '670.876', '2085.36', '2756.23', '0.00110071', '0.314918'],
  ['6', '165.029', '697.476', '2065.35', '2762.83', '0.00110806', '0.272276'],
  ['7', '170.482', '721.319', '2047.05', '2768.37', '0.00111488', '0.239950'],
  ['8', '175.420', '743.000', '2030.10', '2773.10', '0.00112127', '0.214573'],
  ['9', '179.943', '762.937', '2014.23', '2777.17', '0.00112731', '0.194104'],
  ['10', '184.123', '781.434', '1999.28', '2780.71', '0.00113307', '0.177232'],
  ['11', '188.015', '798.721', '1985.09', '2783.81', '0.00113857', '0.163077'],
  ['12', '191.660', '814.973', '1971.55', '2786.53', '0.00114387', '0.151027'],
  ['13', '195.092', '830.330', '1958.59', '2788.92', '0.00114898', '0.140640'],
  ['14', '198.337', '844.905', '1946.13', '2791.04', '0.00115393', '0.131590'],
  ['15', '201.418', '858.790', '1934.11', '2792.90', '0.00115874', '0.123633'],
  ['16', '204.353', '872.060', '1922.49', '2794.55', '0.00116342', '0.116580'],
];

/** degC (225 and 250 degF among them); bar a, bar g, hf, hfg, hg [kJ/kg], vg [m3/kg]. */
const BY_TEMPERATURE = [
  ['60', '0.199458', '-0.81379', '251.154', '2357.69', '2608.85', '7.66766'],
  ['70', '0.312006', '-0.701244', '293.018', '2333.08', '2626.10', '5.03973'],
  ['80', '0.474147', '-0.53910', '334.949', '2308.07', '2643.01', '3.40527'],
  ['90', '0.701824', '-0.31143', '376.968', '2282.56', '2659.53', '2.35915'],
  ['95', '0.846089', '-0.16716', '398.019', '2269.60', '2667.61', '1.98065'],
  ['100', '1.01418', '0.00093', '419.099', '2256.47', '2675.57', '1.67186'],
  ['105', '1.20902', '0.19577', '440.213', '2243.18', '2683.39', '1.41848'],
  ['107.2222', '1.30502', '0.29177', '449.608', '2237.21', '2686.82', '1.32064'],
  ['110', '1.43376', '0.42051', '461.363', '2229.70', '2691.07', '1.20939'],
  ['115', '1.69177', '0.67852', '482.553', '2216.03', '2698.58', '1.03594'],
  ['120', '1.98665', '0.97340', '503.785', '2202.15', '2705.93', '0.891304'],
  ['121.1', '2.05685', '1.04360', '508.462', '2199.07', '2707.53', '0.862795'],
  ['121.1111', '2.05757', '1.04432', '508.509', '2199.03', '2707.54', '0.862513'],
  ['125', '2.32224', '1.30899', '525.062', '2188.04', '2713.11', '0.770112'],
  ['130', '2.70260', '1.68935', '546.388', '2173.70', '2720.09', '0.668084'],
  ['135', '3.13201', '2.11876', '567.766', '2159.10', '2726.87', '0.581802'],
  ['140', '3.61501', '2.60176', '589.200', '2144.24', '2733.44', '0.508519'],
  ['150', '4.76101', '3.74776', '632.252', '2113.67', '2745.92', '0.392502'],
  ['160', '6.18139', '5.16814', '675.575', '2081.86', '2757.43', '0.306818'],
  ['170', '7.92053', '6.90728', '719.206', '2048.69', '2767.89', '0.242616'],
  ['180', '10.0263', '9.01310', '763.188', '2014.03', '2777.22', '0.193862'],
  ['190', '12.5502', '11.53693', '807.566', '1977.74', '2785.31', '0.156377'],
  ['200', '15.5467', '14.53347', '852.393', '1939.67', '2792.06', '0.127222'],
];

/** bar a, degC; h [kJ/kg], v [m3/kg], s, cp [kJ/kgK]. */
const SUPERHEATED = [
  ['2', '130', '2727.25', '0.910412', '7.17962', '2.12318'],
  ['2', '150', '2769.09', '0.959894', '7.28091', '2.06670'],
  ['4', '160', '2775.19', '0.483935', '6.98282', '2.21210'],
  ['4', '200', '2860.99', '0.534345', '7.17237', '2.09839'],
  ['8', '180', '2792.44', '0.247183', '6.71538', '2.44986'],
  ['8', '200', '2839.77', '0.260868', '6.81762', '2.30301'],
  ['8', '250', '2950.54', '0.293199', '7.04029', '2.15530'],
  ['11', '190', '2796.65', '0.180699', '6.58672', '2.63371'],
  ['11', '200', '2822.26', '0.186011', '6.64144', '2.50086'],
  ['11', '250', '2939.48', '0.210739', '6.87715', '2.24132'],
  ['11', '300', '3049.06', '0.233911', '7.07726', '2.15697'],
  ['17', '210', '2811.38', '0.118871', '6.43334', '2.88370'],
  ['17', '250', '2915.85', '0.132955', '6.64130', '2.44274'],
  ['17', '350', '3143.90', '0.164001', '7.04080', '2.19629'],
];

/** bar g, dryness; h [kJ/kg]. */
const WET = [
  ['7', '0.98', '2727.43'],
  ['7', '0.95', '2666.02'],
  ['10', '0.97', '2720.73'],
  ['3', '0.9', '2524.91'],
  ['1', '0.8', '2266.35'],
  ['0', '0.5', '1547.26'],
];

/** from bar g, dryness, to bar g; h [kJ/kg], degC after, superheat [K] or dryness after. */
const THROTTLED = [
  ['10', '1', '2', '2780.71', '159.159', 'superheated', '25.48'],
  ['7', '1', '1', '2768.37', '149.702', 'superheated', '29.28'],
  ['16', '1', '7', '2794.55', '180.903', 'superheated', '10.42'],
  ['8', '0.98', '0.35', '2732.49', '129.577', 'superheated', '21.07'],
  ['10', '0.97', '2', '2720.73', '133.676', 'wet', '0.997984'],
  ['12', '0.95', '3', '2687.95', '143.732', 'wet', '0.976438'],
  ['7', '0.96', '0.5', '2686.49', '111.614', 'wet', '0.996844'],
];

type Columns = readonly (readonly [name: string, unit: string])[];

/** One check for each column of a row, its values worked out together. */
const columns = (
  of: Table,
  at: string,
  names: Columns,
  figures: readonly string[],
  values: () => readonly number[],
): Check[] =>
  names.map(([name, unit], i) =>
    printed(of, `${name} at ${at}`, unit, figures[i] ?? '', () => values()[i] ?? Number.NaN),
  );

const wet = (barG: string, dryness: string) =>
  valueOf(steamState({ pressure: barGauge(Number(barG)), quality: { kind: 'wet', dryness: Number(dryness) } }));

const byPressure = BY_PRESSURE.flatMap(([barG = '', ...figures]) =>
  columns(
    table('Saturation by gauge pressure'),
    `${barG} bar g`,
    [
      ['T', '°C'],
      ['hf', 'kJ/kg'],
      ['hfg', 'kJ/kg'],
      ['hg', 'kJ/kg'],
      ['vf', 'm³/kg'],
      ['vg', 'm³/kg'],
    ],
    figures,
    () => {
      const sat = valueOf(saturationAtPressure(toAbsolute(barGauge(Number(barG)))));
      return [sat.temperature, sat.hf, sat.hfg, sat.hg, sat.vf, sat.vg];
    },
  ),
);

const byTemperature = BY_TEMPERATURE.flatMap(([t = '', ...figures]) =>
  columns(
    table('Saturation by temperature'),
    `${t} °C`,
    [
      ['p', 'bar a'],
      ['p', 'bar g'],
      ['hf', 'kJ/kg'],
      ['hfg', 'kJ/kg'],
      ['hg', 'kJ/kg'],
      ['vg', 'm³/kg'],
    ],
    figures,
    () => {
      const sat = valueOf(saturationAtTemperature(celsius(Number(t))));
      return [sat.pressure, sat.pressure - 1.01325, sat.hf, sat.hfg, sat.hg, sat.vg];
    },
  ),
);

const roundTrip = BY_TEMPERATURE.map(([t = '']) =>
  within(
    table('Saturation by temperature'),
    `Tsat(psat(${t} °C))`,
    'K',
    toKelvin(celsius(Number(t))),
    absolute(1e-6),
    () => saturationTemperature(saturationPressure(toKelvin(celsius(Number(t))))),
  ),
);

const superheated = SUPERHEATED.flatMap(([p = '', t = '', ...figures]) =>
  columns(
    table('Superheated steam'),
    `${p} bar a, ${t} °C`,
    [
      ['h', 'kJ/kg'],
      ['v', 'm³/kg'],
      ['s', 'kJ/kgK'],
      ['cp', 'kJ/kgK'],
    ],
    figures,
    () => {
      const at = valueOf(steamAt(barAbsolute(Number(p)), celsius(Number(t))));
      return [at.h, at.v, at.s, at.cp];
    },
  ),
);

const wetSteam = WET.map(([barG = '', dryness = '', figure = '']) =>
  printed(table('Wet steam'), `h at ${barG} bar g, x = ${dryness}`, 'kJ/kg', figure, () => wet(barG, dryness).h),
);

const throttled = THROTTLED.flatMap(([barG = '', dryness = '', toBarG = '', h = '', t = '', kind, last = '']) => {
  const after = () => valueOf(throttle(wet(barG, dryness), toAbsolute(barGauge(Number(toBarG)))));
  const names: Columns = [['h', 'kJ/kg'], ['T', '°C'], kind === 'wet' ? ['x', ''] : ['superheat', 'K']];
  const at = `${barG} bar g, x = ${dryness}, let down to ${toBarG} bar g`;
  return columns(table('Pressure reduction'), at, names, [h, t, last], () => {
    const state = after();
    if (state.kind !== kind) return [Number.NaN, Number.NaN, Number.NaN];
    return [state.h, state.temperature, state.kind === 'wet' ? state.dryness : state.superheatK];
  });
});

export const steamTableChecks: readonly Check[] = [
  ...byPressure,
  ...byTemperature,
  ...roundTrip,
  ...superheated,
  ...wetSteam,
  ...throttled,
];

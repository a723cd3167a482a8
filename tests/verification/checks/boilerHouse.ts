/** Blowdown, feed tank, export and fuel of a boiler house. */
import { blowdown } from '@/core/duty/blowdown';
import { boilerExport, fromAndAtFactor, type BoilerExport, type BoilerHouseInputs } from '@/core/duty/boilerExport';
import { EMISSION_FACTORS, fuelFor } from '@/core/duty/fuel';
import { toDisplay } from '@/core/quantity/display';
import { toAbsolute } from '@/core/quantity/pressure';
import { barGauge } from '@/core/quantity/units';
import { flashFraction } from '@/core/steam/flash';
import { saturationAtPressure } from '@/core/steam/saturation';
import { supply } from '../dutyWorkedBatches';
import { valueOf } from '../outcome';
import { printed, relative, within, type Check, type Table } from './check';

const INDEPENDENT = 'Computed with an independent implementation of IAPWS-IF97 (python3-iapws 1.5.3)';
const independent = (group: string): Table => ({ group, source: INDEPENDENT, mark: 'independent' });
const published = (group: string, source: string): Table => ({ group, source, mark: 'published' });
const gauge = (barG: number) => toAbsolute(barGauge(barG));

const water = { boilerPressureBarG: 10, makeUpC: 15 };
const blown = (steamKgPerH: number, feedSolidsPpm: number, boilerSolidsPpm: number) =>
  valueOf(blowdown({ ...water, steamKgPerH, feedSolidsPpm, boilerSolidsPpm }, supply));
const UFC = published('Blowdown', 'UFC 3-240-13FN, equations 5 to 8: 20 cycles (5000 / 250 micromho)');
const MIL = published('Blowdown', 'MIL-HDBK-1003/6, paragraph 7.3.7, equation 11 (about 530 lb/h, by trial)');
const caseA = () => blown(4000, 150, 3000);

const blowdowns = [
  within(UFC, 'blowdown / feed', '%', 5, relative(1e-9), () => 100 * blown(18_000, 250, 5000).shareOfFeed),
  printed(UFC, 'blowdown of 5.0 kg/s', 'kg/s', '0.26', () => blown(18_000, 250, 5000).blowdownKgPerH / 3600),
  printed(UFC, 'feed for 5.0 kg/s', 'kg/s', '5.26', () => blown(18_000, 250, 5000).feedKgPerH / 3600),
  printed(
    independent('Blowdown'),
    'blowdown of 5.0 kg/s',
    'kg/s',
    '0.263158',
    () => blown(18_000, 250, 5000).blowdownKgPerH / 3600,
  ),
  printed(
    independent('Blowdown'),
    'feed for 5.0 kg/s',
    'kg/s',
    '5.263158',
    () => blown(18_000, 250, 5000).feedKgPerH / 3600,
  ),
  within(
    MIL,
    '15 000 lb/h, 86 against 2500 ppm',
    'lb/h',
    530,
    relative(0.01),
    () => blown(15_000, 86, 2500).blowdownKgPerH,
  ),
  printed(
    independent('Blowdown'),
    '15 000 lb/h, 86 against 2500 ppm',
    'lb/h',
    '534.38',
    () => blown(15_000, 86, 2500).blowdownKgPerH,
  ),
  printed(independent('Blowdown'), '4000 kg/h, 150 against 3000 ppm', 'kg/h', '210.526', () => caseA().blowdownKgPerH),
  printed(independent('Blowdown'), '… share of the feed', '%', '5.000', () => 100 * caseA().shareOfFeed),
  printed(independent('Blowdown'), '… heat lost at 10 bar g, make-up 15 °C', 'kW', '42.009', () => caseA().heatLostKW),
  printed(
    independent('Blowdown'),
    '… flashed at 0.3 bar g',
    '%',
    '14.8006',
    () => 100 * valueOf(flashFraction(gauge(10), gauge(0.3))),
  ),
];

const HOUSE: BoilerHouseInputs = {
  ratingFromAndAtKgPerH: 4000,
  boilerPressureBarG: 10,
  feedTankPressureBarG: 0.2,
  blowdownFraction: 0.05,
  condensateReturnFraction: 0.6,
  condensateC: 90,
  makeUpC: 15,
};
const chain = (change: Partial<BoilerHouseInputs> = {}) => valueOf(boilerExport({ ...HOUSE, ...change }, supply));
const step = ({ working }: BoilerExport, symbol: string) =>
  working.steps.find((each) => each.symbol === symbol)?.value ?? Number.NaN;
const vented = () => {
  const out = chain({ feedTankVentFraction: 0.001 });
  return (5000 * out.feedTankSteamKgPerH) / out.feedKgPerH;
};

const CHAIN = independent('Boiler chain');
const exports = [
  printed(CHAIN, 'factor', '', '0.964304', () => step(chain(), 'f')),
  printed(CHAIN, 'gross', 'kg/h', '3857.217', () => chain().grossKgPerH),
  printed(CHAIN, 'feed', 'kg/h', '4060.228', () => chain().feedKgPerH),
  printed(CHAIN, 'feed tank steam', 'kg/h', '310.277', () => chain().feedTankSteamKgPerH),
  printed(CHAIN, 'net export', 'kg/h', '3546.94', () => chain().netKgPerH),
  printed(CHAIN, 'heat to water', 'kW', '2526.49', () => chain().heatToWaterKW),
  printed(CHAIN, 'mix of condensate and make-up', 'kJ/kg', '251.427', () => step(chain(), 'h_mix')),
  printed(CHAIN, 'mix with 20 % condensate', 'kJ/kg', '125.86', () =>
    step(chain({ condensateReturnFraction: 0.2 }), 'h_mix'),
  ),
  printed(
    CHAIN,
    'feed tank steam with 20 % condensate',
    'kg/h',
    '491.27',
    () => chain({ condensateReturnFraction: 0.2 }).feedTankSteamKgPerH,
  ),
  printed(
    CHAIN,
    'net export with 20 % condensate',
    'kg/h',
    '3365.95',
    () => chain({ condensateReturnFraction: 0.2 }).netKgPerH,
  ),
  printed(CHAIN, 'two boilers', 'kg/h', '7093.88', () => 2 * chain().netKgPerH),
  printed(
    independent('Deaerator'),
    'steam for 5000 kg/h of feed',
    'kg/h',
    '382.093',
    () => (5000 * chain().feedTankSteamKgPerH) / chain().feedKgPerH,
  ),
  printed(
    independent('Deaerator'),
    'steam / feed',
    '%',
    '7.64186',
    () => (100 * chain().feedTankSteamKgPerH) / chain().feedKgPerH,
  ),
  printed(independent('Deaerator'), '… with a vent of 0.1 % of the feed', 'kg/h', '387.004', vented),
];

const US_GAS = published('Fuel', '40 CFR 98, Table C-1: natural gas 53.06 kg CO2 per million Btu (gross)');
const fuel = (heatToWaterKW: number, efficiency: number) =>
  valueOf(fuelFor({ heatToWaterKW, efficiency }, EMISSION_FACTORS.naturalGasUs));
/** 5000 kg/h at 10 bar g from feed at 85 degC: dry steam, without blowdown. */
const toSteamKW = () => (5000 * 2256.54) / valueOf(fromAndAtFactor(gauge(10), 85)) / 3600;

const fuels = [
  within(
    US_GAS,
    'carbon dioxide per kWh, gross',
    'kg/kWh',
    0.181048,
    relative(5e-6),
    () => EMISSION_FACTORS.naturalGasUs.kgCO2PerKWh,
  ),
  within(
    US_GAS,
    'carbon dioxide per GJ, gross',
    'kg/GJ',
    50.2912,
    relative(5e-6),
    () => EMISSION_FACTORS.naturalGasUs.kgCO2PerKWh / 0.0036,
  ),
  within(
    { group: 'Fuel', source: 'IPCC 2006 guidelines, volume 2, Table 2.2, from memory', mark: 'memory' },
    'carbon dioxide per TJ, net',
    'kg/TJ',
    56_100,
    relative(1e-6),
    () => EMISSION_FACTORS.naturalGasIpcc.kgCO2PerKWh / 3.6e-6,
  ),
  within(
    independent('Fuel'),
    '5000 kg/h, 10 bar g, feed 85 °C: heat to steam',
    'kW',
    3366.59,
    relative(1e-5),
    toSteamKW,
  ),
  within(
    independent('Fuel'),
    '… fuel at 80 % (US DOE steam tips)',
    'kW',
    4208.24,
    relative(1e-5),
    () => fuel(toSteamKW(), 0.8).fuelKW,
  ),
  within(
    independent('Fuel'),
    '… carbon dioxide',
    'kg/h',
    761.894,
    relative(1e-5),
    () => fuel(toSteamKW(), 0.8).co2KgPerH,
  ),
  printed(CHAIN, 'fuel at 82 %', 'kW', '3081.08', () => fuel(chain().heatToWaterKW, 0.82).fuelKW),
  printed(CHAIN, 'carbon dioxide', 'kg/h', '557.82', () => fuel(chain().heatToWaterKW, 0.82).co2KgPerH),
  within(
    { group: 'Boiler horsepower', source: '34.5 lb/h from and at 212 °F in Btu/h, from memory', mark: 'memory' },
    'heat of a boiler horsepower',
    'BTU/h',
    33_475,
    relative(0.001),
    () =>
      toDisplay('heatRate', (34.5 * 0.45359237 * valueOf(saturationAtPressure(gauge(0))).hfg) / 3600, 'usCustomary'),
  ),
];

export const boilerHouseChecks: readonly Check[] = [...blowdowns, ...exports, ...fuels];

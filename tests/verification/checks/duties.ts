/** Duties against published figures and cases worked by hand: kettles, injection, pasteurisers, blanchers, losses. */
import { ENERGY_BALANCE, surfaceLoss } from '@/core/duty/balance';
import { injectionCooker } from '@/core/duty/injectionCooker';
import { jacketedKettle, kettleHeatUp } from '@/core/duty/jacketedKettle';
import { lethalRate, minutesAt121 } from '@/core/duty/lethalRate';
import { platePasteuriser } from '@/core/duty/platePasteuriser';
import { waterHeating } from '@/core/duty/waterHeating';
import { openWorking } from '@/core/duty/working';
import { toDisplay } from '@/core/quantity/display';
import { toAbsolute } from '@/core/quantity/pressure';
import { barGauge, celsius } from '@/core/quantity/units';
import { liquidEnthalpy } from '@/core/steam/fluid';
import { saturationAtPressure } from '@/core/steam/saturation';
import { steamState } from '@/core/steam/steamState';
import { injectionE, plateI } from '../dutyExamples';
import { kettleB, supply } from '../dutyWorkedBatches';
import { valueOf } from '../outcome';
import { absolute, printed, relative, within, type Check, type Table } from './check';

const INDEPENDENT = 'Worked by hand on an independent implementation of IAPWS-IF97 (python3-iapws 1.5.3)';
const independent = (group: string): Table => ({ group, source: INDEPENDENT, mark: 'independent' });
const published = (group: string, source: string): Table => ({ group, source, mark: 'published' });
const BAR_PER_PSI = 1 / toDisplay('gaugePressure', 1, 'usCustomary');
const KJ_PER_KG_PER_BTU_PER_LB = 2.326;

const dry = (barG: number) => ({
  ...supply,
  header: valueOf(steamState({ pressure: barGauge(barG), quality: { kind: 'wet', dryness: 1 } })),
});
const given = (kJPerKgK: number) => ({ kind: 'given', kJPerKgK, source: 'published example' }) as const;

const OSU = published('Jacketed kettle', 'Oklahoma State University Extension, Steam Kettle Hookup, Table 1');
const KETTLE_PSIG = [12, 20, 30, 45];
/** gallons; minutes from 50 to 212 degF at each pressure. */
const KETTLES: readonly (readonly [gallons: number, minutes: readonly number[]])[] = [
  [5, [12.1, 10, 8.6, 7.4]],
  [10, [13.7, 11.3, 9.7, 8.3]],
  [20, [17.5, 14.4, 12.4, 10.6]],
  [40, [20.7, 17.1, 14.7, 12.6]],
  [60, [23.3, 19.2, 16.5, 14.2]],
  [80, [27.5, 22.6, 19.5, 16.7]],
  [100, [26.8, 22.2, 19, 16.3]],
];

/** Minutes to heat up with a jacket of 1 m2: the model's own, in which minutes fall as the jacket grows. */
function minutesPerM2(psig: number): number {
  const batch = { ...kettleB, startC: 10, endC: 100, product: given(4.187), jacketAreaM2: 1, kettleSteelKg: 0 };
  return valueOf(kettleHeatUp({ ...batch, jacketPressureBarG: psig * BAR_PER_PSI }, dry(7))).minutes;
}

/** One jacket for each kettle, fitted at 20 psig; the other three pressures must follow. */
const kettleTimes = KETTLES.flatMap(([gallons, minutes]) =>
  KETTLE_PSIG.flatMap((psig, i) => {
    if (psig === 20) return [];
    const expected = minutes[i] ?? Number.NaN;
    return within(
      OSU,
      `${gallons} gal at ${psig} psig, jacket fitted at 20 psig`,
      'min',
      expected,
      relative(0.015),
      () => ((minutes[1] ?? Number.NaN) / minutesPerM2(20)) * minutesPerM2(psig),
    );
  }),
);

const MILK = published(
  'Jacketed kettle',
  'Energy-management handbook: 1500 lb of milk, 80 to 212 °F, a quarter boiled off',
);
function milkSteamLb(): number {
  const barG = 15 * BAR_PER_PSI;
  const batchKg = 1500 * 0.45359237;
  const batch = { ...kettleB, batchKg, boilOffKg: batchKg / 4, product: given(0.9 * 4.1868), kettleSteelKg: 0 };
  const plain = {
    ...batch,
    startC: (80 - 32) / 1.8,
    endC: 100,
    heatingLossKW: 0,
    holdMin: 0,
    jacketPressureBarG: barG,
  };
  return toDisplay('mass', valueOf(jacketedKettle(plain, dry(barG))).steamKg, 'usCustomary');
}

const kettles = [
  ...kettleTimes,
  within(MILK, 'steam of 15 psig', 'lb', 574, relative(0.002), milkSteamLb),
  within(MILK, 'the same, 542 063 Btu over 945 carried on', 'lb', 573.611, relative(0.001), milkSteamLb),
  within(MILK, 'evaporation at 15 psig, from 945', 'Btu/lb', 945, relative(0.001), () => {
    const { hfg } = valueOf(saturationAtPressure(toAbsolute(barGauge(15 * BAR_PER_PSI))));
    return hfg / KJ_PER_KG_PER_BTU_PER_LB;
  }),
];

const injected = (batchKg: number, cp: number, startC: number, endC: number, barG: number | null) =>
  valueOf(
    injectionCooker(
      { ...injectionE, batchKg, product: given(cp), startC, endC, holdMin: 0 },
      barG === null ? supply : dry(barG),
    ),
  ).steamKg;
const washed = (toC: number) =>
  valueOf(waterHeating({ kind: 'wash', waterKg: 1000, fromC: 15, toC, minutes: 10 }, dry(7)));

const INJECTION = independent('Direct injection');
const injection = [
  printed(INJECTION, '1000 kg, cp 3.9, 20 to 95 °C, 7 bar g x = 0.98', 'kg', '125.569', () =>
    injected(1000, 3.9, 20, 95, null),
  ),
  printed(INJECTION, '… dilution', '%', '12.557', () => injected(1000, 3.9, 20, 95, null) / 10),
  printed(INJECTION, '500 kg of water, cp 4.185, 18 to 85 °C, dry 6 bar g', 'kg', '58.2494', () =>
    injected(500, 4.185, 18, 85, 6),
  ),
  printed(INJECTION, 'wash-down: 1000 kg, 15 to 60 °C, dry 7 bar g', 'kg', '74.8526', () => washed(60).steamKg),
  printed(INJECTION, 'wash-down: 1000 kg, 15 to 82 °C, dry 7 bar g', 'kg', '115.683', () => washed(82).steamKg),
  within(
    INJECTION,
    '… in 10 min',
    'kg/h',
    694.1,
    relative(1e-5),
    () => washed(82).phases[0]?.steamKgPerH ?? Number.NaN,
  ),
  printed(independent('Indirect heat'), '500 kW, condensate at 3 bar g', 'kg/h', '848.1794', () => {
    return (500 * 3600) / (supply.header.h - valueOf(saturationAtPressure(toAbsolute(barGauge(3)))).hf);
  }),
];

const pasteurised = (regeneration: number) => {
  const { working } = valueOf(platePasteuriser({ ...plateI, regeneration, lossKW: 0 }, supply));
  return working.steps.find(({ symbol }) => symbol === 'q_product')?.value ?? Number.NaN;
};
const FAO = published('Pasteuriser', 'FAO, X6541E, chapter 2: regeneration cuts the heat to a fifth or a tenth');
const pasteurisers = [
  ...(
    [
      [0, '736.667'],
      [0.8, '147.333'],
      [0.9, '73.667'],
      [0.95, '36.833'],
    ] as const
  ).map(([regeneration, figure]) =>
    printed(independent('Pasteuriser'), `10 t/h, cp 3.9, 4 to 72 °C, R ${regeneration}`, 'kW', figure, () =>
      pasteurised(regeneration),
    ),
  ),
  within(FAO, 'heat left at R 0.8', '', 0.2, relative(1e-9), () => pasteurised(0.8) / pasteurised(0)),
  within(FAO, 'heat left at R 0.9', '', 0.1, relative(1e-9), () => pasteurised(0.9) / pasteurised(0)),
  within(independent('Pasteuriser'), 'steam at R 0.9, evaporation at 3 bar g', 'kg/h', 124.33, relative(1e-4), () => {
    return (3600 * pasteurised(0.9)) / valueOf(saturationAtPressure(toAbsolute(barGauge(3)))).hfg;
  }),
];

const GRI = published('Blancher', 'GRI-03/0075: 300 to 400 Btu per lb of product in tubular water blanchers');
const steamPerKg = (kJPerKg: number) => kJPerKg / (supply.header.h - valueOf(liquidEnthalpy(celsius(95))));
const EFFICIENCIES = [
  [1, 0.124],
  [0.85, 0.146],
  [0.6, 0.207],
  [0.4, 0.31],
  [0.31, 0.4],
  [0.27, 0.459],
  [0.19, 0.652],
  [0.05, 2.479],
] as const;
const blanchers = [
  within(GRI, 'least, as steam of 7 bar g, x = 0.98', 'kg/kg', 0.3, absolute(0.005), () =>
    steamPerKg(300 * KJ_PER_KG_PER_BTU_PER_LB),
  ),
  within(GRI, 'most, as steam of 7 bar g, x = 0.98', 'kg/kg', 0.4, absolute(0.005), () =>
    steamPerKg(400 * KJ_PER_KG_PER_BTU_PER_LB),
  ),
  ...EFFICIENCIES.map(([efficiency, kgPerKg]) =>
    within(
      independent('Blancher'),
      `288.75 kJ/kg at an efficiency of ${100 * efficiency} %`,
      'kg/kg',
      kgPerKg,
      absolute(0.00051),
      () => steamPerKg(288.75 / efficiency),
    ),
  ),
];

const HEAT_LOSS = published('Bare surface', 'Heat-loss rule of a heater maker: W/in² = °F above ambient / 200');
const lossWPerM2 = (k: number, surfaceC: number, ambientC: number) =>
  1000 * surfaceLoss(openWorking(ENERGY_BALANCE, []), k, 1, surfaceC, ambientC);
const losses = [
  within(HEAT_LOSS, 'the plant-specific default of 14', 'W/m²K', 1.8 / 200 / 0.0254 ** 2, relative(0.004), () =>
    lossWPerM2(14, 1, 0),
  ),
  within(independent('Bare surface'), 'shell of 121.1 °C in a room of 25 °C', 'W/m²', 1340.6, relative(1e-4), () =>
    lossWPerM2(1.8 / 200 / 0.0254 ** 2, 121.1, 25),
  ),
];

const LETHAL: Table = {
  group: 'Lethal rate',
  source: 'Bigelow, Tr 121.1 °C, z 10 K; computed independently',
  mark: 'independent',
};
/** For the sheet only: the product shows no lethality and takes no decision by it. */
const RECORD = [60, 78, 95, 107, 114, 117.5, 119, 119.8, 112, 90].map((t, i) => [5 * i, t] as const);
const lethality = [
  ...(
    [
      [100, 0.00776247],
      [105, 0.0245471],
      [110, 0.0776247],
      [111.1, 0.1],
      [115, 0.245471],
      [118, 0.489779],
      [120, 0.776247],
      [121.1, 1],
      [125, 2.45471],
      [130, 7.76247],
    ] as const
  ).map(([t, rate]) => within(LETHAL, `at ${t} °C`, '', rate, relative(5e-6), () => lethalRate(t))),
  ...(
    [
      [115, '12.221'],
      [118, '6.125'],
      [121.1, '3.000'],
      [125, '1.222'],
      [130, '0.386'],
    ] as const
  ).map(([t, minutes]) =>
    printed(LETHAL, `3 min at 121.1 °C, as minutes at ${t} °C`, 'min', minutes, () => 3 / lethalRate(t)),
  ),
  printed(LETHAL, 'record of ten readings, trapezoid', 'min', '10.77115', () => minutesAt121(RECORD)),
];

export const dutyChecks: readonly Check[] = [
  ...kettles,
  ...injection,
  ...pasteurisers,
  ...blanchers,
  ...losses,
  ...lethality,
];

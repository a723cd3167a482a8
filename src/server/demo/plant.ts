/** The demo plant: invented from end to end, and marked as demo wherever it is shown. */
import type { FuelKey } from '../../core/duty/fuel';
import type { CleaningRule, Header, Line, PlantRules, Unit, UnitKind, VentGroup } from '../../core/plant/plant';

export const DEMO_PLANT = {
  id: 'demo',
  name: 'Tarn Hollow Kitchens',
  timeZone: 'Europe/London',
  altitudeM: 0,
  ambientBarA: 1.01325,
  /** Invented. */
  fuelPricePerKWh: 0.052,
  currency: 'GBP',
} as const;

export const DEMO_RULES: PlantRules = { snapMinutes: 5, reserveFraction: 0.1, sagToleranceBar: 0.5 };

export const DEMO_LINES: readonly Line[] = [
  { id: 'demo-line-a', name: 'Line A · vegetables' },
  { id: 'demo-line-b', name: 'Line B · soups' },
  { id: 'demo-line-c', name: 'Line C · ready meals' },
];

export const MAIN_HEADER = 'demo-main';
export const KETTLE_HEADER = 'demo-kettles';

export const DEMO_HEADERS: readonly Header[] = [
  {
    id: MAIN_HEADER,
    name: 'Main header',
    pressureBarG: 7,
    dryness: 0.98,
    superheatK: null,
    feed: { kind: 'boilers' },
  },
  {
    id: KETTLE_HEADER,
    name: 'Kettle header',
    pressureBarG: 3,
    // The main header's steam after the valve at constant enthalpy, to three digits.
    dryness: 0.995,
    superheatK: null,
    feed: { kind: 'letdown', fromHeaderId: MAIN_HEADER, greatestKgPerH: 1_600, leastKgPerH: 80 },
  },
];

/** Warming and draining the mains by header, invented: minutes, and steam that condenses in them. */
export const DEMO_MAINS: Readonly<Record<string, { readonly warmUpMinutes: number; readonly warmUpKg: number }>> = {
  [MAIN_HEADER]: { warmUpMinutes: 20, warmUpKg: 45 },
  [KETTLE_HEADER]: { warmUpMinutes: 15, warmUpKg: 15 },
};

const STUDY = 'Invented distribution study TH-D-04, demo';
export const DEMO_VENT_GROUPS: readonly VentGroup[] = [
  {
    id: 'demo-vents-north',
    name: 'North manifold',
    ventsAtOnce: 2,
    steamOnsAtOnce: 2,
    steamOnMinutes: 1,
    marginMinutes: 0,
    source: STUDY,
    studyGreatestLoadKgPerH: 3_600,
  },
  {
    id: 'demo-vents-south',
    name: 'South manifold',
    ventsAtOnce: 2,
    steamOnsAtOnce: 2,
    steamOnMinutes: 1,
    marginMinutes: 0,
    source: STUDY,
    studyGreatestLoadKgPerH: 3_400,
  },
];

const unit = (
  id: string,
  line: 'a' | 'b' | 'c',
  name: string,
  kind: UnitKind,
  headerId: string,
  vents: string | null = null,
): Unit => ({ id: `demo-${id}`, lineId: `demo-line-${line}`, name, kind, headerId, ventGroupId: vents });

export const DEMO_UNITS: readonly Unit[] = [
  unit('blancher-1', 'a', 'Blancher 1', 'blancher', MAIN_HEADER),
  unit('filler-1', 'a', 'Filler 1', 'filler', MAIN_HEADER),
  unit('retort-1', 'a', 'Retort 1', 'retort', MAIN_HEADER, 'demo-vents-north'),
  unit('retort-2', 'a', 'Retort 2', 'retort', MAIN_HEADER, 'demo-vents-north'),
  unit('kettle-1', 'b', 'Kettle 1', 'kettle', KETTLE_HEADER),
  unit('kettle-2', 'b', 'Kettle 2', 'kettle', KETTLE_HEADER),
  unit('filler-2', 'b', 'Filler 2', 'filler', MAIN_HEADER),
  unit('retort-3', 'b', 'Retort 3', 'retort', MAIN_HEADER, 'demo-vents-north'),
  unit('retort-4', 'b', 'Retort 4', 'retort', MAIN_HEADER, 'demo-vents-south'),
  unit('blancher-2', 'c', 'Blancher 2', 'blancher', MAIN_HEADER),
  unit('kettle-3', 'c', 'Kettle 3', 'kettle', KETTLE_HEADER),
  unit('kettle-4', 'c', 'Kettle 4', 'kettle', KETTLE_HEADER),
  unit('filler-3', 'c', 'Filler 3', 'filler', MAIN_HEADER),
  unit('retort-5', 'c', 'Retort 5', 'retort', MAIN_HEADER, 'demo-vents-south'),
  unit('retort-6', 'c', 'Retort 6', 'retort', MAIN_HEADER, 'demo-vents-south'),
];

/** How many minutes early and late starts are, by kind of unit; invented. */
export const DEMO_START_SPREADS: Partial<Record<UnitKind, readonly [earlyMin: number, lateMin: number]>> = {
  blancher: [5, 10],
  kettle: [4, 12],
  filler: [2, 6],
  retort: [3, 8],
};
export const DEMO_START_SPREAD_SOURCE = 'experience, invented for the demo';

export interface DemoBoiler {
  readonly id: string;
  readonly name: string;
  readonly ratingFromAndAtKgPerH: number;
  readonly pressureBarG: number;
  readonly feedTankBarG: number;
  readonly blowdownFraction: number;
  readonly condensateReturnFraction: number;
  readonly condensateC: number;
  readonly makeUpC: number;
  readonly turndown: number;
  readonly greatestRiseFractionPerMin: number;
  readonly waterTonnes: number;
  readonly efficiency: number;
  readonly fuel: FuelKey;
  readonly purgeMinutes: number;
  readonly warmReadyMinutes: number;
  readonly coldReadyMinutes: number;
}

const boilerHouse = {
  pressureBarG: 10,
  feedTankBarG: 0.2,
  blowdownFraction: 0.05,
  condensateReturnFraction: 0.6,
  condensateC: 90,
  makeUpC: 15,
  turndown: 4,
  greatestRiseFractionPerMin: 0.3,
  waterTonnes: 10,
  efficiency: 0.82,
  fuel: 'naturalGasUs' as const,
  purgeMinutes: 5,
  warmReadyMinutes: 30,
  coldReadyMinutes: 120,
};

export const DEMO_BOILERS: readonly DemoBoiler[] = [
  { id: 'demo-boiler-1', name: 'Boiler 1', ratingFromAndAtKgPerH: 2_150, ...boilerHouse },
  { id: 'demo-boiler-2', name: 'Boiler 2', ratingFromAndAtKgPerH: 2_150, ...boilerHouse },
];

/** What the boiler house says of the week: minutes from Monday 00:00. Fires are lit then; steam can leave 125 min later. */
export const DEMO_FIRINGS = [
  { boilerId: 'demo-boiler-1', from: 115, to: 8_160, share: 1, reason: 'Week in fire, demo' },
  { boilerId: 'demo-boiler-2', from: 175, to: 8_160, share: 1, reason: 'Week in fire, demo' },
  { boilerId: 'demo-boiler-2', from: 3_600, to: 3_840, share: 0.75, reason: 'Burner on low fire for service, demo' },
] as const;

/** By hour of the week. */
export const DEMO_BASE_LOADS = [
  { headerId: MAIN_HEADER, fromHour: 4, toHour: 136, kgPerH: 240, note: 'Mains losses and space heating, demo' },
] as const;

export const DEMO_SHIFTS = [
  {
    id: 'demo-early',
    name: 'early shift',
    days: [1, 2, 3, 4, 5],
    startsAt: '06:00',
    endsAt: '14:00',
    lineIds: null,
  },
  {
    id: 'demo-late',
    name: 'late shift',
    days: [1, 2, 3, 4, 5],
    startsAt: '14:00',
    endsAt: '22:00',
    lineIds: null,
  },
  { id: 'demo-saturday', name: 'Saturday shift', days: [6], startsAt: '06:00', endsAt: '12:00', lineIds: null },
] as const;

export const CRATES = 'demo-crates';
export const OPERATORS = 'demo-operators';
export const DEMO_SHARED_LIMITS = [
  { id: CRATES, name: 'Retort crates', unit: 'crates', capacity: [{ fromHour: 0, value: 48 }] },
  { id: OPERATORS, name: 'Retort operators', unit: 'operators', capacity: [{ fromHour: 0, value: 4 }] },
] as const;

export const DEMO_FAMILIES = [
  { id: 'demo-corn', name: 'Sweetcorn' },
  { id: 'demo-vegetables', name: 'Vegetables' },
  { id: 'demo-soups', name: 'Soups, plain' },
  { id: 'demo-cream', name: 'Soups with milk' },
  { id: 'demo-meals', name: 'Pulses and rice' },
] as const;

export type DemoFamily = (typeof DEMO_FAMILIES)[number]['id'];
const MILK: DemoFamily = 'demo-cream';

/** How long and how: cleaning from milk is an allergen cleaning. */
export function cleaningKind(from: DemoFamily, to: DemoFamily): CleaningRule['kind'] {
  if (from === to) return 'rinse';
  return from === MILK ? 'allergen' : 'wash';
}

/** Minutes of a cleaning by the kind of unit; no entry: none is needed. */
export const CLEANING_MINUTES: Partial<Record<UnitKind, Partial<Record<CleaningRule['kind'], number>>>> = {
  blancher: { wash: 25, allergen: 45 },
  kettle: { rinse: 10, wash: 20, allergen: 45 },
  filler: { wash: 15, allergen: 40 },
};

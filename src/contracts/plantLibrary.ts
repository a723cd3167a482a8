import { z } from 'zod';
import { BOILER_HOUSE_RANGES } from '../core/duty/boilerExport';
import { EMISSION_FACTORS, type FuelKey } from '../core/duty/fuel';
import type { UnitKind } from '../core/plant/plant';
import { checkRange, shortNumber, type Range } from '../core/quantity/range';

/** What the plant is made of, each with a form of its own. */
export const THING_KINDS = [
  'headers',
  'boilers',
  'units',
  'ventGroups',
  'accumulators',
  'sharedLimits',
  'baseLoads',
  'lines',
] as const;
export type ThingKind = (typeof THING_KINDS)[number];

export const UNIT_KINDS = [
  'blancher',
  'kettle',
  'cooker',
  'filler',
  'retort',
  'pasteuriser',
  'other',
] as const satisfies readonly UnitKind[];

const FUELS = Object.keys(EMISSION_FACTORS) as [FuelKey, ...FuelKey[]];

const range = (name: string, unit: string, min: number, max: number): Range => ({ name, unit, min, max });

/** Ranges of every number, as forms show them and sentences name them. */
export const RANGES = {
  headers: {
    pressureBarG: range('Header pressure', 'bar g', 0, 60),
    dryness: range('Dryness fraction', '', 0.5, 1),
    superheatK: range('Superheat', 'K', 0, 400),
    greatestKgPerH: range('Greatest flow of the letdown', 'kg/h', 1, 200_000),
    leastKgPerH: range('Least flow of the letdown', 'kg/h', 0, 200_000),
    flashShare: range('Share of the condensate', '', 0, 1),
    flashCondensateBarG: range('Condensate pressure', 'bar g', 0, 60),
    warmUpMinutes: range('Warming of the mains', 'min', 0, 1_440),
    warmUpKg: range('Steam to warm the mains', 'kg', 0, 100_000),
  },
  boilers: {
    ratingFromAndAtKgPerH: BOILER_HOUSE_RANGES.ratingFromAndAtKgPerH,
    pressureBarG: BOILER_HOUSE_RANGES.boilerPressureBarG,
    feedTankBarG: BOILER_HOUSE_RANGES.feedTankPressureBarG,
    blowdownFraction: BOILER_HOUSE_RANGES.blowdownFraction,
    condensateReturnFraction: BOILER_HOUSE_RANGES.condensateReturnFraction,
    condensateC: BOILER_HOUSE_RANGES.condensateC,
    makeUpC: BOILER_HOUSE_RANGES.makeUpC,
    turndown: range('Turndown', '', 1, 20),
    greatestRiseFractionPerMin: range('Greatest rise per minute', '', 0.001, 1),
    waterTonnes: range('Water in the boiler', 't', 0.05, 200),
    efficiency: range('Efficiency', '', 0.5, 1),
    purgeMinutes: range('Purge', 'min', 0, 120),
    warmReadyMinutes: range('To pressure, warm', 'min', 0, 1_440),
    coldReadyMinutes: range('To pressure, cold', 'min', 0, 2_880),
  },
  accumulators: {
    waterTonnes: range('Water in store', 't', 0.1, 1_000),
    highBarG: range('Charged up to', 'bar g', 0, 60),
    lowBarG: range('Discharged down to', 'bar g', 0, 60),
    greatestChargeKgPerH: range('Greatest charge', 'kg/h', 1, 200_000),
    greatestDischargeKgPerH: range('Greatest discharge', 'kg/h', 1, 200_000),
    shareAtWeekStart: range('Share in store at the start of the week', '', 0, 1),
  },
  sharedLimits: {
    fromHour: range('From hour', 'h', 0, 167),
    value: range('Capacity', '', 0, 1_000_000),
  },
  baseLoads: {
    fromHour: range('From', 'h', 0, 167),
    toHour: range('To', 'h', 1, 168),
    kgPerH: range('Base load', 'kg/h', 0, 200_000),
  },
} as const satisfies Partial<Record<ThingKind, Record<string, Range>>>;

function numberIn(its: Range, isWhole: boolean) {
  const unit = its.unit === '' ? '' : ` ${its.unit}`;
  const missing = `${its.name} is missing; it must be ${shortNumber(its.min)} to ${shortNumber(its.max)}${unit}.`;
  return z.number({ error: missing }).superRefine((value, context) => {
    const bad = checkRange('INPUT', its, value);
    if (bad) context.addIssue({ code: 'custom', message: bad.message });
    else if (isWhole && !Number.isInteger(value)) {
      context.addIssue({ code: 'custom', message: `${its.name} must be a whole number.` });
    }
  });
}

/** A number in its range; the sentence names value and range. */
export const ranged = (its: Range) => numberIn(its, false);

/** A whole number in its range. */
export const rangedWhole = (its: Range) => numberIn(its, true);

const text = (missing: string, longest: number) =>
  z.string({ error: missing }).trim().min(1, missing).max(longest, `At most ${longest} characters.`);
const name = text('Say what it is called.', 60);
const reference = (missing: string) => z.string({ error: missing }).min(1, missing).max(80, missing);
const noneOr = z.string().min(1).max(80).nullable();
const { headers: H, boilers: B, accumulators: A, sharedLimits: S, baseLoads: L } = RANGES;

const headerSchema = z.object({
  name,
  pressureBarG: ranged(H.pressureBarG),
  /** One of the two: dryness where saturated, superheat where superheated. */
  dryness: ranged(H.dryness).nullable(),
  superheatK: ranged(H.superheatK).nullable(),
  feedKind: z.enum(['boilers', 'letdown'], { error: 'Say what feeds it: boilers or a letdown.' }),
  /** Of a letdown. */
  feedFromHeaderId: noneOr,
  greatestKgPerH: ranged(H.greatestKgPerH).nullable(),
  leastKgPerH: ranged(H.leastKgPerH).nullable(),
  /** Hot condensate of this header's users flashes in; null: none. */
  flashFromHeaderId: noneOr,
  flashShare: ranged(H.flashShare).nullable(),
  flashCondensateBarG: ranged(H.flashCondensateBarG).nullable(),
  warmUpMinutes: rangedWhole(H.warmUpMinutes),
  warmUpKg: ranged(H.warmUpKg),
});

const boilerSchema = z.object({
  name,
  headerId: reference('Choose the header that it feeds.'),
  ratingFromAndAtKgPerH: ranged(B.ratingFromAndAtKgPerH),
  pressureBarG: ranged(B.pressureBarG),
  feedTankBarG: ranged(B.feedTankBarG),
  blowdownFraction: ranged(B.blowdownFraction),
  condensateReturnFraction: ranged(B.condensateReturnFraction),
  condensateC: ranged(B.condensateC),
  makeUpC: ranged(B.makeUpC),
  turndown: ranged(B.turndown),
  greatestRiseFractionPerMin: ranged(B.greatestRiseFractionPerMin),
  waterTonnes: ranged(B.waterTonnes),
  efficiency: ranged(B.efficiency),
  fuel: z.enum(FUELS, { error: 'Choose the fuel.' }),
  purgeMinutes: rangedWhole(B.purgeMinutes),
  warmReadyMinutes: rangedWhole(B.warmReadyMinutes),
  coldReadyMinutes: rangedWhole(B.coldReadyMinutes),
});

const unitSchema = z.object({
  name,
  lineId: reference('Choose its line.'),
  kind: z.enum(UNIT_KINDS, { error: 'Choose what kind of unit it is.' }),
  headerId: noneOr,
  ventGroupId: noneOr,
});

const accumulatorSchema = z.object({
  name,
  chargedFromHeaderId: reference('Choose the header that charges it.'),
  feedsHeaderId: reference('Choose the header that it feeds.'),
  waterTonnes: ranged(A.waterTonnes),
  highBarG: ranged(A.highBarG),
  lowBarG: ranged(A.lowBarG),
  greatestChargeKgPerH: ranged(A.greatestChargeKgPerH),
  greatestDischargeKgPerH: ranged(A.greatestDischargeKgPerH),
  shareAtWeekStart: ranged(A.shareAtWeekStart),
});

const sharedLimitSchema = z.object({
  name,
  unit: text('Say what is counted, such as crates.', 30),
  capacity: z
    .array(z.object({ fromHour: rangedWhole(S.fromHour), value: ranged(S.value) }))
    .min(1, 'Give the capacity from the first hour of the week on.')
    .max(60, 'At most 60 steps a week.'),
});

const baseLoadSchema = z.object({
  headerId: reference('Choose the header that it draws from.'),
  fromHour: rangedWhole(L.fromHour),
  toHour: rangedWhole(L.toHour),
  kgPerH: ranged(L.kgPerH),
  note: text('Say what it is: mains losses, space heating, ...', 200),
});

/** What a form of each kind sends. */
export const THING_SCHEMAS = {
  headers: headerSchema,
  boilers: boilerSchema,
  units: unitSchema,
  ventGroups: z.object({ name }),
  accumulators: accumulatorSchema,
  sharedLimits: sharedLimitSchema,
  baseLoads: baseLoadSchema,
  lines: z.object({ name }),
} as const;

export type ThingValues<K extends ThingKind> = z.infer<(typeof THING_SCHEMAS)[K]>;

/** One thing of the plant as it stands. */
export interface Thing<K extends ThingKind> {
  readonly id: string;
  readonly values: ThingValues<K>;
  /** ISO instant; null while in use. */
  readonly retiredAt: string | null;
}

/** The numbers of a vent group in force; they change by practice rules alone. */
export interface VentNumbersDto {
  readonly ventsAtOnce: number;
  readonly steamOnsAtOnce: number;
  readonly steamOnMinutes: number;
  readonly marginMinutes: number;
  readonly leastHeaderBarG: number | null;
  readonly studyGreatestLoadKgPerH: number | null;
  readonly source: string;
}

export type Things = { readonly [K in ThingKind]: readonly Thing<K>[] };

/** GET /api/plant: the plant's library in its order, what is retired last. */
export interface PlantLibraryDto {
  readonly ambientBarA: number;
  /** 1 is Monday. */
  readonly weekStartsOn: number;
  readonly things: Things;
  /** By vent group. */
  readonly ventNumbers: Readonly<Record<string, VentNumbersDto>>;
}

/** POST /api/plant/:kind */
export const createThingSchema = z.object({ values: z.record(z.string(), z.unknown()) });
/** POST /api/plant/:kind/:id: `was` holds the values that the form was filled with; where they changed it is refused. */
export const editThingSchema = createThingSchema.extend({ was: z.record(z.string(), z.unknown()) });
/** POST /api/plant/:kind/order: every thing in use, in the order wanted. */
export const orderThingsSchema = z.object({ ids: z.array(z.string().min(1).max(80)).max(500) });

/** POST /api/plant/:kind and /:kind/:id */
export interface SavedThingDto {
  readonly id: string;
  readonly library: PlantLibraryDto;
}

import { boolean, doublePrecision, index, integer, jsonb, pgTable, text, unique } from 'drizzle-orm/pg-core';
import type { FuelKey } from '../../core/duty/fuel';
import type { StartSpread } from '../../core/header/spread/startSpread';
import type { FlashFeed, HeaderFeed, UnitKind } from '../../core/plant/plant';
import { createdAt, id, instant } from './columns';

export const plants = pgTable('plants', {
  id: id(),
  name: text('name').notNull(),
  isDemo: boolean('is_demo').notNull().default(false),
  timeZone: text('time_zone').notNull(),
  /** 1 is Monday. */
  weekStartsOn: integer('week_starts_on').notNull().default(1),
  altitudeM: doublePrecision('altitude_m').notNull().default(0),
  displayUnits: text('display_units').$type<'si' | 'us'>().notNull().default('si'),
  snapMinutes: integer('snap_minutes').notNull().default(5),
  reserveFraction: doublePrecision('reserve_fraction').notNull().default(0),
  sagToleranceBar: doublePrecision('sag_tolerance_bar').notNull().default(0.5),
  /** Price of a kWh of fuel on the heating value of the boilers' factor; null: not said. */
  fuelPricePerKWh: doublePrecision('fuel_price_per_kwh'),
  /** Letters that stand before the cost, such as EUR. */
  currency: text('currency').notNull().default('EUR'),
  createdAt: createdAt(),
});

/** Columns that every row of a plant carries. */
export const plantId = () =>
  text('plant_id')
    .notNull()
    .references(() => plants.id, { onDelete: 'cascade' });

export const lines = pgTable(
  'lines',
  {
    id: id(),
    plantId: plantId(),
    name: text('name').notNull(),
    position: integer('position').notNull(),
    retiredAt: instant('retired_at'),
  },
  (t) => [index('lines_plant').on(t.plantId)],
);

export const headers = pgTable(
  'headers',
  {
    id: id(),
    plantId: plantId(),
    name: text('name').notNull(),
    pressureBarG: doublePrecision('pressure_bar_g').notNull(),
    dryness: doublePrecision('dryness'),
    superheatK: doublePrecision('superheat_k'),
    feed: jsonb('feed').$type<HeaderFeed>().notNull(),
    /** Hot condensate that flashes into this header; null: none. */
    flash: jsonb('flash').$type<FlashFeed>(),
    /** Opening, warming and draining the mains before the first user. [min, kg] */
    warmUpMinutes: integer('warm_up_minutes').notNull().default(20),
    warmUpKg: doublePrecision('warm_up_kg').notNull().default(0),
    position: integer('position').notNull(),
    retiredAt: instant('retired_at'),
  },
  (t) => [index('headers_plant').on(t.plantId)],
);

export const ventGroups = pgTable(
  'vent_groups',
  {
    id: id(),
    plantId: plantId(),
    name: text('name').notNull(),
    ventsAtOnce: integer('vents_at_once').notNull(),
    steamOnsAtOnce: integer('steam_ons_at_once').notNull(),
    steamOnMinutes: integer('steam_on_minutes').notNull().default(1),
    marginMinutes: integer('margin_minutes').notNull().default(0),
    source: text('source').notNull(),
    /** The greatest load on the header that the study saw, and the least header pressure it vented at; null: not said. */
    studyGreatestLoadKgPerH: doublePrecision('study_greatest_load_kg_per_h'),
    leastHeaderBarG: doublePrecision('least_header_bar_g'),
    position: integer('position').notNull().default(0),
    retiredAt: instant('retired_at'),
  },
  (t) => [index('vent_groups_plant').on(t.plantId)],
);

export const units = pgTable(
  'units',
  {
    id: id(),
    plantId: plantId(),
    lineId: text('line_id')
      .notNull()
      .references(() => lines.id),
    name: text('name').notNull(),
    kind: text('kind').$type<UnitKind>().notNull(),
    headerId: text('header_id').references(() => headers.id),
    ventGroupId: text('vent_group_id').references(() => ventGroups.id),
    /** How early and late starts are; null: on time. */
    startSpread: jsonb('start_spread').$type<StartSpread>(),
    /** Where the spread is from: experience, or so many recorded starts. */
    startSpreadSource: text('start_spread_source'),
    position: integer('position').notNull(),
    retiredAt: instant('retired_at'),
  },
  (t) => [index('units_plant').on(t.plantId)],
);

export const boilers = pgTable(
  'boilers',
  {
    id: id(),
    plantId: plantId(),
    name: text('name').notNull(),
    headerId: text('header_id')
      .notNull()
      .references(() => headers.id),
    ratingFromAndAtKgPerH: doublePrecision('rating_from_and_at_kg_per_h').notNull(),
    pressureBarG: doublePrecision('pressure_bar_g').notNull(),
    feedTankBarG: doublePrecision('feed_tank_bar_g').notNull(),
    blowdownFraction: doublePrecision('blowdown_fraction').notNull(),
    condensateReturnFraction: doublePrecision('condensate_return_fraction').notNull(),
    condensateC: doublePrecision('condensate_c').notNull(),
    makeUpC: doublePrecision('make_up_c').notNull(),
    turndown: doublePrecision('turndown').notNull(),
    greatestRiseFractionPerMin: doublePrecision('greatest_rise_fraction_per_min').notNull(),
    waterTonnes: doublePrecision('water_tonnes').notNull(),
    /** Heat into the water over heat of the fuel, on the heating value of the factor. */
    efficiency: doublePrecision('efficiency').notNull().default(0.8),
    /** Key of an emission factor in core. */
    fuel: text('fuel').$type<FuelKey>().notNull().default('naturalGasUs'),
    /** Purge before the fire is lit, then to pressure: warm (in fire within half a day) or cold. [min] */
    purgeMinutes: integer('purge_minutes').notNull().default(5),
    warmReadyMinutes: integer('warm_ready_minutes').notNull().default(30),
    coldReadyMinutes: integer('cold_ready_minutes').notNull().default(120),
    position: integer('position').notNull(),
    retiredAt: instant('retired_at'),
  },
  (t) => [index('boilers_plant').on(t.plantId)],
);

/** Hot water under pressure that takes steam in from one header and gives it up to another. */
export const accumulators = pgTable(
  'accumulators',
  {
    id: id(),
    plantId: plantId(),
    name: text('name').notNull(),
    chargedFromHeaderId: text('charged_from_header_id')
      .notNull()
      .references(() => headers.id),
    feedsHeaderId: text('feeds_header_id')
      .notNull()
      .references(() => headers.id),
    waterTonnes: doublePrecision('water_tonnes').notNull(),
    /** Charged up to, discharged down to. */
    highBarG: doublePrecision('high_bar_g').notNull(),
    lowBarG: doublePrecision('low_bar_g').notNull(),
    greatestChargeKgPerH: doublePrecision('greatest_charge_kg_per_h').notNull(),
    greatestDischargeKgPerH: doublePrecision('greatest_discharge_kg_per_h').notNull(),
    /** Share of what it can give up that is in store at the week's first instant. */
    shareAtWeekStart: doublePrecision('share_at_week_start').notNull().default(0),
    position: integer('position').notNull(),
    retiredAt: instant('retired_at'),
  },
  (t) => [index('accumulators_plant').on(t.plantId)],
);

/**
 * What the utilities lead has said of a boiler for a span; a later row overrules an earlier one where they overlap.
 * Never changed or deleted.
 */
export const boilerFirings = pgTable(
  'boiler_firings',
  {
    id: id(),
    plantId: plantId(),
    boilerId: text('boiler_id')
      .notNull()
      .references(() => boilers.id),
    fromAt: instant('from_at').notNull(),
    toAt: instant('to_at').notNull(),
    /** 0: shut; 1: lit at full rating; between: derated. */
    share: doublePrecision('share').notNull(),
    reason: text('reason').notNull(),
    authorId: text('author_id').notNull(),
    sequence: integer('sequence').generatedAlwaysAsIdentity().notNull(),
    createdAt: createdAt(),
  },
  (t) => [index('boiler_firings_span').on(t.plantId, t.fromAt, t.toAt)],
);

/** A steam limit set for a span; `limit_kg_per_h` null takes a set limit back. Later rows overrule earlier ones. */
export const steamLimits = pgTable(
  'steam_limits',
  {
    id: id(),
    plantId: plantId(),
    headerId: text('header_id')
      .notNull()
      .references(() => headers.id),
    fromAt: instant('from_at').notNull(),
    toAt: instant('to_at').notNull(),
    limitKgPerH: doublePrecision('limit_kg_per_h'),
    reason: text('reason').notNull(),
    authorId: text('author_id').notNull(),
    sequence: integer('sequence').generatedAlwaysAsIdentity().notNull(),
    createdAt: createdAt(),
  },
  (t) => [index('steam_limits_span').on(t.plantId, t.fromAt, t.toAt)],
);

/** Losses and users outside the plan, by hour of the week (0 is the first hour of the week). */
export const baseLoads = pgTable(
  'base_loads',
  {
    id: id(),
    plantId: plantId(),
    headerId: text('header_id')
      .notNull()
      .references(() => headers.id),
    fromHour: integer('from_hour').notNull(),
    toHour: integer('to_hour').notNull(),
    kgPerH: doublePrecision('kg_per_h').notNull(),
    note: text('note').notNull(),
    position: integer('position').notNull().default(0),
    retiredAt: instant('retired_at'),
  },
  (t) => [index('base_loads_plant').on(t.plantId)],
);

/** Crates, cooling water, hoist, operators: capacity by hour of the week as [fromHour, value] steps. */
export const sharedLimits = pgTable(
  'shared_limits',
  {
    id: id(),
    plantId: plantId(),
    name: text('name').notNull(),
    unit: text('unit').notNull(),
    capacity: jsonb('capacity').$type<{ fromHour: number; value: number }[]>().notNull(),
    position: integer('position').notNull().default(0),
    retiredAt: instant('retired_at'),
  },
  (t) => [index('shared_limits_plant').on(t.plantId)],
);

/** A shift of the week, wall-clock times in the plant's zone; one that ends at or before its start runs past midnight. */
export const shifts = pgTable(
  'shifts',
  {
    id: id(),
    plantId: plantId(),
    name: text('name').notNull(),
    /** 1 is Monday. */
    days: jsonb('days').$type<number[]>().notNull(),
    /** "06:00" */
    startsAt: text('starts_at').notNull(),
    endsAt: text('ends_at').notNull(),
    /** Lines that the shift runs; null: all. */
    lineIds: jsonb('line_ids').$type<string[]>(),
    position: integer('position').notNull(),
  },
  (t) => [unique('shifts_name').on(t.plantId, t.name)],
);

/** A day or span that differs: holiday, maintenance, overtime. */
export const calendarExceptions = pgTable(
  'calendar_exceptions',
  {
    id: id(),
    plantId: plantId(),
    /** null: every unit. */
    unitId: text('unit_id').references(() => units.id),
    fromAt: instant('from_at').notNull(),
    toAt: instant('to_at').notNull(),
    open: boolean('open').notNull(),
    reason: text('reason').notNull(),
  },
  (t) => [index('calendar_exceptions_span').on(t.plantId, t.fromAt, t.toAt)],
);

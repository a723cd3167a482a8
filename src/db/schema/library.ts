import { doublePrecision, index, integer, jsonb, pgTable, text, unique, type AnyPgColumn } from 'drizzle-orm/pg-core';
import type { PracticeRuleKind } from '../../contracts/practice';
import type { ProcessValuesDto } from '../../contracts/processData';
import type { DutyModel } from '../../core/duty/model';
import type { SpecificHeatBasis } from '../../core/duty/specificHeat';
import type { LimitUse, Phase, Stage } from '../../core/plant/activity';
import type { UnitKind } from '../../core/plant/plant';
import { createdAt, id, instant } from './columns';
import { plantId, units, ventGroups } from './plant';

export const families = pgTable(
  'families',
  { id: id(), plantId: plantId(), name: text('name').notNull(), retiredAt: instant('retired_at') },
  (t) => [index('families_plant').on(t.plantId)],
);

export const cleaningRules = pgTable(
  'cleaning_rules',
  {
    id: id(),
    plantId: plantId(),
    unitKind: text('unit_kind').$type<UnitKind>().notNull(),
    fromFamilyId: text('from_family_id')
      .notNull()
      .references(() => families.id),
    toFamilyId: text('to_family_id')
      .notNull()
      .references(() => families.id),
    minutes: integer('minutes').notNull(),
    kind: text('kind').$type<'rinse' | 'wash' | 'allergen'>().notNull(),
    phases: jsonb('phases').$type<Phase[]>().notNull(),
    uses: jsonb('uses').$type<LimitUse[]>().notNull(),
    /** Duty data that the phases come from; null: typed. */
    dutyId: text('duty_id').references((): AnyPgColumn => duties.id),
  },
  (t) => [unique('cleaning_rules_pair').on(t.plantId, t.unitKind, t.fromFamilyId, t.toFamilyId)],
);

export const products = pgTable(
  'products',
  {
    id: id(),
    plantId: plantId(),
    name: text('name').notNull(),
    familyId: text('family_id')
      .notNull()
      .references(() => families.id),
    /** Mass fractions; carbohydrate net of fibre. */
    composition: jsonb('composition').$type<Record<string, number>>().notNull(),
    containerKg: doublePrecision('container_kg').notNull(),
    fillKg: doublePrecision('fill_kg').notNull(),
    casePieces: integer('case_pieces').notNull(),
    /** Where the specific heat is from when not from the composition. */
    specificHeat: jsonb('specific_heat').$type<SpecificHeatBasis>(),
    /** Contents at steam on, as it usually is; the process data holds the least that is allowed. [degC] */
    initialC: doublePrecision('initial_c'),
    retiredAt: instant('retired_at'),
  },
  (t) => [index('products_plant').on(t.plantId)],
);

/**
 * Thermal-process data of a product. It can be planned with only while released, and never by the person who entered
 * it; a change is a new row.
 */
export const processData = pgTable(
  'process_data',
  {
    id: id(),
    plantId: plantId(),
    productId: text('product_id')
      .notNull()
      .references(() => products.id),
    document: text('document').notNull(),
    issue: text('issue').notNull(),
    /** Process temperature [degC], process time [min], vent schedule, longest waits [min], initial temperature [degC]. */
    values: jsonb('values').$type<ProcessValuesDto>().notNull(),
    enteredBy: text('entered_by').notNull(),
    createdAt: createdAt(),
    releasedBy: text('released_by'),
    releasedAt: instant('released_at'),
    withdrawnAt: instant('withdrawn_at'),
  },
  (t) => [index('process_data_product').on(t.plantId, t.productId)],
);

/**
 * A rule of practice with its source. It holds once released by the quality lead; a change is a new row, and the
 * newest released one that is not withdrawn is in force.
 */
export const practiceRules = pgTable(
  'practice_rules',
  {
    id: id(),
    plantId: plantId(),
    kind: text('kind').$type<PracticeRuleKind>().notNull(),
    /** The vent group that it is for; null: the whole plant. */
    ventGroupId: text('vent_group_id').references(() => ventGroups.id),
    values: jsonb('values').$type<Record<string, number | null>>().notNull(),
    /** Study, regulation or document; or "common practice, no source". */
    source: text('source').notNull(),
    enteredBy: text('entered_by').notNull(),
    createdAt: createdAt(),
    releasedBy: text('released_by'),
    releasedAt: instant('released_at'),
    withdrawnAt: instant('withdrawn_at'),
  },
  (t) => [index('practice_rules_plant').on(t.plantId, t.kind)],
);

/** Inputs of a duty model (core/duty), by its name; `typed` holds a measured profile instead. */
export const duties = pgTable(
  'duties',
  {
    id: id(),
    plantId: plantId(),
    name: text('name').notNull(),
    model: text('model').$type<DutyModel['model']>().notNull(),
    inputs: jsonb('inputs').$type<Record<string, unknown>>().notNull(),
    /** Counts every change; modes worked out from an older one are out of date. */
    revision: integer('revision').notNull().default(0),
    changedAt: instant('changed_at'),
    changedBy: text('changed_by'),
    createdAt: createdAt(),
    retiredAt: instant('retired_at'),
  },
  (t) => [index('duties_plant').on(t.plantId)],
);

/** One stage of a product's route on one eligible unit. */
export const routeModes = pgTable(
  'route_modes',
  {
    id: id(),
    plantId: plantId(),
    productId: text('product_id')
      .notNull()
      .references(() => products.id),
    position: integer('position').notNull(),
    stage: text('stage').$type<Stage>().notNull(),
    unitId: text('unit_id')
      .notNull()
      .references(() => units.id),
    /** Door to door where no duty says more. */
    minutes: integer('minutes').notNull(),
    dutyId: text('duty_id').references(() => duties.id),
    /** From the start to steam on, and from the last phase to the unit's end. */
    leadMin: integer('lead_min').notNull().default(0),
    afterMin: integer('after_min').notNull().default(0),
    uses: jsonb('uses').$type<LimitUse[]>().notNull(),
    /** What one batch takes in [kg]; null: the duty's own. */
    sizeKg: doublePrecision('size_kg'),
    /** Containers of one load; null: the duty's own. */
    pieces: integer('pieces'),
    /** Containers a minute of a filler; null: the duty's own, else one load in `minutes`. */
    piecesPerMin: doublePrecision('pieces_per_min'),
    /** kg in containers for every kg that goes in; null: 1, less what the duty boils off. */
    yield: doublePrecision('yield'),
  },
  (t) => [unique('route_modes_stage_unit').on(t.productId, t.position, t.unitId)],
);

import { boolean, date, doublePrecision, index, integer, jsonb, pgTable, text, unique } from 'drizzle-orm/pg-core';
import type { LevellingProgressDto, LevellingState } from '../../contracts/levelling';
import type { ActivityKind, CleaningKind, Fixing, LinkEnd, LinkRule, Mode, Stage } from '../../core/plant/activity';
import type { Change, EditKind } from '../../core/schedule/edit';
import type { Week } from '../../core/schedule/week';
import { createdAt, id, instant } from './columns';
import { families, processData, products } from './library';
import { orders } from './orders';
import { plantId, units } from './plant';

/** The plan of one plant and week. */
export const plans = pgTable(
  'plans',
  {
    id: id(),
    plantId: plantId(),
    /** The week's first day, in the plant's zone. */
    weekStart: date('week_start', { mode: 'string' }).notNull(),
    revision: integer('revision').notNull().default(0),
    createdAt: createdAt(),
  },
  (t) => [unique('plans_week').on(t.plantId, t.weekStart)],
);

const planId = () =>
  text('plan_id')
    .notNull()
    .references(() => plans.id, { onDelete: 'cascade' });

export const activities = pgTable(
  'activities',
  {
    id: id(),
    plantId: plantId(),
    planId: planId(),
    kind: text('kind').$type<ActivityKind>().notNull(),
    stage: text('stage').$type<Stage>(),
    /** Of a cleaning that was planned by hand. */
    cleaning: text('cleaning').$type<CleaningKind>(),
    batchId: text('batch_id'),
    orderId: text('order_id').references(() => orders.id),
    code: text('code').notNull(),
    title: text('title').notNull(),
    productId: text('product_id').references(() => products.id),
    familyId: text('family_id').references(() => families.id),
    /** Duration, phases and uses by eligible unit, as they were when planned. */
    modes: jsonb('modes').$type<Mode[]>().notNull(),
    unitId: text('unit_id').references(() => units.id),
    startAt: instant('start_at'),
    cleanAfterMin: integer('clean_after_min').notNull().default(0),
    fixing: text('fixing').$type<Fixing>().notNull().default('free'),
    /** null: until its own end; else the link whose later activity takes it off. */
    occupiesUntilLinkId: text('occupies_until_link_id'),
    earliestAt: instant('earliest_at').notNull(),
    latestStartAt: instant('latest_start_at'),
    dueAt: instant('due_at'),
    weight: doublePrecision('weight').notNull().default(1),
    processDataId: text('process_data_id').references(() => processData.id),
    revision: integer('revision').notNull().default(0),
    movedBy: text('moved_by'),
    movedAt: instant('moved_at'),
  },
  (t) => [index('activities_plan').on(t.planId), index('activities_unit').on(t.unitId, t.startAt)],
);

export const links = pgTable(
  'links',
  {
    id: id(),
    plantId: plantId(),
    planId: planId(),
    from: jsonb('from_end').$type<LinkEnd>().notNull(),
    to: jsonb('to_end').$type<LinkEnd>().notNull(),
    leastMin: integer('least_min').notNull(),
    greatestMin: integer('greatest_min'),
    rule: text('rule').$type<LinkRule>().notNull(),
    greatestBreach: text('greatest_breach').$type<'process' | 'time'>().notNull(),
    source: text('source'),
  },
  (t) => [index('links_plan').on(t.planId)],
);

/** Every change of a plan, in order; never changed or deleted. */
export const edits = pgTable(
  'edits',
  {
    id: id(),
    plantId: plantId(),
    planId: planId(),
    /** The plan's revision that the edit made. */
    revision: integer('revision').notNull(),
    kind: text('kind').$type<EditKind>().notNull(),
    changes: jsonb('changes').$type<Change[]>().notNull(),
    authorId: text('author_id').notNull(),
    createdAt: createdAt(),
  },
  (t) => [unique('edits_revision').on(t.planId, t.revision)],
);

/** A utilities lead's agreement to steam over the limit in one revision of the plan. */
export const agreements = pgTable(
  'agreements',
  {
    id: id(),
    plantId: plantId(),
    planId: planId(),
    revision: integer('revision').notNull(),
    /** The last word on the week's firings and limits that it was given to: it holds until there is a newer one. */
    capacityMark: text('capacity_mark').notNull().default(''),
    comment: text('comment').notNull(),
    authorId: text('author_id').notNull(),
    createdAt: createdAt(),
  },
  (t) => [index('agreements_plan').on(t.planId, t.revision)],
);

/** A plan put on the floor: an immutable copy of the whole week as it was judged. */
export const issues = pgTable(
  'issues',
  {
    id: id(),
    plantId: plantId(),
    planId: planId(),
    number: integer('number').notNull(),
    revision: integer('revision').notNull(),
    week: jsonb('week').$type<Week>().notNull(),
    comment: text('comment').notNull(),
    agreementId: text('agreement_id').references(() => agreements.id),
    authorId: text('author_id').notNull(),
    createdAt: createdAt(),
  },
  (t) => [unique('issues_number').on(t.planId, t.number)],
);

/** A levelling run: its own row, heartbeat and cancel flag beside the queue's job. */
export const levellingRuns = pgTable(
  'levelling_runs',
  {
    id: id(),
    plantId: plantId(),
    planId: planId(),
    /** The plan's revision that it started from. */
    revision: integer('revision').notNull(),
    state: text('state').$type<LevellingState>().notNull(),
    options: jsonb('options').$type<Record<string, unknown>>().notNull(),
    progress: jsonb('progress').$type<LevellingProgressDto[]>().notNull().default([]),
    proposal: jsonb('proposal').$type<unknown>(),
    failure: text('failure'),
    cancelAsked: boolean('cancel_asked').notNull().default(false),
    heartbeatAt: instant('heartbeat_at'),
    authorId: text('author_id').notNull(),
    createdAt: createdAt(),
    endedAt: instant('ended_at'),
  },
  (t) => [index('levelling_runs_plan').on(t.planId)],
);

import { index, pgTable, text } from 'drizzle-orm/pg-core';
import type { FloorEventKind } from '../../core/shift/floorEvent';
import { createdAt, id, instant } from './columns';
import { plantId } from './plant';
import { activities, issues, plans } from './plan';

/** Recorded by a supervisor; never changed: a mistake is taken back by a row that names it. */
export const floorEvents = pgTable(
  'floor_events',
  {
    id: id(),
    plantId: plantId(),
    planId: text('plan_id')
      .notNull()
      .references(() => plans.id, { onDelete: 'cascade' }),
    issueId: text('issue_id')
      .notNull()
      .references(() => issues.id),
    activityId: text('activity_id')
      .notNull()
      .references(() => activities.id),
    event: text('event').$type<FloorEventKind>().notNull(),
    happenedAt: instant('happened_at').notNull(),
    authorId: text('author_id').notNull(),
    takenBackById: text('taken_back_by_id'),
    createdAt: createdAt(),
  },
  (t) => [index('floor_events_activity').on(t.activityId), index('floor_events_plan').on(t.planId)],
);

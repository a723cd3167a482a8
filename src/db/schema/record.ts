import { index, jsonb, pgTable, text } from 'drizzle-orm/pg-core';
import { createdAt, id } from './columns';
import { plantId } from './plant';

/** Who changed what, when; only ever appended. */
export const record = pgTable(
  'record',
  {
    id: id(),
    plantId: plantId(),
    authorId: text('author_id').notNull(),
    action: text('action').notNull(),
    subject: text('subject').notNull(),
    details: jsonb('details').$type<Record<string, unknown>>().notNull(),
    createdAt: createdAt(),
  },
  (t) => [index('record_plant_time').on(t.plantId, t.createdAt)],
);

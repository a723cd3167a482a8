import { doublePrecision, index, integer, pgTable, text } from 'drizzle-orm/pg-core';
import { createdAt, id, instant } from './columns';
import { products } from './library';
import { plantId } from './plant';

export const orders = pgTable(
  'orders',
  {
    id: id(),
    plantId: plantId(),
    number: text('number').notNull(),
    productId: text('product_id')
      .notNull()
      .references(() => products.id),
    quantityKg: doublePrecision('quantity_kg').notNull(),
    /** As it was typed: shown and edited in it. */
    quantityUnit: text('quantity_unit').$type<'cases' | 'kg'>().notNull().default('cases'),
    earliestAt: instant('earliest_at'),
    latestStartAt: instant('latest_start_at'),
    dueAt: instant('due_at').notNull(),
    priority: integer('priority').notNull().default(1),
    createdAt: createdAt(),
    /** Counts every change; a save names the one that it read. */
    revision: integer('revision').notNull().default(0),
  },
  (t) => [index('orders_due').on(t.plantId, t.dueAt)],
);

import { text, timestamp } from 'drizzle-orm/pg-core';

/** A moment, stored with its zone. */
export const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' });

/** When the row was written. */
export const createdAt = () => instant('created_at').notNull().defaultNow();

/** Text ids: random for people's data, telling for the demo's. */
export const id = () => text('id').primaryKey();

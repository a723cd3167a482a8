import { index, integer, pgTable, text } from 'drizzle-orm/pg-core';
import { createdAt, id, instant } from './columns';
import { plants } from './plant';

export type MailState = 'queued' | 'sending' | 'sent' | 'failed';

/**
 * Messages to people: this table is the queue. A message is written in the transaction of what it tells of, and taken by
 * a worker that locks its row. The worker's times are those of the database's own clock.
 */
export const mails = pgTable(
  'mails',
  {
    id: id(),
    /** null: of no plant, such as a forgotten password. */
    plantId: text('plant_id').references(() => plants.id, { onDelete: 'cascade' }),
    to: text('to_address').notNull(),
    subject: text('subject').notNull(),
    /** Both bodies; null once there is nothing left to send: links in them open accounts. */
    text: text('body_text'),
    html: text('body_html'),
    /** The same for every try, so that a message that arrives twice is known for one. */
    messageId: text('message_id').notNull().unique(),
    state: text('state').$type<MailState>().notNull().default('queued'),
    tries: integer('tries').notNull().default(0),
    nextTryAt: instant('next_try_at').notNull().defaultNow(),
    /** While a worker sends it: when another may take the worker for lost. */
    leaseEndsAt: instant('lease_ends_at'),
    /** Of no more use after this: then it fails instead of being tried again. */
    giveUpAt: instant('give_up_at').notNull(),
    lastError: text('last_error'),
    createdAt: createdAt(),
    sentAt: instant('sent_at'),
  },
  (t) => [index('mails_due').on(t.state, t.nextTryAt), index('mails_plant').on(t.plantId)],
);

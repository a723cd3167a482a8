import { and, eq, inArray, lte, sql } from 'drizzle-orm';
import { db, type Db } from '@/db/client';
import { mails } from '@/db/schema/index';
import { now } from '../clock';
import { newId } from '../id';
import type { Letter } from './letter';
import { appAddress } from './mailServer';

/** Beyond the longest that one try may take, so that no two workers send one message at once. */
export const LEASE_SECONDS = 180;

export interface MailToQueue {
  readonly plantId: string | null;
  readonly to: string;
  readonly letter: Letter;
  /** The message is of no more use after so long. [min] */
  readonly goodForMinutes: number;
}

export type MailRow = typeof mails.$inferSelect;

const inFuture = (seconds: number) => sql`now() + ${seconds} * interval '1 second'`;
const EMPTIED = { text: null, html: null, leaseEndsAt: null };

function messageIdOf(id: string): string {
  const host = new URL(appAddress()).hostname;
  return `<${id}@${host}>`;
}

/** Puts a message into the queue within the transaction of what it tells of: both are there or neither. Gives its id. */
export async function queueMail(tx: Db, { plantId, to, letter, goodForMinutes }: MailToQueue): Promise<string> {
  const id = newId();
  const row = { id, plantId, to, ...letter, messageId: messageIdOf(id), createdAt: now() };
  await tx.insert(mails).values({ ...row, giveUpAt: inFuture(goodForMinutes * 60) });
  return id;
}

/** Gives up on messages that are of no more use. */
async function giveUp(): Promise<void> {
  const late = and(inArray(mails.state, ['queued', 'sending']), lte(mails.giveUpAt, sql`now()`));
  const abandoned = sql`coalesce(${mails.leaseEndsAt}, now()) <= now()`;
  await db
    .update(mails)
    .set({ ...EMPTIED, state: 'failed', lastError: sql`coalesce(${mails.lastError}, 'Not sent in time.')` })
    .where(and(late, abandoned));
}

/**
 * Takes the message that is due, alone among all workers; null where none is. One whose worker has not been heard of
 * within its lease is due again.
 */
export async function claimMail(): Promise<MailRow | null> {
  await giveUp();
  const due = sql`(select id from ${mails}
    where (state = 'queued' and next_try_at <= now()) or (state = 'sending' and lease_ends_at <= now())
    order by next_try_at, id limit 1 for update skip locked)`;
  const [row] = await db
    .update(mails)
    .set({ state: 'sending', tries: sql`${mails.tries} + 1`, leaseEndsAt: inFuture(LEASE_SECONDS) })
    .where(eq(mails.id, due))
    .returning();
  return row ?? null;
}

/** Only the worker that holds the newest try may say how it went. */
const own = ({ id, tries }: MailRow) => and(eq(mails.id, id), eq(mails.state, 'sending'), eq(mails.tries, tries));

/** The server has taken the message. */
export async function markSent(row: MailRow): Promise<void> {
  await db
    .update(mails)
    .set({ ...EMPTIED, state: 'sent', sentAt: now(), lastError: null })
    .where(own(row));
}

/** The server will never take it. */
export async function markRefused(row: MailRow, error: string): Promise<void> {
  await db
    .update(mails)
    .set({ ...EMPTIED, state: 'failed', lastError: error })
    .where(own(row));
}

/** It goes back to the queue and is due again after a wait. */
export async function putBack(row: MailRow, error: string, waitSeconds: number): Promise<void> {
  await db
    .update(mails)
    .set({ state: 'queued', leaseEndsAt: null, lastError: error, nextTryAt: inFuture(waitSeconds) })
    .where(own(row));
}

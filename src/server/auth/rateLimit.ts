import { createHash } from 'node:crypto';
import { inArray, lt, sql } from 'drizzle-orm';
import { db } from '@/db/client';
import { rateLimits } from '@/db/schema/index';
import { now } from '../clock';

/** So many tries under one key within a window. */
export interface RateLimit {
  readonly key: string;
  readonly tries: number;
}

const WINDOW_MS = 15 * 60_000;

/** Addresses and accounts are counted under hashes: the table is no list of who tried to sign in. */
const hashed = (key: string): string => createHash('sha256').update(key).digest('hex');

/**
 * Counts a try under every key and says whether all are still within their limit. One statement a key, so that tries
 * at the same time through several processes are all counted.
 */
export async function countTry(limits: readonly RateLimit[]): Promise<boolean> {
  const at = now();
  const windowEndsAt = new Date(at.getTime() + WINDOW_MS);
  const over = sql`${rateLimits.windowEndsAt} <= ${at.toISOString()}::timestamptz`;
  let within = true;
  for (const limit of limits) {
    const [row] = await db
      .insert(rateLimits)
      .values({ key: hashed(limit.key), count: 1, windowEndsAt })
      .onConflictDoUpdate({
        target: rateLimits.key,
        set: {
          count: sql`case when ${over} then 1 else ${rateLimits.count} + 1 end`,
          windowEndsAt: sql`case when ${over} then excluded.window_ends_at else ${rateLimits.windowEndsAt} end`,
        },
      })
      .returning({ count: rateLimits.count });
    within &&= (row?.count ?? 1) <= limit.tries;
  }
  return within;
}

/** Takes a good try back: only failures add up. Windows that ended are cleared on the way. */
export async function forgiveTry(limits: readonly RateLimit[]): Promise<void> {
  const keys = limits.map((limit) => hashed(limit.key));
  await db
    .update(rateLimits)
    .set({ count: sql`greatest(0, ${rateLimits.count} - 1)` })
    .where(inArray(rateLimits.key, keys));
  await db.delete(rateLimits).where(lt(rateLimits.windowEndsAt, now()));
}

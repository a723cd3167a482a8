import { createHash } from 'node:crypto';
import { eq, sql } from 'drizzle-orm';
import { db } from '@/db/client';
import { rateLimits } from '@/db/schema/index';

/** Tries under a key: so many at once, then each after a wait that doubles. */
export interface Waits {
  readonly key: string;
  /** Failures that cost nothing. */
  readonly free: number;
  /** The wait after the first failure that costs one. [s] */
  readonly firstSeconds: number;
}

const LONGEST_SECONDS = 3_600;
/** Failures are forgotten so long after the last. */
const FORGET_SECONDS = 12 * 3_600;

const hashed = (key: string): string => createHash('sha256').update(`waits ${key}`).digest('hex');

/**
 * Takes a try under the key: 0 where it may be made now, else the seconds until one may. The try counts as a failure
 * until `forgive` takes it back, in one statement, so that tries at the same time are all counted. The database's own
 * clock decides.
 */
export async function takeTry({ key, free, firstSeconds }: Waits): Promise<number> {
  const id = hashed(key);
  const { count, windowEndsAt } = rateLimits;
  const isOver = sql`${windowEndsAt} <= now()`;
  const wait = sql`case when ${count} < ${free} then 0
    else least(${LONGEST_SECONDS}, ${firstSeconds} * power(2, least(${count} - ${free}, 20))) end`;
  const until = sql`${windowEndsAt} + (${wait} - ${FORGET_SECONDS}) * interval '1 second'`;
  const ends = sql`now() + ${FORGET_SECONDS} * interval '1 second'`;
  const [taken] = await db
    .insert(rateLimits)
    .values({ key: id, count: 1, windowEndsAt: ends })
    .onConflictDoUpdate({
      target: rateLimits.key,
      set: { count: sql`case when ${isOver} then 1 else ${count} + 1 end`, windowEndsAt: ends },
      setWhere: sql`${isOver} or ${until} <= now()`,
    })
    .returning({ count });
  if (taken) return 0;
  const [row] = await db
    .select({ seconds: sql<number>`ceil(extract(epoch from ${until} - now()))::int` })
    .from(rateLimits)
    .where(eq(rateLimits.key, id));
  return Math.max(1, row?.seconds ?? 1);
}

/** Forgets every failure under the key. */
export async function forgiveAll({ key }: Waits): Promise<void> {
  await db.delete(rateLimits).where(eq(rateLimits.key, hashed(key)));
}

/** Takes the last try back and leaves earlier failures counted. */
export async function forgiveOne({ key }: Waits): Promise<void> {
  await db
    .update(rateLimits)
    .set({ count: sql`greatest(0, ${rateLimits.count} - 1)` })
    .where(eq(rateLimits.key, hashed(key)));
}

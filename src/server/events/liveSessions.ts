import { and, eq, gt, inArray, isNull, sql } from 'drizzle-orm';
import { db } from '@/db/client';
import { memberships, people, sessions } from '@/db/schema/index';

interface Held {
  readonly sessionHash: string;
  readonly plantId: string;
}

/** Those whose session still runs, at the same plant, for a person who is active and still holds a role there. */
export async function liveSessions<T extends Held>(held: readonly T[]): Promise<ReadonlySet<T>> {
  const ids = [...new Set(held.map((one) => one.sessionHash))];
  const rows = await db
    .select({ id: sessions.id, plantId: sessions.plantId })
    .from(sessions)
    .innerJoin(people, and(eq(people.id, sessions.userId), eq(people.active, true)))
    .innerJoin(
      memberships,
      and(
        eq(memberships.personId, people.id),
        eq(memberships.plantId, sessions.plantId),
        isNull(memberships.inactiveAt),
      ),
    )
    // Sessions are made and expire by the machines' clocks, never by a clock that was set.
    .where(and(inArray(sessions.id, ids), gt(sessions.expiresAt, sql`now()`)));
  const plantOf = new Map(rows.map((row) => [row.id, row.plantId]));
  return new Set(held.filter((one) => plantOf.get(one.sessionHash) === one.plantId));
}

import { and, eq } from 'drizzle-orm';
import { beforeAll, expect, it } from 'vitest';
import { db } from '@/db/client';
import { memberships, people, sessions } from '@/db/schema/index';
import { hashSessionId } from '@/server/auth/hashedSessions';
import { liveSessions } from '@/server/events/liveSessions';
import { openWorld, sessionOf } from '../support/world';

beforeAll(openWorld);

it('keeps only streams whose session runs, at its plant, for somebody active with a role there', async () => {
  const held = async (personId: string, plantId: string) => ({
    personId,
    plantId,
    sessionHash: hashSessionId(await sessionOf(personId, plantId)),
  });
  const runs = await held('north-planner', 'north');
  const second = { ...runs };
  const signedOut = await held('north-planner', 'north');
  const expired = await held('north-planner', 'north');
  const moved = await held('both', 'north');
  const inactive = await held('north-administrator', 'north');
  const roleTaken = await held('north-qualityLead', 'north');
  await db.delete(sessions).where(eq(sessions.id, signedOut.sessionHash));
  await db
    .update(sessions)
    .set({ expiresAt: new Date(0) })
    .where(eq(sessions.id, expired.sessionHash));
  await db.update(sessions).set({ plantId: 'south' }).where(eq(sessions.id, moved.sessionHash));
  await db.update(people).set({ active: false }).where(eq(people.id, inactive.personId));
  await db
    .delete(memberships)
    .where(and(eq(memberships.personId, roleTaken.personId), eq(memberships.plantId, 'north')));
  const live = await liveSessions([runs, second, signedOut, expired, moved, inactive, roleTaken]);
  expect([...live]).toEqual([runs, second]);
});

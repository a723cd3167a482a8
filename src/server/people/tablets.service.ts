import { and, eq, isNull } from 'drizzle-orm';
import type { EnrolRequest, PeopleDto } from '@/contracts/people';
import { fail, ok, type Result } from '@/core/result';
import { db } from '@/db/client';
import { plants, sessions, tablets } from '@/db/schema/index';
import type { Authorized } from '../auth/permissions';
import { endSession } from '../auth/session';
import { tabletByToken } from '../auth/tabletSession';
import { hashToken, newToken } from '../auth/token';
import { now } from '../clock';
import { notify, notifySessionEnd } from '../events/notify';
import { notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { record } from '../record/record';
import { linesFault, listPeople } from './people.service';
import { linesOf } from './plantPeople.repo';
import { currentWeek } from '../weeks/currentWeek';

type Manager = Authorized<'people.manage'>;

/** The tablet that a device's cookie names, for its keypad; null where it is none or no longer. */
export async function tabletAsked(token: string | null) {
  const tablet = await tabletByToken(token);
  if (!tablet) return null;
  const [plant] = await db.select({ name: plants.name }).from(plants).where(eq(plants.id, tablet.plantId));
  return { name: tablet.name, plantName: plant?.name ?? '' };
}

/** The lines that a tablet can hang at. */
export const tabletLines = (actor: Authorized<'tablets.manage'>) => linesOf(db, actor.plantId);

/**
 * Makes the device that asks one of the plant's tablets: gives the token for its cookie. The administrator's own
 * session on it ends, so that the floor never finds it open.
 */
export async function enrolTablet(
  actor: Authorized<'tablets.manage'>,
  { name, lineId }: EnrolRequest,
  { sessionId, oldToken }: { readonly sessionId: string | null; readonly oldToken: string | null },
): Promise<Result<{ readonly token: string }, HttpProblem>> {
  const { token, tokenHash } = newToken();
  const enrolled = await db.transaction(async (tx): Promise<Result<undefined, HttpProblem>> => {
    const fault = await linesFault(tx, actor.plantId, lineId === null ? null : [lineId]);
    if (fault) return fail({ ...fault, fields: [{ path: 'lineId', message: fault.message }] });
    const owner = { plantId: actor.plantId, enrolledBy: actor.personId, createdAt: now() };
    const row = { id: newId(), name, lineId, tokenHash, ...owner };
    await tx.insert(tablets).values(row);
    // What the device was before is nothing that anybody holds any more.
    if (oldToken) {
      await tx
        .update(tablets)
        .set({ revokedAt: now() })
        .where(and(eq(tablets.tokenHash, hashToken(oldToken)), isNull(tablets.revokedAt)));
    }
    await record(tx, actor, 'tablet.enrol', row.id, { name, lineId });
    await notify(tx, actor.plantId, { kind: 'people' });
    return ok(undefined);
  });
  if (!enrolled.ok) return enrolled;
  if (sessionId) await endSession(sessionId);
  return ok({ token });
}

/** Lets a tablet sign nobody in any more; whoever is signed in at it is signed out. */
export function revokeTablet(actor: Manager, id: string): Promise<Result<PeopleDto, HttpProblem>> {
  return db.transaction(async (tx) => {
    const [row] = await tx
      .update(tablets)
      .set({ revokedAt: now() })
      .where(and(eq(tablets.id, id), eq(tablets.plantId, actor.plantId), isNull(tablets.revokedAt)))
      .returning({ name: tablets.name });
    if (!row) return fail(notFound(`There is no such tablet at ${actor.plantName}.`));
    const ended = await tx.delete(sessions).where(eq(sessions.tabletId, id)).returning({ id: sessions.id });
    for (const session of ended) await notifySessionEnd(tx, session.id);
    await record(tx, actor, 'tablet.revoke', id, { name: row.name, sessionsEnded: ended.length });
    await notify(tx, actor.plantId, { kind: 'people' });
    return listPeople(actor, tx);
  });
}

/** The page that a tablet opens on: this week's shift sheet of its line. */
export async function sheetOfTablet({ plantId, lineId }: { plantId: string; lineId: string | null }): Promise<string> {
  const week = await currentWeek({ plantId });
  return lineId === null ? `/shift/${week}` : `/shift/${week}?line=${encodeURIComponent(lineId)}`;
}

import { and, eq, isNull } from 'drizzle-orm';
import type { Session } from 'lucia';
import type { BadgeSignInRequest } from '@/contracts/people';
import { fail, ok, type Result } from '@/core/result';
import { db } from '@/db/client';
import { badges, memberships, people, tablets } from '@/db/schema/index';
import { now } from '../clock';
import type { HttpProblem } from '../http/problem';
import { touchPerson } from '../people/people.repo';
import { longestShiftMinutes } from '../people/tablets.repo';
import { forgiveAll, forgiveOne, takeTry, type Waits } from './growingWaits';
import { lucia } from './lucia';
import { verifyPassword } from './password';
import { FLOOR_ROLES } from './permissions';
import { endSession } from './session';
import { tabletByToken } from './tabletSession';

export interface BadgeAttempt extends BadgeSignInRequest {
  /** As in the tablet's cookie. */
  readonly tabletToken: string | null;
  readonly oldSessionId: string | null;
}

const notEnrolled: HttpProblem = {
  status: 403,
  code: 'TABLET-UNKNOWN',
  message: 'This device signs nobody in by badge. An administrator can enrol it.',
};
const wrong: HttpProblem = {
  status: 401,
  code: 'BADGE-WRONG',
  message: 'Badge number and PIN do not belong together. Try again.',
};

function waitFirst(seconds: number): HttpProblem {
  const said = seconds < 90 ? `${seconds} seconds` : `${Math.ceil(seconds / 60)} minutes`;
  const message = `Too many wrong tries. Wait ${said}, then try again.`;
  return { status: 429, code: 'BADGE-WAIT', message, extra: { waitSeconds: seconds } };
}

const badgeWaits = (plantId: string, number: string): Waits => ({
  key: `badge ${plantId} ${number}`,
  free: 3,
  firstSeconds: 15,
});
/** A tablet serves a whole shift: more slips are forgiven before it has to wait. */
const tabletWaits = (tabletId: string): Waits => ({ key: `tablet ${tabletId}`, free: 12, firstSeconds: 15 });

/** The holder of a badge number at the plant, if the holder may work on the floor. */
async function holderOf(plantId: string, number: string) {
  const rows = await db
    .select({ personId: badges.personId, pinHash: badges.pinHash, role: memberships.role })
    .from(badges)
    .innerJoin(people, and(eq(people.id, badges.personId), eq(people.active, true)))
    .innerJoin(memberships, and(eq(memberships.personId, people.id), eq(memberships.plantId, plantId)))
    .where(and(eq(badges.plantId, plantId), eq(badges.number, number), isNull(memberships.inactiveAt)));
  return rows.find(({ role }) => FLOOR_ROLES.includes(role)) ?? null;
}

async function openTabletSession(personId: string, tablet: { id: string; plantId: string }): Promise<Session> {
  const at = now();
  const endsAt = new Date(at.getTime() + (await longestShiftMinutes(db, tablet.plantId)) * 60_000);
  const session = await lucia.createSession(personId, {
    plantId: tablet.plantId,
    tabletId: tablet.id,
    touchedAt: at,
    endsAt,
  });
  await touchPerson(personId, now());
  await db.update(tablets).set({ lastSeenAt: now() }).where(eq(tablets.id, tablet.id));
  return session;
}

/** Opens a session on an enrolled tablet. Unknown badge, wrong PIN and no role on the floor are one answer. */
export async function signInByBadge(
  attempt: BadgeAttempt,
): Promise<
  Result<{ readonly session: Session; readonly plantId: string; readonly lineId: string | null }, HttpProblem>
> {
  const tablet = await tabletByToken(attempt.tabletToken);
  if (!tablet) return fail(notEnrolled);
  const ofTablet = tabletWaits(tablet.id);
  const ofBadge = badgeWaits(tablet.plantId, attempt.number);
  const tabletSeconds = await takeTry(ofTablet);
  if (tabletSeconds > 0) return fail(waitFirst(tabletSeconds));
  const badgeSeconds = await takeTry(ofBadge);
  if (badgeSeconds > 0) {
    // Nothing was guessed: one who must wait keeps nobody else waiting.
    await forgiveOne(ofTablet);
    return fail(waitFirst(badgeSeconds));
  }
  const holder = await holderOf(tablet.plantId, attempt.number);
  const matches = await verifyPassword(holder?.pinHash, attempt.pin);
  if (!holder || !matches) return fail(wrong);
  // The badge's own failures are over; the tablet's stay, or one good badge would clear the way for guessing others.
  await forgiveAll(ofBadge);
  await forgiveOne(ofTablet);
  if (attempt.oldSessionId) await endSession(attempt.oldSessionId);
  return ok({
    session: await openTabletSession(holder.personId, tablet),
    plantId: tablet.plantId,
    lineId: tablet.lineId,
  });
}

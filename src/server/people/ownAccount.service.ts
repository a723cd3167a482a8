import { and, eq, sql } from 'drizzle-orm';
import type { ChangePasswordRequest } from '@/contracts/people';
import { fail, ok, type Result } from '@/core/result';
import { db } from '@/db/client';
import { badges, people } from '@/db/schema/index';
import { hashSessionId } from '../auth/hashedSessions';
import { hashPassword, verifyPassword } from '../auth/password';
import { passwordFault } from '../auth/passwordStrength';
import type { Authorized } from '../auth/permissions';
import { pinFault } from '../auth/pinStrength';
import { countTry, forgiveTry } from '../auth/rateLimit';
import { endSessionsOf } from '../auth/session';
import { tooMany } from '../auth/signIn';
import { now } from '../clock';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { record } from '../record/record';
import { storePassword } from './reset.service';

type Own = Authorized<'account.own'>;
type Done = Promise<Result<undefined, HttpProblem>>;

export interface OwnAccount {
  readonly email: string;
  /** The number of the badge at this plant; null without one. */
  readonly badge: string | null;
  readonly notices: { readonly issue: boolean };
}

/** What a person may change of the own account. */
export async function readOwnAccount(actor: Own): Promise<Result<OwnAccount, HttpProblem>> {
  const [row] = await db
    .select({ email: people.email, settings: people.settings, badge: badges.number })
    .from(people)
    .leftJoin(badges, and(eq(badges.personId, people.id), eq(badges.plantId, actor.plantId)))
    .where(eq(people.id, actor.personId));
  if (!row) return fail(notFound());
  return ok({ email: row.email, badge: row.badge, notices: { issue: row.settings.notices?.issue ?? true } });
}

/** The password again, before something is changed that an unattended screen should not allow. */
async function confirmed(actor: Own, password: string): Promise<Result<{ email: string; name: string }, HttpProblem>> {
  const limits = [{ key: `confirm ${actor.personId}`, tries: 8 }];
  if (!(await countTry(limits))) return fail(tooMany);
  const [person] = await db
    .select({ email: people.email, name: people.name, passwordHash: people.passwordHash })
    .from(people)
    .where(eq(people.id, actor.personId));
  const matches = await verifyPassword(person?.passwordHash, password);
  if (!person || !matches) return fail(badInput('PASSWORD-WRONG', 'That is not your password.', 'password'));
  await forgiveTry(limits);
  return ok(person);
}

/** Sets another password; this session stays, all others end. */
export async function changePassword(actor: Own, sessionId: string, request: ChangePasswordRequest): Done {
  const person = await confirmed(actor, request.password);
  if (!person.ok) return person;
  const fault =
    request.newPassword === request.password
      ? 'That is the password that you have now.'
      : passwordFault(request.newPassword, person.value);
  if (fault) return fail(badInput('PASSWORD-WEAK', fault, 'newPassword'));
  await db.transaction(async (tx) => {
    const owner = { ...person.value, personId: actor.personId };
    await storePassword(tx, owner, request.newPassword, hashSessionId(sessionId));
    await record(tx, actor, 'account.password', actor.personId, {});
  });
  return ok(undefined);
}

/** Ends every session of one's own, this one too. */
export async function signOutEverywhere(actor: Own): Done {
  await db.transaction(async (tx) => {
    const sessionsEnded = await endSessionsOf(tx, actor.personId);
    await record(tx, actor, 'account.signOut', actor.personId, { sessionsEnded });
  });
  return ok(undefined);
}

/** Another PIN for one's own badge at this plant. */
export async function changeOwnPin(actor: Own, { pin, password }: { pin: string; password: string }): Done {
  const person = await confirmed(actor, password);
  if (!person.ok) return person;
  const own = and(eq(badges.personId, actor.personId), eq(badges.plantId, actor.plantId));
  const [badge] = await db.select({ number: badges.number }).from(badges).where(own);
  if (!badge) return fail(conflict('NO-BADGE', 'You have no badge here. Your administrator can give you one.'));
  const fault = pinFault(pin, badge.number);
  if (fault) return fail(badInput('PIN-WEAK', fault, 'pin'));
  const pinHash = await hashPassword(pin);
  await db.transaction(async (tx) => {
    await tx.update(badges).set({ pinHash, changedAt: now() }).where(own);
    await record(tx, actor, 'account.pin', actor.personId, {});
  });
  return ok(undefined);
}

/** What one wants to be told of by e-mail. Other settings stay as they are. */
export async function setNotices(actor: Own, notices: { readonly issue: boolean }): Done {
  const patch = JSON.stringify({ notices });
  await db
    .update(people)
    .set({ settings: sql`${people.settings} || ${patch}::jsonb` })
    .where(eq(people.id, actor.personId));
  return ok(undefined);
}

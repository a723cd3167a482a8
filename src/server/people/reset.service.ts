import { setTimeout as sleep } from 'node:timers/promises';
import { and, eq, gt, isNull, sql } from 'drizzle-orm';
import type { Session } from 'lucia';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { passwordResets, people } from '@/db/schema/index';
import { hashPassword } from '../auth/password';
import { passwordFault } from '../auth/passwordStrength';
import { countTry } from '../auth/rateLimit';
import { endSessionsOf, openSession } from '../auth/session';
import { hashToken, newToken } from '../auth/token';
import { now } from '../clock';
import { badInput, notFound, type HttpProblem } from '../http/problem';
import { passwordChangedLetter, resetLetter } from '../mail/letters';
import { queueMail } from '../mail/mails.repo';
import { record } from '../record/record';
import type { Caller } from './accept.service';
import { accountByEmail, plantsOf } from './people.repo';

const GOOD_FOR_MINUTES = 60;
const TAKES_AT_LEAST_MS = 250;

const tooMany: HttpProblem = {
  status: 429,
  code: 'RESET-TOO-MANY',
  message: 'Too many tries. Wait a quarter of an hour, then try again.',
};
const gone = notFound('This link has expired or has been used. Ask for a new one.');

async function sendReset(email: string): Promise<void> {
  const person = await accountByEmail(email);
  if (!person?.active || !person.passwordHash || (await plantsOf(person.id)).length === 0) return;
  const { token, tokenHash } = newToken();
  const expiresAt = new Date(now().getTime() + GOOD_FOR_MINUTES * 60_000);
  await db.transaction(async (tx) => {
    await tx.insert(passwordResets).values({ tokenHash, personId: person.id, expiresAt, createdAt: now() });
    const letter = resetLetter(person.name, token);
    await queueMail(tx, { plantId: null, to: person.email, letter, goodForMinutes: GOOD_FOR_MINUTES });
  });
}

/**
 * Sends a link to set a new password, if the address has an account. Whether it has shows neither in the answer nor in
 * the time that it takes, nor in when asking again is refused.
 */
export async function askReset(email: string, address: string): Promise<Result<undefined, HttpProblem>> {
  if (!(await countTry([{ key: `reset from ${address}`, tries: 20 }]))) return fail(tooMany);
  const mayWrite = await countTry([{ key: `reset of ${email.trim().toLowerCase()}`, tries: 3 }]);
  const enough = sleep(TAKES_AT_LEAST_MS);
  if (mayWrite) await sendReset(email);
  await enough;
  return ok(undefined);
}

async function openReset(tx: Db, token: string) {
  const usable = and(
    eq(passwordResets.tokenHash, hashToken(token)),
    isNull(passwordResets.usedAt),
    gt(passwordResets.expiresAt, now()),
  );
  const [found] = await tx
    .select({ personId: people.id, name: people.name, email: people.email })
    .from(passwordResets)
    .innerJoin(people, and(eq(people.id, passwordResets.personId), eq(people.active, true)))
    .where(usable)
    .for('update');
  return found ?? null;
}

/** Whose password a link sets. */
export async function readReset(token: string): Promise<Result<{ readonly email: string }, HttpProblem>> {
  const found = await openReset(db, token);
  return found ? ok({ email: found.email }) : fail(gone);
}

/** Stores a new password: every other link and session of the person ends, and the owner is told by e-mail. */
export async function storePassword(
  tx: Db,
  person: { readonly personId: string; readonly name: string; readonly email: string },
  password: string,
  exceptHash?: string,
): Promise<void> {
  const { personId, name, email: to } = person;
  await tx
    .update(people)
    .set({ passwordHash: await hashPassword(password) })
    .where(eq(people.id, personId));
  await tx
    .update(passwordResets)
    .set({ usedAt: now() })
    .where(and(eq(passwordResets.personId, personId), isNull(passwordResets.usedAt)));
  await endSessionsOf(tx, personId, exceptHash);
  await queueMail(tx, { plantId: null, to, letter: passwordChangedLetter(name), goodForMinutes: 24 * 60 });
}

/** Sets a new password by a link, and signs in; the person's other sessions end. */
export async function setPasswordByLink(
  { token, password }: { readonly token: string; readonly password: string },
  { address, oldSessionId }: Caller,
): Promise<Result<{ readonly session: Session }, HttpProblem>> {
  if (!(await countTry([{ key: `reset used from ${address}`, tries: 30 }]))) return fail(tooMany);
  const changed = await db.transaction(async (tx) => {
    const person = await openReset(tx, token);
    const [plant] = person ? await plantsOf(person.personId, tx) : [];
    if (!person || !plant) return fail(gone);
    const fault = passwordFault(password, person);
    if (fault) return fail(badInput('PASSWORD-WEAK', fault, 'password'));
    await storePassword(tx, person, password);
    const actor = { ...plant, personId: person.personId, name: person.name };
    await record(tx, actor, 'account.reset', person.personId, {});
    return ok({ personId: person.personId, plantId: plant.plantId });
  });
  if (!changed.ok) return changed;
  await db.delete(passwordResets).where(sql`${passwordResets.expiresAt} < now() - interval '30 days'`);
  return ok({ session: await openSession(changed.value.personId, changed.value.plantId, oldSessionId) });
}

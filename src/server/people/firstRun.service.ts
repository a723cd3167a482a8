import { randomInt } from 'node:crypto';
import { eq, sql } from 'drizzle-orm';
import type { Session } from 'lucia';
import type { FirstRunRequest } from '@/contracts/people';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { firstRunCodes, memberships, people, plants } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import { hashPassword } from '../auth/password';
import { passwordFault } from '../auth/passwordStrength';
import { countTry } from '../auth/rateLimit';
import { openSession } from '../auth/session';
import { hashToken } from '../auth/token';
import { now } from '../clock';
import { badInput, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { record } from '../record/record';
import type { Caller } from './accept.service';

/** Without letters and digits that are taken for one another. */
const SIGNS = 'ABCDEFGHJKMNPQRSTUVWXYZ23456789';
const GROUPS = 4;
const GROUP_LENGTH = 4;

const over = notFound('This installation has people already. Sign in, or ask an administrator to invite you.');
const tooMany: HttpProblem = {
  status: 429,
  code: 'FIRST-RUN-TOO-MANY',
  message: 'Too many tries. Wait a quarter of an hour, then try again.',
};
const wrongCode = badInput('CODE-WRONG', 'That is not the code that the start command printed last.', 'code');

/** Upper case, however it was typed. */
const canonical = (code: string): string => code.toUpperCase().replace(/[^A-Z0-9]/g, '');

/** True until somebody has an account. */
export async function isFirstRun(tx: Db = db): Promise<boolean> {
  return (await tx.select({ id: people.id }).from(people).limit(1)).length === 0;
}

/** A new code for the first administrator, in the place of older ones; null where there are people already. */
export async function newFirstRunCode(tx: Db = db): Promise<string | null> {
  if (!(await isFirstRun(tx))) return null;
  const group = () => Array.from({ length: GROUP_LENGTH }, () => SIGNS[randomInt(SIGNS.length)]).join('');
  const code = Array.from({ length: GROUPS }, group).join('-');
  await tx.delete(firstRunCodes);
  await tx.insert(firstRunCodes).values({ codeHash: hashToken(canonical(code)), createdAt: now() });
  return code;
}

/** True where the zone is one that this machine's calendar knows, by its place: Europe/Dublin. */
function isTimeZone(name: string): boolean {
  if (name !== 'UTC' && !name.includes('/')) return false;
  try {
    return new Intl.DateTimeFormat('en-GB', { timeZone: name }).resolvedOptions().timeZone !== '';
  } catch {
    return false;
  }
}

async function makePlantAndAdministrator(tx: Db, request: FirstRunRequest): Promise<Actor> {
  const { plantName, timeZone, name } = request;
  const [plantId, personId] = [newId(), newId()];
  const passwordHash = await hashPassword(request.password);
  await tx.insert(plants).values({ id: plantId, name: plantName, timeZone, createdAt: now() });
  await tx
    .insert(people)
    .values({ id: personId, email: request.email.toLowerCase(), name, passwordHash, createdAt: now() });
  await tx.insert(memberships).values({ personId, plantId, role: 'administrator' });
  return { personId, name, plantId, plantName, isDemo: false, roles: ['administrator'] };
}

/** Makes the first plant and its administrator, and signs in. The code works once, and only while nobody is there. */
export async function firstRun(
  request: FirstRunRequest,
  { address, oldSessionId }: Caller,
): Promise<Result<{ readonly session: Session }, HttpProblem>> {
  const limits = [
    { key: `first run from ${address}`, tries: 10 },
    { key: 'first run', tries: 100 },
  ];
  if (!(await countTry(limits))) return fail(tooMany);
  const made = await db.transaction(async (tx): Promise<Result<Actor, HttpProblem>> => {
    await tx.execute(sql`lock table ${firstRunCodes} in exclusive mode`);
    if (!(await isFirstRun(tx))) return fail(over);
    const codeHash = hashToken(canonical(request.code));
    const found = await tx.select().from(firstRunCodes).where(eq(firstRunCodes.codeHash, codeHash));
    if (found.length === 0) return fail(wrongCode);
    if (!isTimeZone(request.timeZone)) {
      return fail(badInput('ZONE-UNKNOWN', 'Choose a zone of the list, such as Europe/Dublin.', 'timeZone'));
    }
    const fault = passwordFault(request.password, request);
    if (fault) return fail(badInput('PASSWORD-WEAK', fault, 'password'));
    await tx.delete(firstRunCodes);
    const actor = await makePlantAndAdministrator(tx, request);
    await record(tx, actor, 'plant.first', actor.plantId, { plantName: request.plantName, timeZone: request.timeZone });
    return ok(actor);
  });
  if (!made.ok) return made;
  return ok({ session: await openSession(made.value.personId, made.value.plantId, oldSessionId) });
}

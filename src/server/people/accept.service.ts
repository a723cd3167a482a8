import { eq } from 'drizzle-orm';
import type { Session } from 'lucia';
import type { AcceptRequest } from '@/contracts/people';
import { newPasswordSchema } from '@/contracts/people';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { invitations, people } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import { hashPassword, verifyPassword } from '../auth/password';
import { passwordFault } from '../auth/passwordStrength';
import { countTry, forgiveTry } from '../auth/rateLimit';
import { openSession } from '../auth/session';
import { limitsOf, tooMany } from '../auth/signIn';
import { hashToken } from '../auth/token';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { record } from '../record/record';
import { invitationByToken } from './invitations.repo';
import { rolesSaid } from './invitations.service';
import { accountByEmail } from './people.repo';
import { lockPeople, peopleAt, setRoles } from './plantPeople.repo';

export interface Caller {
  readonly address: string;
  readonly oldSessionId: string | null;
}

export interface InvitationShown {
  readonly plantName: string;
  readonly isDemo: boolean;
  readonly email: string;
  readonly invitedBy: string;
  readonly roles: string;
  /** The address has an account with a password: at another plant. */
  readonly isKnown: boolean;
}

const gone = notFound(
  'This invitation has expired, was withdrawn, or has been used. Ask who invited you for a new one.',
);
const closed: HttpProblem = {
  status: 403,
  code: 'ACCOUNT-CLOSED',
  message: 'The account of this address is closed. Ask who invited you.',
};

/** What an invitation's link opens. */
export async function readInvitation(token: string): Promise<Result<InvitationShown, HttpProblem>> {
  const found = await invitationByToken(db, hashToken(token));
  if (!found) return fail(gone);
  const { row, plantName, isDemo, by } = found;
  const account = await accountByEmail(row.email);
  const invitedBy = by ?? 'Somebody of the plant';
  const isKnown = Boolean(account?.passwordHash);
  return ok({ plantName, isDemo, email: row.email, invitedBy, roles: rolesSaid(row.roles), isKnown });
}

/** The id of the account that accepts: known by its password, or made anew. */
async function accountOf(
  tx: Db,
  email: string,
  { name, password }: AcceptRequest,
): Promise<Result<{ readonly personId: string; readonly name: string }, HttpProblem>> {
  const known = await accountByEmail(email, tx);
  if (known && !known.active) return fail(closed);
  if (known?.passwordHash) {
    const matches = await verifyPassword(known.passwordHash, password);
    if (!matches) return fail(badInput('PASSWORD-WRONG', 'That is not the password of this account.', 'password'));
    return ok({ personId: known.id, name: known.name });
  }
  if (name === undefined) return fail(badInput('INPUT', 'Enter first and last name.', 'name'));
  const isLong = newPasswordSchema.safeParse(password).success;
  const fault = passwordFault(password, { email, name });
  if (!isLong || fault) return fail(badInput('PASSWORD-WEAK', fault ?? 'That is too long.', 'password'));
  const account = { name, passwordHash: await hashPassword(password) };
  if (known) await tx.update(people).set(account).where(eq(people.id, known.id));
  const personId = known?.id ?? newId();
  if (!known) await tx.insert(people).values({ id: personId, email, ...account, createdAt: now() });
  return ok({ personId, name });
}

/** Joins the plant and signs in. The link works once. */
export async function acceptInvitation(
  request: AcceptRequest,
  { address, oldSessionId }: Caller,
): Promise<Result<{ readonly session: Session }, HttpProblem>> {
  const tokenHash = hashToken(request.token);
  const limits = limitsOf(`invitation ${tokenHash}`, address);
  if (!(await countTry(limits))) return fail(tooMany);
  const joined = await db.transaction(async (tx): Promise<Result<Actor, HttpProblem>> => {
    const seen = await invitationByToken(tx, tokenHash);
    if (!seen) return fail(gone);
    // One after the other from here: the same link twice at once finds itself used.
    await lockPeople(tx, seen.row.plantId);
    const found = await invitationByToken(tx, tokenHash);
    if (!found) return fail(gone);
    const { row, plantName, isDemo } = found;
    const account = await accountOf(tx, row.email, request);
    if (!account.ok) return account;
    const { personId, name } = account.value;
    const isHere = (await peopleAt(tx, row.plantId, personId)).length > 0;
    if (!isHere) await setRoles(tx, row.plantId, personId, row.roles, row.lineIds);
    await tx.update(invitations).set({ acceptedAt: now(), acceptedBy: personId }).where(eq(invitations.id, row.id));
    const actor: Actor = { personId, name, plantId: row.plantId, plantName, isDemo, roles: row.roles };
    await record(tx, actor, 'people.join', personId, { email: row.email, roles: row.roles });
    await notify(tx, row.plantId, { kind: 'people' });
    return ok(actor);
  });
  if (!joined.ok) return joined;
  await forgiveTry(limits);
  return ok({ session: await openSession(joined.value.personId, joined.value.plantId, oldSessionId) });
}

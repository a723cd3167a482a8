import { and, eq, sql } from 'drizzle-orm';
import type { InviteRequest, PeopleDto } from '@/contracts/people';
import { fail, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { invitations, memberships, people } from '@/db/schema/index';
import { ROLE_NAMES, type Authorized } from '../auth/permissions';
import { countTry } from '../auth/rateLimit';
import { newToken } from '../auth/token';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { invitationLetter } from '../mail/letters';
import { queueMail } from '../mail/mails.repo';
import { record } from '../record/record';
import { isInvited, openInvitation } from './invitations.repo';
import { linesFault, listPeople } from './people.service';
import { lockPeople } from './plantPeople.repo';

type Manager = Authorized<'people.manage'>;
type Done = Promise<Result<PeopleDto, HttpProblem>>;

const GOOD_FOR_MINUTES = 7 * 24 * 60;
const MESSAGES_IN_A_QUARTER = 60;

const tooMany: HttpProblem = {
  status: 429,
  code: 'INVITATIONS-TOO-MANY',
  message: 'That is many invitations at once. Wait a quarter of an hour, then go on.',
};

const gone = notFound('This invitation is no longer open: it was accepted or withdrawn.');

/** 'planner and quality lead' */
export function rolesSaid(roles: readonly (keyof typeof ROLE_NAMES)[]): string {
  const names = roles.map((role) => ROLE_NAMES[role]);
  const last = names.pop() ?? '';
  return names.length === 0 ? last : `${names.join(', ')} and ${last}`;
}

/** A new link by e-mail; an older one works no more. */
async function sendLink(tx: Db, actor: Manager, to: string, roles: InviteRequest['roles']) {
  const { token, tokenHash } = newToken();
  const { plantId, plantName, name: invitedBy } = actor;
  const letter = invitationLetter({ plantName, invitedBy, roles: rolesSaid(roles), token });
  const mailId = await queueMail(tx, { plantId, to, letter, goodForMinutes: GOOD_FOR_MINUTES });
  return { tokenHash, mailId, expiresAt: new Date(now().getTime() + GOOD_FOR_MINUTES * 60_000) };
}

/** Why the address can't be invited; null where it can. */
async function invitationFault(tx: Db, plantId: string, email: string): Promise<HttpProblem | null> {
  const [member] = await tx
    .select({ name: people.name, inactiveAt: memberships.inactiveAt })
    .from(people)
    .innerJoin(memberships, and(eq(memberships.personId, people.id), eq(memberships.plantId, plantId)))
    .where(eq(sql`lower(${people.email})`, email));
  if (member?.inactiveAt) return badInput('MEMBER', `${member.name} is here, inactive. Activate the account.`, 'email');
  if (member) return badInput('MEMBER', `${member.name} works here already. Change roles in the list.`, 'email');
  if (!(await isInvited(tx, plantId, email))) return null;
  return badInput('INVITED', 'This address is invited already. Send the invitation again from the list.', 'email');
}

const mayWrite = ({ plantId }: Manager): Promise<boolean> =>
  countTry([{ key: `invitations of ${plantId}`, tries: MESSAGES_IN_A_QUARTER }]);

/** Invites an address to the plant, with roles and lines. */
export async function invite(actor: Manager, { email, roles, lineIds }: InviteRequest): Done {
  if (!(await mayWrite(actor))) return fail(tooMany);
  const to = email.toLowerCase();
  return db.transaction(async (tx) => {
    await lockPeople(tx, actor.plantId);
    const fault = (await invitationFault(tx, actor.plantId, to)) ?? (await linesFault(tx, actor.plantId, lineIds));
    if (fault) return fail(fault);
    const link = await sendLink(tx, actor, to, roles);
    const owner = { plantId: actor.plantId, invitedBy: actor.personId, createdAt: now() };
    const row = { id: newId(), email: to, roles, lineIds, ...owner, ...link };
    await tx.insert(invitations).values(row);
    await record(tx, actor, 'people.invite', row.id, { email: to, roles, lineIds });
    await notify(tx, actor.plantId, { kind: 'people' });
    return listPeople(actor, tx);
  });
}

/** Sends an invitation again, good for another seven days. */
export async function resendInvitation(actor: Manager, id: string): Done {
  if (!(await mayWrite(actor))) return fail(tooMany);
  return db.transaction(async (tx) => {
    const row = await openInvitation(tx, actor.plantId, id);
    if (!row) return fail(gone);
    await tx
      .update(invitations)
      .set(await sendLink(tx, actor, row.email, row.roles))
      .where(eq(invitations.id, id));
    await record(tx, actor, 'people.resend', id, { email: row.email });
    await notify(tx, actor.plantId, { kind: 'people' });
    return listPeople(actor, tx);
  });
}

/** Takes an invitation back; its link works no more. */
export async function withdrawInvitation(actor: Manager, id: string): Done {
  return db.transaction(async (tx) => {
    const row = await openInvitation(tx, actor.plantId, id);
    if (!row) return fail(conflict('INVITATION-CLOSED', gone.message));
    await tx.update(invitations).set({ withdrawnAt: now() }).where(eq(invitations.id, id));
    await record(tx, actor, 'people.withdraw', id, { email: row.email });
    await notify(tx, actor.plantId, { kind: 'people' });
    return listPeople(actor, tx);
  });
}

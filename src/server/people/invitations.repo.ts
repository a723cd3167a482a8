import { and, desc, eq, isNull } from 'drizzle-orm';
import type { InvitationDto } from '@/contracts/people';
import type { Db } from '@/db/client';
import { invitations, mails, people, plants } from '@/db/schema/index';
import { now } from '../clock';

export type InvitationRow = typeof invitations.$inferSelect;

const isOpen = and(isNull(invitations.acceptedAt), isNull(invitations.withdrawnAt));

const mailDto = (state: string | null, error: string | null): InvitationDto['mail'] => ({
  state: state === 'sent' || state === 'failed' ? state : 'waiting',
  error,
});

/** Invitations neither accepted nor withdrawn, newest first. */
export async function openInvitations(tx: Db, plantId: string): Promise<InvitationDto[]> {
  const rows = await tx
    .select({ row: invitations, state: mails.state, error: mails.lastError, by: people.name })
    .from(invitations)
    .leftJoin(mails, eq(mails.id, invitations.mailId))
    .leftJoin(people, eq(people.id, invitations.invitedBy))
    .where(and(eq(invitations.plantId, plantId), isOpen))
    .orderBy(desc(invitations.createdAt), desc(invitations.id));
  return rows.map(({ row, state, error, by }) => ({
    id: row.id,
    email: row.email,
    roles: row.roles,
    lineIds: row.lineIds,
    invitedBy: by ?? 'somebody who has left',
    createdAt: row.createdAt.toISOString(),
    expiresAt: row.expiresAt.toISOString(),
    isExpired: row.expiresAt <= now(),
    mail: mailDto(state, error),
  }));
}

/** An open invitation of the plant, locked. */
export async function openInvitation(tx: Db, plantId: string, id: string): Promise<InvitationRow | null> {
  const [row] = await tx
    .select()
    .from(invitations)
    .where(and(eq(invitations.id, id), eq(invitations.plantId, plantId), isOpen))
    .for('update');
  return row ?? null;
}

/** True where the address holds an open invitation to the plant. */
export async function isInvited(tx: Db, plantId: string, email: string): Promise<boolean> {
  const open = and(eq(invitations.plantId, plantId), eq(invitations.email, email), isOpen);
  return (await tx.select({ id: invitations.id }).from(invitations).where(open)).length > 0;
}

/** The invitation that a link's token opens, with its plant; null where it opens none any more. */
export async function invitationByToken(tx: Db, tokenHash: string) {
  const [found] = await tx
    .select({ row: invitations, plantName: plants.name, isDemo: plants.isDemo, by: people.name })
    .from(invitations)
    .innerJoin(plants, eq(plants.id, invitations.plantId))
    .leftJoin(people, eq(people.id, invitations.invitedBy))
    .where(and(eq(invitations.tokenHash, tokenHash), isOpen));
  return found && found.row.expiresAt > now() ? found : null;
}

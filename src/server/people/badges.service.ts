import { and, eq, ne } from 'drizzle-orm';
import type { BadgeRequest, PeopleDto } from '@/contracts/people';
import { fail, type Result } from '@/core/result';
import { db } from '@/db/client';
import { badges } from '@/db/schema/index';
import { hashPassword } from '../auth/password';
import { FLOOR_ROLES, type Authorized } from '../auth/permissions';
import { pinFault } from '../auth/pinStrength';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { record } from '../record/record';
import { rolesSaid } from './invitations.service';
import { listPeople } from './people.service';
import { lockPeople, peopleAt } from './plantPeople.repo';

type Manager = Authorized<'people.manage'>;
type Done = Promise<Result<PeopleDto, HttpProblem>>;

/** Gives a person of the floor a badge number and a PIN, in the place of those held before. */
export async function giveBadge(actor: Manager, personId: string, { number, pin }: BadgeRequest): Done {
  const weak = pinFault(pin, number);
  if (weak) return fail(badInput('PIN-WEAK', weak, 'pin'));
  const pinHash = await hashPassword(pin);
  const { plantId } = actor;
  return db.transaction(async (tx) => {
    await lockPeople(tx, plantId);
    const [person] = await peopleAt(tx, plantId, personId);
    if (!person) return fail(notFound(`There is no such person at ${actor.plantName}.`));
    if (!person.roles.some((role) => FLOOR_ROLES.includes(role))) {
      const message = `A badge opens the floor’s pages only. Make ${person.name} ${rolesSaid(FLOOR_ROLES)} first.`;
      return fail(conflict('BADGE-ROLE', message));
    }
    const others = and(eq(badges.plantId, plantId), eq(badges.number, number), ne(badges.personId, personId));
    const [taken] = await tx.select({ personId: badges.personId }).from(badges).where(others);
    if (taken) return fail(badInput('BADGE-TAKEN', 'Somebody else here has that number.', 'number'));
    const row = { number, pinHash, changedAt: now() };
    await tx
      .insert(badges)
      .values({ personId, plantId, ...row })
      .onConflictDoUpdate({ target: [badges.personId, badges.plantId], set: row });
    await record(tx, actor, 'people.badge', personId, { number });
    await notify(tx, plantId, { kind: 'people' });
    return listPeople(actor, tx);
  });
}

/** Takes a badge away: its number signs nobody in. */
export function takeBadge(actor: Manager, personId: string): Done {
  return db.transaction(async (tx) => {
    const own = and(eq(badges.plantId, actor.plantId), eq(badges.personId, personId));
    const [row] = await tx.delete(badges).where(own).returning({ number: badges.number });
    if (!row) return fail(notFound('There is no badge to take away.'));
    await record(tx, actor, 'people.badgeTaken', personId, { number: row.number });
    await notify(tx, actor.plantId, { kind: 'people' });
    return listPeople(actor, tx);
  });
}

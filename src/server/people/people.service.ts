import { eq } from 'drizzle-orm';
import type { EditPersonRequest, PeopleDto } from '@/contracts/people';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { plants } from '@/db/schema/index';
import type { Authorized } from '../auth/permissions';
import { endSessionsOf } from '../auth/session';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { record } from '../record/record';
import { openInvitations } from './invitations.repo';
import {
  linesOf,
  lockPeople,
  otherAdministrators,
  peopleAt,
  setActive,
  setRoles,
  type PlantPerson,
} from './plantPeople.repo';
import { tabletsAt } from './tablets.repo';

type Manager = Authorized<'people.manage'>;
type Done = Promise<Result<PeopleDto, HttpProblem>>;

const lastAdministrator = conflict(
  'LAST-ADMINISTRATOR',
  'This is the plant’s last administrator. Make somebody else administrator first.',
);

/** The plant's people, who is invited, and its tablets. */
export async function listPeople(actor: Manager, tx: Db = db): Done {
  const { plantId } = actor;
  const [plant] = await tx.select({ timeZone: plants.timeZone }).from(plants).where(eq(plants.id, plantId));
  if (!plant) return fail(notFound());
  const people = (await peopleAt(tx, plantId)).map((person) => ({
    ...person,
    lastSeenAt: person.lastSeenAt?.toISOString() ?? null,
    isSelf: person.id === actor.personId,
  }));
  const invitations = await openInvitations(tx, plantId);
  const tablets = await tabletsAt(tx, plantId);
  return ok({ people, invitations, tablets, lines: await linesOf(tx, plantId), timeZone: plant.timeZone });
}

/** Why lines can't be given to somebody; null where they are all lines of the plant in use. */
export async function linesFault(tx: Db, plantId: string, lineIds: readonly string[] | null) {
  if (lineIds === null) return null;
  const known = new Set((await linesOf(tx, plantId)).map(({ id }) => id));
  const isKnown = lineIds.every((id) => known.has(id));
  return isKnown ? null : badInput('LINE-UNKNOWN', 'A line that you chose is no longer in use. Look again.', 'lineIds');
}

/** Does something about one person of the plant, while nothing else changes, and answers with how everybody stands. */
function change(
  actor: Manager,
  personId: string,
  action: string,
  work: (tx: Db, person: PlantPerson) => Promise<Result<Record<string, unknown>, HttpProblem>>,
): Done {
  return db.transaction(async (tx) => {
    await lockPeople(tx, actor.plantId);
    const [person] = await peopleAt(tx, actor.plantId, personId);
    if (!person) return fail(notFound(`There is no such person at ${actor.plantName}.`));
    const done = await work(tx, person);
    if (!done.ok) return done;
    await record(tx, actor, action, personId, done.value);
    await notify(tx, actor.plantId, { kind: 'people' });
    return listPeople(actor, tx);
  });
}

const sameSet = (a: readonly string[] | null, b: readonly string[] | null): boolean =>
  a === null || b === null ? a === b : [...a].sort().join('\n') === [...b].sort().join('\n');

/** Changes what a person may do and on which lines. */
export function editPerson(actor: Manager, personId: string, request: EditPersonRequest): Done {
  return change(actor, personId, 'people.roles', async (tx, person) => {
    const { roles, lineIds, was } = request;
    if (!sameSet(person.roles, was.roles) || !sameSet(person.lineIds, was.lineIds)) {
      const message = `${person.name} has been changed since you looked; nothing was saved. See what is there now.`;
      return fail(conflict('PERSON-STALE', message, { roles: person.roles, lineIds: person.lineIds }));
    }
    const fault = await linesFault(tx, actor.plantId, lineIds);
    if (fault) return fail(fault);
    const steps = person.isActive && person.roles.includes('administrator') && !roles.includes('administrator');
    if (steps && (await otherAdministrators(tx, actor.plantId, personId)) === 0) return fail(lastAdministrator);
    await setRoles(tx, actor.plantId, personId, roles, lineIds);
    const before = { roles: person.roles, lineIds: person.lineIds };
    return ok({ before, after: { roles, lineIds } });
  });
}

/** Lets a person work here no longer; all sessions end at once. At other plants nothing changes. */
export function deactivatePerson(actor: Manager, personId: string): Done {
  return change(actor, personId, 'people.deactivate', async (tx, person) => {
    if (!person.isActive) return fail(conflict('PERSON-INACTIVE', `${person.name} is inactive already.`));
    const isLast = (await otherAdministrators(tx, actor.plantId, personId)) === 0;
    if (person.roles.includes('administrator') && isLast) return fail(lastAdministrator);
    await setActive(tx, actor.plantId, personId, false);
    return ok({ sessionsEnded: await endSessionsOf(tx, personId) });
  });
}

/** Lets a person work here again, with the roles held before. */
export function activatePerson(actor: Manager, personId: string): Done {
  return change(actor, personId, 'people.activate', async (tx, person) => {
    if (person.isActive) return fail(conflict('PERSON-ACTIVE', `${person.name} is active already.`));
    await setActive(tx, actor.plantId, personId, true);
    return ok({});
  });
}

/** Ends every session of a person, on whatever device. */
export function signOutPerson(actor: Manager, personId: string): Done {
  return change(actor, personId, 'people.signOut', async (tx) =>
    ok({ sessionsEnded: await endSessionsOf(tx, personId) }),
  );
}

import { and, eq, ne } from 'drizzle-orm';
import type { Session, User } from 'lucia';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { sessions } from '@/db/schema/index';
import { now } from '../clock';
import { plantsOf, touchPerson, type PlantOfPerson } from '../people/people.repo';
import { notifySessionEnd } from '../events/notify';
import { notFound, type HttpProblem } from '../http/problem';
import type { Actor } from './actor';
import { choicesOf, type Choices } from './choices';
import { hashSessionId } from './hashedSessions';
import { lucia } from './lucia';
import { FLOOR_ROLES, type Authorized } from './permissions';
import { touchTabletSession, tabletHolds } from './tabletSession';

export interface SignedIn {
  readonly actor: Actor;
  readonly session: Session;
  readonly choices: Choices;
  /** Where the person may work, by name. */
  readonly plants: readonly PlantOfPerson[];
}

interface Person {
  readonly id: string;
  readonly name: string;
}

export const actorAt = (person: Person, plant: PlantOfPerson): Actor => ({
  personId: person.id,
  name: person.name,
  plantId: plant.plantId,
  plantName: plant.plantName,
  isDemo: plant.isDemo,
  roles: plant.roles,
});

const SEEN_EVERY_MS = 5 * 60_000;

/** Notes now and then that somebody is here. */
async function see(personId: string, lastSeenAt: Date | null): Promise<void> {
  const at = now();
  if (Math.abs(at.getTime() - (lastSeenAt?.getTime() ?? 0)) > SEEN_EVERY_MS) await touchPerson(personId, at);
}

/** What a request says of itself besides the session. */
export interface Visit {
  /** The token of the enrolled tablet that it comes from. */
  readonly tabletToken: string | null;
  /** Somebody's hand was on it: a page or a change, not a look from the background. */
  readonly isTouch: boolean;
}

/** Who a session's cookie stands for; null where it has ended, or the person may no longer work at any plant. */
export async function signedIn(sessionId: string, visit: Visit): Promise<SignedIn | null> {
  const { session, user } = await lucia.validateSession(sessionId);
  if (!session || !user.active) return null;
  const plants = await plantsOf(user.id);
  if (session.tabletId) return signedInByBadge(session, user, plants, visit);
  const plant = plants.find(({ plantId }) => plantId === session.plantId) ?? plants[0];
  if (!plant) return null;
  if (plant.plantId !== session.plantId) await setPlant(sessionId, plant.plantId);
  await see(user.id, user.lastSeenAt);
  return { actor: actorAt(user, plant), session, choices: choicesOf(user.settings, plant), plants };
}

/** A session by badge: at its tablet's plant, from that tablet, for as long as it is touched, with floor roles. */
async function signedInByBadge(
  session: Session,
  user: User,
  plants: readonly PlantOfPerson[],
  { tabletToken, isTouch }: Visit,
): Promise<SignedIn | null> {
  const plant = plants.find(({ plantId }) => plantId === session.plantId);
  const roles = plant?.roles.filter((role) => FLOOR_ROLES.includes(role)) ?? [];
  const tabletId = await tabletHolds(session, tabletToken);
  if (!plant || roles.length === 0 || tabletId === null) {
    await endSession(session.id);
    return null;
  }
  if (isTouch) await touchTabletSession(session);
  await see(user.id, user.lastSeenAt);
  const actor = { ...actorAt(user, plant), roles, tabletId };
  return { actor, session, choices: choicesOf(user.settings, plant), plants: [plant] };
}

async function setPlant(sessionId: string, plantId: string): Promise<void> {
  await db
    .update(sessions)
    .set({ plantId })
    .where(eq(sessions.id, hashSessionId(sessionId)));
}

/** Moves the session to another of the person's plants; its event streams end, so that they follow the new one. */
export async function changePlant(
  actor: Authorized<'account.own'>,
  sessionId: string,
  plantId: string,
): Promise<Result<Actor, HttpProblem>> {
  const plant = (await plantsOf(actor.personId)).find((candidate) => candidate.plantId === plantId);
  if (!plant) return fail(notFound('You hold no role at a plant of that name.'));
  await setPlant(sessionId, plantId);
  await notifySessionEnd(db, hashSessionId(sessionId));
  return ok(actorAt({ id: actor.personId, name: actor.name }, plant));
}

/** Ends a session and its event streams; an unknown one is none to end. */
export async function endSession(sessionId: string): Promise<void> {
  await lucia.invalidateSession(sessionId);
  await notifySessionEnd(db, hashSessionId(sessionId));
}

/** Opens a session at a plant; the one that the browser had ends with it. */
export async function openSession(personId: string, plantId: string, oldSessionId: string | null): Promise<Session> {
  if (oldSessionId) await endSession(oldSessionId);
  const session = await lucia.createSession(personId, { plantId });
  await touchPerson(personId, now());
  return session;
}

/** Ends a person's sessions everywhere, but for the one named by its hash; gives how many. */
export async function endSessionsOf(tx: Db, personId: string, exceptHash?: string): Promise<number> {
  const all = eq(sessions.userId, personId);
  const ended = await tx
    .delete(sessions)
    .where(exceptHash === undefined ? all : and(all, ne(sessions.id, exceptHash)))
    .returning({ id: sessions.id });
  for (const { id } of ended) await notifySessionEnd(tx, id);
  return ended.length;
}

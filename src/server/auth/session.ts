import { eq } from 'drizzle-orm';
import type { Session } from 'lucia';
import type { UnitSystem } from '@/core/quantity/display';
import { fail, ok, type Result } from '@/core/result';
import { db } from '@/db/client';
import { sessions, type PersonSettings } from '@/db/schema/index';
import { plantsOf, type PlantOfPerson } from '../people/people.repo';
import { notifySessionEnd } from '../events/notify';
import { notFound, type HttpProblem } from '../http/problem';
import type { Actor } from './actor';
import { hashSessionId } from './hashedSessions';
import { lucia } from './lucia';
import type { Authorized } from './permissions';

export interface SignedIn {
  readonly actor: Actor;
  readonly session: Session;
  readonly choices: Choices;
}

/** What the person chose for the account, and what the plant shows where nothing was chosen. */
export interface Choices {
  readonly theme: 'light' | 'dark' | 'system' | null;
  readonly units: UnitSystem;
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

/** The unit system of a stored choice. */
export const unitSystemOf = (stored: 'si' | 'us'): UnitSystem => (stored === 'us' ? 'usCustomary' : 'si');

/** The person's own choices over those of the plant. */
export const choicesOf = (settings: PersonSettings, plant: PlantOfPerson): Choices => ({
  theme: settings.theme ?? null,
  units: unitSystemOf(settings.units ?? plant.displayUnits),
});

/** Who a session's cookie stands for; null where it has ended, or the person may no longer work at any plant. */
export async function signedIn(sessionId: string): Promise<SignedIn | null> {
  const { session, user } = await lucia.validateSession(sessionId);
  if (!session || !user.active) return null;
  const plants = await plantsOf(user.id);
  const plant = plants.find(({ plantId }) => plantId === session.plantId) ?? plants[0];
  if (!plant) return null;
  if (plant.plantId !== session.plantId) await setPlant(sessionId, plant.plantId);
  return { actor: actorAt(user, plant), session, choices: choicesOf(user.settings, plant) };
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

import { and, asc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Role } from '@/contracts/account';
import { db, type Db } from '@/db/client';
import { memberships, people, plants } from '@/db/schema/index';

/** A plant at which a person holds roles. */
export interface PlantOfPerson {
  readonly plantId: string;
  readonly plantName: string;
  readonly isDemo: boolean;
  readonly displayUnits: 'si' | 'us';
  readonly roles: readonly Role[];
}

/** What signing in needs of an account; addresses are compared without case. */
export async function accountByEmail(email: string, tx: Db = db) {
  const [person] = await tx
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      passwordHash: people.passwordHash,
      active: people.active,
    })
    .from(people)
    .where(eq(sql`lower(${people.email})`, email.trim().toLowerCase()));
  return person ?? null;
}

/** The plants at which a person holds roles and may work, by name. */
export async function plantsOf(personId: string, tx: Db = db): Promise<PlantOfPerson[]> {
  const rows = await tx
    .select({
      plantId: plants.id,
      plantName: plants.name,
      isDemo: plants.isDemo,
      displayUnits: plants.displayUnits,
      role: memberships.role,
    })
    .from(memberships)
    .innerJoin(plants, eq(memberships.plantId, plants.id))
    .where(and(eq(memberships.personId, personId), isNull(memberships.inactiveAt)))
    .orderBy(asc(plants.name), asc(plants.id), asc(memberships.role));
  const byPlant = new Map<string, PlantOfPerson & { roles: Role[] }>();
  for (const { role, ...plant } of rows) {
    const known = byPlant.get(plant.plantId);
    if (known) known.roles.push(role);
    else byPlant.set(plant.plantId, { ...plant, roles: [role] });
  }
  return [...byPlant.values()];
}

/** Names by person id, for "by whom"; ids of people who are gone are missing. */
export async function namesOf(tx: Db, personIds: Iterable<string>): Promise<ReadonlyMap<string, string>> {
  const ids = [...new Set(personIds)];
  if (ids.length === 0) return new Map();
  const rows = await tx.select({ id: people.id, name: people.name }).from(people).where(inArray(people.id, ids));
  return new Map(rows.map((row) => [row.id, row.name]));
}

/** Notes that a person is here. */
export async function touchPerson(personId: string, at: Date): Promise<void> {
  await db.update(people).set({ lastSeenAt: at }).where(eq(people.id, personId));
}

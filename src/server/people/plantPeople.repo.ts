import { and, asc, count, eq, isNull, sql } from 'drizzle-orm';
import type { Role } from '@/contracts/account';
import type { PersonDto } from '@/contracts/people';
import type { Db } from '@/db/client';
import { badges, lines, memberships, people, plants } from '@/db/schema/index';
import { now } from '../clock';

/** One person at one plant, as it stands in the tables. */
export interface PlantPerson extends Omit<PersonDto, 'isSelf' | 'lastSeenAt'> {
  readonly lastSeenAt: Date | null;
}

/** Holds everything about the plant's people still until the transaction ends, without stopping other work. */
export async function lockPeople(tx: Db, plantId: string): Promise<void> {
  await tx.select({ id: plants.id }).from(plants).where(eq(plants.id, plantId)).for('no key update');
}

/** Everybody who holds a role at the plant, active or not, by name; or one of them. */
export async function peopleAt(tx: Db, plantId: string, personId?: string): Promise<PlantPerson[]> {
  const here = eq(memberships.plantId, plantId);
  const rows = await tx
    .select({
      id: people.id,
      name: people.name,
      email: people.email,
      lastSeenAt: people.lastSeenAt,
      open: people.active,
      role: memberships.role,
      lineIds: memberships.lineIds,
      inactiveAt: memberships.inactiveAt,
      badge: badges.number,
    })
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .leftJoin(badges, and(eq(badges.personId, people.id), eq(badges.plantId, plantId)))
    .where(personId === undefined ? here : and(here, eq(people.id, personId)))
    .orderBy(asc(people.name), asc(people.id), asc(memberships.role));
  const byId = new Map<string, PlantPerson & { roles: Role[] }>();
  for (const { role, open, inactiveAt, ...person } of rows) {
    const known = byId.get(person.id);
    if (known) known.roles.push(role);
    else byId.set(person.id, { ...person, isActive: open && inactiveAt === null, roles: [role] });
  }
  return [...byId.values()];
}

/** Puts roles and lines in the place of those that the person held at the plant. */
export async function setRoles(
  tx: Db,
  plantId: string,
  personId: string,
  roles: readonly Role[],
  lineIds: readonly string[] | null,
): Promise<void> {
  const own = and(eq(memberships.plantId, plantId), eq(memberships.personId, personId));
  const [before] = await tx.delete(memberships).where(own).returning({ inactiveAt: memberships.inactiveAt });
  const inactiveAt = before?.inactiveAt ?? null;
  const held = lineIds === null ? null : [...lineIds];
  await tx.insert(memberships).values(roles.map((role) => ({ plantId, personId, role, lineIds: held, inactiveAt })));
}

/** Lets a person work at the plant, or not. */
export async function setActive(tx: Db, plantId: string, personId: string, isActive: boolean): Promise<void> {
  await tx
    .update(memberships)
    .set({ inactiveAt: isActive ? null : now() })
    .where(and(eq(memberships.plantId, plantId), eq(memberships.personId, personId)));
}

/** How many active administrators the plant has besides one person. */
export async function otherAdministrators(tx: Db, plantId: string, personId: string): Promise<number> {
  const [row] = await tx
    .select({ n: count() })
    .from(memberships)
    .innerJoin(people, and(eq(people.id, memberships.personId), eq(people.active, true)))
    .where(
      and(
        eq(memberships.plantId, plantId),
        eq(memberships.role, 'administrator'),
        isNull(memberships.inactiveAt),
        sql`${memberships.personId} <> ${personId}`,
      ),
    );
  return row?.n ?? 0;
}

/** The plant's lines in use, in their order. */
export const linesOf = (tx: Db, plantId: string): Promise<{ id: string; name: string }[]> =>
  tx
    .select({ id: lines.id, name: lines.name })
    .from(lines)
    .where(and(eq(lines.plantId, plantId), isNull(lines.retiredAt)))
    .orderBy(asc(lines.position), asc(lines.name));

import { and, eq, isNull } from 'drizzle-orm';
import type { Week } from '@/core/schedule/week';
import type { Db } from '@/db/client';
import { memberships, people } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import { issueLetter } from '../mail/letters';
import { queueMail } from '../mail/mails.repo';

const GOOD_FOR_MINUTES = 24 * 60;

interface Issued {
  readonly number: number;
  /** 2026-11-30 */
  readonly weekStart: string;
  readonly comment: string;
  readonly week: Week;
}

/** Lines on which something runs in the week. */
function linesAtWork({ plant, activities }: Week): ReadonlySet<string> {
  const lineOf = new Map(plant.units.map((unit) => [unit.id, unit.lineId]));
  return new Set(activities.flatMap(({ placement }) => lineOf.get(placement?.unitId ?? '') ?? []));
}

/** Tells the supervisors of the lines that run, but whoever put the plan there or wants no such messages. */
export async function tellOfIssue(tx: Db, actor: Actor, { number, weekStart, comment, week }: Issued): Promise<void> {
  const { plantId, plantName } = actor;
  const supervisors = await tx
    .select({ id: people.id, to: people.email, settings: people.settings, lineIds: memberships.lineIds })
    .from(memberships)
    .innerJoin(people, and(eq(people.id, memberships.personId), eq(people.active, true)))
    .where(
      and(eq(memberships.plantId, plantId), eq(memberships.role, 'lineSupervisor'), isNull(memberships.inactiveAt)),
    );
  const running = linesAtWork(week);
  const letter = issueLetter({ number, plantName, weekStart, by: actor.name, comment });
  for (const { id, to, settings, lineIds } of supervisors) {
    const isConcerned = lineIds === null || lineIds.some((line) => running.has(line));
    if (id === actor.personId || !isConcerned || settings.notices?.issue === false) continue;
    await queueMail(tx, { plantId, to, letter, goodForMinutes: GOOD_FOR_MINUTES });
  }
}

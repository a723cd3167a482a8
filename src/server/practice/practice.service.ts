import { and, eq, isNotNull, isNull, ne } from 'drizzle-orm';
import type { EnterPractice, PracticeDto } from '@/contracts/practice';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { practiceRules, ventGroups } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { ONE_AT_A_TIME } from '../plant/tables';
import { record } from '../record/record';
import type { PracticeRow } from './practice.repo';
import { practiceDto, standing } from './practiceDto';

type Outcome = Promise<Result<PracticeDto, HttpProblem>>;

async function dtoOf(tx: Db, actor: Actor): Outcome {
  const dto = await practiceDto(tx, actor);
  return dto ? ok(dto) : fail(notFound());
}

/** The plant's practice rules, newest first. */
export function listPractice(actor: Authorized<'practice.read'>): Outcome {
  return dtoOf(db, actor);
}

/** Enters a rule; a change of one is a new one. It holds once it is released. */
export function enterPractice(actor: Authorized<'practice.enter'>, request: EnterPractice): Outcome {
  return db.transaction(async (tx) => {
    const { kind, ventGroupId, values, source } = request;
    if (ventGroupId !== null && !(await groupInUse(tx, actor, ventGroupId))) {
      return fail(
        badInput('PRACTICE-GROUP', `There is no such vent group in use at ${actor.plantName}.`, 'ventGroupId'),
      );
    }
    const row = { id: newId(), plantId: actor.plantId, kind, ventGroupId, values, source };
    await tx.insert(practiceRules).values({ ...row, enteredBy: actor.personId, createdAt: now() });
    await record(tx, actor, 'practice.enter', row.id, { kind, ventGroupId, values, source });
    await notify(tx, actor.plantId, { kind: 'plant' });
    return dtoOf(tx, actor);
  });
}

async function groupInUse(tx: Db, actor: Actor, id: string): Promise<boolean> {
  const own = and(eq(ventGroups.id, id), eq(ventGroups.plantId, actor.plantId), isNull(ventGroups.retiredAt));
  return (await tx.select({ id: ventGroups.id }).from(ventGroups).where(own)).length > 0;
}

async function lockRule(tx: Db, actor: Actor, id: string): Promise<PracticeRow | null> {
  const owned = and(eq(practiceRules.id, id), eq(practiceRules.plantId, actor.plantId));
  const [row] = await tx.select().from(practiceRules).where(owned).for('update');
  return row ?? null;
}

const unknown = (actor: Actor) => notFound(`There is no such rule at ${actor.plantName}.`);

/** Releases a rule: it takes the place of the one in force, and vent groups take its numbers. */
export function releasePractice(actor: Authorized<'practice.release'>, id: string): Outcome {
  return db.transaction(async (tx) => {
    const row = await lockRule(tx, actor, id);
    if (!row) return fail(unknown(actor));
    const refusal = standing(actor, row);
    if (refusal) return fail(refusal);
    if (row.ventGroupId !== null && !(await groupInUse(tx, actor, row.ventGroupId))) {
      return fail(conflict('PRACTICE-GROUP', 'The vent group was retired: the rule has nothing to hold for.'));
    }
    await replace(tx, row);
    const release = { releasedBy: actor.personId, releasedAt: now() };
    await tx.update(practiceRules).set(release).where(eq(practiceRules.id, id));
    if (row.ventGroupId !== null) await writeNumbers(tx, row, row.ventGroupId);
    const { kind, ventGroupId, values, source } = row;
    await record(tx, actor, 'practice.release', id, { kind, ventGroupId, values, source });
    await notify(tx, actor.plantId, { kind: 'plant' });
    return dtoOf(tx, actor);
  });
}

/** The rule that was in force for the same things is so no longer. */
async function replace(tx: Db, { id, plantId, kind, ventGroupId }: PracticeRow): Promise<void> {
  const group = ventGroupId === null ? isNull(practiceRules.ventGroupId) : eq(practiceRules.ventGroupId, ventGroupId);
  const same = and(eq(practiceRules.plantId, plantId), eq(practiceRules.kind, kind), group);
  await tx
    .update(practiceRules)
    .set({ withdrawnAt: now() })
    .where(and(same, ne(practiceRules.id, id), isNotNull(practiceRules.releasedAt), isNull(practiceRules.withdrawnAt)));
}

async function writeNumbers(tx: Db, { plantId, values, source }: PracticeRow, ventGroupId: string): Promise<void> {
  const { ventsAtOnce, steamOnsAtOnce, steamOnMinutes, marginMinutes } = values;
  const { leastHeaderBarG = null, studyGreatestLoadKgPerH = null } = values;
  const numbers = { leastHeaderBarG, studyGreatestLoadKgPerH, source };
  await tx
    .update(ventGroups)
    .set({
      ventsAtOnce: ventsAtOnce ?? ONE_AT_A_TIME.ventsAtOnce,
      steamOnsAtOnce: steamOnsAtOnce ?? ONE_AT_A_TIME.steamOnsAtOnce,
      steamOnMinutes: steamOnMinutes ?? ONE_AT_A_TIME.steamOnMinutes,
      marginMinutes: marginMinutes ?? 0,
      ...numbers,
    })
    .where(and(eq(ventGroups.plantId, plantId), eq(ventGroups.id, ventGroupId)));
}

/**
 * Withdraws a rule. A vent group whose rule in force is withdrawn falls back to one vent and one steam on at a time:
 * its margin and least header pressure stay.
 */
export function withdrawPractice(actor: Authorized<'practice.release'>, id: string): Outcome {
  return db.transaction(async (tx) => {
    const row = await lockRule(tx, actor, id);
    if (!row) return fail(unknown(actor));
    if (row.withdrawnAt) return fail(conflict('PRACTICE-WITHDRAWN', 'This rule was withdrawn already.'));
    await tx.update(practiceRules).set({ withdrawnAt: now() }).where(eq(practiceRules.id, id));
    if (row.ventGroupId !== null && row.releasedAt) {
      const { ventsAtOnce, steamOnsAtOnce, source } = ONE_AT_A_TIME;
      const own = and(eq(ventGroups.plantId, row.plantId), eq(ventGroups.id, row.ventGroupId));
      await tx.update(ventGroups).set({ ventsAtOnce, steamOnsAtOnce, source }).where(own);
    }
    await record(tx, actor, 'practice.withdraw', id, { kind: row.kind, ventGroupId: row.ventGroupId });
    await notify(tx, actor.plantId, { kind: 'plant' });
    return dtoOf(tx, actor);
  });
}

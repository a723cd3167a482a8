import { and, eq } from 'drizzle-orm';
import type { CleaningRequest, FamilyRequest } from '@/contracts/products';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import { cleaningRules, families } from '@/db/schema/index';
import type { Actor } from '../auth/actor';
import type { Authorized } from '../auth/permissions';
import { now } from '../clock';
import { cleaningDraws } from '../duties/refreshCleaning';
import { notify } from '../events/notify';
import { badInput, conflict, notFound, type HttpProblem } from '../http/problem';
import { newId } from '../id';
import { record } from '../record/record';
import { familyRows, limitRows } from './products.repo';

export interface SavedFamily {
  readonly id: string;
}

/** Writes a new family. */
export function createFamily(
  actor: Authorized<'library.edit'>,
  { name }: FamilyRequest,
): Promise<Result<SavedFamily, HttpProblem>> {
  return db.transaction(async (tx) => {
    const id = newId();
    await tx.insert(families).values({ id, plantId: actor.plantId, name });
    await told(tx, actor, 'family.create', id, { name });
    return ok({ id });
  });
}

/** Gives a family another name. */
export function renameFamily(
  actor: Authorized<'library.edit'>,
  id: string,
  { name }: FamilyRequest,
): Promise<Result<SavedFamily, HttpProblem>> {
  return db.transaction(async (tx) => {
    const owned = and(eq(families.plantId, actor.plantId), eq(families.id, id));
    const changed = await tx.update(families).set({ name }).where(owned).returning({ id: families.id });
    if (changed.length === 0) return fail(notFound(`There is no such family at ${actor.plantName}.`));
    await told(tx, actor, 'family.rename', id, { name });
    return ok({ id });
  });
}

/** Takes a family without products out of use. */
export function retireFamily(actor: Authorized<'library.edit'>, id: string): Promise<Result<SavedFamily, HttpProblem>> {
  return db.transaction(async (tx) => {
    const found = (await familyRows(tx, actor.plantId)).find((family) => family.id === id);
    if (!found) return fail(notFound(`There is no such family at ${actor.plantName}.`));
    if (found.products > 0) {
      const many = found.products === 1 ? 'one product belongs' : `${found.products} products belong`;
      return fail(conflict('FAMILY-USED', `${found.name}: ${many} to it. Give them another family first.`));
    }
    const owned = and(eq(families.plantId, actor.plantId), eq(families.id, id));
    await tx.update(families).set({ retiredAt: now() }).where(owned);
    await told(tx, actor, 'family.retire', id, { name: found.name });
    return ok({ id });
  });
}

/** Sets or takes back what is cleaned on a kind of unit between two families, with the steam that its duty draws. */
export function setCleaning(
  actor: Authorized<'library.edit'>,
  request: CleaningRequest,
): Promise<Result<undefined, HttpProblem>> {
  return db.transaction(async (tx) => {
    const { unitKind, fromFamilyId, toFamilyId, rule } = request;
    const known = new Set((await familyRows(tx, actor.plantId)).map(({ id }) => id));
    for (const field of ['fromFamilyId', 'toFamilyId'] as const) {
      if (known.has(request[field])) continue;
      return fail(badInput('CLEANING-FAMILY', `${actor.plantName} has no such family.`, field));
    }
    const drawn = rule && (await ruleRow(tx, actor, unitKind, rule));
    if (drawn && !drawn.ok) return drawn;
    await tx
      .delete(cleaningRules)
      .where(
        and(
          eq(cleaningRules.plantId, actor.plantId),
          eq(cleaningRules.unitKind, unitKind),
          eq(cleaningRules.fromFamilyId, fromFamilyId),
          eq(cleaningRules.toFamilyId, toFamilyId),
        ),
      );
    if (drawn) {
      const row = { id: newId(), plantId: actor.plantId, unitKind, fromFamilyId, toFamilyId, ...drawn.value };
      await tx.insert(cleaningRules).values(row);
    }
    await told(tx, actor, 'cleaning.set', `${unitKind} ${fromFamilyId} ${toFamilyId}`, { rule });
    return ok(undefined);
  });
}

/** A rule's columns; it lasts at least as long as its duty draws. */
async function ruleRow(tx: Db, actor: Actor, unitKind: string, rule: NonNullable<CleaningRequest['rule']>) {
  const { kind, minutes, dutyId } = rule;
  const uses = [...rule.uses];
  const limits = new Set((await limitRows(tx, actor.plantId)).map(({ id }) => id));
  const foreign = uses.findIndex(({ limitId }) => !limits.has(limitId));
  if (foreign >= 0) return fail(badInput('CLEANING-LIMIT', 'Choose a shared limit.', `rule.uses.${foreign}.limitId`));
  if (dutyId === null) return ok({ kind, minutes, dutyId, uses, phases: [] });
  const draw = (await cleaningDraws(tx, actor.plantId))(dutyId, unitKind);
  if (!draw.ok) return fail(badInput(draw.error.code, draw.error.message, 'rule.dutyId'));
  if (draw.value.minutes > minutes) {
    const message = `The duty draws steam for ${draw.value.minutes} min; the cleaning must last at least as long.`;
    return fail(badInput('CLEANING-MINUTES', message, 'rule.minutes'));
  }
  return ok({ kind, minutes, dutyId, uses, phases: [...draw.value.phases] });
}

async function told(tx: Db, actor: Actor, action: string, subject: string, details: Record<string, unknown>) {
  await record(tx, actor, action, subject, details);
  await notify(tx, actor.plantId, { kind: 'plant' });
}

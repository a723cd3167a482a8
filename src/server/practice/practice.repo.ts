import { and, desc, eq, isNotNull, isNull } from 'drizzle-orm';
import type { PracticeRuleKind } from '@/contracts/practice';
import type { PracticeLimits } from '@/core/plant/plant';
import type { Db } from '@/db/client';
import { headers, practiceRules, processData, products, units, ventGroups } from '@/db/schema/index';

export type PracticeRow = typeof practiceRules.$inferSelect;

/** The longest waits that the plant allows, whatever a product's document says. [min] */
export interface LongestWaits {
  readonly sinceClosingMin: number;
  readonly initialTemperatureMin: number | null;
  readonly source: string;
}

/** The rule in force of a kind that is set for the whole plant; null where none is. */
async function inForce(tx: Db, plantId: string, kind: PracticeRuleKind): Promise<PracticeRow | null> {
  const mine = and(eq(practiceRules.plantId, plantId), eq(practiceRules.kind, kind));
  const [row] = await tx
    .select()
    .from(practiceRules)
    .where(and(mine, isNotNull(practiceRules.releasedAt), isNull(practiceRules.withdrawnAt)))
    .orderBy(desc(practiceRules.releasedAt), desc(practiceRules.id))
    .limit(1);
  return row ?? null;
}

/** Cleanliness as the plant's released rule has it; undefined where none is in force. [min] */
export async function cleanlinessInForce(tx: Db, plantId: string): Promise<PracticeLimits | undefined> {
  const rule = await inForce(tx, plantId, 'cleanliness');
  if (!rule) return undefined;
  const { greatestRunningMin = null, greatestStandingDirtyMin = null, allergenReleaseMin = null } = rule.values;
  return { greatestRunningMin, greatestStandingDirtyMin, allergenReleaseMin };
}

/** The plant's longest waits in force; null where none are set. */
export async function longestWaitsInForce(tx: Db, plantId: string): Promise<LongestWaits | null> {
  const rule = await inForce(tx, plantId, 'waits');
  const sinceClosingMin = rule?.values.longestWaitSinceClosingMin;
  if (!rule || typeof sinceClosingMin !== 'number') return null;
  const { longestWaitForInitialTemperatureMin: initialTemperatureMin = null } = rule.values;
  return { sinceClosingMin, initialTemperatureMin, source: rule.source };
}

/** Every rule of a plant, newest first. */
export async function practiceRows(tx: Db, plantId: string): Promise<PracticeRow[]> {
  return tx
    .select()
    .from(practiceRules)
    .where(eq(practiceRules.plantId, plantId))
    .orderBy(desc(practiceRules.createdAt), desc(practiceRules.id));
}

/** Vent groups in use with the headers that their retorts draw from. */
export async function ventGroupsWithHeaders(tx: Db, plantId: string) {
  const groups = await tx
    .select()
    .from(ventGroups)
    .where(and(eq(ventGroups.plantId, plantId), isNull(ventGroups.retiredAt)))
    .orderBy(ventGroups.position, ventGroups.id);
  const drawn = await tx
    .selectDistinct({ groupId: units.ventGroupId, name: headers.name, pressureBarG: headers.pressureBarG })
    .from(units)
    .innerJoin(headers, eq(headers.id, units.headerId))
    .where(and(eq(units.plantId, plantId), isNull(units.retiredAt), isNotNull(units.ventGroupId)));
  return groups.map((group) => ({
    group,
    headers: drawn
      .filter(({ groupId }) => groupId === group.id)
      .map(({ name, pressureBarG }) => ({ name, pressureBarG })),
  }));
}

/** Released process data with its longest wait since closing. */
export async function statedWaits(tx: Db, plantId: string) {
  return tx
    .select({
      product: products.name,
      document: processData.document,
      issue: processData.issue,
      values: processData.values,
    })
    .from(processData)
    .innerJoin(products, eq(products.id, processData.productId))
    .where(and(eq(processData.plantId, plantId), isNotNull(processData.releasedAt), isNull(processData.withdrawnAt)))
    .orderBy(products.name);
}

import { and, desc, eq, isNotNull, isNull } from 'drizzle-orm';
import type { PracticeRuleKind } from '@/contracts/practice';
import type { PracticeLimits } from '@/core/plant/plant';
import type { Db } from '@/db/client';
import { practiceRules } from '@/db/schema/index';

export type PracticeRow = typeof practiceRules.$inferSelect;

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

/** The longest wait since closing that the plant allows whatever a product's document says; null where none is set. [min] */
export async function longestWaitInForce(tx: Db, plantId: string): Promise<number | null> {
  return (await inForce(tx, plantId, 'waits'))?.values.longestWaitSinceClosingMin ?? null;
}

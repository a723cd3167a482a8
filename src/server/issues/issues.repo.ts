import { and, desc, eq, gt, lt, max } from 'drizzle-orm';
import type { Week } from '@/core/schedule/week';
import type { Db } from '@/db/client';
import { agreements, boilerFirings, issues, steamLimits } from '@/db/schema/index';
import type { PlanRow } from '../plans/plans.repo';
import type { WeekTime } from '../weeks/weekTime';

export type IssueRow = typeof issues.$inferSelect;
export type AgreementRow = typeof agreements.$inferSelect;

/** Names the last word on the boilers in fire and the steam limits of the week; a newer word makes another mark. */
export async function capacityMark(tx: Db, plantId: string, time: WeekTime): Promise<string> {
  const marks: number[] = [];
  for (const table of [boilerFirings, steamLimits]) {
    const inWeek = and(
      eq(table.plantId, plantId),
      lt(table.fromAt, time.endInstant),
      gt(table.toAt, time.firstInstant),
    );
    const [row] = await tx
      .select({ last: max(table.sequence) })
      .from(table)
      .where(inWeek);
    marks.push(row?.last ?? 0);
  }
  return marks.join('.');
}

/** Appends an agreement. */
export async function insertAgreement(tx: Db, row: typeof agreements.$inferInsert): Promise<void> {
  await tx.insert(agreements).values(row);
}

/** The newest agreement to the plan's present revision; null where nobody has agreed. */
export async function agreementToPresent(tx: Db, plan: PlanRow): Promise<AgreementRow | null> {
  const present = and(
    eq(agreements.plantId, plan.plantId),
    eq(agreements.planId, plan.id),
    eq(agreements.revision, plan.revision),
  );
  const [row] = await tx
    .select()
    .from(agreements)
    .where(present)
    .orderBy(desc(agreements.createdAt), desc(agreements.id))
    .limit(1);
  return row ?? null;
}

/** One of the plan's agreements; null where the id is null. */
export async function agreementById(tx: Db, plan: PlanRow, id: string | null): Promise<AgreementRow | null> {
  if (id === null) return null;
  const mine = and(eq(agreements.plantId, plan.plantId), eq(agreements.planId, plan.id), eq(agreements.id, id));
  const [row] = await tx.select().from(agreements).where(mine);
  return row ?? null;
}

/** Appends an issue. */
export async function insertIssue(tx: Db, row: typeof issues.$inferInsert): Promise<void> {
  await tx.insert(issues).values(row);
}

/** The issue on the floor with its copy of the week; null where nothing is. */
export async function issueOnFloor(tx: Db, plan: PlanRow): Promise<(IssueRow & { readonly week: Week }) | null> {
  const [row] = await tx
    .select()
    .from(issues)
    .where(and(eq(issues.plantId, plan.plantId), eq(issues.planId, plan.id)))
    .orderBy(desc(issues.number))
    .limit(1);
  return row ?? null;
}

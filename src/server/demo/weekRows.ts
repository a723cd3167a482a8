/** Rows of one demo week: firings, orders, the plan as the naive hand leaves it, and what is not yet placed. */
import type { Activity, Link, LinkEnd } from '../../core/plant/activity';
import type { Db } from '../../db/client';
import * as schema from '../../db/schema';
import { instantOf, type WeekTime } from '../weeks/weekTime';
import { demoNets } from './demoWeek';
import type { NetParts } from './nets';
import { DEMO_FIRINGS, DEMO_PLANT } from './plant';

const plantId = DEMO_PLANT.id;
const planner = 'demo-person-planner';
const utilitiesLead = 'demo-person-utilities';
/** Rows per statement: PostgreSQL takes 65,535 values in one. */
const CHUNK = 200;

/** Writes the week into a plan without activities; `emptyPlanId` is null where the plan is not there either. */
export async function insertDemoWeek(db: Db, time: WeekTime, emptyPlanId: string | null): Promise<void> {
  const planId = emptyPlanId ?? `demo-plan-${time.weekStart}`;
  const scope = (id: string) => id.replace(/^demo-/, `demo-${time.weekStart}-`);
  const nets = demoNets();
  await db.insert(schema.boilerFirings).values(
    DEMO_FIRINGS.map((f, i) => ({
      id: `demo-firing-${time.weekStart}-${i + 1}`,
      plantId,
      boilerId: f.boilerId,
      fromAt: instantOf(time, f.from),
      toAt: instantOf(time, f.to),
      share: f.share,
      reason: f.reason,
      authorId: utilitiesLead,
    })),
  );
  await db.insert(schema.orders).values(nets.map((parts) => orderRow(parts, time, scope)));
  if (!emptyPlanId) await db.insert(schema.plans).values({ id: planId, plantId, weekStart: time.weekStart });
  const activities = nets.flatMap((parts) => parts.activities.map((a) => activityRow(a, parts, planId, time, scope)));
  for (const rows of chunks(activities)) await db.insert(schema.activities).values(rows);
  const links = nets.flatMap((parts) => parts.links.map((link) => linkRow(link, planId, scope)));
  for (const rows of chunks(links)) await db.insert(schema.links).values(rows);
}

type Scope = (id: string) => string;

function chunks<T>(rows: readonly T[]): T[][] {
  return Array.from({ length: Math.ceil(rows.length / CHUNK) }, (_, i) => rows.slice(i * CHUNK, (i + 1) * CHUNK));
}

const orderId = (parts: NetParts, scope: Scope): string => scope(`demo-order-${parts.net.code.toLowerCase()}`);

const orderRow = (parts: NetParts, time: WeekTime, scope: Scope) => ({
  id: orderId(parts, scope),
  plantId,
  number: `TH-${parts.net.code}`,
  productId: parts.net.product.id,
  quantityKg: parts.net.loads * 714,
  earliestAt: instantOf(time, parts.net.earliest),
  dueAt: instantOf(time, parts.net.due),
});

function activityRow(a: Activity, parts: NetParts, planId: string, time: WeekTime, scope: Scope) {
  const at = (minute: number | null | undefined) => (minute == null ? null : instantOf(time, minute));
  return {
    id: scope(a.id),
    plantId,
    planId,
    kind: a.kind,
    stage: a.stage,
    batchId: a.batchId && scope(a.batchId),
    orderId: orderId(parts, scope),
    code: a.code,
    title: a.title,
    productId: a.productId,
    familyId: a.familyId,
    modes: [...a.modes],
    unitId: a.placement?.unitId ?? null,
    startAt: at(a.placement?.start),
    fixing: a.fixing,
    occupiesUntilLinkId: a.occupiesUntil === 'end' ? null : scope(a.occupiesUntil.linkId),
    earliestAt: instantOf(time, a.earliestStart),
    latestStartAt: at(a.latestStart),
    dueAt: at(a.due),
    weight: a.weight,
    processDataId: a.processData?.id ?? null,
    movedBy: a.placement ? planner : null,
    movedAt: a.placement ? time.firstInstant : null,
  };
}

const scopedEnd = (end: LinkEnd, scope: Scope): LinkEnd => ({ ...end, activityId: scope(end.activityId) });

const linkRow = (link: Link, planId: string, scope: Scope) => ({
  ...link,
  id: scope(link.id),
  plantId,
  planId,
  from: scopedEnd(link.from, scope),
  to: scopedEnd(link.to, scope),
});

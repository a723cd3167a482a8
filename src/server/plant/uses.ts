import { and, eq, gt, gte, inArray, isNull, or, sql } from 'drizzle-orm';
import type { PlantLibraryDto, Thing, ThingKind } from '@/contracts/plantLibrary';
import type { Db } from '@/db/client';
import {
  activities,
  boilerFirings,
  calendarExceptions,
  cleaningRules,
  plans,
  products,
  routeModes,
  shifts,
  steamLimits,
} from '@/db/schema/index';

/** Where a thing is looked for: present and future weeks of its plant. */
export interface UsesQuery {
  readonly tx: Db;
  readonly plantId: string;
  readonly library: PlantLibraryDto;
  readonly now: Date;
  /** First day of the present week. */
  readonly weekStart: string;
}

const MOST_NAMED = 6;

/** 'A01-1, A01-2 and 7 more' */
export function named(names: readonly string[]): string {
  const shown = names.slice(0, MOST_NAMED).join(', ');
  return names.length > MOST_NAMED ? `${shown} and ${names.length - MOST_NAMED} more` : shown;
}

function inUseWhere<K extends ThingKind>(query: UsesQuery, kind: K, uses: (values: Thing<K>['values']) => boolean) {
  const things: readonly Thing<K>[] = query.library.things[kind];
  return things.filter(({ retiredAt, values }) => retiredAt === null && uses(values)).map(({ values }) => values);
}

function usesOfHeader(query: UsesQuery, id: string): string[] {
  const names = [
    ...inUseWhere(query, 'boilers', (boiler) => boiler.headerId === id),
    ...inUseWhere(query, 'units', (unit) => unit.headerId === id),
    ...inUseWhere(query, 'headers', (header) => header.feedFromHeaderId === id || header.flashFromHeaderId === id),
    ...inUseWhere(query, 'accumulators', (one) => one.chargedFromHeaderId === id || one.feedsHeaderId === id),
  ].map(({ name }) => name);
  const loads = inUseWhere(query, 'baseLoads', (load) => load.headerId === id);
  return [...names, ...loads.map(({ note }) => `base load “${note}”`)];
}

async function limitsOfHeader({ tx, plantId, now }: UsesQuery, id: string): Promise<string[]> {
  const set = await tx
    .select({ id: steamLimits.id })
    .from(steamLimits)
    .where(and(eq(steamLimits.plantId, plantId), eq(steamLimits.headerId, id), gt(steamLimits.toAt, now)));
  return set.length > 0 ? ['a steam limit set for this week or later'] : [];
}

async function firingsOfBoiler({ tx, plantId, now }: UsesQuery, id: string): Promise<string[]> {
  const lit = and(eq(boilerFirings.boilerId, id), gt(boilerFirings.toAt, now), gt(boilerFirings.share, 0));
  const rows = await tx
    .select({ reason: boilerFirings.reason })
    .from(boilerFirings)
    .where(and(eq(boilerFirings.plantId, plantId), lit));
  return rows.length > 0 ? [`firings of this week or later (${named(rows.map(({ reason }) => reason))})`] : [];
}

/** Batches of present and future weeks whose modes name the unit or the shared limit. */
async function planned({ tx, plantId, weekStart }: UsesQuery, contains: unknown, unitId?: string): Promise<string[]> {
  const byMode = sql`${activities.modes} @> ${JSON.stringify(contains)}::jsonb`;
  const rows = await tx
    .select({ code: activities.code, week: plans.weekStart })
    .from(activities)
    .innerJoin(plans, eq(plans.id, activities.planId))
    .where(
      and(
        eq(activities.plantId, plantId),
        gte(plans.weekStart, weekStart),
        unitId === undefined ? byMode : or(byMode, eq(activities.unitId, unitId)),
      ),
    )
    .orderBy(plans.weekStart, activities.code);
  const weeks = [...new Set(rows.map(({ week }) => week))];
  const codes = (week: string): string[] => rows.filter((row) => row.week === week).map(({ code }) => code);
  return weeks.map((week) => `${named(codes(week))} in the week of ${week}`);
}

async function routesOver({ tx, plantId }: UsesQuery, kind: 'unit' | 'limit', id: string): Promise<string[]> {
  const uses = sql`${routeModes.uses} @> ${JSON.stringify([{ limitId: id }])}::jsonb`;
  const rows = await tx
    .selectDistinct({ name: products.name })
    .from(routeModes)
    .innerJoin(products, eq(products.id, routeModes.productId))
    .where(
      and(
        eq(routeModes.plantId, plantId),
        isNull(products.retiredAt),
        kind === 'unit' ? eq(routeModes.unitId, id) : uses,
      ),
    )
    .orderBy(products.name);
  return rows.length > 0 ? [`routes of ${named(rows.map(({ name }) => name))}`] : [];
}

async function cleaningsOver({ tx, plantId }: UsesQuery, limitId: string): Promise<string[]> {
  const uses = sql`${cleaningRules.uses} @> ${JSON.stringify([{ limitId }])}::jsonb`;
  const rows = await tx
    .select({ id: cleaningRules.id })
    .from(cleaningRules)
    .where(and(eq(cleaningRules.plantId, plantId), uses));
  return rows.length > 0 ? [`${rows.length} cleaning rules`] : [];
}

async function exceptionsOf({ tx, plantId, now }: UsesQuery, unitId: string): Promise<string[]> {
  const rows = await tx
    .select({ reason: calendarExceptions.reason })
    .from(calendarExceptions)
    .where(
      and(
        eq(calendarExceptions.plantId, plantId),
        inArray(calendarExceptions.unitId, [unitId]),
        gt(calendarExceptions.toAt, now),
      ),
    );
  return rows.map(({ reason }) => `the calendar (${reason})`);
}

async function shiftsOf({ tx, plantId }: UsesQuery, lineId: string): Promise<string[]> {
  const rows = await tx
    .select({ name: shifts.name, lineIds: shifts.lineIds })
    .from(shifts)
    .where(eq(shifts.plantId, plantId));
  return rows.filter(({ lineIds }) => lineIds?.includes(lineId)).map(({ name }) => name);
}

/** What still uses a thing in present and future weeks, in words; empty where it can be retired. */
export async function usesOf(query: UsesQuery, kind: ThingKind, id: string): Promise<string[]> {
  switch (kind) {
    case 'headers':
      return [...usesOfHeader(query, id), ...(await limitsOfHeader(query, id))];
    case 'boilers':
      return firingsOfBoiler(query, id);
    case 'units':
      return [
        ...(await planned(query, [{ unitId: id }], id)),
        ...(await routesOver(query, 'unit', id)),
        ...(await exceptionsOf(query, id)),
      ];
    case 'ventGroups':
      return inUseWhere(query, 'units', (unit) => unit.ventGroupId === id).map(({ name }) => name);
    case 'sharedLimits':
      return [
        ...(await planned(query, [{ uses: [{ limitId: id }] }])),
        ...(await routesOver(query, 'limit', id)),
        ...(await cleaningsOver(query, id)),
      ];
    case 'lines':
      return [
        ...inUseWhere(query, 'units', (unit) => unit.lineId === id).map(({ name }) => name),
        ...(await shiftsOf(query, id)),
      ];
    case 'accumulators':
    case 'baseLoads':
      return [];
  }
}

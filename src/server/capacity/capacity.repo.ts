import { and, asc, eq, gt, isNotNull, lt, sql } from 'drizzle-orm';
import { LOOK_BACK_MIN } from '@/core/house/readiness';
import type { Db } from '@/db/client';
import {
  activities,
  baseLoads,
  boilerFirings,
  boilers,
  headers,
  orders,
  plans,
  plants,
  steamLimits,
} from '@/db/schema/index';
import { inUseIn } from '../weeks/inUse';
import { instantOf, type WeekTime } from '../weeks/weekTime';

export type CapacityRows = Awaited<ReturnType<typeof capacityRows>>;
export type BoilerRow = CapacityRows['boilers'][number];
export type FiringRow = CapacityRows['firings'][number];
export type LimitRow = CapacityRows['limits'][number];

async function plantRow(tx: Db, plantId: string) {
  const [plant] = await tx
    .select({
      altitudeM: plants.altitudeM,
      reserveFraction: plants.reserveFraction,
      fuelPricePerKWh: plants.fuelPricePerKWh,
      currency: plants.currency,
    })
    .from(plants)
    .where(eq(plants.id, plantId));
  if (!plant) throw new Error(`no plant ${plantId}`);
  return plant;
}

/** Firings of the week, and those before it that say how warm a boiler is. */
function firingsOf(tx: Db, plantId: string, time: WeekTime) {
  const lookBack = instantOf(time, -LOOK_BACK_MIN);
  const touches = and(lt(boilerFirings.fromAt, time.endInstant), gt(boilerFirings.toAt, lookBack));
  return tx
    .select()
    .from(boilerFirings)
    .where(and(eq(boilerFirings.plantId, plantId), touches))
    .orderBy(asc(boilerFirings.sequence));
}

function limitsOf(tx: Db, plantId: string, time: WeekTime) {
  const touches = and(lt(steamLimits.fromAt, time.endInstant), gt(steamLimits.toAt, time.firstInstant));
  return tx
    .select()
    .from(steamLimits)
    .where(and(eq(steamLimits.plantId, plantId), touches))
    .orderBy(asc(steamLimits.sequence));
}

/** Product of the orders of which anything is placed in the week. [kg] */
export async function placedKg(tx: Db, plantId: string, time: WeekTime): Promise<number> {
  const placed = tx
    .selectDistinct({ orderId: activities.orderId })
    .from(activities)
    .innerJoin(plans, eq(plans.id, activities.planId))
    .where(and(eq(plans.plantId, plantId), eq(plans.weekStart, time.weekStart), isNotNull(activities.startAt)));
  const [sum] = await tx
    .select({ kg: sql<number>`coalesce(sum(${orders.quantityKg}), 0)`.mapWith(Number) })
    .from(orders)
    .where(and(eq(orders.plantId, plantId), sql`${orders.id} in ${placed}`));
  return sum?.kg ?? 0;
}

/** All that the capacity of a plant's week is made of; what was said later comes later. */
export async function capacityRows(tx: Db, plantId: string, time: WeekTime) {
  const plant = await plantRow(tx, plantId);
  const headerRows = await tx
    .select()
    .from(headers)
    .where(eq(headers.plantId, plantId))
    .orderBy(asc(headers.position), asc(headers.id));
  const boilerRows = await tx
    .select()
    .from(boilers)
    .where(eq(boilers.plantId, plantId))
    .orderBy(asc(boilers.position), asc(boilers.id));
  const firings = await firingsOf(tx, plantId, time);
  const limits = await limitsOf(tx, plantId, time);
  const base = await tx.select().from(baseLoads).where(eq(baseLoads.plantId, plantId)).orderBy(asc(baseLoads.id));
  return {
    plant,
    headers: inUseIn(time, headerRows),
    boilers: inUseIn(time, boilerRows),
    firings,
    limits,
    baseLoads: inUseIn(time, base),
  };
}

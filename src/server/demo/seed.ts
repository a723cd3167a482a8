import { and, eq } from 'drizzle-orm';
import type { Db } from '../../db/client';
import { activities, plans, plants } from '../../db/schema';
import { weekStartOf, weekTimeOf } from '../weeks/weekTime';
import { insertDemoPlant } from './plantRows';
import { DEMO_PLANT } from './plant';
import { insertDemoWeek } from './weekRows';

/** Writes the demo plant once, and the week that `now` lies in once; says what it wrote. */
export async function seedDemo(db: Db, now: Date): Promise<string> {
  return db.transaction(async (tx) => {
    const plant = await tx.query.plants.findFirst({ where: eq(plants.id, DEMO_PLANT.id) });
    if (!plant) await insertDemoPlant(tx, now);
    const rule = { timeZone: plant?.timeZone ?? DEMO_PLANT.timeZone, weekStartsOn: plant?.weekStartsOn ?? 1 };
    const weekStart = weekStartOf(now, rule);
    const plan = await tx.query.plans.findFirst({
      where: and(eq(plans.plantId, DEMO_PLANT.id), eq(plans.weekStart, weekStart)),
    });
    const filled = plan && (await tx.query.activities.findFirst({ where: eq(activities.planId, plan.id) }));
    if (!filled) await insertDemoWeek(tx, weekTimeOf(weekStart, rule.timeZone), plan?.id ?? null);
    if (!plant) return `demo plant ${DEMO_PLANT.name} with the week of ${weekStart}`;
    return filled ? 'the demo plant is there' : `demo week of ${weekStart}`;
  });
}

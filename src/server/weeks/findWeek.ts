import { weekStartSchema } from '@/contracts/week';
import { fail, ok, type Result } from '@/core/result';
import { db, type Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import { now } from '../clock';
import { badInput, notFound, type HttpProblem } from '../http/problem';
import { ensurePlan, findPlan, type PlanRow } from '../plans/plans.repo';
import { plantRow, type PlantRow } from './plantParts.repo';
import { isWeekStart, minuteOf, weekStartOf, weekTimeOf, type WeekTime } from './weekTime';

const YEARS_KEPT = 5;
const YEAR_MIN = 365 * 1_440;

/** A week of a plant that exists. */
export interface FoundWeek {
  readonly plant: PlantRow;
  readonly time: WeekTime;
}

/** The week of the actor's plant that begins on a date; refuses what is no date, no week start, or out of reach. */
export async function findWeek(
  actor: Pick<Actor, 'plantId'>,
  weekStart: string,
  tx: Db = db,
): Promise<Result<FoundWeek, HttpProblem>> {
  if (!weekStartSchema.safeParse(weekStart).success) {
    return fail(badInput('INPUT-WEEK', 'Name a week by its first day, such as 2026-11-30.', 'week'));
  }
  const plant = await plantRow(tx, actor.plantId);
  if (!plant) return fail(notFound());
  const time = weekTimeOf(weekStart, plant.timeZone);
  if (!isWeekStart(weekStart, plant.weekStartsOn)) {
    const right = weekStartOf(time.firstInstant, plant);
    return fail(notFound(`No week of ${plant.name} begins on ${weekStart}; that day is in the week of ${right}.`));
  }
  if (Math.abs(minuteOf(time, now())) > YEARS_KEPT * YEAR_MIN) {
    return fail(notFound(`Weeks can be planned ${YEARS_KEPT} years around today; ${weekStart} is further away.`));
  }
  return ok({ plant, time });
}

/** The plan of a week that was found, made where there is none yet; `lock` keeps others from changing it. */
export async function planOf(tx: Db, week: FoundWeek, lock = false): Promise<PlanRow> {
  const { plant, time } = week;
  const found = await findPlan(tx, plant.id, time.weekStart, lock);
  if (found) return found;
  await ensurePlan(tx, plant.id, time.weekStart);
  const made = await findPlan(tx, plant.id, time.weekStart, lock);
  if (!made) throw new Error(`the plan of ${plant.id} ${time.weekStart} was made but is not there`);
  return made;
}

import { and, eq } from 'drizzle-orm';
import { parseDuty } from '@/contracts/dutyInputs';
import type { Duty, SteamSupply } from '@/core/duty/duty';
import { workOut } from '@/core/duty/model';
import { supplyOf } from '@/core/duty/supply';
import { evaluateWeek } from '@/core/pipeline';
import { drawnMode, type ActivityKind, type Mode } from '@/core/plant/activity';
import { fail, ok, type Result } from '@/core/result';
import type { SteamState } from '@/core/steam/steamState';
import { db } from '@/db/client';
import { activities, duties, headers, plans, plants, units } from '@/db/schema/index';
import type { Authorized } from '../auth/permissions';
import { notFound, withStatus, type HttpProblem } from '../http/problem';
import { findWeek, planOf } from '../weeks/findWeek';
import { weekOfPlan } from '../weeks/weekOfPlan';

type HeaderRow = typeof headers.$inferSelect;

/** A duty worked out on a header's steam. */
export interface WorkedDuty {
  readonly id: string;
  readonly name: string;
  readonly worked: Duty;
  /** Where typed or measured figures are from; null for a duty that is worked out. */
  readonly source: string | null;
}

/** How the kg/h of an activity came about. */
export interface ActivityWorking {
  readonly weekStart: string;
  readonly kind: ActivityKind;
  readonly code: string;
  readonly title: string;
  readonly unitName: string;
  /** As drawn, on whole minutes: a retort's phases after a short gap are those of a warm shell. */
  readonly mode: Mode;
  readonly header: Pick<HeaderRow, 'name' | 'pressureBarG'>;
  readonly steam: SteamState;
  /** null: the draw was typed in with the activity, without a duty behind it. */
  readonly duty: WorkedDuty | null;
}

/** How the kg/h of a duty come about on a header. */
export interface DutyWorking {
  readonly header: Pick<HeaderRow, 'id' | 'name' | 'pressureBarG'>;
  readonly steam: SteamState;
  readonly duty: WorkedDuty;
}

/** What is drawn without being stored: a cleaning that follows a run, a warm-up or an idle spell before one. */
const DERIVED = /^(clean|warm|idle):/;

/** The activity as the judged week draws it, with the week that it is in; null where the plant has none such. */
async function drawnIn(actor: Authorized<'plan.read'>, activityId: string) {
  const storedId = activityId.replace(DERIVED, '');
  const [found] = await db
    .select({ weekStart: plans.weekStart })
    .from(activities)
    .innerJoin(plans, eq(plans.id, activities.planId))
    .where(and(eq(activities.id, storedId), eq(activities.plantId, actor.plantId)));
  const week = found && (await findWeek(actor, found.weekStart));
  if (!found || !week?.ok) return null;
  const loaded = await weekOfPlan(db, week.value, await planOf(db, week.value));
  const activity = evaluateWeek(loaded.week).drawn.find(({ id }) => id === activityId);
  const mode = activity && drawnMode(activity);
  return activity && mode ? { activity, mode, weekStart: found.weekStart } : null;
}

/** The header of a unit of the plant. */
async function placeOf(plantId: string, unitId: string) {
  const [place] = await db
    .select({ unit: units, header: headers, altitudeM: plants.altitudeM })
    .from(units)
    .innerJoin(headers, eq(headers.id, units.headerId))
    .innerJoin(plants, eq(plants.id, units.plantId))
    .where(and(eq(units.id, unitId), eq(units.plantId, plantId)));
  return place ?? null;
}

/** The header's steam and the duty of an activity worked out anew from the plant's present data. */
export async function loadWorking(
  actor: Authorized<'plan.read'>,
  activityId: string,
): Promise<Result<ActivityWorking, HttpProblem>> {
  const found = await drawnIn(actor, activityId);
  const place = found && (await placeOf(actor.plantId, found.mode.unitId));
  if (!found || !place) return fail(notFound('There is no such activity on a steam header of your plant.'));
  const { activity, mode, weekStart } = found;
  const supply = supplyOf(place.header, place.altitudeM);
  if (!supply.ok) return fail(withStatus(409, supply.error));
  const duty = mode.dutyId === null ? ok(null) : await dutyOn(actor.plantId, mode.dutyId, supply.value);
  if (!duty.ok) return duty;
  const { name, pressureBarG } = place.header;
  return ok({
    weekStart,
    kind: activity.kind,
    code: activity.code,
    title: activity.title,
    unitName: place.unit.name,
    mode,
    header: { name, pressureBarG },
    steam: supply.value.header,
    duty: duty.value,
  });
}

/** A duty of the plant worked out on one of its headers; the first header where none is named. */
export async function loadDutyWorking(
  actor: Authorized<'library.read'>,
  dutyId: string,
  headerId: string | null,
): Promise<Result<DutyWorking, HttpProblem>> {
  const rows = await db
    .select({ header: headers, altitudeM: plants.altitudeM })
    .from(headers)
    .innerJoin(plants, eq(plants.id, headers.plantId))
    .where(eq(headers.plantId, actor.plantId))
    .orderBy(headers.position, headers.id);
  const place = headerId === null ? rows[0] : rows.find(({ header }) => header.id === headerId);
  if (!place) return fail(notFound('There is no such header at your plant.'));
  const supply = supplyOf(place.header, place.altitudeM);
  if (!supply.ok) return fail(withStatus(409, supply.error));
  const duty = await dutyOn(actor.plantId, dutyId, supply.value);
  if (!duty.ok) return duty;
  if (!duty.value) return fail(notFound('There is no such duty at your plant.'));
  const { id, name, pressureBarG } = place.header;
  return ok({ header: { id, name, pressureBarG }, steam: supply.value.header, duty: duty.value });
}

/** A stored duty, held to its model and worked out; null where the plant has none such. */
async function dutyOn(
  plantId: string,
  dutyId: string,
  supply: SteamSupply,
): Promise<Result<WorkedDuty | null, HttpProblem>> {
  const [row] = await db
    .select()
    .from(duties)
    .where(and(eq(duties.id, dutyId), eq(duties.plantId, plantId)));
  if (!row) return ok(null);
  const parsed = parseDuty(row.model, row.inputs);
  if (!parsed.ok) return fail(withStatus(409, parsed.error));
  const worked = workOut(parsed.value, supply);
  if (!worked.ok) return fail(withStatus(409, worked.error));
  const source = parsed.value.model === 'typed' ? parsed.value.inputs.source : null;
  return ok({ id: row.id, name: row.name, worked: worked.value, source });
}

import { and, eq } from 'drizzle-orm';
import { workOut, type DutyModel } from '@/core/duty/model';
import type { Duty } from '@/core/duty/duty';
import type { Mode } from '@/core/plant/activity';
import { ambientAtAltitude } from '@/core/quantity/pressure';
import { barGauge } from '@/core/quantity/units';
import { fail, ok, type Result } from '@/core/result';
import { steamState, type SteamState } from '@/core/steam/steamState';
import { db } from '@/db/client';
import { activities, duties, headers, plans, plants, units } from '@/db/schema/index';
import type { Authorized } from '../auth/permissions';
import { notFound, withStatus, type HttpProblem } from '../http/problem';

type HeaderRow = typeof headers.$inferSelect;

/** How the kg/h of an activity came about. */
export interface ActivityWorking {
  readonly weekStart: string;
  readonly code: string;
  readonly title: string;
  readonly unitName: string;
  /** As planned, on whole minutes. */
  readonly mode: Mode;
  readonly header: Pick<HeaderRow, 'name' | 'pressureBarG'>;
  readonly steam: SteamState;
  /** null: the draw was typed in with the activity, without a duty behind it. */
  readonly duty: { readonly name: string; readonly worked: Duty } | null;
}

/** An activity of the plant with the unit that it is drawn on and the header that feeds it. */
async function rowsOf(plantId: string, activityId: string) {
  const [found] = await db
    .select({ activity: activities, weekStart: plans.weekStart, altitudeM: plants.altitudeM })
    .from(activities)
    .innerJoin(plans, eq(plans.id, activities.planId))
    .innerJoin(plants, eq(plants.id, activities.plantId))
    .where(and(eq(activities.id, activityId), eq(activities.plantId, plantId)));
  if (!found) return null;
  const { unitId, modes } = found.activity;
  const mode = modes.find((m) => m.unitId === unitId) ?? modes[0];
  if (!mode) return null;
  const [place] = await db
    .select({ unit: units, header: headers })
    .from(units)
    .innerJoin(headers, eq(headers.id, units.headerId))
    .where(and(eq(units.id, mode.unitId), eq(units.plantId, plantId)));
  return place ? { ...found, ...place, mode } : null;
}

/** The header's steam and the duty of an activity worked out anew from the plant's present data. */
export async function loadWorking(
  actor: Authorized<'plan.read'>,
  activityId: string,
): Promise<Result<ActivityWorking, HttpProblem>> {
  const rows = await rowsOf(actor.plantId, activityId);
  if (!rows) return fail(notFound('There is no such activity on a steam header of your plant.'));
  const { activity, weekStart, altitudeM, unit, header, mode } = rows;
  const ambient = ambientAtAltitude(altitudeM);
  if (!ambient.ok) return fail(withStatus(409, ambient.error));
  const steam = steamState({
    pressure: barGauge(header.pressureBarG),
    quality:
      header.superheatK === null
        ? { kind: 'wet', dryness: header.dryness ?? 1 }
        : { kind: 'superheated', superheatK: header.superheatK },
    ambient: ambient.value,
  });
  if (!steam.ok) return fail(withStatus(409, steam.error));
  const duty = await dutyOf(actor.plantId, mode);
  const worked = duty && workOut(duty.model, { header: steam.value, ambient: ambient.value });
  if (worked && !worked.ok) return fail(withStatus(409, worked.error));
  return ok({
    weekStart,
    code: activity.code,
    title: activity.title,
    unitName: unit.name,
    mode,
    header: { name: header.name, pressureBarG: header.pressureBarG },
    steam: steam.value,
    duty: duty && worked ? { name: duty.name, worked: worked.value } : null,
  });
}

async function dutyOf(plantId: string, { dutyId }: Mode): Promise<{ name: string; model: DutyModel } | null> {
  if (dutyId === null) return null;
  const [row] = await db
    .select()
    .from(duties)
    .where(and(eq(duties.id, dutyId), eq(duties.plantId, plantId)));
  // The model checks its inputs itself, each against its range.
  return row ? { name: row.name, model: { model: row.model, inputs: row.inputs } as unknown as DutyModel } : null;
}

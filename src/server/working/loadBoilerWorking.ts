import { and, eq } from 'drizzle-orm';
import { boilerExport, type BoilerExport } from '@/core/duty/boilerExport';
import { boilerFigures } from '@/core/duty/boilerFigures';
import { EMISSION_FACTORS, fuelFor } from '@/core/duty/fuel';
import { supplyOf } from '@/core/duty/supply';
import type { Working } from '@/core/duty/working';
import { fail, ok, type Result } from '@/core/result';
import type { SteamState } from '@/core/steam/steamState';
import { db } from '@/db/client';
import { boilers, headers, plants } from '@/db/schema/index';
import type { Authorized } from '../auth/permissions';
import { notFound, withStatus, type HttpProblem } from '../http/problem';

export type BoilerRow = typeof boilers.$inferSelect;
type HeaderRow = typeof headers.$inferSelect;

/** A boiler's inputs as core names them. */
export const houseOf = (boiler: BoilerRow) => ({
  ...boiler,
  boilerPressureBarG: boiler.pressureBarG,
  feedTankPressureBarG: boiler.feedTankBarG,
});

/** How the kg/h that a boiler sends out come about, from the rating on its plate. */
export interface BoilerWorking {
  readonly boiler: BoilerRow;
  readonly header: Pick<HeaderRow, 'id' | 'name' | 'pressureBarG'>;
  readonly steam: SteamState;
  readonly worked: BoilerExport;
  /** Rise, least fire and stored steam; then fuel and carbon dioxide at full fire. */
  readonly further: readonly Working[];
  readonly fuelName: string;
  readonly altitudeM: number;
  readonly ambientBarA: number;
}

/** A boiler of the plant with the header that it feeds. */
async function rowsOf(plantId: string, boilerId: string) {
  const [found] = await db
    .select({ boiler: boilers, header: headers, altitudeM: plants.altitudeM })
    .from(boilers)
    .innerJoin(headers, eq(headers.id, boilers.headerId))
    .innerJoin(plants, eq(plants.id, boilers.plantId))
    .where(and(eq(boilers.id, boilerId), eq(boilers.plantId, plantId)));
  return found ?? null;
}

/** A boiler's chain from rating to net export, worked out anew from the plant's present data. */
export async function loadBoilerWorking(
  actor: Authorized<'plan.read'>,
  boilerId: string,
): Promise<Result<BoilerWorking, HttpProblem>> {
  const rows = await rowsOf(actor.plantId, boilerId);
  if (!rows) return fail(notFound('There is no such boiler at your plant.'));
  const { boiler, header } = rows;
  const supply = supplyOf(header, rows.altitudeM);
  if (!supply.ok) return fail(withStatus(409, supply.error));
  const worked = boilerExport(houseOf(boiler), supply.value);
  if (!worked.ok) return fail(withStatus(409, worked.error));
  const { netKgPerH, heatToWaterKW } = worked.value;
  const figures = boilerFigures({ ...houseOf(boiler), netKgPerH }, supply.value);
  if (!figures.ok) return fail(withStatus(409, figures.error));
  const factor = EMISSION_FACTORS[boiler.fuel];
  const fuel = fuelFor({ heatToWaterKW, efficiency: boiler.efficiency }, factor);
  if (!fuel.ok) return fail(withStatus(409, fuel.error));
  return ok({
    boiler,
    header: { id: header.id, name: header.name, pressureBarG: header.pressureBarG },
    steam: supply.value.header,
    worked: worked.value,
    further: [figures.value.working, fuel.value.working],
    fuelName: factor.name,
    altitudeM: rows.altitudeM,
    ambientBarA: supply.value.ambient,
  });
}

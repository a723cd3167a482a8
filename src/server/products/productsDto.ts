import type { CleaningRuleDto, ProductDto, ProductsDto, RouteStageDto } from '@/contracts/products';
import { parseDuty } from '@/contracts/dutyInputs';
import { DUTY_CATALOGUE } from '@/core/duty/catalogue';
import { steamOfPhases } from '@/core/duty/duty';
import type { DutyModel } from '@/core/duty/model';
import type { Db } from '@/db/client';
import { basisOf } from '../duties/dutiesDto';
import { dutyRows, headerRows, plantPlace, processDataInForce } from '../duties/duties.repo';
import * as repo from './products.repo';
import { readMark } from './readMark';
import { stageModes, type StageMode } from './stageModes';

/** A product's mark: what a form read of it. */
export const productMark = (row: repo.ProductRow): string => readMark({ ...row, retiredAt: row.retiredAt !== null });

/** A route's mark. */
export const routeMark = (rows: readonly repo.RouteRow[]): string =>
  readMark(rows.map((row) => ({ ...row, plantId: '' })));

/** A route's stages in order, each with the mode on every unit that it can run on. */
export function stagesOf(rows: readonly repo.RouteRow[], modeOf: StageMode): RouteStageDto[] {
  const positions = [...new Set(rows.map(({ position }) => position))].sort((a, b) => a - b);
  return positions.map((position) => {
    const here = rows.filter((row) => row.position === position);
    const [first] = here;
    return {
      stage: first?.stage ?? 'other',
      uses: first?.uses ?? [],
      units: here.map((row) => {
        const { unitId, dutyId, minutes, leadMin, afterMin } = row;
        const mode = modeOf(row);
        const worked = mode.ok ? { mode: mode.value, fault: null } : { mode: null, fault: mode.error.message };
        return { unitId, dutyId, minutes, leadMin, afterMin, ...worked };
      }),
    };
  });
}

const titleOf = (model: DutyModel['model']): string =>
  model === 'typed' ? 'typed draw' : DUTY_CATALOGUE[model].title.toLowerCase();

async function choicesOf(tx: Db, plantId: string, altitudeM: number): Promise<ProductsDto['choices']> {
  const headers = await headerRows(tx, plantId);
  const units = await repo.unitRows(tx, plantId);
  const duties = (await dutyRows(tx, plantId)).filter(({ retiredAt }) => retiredAt === null);
  return {
    altitudeM,
    units: units.map(({ unit: { id, name, kind, headerId }, lineName }) => ({ id, name, kind, lineName, headerId })),
    duties: duties.map(({ id, name, model, inputs }) => {
      const parsed = parseDuty(model, inputs);
      return { id, name, title: titleOf(model), duty: parsed.ok ? parsed.value : null };
    }),
    limits: await repo.limitRows(tx, plantId),
    headers: headers.map(({ id, name, pressureBarG, dryness, superheatK }) => {
      return { id, name, pressureBarG, dryness, superheatK };
    }),
  };
}

const cleaningDto = (row: Awaited<ReturnType<typeof repo.cleaningRows>>[number]): CleaningRuleDto => {
  const { unitKind, fromFamilyId, toFamilyId, minutes, kind, dutyId, uses, phases } = row;
  const greatestKgPerH = Math.max(0, ...phases.map(({ steamKgPerH }) => steamKgPerH));
  return {
    unitKind,
    fromFamilyId,
    toFamilyId,
    minutes,
    kind,
    dutyId,
    uses,
    steamKg: steamOfPhases(phases),
    greatestKgPerH,
  };
};

/** Products with their routes, families and cleaning, and what their forms choose from. */
export async function productsDto(tx: Db, plantId: string): Promise<ProductsDto | null> {
  const place = await plantPlace(tx, plantId);
  if (!place) return null;
  const rows = await repo.productRows(tx, plantId);
  const routes = await repo.routeRows(tx, plantId);
  const modeOf = await stageModes(tx, plantId);
  const processData = await processDataInForce(tx, plantId);
  const planned = await repo.plannedRuns(tx, plantId);
  return {
    families: await repo.familyRows(tx, plantId),
    products: rows.map((row) => productDto(row, { routes, modeOf, processData, planned })),
    choices: await choicesOf(tx, plantId, place.altitudeM),
    cleaning: (await repo.cleaningRows(tx, plantId)).map(cleaningDto),
  };
}

interface Around {
  readonly routes: readonly repo.RouteRow[];
  readonly modeOf: StageMode;
  readonly processData: Awaited<ReturnType<typeof processDataInForce>>;
  readonly planned: ReadonlyMap<string, number>;
}

function productDto(row: repo.ProductRow, { routes, modeOf, processData, planned }: Around): ProductDto {
  const route = routes.filter(({ productId }) => productId === row.id);
  const data = processData.find(({ productId }) => productId === row.id);
  const { id, name, familyId, containerKg, fillKg, casePieces, initialC } = row;
  return {
    ...{ id, name, familyId, containerKg, fillKg, casePieces, initialC },
    basis: basisOf(row),
    isRetired: row.retiredAt !== null,
    read: productMark(row),
    stages: stagesOf(route, modeOf),
    routeRead: routeMark(route),
    processData: data
      ? {
          productId: id,
          productName: name,
          document: data.document,
          issue: data.issue,
          values: data.values,
          isReleased: data.releasedAt !== null,
        }
      : null,
    plannedRuns: planned.get(id) ?? 0,
  };
}

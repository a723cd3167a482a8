import type { DutiesDto, DutyDto, DutyUseDto } from '@/contracts/duties';
import { STAGE_NAMES } from '@/contracts/products';
import { parseDuty } from '@/contracts/dutyInputs';
import type { FoodComposition, SpecificHeatBasis } from '@/core/duty/specificHeat';
import type { Db } from '@/db/client';
import { namesOf } from '../people/people.repo';
import * as repo from './duties.repo';

type RouteUse = Awaited<ReturnType<typeof repo.routeUses>>[number];
type CleaningUse = Awaited<ReturnType<typeof repo.cleaningUses>>[number];

/** All that tells who uses which duty. */
interface Uses {
  readonly routes: readonly RouteUse[];
  readonly cleaning: readonly CleaningUse[];
  readonly planned: ReadonlyMap<string, number>;
  readonly headerOfKind: ReadonlyMap<string, string>;
}

/** Reads who uses the plant's duties. */
export async function readUses(tx: Db, plantId: string): Promise<Uses> {
  return {
    routes: await repo.routeUses(tx, plantId),
    cleaning: await repo.cleaningUses(tx, plantId),
    planned: await repo.plannedUses(tx, plantId),
    headerOfKind: await repo.headerOfKinds(tx, plantId),
  };
}

/** What uses a duty, each once, in words. */
export function usesOf(dutyId: string, { routes, cleaning, planned }: Uses): DutyUseDto[] {
  const stages = new Map<string, DutyUseDto>();
  for (const use of routes.filter((route) => route.dutyId === dutyId)) {
    const text = `${use.productName}, ${STAGE_NAMES[use.stage]}`;
    stages.set(`${use.productId} ${use.position}`, { kind: 'route', text, href: `/products/${use.productId}` });
  }
  const rules = cleaning.filter((rule) => rule.dutyId === dutyId).length;
  const count = planned.get(dutyId) ?? 0;
  return [
    ...stages.values(),
    ...(rules > 0
      ? [{ kind: 'cleaning' as const, text: counted(rules, 'cleaning rule'), href: '/products/cleaning' }]
      : []),
    ...(count > 0
      ? [{ kind: 'plan' as const, text: `${counted(count, 'run')} planned and not yet started`, href: null }]
      : []),
  ];
}

const counted = (count: number, what: string): string => `${count} ${what}${count === 1 ? '' : 's'}`;

/** Headers that a duty is drawn on, each once. */
export function headersOfDuty(dutyId: string, { routes, cleaning, headerOfKind }: Uses): string[] {
  const ofRoutes = routes.filter((route) => route.dutyId === dutyId).map((route) => route.headerId);
  const ofRules = cleaning.filter((rule) => rule.dutyId === dutyId).map((rule) => headerOfKind.get(rule.unitKind));
  return [...new Set([...ofRoutes, ...ofRules].flatMap((id) => id ?? []))];
}

/** Where a product's specific heat comes from: as entered for it, else its composition. */
export function basisOf(product: {
  readonly composition: Record<string, number>;
  readonly specificHeat: SpecificHeatBasis | null;
}): SpecificHeatBasis {
  return product.specificHeat ?? { kind: 'composition', composition: compositionOf(product.composition) };
}

/** Fractions by their names; what is not there is 0. */
export function compositionOf(stored: Readonly<Record<string, number>>): FoodComposition {
  const of = (name: keyof FoodComposition): number => stored[name] ?? 0;
  const [water, protein, fat] = [of('water'), of('protein'), of('fat')];
  return { water, protein, fat, carbohydrate: of('carbohydrate'), fibre: of('fibre'), ash: of('ash') };
}

/** Every duty of the plant with what a form needs beside it. */
export async function dutiesDto(tx: Db, plantId: string): Promise<DutiesDto | null> {
  const place = await repo.plantPlace(tx, plantId);
  if (!place) return null;
  const rows = await repo.dutyRows(tx, plantId);
  const headers = await repo.headerRows(tx, plantId);
  const uses = await readUses(tx, plantId);
  const processData = await repo.processDataInForce(tx, plantId);
  const names = await namesOf(
    tx,
    rows.flatMap((row) => row.changedBy ?? []),
  );
  return {
    ...place,
    headers: headers.map(({ id, name, pressureBarG, dryness, superheatK }) => {
      return { id, name, pressureBarG, dryness, superheatK };
    }),
    products: (await repo.productRows(tx, plantId)).map((row) => ({ id: row.id, name: row.name, basis: basisOf(row) })),
    duties: rows.map((row) => dutyDto(row, uses, processData, names)),
  };
}

function dutyDto(
  row: repo.DutyRow,
  uses: Uses,
  processData: Awaited<ReturnType<typeof repo.processDataInForce>>,
  names: ReadonlyMap<string, string>,
): DutyDto {
  const parsed = parseDuty(row.model, row.inputs);
  const products = new Map(
    uses.routes.filter(({ dutyId }) => dutyId === row.id).map(({ productId, productName }) => [productId, productName]),
  );
  return {
    id: row.id,
    name: row.name,
    model: row.model,
    duty: parsed.ok ? parsed.value : null,
    fault: parsed.ok ? null : parsed.error.message,
    revision: row.revision,
    changedBy: row.changedBy === null ? null : (names.get(row.changedBy) ?? 'somebody who has left'),
    changedAt: row.changedAt?.toISOString() ?? null,
    isRetired: row.retiredAt !== null,
    headerId: headersOfDuty(row.id, uses)[0] ?? null,
    uses: usesOf(row.id, uses),
    processData: [...products].flatMap(([productId, productName]) => {
      const found = processData.find((data) => data.productId === productId);
      if (!found) return [];
      const { document, issue, values, releasedAt } = found;
      return [{ productId, productName, document, issue, values, isReleased: releasedAt !== null }];
    }),
  };
}

import type { PlantModel } from '../plant/plant';

const pathsByPlant = new WeakMap<PlantModel, ReadonlyMap<string, readonly string[]>>();

/**
 * The header and every header that feeds it through letdowns, upwards. A draw counts on all of them: the mass is
 * unchanged over a valve. A ring of letdowns ends where it would repeat.
 */
export function feedPath(plant: PlantModel, headerId: string): readonly string[] {
  const path: string[] = [];
  let header = plant.headers.find((h) => h.id === headerId);
  while (header && !path.includes(header.id)) {
    path.push(header.id);
    const feed = header.feed;
    header = feed.kind === 'letdown' ? plant.headers.find((h) => h.id === feed.fromHeaderId) : undefined;
  }
  return path;
}

/** The headers that a unit's draw counts on, its own first; none where it has no header. */
export function headersOfUnit(plant: PlantModel, unitId: string): readonly string[] {
  let paths = pathsByPlant.get(plant);
  if (!paths) {
    paths = new Map(plant.units.map((unit) => [unit.id, unit.headerId ? feedPath(plant, unit.headerId) : []]));
    pathsByPlant.set(plant, paths);
  }
  return paths.get(unitId) ?? [];
}

/** True where a draw of the unit counts on the header, directly or through letdowns. */
export function countsOn(plant: PlantModel, unitId: string, headerId: string): boolean {
  return headersOfUnit(plant, unitId).includes(headerId);
}

const plainByPlant = new WeakMap<PlantModel, PlantModel>();

/**
 * The same plant without flash and accumulators: every draw counts in full on all headers above it. Levelling places on
 * this one; both only ever take load off a header that is over, so what fits here fits on the plant as it is. The same
 * value each time, and the plant itself where it has neither.
 */
export function plainNetwork(plant: PlantModel): PlantModel {
  if (!plant.accumulators?.length && !plant.headers.some((header) => header.flash)) return plant;
  let plain = plainByPlant.get(plant);
  if (!plain) {
    plain = { ...plant, headers: plant.headers.map((header) => ({ ...header, flash: null })), accumulators: [] };
    plainByPlant.set(plant, plain);
  }
  return plain;
}

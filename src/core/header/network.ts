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

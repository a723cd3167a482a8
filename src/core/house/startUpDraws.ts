import { placedPhases } from '../demand/activityLoad';
import type { Activity } from '../plant/activity';
import type { PlantModel } from '../plant/plant';

/** The first steam of a machine's warm-up or of a run. */
export interface StartUpDraw {
  readonly headerId: string;
  readonly unitId: string;
  readonly activityId: string;
  readonly kind: 'warmUp' | 'steamOn';
  readonly fromMin: number;
  /** End of the warm-up, or of the phase that steam is first on for. */
  readonly toMin: number;
}

/** What draws first on each unit's own header, by time: warm-ups apart from runs; nothing of what draws no steam. */
export function startUpDraws(plant: PlantModel, activities: readonly Activity[]): StartUpDraw[] {
  const headerOf = new Map(plant.units.map((unit) => [unit.id, unit.headerId]));
  return activities.flatMap((activity) => drawsOf(activity, headerOf)).sort((a, b) => a.fromMin - b.fromMin);
}

function drawsOf(activity: Activity, headerOf: ReadonlyMap<string, string | null>): StartUpDraw[] {
  const unitId = activity.placement?.unitId;
  const headerId = unitId === undefined ? undefined : headerOf.get(unitId);
  if (unitId === undefined || !headerId || activity.kind === 'idle') return [];
  const drawing = placedPhases(activity)
    .filter((phase) => phase.steamKgPerH > 0)
    .sort((a, b) => a.from - b.from);
  const isWarmUp = (kind: string) => activity.kind === 'warmUp' || kind === 'warmUp';
  const warming = drawing.filter((phase) => isWarmUp(phase.kind));
  const [first] = drawing.filter((phase) => !isWarmUp(phase.kind));
  const shared = { headerId, unitId, activityId: activity.id };
  const [warm] = warming;
  return [
    ...(warm ? [{ ...shared, kind: 'warmUp' as const, fromMin: warm.from, toMin: warming.at(-1)?.to ?? warm.to }] : []),
    ...(first ? [{ ...shared, kind: 'steamOn' as const, fromMin: first.from, toMin: first.to }] : []),
  ];
}

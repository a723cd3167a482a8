import type { PlantModel } from '../plant/plant';
import { sayingIn, type Saying } from '../quantity/saying';

/**
 * A warning where a header's steam limit [kg/h] is above the greatest load that the study of a vent group on it has seen:
 * vents were never shown to reach their temperature beside so much. Null where it is not, or no study says.
 */
export function limitAboveStudy(
  plant: Pick<PlantModel, 'units' | 'ventGroups'>,
  headerId: string,
  limitKgPerH: number,
  say: Saying = sayingIn('si'),
): string | null {
  const onHeader = new Set(plant.units.filter((unit) => unit.headerId === headerId).map((unit) => unit.ventGroupId));
  const studied = plant.ventGroups.flatMap((group) => {
    const kgPerH = group.studyGreatestLoadKgPerH ?? null;
    return kgPerH === null || !onHeader.has(group.id) ? [] : [{ group, kgPerH }];
  });
  const least = studied.sort((a, b) => a.kgPerH - b.kgPerH || (a.group.id < b.group.id ? -1 : 1))[0];
  if (!least || limitKgPerH <= least.kgPerH) return null;
  const seen = `the study of ${least.group.name} (${least.group.source}) saw at most ${say.rate(least.kgPerH)}`;
  return `The limit of ${say.rate(limitKgPerH)} is above what was validated: ${seen}. Ask the quality lead.`;
}

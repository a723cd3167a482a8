import type { CapacityDto } from '@/contracts/capacity';
import type { Activity } from '@/core/plant/activity';
import type { PlantModel } from '@/core/plant/plant';
import type { StartUpNames } from './startUpWords';

/** Names of boilers, headers, units and activities for a sequence; an unknown one by its id. */
export function startUpNames(dto: CapacityDto, plant: PlantModel, drawn: readonly Activity[]): StartUpNames {
  const named = (list: readonly { readonly id: string; readonly name: string }[]) => (id: string) =>
    list.find((one) => one.id === id)?.name ?? id;
  return {
    boiler: named(dto.boilers),
    header: named(dto.headers),
    unit: named(plant.units),
    activity: (id) => {
      const found = drawn.find((activity) => activity.id === id);
      return found ? `${found.code} ${found.title}`.trim() : id;
    },
  };
}

import type { PlantModel } from '@/core/plant/plant';
import { ambientAtAltitude, STANDARD_ATMOSPHERE } from '@/core/quantity/pressure';
import type { PlantParts, PlantRow } from './plantParts.repo';
import { stepsByHour } from './weeklySteps';
import type { WeekTime } from './weekTime';

/** The plant as core knows it, for one week: hours of the week become elapsed minutes. */
export function plantModelOf(plant: PlantRow, parts: PlantParts, time: WeekTime): PlantModel {
  const ambient = ambientAtAltitude(plant.altitudeM);
  return {
    id: plant.id,
    name: plant.name,
    isDemo: plant.isDemo,
    ambientBarA: ambient.ok ? ambient.value : STANDARD_ATMOSPHERE,
    rules: {
      snapMinutes: plant.snapMinutes,
      reserveFraction: plant.reserveFraction,
      sagToleranceBar: plant.sagToleranceBar,
    },
    lines: parts.lines.map(({ id, name }) => ({ id, name })),
    units: parts.units.map(({ id, lineId, name, kind, headerId, ventGroupId }) => {
      return { id, lineId, name, kind, headerId, ventGroupId };
    }),
    ventGroups: parts.ventGroups.map(({ plantId: _plant, ...group }) => group),
    headers: parts.headers.map(({ id, name, pressureBarG, dryness, superheatK, feed }) => {
      return { id, name, pressureBarG, dryness, superheatK, feed };
    }),
    sharedLimits: parts.sharedLimits.map(({ id, name, unit, capacity }) => {
      return { id, name, unit, capacity: stepsByHour(time, capacity) };
    }),
    cleaning: parts.cleaning.map(({ id: _id, plantId: _plant, ...rule }) => rule),
  };
}

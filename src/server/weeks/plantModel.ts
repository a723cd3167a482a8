import type { Accumulator, PlantModel, VentGroup } from '@/core/plant/plant';
import { ambientAtAltitude, STANDARD_ATMOSPHERE } from '@/core/quantity/pressure';
import { inUseIn } from './inUse';
import type { PlantParts, PlantRow } from './plantParts.repo';
import { stepsByHour } from './weeklySteps';
import type { WeekTime } from './weekTime';

/** The plant as core knows it, for one week: hours of the week become elapsed minutes. */
export function plantModelOf(plant: PlantRow, parts: PlantParts, time: WeekTime): PlantModel {
  const ambient = ambientAtAltitude(plant.altitudeM);
  const inUse = <Row extends { readonly retiredAt: Date | null }>(rows: readonly Row[]) => inUseIn(time, rows);
  return {
    id: plant.id,
    name: plant.name,
    isDemo: plant.isDemo,
    ambientBarA: ambient.ok ? ambient.value : STANDARD_ATMOSPHERE,
    rules: {
      snapMinutes: plant.snapMinutes,
      reserveFraction: plant.reserveFraction,
      sagToleranceBar: plant.sagToleranceBar,
      ...(parts.practice ? { practice: parts.practice } : {}),
    },
    lines: inUse(parts.lines).map(({ id, name }) => ({ id, name })),
    units: inUse(parts.units).map(({ id, lineId, name, kind, headerId, ventGroupId }) => {
      return { id, lineId, name, kind, headerId, ventGroupId };
    }),
    ventGroups: inUse(parts.ventGroups).map(ventGroupOf),
    headers: inUse(parts.headers).map(({ id, name, pressureBarG, dryness, superheatK, feed, flash }) => {
      return { id, name, pressureBarG, dryness, superheatK, feed, flash };
    }),
    accumulators: inUse(parts.accumulators).map(accumulatorOf),
    sharedLimits: inUse(parts.sharedLimits).map(({ id, name, unit, capacity }) => {
      return { id, name, unit, capacity: stepsByHour(time, capacity) };
    }),
    cleaning: parts.cleaning.map(({ id: _id, plantId: _plant, ...rule }) => rule),
  };
}

function ventGroupOf(row: PlantParts['ventGroups'][number]): VentGroup {
  const { plantId: _plant, position: _position, retiredAt: _retired, ...group } = row;
  return group;
}

function accumulatorOf(row: PlantParts['accumulators'][number]): Accumulator {
  const { plantId: _plant, position: _position, retiredAt: _retired, ...accumulator } = row;
  return accumulator;
}

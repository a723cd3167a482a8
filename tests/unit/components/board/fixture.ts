import type { Activity, Mode, Phase } from '@/core/plant/activity';
import type { PlantModel, Unit } from '@/core/plant/plant';
import { activity as plainActivity } from '../../../support/builders';

/** An invented plant: two lines, three units. */
export function unit(id: string, lineId: string, name = id): Unit {
  return { id, lineId, name, kind: 'retort', headerId: 'main', ventGroupId: null };
}

export const PLANT: PlantModel = {
  id: 'plant',
  name: 'Invented plant',
  isDemo: true,
  ambientBarA: 1.013,
  rules: { snapMinutes: 5, reserveFraction: 0.1, sagToleranceBar: 0.3 },
  lines: [
    { id: 'a', name: 'Line A' },
    { id: 'empty', name: 'Line without units' },
    { id: 'b', name: 'Line B' },
  ],
  units: [unit('r1', 'a', 'Retort 1'), unit('r2', 'a', 'Retort 2'), unit('k1', 'b', 'Kettle 1')],
  ventGroups: [],
  headers: [],
  sharedLimits: [],
  cleaning: [],
};

export function phase(offsetMin: number, minutes: number, steamKgPerH: number): Phase {
  return { kind: 'run', offsetMin, minutes, steamKgPerH };
}

export function mode(unitId: string, minutes: number, phases: readonly Phase[] = []): Mode {
  return { unitId, minutes, phases, uses: [], dutyId: null };
}

export function activity(id: string, over: Partial<Activity> = {}): Activity {
  const modes = [mode('r1', 60), mode('r2', 60)];
  return plainActivity(id, { stage: 'retort', title: `Batch ${id}`, modes, placement: null, ...over });
}

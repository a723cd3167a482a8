import type { Activity, Phase } from '@/core/plant/activity';
import type { PlantModel } from '@/core/plant/plant';
import type { Week } from '@/core/schedule/week';
import { activity, capacity, flatMode, phase, plant, unit, ventGroup, week } from './builders';

/** Net export of the worked boiler chain (invented plant). [kg/h] */
export const NET_EXPORT_KG_PER_H = 3546.94;
/** Two steam blanchers running, worked batch A (invented plant). [kg/h] */
export const TWO_BLANCHERS_KG_PER_H = 1229.87;
/** A jacketed kettle's greatest draw, worked batch B (invented plant). [kg/h] */
export const KETTLE_PEAK_KG_PER_H = 340.9365;
/** 8 t of boiler water at 7 bar g, 11.03 kg per bar and tonne. [kg/bar] */
export const STORED_KG_PER_BAR = 8 * 11.03;

/** A still retort from steam on, worked batch C (invented plant). */
export const RETORT_PHASES: readonly Phase[] = [
  phase(0, 6, 1555.237, 'vent'),
  phase(6, 6, 359.2303, 'comeUp'),
  phase(12, 12, 217.2079, 'process'),
  phase(24, 26, 119.811, 'process'),
];

/** A retort load on its own retort. */
export function retortLoad(id: string, unitId: string, start: number, changes: Partial<Activity> = {}): Activity {
  return activity(id, {
    stage: 'retort',
    modes: [{ unitId, minutes: 50, phases: RETORT_PHASES, uses: [], dutyId: null }],
    placement: { unitId, start },
    ...changes,
  });
}

/** Retorts 1 to 4 on one manifold, a kettle, and a place for the two blanchers. */
export function cannery(changes: Partial<PlantModel> = {}): PlantModel {
  const retorts = [1, 2, 3, 4].map((n) => {
    return unit(`retort${n}`, { name: `Retort ${n}`, kind: 'retort', ventGroupId: 'manifold' });
  });
  const kettle = unit('kettle1', { name: 'Kettle 1', kind: 'kettle' });
  const blanchers = unit('blanchers', { name: 'Blanchers', kind: 'blancher' });
  return plant({ units: [...retorts, kettle, blanchers], ventGroups: [ventGroup('manifold')], ...changes });
}

/** Two blanchers running all week beside the activities given, under the boiler's export less a reserve. */
export function canneryWeek(activities: readonly Activity[], reserve = 0, changes: Partial<Week> = {}): Week {
  const blanchers = activity('blanch', { modes: [flatMode('blanchers', 10_080, TWO_BLANCHERS_KG_PER_H)] });
  return week({
    plant: cannery(),
    capacities: [capacity('main', NET_EXPORT_KG_PER_H * (1 - reserve))],
    activities: [blanchers, ...activities],
    ...changes,
  });
}

import type { HeaderJudgement } from '../header/judgement';
import type { Breach } from './breach';
import type { JudgedWeek } from './judged';
import { linkBreaches } from './linkBreaches';
import { processBreaches } from './processBreaches';
import { sharedBreaches } from './sharedBreaches';
import { steamBreaches } from './steamBreaches';
import { timeBreaches } from './timeBreaches';
import { ventPressureBreaches } from './ventPressure';

/** Every limit that a week passes: process limits first, then steam, shared limits and time, each in order of time. */
export function weekBreaches(judged: JudgedWeek, headers: readonly HeaderJudgement[]): Breach[] {
  const drawn = { plant: judged.week.plant, activities: judged.drawn };
  const found: Breach[] = [
    ...steamBreaches(headers, drawn),
    ...ventPressureBreaches(judged, headers),
    ...plainBreaches(judged),
  ];
  return found.sort(inOrder);
}

/** The limits that are judged without the load: process, shared, time. In no set order. */
export function plainBreaches(judged: JudgedWeek): Breach[] {
  return [...processBreaches(judged), ...linkBreaches(judged.week), ...sharedBreaches(judged), ...timeBreaches(judged)];
}

const CLASS_ORDER = { process: 0, steam: 1, shared: 2, time: 3 } as const;

function inOrder(a: Breach, b: Breach): number {
  return CLASS_ORDER[a.class] - CLASS_ORDER[b.class] || a.from - b.from || a.to - b.to || (a.id < b.id ? -1 : 1);
}

import { placedPhases } from '@/core/demand/activityLoad';
import type { Activity } from '@/core/plant/activity';
import type { FloorEventKind } from '@/core/shift/floorEvent';
import { instantOf, type WeekTime } from '../weeks/weekTime';

/** A start that the floor recorded: crates in, or steam on. */
export interface RecordedStart {
  readonly event: Extract<FloorEventKind, 'cratesIn' | 'steamOn'>;
  readonly happenedAt: Date;
}

const MS_PER_MINUTE = 60_000;

/**
 * How late (less than 0: early) a run was begun against the issue that the floor had: steam on against the first planned
 * draw, and only where that was not recorded, crates in against the planned start. A retort's crates wait at the door
 * before steam on, so its crates in say nothing. null where nothing says it. [min]
 */
export function deviationMin(issued: Activity, recorded: readonly RecordedStart[], time: WeekTime): number | null {
  if (!issued.placement) return null;
  const happened = (event: RecordedStart['event']) => recorded.find((one) => one.event === event)?.happenedAt;
  const [steamOn, cratesIn] = [happened('steamOn'), happened('cratesIn')];
  const draws = placedPhases(issued).filter(({ steamKgPerH }) => steamKgPerH > 0);
  if (steamOn && draws.length > 0) return apart(steamOn, Math.min(...draws.map(({ from }) => from)), time);
  if (cratesIn && issued.stage !== 'retort') return apart(cratesIn, issued.placement.start, time);
  return null;
}

function apart(happenedAt: Date, plannedMin: number, time: WeekTime): number {
  return (happenedAt.getTime() - instantOf(time, plannedMin).getTime()) / MS_PER_MINUTE;
}

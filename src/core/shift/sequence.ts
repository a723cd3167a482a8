import { placedPhases, type PlacedPhase } from '../demand/activityLoad';
import type { Activity, Fixing, Stage } from '../plant/activity';
import { drawnActivities } from '../schedule/judged';
import { occupation, type Occupation } from '../schedule/occupation';
import type { Week } from '../schedule/week';
import { indexOf } from '../schedule/weekIndex';
import type { Interval } from '../time/interval';
import type { FloorEventKind } from './floorEvent';

/** A moment as planned, by the name under which the floor records it. [min of the week] */
export interface PlannedEvent {
  readonly kind: FloorEventKind;
  readonly minute: number;
}

/** One row of a line's sequence. */
export interface ShiftRow {
  readonly activityId: string;
  readonly kind: Activity['kind'];
  readonly unitId: string;
  readonly unitName: string;
  readonly code: string;
  readonly title: string;
  readonly productId: string | null;
  readonly stage: Stage | null;
  readonly fixing: Fixing;
  readonly from: number;
  readonly to: number;
  /** In order of time. */
  readonly events: readonly PlannedEvent[];
}

/**
 * What a line has to do in a shift: activities that overlap it, cleanings included, idle spells and warm-ups not, in
 * order of start, then unit.
 */
export function shiftSequence(week: Week, lineId: string, shift: Interval): ShiftRow[] {
  const units = indexOf(week).units;
  return drawnActivities(week)
    .filter(({ kind }) => kind === 'stage' || kind === 'cleaning')
    .flatMap((activity): ShiftRow[] => {
      const taken = occupation(activity, week);
      const unit = taken && units.get(taken.unitId);
      if (!taken || unit?.lineId !== lineId || taken.to <= shift.from || taken.from >= shift.to) return [];
      return [row(activity, unit.name, taken, plannedEvents(activity, week))];
    })
    .sort((a, b) => a.from - b.from || (a.unitName < b.unitName ? -1 : a.unitName > b.unitName ? 1 : 0));
}

/**
 * The moments of a placed activity, from its phases, in the order of a retort's cycle; an activity that is no retort run has
 * only the first and the last: its start and when its unit is free.
 */
export function plannedEvents(activity: Activity, week: Week): PlannedEvent[] {
  const taken = occupation(activity, week);
  if (!taken) return [];
  const cycle = activity.stage === 'retort' ? retortEvents(placedPhases(activity)) : [];
  return [{ kind: 'cratesIn', minute: taken.from }, ...cycle, { kind: 'empty', minute: taken.to }];
}

function retortEvents(phases: readonly PlacedPhase[]): PlannedEvent[] {
  const drawing = phases.filter((phase) => phase.steamKgPerH > 0);
  const ofKind = (kind: PlacedPhase['kind']) => phases.filter((phase) => phase.kind === kind);
  const events = [
    at('steamOn', earliest(drawing)),
    at('ventsClosed', latest(ofKind('vent'))),
    at('timingStarted', earliest(ofKind('process'))),
    at('steamOff', latest(drawing)),
    at('cooled', latest(ofKind('cool'))),
  ];
  return events.filter((event) => event !== null);
}

/** The first planned moment at or after a minute; null where nothing is left. */
export function nextEvent(row: ShiftRow, minute: number): PlannedEvent | null {
  return row.events.find((event) => event.minute >= minute) ?? null;
}

function row(activity: Activity, unitName: string, taken: Occupation, events: readonly PlannedEvent[]): ShiftRow {
  return {
    activityId: activity.id,
    kind: activity.kind,
    unitId: taken.unitId,
    unitName,
    code: activity.code,
    title: activity.title,
    productId: activity.productId,
    stage: activity.stage,
    fixing: activity.fixing,
    from: taken.from,
    to: taken.to,
    events,
  };
}

function at(kind: FloorEventKind, minute: number | null): PlannedEvent | null {
  return minute === null ? null : { kind, minute };
}

function earliest(phases: readonly PlacedPhase[]): number | null {
  return phases.length === 0 ? null : Math.min(...phases.map((phase) => phase.from));
}

function latest(phases: readonly PlacedPhase[]): number | null {
  return phases.length === 0 ? null : Math.max(...phases.map((phase) => phase.to));
}

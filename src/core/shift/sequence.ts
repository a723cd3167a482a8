import { placedPhases, type PlacedPhase } from '../demand/activityLoad';
import type { Activity, Fixing, Stage } from '../plant/activity';
import { drawnActivities } from '../schedule/changeovers';
import { occupation, type Occupation } from '../schedule/occupation';
import type { Week } from '../schedule/week';
import { indexOf } from '../schedule/weekIndex';
import type { Interval } from '../time/interval';

/** Moments that the floor acts at or records. */
export type ShiftEventKind =
  'start' | 'cratesIn' | 'steamOn' | 'ventsClosed' | 'processTiming' | 'steamOff' | 'empty' | 'end';

/** A moment as planned. [min of the week] */
export interface ShiftEvent {
  readonly kind: ShiftEventKind;
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
  readonly events: readonly ShiftEvent[];
}

/** What a line has to do in a shift: activities that overlap it, cleanings included, in order of start, then unit. */
export function shiftSequence(week: Week, lineId: string, shift: Interval): ShiftRow[] {
  const units = indexOf(week).units;
  return drawnActivities(week)
    .flatMap((activity): ShiftRow[] => {
      const taken = occupation(activity, week);
      const unit = taken && units.get(taken.unitId);
      if (!taken || unit?.lineId !== lineId || taken.to <= shift.from || taken.from >= shift.to) return [];
      return [row(activity, unit.name, taken, plannedEvents(activity, week))];
    })
    .sort((a, b) => a.from - b.from || (a.unitName < b.unitName ? -1 : a.unitName > b.unitName ? 1 : 0));
}

/**
 * The moments of a placed activity, from its phases: a retort run has crates in, steam on, vents closed, process timing
 * started, steam off, empty; anything else start, steam on and steam off where it draws steam, and end.
 */
export function plannedEvents(activity: Activity, week: Week): ShiftEvent[] {
  const taken = occupation(activity, week);
  if (!taken) return [];
  const phases = placedPhases(activity);
  const retort = activity.stage === 'retort';
  const drawing = phases.filter((phase) => phase.steamKgPerH > 0);
  const events: (ShiftEvent | null)[] = [
    { kind: retort ? 'cratesIn' : 'start', minute: taken.from },
    at('steamOn', earliest(drawing)),
    retort ? at('ventsClosed', latest(phases.filter((phase) => phase.kind === 'vent'))) : null,
    retort ? at('processTiming', earliest(phases.filter((phase) => phase.kind === 'process'))) : null,
    at('steamOff', latest(drawing)),
    { kind: retort ? 'empty' : 'end', minute: taken.to },
  ];
  return events.filter((event) => event !== null);
}

/** The first planned moment at or after a minute; null where nothing is left. */
export function nextEvent(row: ShiftRow, minute: number): ShiftEvent | null {
  return row.events.find((event) => event.minute >= minute) ?? null;
}

function row(activity: Activity, unitName: string, taken: Occupation, events: readonly ShiftEvent[]): ShiftRow {
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

function at(kind: ShiftEventKind, minute: number | null): ShiftEvent | null {
  return minute === null ? null : { kind, minute };
}

function earliest(phases: readonly PlacedPhase[]): number | null {
  return phases.length === 0 ? null : Math.min(...phases.map((phase) => phase.from));
}

function latest(phases: readonly PlacedPhase[]): number | null {
  return phases.length === 0 ? null : Math.max(...phases.map((phase) => phase.to));
}

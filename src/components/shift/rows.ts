import type { ShiftRowDto } from '@/contracts/floor';
import type { Stage } from '@/core/plant/activity';
import type { FloorEventKind } from '@/core/shift/floorEvent';

/** An event of a row: as planned, and as it was if it has been. Minutes of the week. */
export interface RowEvent {
  readonly kind: FloorEventKind;
  readonly plannedMin: number;
  readonly happenedMin: number | null;
}

export interface RowState {
  readonly events: readonly RowEvent[];
  /** What is to be recorded next; null where all is done. */
  readonly next: RowEvent | null;
  readonly begun: boolean;
}

/** What a retort's supervisor records; crates in and cooled are for the plan. */
const RETORT_ACTIONS: ReadonlySet<FloorEventKind> = new Set([
  'steamOn',
  'ventsClosed',
  'timingStarted',
  'steamOff',
  'empty',
]);

/** The floor's name of an event; a unit that is no retort is only begun and emptied or, without a stage, cleaned. */
export function eventName(kind: FloorEventKind, stage: Stage | null): string {
  if (stage === null && kind === 'empty') return 'Clean';
  if (stage !== 'retort') return kind === 'cratesIn' ? 'Begun' : kind === 'empty' ? 'Empty' : kind;
  const names: Readonly<Record<FloorEventKind, string>> = {
    cratesIn: 'Crates in',
    steamOn: 'Steam on',
    ventsClosed: 'Vents closed',
    timingStarted: 'Process timing started',
    steamOff: 'Steam off',
    cooled: 'Cooled',
    empty: 'Empty',
  };
  return names[kind];
}

/** How a row stands: what was recorded counts; what the plan has before the last of it was passed over. */
export function rowState(row: ShiftRowDto): RowState {
  const isRetort = row.activity.stage === 'retort';
  const planned = row.planned.filter(({ kind }) => !isRetort || RETORT_ACTIONS.has(kind));
  const events = planned.map(({ kind, minute }) => ({
    kind,
    plannedMin: minute,
    happenedMin: row.events.findLast((event) => event.event === kind)?.minute ?? null,
  }));
  const last = events.findLastIndex((event) => event.happenedMin !== null);
  return { events, next: events[last + 1] ?? null, begun: row.events.length > 0 };
}

export interface RowGroups {
  readonly inHand: readonly ShiftRowDto[];
  readonly later: readonly ShiftRowDto[];
  readonly done: readonly ShiftRowDto[];
}

/** How long before its start a row is in hand. [min] */
const AHEAD_MIN = 30;

/** Rows that need a hand now, rows to come, rows that are done; each in the order given. */
export function groupRows(rows: readonly ShiftRowDto[], nowMin: number): RowGroups {
  const inHand: ShiftRowDto[] = [];
  const later: ShiftRowDto[] = [];
  const done: ShiftRowDto[] = [];
  for (const row of rows) {
    const state = rowState(row);
    if (!state.next) done.push(row);
    else if (state.begun || state.next.plannedMin <= nowMin + AHEAD_MIN) inHand.push(row);
    else later.push(row);
  }
  return { inHand, later, done };
}

/** 'in 9 min', 'now', 'late by 6 min'; beyond an hour and a half without the minutes' fuss. */
export function dueText(plannedMin: number, nowMin: number): string {
  const ahead = plannedMin - nowMin;
  if (ahead < 0) return `late by ${hoursAndMinutes(-ahead)}`;
  return ahead === 0 ? 'now' : `in ${hoursAndMinutes(ahead)}`;
}

/** 'late by 3 min', 'early by 2 min', 'on time' for what has happened. */
export function happenedText(plannedMin: number, happenedMin: number): string {
  const late = happenedMin - plannedMin;
  if (late === 0) return 'on time';
  return late > 0 ? `late by ${hoursAndMinutes(late)}` : `early by ${hoursAndMinutes(-late)}`;
}

function hoursAndMinutes(minutes: number): string {
  if (minutes < 90) return `${minutes} min`;
  return `${Math.floor(minutes / 60)} h ${String(minutes % 60).padStart(2, '0')}`;
}

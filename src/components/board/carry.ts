import type { Activity, Mode, Placement } from '../../core/plant/activity';
import { isDerived } from '../../core/schedule/derived';
import { unitAt, unitBeside, type Rows } from './rows';
import { clampStart, minuteAt, snap, type TimeScale } from './timeScale';

/** Where a carried activity would be put down. */
export interface Target {
  readonly unitId: string;
  readonly start: number;
  /** The activity can run on the unit. */
  readonly eligible: boolean;
}

/** An activity picked up, by hand or by keys, as it was then. Every target is worked out from that, so nothing drifts. */
export interface Carry {
  readonly by: 'hand' | 'keys';
  readonly activity: Activity;
  /** Where within the activity the hand took hold. [min] */
  readonly heldAtMin: number;
  /** null: nowhere on the board. */
  readonly target: Target | null;
}

/** A run of a batch. */
export function isRun(activity: Activity): boolean {
  return activity.kind === 'stage';
}

/** What a planner places: runs, and cleans that were added. The rest follows from the sequence on the units. */
export function isPlanned(activity: Activity): boolean {
  return isRun(activity) || (activity.kind === 'cleaning' && !isDerived(activity));
}

/** An activity that the floor has started, or that is drawn only, stays where it is. */
export function canCarry(activity: Activity): boolean {
  return isPlanned(activity) && (activity.fixing === 'free' || activity.fixing === 'fixed');
}

export function pickUp(activity: Activity, by: Carry['by'], heldAtMin = 0): Carry {
  const { placement } = activity;
  const target = placement && { unitId: placement.unitId, start: placement.start, eligible: true };
  return { by, activity, heldAtMin, target };
}

export function modeOn(activity: Activity, unitId: string): Mode | undefined {
  return activity.modes.find((mode) => mode.unitId === unitId);
}

const minutesOn = (activity: Activity, unitId: string): number =>
  (modeOn(activity, unitId) ?? activity.modes[0])?.minutes ?? 0;

/** The pointer over the rows: px from the week's first instant and from the first row. */
export interface Pointer {
  readonly x: number;
  readonly y: number;
  /** To the minute instead of the plant's snap. */
  readonly fine: boolean;
}

/** The carried activity under the hand. Between units it stays with the unit that it was over last. */
export function carryTo(carry: Carry, pointer: Pointer, rows: Rows, scale: TimeScale, snapMinutes: number): Carry {
  const unitId = unitAt(rows, pointer.y) ?? (insideRows(rows, pointer.y) ? carry.target?.unitId : undefined);
  if (unitId === undefined) return { ...carry, target: null };
  const start = snap(minuteAt(scale, pointer.x) - carry.heldAtMin, pointer.fine ? 1 : snapMinutes);
  return { ...carry, target: targetAt(carry.activity, unitId, start, scale.horizonMin) };
}

const insideRows = (rows: Rows, y: number): boolean => y >= 0 && y < rows.heightPx;

function targetAt(activity: Activity, unitId: string, start: number, horizonMin: number): Target {
  return {
    unitId,
    start: clampStart(start, minutesOn(activity, unitId), horizonMin),
    eligible: modeOn(activity, unitId) !== undefined,
  };
}

/** One step by keys: minutes along, or to the next unit above or below that the activity can run on. */
export function stepCarry(
  carry: Carry,
  step: { readonly minutes: number } | { readonly units: 1 | -1 },
  rows: Rows,
  horizonMin: number,
): Carry {
  const { target, activity } = carry;
  if (!target) return carry;
  if ('minutes' in step) {
    return { ...carry, target: targetAt(activity, target.unitId, target.start + step.minutes, horizonMin) };
  }
  const unitId = unitBeside(rows, target.unitId, step.units, (id) => modeOn(activity, id) !== undefined);
  return { ...carry, target: targetAt(activity, unitId, target.start, horizonMin) };
}

/** Where the activity is put down; null where that is nowhere, not eligible or where it was. */
export function putDown(carry: Carry): Placement | null {
  const { target, activity } = carry;
  if (!target?.eligible) return null;
  const { placement } = activity;
  if (placement?.unitId === target.unitId && placement.start === target.start) return null;
  return { unitId: target.unitId, start: target.start };
}

/** Where keys first hold an activity that is not yet placed: its first unit, at a minute or its earliest start. */
export function firstTarget(activity: Activity, atMinute: number, snapMinutes: number, horizonMin: number): Target {
  const mode = activity.modes[0];
  const start = Math.ceil(Math.max(atMinute, activity.earliestStart) / snapMinutes) * snapMinutes;
  return targetAt(activity, mode?.unitId ?? '', start, horizonMin);
}

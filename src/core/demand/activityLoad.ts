import { drawnMode, type Activity, type Phase, type PhaseKind } from '../plant/activity';
import type { Interval } from '../time/interval';

/** A phase where it stands in the week. [min, kg/h] */
export interface PlacedPhase extends Interval {
  readonly kind: PhaseKind;
  readonly steamKgPerH: number;
}

/**
 * Rates are added up in parts of 2^-20 kg/h (about a milligram an hour), so that sums come out the same in any order and an
 * added and removed draw leaves nothing behind.
 */
const PARTS_PER_KG_PER_H = 2 ** 20;

/** A rate rounded to the parts in which loads are added up. [kg/h] */
export function addableKgPerH(steamKgPerH: number): number {
  return Math.round(steamKgPerH * PARTS_PER_KG_PER_H) / PARTS_PER_KG_PER_H;
}

const phasesByActivity = new WeakMap<Activity, readonly PlacedPhase[]>();

/** The phases of a placed activity in minutes of the week, worked out once; none where it is not placed. */
export function placedPhases(activity: Activity): readonly PlacedPhase[] {
  let placed = phasesByActivity.get(activity);
  if (!placed) {
    placed = phasesInWeek(activity);
    phasesByActivity.set(activity, placed);
  }
  return placed;
}

function phasesInWeek(activity: Activity): PlacedPhase[] {
  const start = activity.placement?.start;
  if (start === undefined) return [];
  return (drawnMode(activity)?.phases ?? []).map((phase) => ({
    kind: phase.kind,
    from: start + phase.offsetMin,
    to: start + phase.offsetMin + phase.minutes,
    steamKgPerH: phase.steamKgPerH,
  }));
}

/** Steam of phases on the minute grid. [kg] */
export function phasesKg(phases: readonly Phase[]): number {
  return phases.reduce((kg, phase) => kg + (phase.steamKgPerH * phase.minutes) / 60, 0);
}

/** Greatest rate of phases; 0 where there are none. [kg/h] */
export function phasesPeakKgPerH(phases: readonly Phase[]): number {
  return phases.reduce((peak, phase) => Math.max(peak, phase.steamKgPerH), 0);
}

/** What an activity draws at a minute of the week; 0 outside its phases or not placed. [kg/h] */
export function drawAt(activity: Activity, minute: number): number {
  let kgPerH = 0;
  for (const phase of placedPhases(activity))
    if (phase.from <= minute && minute < phase.to) kgPerH += phase.steamKgPerH;
  return kgPerH;
}

/** When an activity first draws steam; null where it never does or is not placed. [min] */
export function steamOnMinute(activity: Activity): number | null {
  const drawing = placedPhases(activity).filter((phase) => phase.steamKgPerH > 0);
  return drawing.length === 0 ? null : Math.min(...drawing.map((phase) => phase.from));
}

/** Start to own end of a placed activity; null where it is not placed. [min] */
export function ownSpan(activity: Activity): Interval | null {
  const mode = drawnMode(activity);
  if (!activity.placement || !mode) return null;
  return { from: activity.placement.start, to: activity.placement.start + mode.minutes };
}

import type { Activity, Link, Mode, Phase } from '@/core/plant/activity';
import type { Header, HeaderCapacity, PlantModel, Unit, UnitKind, VentGroup } from '@/core/plant/plant';
import type { Week } from '@/core/schedule/week';

export const WEEK_MINUTES = 10_080;

/** A phase from its offset, length and rate. */
export function phase(offsetMin: number, minutes: number, steamKgPerH: number, kind: Phase['kind'] = 'run'): Phase {
  return { kind, offsetMin, minutes, steamKgPerH };
}

/** A mode on a unit that draws a flat rate for its whole length. */
export function flatMode(unitId: string, minutes: number, steamKgPerH: number): Mode {
  return { unitId, minutes, phases: [phase(0, minutes, steamKgPerH)], uses: [], dutyId: null };
}

/** A free stage run that can run on one unit for 60 minutes at 100 kg/h, placed at 0, unless told otherwise. */
export function activity(id: string, changes: Partial<Activity> = {}): Activity {
  const modes = changes.modes ?? [flatMode('unit1', 60, 100)];
  return {
    id,
    kind: 'stage',
    stage: 'other',
    batchId: null,
    code: id.toUpperCase(),
    title: `Product ${id}`,
    productId: null,
    familyId: null,
    modes,
    placement: { unitId: modes[0]?.unitId ?? 'unit1', start: 0 },
    fixing: 'free',
    occupiesUntil: 'end',
    earliestStart: 0,
    latestStart: null,
    due: null,
    weight: 1,
    processData: null,
    revision: 1,
    ...changes,
  };
}

/** A flow link from the end of one activity to the start of another. */
export function link(id: string, fromId: string, toId: string, changes: Partial<Link> = {}): Link {
  return {
    id,
    from: { activityId: fromId, anchor: 'end', offsetMin: 0 },
    to: { activityId: toId, anchor: 'start', offsetMin: 0 },
    leastMin: 0,
    greatestMin: null,
    rule: 'flow',
    greatestBreach: 'time',
    source: null,
    ...changes,
  };
}

export function unit(id: string, changes: Partial<Unit> = {}): Unit {
  const kind: UnitKind = 'other';
  return { id, lineId: 'line1', name: id, kind, headerId: 'main', ventGroupId: null, ...changes };
}

export function ventGroup(id: string, changes: Partial<VentGroup> = {}): VentGroup {
  return {
    id,
    name: `Manifold ${id}`,
    ventsAtOnce: 1,
    steamOnsAtOnce: 9,
    steamOnMinutes: 1,
    marginMinutes: 0,
    source: 'common practice, no source',
    ...changes,
  };
}

export function header(id: string, changes: Partial<Header> = {}): Header {
  return {
    id,
    name: `Header ${id}`,
    pressureBarG: 7,
    dryness: 0.98,
    superheatK: null,
    feed: { kind: 'boilers' },
    ...changes,
  };
}

/** A plant with one line, one unit and one header fed by boilers, unless told otherwise. */
export function plant(changes: Partial<PlantModel> = {}): PlantModel {
  return {
    id: 'plant1',
    name: 'Invented plant',
    isDemo: true,
    ambientBarA: 1.01325,
    rules: { snapMinutes: 5, reserveFraction: 0, sagToleranceBar: 0.5 },
    lines: [{ id: 'line1', name: 'Line 1' }],
    units: [unit('unit1')],
    ventGroups: [],
    headers: [header('main')],
    sharedLimits: [],
    cleaning: [],
    ...changes,
  };
}

/** A capacity with one limit for the whole week; no base load, rise and stored steam not known. */
export function capacity(
  headerId: string,
  limitKgPerH: number | null,
  changes: Partial<HeaderCapacity> = {},
): HeaderCapacity {
  const flat = limitKgPerH === null ? null : [{ from: 0, value: limitKgPerH }];
  return {
    headerId,
    exportKgPerH: flat,
    limitKgPerH: flat,
    baseLoadKgPerH: [],
    greatestRiseKgPerHPerMin: null,
    storedKgPerBar: null,
    ...changes,
  };
}

/** An empty week on {@link plant}, limit 1000 kg/h, no calendars: every unit always open. */
export function week(changes: Partial<Week> = {}): Week {
  return {
    horizonMin: WEEK_MINUTES,
    plant: plant(),
    calendars: [],
    capacities: [capacity('main', 1000)],
    activities: [],
    links: [],
    ...changes,
  };
}

/** The activity at a start on its first mode's unit, or on another. */
export function placedAt(source: Activity, start: number, unitId = source.modes[0]?.unitId ?? ''): Activity {
  return { ...source, placement: { ...source.placement, unitId, start } };
}

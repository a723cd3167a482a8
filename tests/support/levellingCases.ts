import type { Activity, Link, Mode, Phase } from '@/core/plant/activity';
import type { Header, PlantModel, Unit, VentGroup } from '@/core/plant/plant';
import type { Week } from '@/core/schedule/week';
import { activity as plainActivity } from './builders';

/** A phase: kind, minutes after the start, minutes, kg/h. */
export const phase = (kind: Phase['kind'], offsetMin: number, minutes: number, steamKgPerH: number): Phase => ({
  kind,
  offsetMin,
  minutes,
  steamKgPerH,
});

/** An activity with the parts that a case leaves open filled in. */
export function activity(id: string, parts: Partial<Activity> & { readonly modes: readonly Mode[] }): Activity {
  return plainActivity(id, { stage: 'retort', code: id, title: id, placement: null, revision: 3, ...parts });
}

export const mode = (unitId: string, minutes: number, phases: readonly Phase[] = []): Mode => ({
  unitId,
  minutes,
  phases,
  uses: [],
  dutyId: null,
});

export function link(id: string, from: string, to: string, leastMin: number, greatestMin: number | null): Link {
  return {
    id,
    from: { activityId: from, anchor: 'end', offsetMin: 0 },
    to: { activityId: to, anchor: 'start', offsetMin: 0 },
    leastMin,
    greatestMin,
    rule: 'flow',
    greatestBreach: 'time',
    source: null,
  };
}

export const unit = (id: string, kind: Unit['kind'], parts: Partial<Unit> = {}): Unit => ({
  id,
  lineId: 'line',
  name: id,
  kind,
  headerId: 'main',
  ventGroupId: null,
  ...parts,
});

export const MAIN: Header = {
  id: 'main',
  name: 'Main header',
  pressureBarG: 7,
  dryness: 0.98,
  superheatK: null,
  feed: { kind: 'boilers' },
};

export function ventGroup(parts: Partial<VentGroup> = {}): VentGroup {
  return {
    id: 'group',
    name: 'Group',
    ventsAtOnce: 1,
    steamOnsAtOnce: 9,
    steamOnMinutes: 1,
    marginMinutes: 0,
    source: 'common practice, no source',
    ...parts,
  };
}

/** A day with one header; everything else as the case has it. */
export function week(
  parts: {
    readonly activities: readonly Activity[];
    readonly links?: readonly Link[];
    readonly limitKgPerH?: number;
    readonly horizonMin?: number;
  } & Partial<Pick<Week, 'calendars' | 'capacities'>> &
    Partial<Pick<PlantModel, 'units' | 'ventGroups' | 'headers' | 'cleaning' | 'sharedLimits'>>,
): Week {
  return {
    horizonMin: parts.horizonMin ?? 1440,
    plant: {
      id: 'plant',
      name: 'Invented plant',
      isDemo: true,
      ambientBarA: 1.01325,
      rules: { snapMinutes: 5, reserveFraction: 0, sagToleranceBar: 1 },
      lines: [{ id: 'line', name: 'Line' }],
      units: parts.units ?? [],
      ventGroups: parts.ventGroups ?? [],
      headers: parts.headers ?? [MAIN],
      sharedLimits: parts.sharedLimits ?? [],
      cleaning: parts.cleaning ?? [],
    },
    calendars: parts.calendars ?? [],
    capacities: parts.capacities ?? [
      {
        headerId: 'main',
        exportKgPerH: null,
        limitKgPerH: parts.limitKgPerH === undefined ? null : [{ from: 0, value: parts.limitKgPerH }],
        baseLoadKgPerH: [{ from: 0, value: 0 }],
        greatestRiseKgPerHPerMin: null,
        storedKgPerBar: null,
      },
    ],
    activities: parts.activities,
    links: parts.links ?? [],
  };
}

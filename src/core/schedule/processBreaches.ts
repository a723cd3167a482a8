import { placedPhases, steamOnMinute } from '../demand/activityLoad';
import type { Activity } from '../plant/activity';
import type { VentGroup } from '../plant/plant';
import { mergeIntervals, type Interval } from '../time/interval';
import type { ProcessBreach } from './breach';
import type { JudgedWeek } from './judged';
import { occupation } from './occupation';
import { practiceBreaches } from './practiceBreaches';
import { usageOver, type Use } from './usage';
import { indexOf } from './weekIndex';

/** Vents and steam ons at once, unreleased process data, cleaning and practice rules; waits are judged with the links. */
export function processBreaches(judged: JudgedWeek): ProcessBreach[] {
  return [
    ...groupBreaches(judged),
    ...unreleasedData(judged),
    ...allergenCleaning(judged),
    ...practiceBreaches(judged),
  ];
}

/** When an activity vents, its margin not included; equal to no span where it does not vent or is not placed. */
export function ventSpans(activity: Activity): Interval[] {
  return mergeIntervals(placedPhases(activity).filter((phase) => phase.kind === 'vent'));
}

/** The span in which an activity's steam on counts; null where it is no retort run or draws no steam. */
export function steamOnSpan(activity: Activity, group: Pick<VentGroup, 'steamOnMinutes'>): Interval | null {
  const on = activity.stage === 'retort' ? steamOnMinute(activity) : null;
  return on === null ? null : { from: on, to: on + group.steamOnMinutes };
}

function groupBreaches(judged: JudgedWeek): ProcessBreach[] {
  const { units } = indexOf(judged.week);
  const members = new Map<string, Activity[]>();
  for (const activity of judged.drawn) {
    const groupId = units.get(activity.placement?.unitId ?? '')?.ventGroupId;
    if (groupId) members.set(groupId, [...(members.get(groupId) ?? []), activity]);
  }
  return judged.week.plant.ventGroups.flatMap((group) => {
    const activities = members.get(group.id) ?? [];
    return [
      ...atOnce('ventsAtOnce', group, ventUses(activities, group), group.ventsAtOnce),
      ...atOnce('steamOnsAtOnce', group, steamOnUses(activities, group), group.steamOnsAtOnce),
    ];
  });
}

function ventUses(activities: readonly Activity[], group: VentGroup): Use[] {
  return activities.flatMap((activity) =>
    ventSpans(activity).map(({ from, to }) => {
      return { activityId: activity.id, from, to: to + group.marginMinutes, amount: 1 };
    }),
  );
}

function steamOnUses(activities: readonly Activity[], group: VentGroup): Use[] {
  return activities.flatMap((activity) => {
    const span = steamOnSpan(activity, group);
    return span ? [{ activityId: activity.id, ...span, amount: 1 }] : [];
  });
}

function atOnce(
  code: 'ventsAtOnce' | 'steamOnsAtOnce',
  group: VentGroup,
  uses: readonly Use[],
  limit: number,
): ProcessBreach[] {
  return usageOver(uses, [{ from: -Infinity, value: limit }]).map((span) => ({
    id: `${code}:${group.id}:${span.from}`,
    class: 'process',
    code,
    from: span.from,
    to: span.to,
    activityIds: span.activityIds,
    found: span.found,
    limit,
    ventGroupId: group.id,
  }));
}

function unreleasedData({ week }: JudgedWeek): ProcessBreach[] {
  return week.activities.flatMap((activity): ProcessBreach[] => {
    const taken = occupation(activity, week);
    if (!taken || !activity.processData || activity.processData.released) return [];
    return [
      {
        id: `unreleasedData:${activity.id}`,
        class: 'process',
        code: 'unreleasedData',
        from: taken.from,
        to: taken.to,
        activityIds: [activity.id],
        found: null,
        limit: null,
        ventGroupId: null,
      },
    ];
  });
}

function allergenCleaning(judged: JudgedWeek): ProcessBreach[] {
  return judged.changeovers
    .filter(({ rule, availableMin }) => rule.kind === 'allergen' && availableMin < rule.minutes)
    .map(({ rule, from, availableMin, previousId, nextId, cleaning }) => ({
      id: `allergenCleaning:${previousId}`,
      class: 'process',
      code: 'allergenCleaning',
      from,
      to: from + rule.minutes,
      activityIds: [nextId, previousId, cleaning.id],
      found: Math.max(0, availableMin),
      limit: rule.minutes,
      ventGroupId: null,
    }));
}

import { withPlacements } from '../pipeline';
import { isNeverMoved, type Activity, type Placement } from '../plant/activity';
import { releaseAfterMin } from '../plant/plant';
import { changeovers } from '../schedule/changeovers';
import { occupationsByUnit, type Occupation } from '../schedule/occupation';
import type { Week } from '../schedule/week';
import { indexOf, momentOf } from '../schedule/weekIndex';
import { isCrewed } from './trouble';

/** Rounds of pushing; each settles at least one activity that the round before left wrong. */
const ROUNDS = 400;

/**
 * Moves activities later, each as little as it takes, until every least wait, every unit and its cleaning hold again;
 * what stands on a unit that is not open goes to another that is free at its time, or waits for its own. Only free
 * activities that start at `from` or later move. Greatest waits, shifts and steam are not looked at: that is
 * levelling's part.
 */
export function pushOn(week: Week, from: number): Week {
  let pushed = week;
  for (let round = 0; round < ROUNDS; round++) {
    const changes = oneRound(pushed, from);
    if (changes.size === 0) break;
    pushed = withPlacements(
      pushed,
      [...changes].map(([activityId, placement]) => ({ activityId, placement })),
    );
  }
  return pushed;
}

type Changes = Map<string, Placement>;

function oneRound(week: Week, from: number): Changes {
  const changes: Changes = new Map();
  const later = (activity: Activity | undefined, byMin: number): void => {
    if (!activity?.placement || byMin <= 0 || !mayMove(activity, from)) return;
    const start = activity.placement.start + byMin;
    if (start > (changes.get(activity.id)?.start ?? -1)) changes.set(activity.id, { ...activity.placement, start });
  };
  pushAlongLinks(week, later);
  pushOnUnits(week, later);
  if (changes.size === 0) leaveLostUnits(week, from, changes);
  return changes;
}

type Later = (activity: Activity | undefined, byMin: number) => void;

const mayMove = (activity: Activity, from: number): boolean =>
  activity.fixing === 'free' && !isNeverMoved(activity) && (activity.placement?.start ?? -1) >= from;

function pushAlongLinks(week: Week, later: Later): void {
  for (const link of week.links) {
    const earlier = momentOf(link.from, week);
    const after = momentOf(link.to, week);
    if (earlier === null || after === null) continue;
    later(indexOf(week).activities.get(link.to.activityId), earlier + link.leastMin - after);
  }
}

function pushOnUnits(week: Week, later: Later): void {
  const { activities } = indexOf(week);
  for (const taken of occupationsByUnit(week.activities, week).values()) {
    taken.slice(1).forEach((next, i) => {
      later(activities.get(next.activityId), (taken[i] as Occupation).to - next.from);
    });
  }
  for (const { nextId, rule, availableMin } of changeovers(week)) {
    later(activities.get(nextId), rule.minutes + releaseAfterMin(week.plant, rule) - availableMin);
  }
}

/** One at a time: each may take the place that another would have taken. */
function leaveLostUnits(week: Week, from: number, changes: Changes): void {
  const stranded = week.activities.find((a) => mayMove(a, from) && !isCrewed(week, a) && placeFor(week, a));
  const place = stranded && placeFor(week, stranded);
  if (stranded && place) changes.set(stranded.id, place);
}

/** Another unit that is open and free then; else the first time from which its own is open for it. */
function placeFor(week: Week, activity: Activity): Placement | null {
  const { placement, modes } = activity;
  if (!placement) return null;
  for (const { unitId } of modes) {
    const tried = { ...placement, unitId };
    if (unitId !== placement.unitId && isFreeAt(week, { ...activity, placement: tried })) return tried;
  }
  const open = week.calendars.filter((c) => c.unitId === placement.unitId).flatMap((c) => c.open);
  const minutes = modes.find((m) => m.unitId === placement.unitId)?.minutes ?? 0;
  const next = open.filter((o) => o.from > placement.start && o.to - o.from >= minutes).sort((a, b) => a.from - b.from);
  return next[0] ? { ...placement, start: next[0].from } : null;
}

function isFreeAt(week: Week, activity: Activity): boolean {
  if (!isCrewed(week, activity)) return false;
  const tried = withPlacements(week, [{ activityId: activity.id, placement: activity.placement }]);
  const taken = occupationsByUnit(tried.activities, tried).get(activity.placement?.unitId ?? '') ?? [];
  return taken.every((span, i) => i === 0 || (taken[i - 1] as Occupation).to <= span.from);
}

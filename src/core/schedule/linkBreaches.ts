import type { Link } from '../plant/activity';
import type { ProcessBreach, TimeBreach } from './breach';
import type { Week } from './week';
import { indexOf, momentOf } from './weekIndex';

/** Waits of links that are too short or too long; links with an end that is not placed are passed over. */
export function linkBreaches(week: Week): (ProcessBreach | TimeBreach)[] {
  return week.links.flatMap((link) => {
    const from = momentOf(link.from, week);
    const to = momentOf(link.to, week);
    return from === null || to === null ? [] : waitBreaches(link, from, to, week);
  });
}

function waitBreaches(link: Link, from: number, to: number, week: Week): (ProcessBreach | TimeBreach)[] {
  const wait = to - from;
  if (wait < link.leastMin) {
    return [{ ...timeOf(link, wait, link.leastMin, week), code: 'waitTooShort', from: to, to: from + link.leastMin }];
  }
  if (link.greatestMin === null || wait <= link.greatestMin) return [];
  const place = { from: from + link.greatestMin, to };
  const code = processCode(link);
  if (code === null) return [{ ...timeOf(link, wait, link.greatestMin, week), code: 'waitTooLong', ...place }];
  const activityIds = [link.to.activityId, link.from.activityId];
  const limits = { found: wait, limit: link.greatestMin, ventGroupId: null };
  return [{ id: `${code}:${link.id}`, class: 'process', code, ...place, activityIds, ...limits }];
}

function processCode(link: Link): 'waitSinceClosing' | 'initialTemperature' | 'waitTooLong' | null {
  if (link.rule === 'sinceClosing') return 'waitSinceClosing';
  if (link.rule === 'initialTemperature') return 'initialTemperature';
  return link.greatestBreach === 'process' ? 'waitTooLong' : null;
}

function timeOf(link: Link, found: number, limit: number, week: Week) {
  return {
    id: `wait:${link.id}`,
    class: 'time',
    activityIds: [link.to.activityId, link.from.activityId],
    unitId: indexOf(week).activities.get(link.to.activityId)?.placement?.unitId ?? null,
    found,
    limit,
  } as const;
}

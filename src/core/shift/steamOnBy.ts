import type { Link } from '../plant/activity';
import { indexOf, momentOf } from '../schedule/weekIndex';
import type { Week } from '../schedule/week';

/** The latest moment for steam on that a greatest wait leaves. Minutes of the week. */
export interface SteamOnBy {
  readonly minute: number;
  /** From where the wait runs. */
  readonly sinceMin: number;
  readonly greatestMin: number;
  readonly rule: Exclude<Link['rule'], 'flow'>;
}

/**
 * The tightest wait that an activity's start must keep, since the first container closed or for the initial
 * temperature, as planned; null where there is none or what it runs from is not placed. [min]
 */
export function steamOnBy(week: Week, activityId: string): SteamOnBy | null {
  const linksOfWeek = [...indexOf(week).links.values()];
  const waits = linksOfWeek.flatMap((link): SteamOnBy[] => {
    if (link.to.activityId !== activityId || link.rule === 'flow' || link.greatestMin === null) return [];
    const sinceMin = momentOf(link.from, week);
    if (sinceMin === null) return [];
    return [{ minute: sinceMin + link.greatestMin, sinceMin, greatestMin: link.greatestMin, rule: link.rule }];
  });
  return waits.sort((a, b) => a.minute - b.minute)[0] ?? null;
}

import { drawAt } from '../demand/activityLoad';
import type { Activity } from '../plant/activity';
import { countsOn } from './network';
import type { LoadSource } from './loadCurve';

/** An activity's draw at a moment. */
export interface DrawShare {
  readonly activityId: string;
  readonly unitId: string;
  readonly kgPerH: number;
}

/** The activities that draw on a header at a minute, directly or through letdowns, greatest first. [kg/h] */
export function whoDraws(
  source: Pick<LoadSource, 'plant' | 'activities'>,
  headerId: string,
  minute: number,
): DrawShare[] {
  return source.activities
    .map((activity) => shareAt(activity, minute))
    .filter((share) => share.kgPerH > 0 && countsOn(source.plant, share.unitId, headerId))
    .sort(greatestFirst);
}

/** The activities whose draw on a header is higher at a minute than in the minute before, greatest rise first. [kg/h] */
export function whoRises(
  source: Pick<LoadSource, 'plant' | 'activities'>,
  headerId: string,
  minute: number,
): DrawShare[] {
  return source.activities
    .map((activity) => {
      const share = shareAt(activity, minute);
      return share.kgPerH > 0 ? { ...share, kgPerH: share.kgPerH - drawAt(activity, minute - 1) } : share;
    })
    .filter((share) => share.kgPerH > 0 && countsOn(source.plant, share.unitId, headerId))
    .sort(greatestFirst);
}

function shareAt(activity: Activity, minute: number): DrawShare {
  const unitId = activity.placement?.unitId ?? '';
  return { activityId: activity.id, unitId, kgPerH: drawAt(activity, minute) };
}

function greatestFirst(a: DrawShare, b: DrawShare): number {
  return b.kgPerH - a.kgPerH || (a.activityId < b.activityId ? -1 : 1);
}

import { drawnMode, type Activity, type Link, type LinkEnd } from '../../core/plant/activity';
import type { Rows } from './rows';

/** A wait between two linked activities, drawn from moment to moment. */
export interface Thread {
  readonly linkId: string;
  readonly fromId: string;
  readonly toId: string;
  readonly fromMinute: number;
  readonly toMinute: number;
  readonly fromUnitId: string;
  readonly toUnitId: string;
  readonly waitMin: number;
  readonly greatestMin: number | null;
  readonly rule: Link['rule'];
  readonly broken: boolean;
}

function momentOf(end: LinkEnd, activity: Activity): number | null {
  const mode = drawnMode(activity);
  if (!activity.placement || !mode) return null;
  return activity.placement.start + (end.anchor === 'end' ? mode.minutes : 0) + end.offsetMin;
}

/** The waits of a batch's activities, to and from others that feed it included; both ends placed. */
export function threadsOf(links: readonly Link[], activities: readonly Activity[], activityId: string): Thread[] {
  const byId = new Map(activities.map((activity) => [activity.id, activity]));
  const chosen = byId.get(activityId);
  const ofBatch = (id: string): boolean =>
    id === activityId || (chosen?.batchId != null && byId.get(id)?.batchId === chosen.batchId);
  return links.flatMap((link): Thread[] => {
    if (!ofBatch(link.from.activityId) && !ofBatch(link.to.activityId)) return [];
    const from = byId.get(link.from.activityId);
    const to = byId.get(link.to.activityId);
    const fromMinute = from ? momentOf(link.from, from) : null;
    const toMinute = to ? momentOf(link.to, to) : null;
    if (!from?.placement || !to?.placement || fromMinute === null || toMinute === null) return [];
    const waitMin = toMinute - fromMinute;
    const broken = waitMin < link.leastMin || (link.greatestMin !== null && waitMin > link.greatestMin);
    return [
      {
        linkId: link.id,
        fromId: from.id,
        toId: to.id,
        fromMinute,
        toMinute,
        fromUnitId: from.placement.unitId,
        toUnitId: to.placement.unitId,
        waitMin,
        greatestMin: link.greatestMin,
        rule: link.rule,
        broken,
      },
    ];
  });
}

/** The wait since closing of an activity: the tightest one that leads to it; null where none does. */
export function waitSinceClosing(links: readonly Link[], activities: readonly Activity[], id: string): Thread | null {
  const waits = threadsOf(
    links.filter((link) => link.rule !== 'flow' && link.to.activityId === id),
    activities,
    id,
  );
  return waits.reduce<Thread | null>((tightest, wait) => {
    const left = (w: Thread): number => (w.greatestMin ?? Infinity) - w.waitMin;
    return tightest && left(tightest) <= left(wait) ? tightest : wait;
  }, null);
}

/** A thread's curve: along the foot of the rows it leads between. [SVG path] */
export function threadPath(thread: Thread, rows: Rows, pxPerMin: number, footPx: number): string | null {
  const fromTop = rows.topOfUnit.get(thread.fromUnitId);
  const toTop = rows.topOfUnit.get(thread.toUnitId);
  if (fromTop === undefined || toTop === undefined) return null;
  const [x0, y0] = [thread.fromMinute * pxPerMin, fromTop + footPx];
  const [x1, y1] = [thread.toMinute * pxPerMin, toTop + footPx];
  const bend = Math.max(14, Math.min(60, Math.abs(x1 - x0) / 2));
  return `M${x0.toFixed(1)} ${y0}C${(x0 + bend).toFixed(1)} ${y0} ${(x1 - bend).toFixed(1)} ${y1} ${x1.toFixed(1)} ${y1}`;
}

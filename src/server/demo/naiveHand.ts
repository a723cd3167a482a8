/**
 * A planner's hand that does not see steam: every run as early as it can be, retort loads every three quarters of an hour. It keeps
 * units, cleaning, waits, shifts and the vents validated at once.
 */
import { drawnMode, type Activity, type Link, type LinkEnd, type Mode } from '../../core/plant/activity';
import type { Interval } from '../../core/time/interval';
import type { NetParts } from './nets';

export interface HandRules {
  readonly open: readonly Interval[];
  /** Cleaning between two families on a unit. [min] */
  readonly cleaningMin: (unitId: string, from: string, to: string) => number;
  readonly ventGroupOf: (unitId: string) => string | null;
  readonly ventsAtOnce: number;
}

interface Busy {
  readonly until: number;
  readonly familyId: string;
}

const QUARTER_HOUR = 15;
const THREE_QUARTERS = 45;

const roundUp = (minute: number, step: number): number => Math.ceil(minute / step) * step;

/** Places nets one after the other; a net starts no earlier than its `earliest`. */
export class NaiveHand {
  private readonly busy = new Map<string, Busy>();
  private readonly vents: { readonly group: string; readonly from: number; readonly to: number }[] = [];

  constructor(private readonly rules: HandRules) {}

  /** The net's activities with placements; tries a later and later start until everything fits. */
  place(parts: NetParts): readonly Activity[] {
    for (let start = parts.net.earliest; ; start += QUARTER_HOUR) {
      const placed = this.tryFrom(parts, start);
      if (placed) return placed;
      if (start > parts.net.earliest + 1_440) throw new Error(`no room for ${parts.net.code}`);
    }
  }

  private tryFrom(parts: NetParts, start: number): readonly Activity[] | null {
    const placed = new Map<string, Activity>();
    for (const activity of parts.activities) {
      const at = this.earliestPlace(activity, parts, placed, start);
      if (!at) return null;
      placed.set(activity.id, at);
    }
    const all = [...placed.values()];
    if (!parts.links.every((link) => waitHolds(link, placed))) return null;
    all.forEach((activity) => this.occupy(activity, parts.links, placed));
    return all;
  }

  private earliestPlace(a: Activity, parts: NetParts, placed: ReadonlyMap<string, Activity>, netStart: number) {
    const ready = Math.max(netStart, ...parts.links.map((link) => earliestBy(link, a, placed)));
    const taken = [...placed.values()].filter((p) => p.stage === a.stage);
    const options = a.modes.map((mode) => this.earliestOn(a, mode, ready, taken)).filter((o) => o !== null);
    const idleSince = (unitId: string) => this.busy.get(unitId)?.until ?? 0;
    const best = options.sort((x, y) => x.start - y.start || idleSince(x.unitId) - idleSince(y.unitId))[0];
    return best ? { ...a, placement: best } : null;
  }

  private earliestOn(a: Activity, mode: Mode, ready: number, taken: readonly Activity[]) {
    const busy = this.busy.get(mode.unitId);
    const mine = taken.filter((p) => p.placement?.unitId === mode.unitId).map((p) => endOf(p));
    const clean = busy ? this.rules.cleaningMin(mode.unitId, busy.familyId, a.familyId ?? '') : 0;
    const step = a.stage === 'retort' ? THREE_QUARTERS : QUARTER_HOUR;
    let start = roundUp(Math.max(ready, busy ? busy.until + clean : 0, ...mine), step);
    for (let tries = 0; tries < 96; tries++, start += step) {
      if (this.isOpen(start, mode.minutes) && this.ventsHold(mode, start, taken)) return { unitId: mode.unitId, start };
    }
    return null;
  }

  private isOpen(start: number, minutes: number): boolean {
    return this.rules.open.some((span) => span.from <= start && start + minutes <= span.to);
  }

  private ventsHold(mode: Mode, start: number, taken: readonly Activity[]): boolean {
    const vent = ventOf(mode, start);
    const group = this.rules.ventGroupOf(mode.unitId);
    if (!vent || !group) return true;
    const mine = taken.flatMap((p) => {
      const other = drawnMode(p);
      const span = other && p.placement ? ventOf(other, p.placement.start) : null;
      return span && other && this.rules.ventGroupOf(other.unitId) === group ? [span] : [];
    });
    const others = [...mine, ...this.vents.filter((v) => v.group === group)];
    return others.filter((v) => v.from < vent.to && vent.from < v.to).length < this.rules.ventsAtOnce;
  }

  private occupy(a: Activity, links: readonly Link[], placed: ReadonlyMap<string, Activity>): void {
    const { placement } = a;
    const mode = drawnMode(a);
    if (!placement || !mode) return;
    const takenOff = a.occupiesUntil === 'end' ? undefined : links.find((l) => l.id === `${a.id}-taken-off`);
    const until = Math.max(endOf(a), takenOff ? (momentOf(takenOff.to, placed) ?? 0) : 0);
    this.busy.set(placement.unitId, { until, familyId: a.familyId ?? '' });
    const vent = ventOf(mode, placement.start);
    const group = this.rules.ventGroupOf(mode.unitId);
    if (vent && group) this.vents.push({ group, ...vent });
  }
}

const endOf = (a: Activity): number => (a.placement?.start ?? 0) + (drawnMode(a)?.minutes ?? 0);

function ventOf(mode: Mode, start: number): Interval | null {
  const vents = mode.phases.filter((p) => p.kind === 'vent');
  const first = vents[0];
  const last = vents.at(-1);
  return first && last ? { from: start + first.offsetMin, to: start + last.offsetMin + last.minutes } : null;
}

/** The moment of a link's end, once its activity is placed. */
function momentOf(moment: LinkEnd, placed: ReadonlyMap<string, Activity>): number | null {
  const a = placed.get(moment.activityId);
  if (!a?.placement) return null;
  return (moment.anchor === 'start' ? a.placement.start : endOf(a)) + moment.offsetMin;
}

/** Earliest start of an activity by a link that ends at it. */
function earliestBy(link: Link, a: Activity, placed: ReadonlyMap<string, Activity>): number {
  if (link.to.activityId !== a.id) return 0;
  const from = momentOf(link.from, placed);
  return from === null ? 0 : from + link.leastMin - link.to.offsetMin;
}

function waitHolds(link: Link, placed: ReadonlyMap<string, Activity>): boolean {
  const from = momentOf(link.from, placed);
  const to = momentOf(link.to, placed);
  if (from === null || to === null) return true;
  return to - from >= link.leastMin && (link.greatestMin === null || to - from <= link.greatestMin);
}

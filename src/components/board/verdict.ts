import type { Activity, Phase } from '../../core/plant/activity';
import { headersOfUnit } from '../../core/header/network';
import type { Preview, WeekEvaluation, WeekEvaluator } from '../../core/pipeline';
import type { Breach } from '../../core/schedule/breach';
import { breachSentence, type Names } from '../../core/schedule/sentences';
import type { Week } from '../../core/schedule/week';
import type { Interval } from '../../core/time/interval';
import type { Clock } from '../time';
import type { Target } from './carry';
import { fitsAt, fittingStarts, type RoomOnHeader } from './fits';
import { spellsOf } from './outline';

/** Starts at which an activity's steam fits, by unit that it can run on. A unit whose headers have no limit is left out. */
export type Fits = ReadonlyMap<string, readonly Interval[]>;

/** Where an activity's steam would fit under the limits, all others staying where they are. */
export function fitsOf(activity: Activity, week: Week, evaluator: WeekEvaluator): Fits {
  const without = evaluator.preview([{ activityId: activity.id, placement: null }]).evaluation;
  const fits = new Map<string, readonly Interval[]>();
  const known = new Map<string, readonly Interval[]>();
  for (const mode of activity.modes) {
    const rooms = roomsOf(mode.unitId, week, without);
    if (rooms.length === 0) continue;
    const key = `${headersOfUnit(week.plant, mode.unitId).join()} ${mode.minutes} ${JSON.stringify(mode.phases)}`;
    const spans =
      known.get(key) ?? fittingStarts(asSpells(mode.phases, mode.minutes), mode.minutes, rooms, week.horizonMin);
    known.set(key, spans);
    fits.set(mode.unitId, spans);
  }
  return fits;
}

function roomsOf(unitId: string, week: Week, evaluation: WeekEvaluation): RoomOnHeader[] {
  return headersOfUnit(week.plant, unitId).flatMap((headerId): RoomOnHeader[] => {
    const header = evaluation.headers.find((h) => h.headerId === headerId);
    const feed = week.plant.headers.find((h) => h.id === headerId)?.feed;
    if (!header) return [];
    const rooms: RoomOnHeader[] = [];
    if (header.limitKgPerH) rooms.push({ loadKgPerH: header.loadKgPerH, limitKgPerH: header.limitKgPerH });
    if (feed?.kind === 'letdown') {
      const limitKgPerH = new Float64Array(week.horizonMin).fill(feed.greatestKgPerH);
      rooms.push({ loadKgPerH: header.loadKgPerH, limitKgPerH });
    }
    return rooms;
  });
}

function asSpells(phases: readonly Phase[], minutes: number): Phase[] {
  return spellsOf(phases, minutes).map((spell) => ({
    kind: 'run' as const,
    offsetMin: spell.from,
    minutes: spell.to - spell.from,
    steamKgPerH: spell.kgPerH,
  }));
}

export interface Verdict {
  readonly look: 'room' | 'over' | 'quiet';
  readonly steam: string;
  /** What else would be wrong, in a few words; empty where nothing would. */
  readonly others: readonly string[];
}

/** What putting an activity down at a target would mean. */
export function verdictOf(
  activityId: string,
  target: Target,
  fits: Fits,
  preview: Preview | null,
  names: Names,
  clock: Clock,
): Verdict {
  if (!target.eligible) return { look: 'over', steam: `can't run on ${names.unit(target.unitId)}`, others: [] };
  const mine = (preview?.evaluation.breaches ?? []).filter((breach) => breach.activityIds.includes(activityId));
  const others = mine.filter((b) => b.class !== 'steam').map((b) => breachSentence(b, names, clock.dayTime).title);
  const spans = fits.get(target.unitId);
  if (!spans) return { look: others.length > 0 ? 'over' : 'quiet', steam: 'steam not judged', others };
  if (fitsAt(spans, target.start)) return { look: others.length > 0 ? 'over' : 'room', steam: 'steam fits', others };
  return { look: 'over', steam: overWords(mine, names), others };
}

function overWords(breaches: readonly Breach[], names: Names): string {
  const over = breaches.reduce(
    (most, b) => (b.class === 'steam' && b.code !== 'stepTooSteep' ? Math.max(most, b.overKgPerH) : most),
    0,
  );
  return over > 0 ? `${names.say.rate(over)} over the limit` : 'over the limit';
}

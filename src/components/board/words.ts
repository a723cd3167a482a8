import type { ActivityState, WeekDto } from '../../contracts/week';
import type { ProposedMove } from '../../core/levelling/proposal';
import {
  drawnMode,
  type Activity,
  type ActivityKind,
  type Fixing,
  type Placement,
  type Stage,
} from '../../core/plant/activity';
import type { HeaderJudgement } from '../../core/header/judgement';
import type { PlantModel } from '../../core/plant/plant';
import { isPlanned } from './carry';
import { CLEAN_WORDS } from './cleans';
import { groupDigits, spanText, type Clock } from '../time';
import type { Units } from '../units';

export const STAGE_WORDS: Readonly<Record<Stage, string>> = {
  prepare: 'prepare',
  blanch: 'blanch',
  cook: 'cook',
  fill: 'fill and close',
  retort: 'retort',
  pasteurise: 'pasteurise',
  other: 'run',
};

/** What follows from the sequence on the units, by kind. */
const FOLLOWING_WORDS: Readonly<Record<ActivityKind, string>> = {
  stage: 'run',
  cleaning: 'cleaning, follows from the sequence',
  idle: 'kept hot until the next run, follows from the gap',
  warmUp: 'warm-up, follows from the gap',
};

/** Of machines that take hours to heat up and then draw steadily. */
export const NEVER_MOVED = 'only by hand: levelling and slipping leave it where it is';

/** What an activity is: its stage, the kind of a planned clean, or what it follows from. */
export function whatWords(activity: Activity): string {
  if (activity.stage) return STAGE_WORDS[activity.stage];
  return activity.kind === 'cleaning' && isPlanned(activity)
    ? CLEAN_WORDS[activity.cleaning ?? 'wash']
    : FOLLOWING_WORDS[activity.kind];
}

export const FIXING_WORDS: Readonly<Record<Fixing, string>> = {
  free: 'free to move',
  fixed: 'fixed',
  started: 'started on the floor',
  done: 'done',
};

export function unitName(plant: PlantModel, unitId: string): string {
  return plant.units.find((unit) => unit.id === unitId)?.name ?? unitId;
}

/** 'A107 Carrot dice 2.5 kg' */
export function activityName(activity: Pick<Activity, 'code' | 'title'>): string {
  return activity.title.includes(activity.code) ? activity.title : `${activity.code} ${activity.title}`;
}

/** 'Retort 2, Tue 07:05', or 'not yet placed'. */
export function placeText(placement: Placement | null, plant: PlantModel, clock: Clock): string {
  if (!placement) return 'not yet placed';
  return `${unitName(plant, placement.unitId)}, ${clock.dayTime(placement.start)}`;
}

/** All that a block says to those who can't see it. */
export function blockLabel(
  activity: Activity,
  plant: PlantModel,
  clock: Clock,
  breachTitles: readonly string[],
  units: Units,
): string {
  const mode = drawnMode(activity);
  const { placement } = activity;
  const peak = Math.max(0, ...(mode?.phases ?? []).map((phase) => phase.steamKgPerH));
  const parts = [
    activityName(activity),
    placeText(placement, plant, clock),
    placement && mode ? `to ${clock.time(placement.start + mode.minutes)}` : '',
    peak > 0 ? `steam up to ${units.rate(peak)}` : 'no steam',
    activity.fixing === 'free' ? '' : FIXING_WORDS[activity.fixing],
    mode?.neverMoved ? 'never moved by levelling or slipping' : '',
    ...breachTitles,
  ];
  return parts.filter((part) => part !== '').join(', ');
}

export interface OverWords {
  readonly look: 'over' | 'room' | 'quiet';
  readonly figure: string;
  readonly line: string;
}

/** How a header stands, in a figure and a line below it. */
export function overWords(judgement: HeaderJudgement | undefined, clock: Clock, units: Units): OverWords {
  if (!judgement) return { look: 'quiet', figure: 'not judged', line: 'no such header' };
  const { over, letdown, leastSpare } = judgement;
  const worst = over && over.kg > 0 ? over : letdown && letdown.kg > 0 ? letdown : null;
  if (worst) {
    const what = worst === over ? 'over the limit' : 'more than the letdown passes';
    return { look: 'over', figure: units.mass(worst.kg), line: `${what}, ${spanText(worst.minutes)}` };
  }
  if (!over)
    return letdown
      ? letdownFits(judgement, units)
      : { look: 'quiet', figure: 'not judged', line: 'no steam limit is set' };
  if (judgement.peak.kgPerH === 0) return { look: 'room', figure: 'under the limit', line: 'nothing draws steam' };
  if (!leastSpare) return { look: 'quiet', figure: 'not judged', line: 'no steam limit is set' };
  return {
    look: 'room',
    figure: 'under the limit',
    line: `least to spare ${units.rate(leastSpare.kgPerH)}, ${clock.dayTime(leastSpare.minute)}`,
  };
}

function letdownFits(judgement: HeaderJudgement, units: Units): OverWords {
  return {
    look: 'room',
    figure: 'the letdown passes it',
    line: `peak ${units.rate(judgement.peak.kgPerH)}; no limit set`,
  };
}

/** What became of an edit that another was faster than: who moved what, when, and where it is now. */
export function staleSentences(stale: readonly ActivityState[], dto: WeekDto, clock: Clock): string[] {
  const byId = new Map(dto.week.activities.map((activity) => [activity.id, activity]));
  return stale.map((state) => {
    const activity = byId.get(state.id);
    const name = activity ? activityName(activity) : state.id;
    const who = state.movedBy ?? 'Somebody else';
    const when = state.movedAt ? `, ${clock.instantDayTime(state.movedAt)}` : '';
    return `${who} changed ${name}${when}. It is now ${placeText(state.placement, dto.week.plant, clock)}.`;
  });
}

/** '12 min later', '5 min earlier', 'to Retort 3, 12 min later'. */
export function moveText(move: Pick<ProposedMove, 'from' | 'to'>, plant: PlantModel): string {
  const by = move.to.start - move.from.start;
  const along = by === 0 ? '' : `${spanText(by)} ${by > 0 ? 'later' : 'earlier'}`;
  if (move.to.unitId === move.from.unitId) return along || 'stays';
  return ['to ' + unitName(plant, move.to.unitId), along].filter((part) => part !== '').join(', ');
}

/** Marks along a strip: t/h where there are tonnes, else the bare figure in the units shown. */
export function markText(kgPerH: number, topKgPerH: number, units: Units): string {
  if (units.system === 'si' && topKgPerH >= 4000) return `${kgPerH / 1000} t/h`;
  return groupDigits(units.shown('steamRate', kgPerH));
}

import { judgeHeader, type HeaderJudgement } from './header/judgement';
import { overTogether } from './header/judge';
import { loadOf, type LoadCurve } from './header/loadCurve';
import { NOTHING_OVER, type OverMeasure } from './header/over';
import { settleFlows, type HeaderFlows } from './header/settle';
import { whoDraws as whoDrawsOf, type DrawShare } from './header/whoDraws';
import { drawnMode, type Activity, type Placement } from './plant/activity';
import type { Breach } from './schedule/breach';
import { weekBreaches } from './schedule/breaches';
import { drawnActivities, prepareWeek, type JudgedWeek } from './schedule/judged';
import type { GapDraw } from './schedule/gapDraws';
import { lateMinutesOf } from './schedule/timeBreaches';
import type { Week } from './schedule/week';

/** A week judged. */
export interface WeekEvaluation {
  /** In the plant's order of headers. */
  readonly headers: readonly HeaderJudgement[];
  /** Steam over the limit, all headers that are judged together. */
  readonly over: OverMeasure;
  readonly breaches: readonly Breach[];
  /** Cleanings that follow from the sequence on the units. */
  readonly cleanings: readonly Activity[];
  /** Idle spells and warm-ups between runs (kinds `idle` and `warmUp`), each with the id of the run that it is for. */
  readonly gapDraws: readonly GapDraw[];
  /** All that draws: the week's activities, after a short gap with a warm machine's phases, and what follows from them. */
  readonly drawn: readonly Activity[];
  /** Minutes late, summed over the activities with a due time. */
  readonly lateMinutes: number;
  readonly lateActivities: number;
}

/** Judges a week: demand, load, capacity, what is over and every breach. The one truth for board, server and solver. */
export function evaluateWeek(week: Week): WeekEvaluation {
  const judged = prepareWeek(week);
  return evaluatePrepared(judged, loadOf({ ...week, activities: judged.drawn }));
}

/** Who draws on a header at a minute, greatest first, what follows from the sequence included. [kg/h] */
export function whoDraws(week: Week, headerId: string, minute: number): DrawShare[] {
  return whoDrawsOf({ plant: week.plant, activities: drawnActivities(week) }, headerId, minute);
}

function evaluatePrepared(judged: JudgedWeek, load: LoadCurve): WeekEvaluation {
  const { plant, capacities } = judged.week;
  const flows = settleFlows(plant, capacities, load);
  const headers = plant.headers.map((header) => {
    const capacity = capacities.find((c) => c.headerId === header.id);
    const { loadKgPerH, ...beside } = flows.get(header.id) as HeaderFlows;
    return judgeHeader(header, capacity, loadKgPerH, plant.rules, beside);
  });
  const late = judged.week.activities.map(lateMinutesOf);
  return {
    headers,
    over: headers.length === 0 ? NOTHING_OVER : overTogether(headers.flatMap(({ over }) => (over ? [over] : []))),
    breaches: weekBreaches(judged, headers),
    cleanings: judged.changeovers.map(({ cleaning }) => cleaning),
    gapDraws: judged.gapDraws,
    drawn: judged.drawn,
    lateMinutes: late.reduce((sum, minutes) => sum + minutes, 0),
    lateActivities: late.filter((minutes) => minutes > 0).length,
  };
}

/** A placement tried out. */
export interface TriedPlacement {
  readonly activityId: string;
  readonly placement: Placement | null;
}

/** What trying placements out would do. */
export interface Preview {
  readonly week: Week;
  readonly evaluation: WeekEvaluation;
  /** Breaches that the week as it stands does not have. */
  readonly appeared: readonly Breach[];
  /** Breaches of the week as it stands that would be gone. */
  readonly gone: readonly Breach[];
}

/** Judges a week again and again while a hand moves a few of its activities. */
export interface WeekEvaluator {
  /** The week as it stands, judged. */
  readonly evaluation: WeekEvaluation;
  /** Judges the week with some placements changed; the week as it stands is kept. Unknown activities are passed over. */
  preview(changes: readonly TriedPlacement[]): Preview;
}

/** An evaluator that keeps the load and changes only what the tried placements change. */
export function createEvaluator(week: Week): WeekEvaluator {
  const judged = prepareWeek(week);
  const load = loadOf({ ...week, activities: judged.drawn });
  const evaluation = evaluatePrepared(judged, load);
  const breachIds = new Set(evaluation.breaches.map((breach) => breach.id));
  return {
    evaluation,
    preview: (changes) => {
      const tried = prepareWeek(withPlacements(week, changes));
      replaceDraws(load, judged.drawn, tried.drawn);
      const preview = evaluatePrepared(tried, load);
      replaceDraws(load, tried.drawn, judged.drawn);
      const previewIds = new Set(preview.breaches.map((breach) => breach.id));
      return {
        week: tried.week,
        evaluation: preview,
        appeared: preview.breaches.filter((breach) => !breachIds.has(breach.id)),
        gone: evaluation.breaches.filter((breach) => !previewIds.has(breach.id)),
      };
    },
  };
}

/** The week with some placements changed; all other activities are the same values. */
export function withPlacements(week: Week, changes: readonly TriedPlacement[]): Week {
  const placements = new Map(changes.map((change) => [change.activityId, change.placement]));
  const activities = week.activities.map((activity) => {
    const placement = placements.get(activity.id);
    return placement === undefined ? activity : { ...activity, placement };
  });
  return { ...week, activities };
}

/** Takes the draws of one set of activities to those of another, touching only those that differ. */
function replaceDraws(load: LoadCurve, from: readonly Activity[], to: readonly Activity[]): void {
  const wanted = new Map(to.map((activity) => [activity.id, activity]));
  for (const activity of from) if (!wanted.has(activity.id)) load.remove(activity.id);
  const present = new Map(from.map((activity) => [activity.id, activity]));
  for (const activity of to) {
    const before = present.get(activity.id);
    if (before !== activity && !(before && sameDraw(before, activity))) load.add(activity);
  }
}

function sameDraw(a: Activity, b: Activity): boolean {
  return (
    drawnMode(a)?.phases === drawnMode(b)?.phases &&
    a.placement?.unitId === b.placement?.unitId &&
    a.placement?.start === b.placement?.start
  );
}

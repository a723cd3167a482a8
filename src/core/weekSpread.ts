import { convolveSpread, type ConvolutionOptions, type ConvolvedSpread } from './header/spread/convolution';
import { SampledLoads, type SampledSpread, type SamplingOptions } from './header/spread/sampledLoads';
import {
  plannedDraws,
  spreadHeader,
  type PlannedDraw,
  type SpreadDraw,
  type UnitSpreads,
} from './header/spread/spreadDraws';
import { ON_TIME } from './header/spread/startSpread';
import { countsOn } from './header/network';
import { withPlacements, type TriedPlacement } from './pipeline';
import type { Activity } from './plant/activity';
import { prepareWeek } from './schedule/judged';
import type { Week } from './schedule/week';

/**
 * What draws on a header, cleanings included. A batch is early or late as one: its activities share one random number,
 * and each deviates by the minutes that its own unit's spread has there (on units of equal spread by the same minutes).
 * A cleaning that follows a run goes with that run, an idle spell or a warm-up with the run that it is for. What has
 * started or is done stands where it is.
 */
export function spreadDraws(week: Week, headerId: string, spreads: UnitSpreads): SpreadDraw[] {
  const { changeovers, gapDraws, drawn } = prepareWeek(week);
  const runs = new Map(week.activities.map((activity) => [activity.id, activity]));
  const leaders = new Map([
    ...changeovers.map(({ cleaning, previousId }) => [cleaning.id, runs.get(previousId)] as const),
    ...gapDraws.map(({ activity, runId }) => [activity.id, runs.get(runId)] as const),
  ]);
  return drawn.flatMap((activity) => {
    const unitId = activity.placement?.unitId;
    if (unitId === undefined || !countsOn(week.plant, unitId, headerId)) return [];
    const leader = leaders.get(activity.id) ?? activity;
    const known = leader.fixing === 'started' || leader.fixing === 'done';
    const spread = known ? ON_TIME : (spreads.get(unitId) ?? ON_TIME);
    return [{ activity, key: spreadKey(leader), spread, draws: plannedDraws(activity) }];
  });
}

/** What an activity shares its random number by: its batch, or itself where it has none. */
export function spreadKey(activity: Activity): string {
  return activity.batchId === null ? `activity:${activity.id}` : `batch:${activity.batchId}`;
}

/** Chance of being over and confident load of a header by convolution: see {@link convolveSpread}. */
export function spreadByConvolution(
  week: Week,
  headerId: string,
  spreads: UnitSpreads,
  options: ConvolutionOptions,
): ConvolvedSpread {
  return convolveSpread(spreadHeader(week, headerId), spreadDraws(week, headerId, spreads), options);
}

/** Follows a hand that moves a few activities of a week with spread starts. */
export interface SpreadEvaluator {
  /** The week as it stands. */
  readonly asItStands: SampledSpread;
  /** The same with some placements changed; unknown activities are passed over; the week as it stands is kept. */
  preview(changes: readonly TriedPlacement[]): SampledSpread;
}

/**
 * An evaluator that keeps every sampled load of the header and changes only what the tried placements change. Each batch
 * keeps its random numbers, so that two previews differ by the move and not by chance, and a preview is what an
 * evaluator built anew from the same random numbers would say. Keeps samples x minutes of the week x 8 bytes.
 */
export function createSpreadEvaluator(
  week: Week,
  headerId: string,
  spreads: UnitSpreads,
  options: SamplingOptions,
): SpreadEvaluator {
  const keys = new Set(week.activities.map(spreadKey));
  const loads = new SampledLoads(spreadHeader(week, headerId), keys, options);
  const standing = spreadDraws(week, headerId, spreads);
  for (const draw of standing) loads.pour(draw, 1);
  loads.settle();
  return {
    asItStands: loads.tried(),
    preview: (changes) => {
      const tried = spreadDraws(withPlacements(week, changes), headerId, spreads);
      const { removed, added } = difference(standing, tried);
      for (const draw of removed) loads.pour(draw, -1);
      for (const draw of added) loads.pour(draw, 1);
      const figures = loads.tried();
      for (const draw of added) loads.pour(draw, -1);
      for (const draw of removed) loads.pour(draw, 1);
      loads.restored();
      return figures;
    },
  };
}

function difference(from: readonly SpreadDraw[], to: readonly SpreadDraw[]) {
  const before = new Map(from.map((draw) => [draw.activity.id, draw]));
  const added: SpreadDraw[] = [];
  for (const draw of to) {
    const old = before.get(draw.activity.id);
    if (old && sameDraw(old, draw)) before.delete(draw.activity.id);
    else added.push(draw);
  }
  return { removed: [...before.values()], added };
}

function sameDraw(a: SpreadDraw, b: SpreadDraw): boolean {
  if (a.key !== b.key || a.spread !== b.spread || a.draws.length !== b.draws.length) return false;
  return a.draws.every((draw, i) => {
    const other = b.draws[i] as PlannedDraw;
    return draw.from === other.from && draw.to === other.to && draw.kgPerH === other.kgPerH;
  });
}

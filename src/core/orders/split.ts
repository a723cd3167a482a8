/** An order split over its product's route: runs, kettle batches and retort loads, and when each is needed. */
import { fail, ok, problem, type Result } from '../result';
import type { Stage } from '../plant/activity';
import { splitBatches, splitLoads, type PartLoad } from './amounts';
import { kettleFilling, steadyFilling, type Filling } from './filling';
import { batchPace, loadPace, pacesOf, slowest, type StagePace } from './pace';
import { batchOutKg, type BatchStage, type LoadStage, type OrderRoute, type RunStage } from './route';

export interface RunSplit {
  readonly stage: Stage;
  /** In the order of the route's stages. */
  readonly index: number;
  /** At the machine's own rate. [min] */
  readonly ownMin: number;
  /** As planned: what comes after it may not keep up with its own rate. Whole. [min] */
  readonly minutes: number;
}

export interface BatchSplit {
  readonly inKg: number;
  readonly outKg: number;
  /** After the fill run's start, ready by then and taken off by then. [min] */
  readonly neededMin: number;
  readonly takenOffMin: number;
}

export interface LoadSplit {
  readonly pieces: number;
  /** First container closed no earlier, last one filled by then, after the fill run's start. [min] */
  readonly firstMin: number;
  readonly lastMin: number;
  /** Filled into this load and those before it. [kg] */
  readonly filledKg: number;
  /** The batch, from 1, that must be ready before the load can be full; 0: not out of kettles. */
  readonly needsBatch: number;
}

export interface OrderSplit {
  /** Containers planned, and left over for another order. */
  readonly pieces: number;
  readonly carriedPieces: number;
  readonly kg: number;
  readonly runs: readonly RunSplit[];
  readonly batches: readonly BatchSplit[];
  readonly loads: readonly LoadSplit[];
  readonly paces: readonly StagePace[];
  /** The stage that all others wait for. */
  readonly pace: StagePace;
}

/** Of the longest wait, what the order's own queue for the retorts may take; the rest is for what else holds them. */
const SHARE_OF_WAIT = 0.75;

/** Batches, and loads, that one order may become: more than a week has room for. */
const MOST_PARTS = 400;

interface Parts {
  readonly fill: RunStage;
  readonly batch: BatchStage | null;
  readonly load: LoadStage | null;
}

/**
 * Splits containers over a route. Runs go at their own rate as long as kettles and retorts keep up, else at theirs.
 * @returns ORDER-ROUTE for a route that no order can be split over, ORDER-SMALL where nothing is left to plan,
 * ORDER-LARGE where it is more than a week can hold.
 */
export function splitOrder(route: OrderRoute, pieces: number, part: PartLoad): Result<OrderSplit> {
  const parts = partsOf(route);
  if (!parts.ok) return parts;
  const { fill, batch, load } = parts.value;
  const batchPieces = batch ? batchOutKg(batch) / route.fillKg : Infinity;
  if (pieces / Math.min(batchPieces, load?.pieces ?? Infinity) > MOST_PARTS) {
    const message = `It would be more than ${MOST_PARTS} batches or loads; make several orders of it.`;
    return fail(problem('ORDER-LARGE', message));
  }
  const { loads, carried } = load ? splitLoads(pieces, load.pieces, part) : { loads: [], carried: 0 };
  const planned = pieces - carried;
  if (planned < 1) {
    return fail(problem('ORDER-SMALL', 'It is less than one load: level it, or plan it as a load of its own.', 'part'));
  }
  const kg = planned * route.fillKg;
  const batchesKg = batch ? splitBatches(kg, batchOutKg(batch)) : [];
  const paces = pacesOf(route, fill.piecesPerMin);
  const filling = fillingOf(route, parts.value, { planned, batchesKg, loads });
  return ok({
    ...{ pieces: planned, carriedPieces: carried, kg, paces, pace: slowest(paces) },
    runs: runsOf(route, planned, filling),
    batches: batchesKg.map((outKg, k) => batchSplit(outKg, batch?.yield ?? 1, filling, k)),
    loads: loadsOf(route, loads, batchesKg, filling),
  });
}

function partsOf({ stages }: OrderRoute): Result<Parts> {
  const fillAt = stages.findIndex(({ stage, kind }) => stage === 'fill' && kind === 'run');
  const fill = stages[fillAt];
  if (!fill || fill.kind !== 'run') return fail(problem('ORDER-ROUTE', 'The route has no filling; add one to it.'));
  const batches = stages.filter((stage) => stage.kind === 'batch');
  const loads = stages.filter((stage) => stage.kind === 'load');
  const misplaced = stages.some(({ kind }, i) => (kind === 'batch' && i > fillAt) || (kind === 'load' && i < fillAt));
  if (batches.length > 1 || loads.length > 1 || misplaced) {
    const message = 'An order is split over one cooking before the filling and one retort stage after it.';
    return fail(problem('ORDER-ROUTE', `${message} The route has them otherwise.`));
  }
  return ok({ fill, batch: batches[0] ?? null, load: loads[0] ?? null });
}

interface Amounts {
  readonly planned: number;
  readonly batchesKg: readonly number[];
  readonly loads: readonly number[];
}

/** The filling at the runs' own rates, slowed down to kettles and retorts where they would not keep up. */
function fillingOf(route: OrderRoute, { fill, batch, load }: Parts, { planned, batchesKg, loads }: Amounts): Filling {
  const runs = route.stages.flatMap((stage) => (stage.kind === 'run' ? [stage.piecesPerMin] : []));
  const queues = batch && batchesKg.length > batch.unitMin.length;
  const kettles = queues ? [batchPace(batch, route.fillKg, fill.piecesPerMin).piecesPerMin] : [];
  const own = Math.min(...runs, ...kettles);
  const at = (perMin: number): Filling =>
    batchesKg.length === 0
      ? steadyFilling(planned, perMin)
      : kettleFilling(
          batchesKg.map((kg) => kg / route.fillKg),
          fill.piecesPerMin,
          perMin,
        );
  const filling = at(own);
  if (!load || longestQueueMin(load, loads, filling) <= load.longestWaitMin * SHARE_OF_WAIT) return filling;
  return at(Math.min(own, loadPace(load).piecesPerMin));
}

/** The longest that a load of the order would wait, first container to steam on, with the retorts to itself. [min] */
function longestQueueMin({ unitMin, leadMin }: LoadStage, loads: readonly number[], filling: Filling): number {
  const freeAt = unitMin.map(() => 0);
  const waits = spans(loads).map(([before, upTo]) => {
    const ready = filling.doneMin(upTo);
    const ends = freeAt.map((free, unit) => Math.max(free, ready) + (unitMin[unit] ?? 0));
    const unit = ends.indexOf(Math.min(...ends));
    const start = Math.max(freeAt[unit] ?? 0, ready);
    freeAt[unit] = ends[unit] ?? 0;
    return start + leadMin - filling.firstMin(before);
  });
  return Math.max(0, ...waits);
}

/** Before and up to each load, counted from the order's first container. */
function spans(loads: readonly number[]): [number, number][] {
  let before = 0;
  return loads.map((pieces) => {
    before += pieces;
    return [before - pieces, before];
  });
}

function runsOf(route: OrderRoute, planned: number, filling: Filling): RunSplit[] {
  return route.stages.flatMap((stage, index): RunSplit[] => {
    if (stage.kind !== 'run') return [];
    const ownMin = planned / stage.piecesPerMin;
    const minutes = stage.stage === 'fill' ? filling.minutes : Math.max(Math.ceil(ownMin - 1e-6), filling.minutes);
    return [{ stage: stage.stage, index, ownMin, minutes }];
  });
}

const batchSplit = (outKg: number, yieldShare: number, filling: Filling, k: number): BatchSplit => ({
  inKg: outKg / yieldShare,
  outKg,
  neededMin: filling.emptied[k]?.neededMin ?? 0,
  takenOffMin: filling.emptied[k]?.takenOffMin ?? 0,
});

function loadsOf(
  { fillKg }: OrderRoute,
  loads: readonly number[],
  batchesKg: readonly number[],
  filling: Filling,
): LoadSplit[] {
  const [firstBatch] = batchesKg;
  return spans(loads).map(([before, upTo]) => ({
    pieces: upTo - before,
    firstMin: filling.firstMin(before),
    lastMin: filling.doneMin(upTo),
    filledKg: upTo * fillKg,
    needsBatch: firstBatch === undefined ? 0 : Math.ceil((upTo * fillKg) / firstBatch - 1e-9),
  }));
}

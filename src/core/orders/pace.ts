/** How fast each stage of a route can go on, and which one sets the pace. */
import type { Stage } from '../plant/activity';
import { batchOutKg, type BatchStage, type LoadStage, type OrderRoute } from './route';

/** A stage's pace with the figures that it comes from. */
export interface StagePace {
  readonly stage: Stage;
  readonly piecesPerMin: number;
  /** Machines that share the work; 1 for a run. */
  readonly units: number;
  /** Containers of a batch or load; null for a run. */
  readonly piecesEach: number | null;
  /** How long a machine is taken by each, the longest of them; null for a run. [min] */
  readonly minutesEach: number | null;
}

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

function shared(stage: Stage, pieces: number, unitMin: readonly number[]): StagePace {
  return {
    stage,
    piecesPerMin: sum(unitMin.map((minutes) => pieces / minutes)),
    units: unitMin.length,
    piecesEach: pieces,
    minutesEach: Math.max(...unitMin),
  };
}

/** Loads on all eligible units, door to door. */
export const loadPace = ({ stage, pieces, unitMin }: LoadStage): StagePace => shared(stage, pieces, unitMin);

/** Batches on all eligible units: each cooks, and stays in its kettle until the filler has taken it off. */
export function batchPace(batch: BatchStage, fillKg: number, fillPerMin: number): StagePace {
  const pieces = batchOutKg(batch) / fillKg;
  const drainMin = Math.ceil(pieces / fillPerMin);
  return shared(
    batch.stage,
    pieces,
    batch.unitMin.map((minutes) => minutes + drainMin),
  );
}

/** Every stage's pace, in the order of the route. `fillPerMin`: the filler's own. [1/min] */
export function pacesOf({ stages, fillKg }: OrderRoute, fillPerMin: number): StagePace[] {
  return stages.map((stage) => {
    if (stage.kind === 'load') return loadPace(stage);
    if (stage.kind === 'batch') return batchPace(stage, fillKg, fillPerMin);
    const { piecesPerMin } = stage;
    return { stage: stage.stage, piecesPerMin, units: 1, piecesEach: null, minutesEach: null };
  });
}

/** The slowest; of equals the last. `paces` is not empty. */
export function slowest(paces: readonly StagePace[]): StagePace {
  return paces.reduce((least, pace) => (pace.piecesPerMin <= least.piecesPerMin ? pace : least));
}

/**
 * How much of a shared limit is out at a time, on average: what a load takes, loads an hour, hours that it is out
 * (Little's law).
 */
export const outAtOnce = (perLoad: number, loadsPerH: number, hoursOut: number): number =>
  perLoad * loadsPerH * hoursOut;

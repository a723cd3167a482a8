/** A product's route as an order is split over it: what each stage takes in one go, and how fast. */
import type { Stage } from '../plant/activity';

/** A machine that containers or their contents pass through: one run for the whole order. */
export interface RunStage {
  readonly kind: 'run';
  readonly stage: Stage;
  /** Containers filled from what it passes in a minute. [1/min] */
  readonly piecesPerMin: number;
}

/** A kettle: one batch after another on whichever of its units is free. */
export interface BatchStage {
  readonly kind: 'batch';
  readonly stage: Stage;
  /** What one batch takes in. [kg] */
  readonly sizeKg: number;
  /** kg in containers for every kg that goes in. */
  readonly yield: number;
  /** Start to ready, by eligible unit. [min] */
  readonly unitMin: readonly number[];
}

/** A retort: closed containers in loads. */
export interface LoadStage {
  readonly kind: 'load';
  readonly stage: Stage;
  /** Containers of one load at most. */
  readonly pieces: number;
  /** Door to door, by eligible unit. [min] */
  readonly unitMin: readonly number[];
  /** From the start to steam on. [min] */
  readonly leadMin: number;
  /** From the first container's closing to steam on at most. [min] */
  readonly longestWaitMin: number;
}

export type OrderStage = RunStage | BatchStage | LoadStage;

/** Stages in order; `stages` has one filling, at most one batch stage before it and at most one load stage after it. */
export interface OrderRoute {
  readonly stages: readonly OrderStage[];
  /** Product in one container. [kg] */
  readonly fillKg: number;
}

/**
 * Containers filled from what a machine passes in a minute. [1/min]
 * @param kgPerH what goes in [kg/h]; `yieldShare`: kg in containers for every kg that goes in; `fillKg` [kg].
 */
export const piecesPerMinOf = (kgPerH: number, yieldShare: number, fillKg: number): number =>
  (kgPerH * yieldShare) / (60 * fillKg);

/** What one batch gives into containers. [kg] */
export const batchOutKg = ({ sizeKg, yield: share }: BatchStage): number => sizeKg * share;

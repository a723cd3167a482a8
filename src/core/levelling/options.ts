import type { Interval } from '../time/interval';
import type { ChangePrices } from './problem';

/** What a run of levelling may do. */
export interface LevellingOptions {
  /** Only activities that start in the span may move, and only within it; left out: the whole week. */
  readonly span?: Interval;
  readonly mayChangeUnit?: boolean;
  /** How far a start may move. [min] */
  readonly greatestShiftMin?: number;
  /** False: a start may only move later. */
  readonly mayMoveEarlier?: boolean;
  readonly prices?: Partial<ChangePrices>;
  readonly seed?: number;
  readonly budget?: Budget;
}

/** The search ends at the first bound reached; a run by iterations alone gives the identical plan each time. */
export interface Budget {
  readonly iterations?: number;
  readonly ms?: number;
}

/** A batch that moves is worth a quarter of an hour of moving: the floor counts changes, not minutes. */
export const DEFAULT_PRICES: ChangePrices = { batchMoved: 15, minuteMoved: 1, unitChanged: 30 };

/** Both stages of a day's shift may be used, not another day. [min] */
export const DEFAULT_GREATEST_SHIFT_MIN = 720;

/** Options with every default filled in. */
export type FullOptions = Required<Omit<LevellingOptions, 'span' | 'prices'>> & {
  readonly span: Interval | null;
  readonly prices: ChangePrices;
};

/** Fills in the defaults. */
export function fullOptions(options: LevellingOptions): FullOptions {
  return {
    span: options.span ?? null,
    mayChangeUnit: options.mayChangeUnit ?? true,
    greatestShiftMin: options.greatestShiftMin ?? DEFAULT_GREATEST_SHIFT_MIN,
    mayMoveEarlier: options.mayMoveEarlier ?? true,
    prices: { ...DEFAULT_PRICES, ...options.prices },
    seed: options.seed ?? 1,
    budget: options.budget ?? { iterations: 20_000 },
  };
}

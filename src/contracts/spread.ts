import { z } from 'zod';
import type { StartOutcome, StartSpread } from '../core/header/spread/startSpread';
import type { UnitKind } from '../core/plant/plant';

/** Furthest early or late that may be typed; a start further out is a change of plan, not a spread. [min] */
export const GREATEST_TYPED_MIN = 240;

const minutes = (what: string) =>
  z
    .int(`Give ${what} as whole minutes from 0 to ${GREATEST_TYPED_MIN}.`)
    .min(0, `Give ${what} as whole minutes from 0 to ${GREATEST_TYPED_MIN}.`)
    .max(GREATEST_TYPED_MIN, `Give ${what} as whole minutes from 0 to ${GREATEST_TYPED_MIN}.`);

/** The spread as the person saw it: a save against another one is refused. */
const seen = z.string().min(1).max(80);

/** What is typed from experience: every minute from so early to so late equally likely. */
export const experienceSchema = z.object({ earlyMin: minutes('early'), lateMin: minutes('late') });

/** POST /api/units/:unit/spread */
export const spreadRequestSchema = z.discriminatedUnion('kind', [
  experienceSchema.extend({ kind: z.literal('experience'), seen }),
  /** The recorded starts as the server counts them. */
  z.object({ kind: z.literal('recorded'), seen }),
  z.object({ kind: z.literal('onTime'), seen }),
]);
export type SpreadRequest = z.infer<typeof spreadRequestSchema>;

/** Starts that the floor has recorded, against the issue that was on the floor. */
export interface RecordedStarts {
  readonly count: number;
  /** More than a day out, and not counted. */
  readonly leftOut: number;
  /** Ascending in deviation; none where nothing is recorded. */
  readonly outcomes: readonly StartOutcome[];
}

export interface UnitSpreadDto {
  readonly unitId: string;
  readonly name: string;
  readonly lineName: string;
  readonly kind: UnitKind;
  /** null: every start on its planned minute. */
  readonly spread: StartSpread | null;
  /** Where the spread is from. */
  readonly source: string | null;
  readonly seen: string;
  readonly recorded: RecordedStarts;
}

/** GET /api/units/spread */
export interface SpreadListDto {
  /** Weeks back that recorded starts are taken from. */
  readonly weeks: number;
  /** Fewer recorded starts than this are not offered. */
  readonly leastCount: number;
  readonly units: readonly UnitSpreadDto[];
}

/** 409 SPREAD-STALE: nothing was saved; this is what there is now. */
export interface SpreadStaleResponse {
  readonly code: 'SPREAD-STALE';
  readonly message: string;
  readonly unit: UnitSpreadDto;
}

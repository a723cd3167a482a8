import { z } from 'zod';
import type { HeaderCapacity } from '../core/plant/plant';

const span = {
  /** Minutes since the week's first instant. */
  fromMin: z.int().min(0).max(10_140),
  toMin: z.int().min(1).max(10_140),
  reason: z.string().trim().min(1, 'Say why in a few words.').max(500),
};
const ordered = (v: { fromMin: number; toMin: number }): boolean => v.toMin > v.fromMin;
const orderedMessage = { path: ['toMin'], message: 'The span must end after it begins.' };

/** POST /api/weeks/:weekStart/firings: a boiler lit, shut or derated for a span. */
export const firingRequestSchema = z
  .object({ ...span, boilerId: z.string().min(1).max(80), share: z.number().min(0).max(1) })
  .refine(ordered, orderedMessage);
export type FiringRequest = z.infer<typeof firingRequestSchema>;

/** POST /api/weeks/:weekStart/limits: the steam limit of a header for a span; null takes a set limit back. */
export const limitRequestSchema = z
  .object({ ...span, headerId: z.string().min(1).max(80), limitKgPerH: z.number().min(0).max(1_000_000).nullable() })
  .refine(ordered, orderedMessage);
export type LimitRequest = z.infer<typeof limitRequestSchema>;

export interface BoilerDto {
  readonly id: string;
  readonly name: string;
  readonly headerId: string;
  readonly ratingFromAndAtKgPerH: number;
  /** Net export at header conditions when fully lit. [kg/h] */
  readonly netKgPerH: number;
  readonly pressureBarG: number;
  readonly turndown: number;
  readonly greatestRiseFractionPerMin: number;
  /** share of full rating over the week: 0 shut, 1 lit. */
  readonly share: readonly { readonly from: number; readonly value: number }[];
}

/** One line of the week's capacity record, newest first. */
export interface CapacityEntryDto {
  readonly id: string;
  readonly kind: 'firing' | 'limit';
  readonly subject: string;
  readonly fromMin: number;
  readonly toMin: number;
  readonly value: number | null;
  readonly reason: string;
  readonly by: string;
  /** ISO instant. */
  readonly at: string;
}

/** GET /api/weeks/:weekStart/capacity */
export interface CapacityDto {
  readonly weekStart: string;
  readonly timeZone: string;
  readonly firstInstant: string;
  readonly now: string;
  readonly horizonMin: number;
  readonly reserveFraction: number;
  readonly boilers: readonly BoilerDto[];
  readonly capacities: readonly HeaderCapacity[];
  readonly headers: readonly {
    readonly id: string;
    readonly name: string;
    readonly pressureBarG: number;
    readonly dryness: number | null;
  }[];
  readonly entries: readonly CapacityEntryDto[];
}

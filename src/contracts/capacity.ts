import { z } from 'zod';
import type { FuelKey } from '../core/duty/fuel';
import type { StartUpHeader } from '../core/house/headerNeeds';
import type { Fire, ReadyTimes } from '../core/house/readiness';
import type { HeaderCapacity } from '../core/plant/plant';
import type { StepFunction } from '../core/time/stepFunction';

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

export interface BoilerDto extends ReadyTimes {
  readonly id: string;
  readonly name: string;
  readonly headerId: string;
  readonly ratingFromAndAtKgPerH: number;
  /** Net export at header conditions when fully lit. [kg/h] */
  readonly netKgPerH: number;
  readonly pressureBarG: number;
  readonly turndown: number;
  readonly greatestRiseFractionPerMin: number;
  /** Heat into the water when fully lit. [kW] */
  readonly heatToWaterKW: number;
  readonly efficiency: number;
  readonly fuel: FuelKey;
  /** Share of full rating, 0 shut, 1 lit; from before the week, so far as that bears on it (negative minutes). */
  readonly share: StepFunction;
  /** Spells in fire, with when they are ready; the first may have begun before the week. */
  readonly fires: readonly Fire[];
}

/** A header of the capacity desk. */
export interface DeskHeaderDto extends StartUpHeader {
  readonly name: string;
  readonly pressureBarG: number;
  readonly dryness: number | null;
}

/** Losses and users outside the plan, by hour of the week (0 is its first hour). */
export interface BaseLoadDto {
  readonly id: string;
  readonly headerId: string;
  readonly fromHour: number;
  readonly toHour: number;
  readonly kgPerH: number;
  readonly note: string;
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
  /** The same with, at each time, the boiler out that exports most. */
  readonly largestOut: readonly HeaderCapacity[];
  readonly headers: readonly DeskHeaderDto[];
  readonly baseLoads: readonly BaseLoadDto[];
  /** Price of a kWh of fuel; null: not set. */
  readonly fuelPricePerKWh: number | null;
  readonly currency: string;
  /** Product of the orders that the week's plan has placed. [kg] */
  readonly placedKg: number;
  readonly entries: readonly CapacityEntryDto[];
}

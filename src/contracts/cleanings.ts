import { z } from 'zod';
import { CLEANING_KINDS } from './products';

/** POST /api/weeks/:weekStart/cleanings: a clean of a unit, not yet placed; the plant's longest rule says what it takes. */
export const cleaningPlanSchema = z.object({
  unitId: z.string().min(1, { error: 'Choose a unit.' }).max(80),
  kind: z.enum(CLEANING_KINDS, { error: 'Choose how it is cleaned.' }),
});
export type CleaningPlanRequest = z.infer<typeof cleaningPlanSchema>;

/** The clean that was added, or the plan after one was removed. */
export interface CleaningPlanDto {
  readonly activityId: string;
  /** As people call it, such as "C1". */
  readonly code: string;
  readonly planRevision: number;
}

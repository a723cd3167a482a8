import { z } from 'zod';

/** GET /api/weeks/:weekStart/rework: runs whose duty or route has changed since they were planned. */
export interface OutOfDateDto {
  readonly planRevision: number;
  readonly activities: readonly {
    readonly id: string;
    readonly code: string;
    readonly title: string;
    /** What would change, in a few words. */
    readonly change: string;
  }[];
  /** Stages that the library can't work out as it stands; their runs keep what they have. */
  readonly faults: readonly string[];
}

/** POST /api/weeks/:weekStart/rework: works runs out anew, all that are out of date or some of them. */
export const reworkRequestSchema = z.object({
  activityIds: z.union([z.literal('all'), z.array(z.string().min(1).max(80)).min(1).max(2000)]),
});
export type ReworkRequest = z.infer<typeof reworkRequestSchema>;

export interface ReworkedDto {
  readonly planRevision: number;
  readonly reworked: number;
}

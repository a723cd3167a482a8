import { z } from 'zod';
import type { LevellingProposal } from '../core/levelling/proposal';

/** POST /api/weeks/:weekStart/levelling */
export const levellingRequestSchema = z.object({
  planRevision: z.int().min(0),
  /** Only starts in [fromMin, toMin) may move; left out: the whole week from now on. */
  fromMin: z.int().min(0).max(10_140).optional(),
  toMin: z.int().min(0).max(10_140).optional(),
  mayChangeUnit: z.boolean().default(true),
  /** How far a start may move. [min] */
  greatestShiftMin: z.int().min(1).max(2_880).default(720),
  /** How long to look. [s] */
  seconds: z.int().min(1).max(120).default(15),
});
export type LevellingRequest = z.infer<typeof levellingRequestSchema>;

/** POST /api/levelling/:runId/accept */
export const acceptRequestSchema = z.object({
  /** Batches' moves to take, by activity id; 'all' takes the whole proposal. */
  activityIds: z.union([z.literal('all'), z.array(z.string().min(1).max(80)).min(1).max(600)]),
});
export type AcceptRequest = z.infer<typeof acceptRequestSchema>;

export interface LevellingProgressDto {
  readonly ms: number;
  readonly overKg: number;
  readonly lateMin: number;
  readonly movedMin: number;
}

export type LevellingState = 'queued' | 'running' | 'proposed' | 'accepted' | 'discarded' | 'cancelled' | 'failed';

export interface LevellingRunDto {
  readonly id: string;
  readonly planRevision: number;
  readonly state: LevellingState;
  readonly by: string;
  readonly seconds: number;
  readonly progress: readonly LevellingProgressDto[];
  readonly proposal: LevellingProposal | null;
  readonly failure: string | null;
}

import { z } from 'zod';
import type { StartSpread } from '../core/header/spread/startSpread';
import type { Activity } from '../core/plant/activity';
import type { Interval } from '../core/time/interval';
import type { Week } from '../core/schedule/week';
import type { FloorEventKind } from '../core/shift/floorEvent';
import type { LevellingRunDto } from './levelling';

const idText = z.string().min(1).max(80);

/** The first day of a planning week in the plant's zone, such as 2026-11-30. */
export const weekStartSchema = z.iso.date();

export const placementSchema = z.object({
  unitId: idText,
  start: z.int().min(0).max(10_140),
  cleanAfterMin: z.int().min(0).max(1_440).optional(),
});

const changeSchema = z.object({
  activityId: idText,
  /** The revision that the client has. */
  revision: z.int().min(0),
  /** null takes the activity off the board. */
  placement: placementSchema.nullable(),
  fixing: z.enum(['free', 'fixed']).optional(),
});

/** POST /api/weeks/:weekStart/edits. One stale activity refuses the whole edit. */
export const editRequestSchema = z.object({
  kind: z.enum(['place', 'move', 'takeOff', 'fix', 'slip', 'undo', 'redo']),
  changes: z.array(changeSchema).min(1).max(600),
});
export type EditRequest = z.infer<typeof editRequestSchema>;

/** An activity's changeable part as it is now, with who moved it last. */
export type ActivityState = Pick<Activity, 'id' | 'placement' | 'fixing' | 'revision'> & {
  readonly movedBy: string | null;
  /** ISO instant. */
  readonly movedAt: string | null;
};

export interface EditResponse {
  readonly planRevision: number;
  readonly activities: readonly ActivityState[];
}

/** 409 PLAN-STALE: nothing was saved; these are the current values. */
export interface StaleResponse {
  readonly code: 'PLAN-STALE';
  readonly message: string;
  readonly planRevision: number;
  readonly stale: readonly ActivityState[];
}

export interface ShiftSpan extends Interval {
  readonly shiftId: string;
  readonly name: string;
  /** The plant-zone date on which the shift starts, such as 2026-12-01. */
  readonly date: string;
  readonly lineIds: readonly string[] | null;
}

export interface FloorEventDto {
  readonly id: string;
  readonly activityId: string;
  readonly event: FloorEventKind;
  /** Minutes since the week's first instant. */
  readonly minute: number;
  readonly by: string;
}

export interface IssueDto {
  readonly id: string;
  readonly number: number;
  readonly revision: number;
  /** ISO instant. */
  readonly at: string;
  readonly by: string;
  readonly comment: string;
  readonly agreedBy: string | null;
}

export interface AgreementDto {
  readonly revision: number;
  readonly at: string;
  readonly by: string;
  readonly comment: string;
}

/** GET /api/weeks/:weekStart: all that the board needs; also handed to the island as its first data. */
export interface WeekDto {
  readonly planId: string;
  readonly weekStart: string;
  readonly planRevision: number;
  readonly timeZone: string;
  /** ISO instant of minute 0. */
  readonly firstInstant: string;
  /** ISO instant of the server's clock when this was read. */
  readonly now: string;
  readonly week: Week;
  readonly shifts: readonly ShiftSpan[];
  /** By activity id, for activities that somebody has moved. */
  readonly moved: Readonly<Record<string, { readonly by: string; readonly at: string }>>;
  readonly floorEvents: readonly FloorEventDto[];
  /** The latest on the floor, if any. */
  readonly issue: IssueDto | null;
  /** An agreement to the present revision, if any. */
  readonly agreement: AgreementDto | null;
  /** The newest run that is queued, running or proposed. */
  readonly levelling: LevellingRunDto | null;
  readonly families: readonly { readonly id: string; readonly name: string }[];
  /** How early or late starts are, by unit id; a unit without one starts on time. */
  readonly startSpreads: Readonly<Record<string, StartSpread>>;
}

/** POST /api/weeks/:weekStart/issues and .../agreements */
export const commentRequestSchema = z.object({
  /** The plan's revision that the person saw. */
  planRevision: z.int().min(0),
  comment: z.string().trim().min(1, 'Say why in a few words.').max(2_000),
});
export type CommentRequest = z.infer<typeof commentRequestSchema>;

/** Server-sent events on GET /api/events?week=...: names of what changed, never data. */
export interface PlantNotice {
  readonly kind: 'plan' | 'capacity' | 'issue' | 'floor' | 'levelling' | 'processData' | 'plant' | 'people' | 'orders';
  readonly planId?: string;
  readonly revision?: number;
  readonly runId?: string;
}

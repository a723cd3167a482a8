import { z } from 'zod';
import type { Activity } from '../core/plant/activity';
import { FLOOR_EVENTS } from '../core/shift/floorEvent';
import type { PlannedEvent } from '../core/shift/sequence';
import type { SteamOnBy } from '../core/shift/steamOnBy';
import type { FloorEventDto, IssueDto, ShiftSpan } from './week';

/** POST /api/weeks/:weekStart/floor-events */
export const floorEventRequestSchema = z.object({
  activityId: z.string().min(1).max(80),
  event: z.enum(FLOOR_EVENTS),
  /** When it happened; left out: now. ISO instant. */
  at: z.iso.datetime({ offset: true }).optional(),
  /** The issue that the sheet showed. */
  issueId: z.string().min(1).max(80),
});
export type FloorEventRequest = z.infer<typeof floorEventRequestSchema>;

/** GET /api/weeks/:weekStart/shift-sheet?line=...&shift=...&date=...: one line's shift from the issue on the floor. */
export interface ShiftSheetDto {
  readonly weekStart: string;
  readonly timeZone: string;
  readonly firstInstant: string;
  readonly now: string;
  readonly plantName: string;
  readonly isDemo: boolean;
  readonly line: { readonly id: string; readonly name: string };
  readonly shift: ShiftSpan;
  /** null: nothing is on the floor yet. */
  readonly issue: IssueDto | null;
  readonly rows: readonly ShiftRowDto[];
}

export interface ShiftRowDto {
  readonly activity: Activity;
  readonly unitName: string;
  readonly start: number;
  readonly end: number;
  /** In order of time. */
  readonly planned: readonly PlannedEvent[];
  readonly steamOnBy: SteamOnBy | null;
  readonly events: readonly FloorEventDto[];
}

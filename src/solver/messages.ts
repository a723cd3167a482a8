import type { LevellingProgress, LevellingResult } from '../core/levelling/levelWeek';
import type { LevellingOptions } from '../core/levelling/options';
import type { Week } from '../core/schedule/week';
import type { MailboxPart } from './mailbox';

/** What the thread is started with: `cancel[0]` is set to 1 to stop it, and may be shared between processors. */
export interface StartMessage {
  readonly kind: 'start';
  readonly week: Week;
  readonly options: LevellingOptions;
  readonly cancel: Int32Array;
  /** Left out: this thread searches alone. */
  readonly mailbox?: MailboxPart;
}

export type ThreadMessage =
  | { readonly kind: 'progress'; readonly progress: LevellingProgress }
  | { readonly kind: 'done'; readonly result: LevellingResult };

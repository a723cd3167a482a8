import { Worker, type WorkerOptions } from 'node:worker_threads';
import type { LevellingProgress, LevellingResult } from '../core/levelling/levelWeek';
import type { LevellingOptions } from '../core/levelling/options';
import type { Week } from '../core/schedule/week';
import { markGone, newMailbox, type MailboxPart, type Side } from './mailbox';
import type { StartMessage, ThreadMessage } from './messages';

export interface LevellingJob {
  readonly week: Week;
  readonly options: LevellingOptions;
  /** 2: one searches from the plan, one from nothing, and they tell each other what they find. 1 unless given. */
  readonly threads?: 1 | 2;
  readonly onProgress?: (progress: LevellingProgress) => void;
}

export interface RunningLevelling {
  /** Rejects when the thread that answers dies without an answer. */
  readonly result: Promise<LevellingResult>;
  /** Asks the threads to stop; they answer with the best found so far. */
  readonly cancel: () => void;
  /** Ends the threads at once, without an answer. */
  readonly kill: () => Promise<unknown>;
}

/** Levels a week on threads of its own. `script` is the built thread entry; `worker` goes to each thread as it is. */
export function startLevelling(script: string | URL, job: LevellingJob, worker: WorkerOptions = {}): RunningLevelling {
  const cancel = new Int32Array(new SharedArrayBuffer(4));
  const parts = job.threads === 2 ? mailboxFor(job) : null;
  const start = (part: MailboxPart | null): Worker => {
    const thread = new Worker(script, worker);
    const message: StartMessage = {
      kind: 'start',
      week: job.week,
      options: job.options,
      cancel,
      ...(part ? { mailbox: part } : {}),
    };
    thread.postMessage(message);
    return thread;
  };
  const helper = parts && start(parts[1]);
  helper?.on('error', (error) => console.error('the second levelling thread ended:', error));
  helper?.on('exit', () => parts && markGone(parts[1]));
  const thread = start(parts && parts[0]);
  const kill = (): Promise<unknown> => Promise.all([thread.terminate(), helper?.terminate()]);
  const result = answerOf(thread, job).finally(() => helper?.terminate());
  return { result, cancel: () => void Atomics.store(cancel, 0, 1), kill };
}

function answerOf(thread: Worker, { onProgress }: LevellingJob): Promise<LevellingResult> {
  return new Promise<LevellingResult>((resolve, reject) => {
    thread.on('message', (message: ThreadMessage) => {
      if (message.kind === 'progress') onProgress?.(message.progress);
      else resolve(message.result);
    });
    thread.on('error', reject);
    thread.on('exit', (code) => reject(new Error(`levelling thread ended with code ${code} before it had an answer`)));
  });
}

/** A run without a bound in time is held in step, so that it comes out the same each time. */
function mailboxFor({ week, options }: LevellingJob): readonly [MailboxPart, MailboxPart] {
  const room = week.activities.length;
  const shared = newMailbox(room);
  const inStep = options.budget?.ms === undefined && options.budget?.iterations !== undefined;
  const part = (side: Side): MailboxPart => ({ shared, side, room, inStep });
  return [part(0), part(1)];
}

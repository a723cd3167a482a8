import { Worker, type WorkerOptions } from 'node:worker_threads';
import type { LevellingProgress, LevellingResult } from '../core/levelling/levelWeek';
import type { LevellingOptions } from '../core/levelling/options';
import type { Week } from '../core/schedule/week';
import type { StartMessage, ThreadMessage } from './messages';

export interface LevellingJob {
  readonly week: Week;
  readonly options: LevellingOptions;
  readonly onProgress?: (progress: LevellingProgress) => void;
}

export interface RunningLevelling {
  /** Rejects when the thread dies without an answer. */
  readonly result: Promise<LevellingResult>;
  /** Asks the thread to stop; it answers with the best found so far. */
  readonly cancel: () => void;
  /** Ends the thread at once, without an answer. */
  readonly kill: () => Promise<unknown>;
}

/** Levels a week on a thread of its own. `script` is the built thread entry; `worker` goes to the thread as it is. */
export function startLevelling(script: string | URL, job: LevellingJob, worker: WorkerOptions = {}): RunningLevelling {
  const cancel = new Int32Array(new SharedArrayBuffer(4));
  const thread = new Worker(script, worker);
  const result = new Promise<LevellingResult>((resolve, reject) => {
    thread.on('message', (message: ThreadMessage) => {
      if (message.kind === 'progress') job.onProgress?.(message.progress);
      else resolve(message.result);
    });
    thread.on('error', reject);
    thread.on('exit', (code) => reject(new Error(`levelling thread ended with code ${code} before it had an answer`)));
  });
  const start: StartMessage = { kind: 'start', week: job.week, options: job.options, cancel };
  thread.postMessage(start);
  return { result, cancel: () => void Atomics.store(cancel, 0, 1), kill: () => thread.terminate() };
}

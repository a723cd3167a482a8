import { closeDb } from '@/db/client';
import { reapLostRuns } from '../levelling/reaper';
import { workOnRun, type StartThread } from '../levelling/runner';
import { enqueueLevelling, LEVELLING_QUEUE, openQueue, type LevellingJob } from './queue';

const POLL_SECONDS = 0.5;
const REAP_MS = 5_000;
const STOP_MS = 8_000;

/**
 * Takes levelling runs from the queue until the process is asked to stop; any number of processes may. What it works on
 * by then goes back to the queue. `stopBeside` ends what else the process does, before the database is let go.
 */
export async function runLevellingWorker(
  startThread: StartThread,
  stopBeside: () => Promise<void> = async () => undefined,
): Promise<void> {
  process.on('unhandledRejection', (error) => console.error('levelling worker:', error));
  const stop = new AbortController();
  const queue = await openQueue(true);
  const requeue = (tx: Parameters<typeof enqueueLevelling>[0], runId: string) => enqueueLevelling(tx, queue, { runId });
  const options = { pollingIntervalSeconds: POLL_SECONDS, batchSize: 1 };
  await queue.work<LevellingJob>(LEVELLING_QUEUE, options, async (jobs) => {
    for (const { data } of jobs) await workOnRun(data.runId, { startThread, stop: stop.signal, requeue });
  });
  const reaping = setInterval(() => {
    reapLostRuns().catch((error: unknown) => console.error('levelling worker: reaping:', error));
  }, REAP_MS);
  onStopSignal(async () => {
    clearInterval(reaping);
    stop.abort();
    await Promise.all([queue.stop({ graceful: true, timeout: STOP_MS }), stopBeside()]);
    await closeDb();
  });
  console.log('The levelling worker is ready.');
}

function onStopSignal(finish: () => Promise<void>): void {
  let stopping = false;
  for (const signal of ['SIGTERM', 'SIGINT'] as const) {
    process.on(signal, () => {
      if (stopping) return;
      stopping = true;
      finish().then(
        () => process.exit(0),
        (error: unknown) => {
          console.error('levelling worker: stopping:', error);
          process.exit(1);
        },
      );
    });
  }
}

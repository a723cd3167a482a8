import PgBoss from 'pg-boss';
import { sql, type SQL } from 'drizzle-orm';
import { databaseUrl, type Db } from '@/db/client';

export const LEVELLING_QUEUE = 'levelling';
/** Beyond the longest search and its check; the run's own heartbeat notices a lost worker long before. */
const EXPIRE_SECONDS = 600;

export interface LevellingJob {
  readonly runId: string;
}

/** Opens the queue in the application's database; `supervise` also tidies up finished jobs. */
export async function openQueue(supervise: boolean): Promise<PgBoss> {
  const boss = new PgBoss({ connectionString: databaseUrl(), max: 2, schedule: false, supervise });
  boss.on('error', (error) => console.error('levelling queue:', error.message));
  await boss.start();
  // Sending to a queue that was never made answers null without a word.
  await boss.createQueue(LEVELLING_QUEUE, {
    name: LEVELLING_QUEUE,
    policy: 'standard',
    retryLimit: 0,
    expireInSeconds: EXPIRE_SECONDS,
  });
  return boss;
}

let sending: Promise<PgBoss> | null = null;

/** Opens this process's queue for sending, once; call it before the transaction that sends. */
export async function readyToSend(): Promise<PgBoss> {
  sending ??= openQueue(false).catch((error: unknown) => {
    sending = null;
    throw error;
  });
  return sending;
}

/** Closes what `readyToSend` opened. */
export async function closeQueue(): Promise<void> {
  const closing = sending;
  sending = null;
  await (await closing)?.stop({ graceful: false });
}

/** Puts a run into the queue within the transaction that wrote its row: both are there or neither. */
export async function enqueueLevelling(tx: Db, boss: PgBoss, job: LevellingJob): Promise<void> {
  const executeSql = async (text: string, values: unknown[]) => {
    const { rows } = await tx.execute(withParameters(text, values));
    return { rows: rows as unknown[] };
  };
  const id = await boss.send(LEVELLING_QUEUE, job, { db: { executeSql } });
  if (id === null) throw new Error(`run ${job.runId} was not taken by the queue`);
}

/** A statement written with $1, $2 ... as drizzle takes it. */
function withParameters(text: string, values: readonly unknown[]): SQL {
  const parts = text.split(/\$(\d+)/);
  return sql.join(
    parts.map((part, i) => (i % 2 === 0 ? sql.raw(part) : sql`${sql.param(values[Number(part) - 1] ?? null)}`)),
  );
}

import pg from 'pg';
import { databaseUrl } from '@/db/client';

export interface ListenerOptions {
  readonly channels: readonly string[];
  readonly onMessage: (channel: string, payload: string) => void;
  /** Listening (again): whatever was said before has been missed. */
  readonly onListening: () => void;
}

export interface Listener {
  readonly stop: () => Promise<void>;
}

const SHORTEST_WAIT_MS = 250;
const LONGEST_WAIT_MS = 15_000;

async function listen(client: pg.Client, channels: readonly string[]): Promise<void> {
  await client.connect();
  for (const channel of channels) await client.query(`listen ${client.escapeIdentifier(channel)}`);
}

/** Keeps one connection listening; a lost one is tried again at growing waits until stopped. */
export function startListener(options: ListenerOptions): Listener {
  let client: pg.Client | null = null;
  let timer: NodeJS.Timeout | undefined;
  let waitMs = SHORTEST_WAIT_MS;
  let stopped = false;

  const retry = (lost: pg.Client, why: string): void => {
    if (client !== lost || stopped) return;
    client = null;
    console.error(`listening connection lost (${why}); trying again in ${waitMs} ms`);
    void lost.end().catch(() => undefined);
    timer = setTimeout(start, waitMs);
    timer.unref();
    waitMs = Math.min(LONGEST_WAIT_MS, waitMs * 2);
  };

  const start = (): void => {
    const opened = new pg.Client({ connectionString: databaseUrl(), keepAlive: true, connectionTimeoutMillis: 10_000 });
    client = opened;
    opened.on('error', (error) => retry(opened, error.message));
    opened.on('end', () => retry(opened, 'ended by the database'));
    opened.on('notification', ({ channel, payload }) => options.onMessage(channel, payload ?? ''));
    listen(opened, options.channels).then(
      () => {
        waitMs = SHORTEST_WAIT_MS;
        if (client === opened) options.onListening();
      },
      (error: unknown) => retry(opened, error instanceof Error ? error.message : String(error)),
    );
  };

  start();
  return {
    stop: async () => {
      stopped = true;
      clearTimeout(timer);
      await client?.end().catch(() => undefined);
    },
  };
}

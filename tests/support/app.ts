import { join } from 'node:path';
import { testDist } from '../../scripts/support/build';
import { type AppProcess, startProcess } from '../../scripts/support/child';
import { anyFreePort } from '../../scripts/support/ports';
import { waitUntilServing } from '../../scripts/support/waitUntilServing';
import { createDemoDatabase, type TestDatabase } from './database';

/** The built application, running: web process and levelling worker on a database of their own. */
export interface TestApp {
  /** Without a slash at its end. */
  readonly url: string;
  readonly databaseUrl: string;
  /** What both processes have printed, newest last. */
  readonly lines: readonly string[];
  /** Starts both processes again with the clock at another instant; data, address and sign-ins stay. */
  setClock(now: string): Promise<void>;
  stop(): Promise<void>;
}

/**
 * Starts the built application, its clock set to `now` (an ISO instant) and running on from there: with the demo plant,
 * or on another database.
 */
export async function startApp(
  now: string,
  extraEnv: Record<string, string> = {},
  makeDatabase: (now: string) => Promise<TestDatabase> = createDemoDatabase,
): Promise<TestApp> {
  const database = await makeDatabase(now);
  const port = await anyFreePort();
  const url = `http://localhost:${port}`;
  const lines: string[] = [];
  let processes: AppProcess[] = [];

  const start = async (instant: string): Promise<void> => {
    const env = { DATABASE_URL: database.url, PORT: String(port), APP_URL: url, STEADMAIN_NOW: instant, ...extraEnv };
    processes = ['web/web.js', 'worker/worker.js'].map((file) =>
      startProcess(join(testDist, file), env, (line) => lines.push(`[${file.slice(0, file.indexOf('/'))}] ${line}`)),
    );
    await waitUntilServing(`http://127.0.0.1:${port}/healthz`).catch((error: unknown) => {
      throw new Error(`The application did not start:\n${lines.join('\n')}`, { cause: error });
    });
  };
  const stopProcesses = async (): Promise<void> => {
    await Promise.all(processes.map((process) => process.stop()));
  };

  await start(now);
  return {
    url,
    databaseUrl: database.url,
    lines,
    setClock: async (instant) => {
      await stopProcesses();
      await start(instant);
    },
    stop: async () => {
      await stopProcesses();
      await database.close();
    },
  };
}

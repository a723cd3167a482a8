import { type HeldServer, holdServer } from './postgres/hold';
import { say } from './say';

const LOOK_EVERY_MS = 3_000;

/** Starts PostgreSQL again when it ends under a running application. @returns how to stop watching. */
export function watchServer(server: HeldServer): () => Promise<void> {
  let restarting: Promise<unknown> | undefined;
  const timer = setInterval(() => {
    if (restarting || server.isRunning()) return;
    say('PostgreSQL ended by itself; starting it again');
    restarting = restart().finally(() => (restarting = undefined));
  }, LOOK_EVERY_MS);
  return async () => {
    clearInterval(timer);
    await restarting;
  };
}

/** The place is the same, so the server that we hold is the one that runs again. */
async function restart(): Promise<void> {
  try {
    await (await holdServer('postgres')).letGoWithoutStopping();
  } catch (error) {
    say(`PostgreSQL could not be started again: ${error instanceof Error ? error.message : String(error)}`);
  }
}

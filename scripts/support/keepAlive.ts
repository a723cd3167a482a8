import { type AppProcess, startProcess } from './child';
import { say } from './say';

const FIRST_WAIT_MS = 1_000;
const LONGEST_WAIT_MS = 30_000;
const STEADY_AFTER_MS = 60_000;

/** A process of the application that is started again when it ends by itself. */
export interface KeptProcess {
  stop(): Promise<void>;
}

/** Starts a built file and starts it again, with growing pauses, each time that it ends unasked. */
export function keepAlive(name: string, file: string, env: Record<string, string | undefined>): KeptProcess {
  let current: AppProcess | undefined;
  let stopping = false;
  let wake: () => void = () => undefined;

  const loop = async (): Promise<void> => {
    let waitMs = FIRST_WAIT_MS;
    while (!stopping) {
      const startedAt = Date.now();
      current = startProcess(file, env, (line) => console.log(`[${name}] ${line}`));
      const reason = await current.ended;
      if (stopping) return;
      if (Date.now() - startedAt > STEADY_AFTER_MS) waitMs = FIRST_WAIT_MS;
      say(`The ${name} process ended by itself (${reason}); starting it again in ${waitMs / 1000} s`);
      await new Promise<void>((resolve) => {
        const timer = setTimeout(resolve, waitMs);
        wake = () => {
          clearTimeout(timer);
          resolve();
        };
      });
      waitMs = Math.min(waitMs * 2, LONGEST_WAIT_MS);
    }
  };

  const done = loop();
  return {
    stop: async () => {
      stopping = true;
      wake();
      await current?.stop();
      await done;
    },
  };
}

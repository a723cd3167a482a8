import { Sentence } from './project';
import { stopRunning } from './run';
import { say } from './say';

type Step = () => Promise<void>;

const steps: Step[] = [];
let finishing: Promise<void> | undefined;

/** Names something to undo at the end; the last named is undone first. */
export function atEnd(step: Step): void {
  steps.push(step);
}

/** Undoes everything named, once, however often it is called. */
export function undoAll(): Promise<void> {
  finishing ??= (async () => {
    for (const step of steps.reverse()) {
      await step().catch((error: unknown) => console.error(error));
    }
  })();
  return finishing;
}

/**
 * Runs a command to its end: Ctrl-C, a closed terminal or a failure all lead through {@link undoAll}.
 * `work` gives the exit code.
 */
export async function runCommand(work: () => Promise<number>): Promise<never> {
  // A closed terminal makes every further line fail; what is left to undo must be undone all the same.
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => undefined);
  let signalled = 0;
  const onSignal = (code: number) => () => {
    if (signalled) return;
    signalled = code;
    console.log('');
    say('Stopping');
    stopRunning();
    void undoAll().then(() => {
      say('Stopped');
      process.exit(code);
    });
  };
  process.on('SIGINT', onSignal(130));
  process.on('SIGTERM', onSignal(143));
  process.on('SIGHUP', onSignal(129));
  let code = 1;
  try {
    code = await work();
  } catch (error) {
    // Commands cut short by a signal fail; that is no news.
    if (!signalled) console.error(error instanceof Sentence ? `\n${error.message}` : error);
  }
  await undoAll();
  if (signalled) await new Promise(() => undefined);
  process.exit(code);
}

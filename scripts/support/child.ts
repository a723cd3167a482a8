import { type ChildProcess, spawn } from 'node:child_process';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { projectDir } from './project';
import { cleanEnv } from './run';

const LEASH = fileURLToPath(new URL('leash.mjs', import.meta.url));
const STOP_WITHIN_MS = 10_000;

/** A long-running process of the application. */
export interface AppProcess {
  /** Settles when it has ended, with what is known of why. */
  readonly ended: Promise<string>;
  /** Asks it to end and waits; after ten seconds it is ended by force. */
  stop(): Promise<void>;
}

/**
 * Starts a built file of the application in a session of its own (the terminal's Ctrl-C does not reach it) and on a
 * leash (it ends when this process is gone). Each line that it prints goes to `onLine`.
 */
export function startProcess(
  file: string,
  env: Record<string, string | undefined>,
  onLine: (line: string) => void,
): AppProcess {
  const child = spawn(process.execPath, ['--import', LEASH, '--enable-source-maps', file], {
    cwd: projectDir,
    env: cleanEnv({ NODE_ENV: 'production', ...env }),
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
    detached: true,
  });
  for (const stream of [child.stdout, child.stderr]) {
    if (stream) createInterface({ input: stream }).on('line', onLine);
  }
  const ended = new Promise<string>((resolve) => {
    child.on('error', (error) => resolve(error.message));
    child.on('exit', (code, signal) => resolve(signal ? `signal ${signal}` : `exit code ${code}`));
  });
  return { ended, stop: () => stopChild(child, ended) };
}

async function stopChild(child: ChildProcess, ended: Promise<string>): Promise<void> {
  if (child.exitCode === null && child.signalCode === null) child.kill('SIGTERM');
  const force = setTimeout(() => child.kill('SIGKILL'), STOP_WITHIN_MS);
  await ended;
  clearTimeout(force);
}

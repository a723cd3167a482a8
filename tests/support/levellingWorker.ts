import { spawn, type ChildProcess } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { createInterface } from 'node:readline';

const root = fileURLToPath(new URL('../..', import.meta.url));
const entry = fileURLToPath(new URL('./sourceWorker.ts', import.meta.url));

/** A levelling worker in a process of its own, from the sources. */
export interface WorkerProcess {
  readonly lines: readonly string[];
  /** SIGTERM, then waits. */
  stop(): Promise<void>;
  /** SIGKILL: as if the machine had lost power. */
  kill(): Promise<void>;
}

/** Starts a worker on the database of DATABASE_URL and waits until it is ready. */
export async function startWorker(env: Record<string, string> = {}): Promise<WorkerProcess> {
  const child = spawn(process.execPath, ['--import', 'tsx', entry], {
    cwd: root,
    env: { ...process.env, ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const lines: string[] = [];
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  const ready = new Promise<void>((resolve, reject) => {
    for (const stream of [child.stdout, child.stderr]) {
      createInterface({ input: stream }).on('line', (line) => {
        lines.push(line);
        if (line.includes('worker is ready')) resolve();
      });
    }
    child.once('exit', () => reject(new Error(`the worker ended:\n${lines.join('\n')}`)));
  });
  await ready;
  return { lines, stop: () => end(child, ended, 'SIGTERM'), kill: () => end(child, ended, 'SIGKILL') };
}

async function end(child: ChildProcess, ended: Promise<void>, signal: NodeJS.Signals): Promise<void> {
  if (child.exitCode === null && child.signalCode === null) child.kill(signal);
  await ended;
}

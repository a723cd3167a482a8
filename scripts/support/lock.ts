import { spawn } from 'node:child_process';
import type { Socket } from 'node:net';
import { statePath } from './project';

/** A lock on a file, shared with other processes of this machine. */
export interface Lock {
  release(): Promise<void>;
}

/** flock's exit code for "somebody else has it", chosen by us. */
const TAKEN = 75;

/**
 * Takes a lock by name. The kernel's file lock is held by a small child that ends when its standard input does, so the
 * lock falls with this process however it dies, and is never inherited by what this process starts.
 * @returns undefined when another process has it and `wait` is false.
 */
export async function takeLock(
  name: string,
  { shared = false, wait = false }: { shared?: boolean; wait?: boolean } = {},
): Promise<Lock | undefined> {
  const flags = [shared ? '-s' : '-x', ...(wait ? [] : ['-n']), '-E', String(TAKEN)];
  const holder = spawn('flock', [...flags, statePath(`${name}.lock`), 'sh', '-c', 'echo held; exec cat >/dev/null'], {
    stdio: ['pipe', 'pipe', 'ignore'],
    detached: true,
  });
  const ended = new Promise<number>((resolve, reject) => {
    holder.on('error', reject);
    holder.on('close', (code) => resolve(code ?? 1));
  });
  const held = new Promise<'held'>((resolve) => holder.stdout.once('data', () => resolve('held')));
  const outcome = await Promise.race([held, ended]);
  if (outcome === TAKEN) return undefined;
  if (outcome !== 'held') throw new Error(`flock ended with code ${outcome} for the lock "${name}"`);
  holder.unref();
  (holder.stdin as Socket).unref();
  (holder.stdout as Socket).unref();
  return {
    release: async () => {
      holder.ref();
      holder.stdin.end();
      await ended;
    },
  };
}

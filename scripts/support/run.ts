import { type ChildProcess, type SpawnOptions, spawn } from 'node:child_process';
import { projectDir } from './project';

/** What a finished command left behind. */
export interface Finished {
  /** The exit code; 1 when a signal ended it or it could not be started. */
  readonly code: number;
  /** What it wrote, empty unless asked for by `capture`. */
  readonly output: string;
}

interface RunOptions extends SpawnOptions {
  /** Keep the output instead of passing it to the terminal. */
  readonly capture?: boolean;
  /** Let it finish even when this process is asked to stop: it is short, and half done is worse than done. */
  readonly toItsEnd?: boolean;
}

const running = new Set<ChildProcess>();

/** Runs a command in the project's folder and waits for its end. Never throws: look at the code. */
export function run(command: string, args: readonly string[], options: RunOptions = {}): Promise<Finished> {
  const { capture = false, toItsEnd = false, ...spawnOptions } = options;
  const stdio = capture ? (['ignore', 'pipe', 'pipe'] as const) : (['ignore', 'inherit', 'inherit'] as const);
  const child = spawn(command, args, { cwd: projectDir, stdio: [...stdio], detached: toItsEnd, ...spawnOptions });
  if (!toItsEnd) running.add(child);
  let output = '';
  child.stdout?.on('data', (chunk: Buffer) => (output += chunk.toString()));
  child.stderr?.on('data', (chunk: Buffer) => (output += chunk.toString()));
  return new Promise((resolve) => {
    const end = (code: number) => {
      running.delete(child);
      resolve({ code, output });
    };
    child.on('error', (error) => {
      output += error.message;
      end(1);
    });
    child.on('close', (code) => end(code ?? 1));
  });
}

/** Runs one of the project's TypeScript files. */
export const runTs = (file: string, args: readonly string[] = [], options: RunOptions = {}): Promise<Finished> =>
  run(process.execPath, ['--import', 'tsx', file, ...args], options);

/** Runs a tool installed in node_modules. */
export const runTool = (tool: string, args: readonly string[], options: RunOptions = {}): Promise<Finished> =>
  run(`${projectDir}/node_modules/.bin/${tool}`, args, options);

/** Asks every command still running to end. */
export function stopRunning(): void {
  for (const child of running) child.kill('SIGTERM');
}

/** The environment without PostgreSQL's own variables, which would turn our clients to somebody else's server. */
export function cleanEnv(extra: Record<string, string | undefined> = {}): NodeJS.ProcessEnv {
  const kept = Object.entries(process.env).filter(([name]) => !/^PG[A-Z]+$/.test(name));
  return { ...Object.fromEntries(kept), ...extra };
}

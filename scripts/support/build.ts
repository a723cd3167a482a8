import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { takeLock } from './lock';
import { Sentence, projectDir, statePath } from './project';
import { runTool } from './run';
import { say } from './say';
import { hashOf } from './sources';

/** Where `npm start` keeps what it serves. The tests build apart, so that they never change a running application. */
export const startDist = join(projectDir, 'dist');
export const testDist = join(projectDir, '.steadmain', 'test-dist');

/** Builds pages, islands, web entry and worker into the folder, unless it holds exactly these sources already. */
export async function buildInto(dist: string): Promise<void> {
  const lock = await takeLock('build', { wait: true });
  try {
    const stamp = join(dist, 'built-from');
    const sources = hashOf();
    if (existsSync(stamp) && readFileSync(stamp, 'utf8') === sources) return say('The build is up to date');
    say('Building the application');
    rmSync(stamp, { force: true });
    await buildStep('pages and islands', 'astro', ['build'], dist);
    await buildStep('web entry and worker', 'vite', ['build', '--config', 'scripts/vite.worker.config.ts'], dist);
    writeFileSync(stamp, sources);
  } finally {
    await lock?.release();
  }
}

async function buildStep(what: string, tool: string, args: string[], dist: string): Promise<void> {
  const env = { ...process.env, NODE_ENV: 'production', STEADMAIN_DIST: dist, ASTRO_TELEMETRY_DISABLED: '1' };
  const { code, output } = await runTool(tool, args, { capture: true, env });
  const log = statePath(`build-${tool}.log`);
  mkdirSync(dirname(log), { recursive: true });
  writeFileSync(log, output);
  if (code === 0) return say(`Built the ${what}`);
  throw new Sentence(`The ${what} could not be built:\n${output.trim().split('\n').slice(-40).join('\n')}`);
}

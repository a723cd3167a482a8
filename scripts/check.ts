import { runCommand } from './support/finish';
import { runTool } from './support/run';
import { say } from './support/say';

interface Check {
  readonly what: string;
  readonly tool: string;
  readonly args: readonly string[];
}

const CHECKS: readonly Check[] = [
  { what: 'types of pages', tool: 'astro', args: ['check', '--minimumFailingSeverity', 'error'] },
  { what: 'lint', tool: 'eslint', args: ['--config', 'scripts/eslint.config.mjs', '--max-warnings', '0', '.'] },
  { what: 'types', tool: 'tsc', args: ['--noEmit', '-p', 'tsconfig.json'] },
  { what: 'core needs neither browser nor Node', tool: 'tsc', args: ['--noEmit', '-p', 'src/core'] },
  { what: 'format', tool: 'prettier', args: ['--check', '--log-level', 'warn', '.'] },
  {
    what: 'dependency boundaries',
    tool: 'depcruise',
    args: ['--config', '.dependency-cruiser.mjs', '--output-type', 'err-long', 'src', 'scripts'],
  },
  { what: 'unused code', tool: 'knip', args: ['--config', '.knip.json', '--no-progress'] },
];

/** Runs one check; its output is shown when it fails. */
async function passes({ what, tool, args }: Check): Promise<boolean> {
  const env = { ...process.env, ASTRO_TELEMETRY_DISABLED: '1' };
  const { code, output } = await runTool(tool, args, { capture: true, env });
  say(`${code === 0 ? 'ok    ' : 'FAILED'}  ${what}`);
  if (code !== 0) console.log(`${output.trim()}\n`);
  return code === 0;
}

/** Two at a time: most checks keep one core busy. */
async function failedOf(checks: readonly Check[]): Promise<string[]> {
  const waiting = [...checks];
  const failed: string[] = [];
  const lane = async (): Promise<void> => {
    for (let check = waiting.shift(); check; check = waiting.shift()) {
      if (!(await passes(check))) failed.push(check.what);
    }
  };
  await Promise.all([lane(), lane()]);
  return failed;
}

await runCommand(async () => {
  // Names given on the command line choose among the checks: npm run check -- lint types
  const chosen = process.argv.slice(2);
  const failed = await failedOf(CHECKS.filter(({ what }) => chosen.length === 0 || chosen.includes(what)));
  if (failed.length > 0) say(`Failed: ${failed.join(', ')}`);
  return failed.length > 0 ? 1 : 0;
});

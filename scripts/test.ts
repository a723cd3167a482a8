import { mkdirSync, rmSync } from 'node:fs';
import { buildInto, testDist } from './support/build';
import { findChromium } from './support/chromium';
import { atEnd, runCommand, undoAll } from './support/finish';
import { findIapwsPython } from './support/iapws';
import { takeLock } from './support/lock';
import { holdServer } from './support/postgres/hold';
import { Sentence, statePath } from './support/project';
import { type Count, closingLine, countRun, sumCounts } from './support/results';
import { cleanEnv, runTool, runTs } from './support/run';
import { say } from './support/say';

const reports = statePath('test-results');

/** A step that is no test run: it counts only when it fails. */
async function step(work: () => Promise<boolean>): Promise<Count> {
  try {
    return { passed: 0, failed: (await work()) ? 0 : 1 };
  } catch (error) {
    console.error(error instanceof Sentence ? `\n${error.message}\n` : error);
    return { passed: 0, failed: 1 };
  }
}

async function testRun(what: string, config: string, env: NodeJS.ProcessEnv = {}): Promise<Count> {
  say(`Running the ${what} tests`);
  const report = `${reports}/${config}.json`;
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
  const args = ['run', '--config', `tests/${config}.ts`, ...reporters];
  const { code } = await runTool('vitest', args, { env: cleanEnv({ NODE_ENV: 'test', ...env }) });
  return countRun(report, code);
}

/** Tests that need neither database nor browser; without python3-iapws the comparison with it fails and says so. */
async function testsOfTheParts(): Promise<Count> {
  let IAPWS_PYTHON: string | undefined;
  const found = await step(async () => {
    IAPWS_PYTHON = await findIapwsPython();
    return true;
  });
  return sumCounts([found, await testRun('unit, property and verification', 'vitest.config', { IAPWS_PYTHON })]);
}

/** Server and browser tests: both need a database, the second the built application and a browser. */
async function testsOfTheWhole(counts: Count[]): Promise<void> {
  const server = await holdServer('test-postgres');
  atEnd(() => server.release());
  counts.push(await testRun('server', 'vitest.server.config'));
  const built = await step(async () => {
    await buildInto(testDist);
    return true;
  });
  counts.push(built);
  if (built.failed === 0) {
    const CHROMIUM = await findChromium();
    counts.push(await testRun('browser', 'vitest.e2e.config', { CHROMIUM }));
  }
}

await runCommand(async () => {
  const lock = await takeLock('test');
  if (!lock) throw new Sentence('npm test already runs in this folder; wait for it to end.');
  atEnd(() => lock.release());
  rmSync(reports, { recursive: true, force: true });
  mkdirSync(reports, { recursive: true });
  const counts: Count[] = [];
  say('Running the checks');
  counts.push(await step(async () => (await runTs('scripts/check.ts')).code === 0));
  counts.push(await testsOfTheParts());
  counts.push(
    await step(async () => {
      await testsOfTheWhole(counts);
      return true;
    }),
  );
  await undoAll();
  const sum = sumCounts(counts);
  say(sum.failed === 0 ? 'All is well' : 'Something failed; see above');
  console.log(closingLine(sum));
  return sum.failed === 0 ? 0 : 1;
});

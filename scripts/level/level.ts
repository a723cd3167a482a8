import { writeFile } from 'node:fs/promises';
import { readProblemFile } from '../../src/contracts/levellingFile';
import { figuresOf } from '../../src/core/levelling/figures';
import { solveProblem } from '../../src/core/levelling/levelWeek';
import { solveLowestPeak } from '../../src/core/levelling/lowestPeak';
import { fullOptions } from '../../src/core/levelling/options';
import { planOf, PROBLEM_VERSION } from '../../src/core/levelling/problem';
import { namePlan } from '../../src/core/levelling/problemDoor';
import { solveLp } from '../../src/solver/lpSolver';
import { admitted, countFlag, flag, leave, neededFlag, textOf } from './files';

/**
 * npm run level -- --problem FILE --out FILE [--seed N] [--ms N | --iterations N] [--objective plan|peak]
 *
 * Levels a problem in the documented file form (src/contracts/levellingFile.ts) and writes the plan found. A run by
 * iterations gives the identical plan every time.
 */
const USAGE = 'npm run level -- --problem FILE --out FILE [--seed N] [--ms N | --iterations N] [--objective plan|peak]';

const file = neededFlag('problem', USAGE);
const out = neededFlag('out', USAGE);
const objective = flag('objective') ?? 'plan';
if (objective !== 'plan' && objective !== 'peak') leave(`--objective must be plan or peak. Usage: ${USAGE}`);
const ms = countFlag('ms');
const iterations = countFlag('iterations');
if (ms !== undefined && iterations !== undefined) leave(`Give --ms or --iterations, not both. Usage: ${USAGE}`);

const problem = admitted(file, readProblemFile(await textOf(file)));
const budget = iterations === undefined ? { ms: ms ?? 15_000 } : { iterations };
const options = fullOptions({ seed: countFlag('seed') ?? 1, budget });
const env = { solveLp, ...(iterations === undefined ? { now: () => performance.now() } : {}) };
const lowest = objective === 'peak' ? solveLowestPeak(problem, options, env) : null;
if (objective === 'peak' && !lowest) leave(`${file} has no header whose load could be lowered.`);
const solved = lowest ?? solveProblem(problem, options, env);
const before = figuresOf(problem, planOf(problem));
const after = figuresOf(problem, solved.plan);
const { iterations: made, withheld } = solved;
const peak = lowest && { headerId: lowest.headerId, found: lowest.peakFound, cantBeBelow: lowest.cantBeBelow };
const named = namePlan(problem, solved.plan);
const result = { version: PROBLEM_VERSION, ...named, objective, before, after, withheld, ...(peak ? { peak } : {}) };
await writeFile(out, `${JSON.stringify(result, null, 2)}\n`);

const moved = problem.activities.filter((a, i) => {
  return solved.plan.starts[i] !== a.plan.start || solved.plan.units[i] !== a.plan.unitId;
}).length;
console.log(
  [
    `${out}: ${moved} of ${problem.activities.length} activities moved in ${made} iterations.`,
    `Over the limit: ${before.overKg.toFixed(1)} kg before, ${after.overKg.toFixed(1)} kg after.`,
    `Late: ${before.lateMinutes} min before, ${after.lateMinutes} min after.`,
    ...Object.entries(after.peakKgPerH).map(([id, peak]) => {
      return `Greatest load of ${id}: ${(before.peakKgPerH[id] ?? 0).toFixed(0)} kg/h before, ${peak.toFixed(0)} after.`;
    }),
    ...(peak
      ? [`Lowest found ${peak.found.toFixed(0)} kg/h; can't be below ${peak.cantBeBelow.kgPerH.toFixed(0)}.`]
      : []),
  ].join('\n'),
);

import { readPlanFile, readProblemFile } from '../../src/contracts/levellingFile';
import { judge } from '../../src/core/levelling/evaluate';
import { figuresOf } from '../../src/core/levelling/figures';
import { planOf } from '../../src/core/levelling/problem';
import { admitted, neededFlag, textOf } from './files';

/**
 * npm run level:check -- --problem FILE --plan FILE
 *
 * Judges a plan from the problem alone, by code that the search does not use. Ends with 1 where a rule of time is
 * broken, or vents, shared limits or steam are over by more than in the planner's own plan.
 */
const USAGE = 'npm run level:check -- --problem FILE --plan FILE';
const problemFile = neededFlag('problem', USAGE);
const planFile = neededFlag('plan', USAGE);
const problem = admitted(problemFile, readProblemFile(await textOf(problemFile)));
const plan = admitted(planFile, readPlanFile(problem, await textOf(planFile)));

const found = judge(problem, plan);
const given = judge(problem, planOf(problem));
const { broken, processOver, sharedOver, steamKg, lateMin, change } = found;
console.log(
  JSON.stringify(
    { broken, processOver, sharedOver, steamKg, lateMin, change, figures: figuresOf(problem, plan) },
    null,
    2,
  ),
);
const TRACE = 1e-6;
const worse = (['broken', 'processOver', 'sharedOver', 'steamKg'] as const).filter(
  (part) => found[part] > given[part] + TRACE,
);
if (worse.length > 0) console.error(`Worse than the planner's own plan in: ${worse.join(', ')}.`);
process.exitCode = worse.length > 0 ? 1 : 0;

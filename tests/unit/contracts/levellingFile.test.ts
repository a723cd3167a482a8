import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readPlanFile, readProblemFile } from '@/contracts/levellingFile';
import { judge } from '@/core/levelling/evaluate';
import { solveProblem } from '@/core/levelling/levelWeek';
import { fullOptions } from '@/core/levelling/options';
import { planOf, type Problem } from '@/core/levelling/problem';
import { namePlan } from '@/core/levelling/problemDoor';
import { solveLp } from '@/solver/lpSolver';

const EXAMPLE = readFileSync(new URL('../../support/files/levellingProblem.json', import.meta.url), 'utf8');

function example(): Problem {
  const read = readProblemFile(EXAMPLE);
  if (!read.ok) throw new Error(JSON.stringify(read.error));
  return read.value;
}

const USE = { resourceId: 'x', offsetMin: -5, minutes: 5, amount: 1, phase: 'warmUp' };
const IDLE = { resourceId: 'x', amount: 1 };
const BEFORE = { idle: [], idleUpToMin: 20, warmUp: [] };

type Node = Record<string, unknown>;

/** The example with a value put at a place, such as `activities.0.plan.start`, as text. */
function changed(place: string, value: unknown): string {
  const draft = JSON.parse(EXAMPLE) as Node;
  const path = place.split('.');
  const last = path.pop() as string;
  const node = path.reduce((at, key) => at[key] as Node, draft);
  node[last] = value;
  return JSON.stringify(draft);
}

/** What the door says of the example with a value changed. */
function faultsOf(place: string, value: unknown): string[] {
  const read = readProblemFile(changed(place, value));
  return read.ok ? [] : read.error.map(({ field, message }) => `${field}: ${message}`);
}

describe('the file form of a levelling problem', () => {
  it('holds two retorts that vent together: 79.34 kg over, gone with 6 minutes between them', () => {
    // Worked batch C (invented plant): 3110.48 - 2317.07 = 793.41 kg/h for 6 min.
    const problem = example();
    expect(judge(problem, planOf(problem)).steamKg).toBeCloseTo(79.341, 3);
    const options = fullOptions({ budget: { iterations: 500 } });
    const { plan } = solveProblem(problem, options, { solveLp });
    expect(judge(problem, plan).steamKg).toBe(0);
    expect(Math.abs((plan.starts[0] as number) - (plan.starts[1] as number))).toBe(6);
  });

  it('is sorted at the door, so that its order does not matter', () => {
    const draft = JSON.parse(EXAMPLE) as Record<string, unknown[]>;
    for (const list of ['activities', 'units', 'resources']) draft[list]?.reverse();
    const turned = readProblemFile(JSON.stringify(draft));
    expect(turned.ok && turned.value).toEqual(example());
  });

  it.each([
    ['a unit that is not there', 'activities.0.modes.0.unitId', 'retort-9', 'no unit “retort-9”'],
    ['a resource that is not there', 'activities.0.modes.0.uses.0.resourceId', 'x', 'no resource “x”'],
    ['the same id twice', 'activities.1.id', 'load-1', '“load-1” is there twice'],
    ['a start outside its bounds', 'activities.0.plan.start', 100, 'outside its own bounds 300 to 480'],
    ['a plan without a mode', 'activities.0.plan.unitId', 'retort-2', 'without a mode there'],
    [
      'an unknown resource of a warm machine',
      'activities.0.modes.0.warm',
      [{ gapUpToMin: 9, uses: [USE] }],
      'no resource “x”',
    ],
    [
      'an unknown resource before a run',
      'activities.0.modes.0.before',
      { ...BEFORE, warmUp: [USE] },
      'no resource “x”',
    ],
    ['an unknown resource of idling', 'activities.0.modes.0.before', { ...BEFORE, idle: [IDLE] }, 'no resource “x”'],
    [
      'gaps out of order',
      'activities.0.modes.0.warm',
      [9, 9].map((gapUpToMin) => ({ gapUpToMin, uses: [] })),
      'must ascend',
    ],
    ['a draw below 0', 'activities.0.modes.0.uses.0.amount', -1, 'activities.0.modes.0.uses.0.amount'],
    ['steps out of order', 'resources.0.capacity.1', { from: 0, value: 1 }, 'Steps must ascend'],
    ['an unknown word', 'colour', 'red', 'colour'],
    ['another version', 'version', 2, 'version'],
  ])('refuses %s and says where', (_what, place, value, said) => {
    expect(faultsOf(place, value).join('\n')).toContain(said);
  });

  it('refuses a link that no wait can keep', () => {
    const end = { activityId: 'load-1', anchor: 'start', offsetMin: 0 };
    const link = { id: 'l', from: end, to: { ...end, activityId: 'load-2' }, leastMin: 9, greatestMin: 3 };
    const said = faultsOf('links', [{ ...link, processGreatestMin: null }]);
    expect(said).toEqual(['links.0.greatestMin: l waits at least 9 and at most 3 min; no wait is both.']);
  });

  it('refuses text that is no JSON', () => {
    const read = readProblemFile('{');
    expect(read.ok ? '' : read.error[0]?.code).toBe('FILE-JSON');
  });
});

describe('the file form of a plan', () => {
  const named = namePlan(example(), planOf(example()));

  it('goes out and comes in unchanged', () => {
    const read = readPlanFile(example(), JSON.stringify({ version: 1, ...named }));
    expect(read.ok && read.value).toEqual(planOf(example()));
  });

  it.each([
    ['a missing activity', { activities: named.activities.slice(1) }, 'no start for load-1'],
    [
      'a unit without a mode',
      { activities: [{ ...named.activities[0], unitId: 'retort-2' }, named.activities[1]] },
      'load-1 can',
    ],
    ['one that is not there', { activities: [...named.activities, { id: 'z', unitId: 'retort-1', start: 1 }] }, '“z”'],
  ])('refuses %s', (_what, plan, said) => {
    const read = readPlanFile(example(), JSON.stringify({ version: 1, ...plan }));
    expect(read.ok ? '' : read.error.map(({ message }) => message).join('\n')).toContain(said);
  });
});

import { expect, it } from 'vitest';
import { gapReason, warmWords } from '@/components/board/gapWords';
import { evaluateWeek } from '@/core/pipeline';
import type { BetweenDraws } from '@/core/plant/activity';
import { activity, flatMode, phase, plant, unit, week } from '../../../support/builders';

const between: BetweenDraws = { idleKgPerH: 75, warmUp: [phase(0, 10, 200, 'warmUp')], idleUpToMin: 30 };
const run = (id: string, start: number, more = {}) =>
  activity(id, {
    code: id.toUpperCase(),
    modes: [{ ...flatMode('b1', 60, 500), between, ...more }],
    placement: { unitId: 'b1', start },
  });
const model = plant({ units: [{ ...unit('b1'), name: 'Blancher 1' }] });
const reasonOf = (id: string, ...runs: ReturnType<typeof run>[]) => {
  const evaluation = evaluateWeek(week({ horizonMin: 600, plant: model, activities: runs }));
  const found = evaluation.drawn.find((one) => one.id === id);
  if (!found) throw new Error(`no ${id}`);
  return gapReason(found, evaluation.gapDraws, evaluation.drawn, model);
};

it('a short gap is kept hot: says how long and up to when that is less steam', () => {
  expect(reasonOf('idle:b', run('a', 100), run('b', 185))).toBe(
    '25 min until B: not longer than the 30 min up to which keeping hot takes less steam than warming up again.',
  );
});

it('a long gap is warmed up again: says since when the machine is out of use', () => {
  expect(reasonOf('warm:b', run('a', 100), run('b', 300))).toBe(
    'Blancher 1 has then been out of use for 2 h 20: longer than the 30 min up to which keeping hot takes less steam than warming up again.',
  );
});

it('the first run of the week says so, and a run itself has no such reason', () => {
  expect(reasonOf('warm:a', run('a', 100), run('b', 300))).toBe('A is the first run of the week on Blancher 1.');
  expect(reasonOf('a', run('a', 100))).toBeNull();
});

it('a run on a machine that is still warm says so', () => {
  const warm = [{ gapUpToMin: 60, phases: [phase(0, 60, 300, 'run')] }];
  const runs = [run('a', 100, { between: undefined, warm }), run('b', 185, { between: undefined, warm })];
  const { drawn } = evaluateWeek(week({ horizonMin: 600, plant: model, activities: runs }));
  const words = drawn.map((one) => warmWords(one, runs));
  expect(words).toEqual([null, 'the machine is still warm from the run before']);
});

import { describe, expect, it } from 'vitest';
import { evaluateWeek } from '@/core/pipeline';
import type { Activity } from '@/core/plant/activity';
import type { CleaningRule, PracticeLimits } from '@/core/plant/plant';
import { breachSentence, namesOf } from '@/core/schedule/sentences';
import type { Week } from '@/core/schedule/week';
import { activity, flatMode, plant, unit, week } from '../../../support/builders';

const NONE: PracticeLimits = { greatestRunningMin: null, greatestStandingDirtyMin: null, allergenReleaseMin: null };

const rule = (fromFamilyId: string, toFamilyId: string, minutes: number, kind: CleaningRule['kind']): CleaningRule => {
  return { unitKind: 'kettle', fromFamilyId, toFamilyId, minutes, kind, phases: [], uses: [] };
};
const CLEANING = [
  rule('soup', 'sauce', 10, 'rinse'),
  rule('sauce', 'soup', 20, 'wash'),
  rule('nut', 'nutFree', 30, 'allergen'),
];

const run = (id: string, familyId: string, start: number) =>
  activity(id, { familyId, modes: [flatMode('kettle1', 60, 0)], placement: { unitId: 'kettle1', start } });
const stored = (id: string, start: number, minutes: number) =>
  activity(id, { kind: 'cleaning', modes: [flatMode('kettle1', minutes, 0)], placement: { unitId: 'kettle1', start } });

function judged(practice: Partial<PracticeLimits>, activities: readonly Activity[]) {
  const plain = plant({ units: [unit('kettle1', { name: 'Kettle 1', kind: 'kettle' })], cleaning: CLEANING });
  const kettle = { ...plain, rules: { ...plain.rules, practice: { ...NONE, ...practice } } };
  const source: Week = week({ plant: kettle, activities });
  return { source, breaches: evaluateWeek(source).breaches };
}
const sentence = ({ source, breaches }: ReturnType<typeof judged>) => {
  const first = breaches[0];
  return first && breachSentence(first, namesOf(source), (minute) => `minute ${minute}`);
};

describe('the greatest running time between two full cleans', () => {
  const runs = [run('a', 'soup', 0), run('b', 'sauce', 100), run('c', 'soup', 250)];

  it('is kept by a full clean and not by a rinse', () => {
    expect(judged({ greatestRunningMin: 120 }, runs).breaches).toEqual([]);
    expect(judged({ greatestRunningMin: 119 }, runs).breaches).toMatchObject([
      { class: 'process', code: 'runningTooLong', from: 159, to: 160, found: 120, limit: 119, activityIds: ['b', 'a'] },
    ]);
  });

  it('is passed from the minute on that passes it to the end of the stretch', () => {
    const same = [run('a', 'soup', 0), run('b', 'soup', 100), run('c', 'soup', 200)];
    const found = judged({ greatestRunningMin: 90 }, same);
    expect(found.breaches).toMatchObject([{ from: 130, to: 260, found: 180, activityIds: ['b', 'a', 'c'] }]);
    expect(sentence(found)).toEqual({
      title: 'Kettle 1 runs too long without a full clean',
      detail: '3 h between two full cleans; at most 1 h 30 min, until minute 130. A rinse is no full clean.',
    });
  });

  it('begins anew after a stored cleaning', () => {
    const split = [run('a', 'soup', 0), stored('wash', 70, 15), run('b', 'soup', 100)];
    expect(judged({ greatestRunningMin: 60 }, split).breaches).toEqual([]);
  });
});

describe('the greatest time standing dirty', () => {
  const gap = (minutes: number) => [run('a', 'soup', 0), run('b', 'soup', 60 + minutes)];

  it('runs from the end of a run to whatever comes next', () => {
    expect(judged({ greatestStandingDirtyMin: 120 }, gap(120)).breaches).toEqual([]);
    const found = judged({ greatestStandingDirtyMin: 120 }, gap(121));
    expect(found.breaches).toMatchObject([
      { code: 'standingDirty', from: 180, to: 181, found: 121, limit: 120, activityIds: ['a', 'b'] },
    ]);
    expect(sentence(found)).toEqual({
      title: 'Kettle 1 stands dirty too long after A Product a',
      detail: '2 h 1 min until minute 181; at most 2 h, until minute 180.',
    });
  });

  it('ends with the cleaning, and a clean unit may stand', () => {
    const clean = [run('a', 'sauce', 0), run('b', 'soup', 500)];
    expect(judged({ greatestStandingDirtyMin: 30 }, clean).breaches).toEqual([]);
    expect(judged({ greatestStandingDirtyMin: 30 }, [...gap(300), stored('wash', 80, 20)]).breaches).toEqual([]);
  });

  it('says nothing of the time after the last run', () => {
    expect(judged({ greatestStandingDirtyMin: 1 }, [run('a', 'soup', 0)]).breaches).toEqual([]);
  });
});

describe('the release after an allergen clean', () => {
  const pair = (start: number) => [run('a', 'nut', 0), run('b', 'nutFree', start)];

  it('keeps the unit from the next run for so long', () => {
    expect(judged({ allergenReleaseMin: 45 }, pair(135)).breaches).toEqual([]);
    const found = judged({ allergenReleaseMin: 45 }, pair(130));
    expect(found.breaches).toMatchObject([
      { code: 'allergenRelease', from: 130, to: 135, found: 40, limit: 45, activityIds: ['b', 'clean:a'] },
    ]);
    expect(sentence(found)).toEqual({
      title: 'Kettle 1 not yet released after the allergen clean: B Product b',
      detail: '40 minutes after the clean; the release takes 45 minutes, until minute 135.',
    });
  });

  it('is not asked for where the clean itself is too short', () => {
    expect(judged({ allergenReleaseMin: 45 }, pair(80)).breaches.map(({ code }) => code)).toEqual(['allergenCleaning']);
  });

  it('counts from a stored clean that stands in', () => {
    const withStored = [...pair(150), stored('clean', 80, 30)];
    expect(judged({ allergenReleaseMin: 40 }, withStored).breaches).toEqual([]);
    expect(judged({ allergenReleaseMin: 41 }, withStored).breaches).toMatchObject([
      { code: 'allergenRelease', activityIds: ['b', 'clean'], found: 40 },
    ]);
  });
});

it('judges no unit of a kind that is never cleaned', () => {
  const loads = [run('a', 'soup', 0), run('b', 'soup', 5000)];
  const { source } = judged({ greatestRunningMin: 30, greatestStandingDirtyMin: 30 }, loads);
  const units = source.plant.units.map((one) => ({ ...one, kind: 'retort' as const }));
  expect(evaluateWeek(source).breaches).toHaveLength(2);
  expect(evaluateWeek({ ...source, plant: { ...source.plant, units } }).breaches).toEqual([]);
});

it('judges no practice rule that is not set', () => {
  const runs = [run('a', 'nut', 0), run('b', 'nutFree', 100), run('c', 'nutFree', 5000)];
  expect(judged({}, runs).breaches).toEqual([]);
});

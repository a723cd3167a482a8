import { describe, expect, it } from 'vitest';
import { cleanFor, fullCleanOf, kindsOf } from '@/components/board/cleans';
import { drawnByUnit, notYetPlaced } from '@/components/board/drawn';
import { whatWords } from '@/components/board/words';
import { evaluateWeek } from '@/core/pipeline';
import type { CleaningKind } from '@/core/plant/activity';
import type { CleaningRule } from '@/core/plant/plant';
import { cleanableUnits } from '@/core/schedule/plannedCleaning';
import { activity, flatMode, plant, unit, week } from '../../../support/builders';

const rule = (kind: CleaningKind): CleaningRule => {
  return { unitKind: 'kettle', fromFamilyId: 'a', toFamilyId: 'b', minutes: 20, kind, phases: [], uses: [] };
};
const run = (id: string, start: number, minutes: number) =>
  activity(id, { familyId: 'a', modes: [flatMode('k2', minutes, 0)], placement: { unitId: 'k2', start } });

function judged(kinds: readonly CleaningKind[], greatestRunningMin: number | null) {
  const bare = plant({ units: [unit('k2', { kind: 'kettle' })], cleaning: kinds.map(rule) });
  const practice = { greatestRunningMin, greatestStandingDirtyMin: 60, allergenReleaseMin: null };
  const kettles = { ...bare, rules: { ...bare.rules, practice } };
  const activities = [run('a', 0, 100), run('b', 130, 100), run('c', 400, 100)];
  const evaluation = evaluateWeek(week({ plant: kettles, activities }));
  return { ...evaluation, byUnit: drawnByUnit(evaluation.drawn), cleanable: cleanableUnits(kettles) };
}

describe('the clean that puts a breach right', () => {
  const wanted = (kinds: readonly CleaningKind[], greatestRunningMin: number | null) => {
    const { breaches, byUnit, cleanable } = judged(kinds, greatestRunningMin);
    return breaches.map((breach) => [breach.code, cleanFor(breach, byUnit, cleanable)]);
  };

  it('is of use from the end of the run that leaves its unit dirty', () => {
    expect(wanted(['wash'], null)).toEqual([['standingDirty', { unitId: 'k2', from: 230 }]]);
  });

  it('is of use before the run that passes the greatest running time, or after it where it is the first', () => {
    expect(wanted(['wash'], 150)).toContainEqual(['runningTooLong', { unitId: 'k2', from: 100 }]);
    expect(wanted(['wash'], 90)).toContainEqual(['runningTooLong', { unitId: 'k2', from: 100 }]);
  });

  it('is none where the unit can only be rinsed, nor for any other breach', () => {
    expect(wanted(['rinse'], null)).toEqual([['standingDirty', null]]);
    const { byUnit, cleanable } = judged(['wash'], null);
    const [clash] = evaluateWeek(week({ activities: [activity('x'), activity('y')] })).breaches;
    expect(clash?.code).toBe('unitClash');
    expect(clash && cleanFor(clash, byUnit, cleanable)).toBeNull();
  });
});

it('offers the kinds that have a rule, the least full clean first of all', () => {
  const { cleanable } = judged(['allergen', 'rinse'], null);
  expect([kindsOf(cleanable, 'k2'), kindsOf(cleanable, 'r1')]).toEqual([['rinse', 'allergen'], []]);
  expect([fullCleanOf(cleanable, 'k2'), fullCleanOf(cleanable, 'r1')]).toEqual(['allergen', undefined]);
});

it('lists a planned clean that waits, and says what it is; a cleaning that follows is no such', () => {
  const clean = activity('c1', { kind: 'cleaning', cleaning: 'allergen', stage: null, placement: null });
  const follows = activity('clean:a', { kind: 'cleaning', stage: null, placement: null });
  expect(notYetPlaced([clean, follows])).toEqual([clean]);
  expect([clean, follows].map(whatWords)).toEqual(['allergen clean', 'cleaning, follows from the sequence']);
});

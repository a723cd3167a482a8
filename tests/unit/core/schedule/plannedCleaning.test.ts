import { describe, expect, it } from 'vitest';
import { evaluateWeek } from '@/core/pipeline';
import type { Activity, CleaningKind } from '@/core/plant/activity';
import type { CleaningRule, PracticeLimits } from '@/core/plant/plant';
import { changeovers } from '@/core/schedule/changeovers';
import { cleanableUnits, longestRule, nextCleaningCode, plannedCleaningTitle } from '@/core/schedule/plannedCleaning';
import { activity, flatMode, plant, unit, week } from '../../../support/builders';

const rule = (from: string, to: string, minutes: number, kind: CleaningKind): CleaningRule => {
  return { unitKind: 'kettle', fromFamilyId: from, toFamilyId: to, minutes, kind, phases: [], uses: [] };
};
const RULES = [
  rule('soup', 'sauce', 10, 'rinse'),
  rule('sauce', 'soup', 20, 'wash'),
  rule('sauce', 'nut', 25, 'wash'),
  rule('nut', 'soup', 30, 'allergen'),
];
const PRACTICE: PracticeLimits = { greatestRunningMin: 400, greatestStandingDirtyMin: 120, allergenReleaseMin: 45 };

const run = (id: string, familyId: string, start: number, minutes = 240): Activity =>
  activity(id, { familyId, modes: [flatMode('kettle2', minutes, 0)], placement: { unitId: 'kettle2', start } });
/** A planned clean that draws 300 kg/h. */
const clean = (cleaning: CleaningKind, start: number, minutes: number): Activity =>
  activity('c1', {
    ...{ kind: 'cleaning', stage: null, cleaning, code: 'C1', title: plannedCleaningTitle(cleaning, 'Kettle 2') },
    modes: [flatMode('kettle2', minutes, 300)],
    placement: { unitId: 'kettle2', start },
  });

function weekOf(activities: readonly Activity[], practice: PracticeLimits = PRACTICE) {
  const kettle = plant({ units: [unit('kettle2', { name: 'Kettle 2', kind: 'kettle' })], cleaning: RULES });
  return week({ plant: { ...kettle, rules: { ...kettle.rules, practice } }, activities });
}
const codes = (activities: readonly Activity[], practice?: PracticeLimits) =>
  evaluateWeek(weekOf(activities, practice)).breaches.map(({ code, found }: { code: string; found?: unknown }) => [
    code,
    found,
  ]);

describe('a planned clean between two runs of one family', () => {
  // 240 min of soup to minute 240, 300 min dirty, 240 min of soup more.
  const runs = [run('a', 'soup', 0), run('b', 'soup', 540)];

  it('cures running too long and standing dirty, and nothing else is asked for', () => {
    expect(codes(runs)).toEqual([
      ['standingDirty', 300],
      ['runningTooLong', 480],
    ]);
    expect(codes([...runs, clean('wash', 300, 25)])).toEqual([]);
    expect(codes([...runs, clean('allergen', 300, 30)])).toEqual([]);
  });

  it('is in time up to the minute that the unit may stand dirty', () => {
    expect(codes([...runs, clean('wash', 360, 25)])).toEqual([]);
    expect(codes([...runs, clean('wash', 361, 25)])).toEqual([['standingDirty', 121]]);
  });

  it('that is only a rinse leaves the hours running as they are', () => {
    expect(codes([...runs, clean('rinse', 300, 25)])).toEqual([['runningTooLong', 480]]);
  });

  it('draws its own steam and has its unit: a run over it clashes', () => {
    const judged = evaluateWeek(weekOf([...runs, clean('wash', 300, 25)]));
    const load = judged.headers[0]?.loadKgPerH ?? [];
    expect([load[299], load[300], load[324], load[325]]).toEqual([0, 300, 300, 0]);
    expect(codes([...runs, clean('wash', 230, 25)])).toContainEqual(['unitClash', 10]);
  });
});

describe('a planned allergen clean', () => {
  const nuts = [run('a', 'nut', 0, 60), run('b', 'soup', 80, 60)];
  const later = [run('a', 'nut', 0, 60), run('b', 'soup', 200, 60)];

  it('stands in for the one that the sequence asks for, its release counted from its end', () => {
    expect(codes(nuts)).toEqual([['allergenCleaning', 20]]);
    expect(codes([...later, clean('allergen', 120, 30)])).toEqual([]);
    expect(codes([...later, clean('allergen', 130, 30)])).toEqual([['allergenRelease', 40]]);
    expect(changeovers(weekOf([...later, clean('allergen', 120, 30)]))).toEqual([]);
  });

  it('is not made up for by a wash as long, nor by a shorter one', () => {
    for (const instead of [clean('wash', 120, 30), clean('allergen', 120, 29)]) {
      expect(changeovers(weekOf([...later, instead])).map(({ cleaning }) => cleaning.id)).toEqual(['clean:a']);
    }
  });

  it('does away with an allergen for all that runs after it', () => {
    const none = { ...PRACTICE, greatestRunningMin: null, greatestStandingDirtyMin: null };
    const between = [run('a', 'nut', 0, 60), run('x', 'plain', 300, 60), run('b', 'soup', 380, 60)];
    expect(changeovers(weekOf(between)).map(({ rule: { kind }, nextId }) => [kind, nextId])).toEqual([
      ['allergen', 'b'],
    ]);
    expect(codes([...between, clean('allergen', 100, 30)], none)).toEqual([]);
    expect(codes([...between, clean('wash', 100, 30)], none)).toEqual([['allergenCleaning', 20]]);
  });
});

describe('what a planner can add', () => {
  it('takes the longest rule of a kind, the first of two as long', () => {
    expect(longestRule(RULES, 'kettle', 'wash')).toBe(RULES[2]);
    expect(longestRule([rule('a', 'b', 20, 'wash'), rule('b', 'a', 20, 'wash')], 'kettle', 'wash')?.fromFamilyId).toBe(
      'a',
    );
    expect(longestRule(RULES, 'retort', 'wash')).toBeNull();
  });

  it('is what there are rules for, by unit', () => {
    const units = [unit('r1', { kind: 'retort' }), unit('k1', { kind: 'kettle' })];
    expect(cleanableUnits({ units, cleaning: RULES })).toEqual([
      { unit: units[1], kinds: ['rinse', 'wash', 'allergen'] },
    ]);
    expect(cleanableUnits({ units, cleaning: RULES.slice(0, 1) })[0]?.kinds).toEqual(['rinse']);
    expect(cleanableUnits({ units, cleaning: [] })).toEqual([]);
  });

  it('has a name and the first code that is free', () => {
    expect(plannedCleaningTitle('allergen', 'Kettle 2')).toBe('Allergen clean of Kettle 2');
    expect(nextCleaningCode([])).toBe('C1');
    expect(nextCleaningCode(['C1', 'A7', 'C3'])).toBe('C2');
  });
});

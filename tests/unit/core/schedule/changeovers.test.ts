import { describe, expect, it } from 'vitest';
import { evaluateWeek } from '@/core/pipeline';
import type { Activity } from '@/core/plant/activity';
import type { CleaningRule } from '@/core/plant/plant';
import { changeovers } from '@/core/schedule/changeovers';
import { occupation, occupationsByUnit } from '@/core/schedule/occupation';
import { activity, flatMode, link, phase, plant, unit, week } from '../../../support/builders';

const rule = (
  fromFamilyId: string,
  toFamilyId: string,
  minutes: number,
  kind: CleaningRule['kind'] = 'wash',
): CleaningRule => ({
  unitKind: 'kettle',
  fromFamilyId,
  toFamilyId,
  minutes,
  kind,
  phases: [phase(0, minutes, 300, 'wash')],
  uses: [{ limitId: 'hoses', offsetMin: 0, minutes, amount: 1 }],
});

const run = (id: string, familyId: string, start: number, changes: Partial<Activity> = {}) =>
  activity(id, { familyId, modes: [flatMode('kettle1', 60, 0)], placement: { unitId: 'kettle1', start }, ...changes });

const kettle = plant({
  units: [unit('kettle1', { kind: 'kettle' })],
  cleaning: [rule('A', 'B', 20), rule('B', 'A', 30)],
});
const kettleWeek = (activities: readonly Activity[]) => week({ plant: kettle, activities });

describe('occupation of a unit', () => {
  const load = activity('load', { placement: { unitId: 'unit1', start: 0 }, occupiesUntil: { linkId: 'off' } });
  const next = activity('next', { placement: { unitId: 'unit2', start: 90 } });
  const takenOff = link('off', 'load', 'next', { to: { activityId: 'next', anchor: 'start', offsetMin: 5 } });

  it('lasts to the own end', () => {
    const own = activity('own');
    expect(occupation(own, week({ activities: [own] }))).toEqual({
      activityId: 'own',
      unitId: 'unit1',
      from: 0,
      to: 60,
    });
  });

  it('lasts until the later activity has taken it off', () => {
    expect(occupation(load, week({ activities: [load, next], links: [takenOff] }))?.to).toBe(95);
  });

  it('lasts at least to the own end, and to that where the later one is not placed or unknown', () => {
    const early = { ...next, placement: { unitId: 'unit2', start: 10 } };
    const loose = { ...next, placement: null };
    const ends = [[early], [loose], []].map(
      (more) => occupation(load, week({ activities: [load, ...more], links: [takenOff] }))?.to,
    );
    expect(ends).toEqual([60, 60, 60]);
    expect(occupation(load, week({ activities: [load, next] }))?.to).toBe(60);
  });

  it('is none where not placed, and sorted by time on a unit', () => {
    const loose = activity('loose', { placement: null });
    const [late, early] = [run('late', 'A', 500), run('early', 'A', 100)];
    expect(occupation(loose, week())).toBeNull();
    const byUnit = occupationsByUnit([late, loose, early], week({ activities: [late, early] }));
    expect(byUnit.get('kettle1')?.map((taken) => taken.activityId)).toEqual(['early', 'late']);
  });
});

describe('cleanings that follow from the sequence', () => {
  it('start when the unit is free, with the steam of the rule', () => {
    const [found, ...more] = changeovers(kettleWeek([run('b', 'B', 200), run('a', 'A', 0)]));
    expect(more).toEqual([]);
    expect(found).toMatchObject({ unitId: 'kettle1', previousId: 'a', nextId: 'b', from: 60, availableMin: 140 });
    expect(found?.cleaning).toMatchObject({
      id: 'clean:a',
      kind: 'cleaning',
      placement: { unitId: 'kettle1', start: 60 },
      modes: [{ minutes: 20, phases: [{ steamKgPerH: 300 }], uses: [{ limitId: 'hoses' }] }],
    });
  });

  it('wait for as long as the placement says', () => {
    const first = run('a', 'A', 0, { placement: { unitId: 'kettle1', start: 0, cleanAfterMin: 45 } });
    expect(changeovers(kettleWeek([first, run('b', 'B', 200)]))[0]).toMatchObject({ from: 105, availableMin: 95 });
  });

  it('need a rule for the families and the kind of unit', () => {
    expect(changeovers(kettleWeek([run('a', 'A', 0), run('b', 'A', 200)]))).toEqual([]);
    expect(changeovers(kettleWeek([run('a', 'A', 0), run('b', 'C', 200)]))).toEqual([]);
    const other = plant({ ...kettle, units: [unit('kettle1', { kind: 'filler' })] });
    expect(changeovers(week({ plant: other, activities: [run('a', 'A', 0), run('b', 'B', 200)] }))).toEqual([]);
  });

  it('look past idling and runs without a family', () => {
    const between = [run('idle', 'X', 70, { kind: 'idle' }), run('plain', 'X', 100, { familyId: null })];
    const found = changeovers(kettleWeek([run('a', 'A', 0), ...between, run('b', 'B', 300)]));
    expect(found.map(({ previousId, nextId }) => [previousId, nextId])).toEqual([['a', 'b']]);
  });

  it("are done by a stored cleaning of the rule's length, not by a shorter one", () => {
    const stored = (minutes: number) =>
      run('wash', 'X', 70, { kind: 'cleaning', familyId: null, modes: [flatMode('kettle1', minutes, 0)] });
    const ids = (minutes: number) =>
      changeovers(kettleWeek([run('a', 'A', 0), stored(minutes), run('b', 'B', 200)])).map(
        ({ cleaning }) => cleaning.id,
      );
    expect(ids(20)).toEqual([]);
    expect(ids(19)).toEqual(['clean:a']);
  });

  it('are too short where the next run starts before they end', () => {
    const breaches = (start: number) => evaluateWeek(kettleWeek([run('a', 'A', 0), run('b', 'B', start)])).breaches;
    expect(breaches(80)).toEqual([]);
    expect(breaches(79)).toMatchObject([
      {
        class: 'time',
        code: 'cleaningTooShort',
        found: 19,
        limit: 20,
        activityIds: ['b', 'a', 'clean:a'],
        from: 60,
        to: 80,
      },
    ]);
  });

  it('of an allergen are a process limit', () => {
    const allergen = plant({ ...kettle, cleaning: [rule('A', 'B', 20, 'allergen')] });
    const { breaches } = evaluateWeek(week({ plant: allergen, activities: [run('a', 'A', 0), run('b', 'B', 79)] }));
    expect(breaches).toMatchObject([{ class: 'process', code: 'allergenCleaning', found: 19, limit: 20 }]);
  });

  it('clash with what is no run in their time', () => {
    const idle = run('idle', 'X', 70, { kind: 'idle', modes: [flatMode('kettle1', 10, 0)] });
    expect(evaluateWeek(kettleWeek([run('a', 'A', 0), idle, run('b', 'B', 200)])).breaches).toMatchObject([
      { code: 'unitClash', activityIds: ['idle', 'clean:a'], from: 70, to: 80 },
    ]);
  });
});

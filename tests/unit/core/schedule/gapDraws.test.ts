import { describe, expect, it } from 'vitest';
import { createEvaluator, evaluateWeek, whoDraws } from '@/core/pipeline';
import type { Activity, Mode } from '@/core/plant/activity';
import { choiceBefore, phasesAfter } from '@/core/schedule/gapDraws';
import { activity, flatMode, phase, plant, unit, ventGroup, week } from '../../../support/builders';

const between = { idleKgPerH: 80, warmUp: [phase(0, 10, 200, 'warmUp')], idleUpToMin: 30 } as const;
const mode: Mode = { ...flatMode('unit1', 60, 400), between };
const run = (id: string, start: number, changes: Partial<Activity> = {}) =>
  activity(id, { modes: [mode], placement: { unitId: 'unit1', start }, ...changes });
const spells = (activities: readonly Activity[], changes = {}) =>
  evaluateWeek(week({ activities, ...changes })).gapDraws.map(({ activity: one, runId }) => [
    one.id,
    runId,
    one.placement?.start,
    one.modes[0]?.minutes,
  ]);

describe('between two runs', () => {
  it('a first run is warmed up before it begins, a short gap is idled, a long one warmed up again', () => {
    expect(spells([run('a', 100), run('b', 185), run('c', 400)])).toEqual([
      ['warm:a', 'a', 90, 10],
      ['idle:b', 'b', 160, 25],
      ['warm:c', 'c', 390, 10],
    ]);
  });

  it('nothing is drawn without a gap or where the runs overlap', () => {
    expect(spells([run('a', 100), run('b', 160), run('c', 190)])).toEqual([['warm:a', 'a', 90, 10]]);
  });

  it('the gap is counted from when the unit is free and clean', () => {
    const rule = { unitKind: 'kettle', fromFamilyId: 'A', toFamilyId: 'B', minutes: 20, kind: 'rinse' } as const;
    const kettle = plant({ units: [unit('unit1', { kind: 'kettle' })], cleaning: [{ ...rule, phases: [], uses: [] }] });
    const pair = [run('a', 100, { familyId: 'A' }), run('b', 205, { familyId: 'B' })];
    expect(spells(pair, { plant: kettle })[1]).toEqual(['idle:b', 'b', 180, 25]);
  });

  it('a stored cleaning does not make a machine warm', () => {
    const stored = activity('wash', { kind: 'cleaning', modes: [flatMode('unit1', 20, 0)] });
    const washAt = (start: number) => ({ ...stored, placement: { unitId: 'unit1', start } });
    expect(spells([washAt(75), run('b', 100)])).toEqual([['warm:b', 'b', 90, 10]]);
    expect(spells([run('a', 0), washAt(75), run('b', 100)])[1]).toEqual(['idle:b', 'b', 95, 5]);
  });

  it('an idle spell draws and says for whom, and follows a hand that drags', () => {
    const source = week({ activities: [run('a', 100), run('b', 185)] });
    expect(whoDraws(source, 'main', 170)).toEqual([{ activityId: 'idle:b', unitId: 'unit1', kgPerH: 80 }]);
    const { evaluation } = createEvaluator(source).preview([
      { activityId: 'b', placement: { unitId: 'unit1', start: 200 } },
    ]);
    expect(evaluation.gapDraws.map(({ activity: one }) => one.id)).toEqual(['warm:a', 'warm:b']);
    expect([165, 195].map((t) => evaluation.headers[0]?.loadKgPerH[t])).toEqual([0, 200]);
  });
});

describe('a machine that is still warm', () => {
  const cold = [phase(0, 6, 900, 'vent'), phase(6, 20, 100, 'process')];
  const soon = [phase(0, 4, 700, 'vent'), phase(4, 22, 100, 'process')];
  const later = [phase(0, 5, 800, 'vent'), phase(5, 21, 100, 'process')];
  const warm = [
    { gapUpToMin: 15, phases: soon },
    { gapUpToMin: 60, phases: later },
  ];
  const load = (id: string, unitId: string, start: number) =>
    activity(id, {
      stage: 'retort',
      modes: [{ unitId, minutes: 26, phases: cold, uses: [], dutyId: null, warm }],
      placement: { unitId, start },
    });

  it('has the phases of the class that holds its gap', () => {
    const kinds = (gap: number | null) => phasesAfter({ phases: cold, warm }, gap);
    expect([null, -1, 0, 15, 16, 60, 61].map(kinds)).toEqual([cold, cold, soon, soon, later, later, cold]);
  });

  it('vents as it is drawn: a shorter vent of a warm retort clears the next one', () => {
    const retorts = plant({
      units: ['r1', 'r2'].map((id) => unit(id, { kind: 'retort', ventGroupId: 'group' })),
      ventGroups: [ventGroup('group')],
    });
    const codes = (firstStart: number) => {
      const loads = [load('x', 'r1', firstStart), load('y', 'r1', 100), load('z', 'r2', 104)];
      return evaluateWeek(week({ plant: retorts, activities: loads, capacities: [] })).breaches.map(({ code }) => code);
    };
    expect(codes(60)).toEqual([]);
    expect(codes(0)).toEqual(['ventsAtOnce']);
  });
});

it('warms up, idles or does nothing by the gap', () => {
  const choices = [0, 1, 30, 31].map((gap) => choiceBefore(between, 500, gap));
  expect(choices).toEqual(['none', 'idle', 'idle', 'warmUp']);
  expect(choiceBefore(between, null, 0)).toBe('warmUp');
});

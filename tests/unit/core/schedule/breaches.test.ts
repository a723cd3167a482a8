import { describe, expect, it } from 'vitest';
import { evaluateWeek } from '@/core/pipeline';
import type { Activity, Mode } from '@/core/plant/activity';
import type { Week } from '@/core/schedule/week';
import {
  activity,
  capacity,
  flatMode,
  header,
  link,
  phase,
  placedAt,
  plant,
  unit,
  ventGroup,
  week,
} from '../../../support/builders';

const breachesOf = (changes: Partial<Week>) => evaluateWeek(week(changes)).breaches;
const at = (id: string, start: number, changes: Partial<Activity> = {}) => placedAt(activity(id, changes), start);

describe('steam limits', () => {
  it('are kept at exactly the limit and passed one kg/h above', () => {
    const flat = (kgPerH: number) =>
      breachesOf({ activities: [at('a', 60, { modes: [flatMode('unit1', 60, kgPerH)] })] });
    expect(flat(1000)).toEqual([]);
    expect(flat(1001)).toMatchObject([
      {
        id: 'overLimit:main:60',
        class: 'steam',
        code: 'overLimit',
        from: 60,
        to: 120,
        overKgPerH: 1,
        activityIds: ['a'],
        sagBar: null,
      },
    ]);
  });

  it('are not judged where there is none', () => {
    const { headers, over, breaches } = evaluateWeek(
      week({ capacities: [capacity('main', null)], activities: [at('a', 0, { modes: [flatMode('unit1', 60, 1e6)] })] }),
    );
    expect(breaches).toEqual([]);
    expect(headers[0]).toMatchObject({ over: null, limitKgPerH: null, leastSpare: null });
    expect(over.kg).toBe(0);
  });

  it('hold for what a letdown can pass', () => {
    const low = header('low', { feed: { kind: 'letdown', fromHeaderId: 'main', greatestKgPerH: 400 } });
    const found = breachesOf({
      plant: plant({ headers: [header('main'), low], units: [unit('unit1', { headerId: 'low' })] }),
      activities: [at('a', 0, { modes: [flatMode('unit1', 60, 450)] })],
    });
    expect(found).toMatchObject([{ code: 'letdownOver', headerId: 'low', overKgPerH: 50, kg: expect.closeTo(50, 9) }]);
  });

  it.each([10_020, 10_080, 10_140])('hold to the last of %d minutes', (horizonMin) => {
    const found = breachesOf({
      horizonMin,
      activities: [at('a', horizonMin - 30, { modes: [flatMode('unit1', 60, 1060)] })],
    });
    expect(found).toMatchObject([
      { code: 'overLimit', from: horizonMin - 30, to: horizonMin, kg: expect.closeTo(30, 9) },
    ]);
  });

  it('are kept by an empty week', () => {
    const { breaches, headers, cleanings, lateMinutes } = evaluateWeek(week());
    expect([breaches, cleanings, lateMinutes]).toEqual([[], [], 0]);
    expect(headers[0]).toMatchObject({
      peak: { kgPerH: 0, minute: 0 },
      leastSpare: null,
      steamKg: 0,
    });
  });
});

describe('vent groups', () => {
  const mode = (unitId: string, phases: Mode['phases']): Mode => ({
    unitId,
    minutes: 80,
    phases,
    uses: [],
    dutyId: null,
  });
  const vent = [phase(10, 6, 100, 'vent'), phase(16, 30, 10, 'process')];
  const manifold = (changes = {}) =>
    plant({
      units: ['r1', 'r2', 'r3'].map((id) => unit(id, { kind: 'retort', ventGroupId: 'group' })),
      ventGroups: [ventGroup('group', changes)],
    });
  const loads = (...starts: number[]) =>
    starts.map((start, i) => at(`load${i + 1}`, start, { stage: 'retort', modes: [mode(`r${i + 1}`, vent)] }));

  it('allow one vent after the other, not a minute of both', () => {
    expect(breachesOf({ plant: manifold(), activities: loads(0, 6) })).toEqual([]);
    expect(breachesOf({ plant: manifold(), activities: loads(0, 5) })).toMatchObject([
      {
        class: 'process',
        code: 'ventsAtOnce',
        from: 15,
        to: 16,
        found: 2,
        limit: 1,
        ventGroupId: 'group',
        activityIds: ['load1', 'load2'],
      },
    ]);
  });

  it('count as many vents as the study validated', () => {
    expect(breachesOf({ plant: manifold({ ventsAtOnce: 2 }), activities: loads(0, 5) })).toEqual([]);
    expect(breachesOf({ plant: manifold({ ventsAtOnce: 2 }), activities: loads(0, 5, 4) })).toMatchObject([
      { code: 'ventsAtOnce', from: 15, to: 16, found: 3, limit: 2 },
    ]);
  });

  it('count a vent of several rates once, its margin once', () => {
    const rates = [phase(0, 3, 200, 'vent'), phase(3, 3, 100, 'vent')];
    const activities = [0, 8].map((start, i) =>
      at(`l${i}`, start, { stage: 'retort', modes: [mode(`r${i + 1}`, rates)] }),
    );
    expect(breachesOf({ plant: manifold({ marginMinutes: 2 }), activities })).toEqual([]);
    expect(breachesOf({ plant: manifold({ marginMinutes: 3 }), activities })).toMatchObject([{ from: 8, to: 9 }]);
  });

  it('count steam ons for as long as the group says', () => {
    const group = manifold({ ventsAtOnce: 9, steamOnsAtOnce: 1, steamOnMinutes: 3 });
    expect(breachesOf({ plant: group, activities: loads(0, 3) })).toEqual([]);
    expect(breachesOf({ plant: group, activities: loads(0, 2) })).toMatchObject([
      { code: 'steamOnsAtOnce', from: 12, to: 13, found: 2, limit: 1 },
    ]);
  });
});

describe('waits of links', () => {
  const two = [at('first', 0), at('second', 90, { modes: [flatMode('unit2', 60, 0)] })];
  const judged = (changes: Parameters<typeof link>[3], activities = two) =>
    breachesOf({ activities, links: [link('wait', 'first', 'second', changes)] });

  it('lie between least and greatest, both included', () => {
    // The first ends at 60; the second starts at 90.
    expect(judged({ leastMin: 30, greatestMin: 30 })).toEqual([]);
    expect(judged({ leastMin: 31 })).toMatchObject([
      { class: 'time', code: 'waitTooShort', found: 30, limit: 31, from: 90, to: 91, activityIds: ['second', 'first'] },
    ]);
    expect(judged({ greatestMin: 29 })).toMatchObject([
      { class: 'time', code: 'waitTooLong', found: 30, limit: 29, from: 89, to: 90 },
    ]);
  });

  it('too long are a process limit where the link says so, and always since closing', () => {
    expect(judged({ greatestMin: 29, greatestBreach: 'process' })).toMatchObject([
      { class: 'process', code: 'waitTooLong' },
    ]);
    expect(judged({ greatestMin: 29, rule: 'sinceClosing' })).toMatchObject([
      { class: 'process', code: 'waitSinceClosing' },
    ]);
    expect(judged({ greatestMin: 29, rule: 'initialTemperature' })).toMatchObject([
      { class: 'process', code: 'initialTemperature' },
    ]);
  });

  it('run from start or end and so many minutes after', () => {
    const from = { activityId: 'first', anchor: 'start', offsetMin: 10 } as const;
    const to = { activityId: 'second', anchor: 'end', offsetMin: -5 } as const;
    // 10 to 145.
    expect(judged({ from, to, leastMin: 135, greatestMin: 135 })).toEqual([]);
    expect(judged({ from, to, greatestMin: 134 })).toMatchObject([{ found: 135 }]);
  });

  it('are passed over where an end is not placed', () => {
    expect(judged({ leastMin: 999 }, [two[0] as Activity, { ...(two[1] as Activity), placement: null }])).toEqual([]);
    expect(judged({ leastMin: 999 }, [two[0] as Activity])).toEqual([]);
  });
});

it("unreleased process data can't be planned with", () => {
  const processData = { id: 'p', document: 'TP-12', issue: '3', released: false };
  const found = (changes: Partial<Activity>) =>
    breachesOf({ activities: [activity('a', { processData, placement: { unitId: 'unit1', start: 10 }, ...changes })] });
  expect(found({})).toMatchObject([{ class: 'process', code: 'unreleasedData', from: 10, to: 70, activityIds: ['a'] }]);
  expect(found({ processData: { ...processData, released: true } })).toEqual([]);
  expect(found({ placement: null })).toEqual([]);
});

describe('shared limits', () => {
  const crates = {
    id: 'crates',
    name: 'Crates',
    unit: 'crates',
    capacity: [
      { from: 0, value: 8 },
      { from: 40, value: 4 },
    ],
  };
  const user = (id: string, unitId: string, start: number, amount: number) =>
    at(id, start, {
      modes: [{ ...flatMode(unitId, 60, 0), uses: [{ limitId: 'crates', offsetMin: 10, minutes: 20, amount }] }],
    });
  const judged = (...activities: Activity[]) => breachesOf({ plant: plant({ sharedLimits: [crates] }), activities });

  it('are passed by more than there is, half-open', () => {
    expect(judged(user('a', 'u1', 0, 4), user('b', 'u2', 0, 4))).toEqual([]);
    expect(judged(user('a', 'u1', 0, 4), user('b', 'u2', 0, 5))).toMatchObject([
      { class: 'shared', code: 'sharedLimitOver', limitId: 'crates', found: 9, limit: 8, from: 10, to: 30 },
    ]);
    expect(judged(user('a', 'u1', 0, 4), user('b', 'u2', 20, 4))).toEqual([]);
  });

  it('follow what there is over time', () => {
    // From 35 to 55, of which 40 to 55 with 4 there.
    expect(judged(user('a', 'u1', 25, 6))).toMatchObject([{ found: 6, limit: 4, from: 40, to: 55 }]);
  });
});

describe('matters of time and place', () => {
  it('a unit takes one at a time, half-open', () => {
    expect(breachesOf({ activities: [at('a', 0), at('b', 60)] })).toEqual([]);
    expect(
      breachesOf({ activities: [at('a', 0), at('b', 59), at('c', 30)] }).map(({ id, from, to }) => [id, from, to]),
    ).toEqual([
      ['unitClash:a:c', 30, 60],
      ['unitClash:a:b', 59, 60],
      ['unitClash:c:b', 59, 90],
    ]);
  });

  it('a unit has to be eligible', () => {
    const found = breachesOf({ activities: [at('a', 0, { placement: null })].map((a) => placedAt(a, 0, 'other')) });
    expect(found).toMatchObject([{ code: 'unitNotEligible', unitId: 'other', from: 0, to: 60 }]);
  });

  it('an activity lies within one open span; touching spans are one; without a calendar the unit is open', () => {
    const judged = (open: [number, number][], start: number) =>
      breachesOf({
        calendars: [{ unitId: 'unit1', open: open.map(([from, to]) => ({ from, to })) }],
        activities: [at('a', start)],
      }).map(({ code, from, to }) => [code, from, to]);
    expect(judged([[100, 160]], 100)).toEqual([]);
    expect(judged([[100, 160]], 101)).toEqual([['outsideShift', 160, 161]]);
    expect(judged([[100, 160]], 99)).toEqual([['outsideShift', 99, 100]]);
    expect(
      judged(
        [
          [100, 130],
          [130, 160],
        ],
        100,
      ),
    ).toEqual([]);
    expect(
      judged(
        [
          [100, 130],
          [131, 160],
        ],
        100,
      ),
    ).toEqual([['outsideShift', 130, 160]]);
    expect(judged([], 100)).toEqual([['outsideShift', 100, 160]]);
  });

  it('late, early and after the latest time are counted in minutes', () => {
    const judged = (changes: Partial<Activity>) =>
      breachesOf({ activities: [at('a', 100, changes)] }).map(({ code, from, to }) => [code, from, to]);
    expect(judged({ due: 160, earliestStart: 100, latestStart: 100 })).toEqual([]);
    expect(judged({ due: 159 })).toEqual([['late', 159, 160]]);
    expect(judged({ earliestStart: 103 })).toEqual([['beforeEarliest', 100, 103]]);
    expect(judged({ latestStart: 98 })).toEqual([['afterLatest', 98, 100]]);
    expect(evaluateWeek(week({ activities: [at('a', 100, { due: 150 }), at('b', 300, { due: 355 })] }))).toMatchObject({
      lateMinutes: 15,
      lateActivities: 2,
    });
  });

  it('what is not placed passes no limit', () => {
    const loose = activity('a', { placement: null, due: 0, earliestStart: 50, latestStart: 10 });
    expect(breachesOf({ activities: [loose] })).toEqual([]);
  });
});

it('lists process limits first, then steam, shared and time, each in order of time', () => {
  const crates = { id: 'crates', name: 'Crates', unit: 'crates', capacity: [{ from: 0, value: 0 }] };
  const uses = [{ limitId: 'crates', offsetMin: 0, minutes: 5, amount: 1 }];
  const heavy = (id: string, start: number) =>
    at(id, start, { modes: [{ ...flatMode('unit1', 60, 2000), uses }], due: 0 });
  const processData = { id: 'p', document: 'TP-12', issue: '3', released: false };
  const activities = [heavy('late', 500), heavy('soon', 100), at('process', 900, { processData })];
  expect(breachesOf({ plant: plant({ sharedLimits: [crates] }), activities }).map((breach) => breach.id)).toEqual([
    'unreleasedData:process',
    'overLimit:main:100',
    'overLimit:main:500',
    'sharedLimitOver:crates:100',
    'sharedLimitOver:crates:500',
    'late:soon',
    'late:late',
  ]);
});

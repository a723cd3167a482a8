import { describe, expect, it } from 'vitest';
import type { Breach } from '@/core/schedule/breach';
import { sayingIn } from '@/core/quantity/saying';
import { breachSentence, listed, minutesText, namesOf } from '@/core/schedule/sentences';
import { activity, flatMode, plant, unit, ventGroup, week } from '../../../support/builders';

const clock = (minute: number) =>
  `${String(Math.floor(minute / 60)).padStart(2, '0')}:${String(minute % 60).padStart(2, '0')}`;

const loads = [2, 3, 5, 6].map((n) =>
  activity(`load${n}`, { code: `A10${n}`, title: 'Sweet corn', modes: [flatMode(`r${n}`, 60, 500)] }),
);
const inWeek = week({
  plant: plant({
    units: [2, 3, 5, 6].map((n) => unit(`r${n}`, { name: `Retort ${n}` })),
    ventGroups: [ventGroup('g', { name: 'Manifold north' })],
    sharedLimits: [{ id: 'crates', name: 'Crates', unit: 'crates', capacity: [] }],
  }),
  activities: loads,
});
const names = namesOf(inWeek);
const say = (breach: Breach) => breachSentence(breach, names, clock);
const span = { id: 'x', from: 400, to: 406, activityIds: ['load2', 'load3', 'load5', 'load6'] };
const process = { ...span, class: 'process', found: 140, limit: 120, ventGroupId: null } as const;
const time = { ...span, class: 'time', unitId: 'r2', found: 19, limit: 20 } as const;

describe('breaches in the words of the floor', () => {
  it('say how much over the steam limit, when, and who draws most', () => {
    const steam = { ...span, class: 'steam', headerId: 'main', overKgPerH: 603.4, kg: 60.3, sagBar: 0.68 } as const;
    expect(say({ ...steam, code: 'overLimit' })).toEqual({
      title: 'Over the steam limit by 600 kg/h, 06:40 to 06:46',
      detail:
        'Retort 2, Retort 3 and Retort 5 draw most. Header main: 60 kg missing; the pressure would fall by about 0.7 bar.',
    });
    expect(say({ ...steam, code: 'overLimit', activityIds: ['load2'], sagBar: null }).detail).toBe(
      'Retort 2 draws most. Header main: 60 kg missing.',
    );
    expect(say({ ...steam, code: 'letdownOver' }).title).toBe(
      'More than the letdown can pass by 600 kg/h, 06:40 to 06:46',
    );
    expect(say({ ...steam, code: 'stepTooSteep', overKgPerH: 1555 })).toMatchObject({
      title: 'Step too steep: 1 560 kg/h more at 06:40',
      detail: expect.stringContaining('rise faster than the boilers in fire can follow'),
    });
    expect(say({ ...steam, code: 'overLimit', activityIds: [] }).detail).toContain('Only the base load draws.');
  });

  it('say which process limit is passed', () => {
    const vents = { ...process, ventGroupId: 'g', found: 2, limit: 1, activityIds: ['load2', 'load3'] };
    expect(say({ ...vents, code: 'ventsAtOnce' })).toEqual({
      title: '2 vents at once, 06:40 to 06:46',
      detail: 'Retort 2 and Retort 3: Manifold north allows 1.',
    });
    expect(say({ ...vents, code: 'steamOnsAtOnce' }).title).toBe('2 steam ons at once, 06:40 to 06:46');
    expect(say({ ...process, code: 'waitSinceClosing' })).toEqual({
      title: 'Wait since closing too long: A102 Sweet corn',
      detail: '2 h 20 min since the first container was closed; at most 2 h, until 06:40.',
    });
    expect(say({ ...process, code: 'initialTemperature' }).title).toContain('initial temperature: A102');
    expect(say({ ...process, code: 'waitTooLong' }).detail).toBe(
      '2 h 20 min after A103 Sweet corn; at most 2 h, until 06:40.',
    );
    expect(say({ ...process, code: 'unreleasedData' }).title).toBe('Process data not released: A102 Sweet corn');
    expect(say({ ...process, code: 'allergenCleaning', found: 10 }).detail).toBe(
      '10 minutes are left after A103 Sweet corn; the clean takes 2 h.',
    );
  });

  it('say what is short and what is late', () => {
    const shared = {
      ...span,
      class: 'shared',
      code: 'sharedLimitOver',
      limitId: 'crates',
      found: 44,
      limit: 40,
    } as const;
    expect(say(shared).title).toBe('Crates: 44 crates needed, 40 crates there, 06:40 to 06:46');
    const titles = (
      [
        'unitClash',
        'unitNotEligible',
        'outsideShift',
        'waitTooShort',
        'waitTooLong',
        'cleaningTooShort',
        'late',
        'beforeEarliest',
        'afterLatest',
      ] as const
    ).map((code) => say({ ...time, code }).title);
    expect(titles).toEqual([
      'Retort 2 is taken twice at 06:40',
      "A102 Sweet corn can't run on Retort 2",
      'A102 Sweet corn runs outside the shift',
      'Wait too short: A102 Sweet corn',
      'Wait too long: A102 Sweet corn',
      'Cleaning too short before A102 Sweet corn',
      'A102 Sweet corn is late by 19 minutes',
      'A102 Sweet corn is early by 19 minutes',
      'A102 Sweet corn is planned 19 minutes after its latest time',
    ]);
  });

  it('use none of the words of optimisation', () => {
    const banned = /overload|exceed|headroom|tardi|pinned|deviation|tray|displace|constraint/i;
    const steam = { ...span, class: 'steam', headerId: 'main', overKgPerH: 5, kg: 0.2, sagBar: null } as const;
    const all: Breach[] = [
      ...(['overLimit', 'letdownOver', 'stepTooSteep'] as const).map((code) => ({ ...steam, code })),
      ...(['ventsAtOnce', 'waitSinceClosing', 'unreleasedData', 'allergenCleaning'] as const).map((code) => ({
        ...process,
        code,
      })),
      ...(['unitClash', 'late', 'cleaningTooShort', 'outsideShift'] as const).map((code) => ({ ...time, code })),
    ];
    for (const breach of all) expect(`${say(breach).title} ${say(breach).detail}`).not.toMatch(banned);
  });
});

it('says steam, load and pressure in the units asked for', () => {
  const over: Breach = {
    ...span,
    class: 'steam',
    code: 'overLimit',
    headerId: 'main',
    overKgPerH: 604,
    kg: 41,
    sagBar: 0.3,
  };
  const us = breachSentence(over, namesOf(inWeek, sayingIn('usCustomary')), clock);
  // 604 kg/h are 1 331.6 lb/h, 41 kg are 90.4 lb, 0.3 bar are 4.35 psi.
  expect(us.title).toBe('Over the steam limit by 1 325 lb/h, 06:40 to 06:46');
  expect(us.detail).toContain('90 lb missing; the pressure would fall by about 4.4 psi');
  expect(say(over).detail).toContain('41 kg missing; the pressure would fall by about 0.3 bar');
});

it('writes rates to 10 kg/h, minutes and lists', () => {
  expect([3, 604, 605, 1234567, 0].map(sayingIn('si').rate)).toEqual([
    '10 kg/h',
    '600 kg/h',
    '610 kg/h',
    '1 234 570 kg/h',
    '0 kg/h',
  ]);
  expect([1, 59, 60, 61].map(minutesText)).toEqual(['1 minute', '59 minutes', '1 h', '1 h 1 min']);
  expect([[], ['a'], ['a', 'b'], ['a', 'b', 'c']].map(listed)).toEqual(['', 'a', 'a and b', 'a, b and c']);
});

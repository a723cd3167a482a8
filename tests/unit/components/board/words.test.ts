import { describe, expect, it } from 'vitest';
import { addNotice } from '@/components/board/notices';
import { progressPath } from '@/components/board/progress';
import { asDataBlock } from '@/components/board/dataBlock';
import { minuteOfClock } from '@/components/board/SlipDialog';
import { standingOf } from '@/components/board/standing';
import { closedSpans, shiftSpells, ticksOf } from '@/components/board/ticks';
import { weekWords } from '@/components/board/weekWords';
import { blockLabel, markText, moveText, overWords } from '@/components/board/words';
import { unitsOf } from '@/components/units';
import { makeClock } from '@/components/time';
import type { Breach } from '@/core/schedule/breach';
import { judgeHeader } from '@/core/header/judgement';
import { activity, mode, phase, PLANT } from './fixture';

const clock = makeClock({ firstInstant: '2026-11-29T23:00:00Z', timeZone: 'Europe/Berlin' });

describe('ticksOf', () => {
  it('should mark every hour where there is room, every sixth where there is little, days always', () => {
    expect(
      ticksOf(clock, 1440, 1)
        .map((tick) => tick.label)
        .slice(0, 3),
    ).toEqual(['Mon 30 Nov', '01:00', '02:00']);
    expect(ticksOf(clock, 2880, 0.2).map((tick) => tick.label)).toEqual([
      'Mon 30 Nov',
      '06:00',
      '12:00',
      '18:00',
      'Tue 1 Dec',
      '06:00',
      '12:00',
      '18:00',
    ]);
    expect(ticksOf(clock, 2880, 0.01).map((tick) => tick.label)).toEqual(['Mon 30 Nov', 'Tue 1 Dec']);
  });
  it('should not repeat or lose a day over a clock change', () => {
    const spring = makeClock({ firstInstant: '2026-03-22T23:00:00Z', timeZone: 'Europe/Berlin' });
    expect(ticksOf(spring, 10_020, 0.1).filter((tick) => tick.isDay)).toHaveLength(7);
    const autumn = makeClock({ firstInstant: '2026-10-18T22:00:00Z', timeZone: 'Europe/Berlin' });
    expect(ticksOf(autumn, 10_140, 0.1).filter((tick) => tick.isDay)).toHaveLength(7);
  });
});

describe('shifts and closed time', () => {
  it('should name a shift once where lines share it', () => {
    const shift = { shiftId: 's', name: 'early', date: '2026-11-30', lineIds: null };
    const spells = shiftSpells([
      { ...shift, from: 360, to: 840 },
      { ...shift, from: 360, to: 900 },
      { ...shift, from: 1800, to: 2280 },
    ]);
    expect(spells.map((spell) => [spell.from, spell.to])).toEqual([
      [360, 900],
      [1800, 2280],
    ]);
  });
  it('should close what lies between open spans', () => {
    expect(
      closedSpans(
        [
          { from: 360, to: 840 },
          { from: 840, to: 1320 },
        ],
        1440,
      ),
    ).toEqual([
      { from: 0, to: 360 },
      { from: 1320, to: 1440 },
    ]);
    expect(closedSpans([], 1440)).toEqual([{ from: 0, to: 1440 }]);
  });
});

describe('weekWords', () => {
  it('should name the week, its span and its neighbours', () => {
    const dto = {
      weekStart: '2026-11-30',
      firstInstant: '2026-11-29T23:00:00Z',
      timeZone: 'Europe/Berlin',
      now: '2026-12-07T00:00:00Z',
    };
    const words = weekWords({
      ...dto,
      week: { horizonMin: 10_080, plant: PLANT, calendars: [], capacities: [], activities: [], links: [] },
    });
    expect(words).toEqual({
      title: 'Week 49',
      span: '30 Nov to 6 Dec 2026',
      previous: '2026-11-23',
      next: '2026-12-07',
      isThisWeek: false,
    });
  });
});

const [si, us] = [unitsOf('si'), unitsOf('usCustomary')];

describe('overWords', () => {
  const header = {
    id: 'main',
    name: 'Main',
    pressureBarG: 7,
    dryness: 0.98,
    superheatK: null,
    feed: { kind: 'boilers' as const },
  };
  const judged = (load: number[], limit: number | null) =>
    judgeHeader(
      header,
      {
        headerId: 'main',
        exportKgPerH: null,
        limitKgPerH: limit === null ? null : [{ from: 0, value: limit }],
        baseLoadKgPerH: [],
        greatestRiseKgPerHPerMin: null,
        storedKgPerBar: null,
      },
      Float64Array.from(load),
      PLANT.rules,
    );
  it('should say how much is over and for how long', () => {
    // 600 kg/h over for 2 min: 20 kg.
    expect(overWords(judged([1000, 1600, 1600, 900], 1000), clock, si)).toEqual({
      look: 'over',
      figure: '20\u00a0kg',
      line: 'over the limit, 2 min',
    });
  });
  it('should say what is left at the tightest minute', () => {
    expect(overWords(judged([100, 900, 300], 1000), clock, si).line).toBe('least to spare 100\u00a0kg/h, Mon 00:01');
  });
  it('should say it in lb where those are shown', () => {
    expect(overWords(judged([1000, 1600, 1600, 900], 1000), clock, us).figure).toBe('44\u00a0lb');
    expect(overWords(judged([100, 900, 300], 1000), clock, us).line).toBe('least to spare 220\u00a0lb/h, Mon 00:01');
  });
  it('should never say that it fits where no limit is set', () => {
    expect(overWords(judged([100, 900], null), clock, si)).toMatchObject({ look: 'quiet', figure: 'not judged' });
  });
});

describe('words of a block and a move', () => {
  it('should say all that is drawn', () => {
    const one = activity('a1', {
      title: 'Peas',
      modes: [mode('r1', 60, [phase(0, 6, 1552)])],
      placement: { unitId: 'r1', start: 400 },
      fixing: 'fixed',
    });
    expect(blockLabel(one, PLANT, clock, ['Late'], si)).toBe(
      'A1 Peas, Retort 1, Mon 06:40, to 07:40, steam up to 1\u2009550\u00a0kg/h, fixed, Late',
    );
    expect(blockLabel(one, PLANT, clock, [], us)).toContain('steam up to 3\u2009420\u00a0lb/h');
  });
  it('should say where and how far', () => {
    const from = { unitId: 'r1', start: 400 };
    expect(moveText({ from, to: { unitId: 'r1', start: 412 } }, PLANT)).toBe('12 min later');
    expect(moveText({ from, to: { unitId: 'r2', start: 395 } }, PLANT)).toBe('to Retort 2, 5 min earlier');
    expect(moveText({ from, to: { unitId: 'r2', start: 400 } }, PLANT)).toBe('to Retort 2');
  });
  it('should mark tonnes where the scale is large', () => {
    expect([markText(2000, 7000, si), markText(500, 1200, si)]).toEqual(['2 t/h', '500']);
    expect(markText(us.inside('steamRate', 10_000), 7000, us)).toBe('10\u2009000');
  });
});

describe('standingOf', () => {
  const steam = { id: 's', class: 'steam', code: 'overLimit', kg: 5, activityIds: [] } as unknown as Breach;
  const vents = { id: 'p', class: 'process', code: 'ventsAtOnce', activityIds: ['a'] } as unknown as Breach;
  const data = { id: 'd', class: 'process', code: 'unreleasedData', activityIds: ['a'] } as unknown as Breach;
  const agreement = { revision: 4, at: '', by: 'U', comment: 'c' };
  it('should let steam go under an agreement to this very revision', () => {
    expect(standingOf([steam], [], null, 4).mayGo).toBe(false);
    expect(standingOf([steam], [], agreement, 4).mayGo).toBe(true);
    expect(standingOf([steam], [], agreement, 5).mayGo).toBe(false);
  });
  it('should let nothing go over a process limit, agreement or not', () => {
    expect(standingOf([vents, steam], [], agreement, 4)).toMatchObject({ mayGo: false, process: [vents] });
  });
  it('should hold data against loads still to come only', () => {
    expect(standingOf([data], [activity('a', { fixing: 'done' })], null, 4).mayGo).toBe(true);
    expect(standingOf([data], [activity('a')], null, 4).mayGo).toBe(false);
  });
});

describe('minuteOfClock', () => {
  it('should find a time of a day, and the first of two where the clock goes back', () => {
    expect(minuteOfClock(clock, 1440, '06:40')).toBe(1840);
    expect(minuteOfClock(clock, 1440, '')).toBeNull();
    const autumn = makeClock({ firstInstant: '2026-10-18T22:00:00Z', timeZone: 'Europe/Berlin' });
    expect(minuteOfClock(autumn, 6 * 1440, '02:30')).toBe(6 * 1440 + 150);
    expect(minuteOfClock(autumn, 6 * 1440, '03:00')).toBe(6 * 1440 + 240);
  });
});

describe('small things', () => {
  it('should not say the same twice, and keep the newest', () => {
    const one = { look: 'note' as const, title: 'a', lines: [] };
    let notices = addNotice([], one);
    notices = addNotice(notices, { ...one, title: 'b' });
    notices = addNotice(notices, one);
    expect(notices.map((notice) => notice.title)).toEqual(['b', 'a']);
    expect(new Set(notices.map((notice) => notice.id)).size).toBe(2);
  });
  it('should step the progress down as better plans are found', () => {
    const at = (ms: number, overKg: number) => ({ ms, overKg, lateMin: 0, movedMin: 0 });
    const frame = { widthPx: 100, heightPx: 50, seconds: 10, most: 400 };
    expect(progressPath([at(0, 400), at(5000, 100), at(20_000, 0)], frame)?.line).toBe('M0 0H0V0H50V37.5H100V50');
    expect(progressPath([], frame)).toBeNull();
  });
  it('should leave nothing in a data block that could end it', () => {
    const block = asDataBlock({ name: '</script><!--' });
    expect(block).not.toContain('<');
    expect(JSON.parse(block)).toEqual({ name: '</script><!--' });
  });
});

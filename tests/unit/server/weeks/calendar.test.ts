import { describe, expect, it } from 'vitest';
import { valueAt } from '@/core/time/stepFunction';
import { expandShifts, unitCalendars, type ShiftRow } from '@/server/weeks/calendar';
import { minuteOfHour, stepsByHour, sumByHour } from '@/server/weeks/weeklySteps';
import { instantOf, weekTimeOf } from '@/server/weeks/weekTime';

const BERLIN = 'Europe/Berlin';
const DAY = 1440;
const time = weekTimeOf('2026-11-30', BERLIN);
const weekdays = [1, 2, 3, 4, 5];
const shift = (id: string, startsAt: string, endsAt: string, more: Partial<ShiftRow> = {}): ShiftRow => ({
  id,
  name: id,
  days: weekdays,
  startsAt,
  endsAt,
  lineIds: null,
  ...more,
});
const threeShifts = [
  shift('early', '06:00', '14:00'),
  shift('late', '14:00', '22:00'),
  shift('night', '22:00', '06:00'),
];

describe('shifts on the clock', () => {
  it('expands one span a day, past midnight where the shift runs so', () => {
    const spans = expandShifts(time, threeShifts);
    expect(spans).toHaveLength(15);
    expect(spans[0]).toMatchObject({ shiftId: 'early', date: '2026-11-30', from: 360, to: 840 });
    expect(spans[2]).toMatchObject({ shiftId: 'night', date: '2026-11-30', from: 1320, to: DAY + 360 });
  });

  it('keeps whole the shift that runs in from the week before and the one that runs out', () => {
    const spans = expandShifts(time, [shift('night', '22:00', '06:00', { days: [7] })]);
    expect(spans.map(({ date, from, to }) => ({ date, from, to }))).toEqual([
      { date: '2026-11-29', from: -120, to: 360 },
      { date: '2026-12-06', from: 6 * DAY + 1320, to: 7 * DAY + 360 },
    ]);
  });

  it('gives a night shift 7 hours when the clocks go forward and 9 when they go back', () => {
    const night = [shift('night', '22:00', '06:00', { days: [6] })];
    const lengths = ['2026-03-23', '2026-10-19', '2026-11-30'].map((weekStart) => {
      const [span] = expandShifts(weekTimeOf(weekStart, BERLIN), night);
      return (span?.to ?? 0) - (span?.from ?? 0);
    });
    expect(lengths).toEqual([420, 540, 480]);
  });

  it('runs a day shift of 24 hours from an end equal to its start', () => {
    const spans = expandShifts(time, [shift('all', '00:00', '00:00', { days: [1, 2, 3, 4, 5, 6, 7] })]);
    expect(spans).toHaveLength(7);
    expect(spans.at(-1)).toMatchObject({ from: 6 * DAY, to: 7 * DAY });
  });
});

describe('when units are crewed', () => {
  const units = [
    { id: 'r1', lineId: 'l1' },
    { id: 'k1', lineId: 'l2' },
  ];
  const openOf = (unitId: string, shifts: readonly ShiftRow[], exceptions: Parameters<typeof unitCalendars>[3] = []) =>
    unitCalendars(time, units, expandShifts(time, shifts), exceptions).find((c) => c.unitId === unitId)?.open;
  const span = (fromMin: number, toMin: number, open: boolean, unitId: string | null = null) => ({
    unitId,
    open,
    fromAt: instantOf(time, fromMin),
    toAt: instantOf(time, toMin),
  });

  it('joins the shifts of the unit’s line and cuts at the week', () => {
    expect(openOf('r1', threeShifts)).toEqual([{ from: 360, to: 5 * DAY + 360 }]);
    expect(openOf('r1', [shift('a', '06:00', '14:00', { lineIds: ['l2'] })])).toEqual([]);
    expect(openOf('r1', [shift('n', '22:00', '06:00', { days: [7] })])).toEqual([
      { from: 0, to: 360 },
      { from: 6 * DAY + 1320, to: 7 * DAY },
    ]);
  });

  it('lets exceptions open and close, the unit’s own over the plant’s', () => {
    const monday = [shift('early', '06:00', '14:00', { days: [1] })];
    expect(openOf('r1', monday, [span(840, 960, true)])).toEqual([{ from: 360, to: 960 }]);
    expect(openOf('r1', monday, [span(400, 500, false)])).toEqual([
      { from: 360, to: 400 },
      { from: 500, to: 840 },
    ]);
    expect(openOf('r1', monday, [span(0, DAY, false)])).toEqual([]);
    expect(openOf('r1', monday, [span(0, DAY, false), span(600, 660, true, 'r1')])).toEqual([{ from: 600, to: 660 }]);
    expect(openOf('k1', monday, [span(0, DAY, false), span(600, 660, true, 'r1')])).toEqual([]);
    expect(openOf('r1', monday, [span(360, 840, true), span(500, 840, false)])).toEqual([{ from: 360, to: 500 }]);
  });
});

describe('values by hour of the week', () => {
  it('follows the clocks across a change', () => {
    const steps = [0, 2, 3, 4].map((hour) => minuteOfHour(weekTimeOf('2026-03-23', BERLIN), 6 * 24 + hour) - 6 * DAY);
    expect(steps).toEqual([0, 120, 120, 180]);
    const back = [0, 2, 3, 4].map((hour) => minuteOfHour(weekTimeOf('2026-10-19', BERLIN), 6 * 24 + hour) - 6 * DAY);
    expect(back).toEqual([0, 120, 240, 300]);
  });

  it('keeps the later of two hours that a clock change brings together', () => {
    const spring = weekTimeOf('2026-03-23', BERLIN);
    const hourSteps = [
      { fromHour: 0, value: 5 },
      { fromHour: 146, value: 6 },
      { fromHour: 147, value: 7 },
    ];
    expect(stepsByHour(spring, hourSteps)).toEqual([
      { from: 0, value: 5 },
      { from: 6 * DAY + 120, value: 7 },
    ]);
  });

  it('sums what overlaps and returns to nothing', () => {
    const load = sumByHour(time, [
      { fromHour: 0, toHour: 168, value: 300 },
      { fromHour: 6, toHour: 22, value: 150 },
    ]);
    expect(load).toEqual([
      { from: 0, value: 300 },
      { from: 360, value: 450 },
      { from: 1320, value: 300 },
    ]);
    expect(valueAt(sumByHour(time, [{ fromHour: 6, toHour: 22, value: 150 }]), 1320)).toBe(0);
    expect(sumByHour(time, [])).toEqual([{ from: 0, value: 0 }]);
  });
});

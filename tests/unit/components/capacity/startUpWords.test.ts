import { describe, expect, it } from 'vitest';
import { hourText } from '@/components/capacity/BaseLoadPanel';
import { lateText, outSinceText, startUpLines, type StartUpNames } from '@/components/capacity/startUpWords';
import { daysOf } from '@/components/capacity/wallTime';
import { makeClock } from '@/components/time';
import { unitsOf } from '@/components/units';
import type { StartUp } from '@/core/house/startUp';

const clock = makeClock({ firstInstant: '2026-11-30T00:00:00.000Z', timeZone: 'Europe/London' });
const names: StartUpNames = {
  boiler: () => 'Boiler 1',
  header: () => 'Main header',
  unit: () => 'Blancher 1',
  activity: () => 'A01 Sweetcorn',
};
const draw = { headerId: 'h', unitId: 'u', activityId: 'a', kind: 'steamOn' as const, fromMin: 360, toMin: 400 };
const start: StartUp = {
  outSinceMin: -2_880,
  firstDrawMin: 345,
  steps: [
    { kind: 'light', atMin: -20, boilerId: 'b', start: 'cold', minutes: 125 },
    { kind: 'purged', atMin: -15, boilerId: 'b', minutes: 5 },
    { kind: 'pressure', atMin: 105, boilerId: 'b', forLoadKgPerH: null },
    { kind: 'pressure', atMin: 200, boilerId: 'b', forLoadKgPerH: 1_801 },
    { kind: 'openMains', atMin: 325, headerId: 'h', minutes: 20, kg: 40 },
    { kind: 'mainsReady', atMin: 345, headerId: 'h' },
    { kind: 'warmUp', atMin: 345, draw: { ...draw, kind: 'warmUp', fromMin: 345, toMin: 360 } },
    { kind: 'steamOn', atMin: 360, draw },
  ],
  late: [],
};
const plain = (text: string) => text.replace(/[\u00a0\u2009]/g, ' ');

describe('a start in words', () => {
  it('reads from the fire to the first steam-on, times before the week with their day', () => {
    const lines = startUpLines(start, names, clock, unitsOf('si')).map((l) => plain(`${l.at} ${l.text}: ${l.reason}`));
    expect(lines).toEqual([
      'Sun 23:40 Light Boiler 1: cold: 2 h 05 to pressure, purge included',
      'Sun 23:45 Boiler 1: purge over: 5 min',
      'Mon 01:45 Boiler 1 at pressure: before the mains are opened',
      'Mon 03:20 Boiler 1 at pressure: the load comes to 1 800 kg/h, more than the boilers before it carry',
      'Mon 05:25 Mains of the main header: open slowly, warm and drain: 20 min, about 40 kg of steam',
      'Mon 05:45 Main header ready: mains opened, warmed and drained',
      'Mon 05:45 Blancher 1 warms up: cold, 15 min',
      'Mon 06:00 First steam on: Blancher 1: A01 Sweetcorn',
    ]);
  });

  it('speaks the units of the person', () => {
    const [, , , load, mains] = startUpLines(start, names, clock, unitsOf('usCustomary'));
    expect([load?.reason, mains?.reason].map((text) => plain(text ?? ''))).toEqual([
      'the load comes to 3 970 lb/h, more than the boilers before it carry',
      'open slowly, warm and drain: 20 min, about 88 lb of steam',
    ]);
  });

  it('says since when nothing burns, as far as it is known', () => {
    expect(outSinceText(start, clock)).toBe('Out of fire since Sat 00:00 or before.');
    expect(outSinceText({ ...start, outSinceMin: 720 }, clock)).toBe('Out of fire since Mon 12:00.');
  });

  it('says what a firing lacks', () => {
    const late = { boilerId: 'b', neededLitMin: 215 };
    expect([
      lateText({ ...late, setLitMin: null, lateMin: null }, names, clock),
      lateText({ ...late, setLitMin: 270, lateMin: 55 }, names, clock),
      lateText({ ...late, setLitMin: 200, lateMin: null }, names, clock),
    ]).toEqual([
      'Boiler 1 must be lit by Mon 03:35; no firing is set.',
      'Boiler 1 must be lit by Mon 03:35; it is set to be lit at Mon 04:30 and comes to pressure 55 min too late.',
      'Boiler 1 must be lit by Mon 03:35; it is set to be lit at Mon 03:20 and goes out before it is at pressure.',
    ]);
  });
});

describe('an hour of the week', () => {
  it('is a day and a full hour; an end at midnight belongs to the day that it ends', () => {
    const days = daysOf(clock, 10_080);
    expect([hourText(4, days), hourText(136, days, true), hourText(24, days), hourText(24, days, true)]).toEqual([
      'Mon 04:00',
      'Sat 16:00',
      'Tue 00:00',
      'Mon 24:00',
    ]);
  });
});

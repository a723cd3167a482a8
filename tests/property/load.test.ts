import fc from 'fast-check';
import { expect, it } from 'vitest';
import { phasesKg } from '@/core/demand/activityLoad';
import { gridMinutes, toGrid } from '@/core/demand/grid';
import { loadOf, type LoadCurve } from '@/core/header/loadCurve';
import { overLimit } from '@/core/header/over';
import { loadKg, steamToSpare } from '@/core/header/spare';
import { toMinutes } from '@/core/time/stepFunction';
import { dutyPhases, placement, SHORT_WEEK_MIN, weeks } from '../support/arbitraryWeeks';

const HEADERS = ['main', 'low'];
const minutesOf = (curve: LoadCurve) => HEADERS.map((id) => [...curve.kgPerH(id)]);

it('puts duty phases on whole minutes without losing or making steam', () => {
  fc.assert(
    fc.property(dutyPhases, (duty) => {
      const phases = toGrid(duty);
      const kg = duty.reduce((sum, one) => sum + (one.steamKgPerH * one.minutes) / 60, 0);
      // A milligram: ends within 1e-9 min of a whole minute are that minute.
      expect(Math.abs(phasesKg(phases) - kg)).toBeLessThan(1e-6);
      expect(phases.reduce((end, one) => (one.offsetMin === end ? end + one.minutes : NaN), 0)).toBe(gridMinutes(duty));
      phases.slice(1).forEach((one, i) => {
        expect([one.kind, one.steamKgPerH]).not.toEqual([phases[i]?.kind, phases[i]?.steamKgPerH]);
      });
    }),
    { numRuns: 300 },
  );
});

it('a load changed step by step is the load built anew, to the bit', () => {
  const moves = fc.array(fc.tuple(fc.nat(), fc.option(placement)), { maxLength: 20 });
  let moved = 0;
  fc.assert(
    fc.property(weeks, moves, (week, changes) => {
      const activities = [...week.activities];
      const curve = loadOf(week);
      for (const [pick, to] of activities.length > 0 ? changes : []) {
        const i = pick % activities.length;
        activities[i] = curve.move(activities[i] as (typeof activities)[number], to);
        moved += 1;
      }
      expect(minutesOf(curve)).toEqual(minutesOf(loadOf({ ...week, activities })));
    }),
    { numRuns: 150 },
  );
  expect(moved).toBeGreaterThan(150);
});

it('the load of the whole is the load of its parts, in any order', () => {
  fc.assert(
    fc.property(weeks, fc.nat(), (week, at) => {
      const cut = week.activities.length === 0 ? 0 : at % week.activities.length;
      const bare = { ...week, capacities: [] };
      const whole = minutesOf(loadOf(bare));
      const first = minutesOf(loadOf({ ...bare, activities: week.activities.slice(0, cut) }));
      const second = minutesOf(loadOf({ ...bare, activities: week.activities.slice(cut) }));
      const summed = first.map((values, h) => values.map((value, t) => value + (second[h]?.[t] ?? NaN)));
      expect(summed).toEqual(whole);
      expect(minutesOf(loadOf({ ...bare, activities: [...week.activities].reverse() }))).toEqual(whole);
    }),
    { numRuns: 100 },
  );
});

it('all steam drawn below a letdown is drawn above it', () => {
  let drawing = 0;
  fc.assert(
    fc.property(weeks, (week) => {
      const curve = loadOf(week);
      const [main, low] = HEADERS.map((id) => curve.kgPerH(id));
      expect(main?.every((value, t) => value >= (low?.[t] ?? NaN))).toBe(true);
      const onlyLow = loadOf({ ...week, activities: week.activities.filter((a) => a.placement?.unitId === 'low1') });
      expect(loadKg(curve.kgPerH('low'))).toBe(loadKg(onlyLow.kgPerH('low')));
      if (week.activities.some((a) => a.placement?.unitId === 'low1')) drawing += 1;
    }),
    { numRuns: 100 },
  );
  expect(drawing).toBeGreaterThan(10);
});

it('a step function holds what the minutes hold', () => {
  fc.assert(
    fc.property(weeks, (week) => {
      const curve = loadOf(week);
      expect([...toMinutes(curve.steps('main'), SHORT_WEEK_MIN)]).toEqual([...curve.kgPerH('main')]);
    }),
    { numRuns: 50 },
  );
});

it('kg over, minutes over and steam to spare agree minute by minute', () => {
  let minutesOver = 0;
  const values = fc.array(fc.integer({ min: 0, max: 3000 }), { maxLength: 80 });
  fc.assert(
    fc.property(values, fc.integer({ min: 0, max: 3000 }), (load, limitKgPerH) => {
      const limit = load.map(() => limitKgPerH);
      const over = overLimit(load, limit, null);
      const missing = [...steamToSpare(load, limit)].filter((spare) => spare < 0);
      expect(over.minutes).toBe(missing.length);
      minutesOver += over.minutes;
      expect(over.kg).toBeCloseTo(
        missing.reduce((sum, spare) => sum - spare / 60, 0),
        6,
      );
      expect(over.peakOverKgPerH).toBe(Math.max(0, ...missing.map((spare) => -spare)));
      // The worst running deficit is the greatest sum of any stretch.
      let worst = 0;
      for (let from = 0; from < load.length; from++) {
        let sum = 0;
        for (let t = from; t < load.length; t++) worst = Math.max(worst, (sum += ((load[t] ?? 0) - limitKgPerH) / 60));
      }
      expect(over.worstDeficitKg).toBeCloseTo(worst, 6);
    }),
    { numRuns: 150 },
  );
  expect(minutesOver).toBeGreaterThan(50);
});

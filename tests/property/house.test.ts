/** What always holds of the boiler house, whatever is lit and drawn. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { boilerExport, type BoilerInForce } from '@/core/header/capacity';
import { withoutLargest } from '@/core/house/largestOut';
import { comingUpSpans, firesOf, readyShare, readySpans } from '@/core/house/readiness';
import { belowTurndown } from '@/core/house/turndown';
import { weekFuel } from '@/core/house/weekFuel';
import { fromMinutes, toMinutes, valueAt } from '@/core/time/stepFunction';
import { expectRelative, valueOf } from '../verification/steamSupport';

const MINUTES = 600;
const everyMinute = Array.from({ length: MINUTES }, (_, t) => t);
const times = fc.record({
  purgeMinutes: fc.integer({ min: 0, max: 15 }),
  warmReadyMinutes: fc.integer({ min: 0, max: 60 }),
  coldReadyMinutes: fc.integer({ min: 60, max: 240 }),
});
/** A share by minute that changes now and then: shut, derated, lit. */
const share = fc
  .array(fc.record({ from: fc.integer({ min: 0, max: MINUTES - 1 }), value: fc.constantFrom(0, 0, 0.5, 1) }), {
    maxLength: 8,
  })
  .map((changes) => {
    const minutes = new Float64Array(MINUTES);
    for (const { from, value } of changes.sort((a, b) => a.from - b.from)) minutes.fill(value, from);
    return fromMinutes(minutes);
  });
const rate = fc.integer({ min: 200, max: 5_000 });
const load = fc.array(fc.integer({ min: 0, max: 4_000 }), { minLength: 6, maxLength: 6 }).map((rates) => {
  return Float64Array.from({ length: MINUTES }, (_, t) => rates[Math.floor(t / 100)] ?? 0);
});

describe('readiness', () => {
  it('splits every minute in fire into coming up and ready, and lets nothing out before', () => {
    fc.assert(
      fc.property(share, times, (set, ready) => {
        const fires = firesOf(set, ready, MINUTES);
        const sent = toMinutes(readyShare(set, fires), MINUTES);
        const inSpan = (spans: readonly { from: number; to: number }[], t: number) =>
          spans.filter((span) => span.from <= t && t < span.to).length;
        const [coming, leaving] = [comingUpSpans(fires), readySpans(fires)];
        const wrong = everyMinute.filter((t) => {
          const [is, up, on] = [valueAt(set, t), inSpan(coming, t), inSpan(leaving, t)];
          return up + on !== (is > 0 ? 1 : 0) || sent[t] !== (on === 1 ? is : 0);
        });
        expect(wrong).toEqual([]);
      }),
      { numRuns: 200 },
    );
  });

  it('never makes a boiler ready sooner when it takes longer', () => {
    fc.assert(
      fc.property(share, times, fc.integer({ min: 1, max: 60 }), (set, ready, more) => {
        const slower = { ...ready, purgeMinutes: ready.purgeMinutes + more };
        const [fast, slow] = [ready, slower].map((t) => toMinutes(readyShare(set, firesOf(set, t, MINUTES)), MINUTES));
        expect(everyMinute.filter((t) => (slow?.[t] ?? 0) > (fast?.[t] ?? 0))).toEqual([]);
      }),
      { numRuns: 200 },
    );
  });
});

describe('the largest boiler out', () => {
  it('leaves the sum less the greatest, minute by minute', () => {
    const boiler = fc.record({ kgPerH: rate, set: share }).map(({ kgPerH, set }, i = 0): BoilerInForce => {
      const spans = set.map((step, k) => ({ from: step.from, to: set[k + 1]?.from ?? MINUTES, value: step.value }));
      return {
        ...{ id: `boiler ${i}`, exportKgPerH: kgPerH, greatestRisePerMin: 0.1, waterTonnes: null },
        ...{ storedKgPerBarAndTonne: null, outages: [] },
        lit: spans.filter((span) => span.value > 0),
        deratings: spans.filter((span) => span.value > 0 && span.value < 1),
      };
    });
    fc.assert(
      fc.property(fc.array(boiler, { minLength: 1, maxLength: 4 }), (boilers) => {
        const [all, left] = [boilers, withoutLargest(boilers)].map((list) =>
          list.map((one) => toMinutes(boilerExport(one), MINUTES)),
        );
        const wrong = everyMinute.filter((t) => {
          const at = (lists: readonly Float64Array[] | undefined) => (lists ?? []).map((minutes) => minutes[t] ?? 0);
          const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
          return Math.abs(sum(at(left)) - (sum(at(all)) - Math.max(...at(all)))) > 1e-6;
        });
        expect(wrong).toEqual([]);
      }),
      { numRuns: 100 },
    );
  });
});

describe('below turndown', () => {
  it('names exactly the minutes under the sum of the least exports', () => {
    fc.assert(
      fc.property(load, share, share, rate, rate, (drawn, one, two, a, b) => {
        const boilers = [
          { id: 'a', netKgPerH: a, turndown: 4, readyShare: one, minutesBack: 35 },
          { id: 'b', netKgPerH: b, turndown: 3, readyShare: two, minutesBack: 35 },
        ];
        const spans = belowTurndown(drawn, boilers, 0.1);
        const wrong = everyMinute.filter((t) => {
          const least = (valueAt(one, t) > 0 ? a / 4 : 0) + (valueAt(two, t) > 0 ? b / 3 : 0);
          const named = spans.filter((span) => span.from <= t && t < span.to).length;
          return named !== ((drawn[t] ?? 0) < least ? 1 : 0);
        });
        expect(wrong).toEqual([]);
      }),
      { numRuns: 200 },
    );
  });
});

describe('fuel of a week', () => {
  it('is that of its parts: two loads together burn what both burn alone', () => {
    fc.assert(
      fc.property(load, load, share, (first, second, set) => {
        const boilers = [true, false].map((isFirst) => ({
          ...{ id: 'b', name: 'Boiler', netKgPerH: 2_000, heatToWaterKW: 1_400, fuel: 'naturalGasUs' as const },
          efficiency: isFirst ? 0.8 : 0.9,
          readyShare: isFirst ? set : [{ from: 0, value: 1 }],
        }));
        const burnt = (minutes: Float64Array) => valueOf(weekFuel(minutes, boilers, 0.05));
        const both = burnt(first.map((kgPerH, t) => kgPerH + (second[t] ?? 0)));
        const [a, b] = [burnt(first), burnt(second)];
        for (const key of ['steamKg', 'fuelKWh', 'co2Kg', 'cost'] as const) {
          const parts = (a[key] ?? 0) + (b[key] ?? 0);
          if (parts === 0) expect(both[key]).toBe(0);
          else expectRelative(both[key] ?? 0, parts, 1e-9);
        }
      }),
      { numRuns: 200 },
    );
  });
});

import fc from 'fast-check';
import { expect, it } from 'vitest';
import { drawAt } from '@/core/demand/activityLoad';
import { headerBalances, type HeaderBalance } from '@/core/header/headerBalance';
import { boilerOutlet, headerSteam } from '@/core/header/headerSteam';
import type { HeaderJudgement } from '@/core/header/judgement';
import { loadOf } from '@/core/header/loadCurve';
import { plainNetwork } from '@/core/header/network';
import { settleFlows } from '@/core/header/settle';
import { stationBalance } from '@/core/header/station';
import { createEvaluator, evaluateWeek, withPlacements } from '@/core/pipeline';
import type { PlantModel } from '@/core/plant/plant';
import { STANDARD_ATMOSPHERE } from '@/core/quantity/pressure';
import { barAbsolute, barGauge } from '@/core/quantity/units';
import type { Week } from '@/core/schedule/week';
import { steamState } from '@/core/steam/steamState';
import { activities, placement, SHORT_WEEK_MIN } from '../support/arbitraryWeeks';
import { activity, capacity, flatMode, header, plant, unit, week } from '../support/builders';
import { expectRelative, valueOf } from '../verification/steamSupport';

const whole = (min: number, max: number) => fc.integer({ min, max });
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

const HEADER_OF: Readonly<Record<string, string>> = {
  r1: 'main',
  r2: 'low',
  r3: 'mid',
  k1: 'low',
  k2: 'low',
  low1: 'low',
};

/** Three headers below each other, flash into both lower ones, an accumulator between the first and the last. */
const plants: fc.Arbitrary<PlantModel> = fc
  .record({
    share: between(0, 1),
    waterTonnes: whole(5, 30),
    greatestChargeKgPerH: whole(0, 2000),
    greatestDischargeKgPerH: whole(0, 4000),
    shareAtWeekStart: between(0, 1),
    greatestKgPerH: whole(50, 3000),
  })
  .map(({ share, greatestKgPerH, ...store }) =>
    plant({
      units: Object.entries(HEADER_OF).map(([id, headerId]) => unit(id, { headerId })),
      headers: [
        header('main', { pressureBarG: 10, dryness: 0.99 }),
        header('mid', {
          pressureBarG: 6,
          dryness: 0.985,
          feed: { kind: 'letdown', fromHeaderId: 'main', greatestKgPerH },
          flash: { fromHeaderId: 'main', share, condensateBarG: 9 },
        }),
        header('low', {
          pressureBarG: 2,
          dryness: 0.98,
          feed: { kind: 'letdown', fromHeaderId: 'mid', greatestKgPerH, leastKgPerH: greatestKgPerH / 10 },
          flash: { fromHeaderId: 'mid', share, condensateBarG: 6 },
        }),
      ],
      accumulators: [
        {
          id: 'acc',
          name: 'Accumulator',
          chargedFromHeaderId: 'main',
          feedsHeaderId: 'low',
          highBarG: 9.5,
          lowBarG: 3,
          ...store,
        },
      ],
    }),
  );

const run = (id: string, unitId: string, start: number, minutes: number, kgPerH: number) =>
  activity(id, { modes: [flatMode(unitId, minutes, kgPerH)], placement: { unitId, start } });
/** So that there is always something to carry and something that flashes. */
const steady = [
  run('above', 'r1', 0, 600, 90),
  run('between', 'r3', 0, 600, 50),
  ...[200, 230, 700, 1100].map((start, i) => run(`vent${i}`, 'low1', start, 12, 1800)),
];

const BASE = 123.4;
const networkWeeks: fc.Arbitrary<Week> = fc
  .tuple(plants, activities, whole(150, 1000), fc.boolean())
  .map(([itsPlant, drawn, limit, knowsRise]) =>
    week({
      horizonMin: SHORT_WEEK_MIN,
      plant: itsPlant,
      capacities: [
        capacity('main', limit, {
          baseLoadKgPerH: [{ from: 0, value: BASE }],
          greatestRiseKgPerHPerMin: knowsRise ? [{ from: 0, value: limit / 10 }] : null,
        }),
        capacity('low', null, { baseLoadKgPerH: [{ from: 300, value: 10 }] }),
      ],
      activities: [...drawn, ...steady],
    }),
  );

const MINUTES = Array.from({ length: SHORT_WEEK_MIN }, (_, t) => t);
const at = (values: ArrayLike<number> | null | undefined, t: number) => values?.[t] ?? 0;
const byId = (headers: readonly HeaderJudgement[]) => {
  const of = (id: string) => headers.find(({ headerId }) => headerId === id) as HeaderJudgement;
  return { main: of('main'), mid: of('mid'), low: of('low') };
};

it('what the boilers send is what is drawn and charged, less flash and discharge, at every minute', () => {
  const seen = { charge: 0, discharge: 0, flash: 0 };
  fc.assert(
    fc.property(networkWeeks, (itsWeek) => {
      const { drawn, headers } = evaluateWeek(itsWeek);
      const { main } = byId(headers);
      let off = 0;
      for (const t of MINUTES.filter((minute) => minute % 4 === 0)) {
        const users = drawn.reduce((sum, one) => sum + drawAt(one, t), BASE + (t >= 300 ? 10 : 0));
        const charge = at(main.carried?.chargeKgPerH, t);
        const discharge = at(main.carried?.dischargeKgPerH, t);
        const flash = at(main.flashKgPerH, t);
        off = Math.max(off, Math.abs(users + charge - discharge - flash - at(main.loadKgPerH, t)));
        seen.charge += Number(charge > 0);
        seen.discharge += Number(discharge > 0);
        seen.flash += Number(flash > 0);
      }
      // Draws are added up in parts of a milligram an hour.
      expect(off).toBeLessThan(1e-4);
      for (const header of headers) {
        const off = MINUTES.map((t) => {
          const beside = at(header.flashKgPerH, t) + at(header.carried?.dischargeKgPerH, t);
          return Math.abs(
            at(header.drawnKgPerH, t) + at(header.carried?.chargeKgPerH, t) - beside - at(header.loadKgPerH, t),
          );
        });
        expect(Math.max(...off)).toBeLessThan(1e-8);
        expect(Math.min(...header.loadKgPerH)).toBeGreaterThan(-1e-8);
      }
    }),
    { numRuns: 60 },
  );
  expect(Math.min(...Object.values(seen))).toBeGreaterThan(300);
});

it('closes in mass and heat over every header, to 1e-9', () => {
  let minutes = 0;
  fc.assert(
    fc.property(networkWeeks, fc.integer({ min: 0, max: SHORT_WEEK_MIN - 1 }), (one, t) => {
      const flows = settleFlows(one.plant, one.capacities, loadOf({ ...one, activities: evaluateWeek(one).drawn }));
      const boiler = valueOf(boilerOutlet(12, STANDARD_ATMOSPHERE));
      const balances = headerBalances(one.plant, flows, t, () => boiler.h);
      expect(balances.map(({ headerId }) => headerId)).toEqual(['main', 'mid', 'low']);
      for (const { into, out, lostKW } of balances) {
        const scale = 1 + into.reduce((sum, { kgPerH }) => sum + kgPerH, 0);
        expect(Math.abs(sumOf(into, () => 1) - sumOf(out, () => 1)) / scale).toBeLessThan(1e-9);
        expect(
          Math.abs(sumOf(into, ({ h }) => h) - sumOf(out, ({ h }) => h) - 3600 * lostKW) / scale / 2700,
        ).toBeLessThan(1e-9);
      }
      expectLinked(balances);
      minutes += Number(at(flows.get('low')?.loadKgPerH, t) > 0);
    }),
    { numRuns: 120 },
  );
  expect(minutes).toBeGreaterThan(30);
});

const sumOf = (streams: HeaderBalance['into'], of: (stream: HeaderBalance['into'][number]) => number) =>
  streams.reduce((sum, stream) => sum + stream.kgPerH * of(stream), 0);

/** What a header sends down is what the lower one is fed with: same kg/h, same enthalpy. */
function expectLinked(balances: readonly HeaderBalance[]): void {
  for (const { headerId, out } of balances)
    for (const sent of out.filter(({ kind }) => kind === 'lower')) {
      const below = balances.find((one) => one.headerId === sent.headerId);
      expect(below?.into.find(({ kind }) => kind === 'feed')).toEqual({ ...sent, kind: 'feed', headerId });
    }
}

it('an accumulator holds what it was given, never below nothing nor above full, and never both at once', () => {
  let carrying = 0;
  fc.assert(
    fc.property(networkWeeks, (one) => {
      const { main, low } = byId(evaluateWeek(one).headers);
      const plain = byId(evaluateWeek({ ...one, plant: plainNetwork(one.plant) }).headers);
      const { carried, limitKgPerH: limit } = main;
      if (!carried) throw new Error('the accumulator does not work on its header');
      const { chargeKgPerH, dischargeKgPerH, storeKg, capacityKg } = carried;
      expect(low.carried?.capacityKg).toBe(capacityKg);
      expect(Math.min(...storeKg)).toBeGreaterThanOrEqual(0);
      expect(Math.max(...storeKg)).toBeLessThanOrEqual(capacityKg);
      const most = (of: (t: number) => number) => Math.max(...MINUTES.map(of));
      expect(most((t) => at(chargeKgPerH, t) * at(dischargeKgPerH, t))).toBe(0);
      // Nothing is over that is not over without it.
      const boundAt = (t: number) => Math.max(at(limit, t), at(plain.main.loadKgPerH, t));
      expect(most((t) => at(main.loadKgPerH, t) - boundAt(t))).toBeLessThan(1e-8);
      expect(most((t) => (at(chargeKgPerH, t) > 0 ? at(main.loadKgPerH, t) - at(limit, t) : 0))).toBeLessThan(1e-8);
      carrying += MINUTES.filter((t) => at(dischargeKgPerH, t) > 0).length;
      const given = MINUTES.slice(1).map((t) => at(storeKg, t) - at(storeKg, t - 1) + at(dischargeKgPerH, t - 1) / 60);
      const perKg = MINUTES.slice(1).flatMap((t, i) =>
        at(chargeKgPerH, t - 1) > 1 ? [(60 * (given[i] ?? 0)) / at(chargeKgPerH, t - 1)] : [],
      );
      if (perKg.length > 0) expect(Math.max(...perKg) - Math.min(...perKg)).toBeLessThan(1e-6);
    }),
    { numRuns: 60 },
  );
  expect(carrying).toBeGreaterThan(300);
});

it('trying placements out settles as settling the changed week, to the bit', () => {
  let changed = 0;
  const tried = fc.array(fc.tuple(fc.nat(), fc.option(placement)), { minLength: 1, maxLength: 3 });
  fc.assert(
    fc.property(networkWeeks, tried, (one, picks) => {
      const changes =
        one.activities.length === 0
          ? []
          : picks.map(([pick, to]) => ({
              activityId: one.activities[pick % one.activities.length]?.id ?? '',
              placement: to,
            }));
      changed += changes.length;
      const preview = createEvaluator(one).preview(changes).evaluation;
      const scratch = evaluateWeek(withPlacements(one, changes));
      preview.headers.forEach((header, i) => {
        const other = scratch.headers[i];
        expect([...header.loadKgPerH]).toEqual([...(other?.loadKgPerH ?? [])]);
        expect([...(header.carried?.storeKg ?? [])]).toEqual([...(other?.carried?.storeKg ?? [])]);
      });
      expect(preview.over).toEqual(scratch.over);
    }),
    { numRuns: 40 },
  );
  expect(changed).toBeGreaterThan(40);
});

it('a station closes in heat both ways for any steam, at any ambient pressure', () => {
  let wetter = 0;
  const quality = fc.oneof(
    between(0.6, 1).map((dryness) => ({ kind: 'wet', dryness }) as const),
    between(0.1, 80).map((superheatK) => ({ kind: 'superheated', superheatK }) as const),
  );
  fc.assert(
    fc.property(
      between(0.2, 30),
      between(0, 1),
      quality,
      quality,
      between(0.7, 1.05),
      between(1, 50_000),
      (high, part, up, down, bar, kgPerH) => {
        const ambient = barAbsolute(bar);
        const upstream = valueOf(steamState({ pressure: barGauge(high), quality: up, ambient }));
        const stated = valueOf(steamState({ pressure: barGauge(high * part), quality: down, ambient }));
        const found = stationBalance({ upstreamName: 'above', upstream, headerName: 'below', stated, kgPerH, ambient });
        if (!found.ok) {
          expect(found.error.code).toBe('STATION-HOTTER');
          expect(stated.h).toBeGreaterThan(upstream.h);
          return;
        }
        wetter += 1;
        const { afterValve, lostKW, upstreamNeeded, carriedOverKgPerH, condensedFraction } = found.value;
        expectRelative(afterValve.h, upstream.h, 1e-9);
        expectRelative(kgPerH * stated.h + 3600 * lostKW, kgPerH * upstream.h, 1e-9);
        expectRelative(upstreamNeeded.h, stated.h, 1e-9);
        const water = upstreamNeeded.kind === 'wet' ? 1 - upstreamNeeded.dryness : 0;
        expect(Math.abs(carriedOverKgPerH - water * kgPerH) / kgPerH).toBeLessThan(1e-9);
        expect(condensedFraction).toBeLessThanOrEqual(1);
      },
    ),
    { numRuns: 400 },
  );
  expect(wetter).toBeGreaterThan(100);
});

it('a header that is fed by its own state arrives in it', () => {
  fc.assert(
    fc.property(between(0, 15), between(0.5, 1), (pressureBarG, dryness) => {
      const own = valueOf(headerSteam({ pressureBarG, dryness, superheatK: null }, 1.01325));
      const found = valueOf(
        stationBalance({
          upstreamName: 'a',
          upstream: own,
          headerName: 'b',
          stated: own,
          kgPerH: 1,
          ambient: STANDARD_ATMOSPHERE,
        }),
      );
      expect(Math.abs(found.lostKJPerKg)).toBeLessThan(1e-9);
      expect(found.says).toHaveLength(2);
    }),
    { numRuns: 100 },
  );
});

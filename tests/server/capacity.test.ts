import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { CapacityDto } from '@/contracts/capacity';
import { valueAt } from '@/core/time/stepFunction';
import { db } from '@/db/client';
import { boilerFirings, plants, record, steamLimits } from '@/db/schema/index';
import { GET } from '@/pages/api/weeks/[week]/capacity';
import { POST as FIRE } from '@/pages/api/weeks/[week]/firings';
import { POST as LIMIT } from '@/pages/api/weeks/[week]/limits';
import { instantOf, weekTimeOf } from '@/server/weeks/weekTime';
import { callApi, outcome } from '../support/api';
import { nameOf, openWorld, sessionOf, WEEK } from '../support/world';

let lead: string;
beforeAll(openWorld);
beforeAll(async () => {
  lead = await sessionOf('north-utilitiesLead');
});
beforeEach(async () => {
  await db.delete(boilerFirings);
  await db.delete(steamLimits);
  await db.delete(record);
});

const week = { week: WEEK };
const NOVEMBER = weekTimeOf(WEEK, 'Europe/London');
const firing = { boilerId: 'north-boiler-1', share: 1, fromMin: 240, toMin: 8_000, reason: 'week in fire' };
const limit = {
  headerId: 'north-main',
  limitKgPerH: 3_000,
  fromMin: 600,
  toMin: 900,
  reason: 'tests of the safety valve',
};

async function read(session = lead): Promise<CapacityDto> {
  return (await (await callApi(GET, { session, params: week })).json()) as CapacityDto;
}
async function set(route: typeof FIRE, body: unknown): Promise<CapacityDto> {
  const response = await callApi(route, { session: lead, params: week, body });
  expect(response.status).toBe(200);
  return (await response.json()) as CapacityDto;
}
const main = (dto: CapacityDto) => dto.capacities.find((capacity) => capacity.headerId === 'north-main');
const limitAt = (dto: CapacityDto, minute: number) => valueAt(main(dto)?.limitKgPerH ?? [], minute);

describe('the boiler house over a week', () => {
  it('is not judged while nothing was said of its boilers', async () => {
    const dto = await read();
    expect(dto).toMatchObject({ weekStart: WEEK, horizonMin: 10_080, firstInstant: '2026-11-30T00:00:00.000Z' });
    expect(main(dto)).toMatchObject({ limitKgPerH: null, exportKgPerH: null });
    expect(dto.boilers.map((boiler) => boiler.share)).toEqual([[{ from: 0, value: 0 }], [{ from: 0, value: 0 }]]);
  });

  it('sends the net export of the lit boilers less the reserve', async () => {
    const dto = await set(FIRE, firing);
    // Worked boiler (invented plant), computed with an independent IAPWS-IF97 implementation: 3546.94 kg/h.
    expect(dto.boilers[0]?.netKgPerH).toBeCloseTo(3_546.94, 2);
    // Lit at 240, cold: 5 min purge and 120 min to pressure.
    expect([364, 365, 7_999, 8_000].map((minute) => limitAt(dto, minute) / 3_546.94)).toEqual([
      0,
      expect.closeTo(0.9, 5),
      expect.closeTo(0.9, 5),
      0,
    ]);
    expect(valueAt(main(dto)?.greatestRiseKgPerHPerMin ?? [], 365)).toBeCloseTo(354.694, 3);
    // 8 t of water at 10 bar g, 8.876 kg per bar and tonne, computed with an independent IAPWS-IF97 implementation.
    expect(valueAt(main(dto)?.storedKgPerBar ?? [], 365)).toBeCloseTo(8 * 8.876, 1);
    expect(valueAt(main(dto)?.baseLoadKgPerH ?? [], 4 * 60)).toBe(240);
  });

  it('leaves a header that no boiler feeds and nobody has limited unjudged', async () => {
    const dto = await set(FIRE, firing);
    expect(dto.capacities.find((one) => one.headerId === 'north-low')).toMatchObject({
      exportKgPerH: null,
      limitKgPerH: null,
    });
  });

  it('lets what is said later overrule what was said before, in part', async () => {
    await set(FIRE, firing);
    await set(FIRE, { ...firing, share: 0.5, fromMin: 1_000, toMin: 1_100, reason: 'burner on low fire' });
    const dto = await set(FIRE, { ...firing, share: 0, fromMin: 1_050, toMin: 1_200, reason: 'tube leak' });
    expect(dto.boilers[0]?.share).toEqual([
      { from: 0, value: 0 },
      { from: 240, value: 1 },
      { from: 1_000, value: 0.5 },
      { from: 1_050, value: 0 },
      { from: 1_200, value: 1 },
      { from: 8_000, value: 0 },
    ]);
    expect(limitAt(dto, 1_000)).toBeCloseTo(0.45 * 3_546.94, 1);
    // Relit at 1 200 after two hours and a half: warm, 5 min purge and 30 min to pressure.
    expect([1_049, 1_050, 1_234, 1_235].map((minute) => limitAt(dto, minute) > 0)).toEqual([true, false, false, true]);
    expect(dto.boilers[0]?.fires.map(({ litMin, readyMin, start }) => [litMin, readyMin, start])).toEqual([
      [240, 365, 'cold'],
      [1_200, 1_235, 'warm'],
    ]);
  });

  it('knows from the week before how warm a boiler is, without listing that week', async () => {
    const before = { fromAt: instantOf(NOVEMBER, -6_000), toAt: instantOf(NOVEMBER, -300) };
    const row = { plantId: 'north', boilerId: 'north-boiler-1', share: 1, reason: 'last week', authorId: 'x' };
    await db.insert(boilerFirings).values({ ...row, id: 'last-week', ...before });
    expect(main(await read())).toMatchObject({ exportKgPerH: null });
    const dto = await set(FIRE, firing);
    // Out at -300, lit at 240: warm, 35 min.
    expect(dto.boilers[0]?.fires.at(-1)).toMatchObject({ litMin: 240, readyMin: 275, start: 'warm' });
    expect(dto.entries.map(({ reason }) => reason)).toEqual([firing.reason]);
  });

  it('is judged with the largest boiler out as well', async () => {
    const out = (dto: CapacityDto) => valueAt(dto.largestOut[0]?.limitKgPerH ?? [], 1_000) / 3_546.94;
    expect(out(await set(FIRE, firing))).toBe(0);
    expect(out(await set(FIRE, { ...firing, boilerId: 'north-boiler-2', share: 0.5 }))).toBeCloseTo(0.45, 5);
    expect(limitAt(await read(), 1_000)).toBeCloseTo(1.35 * 3_546.94, 1);
  });

  it('says what fuel costs, or that no price is set, and what product is placed', async () => {
    expect(await read()).toMatchObject({ fuelPricePerKWh: null, placedKg: 0 });
    await db.update(plants).set({ fuelPricePerKWh: 0.05 }).where(eq(plants.id, 'north'));
    expect(await read()).toMatchObject({ fuelPricePerKWh: 0.05, currency: 'EUR' });
    expect((await read()).baseLoads).toMatchObject([{ headerId: 'north-main', kgPerH: 240 }]);
  });

  it('holds a set limit where it is lower, until it is taken back', async () => {
    await set(FIRE, firing);
    const limited = await set(LIMIT, limit);
    expect(limitAt(limited, 600)).toBe(3_000);
    const [free] = [limitAt(limited, 599)];
    expect(free).toBeCloseTo(0.9 * 3_546.94, 1);
    const back = await set(LIMIT, { ...limit, limitKgPerH: null, fromMin: 700, reason: 'tests are over' });
    expect([limitAt(back, 699), limitAt(back, 700)]).toEqual([3_000, free]);
    const high = await set(LIMIT, { ...limit, limitKgPerH: 9_000, reason: 'wishful' });
    expect(limitAt(high, 650)).toBe(free);
  });

  it('limits a header behind a letdown where a limit is set', async () => {
    const dto = await set(LIMIT, { ...limit, headerId: 'north-low', limitKgPerH: 1_200 });
    const low = dto.capacities.find((one) => one.headerId === 'north-low');
    expect(valueAt(low?.limitKgPerH ?? [], 700)).toBe(1_200);
  });

  it('keeps every word with its author and reason, newest first, and in the record', async () => {
    await set(FIRE, firing);
    const dto = await set(LIMIT, limit);
    expect(dto.entries).toMatchObject([
      { kind: 'limit', subject: 'Main header', value: 3_000, fromMin: 600, toMin: 900, reason: limit.reason },
      { kind: 'firing', subject: 'Boiler 1', value: 1, by: nameOf('north-utilitiesLead') },
    ]);
    const kept = await db.select({ action: record.action, by: record.authorId }).from(record);
    expect(kept).toEqual([
      { action: 'capacity.firing', by: 'north-utilitiesLead' },
      { action: 'capacity.limit', by: 'north-utilitiesLead' },
    ]);
  });

  it('runs by the plant’s clock in a week with a clock change', async () => {
    const autumn = { week: '2026-10-19' };
    const response = await callApi(FIRE, { session: lead, params: autumn, body: { ...firing, toMin: 10_140 } });
    const dto = (await response.json()) as CapacityDto;
    expect(dto).toMatchObject({ horizonMin: 10_140, firstInstant: '2026-10-18T23:00:00.000Z' });
    expect(valueAt(dto.boilers[0]?.share ?? [], 10_139)).toBe(1);
    const spring = { session: lead, params: { week: '2026-03-23' }, body: { ...firing, toMin: 10_030 } };
    expect(await outcome(await callApi(FIRE, spring))).toEqual({ status: 400, code: 'CAPACITY-SPAN' });
  });

  it('shows one plant nothing of another', async () => {
    await set(FIRE, firing);
    const dto = await read(await sessionOf('south-utilitiesLead'));
    expect(dto.entries).toEqual([]);
    expect(dto.boilers.map((boiler) => boiler.id)).toEqual(['south-boiler-1', 'south-boiler-2']);
  });
});

describe('refused, and nothing changed:', () => {
  const bad: [string, typeof FIRE, unknown, string, number][] = [
    ['an empty firing', FIRE, {}, WEEK, 400],
    ['a share above 1', FIRE, { ...firing, share: 1.1 }, WEEK, 400],
    ['a share below 0', FIRE, { ...firing, share: -0.1 }, WEEK, 400],
    ['a mistyped share', FIRE, { ...firing, share: '1' }, WEEK, 400],
    ['a share that is no number', FIRE, { ...firing, share: Number.NaN }, WEEK, 400],
    ['a span that ends before it begins', FIRE, { ...firing, toMin: 200 }, WEEK, 400],
    ['a span of nothing', FIRE, { ...firing, toMin: 240 }, WEEK, 400],
    ['half minutes', FIRE, { ...firing, fromMin: 240.5 }, WEEK, 400],
    ['a span before the week', FIRE, { ...firing, fromMin: -1 }, WEEK, 400],
    ['a span past the week', FIRE, { ...firing, toMin: 10_081 }, WEEK, 400],
    ['no reason', FIRE, { ...firing, reason: '  ' }, WEEK, 400],
    ['a reason too long', FIRE, { ...firing, reason: 'x'.repeat(501) }, WEEK, 400],
    ['an unknown boiler', FIRE, { ...firing, boilerId: 'boiler-9' }, WEEK, 404],
    ['another plant’s boiler', FIRE, { ...firing, boilerId: 'south-boiler-1' }, WEEK, 404],
    ['a day that no week begins on', FIRE, firing, '2026-12-01', 404],
    ['a day that does not exist', FIRE, firing, '2026-02-30', 404],
    ['a week that is no day', FIRE, firing, 'next-week', 404],
    ['an empty limit', LIMIT, {}, WEEK, 400],
    ['a limit left out', LIMIT, { ...limit, limitKgPerH: undefined }, WEEK, 400],
    ['a limit below 0', LIMIT, { ...limit, limitKgPerH: -1 }, WEEK, 400],
    ['a limit beyond reason', LIMIT, { ...limit, limitKgPerH: 1e7 }, WEEK, 400],
    ['a mistyped limit', LIMIT, { ...limit, limitKgPerH: '3000' }, WEEK, 400],
    ['a limit past the week', LIMIT, { ...limit, toMin: 10_100 }, WEEK, 400],
    ['an unknown header', LIMIT, { ...limit, headerId: 'main' }, WEEK, 404],
    ['another plant’s header', LIMIT, { ...limit, headerId: 'south-main' }, WEEK, 404],
    ['a boiler for a header', LIMIT, { ...limit, headerId: 'north-boiler-1' }, WEEK, 404],
  ];

  it.each(bad)('%s', async (_, route, body, weekStart, status) => {
    const response = await callApi(route, { session: lead, params: { week: weekStart }, body });
    expect(response.status).toBe(status);
    expect(await response.json()).toMatchObject({ code: expect.any(String), message: expect.stringMatching(/\w+/) });
    expect([await db.$count(boilerFirings), await db.$count(steamLimits), await db.$count(record)]).toEqual([0, 0, 0]);
  });

  it('names the field', async () => {
    const response = await callApi(FIRE, { session: lead, params: week, body: { ...firing, share: 2 } });
    expect(await response.json()).toMatchObject({ fields: [{ path: 'share' }] });
  });

  it.each([FIRE, LIMIT])('a planner’s word', async (route) => {
    const session = await sessionOf('north-planner');
    const response = await callApi(route, { session, params: week, body: route === FIRE ? firing : limit });
    expect(response.status).toBe(403);
    expect(await response.json()).toMatchObject({ code: 'ROLE', message: expect.stringContaining('utilities lead') });
    expect([await db.$count(boilerFirings), await db.$count(steamLimits)]).toEqual([0, 0]);
  });

  it('reading a week that is none of the plant’s', async () => {
    const response = await callApi(GET, { session: lead, params: { week: '2026-12-02' } });
    expect(await outcome(response)).toEqual({ status: 404, code: 'NOT-FOUND' });
  });
});

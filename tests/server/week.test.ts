import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { WeekDto } from '@/contracts/week';
import { evaluateWeek } from '@/core/pipeline';
import { valueAt } from '@/core/time/stepFunction';
import { db } from '@/db/client';
import { calendarExceptions, plans } from '@/db/schema/index';
import { GET } from '@/pages/api/weeks/[week]/index';
import { callApi, outcome } from '../support/api';
import { activityIn, everySession, openPlant, resetPlan, setClock, WEEK, type Person } from '../support/fixturePlant';

let close: () => Promise<void>;
let sessions: Readonly<Record<Person, string>>;
beforeAll(async () => {
  close = await openPlant();
  sessions = await everySession();
});
afterAll(() => close());
beforeEach(async () => {
  setClock(360);
  await resetPlan();
});

const call = (week: string, person: Person = 'kim') =>
  callApi(GET, { session: sessions[person], params: { week }, path: `/api/weeks/${week}` });
async function load(week = WEEK, person: Person = 'kim'): Promise<WeekDto> {
  const response = await call(week, person);
  expect(response.status).toBe(200);
  return (await response.json()) as WeekDto;
}

describe('a week as the board reads it', () => {
  it('brings plant, calendars, capacity, activities and links on minutes', async () => {
    const dto = await load();
    expect(dto).toMatchObject({
      planId: 'quay-plan',
      weekStart: WEEK,
      planRevision: 0,
      timeZone: 'Europe/Berlin',
      firstInstant: '2026-11-29T23:00:00.000Z',
      issue: null,
      agreement: null,
      levelling: null,
      families: [{ id: 'soups', name: 'Soups' }],
    });
    expect(dto.now.slice(0, 16)).toBe('2026-11-30T05:00');
    expect(dto.week.horizonMin).toBe(10_080);
    expect(dto.week.plant.units.map(({ name }) => name)).toEqual(['R1', 'R2', 'K1', 'K2']);
    expect(dto.week.calendars).toHaveLength(4);
    expect(dto.week.calendars[0]?.open).toEqual([{ from: 0, to: 10_080 }]);
    expect(valueAt(dto.week.capacities[0]?.limitKgPerH ?? [], 10_079)).toBe(3_000);
    expect(activityIn(dto, 'A107')).toMatchObject({
      placement: { unitId: 'R1', start: 600 },
      fixing: 'free',
      due: 1_000,
      revision: 0,
      processData: { id: 'released', document: 'SP-12', issue: '3', released: true },
    });
    expect(activityIn(dto, 'A110').placement).toBeNull();
    expect(dto.week.links).toEqual([
      expect.objectContaining({ id: 'k7-a107', leastMin: 0, greatestMin: 240, greatestBreach: 'process' }),
    ]);
  });

  it('can be judged as it comes', async () => {
    const evaluation = evaluateWeek((await load()).week);
    expect(evaluation.breaches).toEqual([]);
    expect(Math.max(...(evaluation.headers[0]?.loadKgPerH ?? []))).toBeGreaterThanOrEqual(2_000);
  });

  it('is not the other plant’s: the same day is another week there, without any of this plant’s rows', async () => {
    const dto = await load(WEEK, 'hal');
    expect(dto.week.plant.id).toBe('hill');
    expect(dto.week.activities).toEqual([]);
    expect(dto.week.plant.units.map(({ id }) => id)).toEqual(['hill-R1', 'hill-R2', 'hill-K1', 'hill-K2']);
    expect(JSON.stringify(dto)).not.toContain('quay');
  });

  it('makes one plan for a week without one, however many ask at once', async () => {
    const loaded = await Promise.all(Array.from({ length: 6 }, () => load('2026-12-07')));
    expect(new Set(loaded.map(({ planId }) => planId)).size).toBe(1);
    expect(loaded[0]).toMatchObject({ planRevision: 0, week: { activities: [], links: [] }, floorEvents: [] });
    expect(await db.select().from(plans)).toHaveLength(2);
  });

  it.each([
    ['2026-03-23', 10_020, 420],
    ['2026-10-19', 10_140, 540],
  ])('the week of a clock change, %s, has %i minutes', async (week, minutes, lastNight) => {
    const dto = await load(week);
    expect(dto.week.horizonMin).toBe(minutes);
    const night = dto.shifts.filter(({ name }) => name === 'night').find(({ date }) => date > week && isSaturday(date));
    expect((night?.to ?? 0) - (night?.from ?? 0)).toBe(lastNight);
    expect(dto.week.calendars[0]?.open).toEqual([{ from: 0, to: minutes }]);
  });

  it('closes units for a calendar exception', async () => {
    const holiday = { fromAt: new Date('2026-12-01T23:00:00Z'), toAt: new Date('2026-12-02T23:00:00Z') };
    const row = { id: 'x', plantId: 'quay', open: false, reason: 'holiday', ...holiday };
    await db.insert(calendarExceptions).values(row);
    const dto = await load();
    await db.delete(calendarExceptions);
    expect(dto.week.calendars[2]?.open).toEqual([
      { from: 0, to: 2_880 },
      { from: 4_320, to: 10_080 },
    ]);
  });

  it('reads one moment: the clock of the plant, not of the machine', async () => {
    setClock('2026-12-06T22:59:30Z');
    expect((await load()).now.slice(0, 16)).toBe('2026-12-06T22:59');
  });

  it.each([
    ['2026-12-01', 404, 'NOT-FOUND'],
    ['2026-02-30', 400, 'INPUT-WEEK'],
    ['next', 400, 'INPUT-WEEK'],
    ['', 400, 'INPUT-WEEK'],
    ['2046-11-26', 404, 'NOT-FOUND'],
  ])('refuses %j', async (week, status, code) => {
    expect(await outcome(await call(week))).toEqual({ status, code });
    expect(await db.select().from(plans)).toHaveLength(1);
  });

  it('asks people to sign in', async () => {
    const response = await callApi(GET, { params: { week: WEEK } });
    expect(response.status).toBe(401);
  });
});

const isSaturday = (date: string): boolean => new Date(`${date}T00:00:00Z`).getUTCDay() === 6;

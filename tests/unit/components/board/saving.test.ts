import { describe, expect, it } from 'vitest';
import { requestOf, staleOf, withEdits, withStates } from '@/components/board/saving';
import { ApiProblem } from '@/components/query/api';
import type { ActivityState, WeekDto } from '@/contracts/week';
import { changeOf, editOf } from '@/core/schedule/edits';
import { activity, PLANT } from './fixture';

const a = activity('a', { placement: { unitId: 'r1', start: 100 }, revision: 3 });
const b = activity('b', { placement: { unitId: 'r2', start: 200 }, revision: 7 });
const dto: WeekDto = {
  planId: 'plan',
  weekStart: '2026-11-30',
  planRevision: 10,
  timeZone: 'Europe/Berlin',
  firstInstant: '2026-11-29T23:00:00Z',
  now: '2026-12-01T08:00:00Z',
  week: { horizonMin: 10_080, plant: PLANT, calendars: [], capacities: [], activities: [a, b], links: [] },
  shifts: [],
  moved: {},
  floorEvents: [],
  issue: null,
  agreement: { revision: 10, at: '2026-12-01T07:00:00Z', by: 'U', comment: 'c' },
  levelling: null,
  families: [],
  startSpreads: {},
};
const move = editOf('move', [changeOf(a, { placement: { unitId: 'r2', start: 150 } })]);
const state = (over: Partial<ActivityState>): ActivityState => ({
  id: 'a',
  placement: { unitId: 'r1', start: 175 },
  fixing: 'free',
  revision: 4,
  movedBy: 'Piotr Lis',
  movedAt: '2026-12-01T07:59:00Z',
  ...over,
});
const placeOf = (week: WeekDto, id: string) => week.week.activities.find((one) => one.id === id)?.placement;

describe('withEdits', () => {
  it('should show edits on their way over what the server holds, in order', () => {
    const once = withEdits(dto, [move]);
    expect(placeOf(once, 'a')).toEqual({ unitId: 'r2', start: 150 });
    const again = editOf('move', [
      changeOf(once.week.activities[0] as typeof a, { placement: { unitId: 'r2', start: 160 } }),
    ]);
    expect(placeOf(withEdits(dto, [move, again]), 'a')).toEqual({ unitId: 'r2', start: 160 });
    expect(placeOf(dto, 'a')).toEqual({ unitId: 'r1', start: 100 });
  });
  it('should not put an edit over what another has changed since it was read', () => {
    const newer = withStates(dto, 11, [state({})]);
    expect(placeOf(withEdits(newer, [move]), 'a')).toEqual({ unitId: 'r1', start: 175 });
  });
});

describe('withStates', () => {
  it('should take over values, revision and who made them', () => {
    const taken = withStates(dto, 11, [state({})]);
    expect(taken.planRevision).toBe(11);
    expect(taken.week.activities[0]).toMatchObject({ placement: { unitId: 'r1', start: 175 }, revision: 4 });
    expect(taken.moved.a).toEqual({ by: 'Piotr Lis', at: '2026-12-01T07:59:00Z' });
    expect(taken.week.activities[1]).toBe(b);
  });
  it('should leave newer values than the answer has', () => {
    const taken = withStates(dto, 9, [state({ revision: 2 })]);
    expect(taken.week.activities[0]).toBe(a);
    expect(taken.planRevision).toBe(10);
  });
  it('should drop an agreement to an earlier revision', () => {
    expect(withStates(dto, 11, []).agreement).toBeNull();
    expect(withStates(dto, 10, []).agreement).not.toBeNull();
  });
});

describe('requestOf', () => {
  it('should name the revision that was read, and the fixing only where it changes', () => {
    expect(requestOf(move)).toEqual({
      kind: 'move',
      changes: [{ activityId: 'a', revision: 3, placement: { unitId: 'r2', start: 150 } }],
    });
    const fixed = editOf('fix', [changeOf(a, { fixing: 'fixed' })]);
    expect(requestOf(fixed).changes[0]).toMatchObject({ fixing: 'fixed', placement: a.placement });
  });
});

describe('staleOf', () => {
  const body = { code: 'PLAN-STALE', message: 'm', planRevision: 11, stale: [state({})] };
  it('should tell a plan that has moved on from any other refusal', () => {
    expect(staleOf(new ApiProblem(409, body, body))).toEqual(body);
    expect(staleOf(new ApiProblem(409, { code: 'NEEDS-AGREEMENT', message: 'm' }))).toBeNull();
    expect(staleOf(new ApiProblem(403, body, body))).toBeNull();
    expect(staleOf(new Error('x'))).toBeNull();
  });
});

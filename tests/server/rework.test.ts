import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { OutOfDateDto, ReworkedDto } from '@/contracts/rework';
import type { Mode } from '@/core/plant/activity';
import { db } from '@/db/client';
import { activities, duties, edits, plans, record, routeModes } from '@/db/schema/index';
import { GET, POST } from '@/pages/api/weeks/[week]/rework';
import { callApi } from '../support/api';
import { insertUnits } from '../support/library';
import { openWorld, sessionOf, WEEK } from '../support/world';
import { kettleB } from '../verification/dutyWorkedBatches';

beforeAll(async () => {
  const close = await openWorld();
  await insertUnits('north');
  return close;
});

const own = { plantId: 'north' };
const stale: Mode = { unitId: 'north-kettle-1', minutes: 40, phases: [], uses: [], dutyId: 'cook' };
const planned = (id: string, changes: Partial<typeof activities.$inferInsert> = {}) => {
  const run = { kind: 'stage' as const, stage: 'cook' as const, productId: 'north-soup', code: id.toUpperCase() };
  return {
    ...own,
    id,
    planId: 'plan',
    ...run,
    title: 'Leek soup',
    modes: [stale],
    earliestAt: new Date(0),
    ...changes,
  };
};
beforeEach(async () => {
  for (const table of [edits, activities, plans, routeModes, duties, record]) await db.delete(table);
  await db.insert(duties).values({ ...own, id: 'cook', name: 'Cook', model: 'jacketedKettle', inputs: { ...kettleB } });
  const row = { ...own, id: 'route', productId: 'north-soup', position: 0, stage: 'cook' as const, dutyId: 'cook' };
  await db.insert(routeModes).values({ ...row, unitId: 'north-kettle-1', minutes: 0, leadMin: 10, uses: [] });
  await db.insert(plans).values({ ...own, id: 'plan', weekStart: WEEK });
  await db.insert(activities).values([planned('a1'), planned('a2', { fixing: 'started' })]);
});

const list = async (person = 'north-planner') =>
  (await (await callApi(GET, { session: await sessionOf(person), params: { week: WEEK } })).json()) as OutOfDateDto;
const rework = async (activityIds: unknown, person = 'north-planner') =>
  callApi(POST, { session: await sessionOf(person), params: { week: WEEK }, body: { activityIds } });
const modesOf = async (id: string) => (await db.select().from(activities).where(eq(activities.id, id)))[0]?.modes;

describe('runs planned with other duties', () => {
  it('are listed with what would change, without what has started', async () => {
    const dto = await list('north-lineSupervisor');
    expect(dto.activities.map(({ code }) => code)).toEqual(['A1']);
    expect(dto.activities[0]?.change).toMatch(/^40 to \d+ min, 0 to \d+ kg\/h at most, 0 to 20[56] kg$/);
    expect(dto.faults).toEqual([]);
  });

  it('are worked out anew as an edit that keeps the modes before and after; a second time changes nothing', async () => {
    const response = (await (await rework('all')).json()) as ReworkedDto;
    expect(response).toEqual({ planRevision: 1, reworked: 1 });
    const [mode] = (await modesOf('a1')) ?? [];
    expect(mode?.phases[0]).toMatchObject({ kind: 'heatUp', offsetMin: 10 });
    expect(await modesOf('a2')).toEqual([stale]);
    const [edit] = await db.select().from(edits);
    expect(edit).toMatchObject({ kind: 'rework', revision: 1 });
    expect(edit?.changes).toMatchObject([{ activityId: 'a1', revision: 0, modes: { before: [stale], after: [mode] } }]);
    expect(await list()).toMatchObject({ planRevision: 1, activities: [] });
    expect(await (await rework('all')).json()).toEqual({ planRevision: 1, reworked: 0 });
    expect(await db.select().from(record)).toMatchObject([{ action: 'plan.rework' }]);
  });

  it('follow a change of the duty', async () => {
    await rework('all');
    await db.update(duties).set({ inputs: { ...kettleB, holdMin: 50 } });
    expect((await list()).activities[0]?.change).toContain('min');
    expect(await (await rework(['a1'])).json()).toEqual({ planRevision: 2, reworked: 1 });
  });

  it('keep what they have, and say so, where the duty can’t be worked out', async () => {
    await db.update(duties).set({ inputs: { ...kettleB, jacketPressureBarG: 9 } });
    const { activities: none, faults } = await list();
    expect(none).toEqual([]);
    expect(faults).toEqual([expect.stringContaining('Leek soup: A valve cannot take steam')]);
    expect(await (await rework('all')).json()).toEqual({ planRevision: 0, reworked: 0 });
  });

  it.each([
    ['by a role that may not', ['a1'], 'north-utilitiesLead', 403],
    ['of another plan', ['none'], 'north-planner', 404],
    ['of no activity at all', [], 'north-planner', 400],
  ])('are not worked out anew %s', async (_, ids, person, status) => {
    expect((await rework(ids, person)).status).toBe(status);
    expect(await modesOf('a1')).toEqual([stale]);
  });
});

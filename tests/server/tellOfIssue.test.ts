import { and, eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Role } from '@/contracts/account';
import { db } from '@/db/client';
import { mails, memberships, people } from '@/db/schema/index';
import { POST as NOTICES } from '@/pages/api/session/notices';
import { POST as THEME } from '@/pages/api/settings/own';
import { tellOfIssue } from '@/server/people/tellOfIssue';
import { callApi } from '../support/api';
import { activity, flatMode, placedAt, plant, unit, week } from '../support/builders';
import { emailOf, openWorld, sessionOf } from '../support/world';

const SAM = 'north-lineSupervisor';
const PLANNER = {
  personId: 'north-planner',
  name: 'Petra',
  plantId: 'north',
  plantName: 'Plant north',
  isDemo: false,
  roles: ['planner'] as readonly Role[],
};

/** One run on line 1; on line 2 stands a unit, and a batch waits that is not yet placed. */
const WEEK = week({
  plant: plant({ units: [unit('r1', { lineId: 'line-1' }), unit('r2', { lineId: 'line-2' })] }),
  activities: [
    placedAt(activity('a', { modes: [flatMode('r1', 60, 500)] }), 0),
    activity('b', { modes: [flatMode('r2', 60, 500)], placement: null }),
  ],
});

beforeAll(openWorld);
beforeEach(async () => {
  await db.delete(mails);
  await set({ lineIds: null, inactiveAt: null });
});

const set = (values: Partial<typeof memberships.$inferInsert>) =>
  db
    .update(memberships)
    .set(values)
    .where(and(eq(memberships.personId, SAM), eq(memberships.plantId, 'north')));

async function told(actor = PLANNER): Promise<string[]> {
  const issued = { number: 7, weekStart: '2026-11-30', comment: 'Kettle 2 is back.', week: WEEK };
  await db.transaction((tx) => tellOfIssue(tx, actor, issued));
  return (await db.select({ to: mails.to }).from(mails)).map(({ to }) => to);
}

describe('an issue on the floor', () => {
  it('is told to the supervisors of the plant, with who, what and where', async () => {
    expect(await told()).toEqual([emailOf(SAM)]);
    const [mail] = await db.select().from(mails);
    expect(mail?.subject).toBe('Issue 7 of the week of 2026-11-30 is on the floor');
    expect(mail?.text).toContain('Petra put issue 7');
    expect(mail?.text).toContain('Kettle 2 is back.');
    expect(mail?.text).toMatch(/\/shift\/2026-11-30$/m);
  });

  it('is told to those whose lines run in it, and to no others', async () => {
    await set({ lineIds: ['line-1'] });
    expect(await told()).toHaveLength(1);
    await set({ lineIds: ['line-2'] });
    await db.delete(mails);
    expect(await told()).toEqual([]);
  });

  it('is not told to somebody inactive, nor to whoever put it there', async () => {
    await set({ inactiveAt: new Date() });
    expect(await told()).toEqual([]);
    await set({ inactiveAt: null });
    expect(await told({ ...PLANNER, personId: SAM })).toEqual([]);
  });

  it('is not told to who switched it off; other choices stay', async () => {
    const session = await sessionOf(SAM, 'north');
    expect((await callApi(NOTICES, { session, body: { issue: false } })).status).toBe(204);
    expect((await callApi(THEME, { session, body: { theme: 'dark' } })).status).toBe(200);
    expect(await told()).toEqual([]);
    const [row] = await db.select({ settings: people.settings }).from(people).where(eq(people.id, SAM));
    expect(row?.settings).toMatchObject({ theme: 'dark', notices: { issue: false } });
    expect((await callApi(NOTICES, { session, body: { issue: true } })).status).toBe(204);
    expect(await told()).toHaveLength(1);
  });
});

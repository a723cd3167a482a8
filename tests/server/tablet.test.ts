import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { db } from '@/db/client';
import * as t from '@/db/schema/index';
import { POST as BADGE, DELETE as NO_BADGE } from '@/pages/api/people/[id]/badge';
import { POST as DEACTIVATE } from '@/pages/api/people/[id]/deactivate';
import { GET as PEOPLE } from '@/pages/api/people/index';
import { GET as PROCESS_DATA } from '@/pages/api/process-data/index';
import { POST as CHANGE_PLANT } from '@/pages/api/session/plant';
import { POST as OWN_PIN } from '@/pages/api/session/pin';
import { POST as ENROL } from '@/pages/api/tablet/index';
import { POST as REVOKE } from '@/pages/api/tablet/[id]/revoke';
import { POST as BY_BADGE } from '@/pages/api/tablet/session';
import { POST as TOUCH } from '@/pages/api/tablet/touch';
import { hashSessionId } from '@/server/auth/hashedSessions';
import { lucia } from '@/server/auth/lucia';
import { pinFault } from '@/server/auth/pinStrength';
import { TABLET_COOKIE } from '@/server/http/cookies';
import { callApi, outcome } from '../support/api';
import { sessionIn } from '../support/people';
import { openWorld, PASSWORD, sessionOf } from '../support/world';

const ADMIN = 'north-administrator';
const SAM = 'north-lineSupervisor';
const PIN = '8351';

let tablet = '';

beforeAll(async () => {
  const close = await openWorld();
  await db.insert(t.lines).values({ id: 'north-line', plantId: 'north', name: 'Line 1', position: 0 });
  await db.insert(t.memberships).values([
    { personId: SAM, plantId: 'north', role: 'administrator' },
    { personId: SAM, plantId: 'south', role: 'lineSupervisor' },
  ]);
  tablet = await enrol();
  expect((await give(SAM, '417', PIN)).status).toBe(200);
  return close;
});
beforeEach(async () => void (await db.delete(t.rateLimits)));

const tokenOf = (response: Response): string =>
  new RegExp(`${TABLET_COOKIE}=([\\w-]+)`).exec(response.headers.get('set-cookie') ?? '')?.[1] ?? '';

async function enrol(name = 'Retort bay'): Promise<string> {
  const session = await sessionOf(ADMIN);
  return tokenOf(await callApi(ENROL, { session, body: { name, lineId: 'north-line' } }));
}

const give = async (personId: string, number: string, pin: string) =>
  callApi(BADGE, { session: await sessionOf(ADMIN), params: { id: personId }, body: { number, pin } });

const cookies = (token: string | null, session?: string) => ({
  cookie: [token ? `${TABLET_COOKIE}=${token}` : '', session ? `${lucia.sessionCookieName}=${session}` : '']
    .filter(Boolean)
    .join('; '),
});

const byBadge = (pin = PIN, token: string | null = tablet, number = '417') =>
  callApi(BY_BADGE, { body: { number, pin }, headers: cookies(token) });

const at = (route: typeof PEOPLE, session: string, token: string | null = tablet, method = 'GET', body?: unknown) =>
  callApi(route, { method, headers: cookies(token, session), ...(body === undefined ? {} : { body }) });

describe('enrolling', () => {
  it('gives a cookie that scripts can’t read, kept as a hash, and ends the administrator’s session', async () => {
    const session = await sessionOf(ADMIN);
    const response = await callApi(ENROL, { session, body: { name: 'Filler', lineId: null } });
    expect(response.status).toBe(201);
    expect(response.headers.get('set-cookie')).toMatch(/HttpOnly; SameSite=Lax/);
    expect(JSON.stringify(await db.select().from(t.tablets))).not.toContain(tokenOf(response));
    expect((await callApi(PROCESS_DATA, { session })).status).toBe(401);
  });

  it('again on the same device takes the place of what it was', async () => {
    const old = await enrol('Before');
    const session = await sessionOf(ADMIN);
    const again = await callApi(ENROL, { body: { name: 'After', lineId: null }, headers: cookies(old, session) });
    expect(again.status).toBe(201);
    expect((await byBadge(PIN, old)).status).toBe(403);
    expect((await byBadge(PIN, tokenOf(again))).status).toBe(200);
  });

  it('is refused at a line that is not the plant’s', async () => {
    const session = await sessionOf(ADMIN);
    const response = await callApi(ENROL, { session, body: { name: 'Filler', lineId: 'south-line' } });
    expect(await response.json()).toMatchObject({ code: 'LINE-UNKNOWN', fields: [{ path: 'lineId' }] });
  });
});

describe('badge and PIN', () => {
  it('sign in at an enrolled tablet, to the sheet of its line', async () => {
    const response = await byBadge();
    expect(response.status).toBe(200);
    expect(await response.json()).toMatchObject({ next: expect.stringMatching(/^\/shift\/.*line=north-line$/) });
    expect((await at(PROCESS_DATA, sessionIn(response))).status).toBe(200);
  });

  it.each([
    ['without a tablet’s cookie', null],
    ['with a cookie that nobody gave', 'x'.repeat(43)],
  ])('do nothing %s', async (_, token) => {
    expect(await outcome(await byBadge(PIN, token))).toEqual({ status: 403, code: 'TABLET-UNKNOWN' });
  });

  it('that do not belong together, unknown ones, and those of other plants are one answer', async () => {
    await db
      .insert(t.badges)
      .values({ personId: 'south-qualityLead', plantId: 'south', number: '99', pinHash: 'x', changedAt: new Date() });
    for (const [pin, number] of [
      ['9999', '417'],
      [PIN, '418'],
      [PIN, '99'],
    ] as const) {
      expect(await outcome(await byBadge(pin, tablet, number))).toEqual({ status: 401, code: 'BADGE-WRONG' });
    }
  });

  it('of somebody inactive sign nobody in', async () => {
    await db.insert(t.people).values({ id: 'north-temp', email: 'temp@plant.example', name: 'Temp' });
    await db.insert(t.memberships).values({ personId: 'north-temp', plantId: 'north', role: 'lineSupervisor' });
    await give('north-temp', '500', '6274');
    const session = sessionIn(await byBadge('6274', tablet, '500'));
    expect((await at(PROCESS_DATA, session)).status).toBe(200);
    await callApi(DEACTIVATE, { method: 'POST', params: { id: 'north-temp' }, session: await sessionOf(ADMIN) });
    expect((await at(PROCESS_DATA, session)).status).toBe(401);
    expect((await byBadge('6274', tablet, '500')).status).toBe(401);
  });

  it('are stored so that the table tells no PIN', async () => {
    const [row] = await db.select().from(t.badges).where(eq(t.badges.personId, SAM));
    expect(row?.pinHash).toMatch(/^\$argon2id\$/);
  });
});

describe('a session by badge', () => {
  it('may do what the floor may, whatever else the person is', async () => {
    const session = sessionIn(await byBadge());
    expect(await outcome(await at(PEOPLE, session))).toEqual({ status: 403, code: 'ROLE' });
    const move = await at(CHANGE_PLANT, session, tablet, 'POST', { plantId: 'south' });
    expect(await outcome(move)).toEqual({ status: 403, code: 'TABLET' });
    const pin = await at(OWN_PIN, session, tablet, 'POST', { pin: '7391', password: PASSWORD });
    expect(await outcome(pin)).toEqual({ status: 403, code: 'TABLET' });
  });

  it.each([
    ['another device', () => null],
    ['another tablet', () => enrol('Cook room')],
  ])('is worth nothing on %s, and ends', async (_, elsewhere) => {
    const session = sessionIn(await byBadge());
    expect((await at(PROCESS_DATA, session, await elsewhere())).status).toBe(401);
    expect((await at(PROCESS_DATA, session)).status).toBe(401);
  });

  it('ends after a quarter of an hour without a touch; looks from the background are none', async () => {
    const session = sessionIn(await byBadge());
    const row = () => eq(t.sessions.id, hashSessionId(session));
    const untouchedFor = (minutes: number) =>
      db
        .update(t.sessions)
        .set({ touchedAt: new Date(Date.now() - minutes * 60_000) })
        .where(row());
    await untouchedFor(14);
    expect((await at(PROCESS_DATA, session)).status).toBe(200);
    const [looked] = await db.select().from(t.sessions).where(row());
    expect(Date.now() - (looked?.touchedAt?.getTime() ?? 0)).toBeGreaterThan(13 * 60_000);
    expect((await at(TOUCH, session, tablet, 'POST')).status).toBe(204);
    const [touched] = await db.select().from(t.sessions).where(row());
    expect(Date.now() - (touched?.touchedAt?.getTime() ?? 0)).toBeLessThan(60_000);
    await untouchedFor(16);
    expect((await at(TOUCH, session, tablet, 'POST')).status).toBe(401);
  });

  it('lasts one shift at most, however often it is touched', async () => {
    await db.insert(t.shifts).values({
      id: 'night',
      plantId: 'north',
      name: 'Night',
      days: [1],
      startsAt: '22:00',
      endsAt: '06:00',
      position: 0,
    });
    const session = sessionIn(await byBadge());
    const row = eq(t.sessions.id, hashSessionId(session));
    const [opened] = await db.select().from(t.sessions).where(row);
    const hours = ((opened?.endsAt?.getTime() ?? 0) - (opened?.touchedAt?.getTime() ?? 0)) / 3_600_000;
    expect(hours).toBe(8);
    await db
      .update(t.sessions)
      .set({ endsAt: new Date(Date.now() - 1_000) })
      .where(row);
    expect((await at(PROCESS_DATA, session)).status).toBe(401);
  });

  it('ends with the tablet’s enrolment', async () => {
    const token = await enrol('Lost one');
    const session = sessionIn(await byBadge(PIN, token));
    const [row] = await db.select().from(t.tablets).where(eq(t.tablets.name, 'Lost one'));
    const revoke = async (admin: string) =>
      callApi(REVOKE, { method: 'POST', params: { id: row?.id ?? '' }, session: admin });
    await db.insert(t.memberships).values({ personId: 'both', plantId: 'south', role: 'administrator' });
    expect((await revoke(await sessionOf('both', 'south'))).status).toBe(404);
    expect((await at(PROCESS_DATA, session, token)).status).toBe(200);
    expect((await revoke(await sessionOf(ADMIN))).status).toBe(200);
    expect((await at(PROCESS_DATA, session, token)).status).toBe(401);
    expect((await byBadge(PIN, token)).status).toBe(403);
  });
});

describe('wrong tries', () => {
  it('with one badge have to wait, longer each time, even with the right PIN; other badges need not', async () => {
    await give('north-planner', '600', '6274');
    await db.insert(t.memberships).values({ personId: 'north-planner', plantId: 'north', role: 'lineSupervisor' });
    expect((await give('north-planner', '600', '6274')).status).toBe(200);
    for (let i = 0; i < 3; i++) expect((await byBadge('9999')).status).toBe(401);
    const refused = await byBadge();
    expect(refused.status).toBe(429);
    expect(await refused.json()).toMatchObject({ code: 'BADGE-WAIT', waitSeconds: expect.any(Number) });
    expect((await byBadge('6274', tablet, '600')).status).toBe(200);

    const waits: number[] = [];
    for (let i = 0; i < 4; i++) {
      const answer = (await (await byBadge('9999')).json()) as { waitSeconds?: number };
      waits.push(answer.waitSeconds ?? 0);
      await letPass(answer.waitSeconds ?? 0);
      expect((await byBadge('9999')).status).toBe(401);
    }
    waits.forEach((seconds, i) => expect(Math.abs(seconds - 15 * 2 ** i)).toBeLessThanOrEqual(3));
    await letPass(3_600);
    expect((await byBadge()).status).toBe(200);
    for (let i = 0; i < 3; i++) expect((await byBadge('9999')).status).toBe(401);
  });

  it('at the same time are all counted', async () => {
    const answers = await Promise.all(Array.from({ length: 8 }, () => byBadge('9999')));
    expect(answers.map(({ status }) => status).sort()).toEqual([401, 401, 401, 429, 429, 429, 429, 429]);
  });

  it('over many badges make the tablet wait, and one good badge does not clear that', async () => {
    for (let i = 0; i < 11; i++) await byBadge('9999', tablet, String(1_000 + i));
    expect((await byBadge()).status).toBe(200);
    await byBadge('9999', tablet, '2000');
    expect((await byBadge()).status).toBe(429);
    expect((await byBadge(PIN, await enrol('Next door'))).status).toBe(200);
  });
});

/** As if so much time had gone by. */
async function letPass(seconds: number): Promise<void> {
  for (const row of await db.select().from(t.rateLimits)) {
    await db
      .update(t.rateLimits)
      .set({ windowEndsAt: new Date(row.windowEndsAt.getTime() - seconds * 1_000) })
      .where(eq(t.rateLimits.key, row.key));
  }
}

describe('giving a badge', () => {
  it.each<[string, string, string, string]>([
    ['a number that somebody has', '417', '6274', 'BADGE-TAKEN'],
    ['a PIN that counts up', '700', '1234', 'PIN-WEAK'],
    ['a PIN of one digit', '700', '0000', 'PIN-WEAK'],
    ['a PIN that is too long', '700', '1357246', 'INPUT'],
    ['a number that is none', '7a', '6274', 'INPUT'],
  ])('is refused for %s', async (_, number, pin, code) => {
    await db
      .insert(t.memberships)
      .values({ personId: 'north-qualityLead', plantId: 'north', role: 'lineSupervisor' })
      .onConflictDoNothing();
    expect(await outcome(await give('north-qualityLead', number, pin))).toEqual({ status: 400, code });
  });

  it('is refused for somebody who is not of the floor, and for people of other plants', async () => {
    expect(await outcome(await give('north-utilitiesLead', '700', '6274'))).toEqual({
      status: 409,
      code: 'BADGE-ROLE',
    });
    expect((await give('south-qualityLead', '700', '6274')).status).toBe(404);
  });

  it('and taking it away again signs nobody in', async () => {
    await give('north-qualityLead', '701', '6274');
    const session = await sessionOf(ADMIN);
    const taken = await callApi(NO_BADGE, { method: 'DELETE', params: { id: 'north-qualityLead' }, session });
    expect(taken.status).toBe(200);
    expect((await byBadge('6274', tablet, '701')).status).toBe(401);
  });

  it('leaves the PIN to its holder, who changes it with the password', async () => {
    const session = await sessionOf(SAM, 'north');
    const change = (pin: string, password: string) => callApi(OWN_PIN, { session, body: { pin, password } });
    expect(await outcome(await change('7391', 'guess'))).toEqual({ status: 400, code: 'PASSWORD-WRONG' });
    expect(await outcome(await change('4174', PASSWORD))).toEqual({ status: 400, code: 'PIN-WEAK' });
    expect((await change('7391', PASSWORD)).status).toBe(204);
    expect((await byBadge('7391')).status).toBe(200);
    expect((await byBadge(PIN)).status).toBe(401);
    await give(SAM, '417', PIN);
  });
});

describe('a PIN', () => {
  it.each(['1234', '0000', '4321', '1212', '2580', '1984', '2026', '987654', '123123', '1122', '0417', '890123'])(
    'is not %s',
    (pin) => expect(pinFault(pin, '417')).toEqual(expect.any(String)),
  );

  it.each(['8351', '6274', '90417352'.slice(0, 6), '573108'])('may be %s', (pin) =>
    expect(pinFault(pin, '4')).toBeNull(),
  );
});

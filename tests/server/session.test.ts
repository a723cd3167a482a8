import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { db } from '@/db/client';
import { memberships, people, rateLimits, sessions } from '@/db/schema/index';
import { hashSessionId } from '@/server/auth/hashedSessions';
import { createLucia, lucia } from '@/server/auth/lucia';
import { DELETE, POST } from '@/pages/api/session/index';
import { POST as CHANGE_PLANT } from '@/pages/api/session/plant';
import { GET as PROCESS_DATA } from '@/pages/api/process-data/index';
import { callApi, outcome, type Call } from '../support/api';
import { emailOf, openWorld, PASSWORD, sessionOf } from '../support/world';

beforeAll(openWorld);
beforeEach(async () => void (await db.delete(rateLimits)));

const signIn = (personId: string, password = PASSWORD, call: Call = {}) =>
  callApi(POST, { body: { email: emailOf(personId), password }, ...call });

const cookieOf = (response: Response): string =>
  lucia.readSessionCookie(response.headers.get('set-cookie') ?? '') ?? '';

describe('signing in', () => {
  it('gives a cookie that signs in, and who one is', async () => {
    const response = await signIn('north-planner');
    expect(response.status).toBe(200);
    expect(await response.json()).toMatchObject({ personId: 'north-planner', plantId: 'north', roles: ['planner'] });
    expect(response.headers.get('set-cookie')).toMatch(/HttpOnly.*SameSite=Lax/);
    const after = await callApi(PROCESS_DATA, { session: cookieOf(response) });
    expect(after.status).toBe(200);
  });

  it('takes the address in any case', async () => {
    const body = { email: emailOf('north-planner').toUpperCase(), password: PASSWORD };
    expect((await callApi(POST, { body })).status).toBe(200);
  });

  it('stores the session only as a hash', async () => {
    const id = cookieOf(await signIn('north-planner'));
    const stored = await db.select({ id: sessions.id }).from(sessions);
    expect(stored.map((row) => row.id)).not.toContain(id);
    expect(stored.map((row) => row.id)).toContain(hashSessionId(id));
    const withStoredId = await callApi(PROCESS_DATA, { session: hashSessionId(id) });
    expect(withStoredId.status).toBe(401);
  });

  it('ends the session that the browser had', async () => {
    const session = await sessionOf('north-planner');
    await signIn('north-planner', PASSWORD, { session });
    expect((await callApi(PROCESS_DATA, { session })).status).toBe(401);
  });

  it('asks for a secure cookie where the application is on https', () => {
    expect(createLucia('https://plan.example').createSessionCookie('x').attributes.secure).toBe(true);
    expect(createLucia('http://10.0.0.5:4321').createSessionCookie('x').attributes.secure).toBe(false);
  });

  it.each([
    ['a wrong password', 'north-planner', 'four kettles'],
    ['an unknown address', 'nobody', PASSWORD],
  ])('refuses %s with the same answer', async (_, personId, password) => {
    const response = await signIn(personId, password);
    expect(response.headers.get('set-cookie')).toBeNull();
    expect(await outcome(response)).toEqual({ status: 401, code: 'SIGN-IN-WRONG' });
  });

  it('refuses somebody made inactive, and ends their session', async () => {
    const session = await sessionOf('north-administrator');
    await db.update(people).set({ active: false }).where(eq(people.id, 'north-administrator'));
    expect(await outcome(await signIn('north-administrator'))).toEqual({ status: 401, code: 'SIGN-IN-WRONG' });
    expect((await callApi(PROCESS_DATA, { session })).status).toBe(401);
    await db.update(people).set({ active: true }).where(eq(people.id, 'north-administrator'));
  });

  it('refuses somebody who holds no role anywhere', async () => {
    expect(await outcome(await signIn('nowhere'))).toEqual({ status: 403, code: 'SIGN-IN-NO-PLANT' });
  });

  it('refuses a person without a password', async () => {
    await db.insert(people).values({ id: 'invited', email: emailOf('invited'), name: 'Invited' });
    expect(await outcome(await signIn('invited'))).toEqual({ status: 401, code: 'SIGN-IN-WRONG' });
  });

  it.each<[string, Call, number]>([
    ['no body', { method: 'POST' }, 415],
    ['a form', { raw: new URLSearchParams({ email: 'a@b.example', password: 'x' }) }, 415],
    ['broken JSON', { raw: '{', headers: { 'content-type': 'application/json' } }, 400],
    ['an empty object', { body: {} }, 400],
    ['a list', { body: [] }, 400],
    ['an address that is none', { body: { email: 'planner', password: 'x' } }, 400],
    ['an empty password', { body: { email: 'a@b.example', password: '' } }, 400],
    ['a mistyped password', { body: { email: 'a@b.example', password: 7 } }, 400],
    ['a password beyond reason', { body: { email: 'a@b.example', password: 'x'.repeat(201) } }, 400],
    ['more than a request may send', { body: { email: 'a@b.example', password: 'x'.repeat(1_100_000) } }, 413],
  ])('refuses %s', async (_, call, status) => {
    const before = await db.$count(sessions);
    const response = await callApi(POST, call);
    expect(response.status).toBe(status);
    expect(await response.json()).toMatchObject({ code: expect.stringMatching(/^INPUT/), message: expect.any(String) });
    expect(await db.$count(sessions)).toBe(before);
  });
});

describe('many tries', () => {
  it('are refused for that account and address, even with the right password; others still sign in', async () => {
    for (let i = 0; i < 8; i++) expect((await signIn('north-planner', 'guess')).status).toBe(401);
    expect(await outcome(await signIn('north-planner'))).toEqual({ status: 429, code: 'SIGN-IN-TOO-MANY' });
    expect((await signIn('north-planner', PASSWORD, { address: '192.0.2.2' })).status).toBe(200);
    expect((await signIn('north-qualityLead')).status).toBe(200);
  });

  it('at the same time are all counted', async () => {
    const tries = await Promise.all(Array.from({ length: 12 }, () => signIn('north-planner', 'guess')));
    expect(tries.filter((response) => response.status === 429)).toHaveLength(4);
  });

  it('against many accounts are refused for that address', async () => {
    await signIn('nobody', 'guess');
    await db.update(rateLimits).set({ count: 60 });
    expect((await signIn('north-planner')).status).toBe(429);
    expect((await signIn('north-planner', PASSWORD, { address: '192.0.2.2' })).status).toBe(200);
  });

  it('are forgotten when their window has ended', async () => {
    for (let i = 0; i < 9; i++) await signIn('north-planner', 'guess');
    await db.update(rateLimits).set({ windowEndsAt: new Date(0) });
    expect((await signIn('north-planner')).status).toBe(200);
  });

  it('that succeed do not add up', async () => {
    for (let i = 0; i < 10; i++) expect((await signIn('north-planner')).status).toBe(200);
  });
});

describe('signing out', () => {
  it('ends the session and clears the cookie', async () => {
    const session = await sessionOf('north-planner');
    const response = await callApi(DELETE, { method: 'DELETE', session });
    expect(response.status).toBe(204);
    expect(response.headers.get('set-cookie')).toMatch(/Max-Age=0/);
    expect((await callApi(PROCESS_DATA, { session })).status).toBe(401);
  });

  it('without a session is no mistake', async () => {
    expect((await callApi(DELETE, { method: 'DELETE' })).status).toBe(204);
  });
});

describe('a session', () => {
  it('that has expired is refused and its cookie cleared', async () => {
    const session = await sessionOf('north-planner');
    await db
      .update(sessions)
      .set({ expiresAt: new Date(0) })
      .where(eq(sessions.id, hashSessionId(session)));
    const response = await callApi(PROCESS_DATA, { session });
    expect(response.status).toBe(401);
    expect(response.headers.get('set-cookie')).toMatch(/Max-Age=0/);
  });

  it('is renewed in its second half', async () => {
    const session = await sessionOf('north-planner');
    const soon = new Date(Date.now() + 3_600_000);
    await db
      .update(sessions)
      .set({ expiresAt: soon })
      .where(eq(sessions.id, hashSessionId(session)));
    const response = await callApi(PROCESS_DATA, { session });
    expect(cookieOf(response)).toBe(session);
    const [row] = await db
      .select()
      .from(sessions)
      .where(eq(sessions.id, hashSessionId(session)));
    expect(row?.expiresAt.getTime()).toBeGreaterThan(soon.getTime());
  });

  it('changes to another plant of the person, with the roles there', async () => {
    const session = await sessionOf('both', 'north');
    const response = await callApi(CHANGE_PLANT, { session, body: { plantId: 'south' } });
    expect(await response.json()).toMatchObject({ plantId: 'south', roles: ['utilitiesLead'] });
    const again = await callApi(CHANGE_PLANT, { session, body: { plantId: 'south' } });
    expect(again.status).toBe(200);
  });

  it.each([
    ['a plant of others', { plantId: 'south' }, 404],
    ['an unknown plant', { plantId: 'west' }, 404],
    ['no plant', {}, 400],
    ['a mistyped plant', { plantId: 7 }, 400],
  ])('does not change to %s', async (_, body, status) => {
    const session = await sessionOf('north-planner');
    expect((await callApi(CHANGE_PLANT, { session, body })).status).toBe(status);
    const [row] = await db
      .select()
      .from(sessions)
      .where(eq(sessions.id, hashSessionId(session)));
    expect(row?.plantId).toBe('north');
  });

  it('falls back to a plant where a role is still held', async () => {
    const session = await sessionOf('both', 'south');
    await db.delete(memberships).where(eq(memberships.plantId, 'south'));
    const response = await callApi(CHANGE_PLANT, { session, body: { plantId: 'north' } });
    expect(await response.json()).toMatchObject({ plantId: 'north' });
  });
});

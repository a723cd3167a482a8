import { and, eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { PeopleDto } from '@/contracts/people';
import { db } from '@/db/client';
import * as t from '@/db/schema/index';
import { POST as ACCEPT } from '@/pages/api/invitations/accept';
import { POST as INVITE } from '@/pages/api/invitations/index';
import { POST as RESEND } from '@/pages/api/invitations/[id]/resend';
import { POST as WITHDRAW } from '@/pages/api/invitations/[id]/withdraw';
import { GET as PEOPLE } from '@/pages/api/people/index';
import { POST as EDIT } from '@/pages/api/people/[id]/index';
import { POST as ACTIVATE } from '@/pages/api/people/[id]/activate';
import { POST as DEACTIVATE } from '@/pages/api/people/[id]/deactivate';
import { POST as SIGN_OUT } from '@/pages/api/people/[id]/sign-out';
import { GET as PROCESS_DATA } from '@/pages/api/process-data/index';
import { DELETE as EVERYWHERE } from '@/pages/api/session/everywhere';
import { POST as SIGN_IN } from '@/pages/api/session/index';
import { POST as PASSWORD_OWN } from '@/pages/api/session/password';
import { POST as RESET } from '@/pages/api/reset/index';
import { POST as USE_RESET } from '@/pages/api/reset/use';
import { readInvitation } from '@/server/people/accept.service';
import { callApi, outcome } from '../support/api';
import { mailTo, sessionIn, tokenTo } from '../support/people';
import { emailOf, nameOf, openWorld, PASSWORD, sessionOf } from '../support/world';

const NEW_PASSWORD = 'nine retorts by noon';
const ADMIN = 'north-administrator';

beforeAll(async () => {
  const close = await openWorld();
  await db.insert(t.people).values({ id: 'south-administrator', email: emailOf('south-administrator'), name: 'South' });
  await db.insert(t.memberships).values({ personId: 'south-administrator', plantId: 'south', role: 'administrator' });
  await db.insert(t.lines).values([
    { id: 'north-line', plantId: 'north', name: 'Line 1', position: 0 },
    { id: 'south-line', plantId: 'south', name: 'Line 1', position: 0 },
  ]);
  return close;
});
beforeEach(async () => void (await db.delete(t.rateLimits)));

const admin = () => sessionOf(ADMIN);

const invite = async (email: string, more: Record<string, unknown> = {}) =>
  callApi(INVITE, { session: await admin(), body: { email, roles: ['planner'], lineIds: null, ...more } });

const accept = (token: string, more: Record<string, unknown> = {}) =>
  callApi(ACCEPT, { body: { token, name: 'Nora Birch', password: NEW_PASSWORD, ...more } });

const idOf = async (response: Response, email: string): Promise<string> => {
  const { invitations } = (await response.json()) as PeopleDto;
  return invitations.find((one) => one.email === email)?.id ?? '';
};

const isSignedIn = async (session: string): Promise<boolean> =>
  (await callApi(PROCESS_DATA, { session })).status === 200;

const onPerson = async (route: typeof EDIT, id: string, body?: unknown) =>
  callApi(route, { method: 'POST', params: { id }, session: await admin(), ...(body === undefined ? {} : { body }) });

describe('an invitation', () => {
  it('is sent with a link that lets somebody in, once', async () => {
    const response = await invite('Nora@Plant.example', { roles: ['planner', 'qualityLead'], lineIds: ['north-line'] });
    expect(response.status).toBe(201);
    const mail = await mailTo('nora@plant.example');
    expect(mail?.subject).toContain(nameOf(ADMIN));
    expect(mail?.text).toContain('planner and quality lead');
    const token = await tokenTo('nora@plant.example');
    expect(await readInvitation(token)).toMatchObject({
      ok: true,
      value: { plantName: 'Plant north', isKnown: false },
    });

    const accepted = await accept(token);
    expect(accepted.status).toBe(200);
    expect(await isSignedIn(sessionIn(accepted))).toBe(true);
    const list = (await (await callApi(PEOPLE, { session: await admin() })).json()) as PeopleDto;
    expect(list.people.find(({ email }) => email === 'nora@plant.example')).toMatchObject({
      name: 'Nora Birch',
      roles: ['planner', 'qualityLead'],
      lineIds: ['north-line'],
      isActive: true,
    });
    expect(list.invitations).toEqual([]);
    expect((await accept(token)).status).toBe(404);
    const signIn = await callApi(SIGN_IN, { body: { email: 'nora@plant.example', password: NEW_PASSWORD } });
    expect(signIn.status).toBe(200);
  });

  it('keeps its token out of the table, and out of the message once that is sent', async () => {
    await invite('hashed@plant.example');
    const token = await tokenTo('hashed@plant.example');
    const rows = await db.select().from(t.invitations);
    expect(JSON.stringify(rows)).not.toContain(token);
  });

  it('accepted twice at the same time lets in one', async () => {
    await invite('twice@plant.example');
    const token = await tokenTo('twice@plant.example');
    const answers = await Promise.all([accept(token), accept(token), accept(token)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 404, 404]);
  });

  it('has expired after seven days', async () => {
    await invite('late@plant.example');
    const token = await tokenTo('late@plant.example');
    const [row] = await db.select().from(t.invitations).where(eq(t.invitations.email, 'late@plant.example'));
    const days = ((row?.expiresAt.getTime() ?? 0) - (row?.createdAt.getTime() ?? 0)) / 86_400_000;
    expect(days).toBeCloseTo(7, 3);
    await db
      .update(t.invitations)
      .set({ expiresAt: new Date(Date.now() - 1_000) })
      .where(eq(t.invitations.email, 'late@plant.example'));
    expect((await accept(token)).status).toBe(404);
  });

  it('sent again has a new link, and the old one works no more', async () => {
    const id = await idOf(await invite('again@plant.example'), 'again@plant.example');
    const old = await tokenTo('again@plant.example');
    expect((await onPerson(RESEND, id)).status).toBe(200);
    expect((await accept(old)).status).toBe(404);
    const tokens = (await db.select().from(t.mails).where(eq(t.mails.to, 'again@plant.example'))).map(
      ({ text }) => /invitation\/([\w-]+)/.exec(text ?? '')?.[1] ?? '',
    );
    const fresh = tokens.find((token) => token !== old) ?? '';
    expect((await accept(fresh)).status).toBe(200);
  });

  it('taken back works no more', async () => {
    const id = await idOf(await invite('gone@plant.example'), 'gone@plant.example');
    expect((await onPerson(WITHDRAW, id)).status).toBe(200);
    expect((await accept(await tokenTo('gone@plant.example'))).status).toBe(404);
    expect(await outcome(await onPerson(WITHDRAW, id))).toEqual({ status: 409, code: 'INVITATION-CLOSED' });
  });

  it('of another plant is not there', async () => {
    const id = await idOf(await invite('mine@plant.example'), 'mine@plant.example');
    const session = await sessionOf('south-administrator');
    for (const route of [RESEND, WITHDRAW]) {
      expect((await callApi(route, { method: 'POST', params: { id }, session })).status).not.toBe(200);
    }
    const list = (await (await callApi(PEOPLE, { session })).json()) as PeopleDto;
    expect(list.invitations).toEqual([]);
    expect(list.people.map(({ id: person }) => person)).not.toContain(ADMIN);
  });

  it('to somebody of another plant asks for the password there, and keeps it', async () => {
    await invite(emailOf('south-utilitiesLead'));
    const token = await tokenTo(emailOf('south-utilitiesLead'));
    expect(await readInvitation(token)).toMatchObject({ ok: true, value: { isKnown: true } });
    expect(await outcome(await accept(token))).toEqual({ status: 400, code: 'PASSWORD-WRONG' });
    const accepted = await callApi(ACCEPT, { body: { token, password: PASSWORD } });
    expect(accepted.status).toBe(200);
    const held = await db.select().from(t.memberships).where(eq(t.memberships.personId, 'south-utilitiesLead'));
    expect(held.map(({ plantId, role }) => `${plantId} ${role}`).sort()).toEqual([
      'north planner',
      'south utilitiesLead',
    ]);
  });

  it.each<[string, Record<string, unknown>, string, string]>([
    ['an address that is none', { email: 'nora' }, 'INPUT', 'email'],
    ['no role', { roles: [] }, 'INPUT', 'roles'],
    ['an unknown role', { roles: ['owner'] }, 'INPUT', 'roles.0'],
    ['a line of another plant', { lineIds: ['south-line'] }, 'LINE-UNKNOWN', 'lineIds'],
    ['no line', { lineIds: [] }, 'INPUT', 'lineIds'],
    ['somebody who is here', { email: emailOf('north-planner').toUpperCase() }, 'MEMBER', 'email'],
  ])('is refused for %s, at the field', async (_, more, code, path) => {
    const before = await db.$count(t.mails);
    const response = await invite('fresh@plant.example', more);
    expect(response.status).toBe(400);
    expect(await response.json()).toMatchObject({ code, fields: [{ path, message: expect.any(String) }] });
    expect(await db.$count(t.mails)).toBe(before);
  });

  it('is refused for an address that has one', async () => {
    await invite('open@plant.example');
    expect(await outcome(await invite('OPEN@plant.example'))).toEqual({ status: 400, code: 'INVITED' });
  });

  it.each([
    ['short', 'four kettle'],
    ['common', 'Passw0rd2026!'],
    ['a run of keys', 'qwertyuiop123456'],
    ['one’s own address', 'weak.plant.2026'],
    ['one’s own name', 'nora-birch-12345'],
    ['repeating itself', 'abcabcabcabcabc'],
  ])('is not accepted with a password that is %s', async (_, password) => {
    if (!(await mailTo('weak@plant.example'))) await invite('weak@plant.example');
    const response = await accept(await tokenTo('weak@plant.example'), { password });
    expect(response.status).toBe(400);
    expect(await response.json()).toMatchObject({ code: 'PASSWORD-WEAK', fields: [{ path: 'password' }] });
    expect(await db.$count(t.people, eq(t.people.email, 'weak@plant.example'))).toBe(0);
  });

  it('can’t be guessed at for long', async () => {
    const guess = () => accept('x'.repeat(43));
    for (let i = 0; i < 60; i++) await guess();
    expect((await accept('y'.repeat(43))).status).toBe(429);
  });
});

describe('roles and lines', () => {
  const was = { roles: ['planner'], lineIds: null };

  it('change at once, also in open sessions', async () => {
    const session = await sessionOf('north-planner');
    const response = await onPerson(EDIT, 'north-planner', { roles: ['administrator'], lineIds: ['north-line'], was });
    expect(response.status).toBe(200);
    expect((await callApi(PEOPLE, { session })).status).toBe(200);
    const back = { roles: ['planner'], lineIds: null, was: { roles: ['administrator'], lineIds: ['north-line'] } };
    expect((await onPerson(EDIT, 'north-planner', back)).status).toBe(200);
    expect((await callApi(PEOPLE, { session })).status).toBe(403);
    const kept = await db
      .select()
      .from(t.record)
      .where(and(eq(t.record.action, 'people.roles'), eq(t.record.subject, 'north-planner')));
    expect(kept).toHaveLength(2);
  });

  it('changed by somebody else meanwhile are not overwritten', async () => {
    const response = await onPerson(EDIT, 'north-planner', {
      roles: ['qualityLead'],
      lineIds: null,
      was: { roles: ['utilitiesLead'], lineIds: null },
    });
    expect(response.status).toBe(409);
    expect(await response.json()).toMatchObject({ code: 'PERSON-STALE', roles: ['planner'], lineIds: null });
  });

  it('of people of another plant can’t be changed', async () => {
    const body = { roles: ['planner'], lineIds: null, was };
    expect((await onPerson(EDIT, 'south-qualityLead', body)).status).toBe(404);
  });
});

describe('the last administrator', () => {
  const was = { roles: ['administrator'], lineIds: null };

  it('stays administrator and active', async () => {
    const edit = await onPerson(EDIT, ADMIN, { roles: ['planner'], lineIds: null, was });
    expect(await outcome(edit)).toEqual({ status: 409, code: 'LAST-ADMINISTRATOR' });
    expect(await outcome(await onPerson(DEACTIVATE, ADMIN))).toEqual({ status: 409, code: 'LAST-ADMINISTRATOR' });
  });

  it('remains when two administrators step down at the same time', async () => {
    await db.insert(t.memberships).values({ personId: 'north-qualityLead-2', plantId: 'north', role: 'administrator' });
    const both = [await sessionOf(ADMIN), await sessionOf('north-qualityLead-2', 'north')];
    const step = (session: string | undefined, id: string, roles: string[]) =>
      callApi(EDIT, {
        params: { id },
        session: session ?? '',
        body: { roles: ['planner'], lineIds: null, was: { roles, lineIds: null } },
      });
    const answers = await Promise.all([
      step(both[0], ADMIN, ['administrator']),
      step(both[1], 'north-qualityLead-2', ['administrator', 'qualityLead']),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const left = await db
      .select()
      .from(t.memberships)
      .where(and(eq(t.memberships.plantId, 'north'), eq(t.memberships.role, 'administrator')));
    expect(left).toHaveLength(1);
    await db.delete(t.memberships).where(eq(t.memberships.plantId, 'north'));
    await db.insert(t.memberships).values([
      { personId: ADMIN, plantId: 'north', role: 'administrator' },
      { personId: 'north-planner', plantId: 'north', role: 'planner' },
      { personId: 'north-qualityLead', plantId: 'north', role: 'qualityLead' },
      { personId: 'both', plantId: 'north', role: 'planner' },
    ]);
  });
});

describe('somebody made inactive', () => {
  it('is out at once and can’t come back in, until made active', async () => {
    const session = await sessionOf('north-planner');
    expect((await onPerson(DEACTIVATE, 'north-planner')).status).toBe(200);
    expect(await isSignedIn(session)).toBe(false);
    const credentials = { email: emailOf('north-planner'), password: PASSWORD };
    expect((await callApi(SIGN_IN, { body: credentials })).status).toBe(403);
    expect(await outcome(await onPerson(DEACTIVATE, 'north-planner'))).toMatchObject({ code: 'PERSON-INACTIVE' });
    expect((await onPerson(ACTIVATE, 'north-planner')).status).toBe(200);
    expect((await callApi(SIGN_IN, { body: credentials })).status).toBe(200);
  });

  it('still works at another plant', async () => {
    expect((await onPerson(DEACTIVATE, 'both')).status).toBe(200);
    const body = { email: emailOf('both'), password: PASSWORD };
    const response = await callApi(SIGN_IN, { body });
    expect(await response.json()).toMatchObject({ plantId: 'south' });
    await onPerson(ACTIVATE, 'both');
  });
});

describe('signing out everywhere', () => {
  it('by an administrator ends every session of the person, and nobody else’s', async () => {
    const theirs = [await sessionOf('north-planner'), await sessionOf('north-planner')];
    const other = await sessionOf('north-qualityLead');
    expect((await onPerson(SIGN_OUT, 'north-planner')).status).toBe(200);
    for (const session of theirs) expect(await isSignedIn(session)).toBe(false);
    expect(await isSignedIn(other)).toBe(true);
  });

  it('of one’s own ends this one too', async () => {
    const [here, there] = [await sessionOf('north-planner'), await sessionOf('north-planner')];
    const response = await callApi(EVERYWHERE, { method: 'DELETE', session: here });
    expect(response.status).toBe(204);
    expect(response.headers.get('set-cookie')).toMatch(/Max-Age=0/);
    for (const session of [here, there]) expect(await isSignedIn(session)).toBe(false);
  });
});

describe('a forgotten password', () => {
  const ask = (email: string, address?: string) => callApi(RESET, { body: { email }, ...(address ? { address } : {}) });

  it('is set anew by a link that works once; other sessions end, and the owner is told', async () => {
    const elsewhere = await sessionOf('north-qualityLead');
    expect((await ask(emailOf('north-qualityLead'))).status).toBe(204);
    const token = await tokenTo(emailOf('north-qualityLead'));
    expect(JSON.stringify(await db.select().from(t.passwordResets))).not.toContain(token);
    const weak = await callApi(USE_RESET, { body: { token, password: 'password1234' } });
    expect(await outcome(weak)).toEqual({ status: 400, code: 'PASSWORD-WEAK' });
    expect(await isSignedIn(elsewhere)).toBe(true);

    const used = await callApi(USE_RESET, { body: { token, password: NEW_PASSWORD } });
    expect(used.status).toBe(200);
    expect(await isSignedIn(sessionIn(used))).toBe(true);
    expect(await isSignedIn(elsewhere)).toBe(false);
    const credentials = { email: emailOf('north-qualityLead'), password: NEW_PASSWORD };
    expect((await callApi(SIGN_IN, { body: credentials })).status).toBe(200);
    expect((await mailTo(emailOf('north-qualityLead')))?.subject).toMatch(/was changed/);
    expect((await callApi(USE_RESET, { body: { token, password: 'eight blanchers at dawn' } })).status).toBe(404);
  });

  it('is answered the same, and as slowly, where the address has no account', async () => {
    const before = await db.$count(t.mails);
    const answers = await Promise.all([ask('nobody@plant.example'), ask(emailOf('north-planner'))]);
    const [unknown, known] = await Promise.all(
      answers.map(async (one) => [one.status, await one.text(), [...one.headers].sort()]),
    );
    expect(unknown).toEqual(known);
    expect(await db.$count(t.mails)).toBe(before + 1);
  });

  it('is asked for three times at most in a quarter of an hour; the answer does not say so', async () => {
    const before = await db.$count(t.mails);
    for (let i = 0; i < 5; i++) expect((await ask(emailOf('north-planner'), `192.0.2.${i + 10}`)).status).toBe(204);
    expect(await db.$count(t.mails)).toBe(before + 3);
  });

  it('can’t be asked for without end from one address', async () => {
    const asked = await Promise.all(Array.from({ length: 24 }, (_, i) => ask(`p${i}@plant.example`)));
    expect(asked.filter(({ status }) => status === 429)).toHaveLength(4);
  });

  it('is not set by a link after its hour', async () => {
    await ask(emailOf('north-planner'));
    const token = await tokenTo(emailOf('north-planner'));
    const rows = await db.select().from(t.passwordResets);
    const minutes = rows.map((row) => (row.expiresAt.getTime() - row.createdAt.getTime()) / 60_000);
    minutes.forEach((one) => expect(one).toBeCloseTo(60, 1));
    await db.update(t.passwordResets).set({ expiresAt: new Date(Date.now() - 1_000) });
    expect((await callApi(USE_RESET, { body: { token, password: NEW_PASSWORD } })).status).toBe(404);
  });
});

describe('one’s own password', () => {
  it('changes with the old one; this session stays, others end', async () => {
    const [here, there] = [await sessionOf('north-planner'), await sessionOf('north-planner')];
    const change = (password: string, newPassword: string) =>
      callApi(PASSWORD_OWN, { session: here, body: { password, newPassword } });
    expect(await outcome(await change('guess', NEW_PASSWORD))).toEqual({ status: 400, code: 'PASSWORD-WRONG' });
    expect(await outcome(await change(PASSWORD, PASSWORD))).toEqual({ status: 400, code: 'PASSWORD-WEAK' });
    expect((await change(PASSWORD, NEW_PASSWORD)).status).toBe(204);
    expect([await isSignedIn(here), await isSignedIn(there)]).toEqual([true, false]);
  });
});

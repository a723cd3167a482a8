import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { closeDb, db } from '@/db/client';
import * as t from '@/db/schema/index';
import { POST as FIRST_RUN } from '@/pages/api/people/first-run';
import { GET as PEOPLE } from '@/pages/api/people/index';
import { newFirstRunCode } from '@/server/people/firstRun.service';
import { callApi, outcome } from '../support/api';
import { createTestDatabase, type TestDatabase } from '../support/database';
import { sessionIn } from '../support/people';

const GOOD = {
  plantName: 'Moss Bank Cannery',
  timeZone: 'Europe/Dublin',
  name: 'Una Brook',
  email: 'Una@MossBank.example',
  password: 'nine retorts by noon',
};

let database: TestDatabase;

beforeAll(async () => {
  database = await createTestDatabase();
  process.env.DATABASE_URL = database.url;
});
afterAll(async () => {
  await closeDb();
  await database.close();
});
beforeEach(async () => {
  await db.delete(t.rateLimits);
  await db.delete(t.people);
  await db.delete(t.plants);
});

const newCode = async (): Promise<string> => (await newFirstRunCode()) ?? '';
const run = (code: string, more: Record<string, unknown> = {}) =>
  callApi(FIRST_RUN, { body: { ...GOOD, ...more, code } });

describe('the first run', () => {
  it('makes a plant and its administrator, signed in', async () => {
    const response = await run(await newCode());
    expect(response.status).toBe(200);
    const people = await callApi(PEOPLE, { session: sessionIn(response) });
    expect(await people.json()).toMatchObject({
      people: [{ name: 'Una Brook', email: 'una@mossbank.example', roles: ['administrator'], isSelf: true }],
      timeZone: 'Europe/Dublin',
    });
    expect(await db.select().from(t.plants)).toMatchObject([{ name: 'Moss Bank Cannery', isDemo: false }]);
  });

  it('takes the code however it is typed, keeps it only as a hash', async () => {
    const code = await newCode();
    expect(code).toMatch(/^([A-Z2-9]{4}-){3}[A-Z2-9]{4}$/);
    expect(JSON.stringify(await db.select().from(t.firstRunCodes))).not.toContain(code.replaceAll('-', ''));
    expect((await run(` ${code.toLowerCase().replaceAll('-', ' ')} `)).status).toBe(200);
  });

  it('takes the code once', async () => {
    const code = await newCode();
    expect((await run(code)).status).toBe(200);
    await db.delete(t.people);
    expect(await outcome(await run(code))).toEqual({ status: 400, code: 'CODE-WRONG' });
  });

  it('makes one plant where two ask at the same time', async () => {
    const code = await newCode();
    const answers = await Promise.all([run(code), run(code, { email: 'other@mossbank.example' }), run(code)]);
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    expect([await db.$count(t.plants), await db.$count(t.people)]).toEqual([1, 1]);
  });

  it('takes only the code that was printed last', async () => {
    const [first, second] = [await newCode(), await newCode()];
    expect((await run(first)).status).toBe(400);
    expect((await run(second)).status).toBe(200);
  });

  it('is over once somebody has an account: no code is made, none works', async () => {
    const code = await newCode();
    await db.insert(t.people).values({ id: 'somebody', email: 'somebody@plant.example', name: 'Somebody' });
    expect(await newFirstRunCode()).toBeNull();
    expect(await outcome(await run(code))).toEqual({ status: 404, code: 'NOT-FOUND' });
  });

  it.each<[string, Record<string, unknown>, string]>([
    ['no zone', { timeZone: '' }, 'timeZone'],
    ['an invented zone', { timeZone: 'Europe/Atlantis' }, 'timeZone'],
    ['an offset for a zone', { timeZone: '+01:00' }, 'timeZone'],
    ['a short password', { password: 'retorts' }, 'password'],
    ['a common password', { password: 'Passw0rd2026!' }, 'password'],
    ['a password of the own name', { password: 'una-brook-12345' }, 'password'],
    ['an address that is none', { email: 'una' }, 'email'],
    ['no name', { name: ' ' }, 'name'],
    ['no plant', { plantName: '' }, 'plantName'],
  ])('is refused with %s, at the field, and keeps the code', async (_, more, path) => {
    const code = await newCode();
    const response = await run(code, more);
    expect(response.status).toBe(400);
    expect(await response.json()).toMatchObject({ fields: [{ path }] });
    expect([await db.$count(t.plants), await db.$count(t.firstRunCodes)]).toEqual([0, 1]);
  });

  it('can’t be guessed at for long', async () => {
    const code = await newCode();
    for (let i = 0; i < 10; i++) expect((await run('AAAA-AAAA-AAAA-AAAA')).status).toBe(400);
    expect((await run(code)).status).toBe(429);
  });
});

import { sql } from 'drizzle-orm';
import { afterEach, beforeAll, expect, it, vi } from 'vitest';
import { closeDb, db } from '@/db/client';
import { POST } from '@/pages/api/session/index';
import { GET } from '@/pages/api/weeks/[week]/capacity';
import { callApi, outcome } from '../support/api';
import { emailOf, openWorld, PASSWORD, sessionOf, WEEK } from '../support/world';

beforeAll(openWorld);
afterEach(() => {
  vi.unstubAllEnvs();
  vi.restoreAllMocks();
});

it('outlives a connection that the database drops in the middle of a transaction', async () => {
  const logged = vi.spyOn(console, 'error').mockImplementation(() => undefined);
  const cut = db.transaction(async (tx) => {
    const { rows } = await tx.execute<{ pid: number }>(sql`select pg_backend_pid() as pid`);
    await db.execute(sql`select pg_terminate_backend(${rows[0]?.pid})`);
    await expect.poll(() => logged.mock.calls.flat().join()).toContain('lost');
    await tx.execute(sql`select 1`);
  });
  await expect(cut).rejects.toThrow();
  expect((await db.execute(sql`select 1 as one`)).rows).toEqual([{ one: 1 }]);
});

it('out of reach is said so, with a session or without', async () => {
  vi.spyOn(console, 'error').mockImplementation(() => undefined);
  const session = await sessionOf('north-planner');
  await closeDb();
  vi.stubEnv('DATABASE_URL', 'postgres://nobody@127.0.0.1:1/none');
  const reading = await callApi(GET, { session, params: { week: WEEK } });
  expect(await outcome(reading)).toEqual({ status: 503, code: 'NO-DATABASE' });
  const signingIn = await callApi(POST, { body: { email: emailOf('north-planner'), password: PASSWORD } });
  expect(await outcome(signingIn)).toEqual({ status: 503, code: 'NO-DATABASE' });
  await closeDb();
});

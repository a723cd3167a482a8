import { sql } from 'drizzle-orm';
import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import { db } from '@/db/client';
import { notify } from '@/server/events/notify';
import { GET } from '@/pages/api/events';
import { DELETE } from '@/pages/api/session/index';
import { POST as CHANGE_PLANT } from '@/pages/api/session/plant';
import { POST as LIMIT } from '@/pages/api/weeks/[week]/limits';
import { callApi } from '../support/api';
import { openWorld, sessionOf, WEEK } from '../support/world';

beforeAll(openWorld);

const opened: AbortController[] = [];
afterEach(() => opened.splice(0).forEach((controller) => controller.abort()));

/** An event stream as a browser has it: what came so far, and whether it has ended. */
async function follow(session: string) {
  const controller = new AbortController();
  opened.push(controller);
  const response = await callApi(GET, { session, signal: controller.signal });
  const state = { response, text: '', ended: false };
  const decoder = new TextDecoder();
  void (async () => {
    for await (const chunk of response.body as unknown as AsyncIterable<Uint8Array>) {
      state.text += decoder.decode(chunk, { stream: true });
    }
    state.ended = true;
  })();
  return state;
}
const within2s = { timeout: 2_000, interval: 20 };
const body = { headerId: 'north-main', limitKgPerH: 3_000, fromMin: 0, toMin: 60, reason: 'test' };

describe('an event stream', () => {
  it('tells a planner of a new steam limit within two seconds, and nobody at another plant', async () => {
    const planner = await follow(await sessionOf('north-planner'));
    const elsewhere = await follow(await sessionOf('south-utilitiesLead'));
    expect(planner.response.headers.get('content-type')).toContain('text/event-stream');
    const session = await sessionOf('north-utilitiesLead');
    await callApi(LIMIT, { session, params: { week: WEEK }, body });
    await expect.poll(() => planner.text, within2s).toContain('data: {"kind":"capacity"}\n\n');
    // A later notice of its own has come through, so the first would have too.
    await notify(db, 'south', { kind: 'plan', planId: 'p', revision: 4 });
    await expect.poll(() => elsewhere.text, within2s).toContain('"revision":4');
    expect(elsewhere.text).not.toContain('capacity');
  });

  it('says nothing of a change that was not committed', async () => {
    const planner = await follow(await sessionOf('north-planner'));
    const undone = db.transaction(async (tx) => {
      await notify(tx, 'north', { kind: 'issue' });
      throw new Error('undone');
    });
    await expect(undone).rejects.toThrow('undone');
    await notify(db, 'north', { kind: 'floor' });
    await expect.poll(() => planner.text, within2s).toContain('floor');
    expect(planner.text).not.toContain('issue');
  });

  it('ends when its session ends, and only then', async () => {
    const session = await sessionOf('north-planner');
    const mine = await follow(session);
    const others = await follow(await sessionOf('north-planner'));
    await callApi(DELETE, { method: 'DELETE', session });
    await expect.poll(() => mine.ended, within2s).toBe(true);
    expect(others.ended).toBe(false);
  });

  it('ends when the session changes plant, and then follows that one', async () => {
    const session = await sessionOf('both', 'north');
    const stream = await follow(session);
    await callApi(CHANGE_PLANT, { session, body: { plantId: 'south' } });
    await expect.poll(() => stream.ended, within2s).toBe(true);
    const next = await follow(session);
    await notify(db, 'south', { kind: 'plan' });
    await expect.poll(() => next.text, within2s).toContain('plan');
  });

  it('ends after the database dropped the listening connection, which is then open again', async () => {
    const stream = await follow(await sessionOf('north-planner'));
    await db.execute(
      sql`select pg_terminate_backend(pid) from pg_stat_activity where query ilike 'listen%' and datname = current_database()`,
    );
    await expect.poll(() => stream.ended, { timeout: 10_000, interval: 50 }).toBe(true);
    const next = await follow(await sessionOf('north-planner'));
    await notify(db, 'north', { kind: 'floor' });
    await expect.poll(() => next.text, within2s).toContain('floor');
  });

  it('serves all streams of a process over one listening connection', async () => {
    for (let i = 0; i < 4; i++) await follow(await sessionOf('north-planner'));
    const { rows } = await db.execute(
      sql`select 1 from pg_stat_activity where query ilike 'listen%' and datname = current_database()`,
    );
    expect(rows).toHaveLength(1);
  });
});

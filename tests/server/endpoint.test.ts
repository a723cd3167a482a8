import type { APIRoute } from 'astro';
import { afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { ok } from '@/core/result';
import { endpoint, openEndpoint } from '@/server/http/endpoint';
import { conflict } from '@/server/http/problem';
import { callApi } from '../support/api';
import { openWorld, sessionOf } from '../support/world';

beforeAll(openWorld);
afterEach(() => void vi.restoreAllMocks());

const json = async (route: APIRoute, call = {}) => {
  const response = await callApi(route, call);
  return [response.status, await response.json()];
};

describe('an endpoint', () => {
  it('says nothing of an error that nobody expected, and logs it', async () => {
    const logged = vi.spyOn(console, 'error').mockImplementation(() => undefined);
    const route = openEndpoint({
      handle: () => {
        throw new Error('secret');
      },
    });
    const [status, body] = await json(route);
    expect([status, body]).toMatchObject([500, { code: 'FAULT' }]);
    expect(JSON.stringify(body)).not.toContain('secret');
    expect(String(logged.mock.calls[0]?.[1])).toContain('secret');
  });

  it('joins a conflict’s details to its body', async () => {
    const route = openEndpoint({
      handle: async () => ({ ok: false, error: conflict('PLAN-STALE', 'Changed since.', { planRevision: 7 }) }),
    });
    expect(await json(route)).toEqual([409, { code: 'PLAN-STALE', message: 'Changed since.', planRevision: 7 }]);
  });

  it('hands on a query that fits and refuses one that does not', async () => {
    const query = z.object({ line: z.string().min(1) });
    const route = openEndpoint({ query, handle: async (input) => ok(input.query) });
    expect(await json(route, { path: '/api/x?line=a' })).toEqual([200, { line: 'a' }]);
    expect(await json(route, { path: '/api/x' })).toMatchObject([400, { fields: [{ path: 'line' }] }]);
  });

  it('answers a success without a value 204, and another with its status', async () => {
    expect((await callApi(openEndpoint({ handle: async () => ok(undefined) }))).status).toBe(204);
    expect((await callApi(openEndpoint({ status: 202, handle: async () => ok({}) }))).status).toBe(202);
  });

  it('looks at session and role before input', async () => {
    const handle = vi.fn(async () => ok({}));
    const route = endpoint({ permission: 'plan.edit', body: z.object({}), handle });
    expect(await json(route, { raw: '{' })).toMatchObject([401, {}]);
    const session = await sessionOf('north-lineSupervisor');
    expect(await json(route, { raw: '{', session })).toMatchObject([403, {}]);
    expect(handle).not.toHaveBeenCalled();
  });

  it('counts a body that does not announce its length', async () => {
    const route = openEndpoint({ body: z.unknown(), handle: async () => ok({}) });
    let sent = 0;
    const endless = new ReadableStream<Uint8Array>({
      pull: (controller) => {
        sent += 100_000;
        controller.enqueue(new Uint8Array(100_000).fill(32));
      },
    });
    const headers = { 'content-type': 'application/json' };
    expect(await json(route, { method: 'POST', raw: endless, headers })).toMatchObject([413, {}]);
    expect(sent).toBeLessThan(2_000_000);
  });
});

it('an unknown endpoint answers as endpoints do, not with a page', async () => {
  const page: APIRoute = () =>
    new Response('<!doctype html>', { status: 404, headers: { 'content-type': 'text/html' } });
  expect(await json(page, { path: '/api/no-such' })).toMatchObject([404, { code: 'NOT-FOUND' }]);
});

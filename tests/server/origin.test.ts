import { beforeAll, describe, expect, it } from 'vitest';
import { db } from '@/db/client';
import { steamLimits } from '@/db/schema/index';
import { POST } from '@/pages/api/weeks/[week]/limits';
import { GET } from '@/pages/api/process-data/index';
import { callApi, ORIGIN, outcome } from '../support/api';
import { openWorld, sessionOf, WEEK } from '../support/world';

beforeAll(openWorld);

const body = { headerId: 'north-main', limitKgPerH: 3_000, fromMin: 0, toMin: 60, reason: 'test' };

describe('a change that comes from', () => {
  it.each([
    ['another site', 'https://elsewhere.example'],
    ['another port', 'http://steadmain.test:8080'],
    ['nowhere (a sandboxed frame)', 'null'],
    ['a browser that does not say', null],
  ])('%s is refused, JSON or not, and changes nothing', async (_, origin) => {
    const session = await sessionOf('north-utilitiesLead');
    const response = await callApi(POST, { session, body, params: { week: WEEK }, origin });
    expect(await outcome(response)).toEqual({ status: 403, code: 'ORIGIN' });
    expect(await db.$count(steamLimits)).toBe(0);
  });

  it('the application itself is done', async () => {
    const session = await sessionOf('north-utilitiesLead');
    const response = await callApi(POST, { session, body, params: { week: WEEK }, origin: ORIGIN });
    expect(response.status).toBe(200);
    expect(await db.$count(steamLimits)).toBe(1);
  });
});

it('reading needs no origin, and answers may be kept by nobody', async () => {
  const session = await sessionOf('north-planner');
  const response = await callApi(GET, { session, origin: null });
  expect(response.status).toBe(200);
  expect(response.headers.get('cache-control')).toBe('no-store');
  expect(response.headers.get('content-security-policy')).toContain("default-src 'none'");
});

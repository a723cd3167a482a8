import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser } from '../support/browser';
import { mainHeaderState, signIn } from './people';

const MID_SHIFT = '2026-12-01T10:17:00Z';

/** Instants and what a clock in Europe/London shows at each. */
const MOMENTS = [
  { what: 'mid-shift', now: MID_SHIFT, week: '2026-11-30', shows: /^10:1[789]$/ },
  { what: 'midnight between two shifts', now: '2026-12-02T00:00:30Z', week: '2026-11-30', shows: /^00:0[0-3]$/ },
  { what: 'Sunday', now: '2026-12-06T14:30:00Z', week: '2026-11-30', shows: /^14:3[0-3]$/ },
  { what: 'the hour that comes twice', now: '2026-10-25T01:30:00Z', week: '2026-10-19', shows: /^01:3[0-3]$/ },
  { what: 'after summer time', now: '2026-10-25T09:10:00Z', week: '2026-10-19', shows: /^09:1[0-3]$/ },
  { what: 'after winter time', now: '2027-03-28T09:10:00Z', week: '2027-03-22', shows: /^10:1[0-3]$/ },
];

let app: TestApp;
let browser: Browser;

beforeAll(async () => {
  app = await startApp(MID_SHIFT);
  browser = await launchBrowser();
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

describe('the pages at every hour', () => {
  it.each(MOMENTS)('show the plant’s clock: $what', async ({ now, week, shows }) => {
    await app.setClock(now);
    const { context, page, troubles } = await signIn(browser, app.url, 'planner', { timezoneId: 'Asia/Tokyo' });
    await page.goto(`${app.url}/week`);
    await page.waitForURL(`${app.url}/week/${week}`);
    await mainHeaderState(page).waitFor();
    expect(await page.getByTestId('now').innerText()).toMatch(shows);
    await page.goto(`${app.url}/capacity`);
    await page.waitForURL(`${app.url}/capacity/${week}`);
    await page.getByRole('heading', { name: 'Record of changes' }).waitFor();
    await page.goto(`${app.url}/shift`);
    await page.getByRole('heading', { level: 1 }).waitFor();
    expect(new URL(page.url()).pathname).toBe(`/shift/${week}`);
    expect(troubles).toEqual([]);
    await context.close();
  });
});

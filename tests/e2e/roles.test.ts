import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser } from '../support/browser';
import { mainHeaderState, signIn } from './people';

const WEEK = '2026-11-30';

let app: TestApp;
let browser: Browser;

beforeAll(async () => {
  app = await startApp('2026-11-30T05:50:00Z');
  browser = await launchBrowser();
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

describe('what each role may do', () => {
  it('shows a supervisor the board to be read', async () => {
    const { page, troubles } = await signIn(browser, app.url, 'supervisor');
    await page.goto(`${app.url}/week/${WEEK}`);
    await mainHeaderState(page).waitFor();
    expect(await page.getByRole('button', { name: /^(Level this week|Put on the floor|Undo)/ }).count()).toBe(0);
    const load = page.getByRole('button', { name: /^A01-1 / });
    const name = await load.getAttribute('aria-label');
    await load.focus();
    for (const key of ['Enter', 'ArrowRight', 'Enter']) await page.keyboard.press(key);
    expect(await load.getAttribute('aria-label')).toBe(name);
    expect(await page.getByTestId('carried').count()).toBe(0);
    expect(troubles).toEqual([]);
  });

  it('shows a planner the capacity to be read, and who may set it', async () => {
    const { page, troubles } = await signIn(browser, app.url, 'planner');
    await page.goto(`${app.url}/capacity/${WEEK}`);
    await page.getByText(/^Only .*utilities lead/).waitFor();
    expect(await page.getByRole('button', { name: 'Steam limit…' }).count()).toBe(0);
    expect(troubles).toEqual([]);
  });

  it('lets the quality lead release process data; the breach goes from the open board', async () => {
    const quality = await signIn(browser, app.url, 'quality');
    await quality.page.goto(`${app.url}/process-data`);
    const planner = await signIn(browser, app.url, 'planner', { viewport: { width: 1440, height: 900 } });
    await planner.page.goto(`${app.url}/week/${WEEK}`);
    await mainHeaderState(planner.page).waitFor();
    expect(await planner.page.getByRole('button', { name: /^Place (it|all)/ }).count()).toBeGreaterThan(0);

    const release = quality.page.getByRole('button', { name: /^Release / });
    const waiting = quality.page.getByRole('region', { name: 'To be released' }).getByRole('listitem');
    const product = (await waiting.first().getByRole('heading').first().innerText()).trim();
    const group = planner.page.getByRole('region').filter({
      has: planner.page.getByRole('heading', { level: 3 }).filter({ hasText: product }),
    });
    await group
      .last()
      .getByRole('button', { name: /^Place / })
      .click();
    const unreleased = planner.page.getByRole('button', { name: /not released/i });
    await unreleased.first().waitFor();

    const toRelease = await release.count();
    for (let left = toRelease; left > 0; left--) {
      await release.first().click();
      await quality.page.getByRole('dialog').getByRole('button', { name: 'Release', exact: true }).click();
      await quality.page.getByRole('dialog').waitFor({ state: 'detached' });
    }
    await quality.page.waitForURL(/process-data/);
    await unreleased.first().waitFor({ state: 'detached' });
    expect([...quality.troubles, ...planner.troubles]).toEqual([]);
  });
});

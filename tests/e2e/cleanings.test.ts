import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser, type Visitor } from '../support/browser';
import { mainHeaderState, signIn } from './people';

const WEEK = '2026-11-30';

let app: TestApp;
let browser: Browser;
let petra: Visitor;
let milo: Visitor;

/** Enters a rule of cleanliness as planner and releases it as quality lead. */
async function releaseCleanliness(planner: Page, quality: Page): Promise<void> {
  const headers = { origin: app.url };
  const values = { greatestRunningMin: null, greatestStandingDirtyMin: 600, allergenReleaseMin: null };
  const data = { kind: 'cleanliness', values, source: 'common practice, no source' };
  const entered = await planner.request.post(`${app.url}/api/practice`, { headers, data });
  expect(entered.status()).toBe(201);
  const { rules } = (await entered.json()) as { rules: { id: string; kind: string; released: unknown }[] };
  const rule = rules.find(({ kind, released }) => kind === 'cleanliness' && released === null);
  const released = await quality.request.post(`${app.url}/api/practice/${rule?.id}/release`, { headers });
  expect(released.status()).toBe(200);
}

beforeAll(async () => {
  app = await startApp('2026-11-30T05:50:00Z');
  browser = await launchBrowser();
  const open = (key: string) => signIn(browser, app.url, key, { viewport: { width: 1440, height: 900 } });
  [petra, milo] = [await open('planner'), await open('planner2')];
  const quality = await open('quality');
  await releaseCleanliness(petra.page, quality.page);
  for (const { page } of [petra, milo]) {
    await page.goto(`${app.url}/week/${WEEK}`);
    await mainHeaderState(page).waitFor();
  }
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

const savedOn = (page: Page): Promise<unknown> =>
  page.waitForResponse((answer) => answer.url().endsWith('/edits') && answer.request().method() === 'POST');
const unplaced = async (page: Page): Promise<number> => Number(await page.getByTestId('unplaced-count').innerText());

it('adds a clean for a unit that stands dirty, places it by keys, and the breach goes', async () => {
  const { page } = petra;
  const line = page.getByRole('listitem').filter({ hasText: 'stands dirty too long' }).first();
  const title = (await line.getByText('stands dirty too long').innerText()).trim();
  const unit = title.slice(0, title.indexOf(' stands dirty'));
  const before = await unplaced(page);

  await line.getByRole('button', { name: `Add a clean for ${unit}` }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Add it' }).click();
  const card = page.getByRole('button', { name: new RegExp(`^C1 \\w+ of ${unit}, .*not yet placed$`) });
  await card.waitFor();
  await page.waitForFunction(() => document.activeElement?.getAttribute('aria-label')?.startsWith('C1 '));
  expect(await unplaced(page)).toBe(before + 1);
  await milo.page.getByRole('button', { name: /^C1 .*not yet placed$/ }).waitFor();

  await page.keyboard.press('Enter');
  const saved = savedOn(page);
  await page.keyboard.press('Enter');
  await saved;
  await page.locator('.batch[aria-label^="C1 "]').waitFor();
  await page.getByText(title, { exact: true }).waitFor({ state: 'detached' });
  expect(await unplaced(page)).toBe(before);
  await milo.page.getByText(title, { exact: true }).waitFor({ state: 'detached' });
});

it('adds any clean, drags it onto its row, and removes it once it is taken off', async () => {
  const { page } = petra;
  const before = await unplaced(page);
  await page.getByRole('button', { name: 'Add a clean…' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Unit').selectOption({ label: 'Kettle 1' });
  await dialog.getByLabel('Kind').selectOption({ label: 'rinse' });
  await dialog.getByRole('button', { name: 'Add it' }).click();
  const card = page.getByRole('button', { name: /^C2 Rinse of Kettle 1, rinse, \d+ min, not yet placed$/ });
  await card.waitFor();

  const row = page.getByRole('group', { name: 'Kettle 1', exact: true });
  await row.locator('.board-label').scrollIntoViewIfNeeded();
  await card.scrollIntoViewIfNeeded();
  await card.hover();
  await page.mouse.down();
  const to = await row.locator('.board-label').boundingBox();
  if (!to) throw new Error('Kettle 1 has no place on the screen');
  await page.mouse.move(to.x + to.width + 300, to.y + to.height / 2, { steps: 8 });
  const placed = savedOn(page);
  await page.mouse.up();
  await placed;
  const block = row.locator('.batch[aria-label^="C2 Rinse of Kettle 1, Kettle 1"]');
  await block.waitFor();

  await block.focus();
  const takenOff = savedOn(page);
  await page.keyboard.press('Delete');
  await takenOff;
  await card.click();
  await page.getByRole('button', { name: 'Remove it' }).click();
  await card.waitFor({ state: 'detached' });
  expect(await unplaced(page)).toBe(before);
  expect([...petra.troubles, ...milo.troubles]).toEqual([]);
});

import type { Browser, Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser, type Visitor } from '../support/browser';
import { mainHeaderState, signIn } from './people';

const WEEK = '2026-11-30';
const MONDAY_EARLY = '2026-11-30T05:50:00Z';

let app: TestApp;
let browser: Browser;
let petra: Visitor;
let milo: Visitor;

async function boardOf(key: string): Promise<Visitor> {
  const visitor = await signIn(browser, app.url, key, { viewport: { width: 1440, height: 900 } });
  await visitor.page.goto(`${app.url}/week/${WEEK}`);
  await mainHeaderState(visitor.page).waitFor();
  return visitor;
}

beforeAll(async () => {
  app = await startApp(MONDAY_EARLY);
  browser = await launchBrowser();
  petra = await boardOf('planner');
  milo = await boardOf('planner2');
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

const block = (page: Page, name: RegExp): Locator => page.getByRole('button', { name });
const undoOf = (page: Page): Locator => page.getByRole('button', { name: 'Undo' });
const savedOn = (page: Page): Promise<unknown> =>
  page.waitForResponse((answer) => answer.url().endsWith('/edits') && answer.request().method() === 'POST');

/** Carries with the mouse to the middle of what can be seen of a unit's row; lets go only if asked. */
async function dragToRow(page: Page, card: Locator, unitName: string, letGo = true): Promise<void> {
  const row = page.getByRole('group', { name: unitName, exact: true });
  await row.locator('.board-label').scrollIntoViewIfNeeded();
  await card.scrollIntoViewIfNeeded();
  await card.hover();
  await page.mouse.down();
  const to = await row.locator('.board-label').boundingBox();
  if (!to) throw new Error(`${unitName} has no place on the screen`);
  await page.mouse.move(to.x + to.width + 300, to.y + to.height / 2, { steps: 8 });
  if (letGo) await page.mouse.up();
}

/** Moves a block by quarter hours with the keys. */
async function moveByKeys(page: Page, name: RegExp, key: 'ArrowRight' | 'ArrowLeft', presses: number): Promise<void> {
  await block(page, name).focus();
  await page.keyboard.press('Enter');
  for (let press = 0; press < presses; press++) await page.keyboard.press(key);
  const saved = savedOn(page);
  await page.keyboard.press('Enter');
  await saved;
}

describe('the week board in the hand', () => {
  it('places with the mouse what is not yet placed and keeps it; Escape lets it be', async () => {
    const { page } = petra;
    const before = await page.getByTestId('unplaced-count').innerText();
    const card = page.getByRole('button', { name: /^A\d+-1 .*not yet placed$/ }).first();
    const id = await card.getAttribute('data-activity');

    await dragToRow(page, card, 'Retort 1', false);
    await page.keyboard.press('Escape');
    await page.mouse.up();
    expect(await page.getByTestId('unplaced-count').innerText()).toBe(before);

    const saved = savedOn(page);
    await dragToRow(page, card, 'Retort 1');
    await saved;
    const placed = page.locator(`.batch[data-activity="${id}"]`);
    await placed.waitFor();
    expect(await placed.getAttribute('aria-label')).toContain('Retort 1');
    expect(await page.getByTestId('unplaced-count').innerText()).toBe(String(Number(before) - 1));
    await page.reload();
    await placed.waitFor({ state: 'attached' });

    await milo.page.locator(`.batch[data-activity="${id}"]`).waitFor({ state: 'attached' });
  });

  it('takes a move back, and makes it again', async () => {
    const { page } = petra;
    const name = await block(page, /^A01-1 /).getAttribute('aria-label');
    await moveByKeys(page, /^A01-1 /, 'ArrowRight', 2);
    expect(await block(page, /^A01-1 /).getAttribute('aria-label')).not.toBe(name);
    const undone = savedOn(page);
    await undoOf(page).click();
    await undone;
    expect(await block(page, /^A01-1 /).getAttribute('aria-label')).toBe(name);
    const redone = savedOn(page);
    await page.keyboard.press('Control+Shift+Z');
    await redone;
    expect(await block(page, /^A01-1 /).getAttribute('aria-label')).not.toBe(name);
  });

  it('refuses to undo what another has moved since, and says who', async () => {
    const { page } = petra;
    await moveByKeys(page, /^A01-1 /, 'ArrowRight', 1);
    const seen = await block(page, /^A01-1 /).getAttribute('aria-label');
    await milo.page.reload();
    await mainHeaderState(milo.page).waitFor();
    await moveByKeys(milo.page, /^A01-1 /, 'ArrowRight', 1);
    const now = await block(milo.page, /^A01-1 /).getAttribute('aria-label');
    expect(now).not.toBe(seen);

    const refused = savedOn(page);
    await undoOf(page).click();
    await refused;
    await page.getByTestId('notices').getByText('Undo was not saved').waitFor();
    expect(await page.getByTestId('notices').innerText()).toMatch(/Milo Fenn changed A01-1/);
    expect(await block(page, /^A01-1 /).getAttribute('aria-label')).toBe(now);
  });

  it('refuses a move of what another has moved meanwhile, and loses neither', async () => {
    const { page } = milo;
    // The first planner's board hears nothing of it, as over a broken line.
    await petra.context.route('**/api/events', (route) => route.abort());
    await petra.context.route(`**/api/weeks/${WEEK}`, (route) => route.abort());
    await petra.page.reload();
    await mainHeaderState(petra.page).waitFor();
    await moveByKeys(page, /^A01-1 /, 'ArrowLeft', 1);
    const now = await block(page, /^A01-1 /).getAttribute('aria-label');

    await moveByKeys(petra.page, /^A01-1 /, 'ArrowRight', 1);
    await petra.page.getByTestId('notices').getByText('The change was not saved').waitFor();
    expect(await petra.page.getByTestId('notices').innerText()).toContain('Milo Fenn');
    expect(await block(petra.page, /^A01-1 /).getAttribute('aria-label')).toBe(now);
    expect(milo.troubles.filter((trouble) => !trouble.includes('409'))).toEqual([]);
  });
});

import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser, type Visitor } from '../support/browser';
import { mainHeaderState, signIn } from './people';

const WEEK = '2026-11-30';
const MONDAY_EARLY = '2026-11-30T05:50:00Z';

let app: TestApp;
let browser: Browser;
let petra: Visitor;

const visit = (key: string): Promise<Visitor> =>
  signIn(browser, app.url, key, { viewport: { width: 1440, height: 900 } });

beforeAll(async () => {
  app = await startApp(MONDAY_EARLY);
  browser = await launchBrowser();
  petra = await visit('planner');
  await petra.page.goto(`${app.url}/week/${WEEK}`);
  await mainHeaderState(petra.page).waitFor();
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

const chanceFold = (page: Page) => page.getByRole('button', { name: 'Early and late starts' });
const greatest = (page: Page) => page.getByTestId('greatest-chance-demo-main').getByRole('button');
const pathOf = (page: Page, name: string) => page.getByTestId(name).first().getAttribute('d');
const chanceFace = (page: Page) => page.getByRole('slider', { name: /chance of going over/ });

/** Waits until something drawn is no longer what it was. */
async function changed(page: Page, name: string, before: string | null): Promise<string | null> {
  await expect.poll(() => pathOf(page, name), { timeout: 20_000 }).not.toBe(before);
  return pathOf(page, name);
}

describe('early and late starts on the board', () => {
  it('are off at first; switched on they show the chance of going over, and this browser remembers it', async () => {
    const { page } = petra;
    expect(await greatest(page).count()).toBe(0);
    await chanceFold(page).click();
    await greatest(page).waitFor();
    expect(await greatest(page).innerText()).toMatch(/^(> )?\d+(\.\d)?\s%\s(Mon|Tue|Wed|Thu|Fri|Sat) \d\d:\d\d$/);
    expect(await pathOf(page, 'too-likely')).toMatch(/^M/);
    expect(await pathOf(page, 'confident')).toMatch(/^M/);
    await page.reload();
    await greatest(page).waitFor();
    expect(await chanceFold(page).getAttribute('aria-expanded')).toBe('true');
  });

  it('show the load at another confidence', async () => {
    const { page } = petra;
    const at95 = await pathOf(page, 'confident');
    await page.getByLabel('Part of the weeks that the load shown covers').selectOption('0.99');
    const at99 = await changed(page, 'confident', at95);
    expect((at99 ?? '').length).toBeGreaterThan(0);
    await page.getByLabel('Part of the weeks that the load shown covers').selectOption('0.95');
    await expect.poll(() => pathOf(page, 'confident'), { timeout: 20_000 }).toBe(at95);
  });

  it('say by minute what the chance is and how it was found, with the keys', async () => {
    const { page } = petra;
    await chanceFace(page).focus();
    await page.keyboard.press('PageUp');
    expect(await chanceFace(page).getAttribute('aria-valuetext')).toMatch(
      /^\w{3} \d\d:\d\d: chance of going over (< |> )?\d+(\.\d)?\s%$/,
    );
    const card = page.getByTestId('who-draws');
    expect(await card.innerText()).toContain('400 weeks');
    await page.keyboard.press('Escape');
    await card.waitFor({ state: 'detached' });
  });

  it('follow an activity that is carried, and go back when it is let be', async () => {
    const { page } = petra;
    const before = await pathOf(page, 'confident');
    const block = page.getByRole('button', { name: /^A05-1 / });
    await block.focus();
    await page.keyboard.press('Enter');
    for (let press = 0; press < 8; press++) await page.keyboard.press('ArrowRight');
    await changed(page, 'confident', before);
    await page.keyboard.press('Escape');
    await expect.poll(() => pathOf(page, 'confident'), { timeout: 20_000 }).toBe(before);
  });
});

describe('shared limits on the board', () => {
  it('unfold to a strip each and a table, and say who uses what at the pointed minute', async () => {
    const { page } = petra;
    await page.getByRole('button', { name: 'Shared limits' }).click();
    const table = page.getByTestId('limit-table');
    expect(await table.getByRole('row').count()).toBe(3);
    const crates = page.getByRole('slider', { name: /^Retort crates in use/ });
    expect(await table.innerText()).toContain('Retort crates');
    await table
      .getByRole('row', { name: /Retort crates/ })
      .getByRole('button')
      .click();
    await crates.focus();
    await page.keyboard.press('ArrowRight');
    expect(await crates.getAttribute('aria-valuetext')).toMatch(/^\w{3} \d\d:\d\d: \d+ of 48 crates$/);
    expect(await page.getByTestId('who-draws').innerText()).toContain('of 48 crates');
  });

  it('stand in the detail of what uses them', async () => {
    const { page } = petra;
    await page.getByRole('button', { name: /^A05-1 / }).click();
    expect(await page.getByRole('region', { name: 'Selected' }).innerText()).toMatch(/crates, \d\d:\d\d to \d\d:\d\d/);
  });
});

describe('the page of early and late starts', () => {
  it('lets the utilities lead set a unit’s, refuses what is none, and reaches open boards', async () => {
    const ulla = await visit('utilities');
    const { page } = ulla;
    await page.goto(`${app.url}/plant/spread`);
    await page.getByRole('button', { name: /^Retort 1/ }).click();
    await page.getByRole('heading', { name: 'Retort 1' }).waitFor();
    const late = page.getByLabel('Late by up to');
    await late.fill('300');
    await page.getByRole('button', { name: 'Save' }).click();
    await page.getByText('It must be 0 to 240 min.').waitFor();
    expect(await page.getByTestId('spread-now').innerText()).toContain('3 min early to 8 min late');

    const before = await pathOf(petra.page, 'confident');
    await late.fill('20');
    await page.getByRole('button', { name: 'Save' }).click();
    await expect
      .poll(() => page.getByTestId('spread-now').innerText())
      .toContain('3 min early to 20 min late, experience');
    await changed(petra.page, 'confident', before);
    expect(ulla.troubles).toEqual([]);
  });

  it('is for reading to a supervisor, and says who may change it', async () => {
    const sam = await visit('supervisor');
    await sam.page.goto(`${app.url}/plant/spread`);
    await sam.page.getByRole('heading', { name: 'Early and late starts' }).waitFor();
    expect(await sam.page.getByRole('button', { name: 'Save' }).count()).toBe(0);
    await sam.page.getByText(/Only a planner or utilities lead or administrator/).waitFor();
    expect(sam.troubles).toEqual([]);
  });
});

it('no page of these has reported a trouble', () => expect(petra.troubles).toEqual([]));

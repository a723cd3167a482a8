import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser, type Visitor } from '../support/browser';
import { mainHeaderState, signIn } from './people';

const WEEK = '2026-11-30';
/** Monday, before the first shift of the demo week. */
const MONDAY_EARLY = '2026-11-30T05:50:00Z';
/** The first retort load of line A stands in its retort. */
const FIRST_LOAD = '2026-11-30T07:38:00Z';

let app: TestApp;
let browser: Browser;

beforeAll(async () => {
  app = await startApp(MONDAY_EARLY);
  browser = await launchBrowser();
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

const textOf = (page: Page): Promise<string> => mainHeaderState(page).innerText();

/** Waits until the board says something else of the main header; returns how long that took. [ms] */
async function untilStateMatches(page: Page, pattern: RegExp, timeout: number): Promise<number> {
  const from = performance.now();
  await mainHeaderState(page).filter({ hasText: pattern }).waitFor({ timeout });
  return performance.now() - from;
}

async function moveWithKeys(page: Page): Promise<void> {
  const load = page.getByRole('button', { name: /^A01-1 / });
  await load.focus();
  await page.keyboard.press('Enter');
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('Enter');
  await page.getByRole('button', { name: /^A01-1 .*06:55/ }).waitFor();
  await page.getByRole('button', { name: 'Undo' }).and(page.locator(':enabled')).waitFor();
}

async function level(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Level this week…' }).click();
  await page.getByLabel('Look for').selectOption('5');
  await page.getByRole('button', { name: 'Look for moves' }).click();
  await page.getByRole('button', { name: /^Accept all/ }).click({ timeout: 90_000 });
  await untilStateMatches(page, /^under the limit$/, 30_000);
}

async function lowerTheLimit(page: Page): Promise<void> {
  await page.goto(`${app.url}/capacity/${WEEK}`);
  await page.getByRole('button', { name: 'Steam limit…' }).click();
  await page.getByRole('combobox', { name: 'From' }).selectOption({ index: 0 });
  await page.getByLabel('From, time').fill('08:00');
  await page.getByLabel('To, time').fill('20:00');
  await page.getByRole('textbox', { name: 'Steam limit' }).fill('2200');
  await page.getByLabel('Why').fill('Boiler 2 on half load, trial');
  await page.getByRole('button', { name: /^Set the limit to/ }).click();
}

async function agree(page: Page): Promise<void> {
  await page.goto(`${app.url}/week/${WEEK}`);
  await page.getByRole('button', { name: 'Agree to this week’s steam…' }).click();
  await page.getByLabel('Why this is all right').fill('Boiler 1 carries it for those minutes');
  await page.getByRole('button', { name: 'Agree to this', exact: true }).click();
}

async function putOnTheFloor(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Put on the floor…' }).click();
  await page.getByLabel('What is new, for those on the floor').fill('Levelled; three loads moved');
  await page.getByRole('button', { name: 'Put on the floor', exact: true }).click();
  await page
    .getByTestId('issue-state')
    .filter({ hasText: /issue 1, on the floor since/ })
    .waitFor();
}

async function recordSteamOn(page: Page): Promise<void> {
  await page.goto(`${app.url}/shift/${WEEK}?line=demo-line-a&shift=demo-early&date=${WEEK}`);
  const card = page.getByRole('listitem', { name: /^Retort \d, A01-1$/ });
  await card.getByRole('button', { name: 'Steam on' }).click();
  await card.getByRole('button', { name: 'Vents closed' }).waitFor();
}

describe('the whole job, as the people concerned', () => {
  it('plans, levels, lowers the limit, agrees, issues and turns steam on', { timeout: 300_000 }, async () => {
    const visitors: Visitor[] = [];
    const join = async (key: string, options = {}): Promise<Page> => {
      const visitor = await signIn(browser, app.url, key, options);
      visitors.push(visitor);
      return visitor.page;
    };

    const planner = await join('planner', { viewport: { width: 1440, height: 900 } });
    await planner.goto(`${app.url}/week/${WEEK}`);
    await mainHeaderState(planner).waitFor();
    expect(await textOf(planner)).toMatch(/\d\skg$/);
    await moveWithKeys(planner);
    await level(planner);

    const utilities = await join('utilities');
    await lowerTheLimit(utilities);
    await utilities.getByText('In force, and told to the planners').waitFor();
    const seenAfterMs = await untilStateMatches(planner, /\skg$/, 10_000);
    console.log(
      `the planner's open board showed the new limit ${Math.round(seenAfterMs)} ms after the desk had saved it`,
    );

    await planner.getByRole('button', { name: 'Put on the floor…' }).click();
    expect(await planner.getByRole('button', { name: 'Put on the floor', exact: true }).count()).toBe(0);
    await planner.keyboard.press('Escape');
    await agree(utilities);
    await planner.getByTestId('issue-state').filter({ hasText: 'steam agreed to by Ulla Marsh' }).waitFor();
    await putOnTheFloor(planner);

    expect(visitors.flatMap((visitor) => visitor.troubles)).toEqual([]);

    // The restart cuts the open pages' connections; only what comes after a new page is loaded counts.
    await app.setClock(FIRST_LOAD);
    const supervisor = await join('supervisor', { viewport: { width: 390, height: 844 } });
    await recordSteamOn(supervisor);
    await planner.reload();
    await planner.locator('[data-activity$="a01-1"] .batch-event').first().waitFor({ state: 'attached' });

    expect(visitors.at(-1)?.troubles).toEqual([]);
  });
});

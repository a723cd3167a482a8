/** An order typed in the browser, split, and found again among what waits for a place on the board. */
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser, type Visitor } from '../support/browser';
import { signIn } from './people';

/** Monday, before the first shift of the demo week. */
const MONDAY_EARLY = '2026-11-30T05:50:00Z';

let app: TestApp;
let browser: Browser;
let visitor: Visitor;
let page: Page;

beforeAll(async () => {
  app = await startApp(MONDAY_EARLY);
  browser = await launchBrowser();
  visitor = await signIn(browser, app.url, 'planner');
  page = visitor.page;
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

const form = () => page.getByRole('form', { name: 'New order' });
const field = (label: string) => form().getByLabel(label, { exact: true });
const rows = () => page.locator('tr[data-order]');
const add = () => form().getByRole('button', { name: 'Add the order' }).click();

describe('an order', () => {
  it('is refused while something is missing, and saved when nothing is', async () => {
    await page.goto(`${app.url}/orders`);
    await page.getByRole('button', { name: 'New order' }).click();
    await field('Order').fill('4711');
    await add();
    await form().getByText('Choose a product.').waitFor();
    await form().getByText('Say when it is due.').waitFor();
    await field('Product').selectOption({ label: 'Lentil soup 400 g' });
    await field('Quantity').fill('400');
    await field('Due').fill('2026-12-04T14:00');
    await add();
    await page.getByText('4711 is saved.').waitFor();
    await page.getByLabel('Search').fill('4711');
    await expect.poll(() => rows().count()).toBe(1);
    expect(await rows().innerText()).toContain('not planned');
  });

  it('is split by what is offered, and waits in its week for a place', async () => {
    await page.getByRole('button', { name: 'Split 4711' }).click();
    const dialog = page.getByRole('dialog');
    await dialog.getByText('The pace is set by: cooking').waitFor();
    await dialog.getByRole('radio', { name: /Full loads, and the rest as a part load/ }).check();
    await dialog.getByRole('button', { name: 'Add to the week' }).click();
    await page.getByText(/13 runs, batches and loads are in the week/).waitFor();
    await expect.poll(() => rows().innerText()).toContain('planned, 0 of 13 placed');
    await rows().getByRole('link', { name: 'week' }).click();
    const waiting = page.getByRole('region', { name: 'Not yet placed' });
    for (const code of ['4711K1', '4711K6', '4711F', '4711-1', '4711-6']) {
      await waiting.getByText(code, { exact: true }).first().waitFor();
    }
  });

  it('is taken back while nothing of it is placed', async () => {
    await page.goto(`${app.url}/orders`);
    await page.getByLabel('Search').fill('4711');
    await page.getByRole('button', { name: 'Split 4711' }).click();
    await page.getByRole('button', { name: 'Take it back' }).click();
    await page.getByText('4711 is taken back out of the week.').waitFor();
    await expect.poll(() => rows().innerText()).toContain('not planned');
  });
});

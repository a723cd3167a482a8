/** A duty entered in the browser: absurd figures first, then sound ones, with the demand beside them as they are typed. */
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
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
  visitor = await signIn(browser, app.url, 'utilities');
  page = visitor.page;
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});
beforeEach(() => page.goto(`${app.url}/duties/new`));

const field = (label: string) => page.getByLabel(label, { exact: true });
const save = () => page.getByRole('button', { name: 'Save the duty' }).click();
const drawn = () => page.getByRole('region', { name: 'Steam that it draws' });
const faultAt = async (label: string): Promise<string> => {
  const input = field(label);
  expect(await input.getAttribute('aria-invalid')).toBe('true');
  return page.locator(`[id="${await input.getAttribute('aria-describedby')}"]`).innerText();
};
const dutiesSaved = async (): Promise<string[]> => {
  const response = await visitor.context.request.get(`${app.url}/api/duties`);
  return ((await response.json()) as { duties: { name: string }[] }).duties.map(({ name }) => name);
};

async function enterBlancher(name: string): Promise<void> {
  await page.getByLabel('Kind of duty').selectOption('steamBlancher');
  await field('Name').fill(name);
  await field('Product rate').fill('3600');
  await field('Run').fill('120');
  await page.getByLabel('Take over from a product').selectOption({ label: 'Carrot dice 425 g' });
}

describe('the form of a duty', () => {
  it('asks for a blancher’s escape, warns when it is little, and draws the demand as it is typed', async () => {
    await enterBlancher('Carrots, a trial');
    await drawn().getByText('One figure is still missing or out of range.').waitFor();
    await save();
    expect(await faultAt('Share escaping at the ends')).toContain('is not entered; it must be 0 to 0.95');
    await field('Share escaping at the ends').fill('0.25');
    await drawn().getByText('615 kg/h', { exact: false }).first().waitFor();
    await drawn()
      .getByText(/less than the 0\.30 to 0\.40 kg\/kg/)
      .waitFor();
    await field('Share escaping at the ends').fill('0.6');
    await drawn()
      .getByText(/less than the 0\.30/)
      .waitFor({ state: 'detached' });
    await save();
    await page.waitForURL('**/duties');
    expect(await dutiesSaved()).toContain('Carrots, a trial');
  });

  it('says at each field what is absurd, all at once, and saves nothing', async () => {
    await enterBlancher('Nothing like it');
    await field('Share escaping at the ends').fill('1.4');
    await field('Steel').fill('-850');
    await field('Run').fill('a while');
    await save();
    expect(await faultAt('Share escaping at the ends')).toContain('is 1.4; it must be 0 to 0.95');
    expect(await faultAt('Steel')).toContain('is -850 kg; it must be 0 to 20000 kg');
    expect(await faultAt('Run')).toContain('read as a figure');
    expect(await dutiesSaved()).not.toContain('Nothing like it');
  });

  it('says that a jacket is colder than the product', async () => {
    await page.getByLabel('Kind of duty').selectOption('jacketedKettle');
    await field('Name').fill('A cold jacket');
    await field('Batch').fill('900');
    await page.getByLabel('Take over from a product').selectOption({ label: 'Lentil soup 400 g' });
    await field('Jacket pressure').fill('0');
    await drawn()
      .getByText(/Raise the jacket pressure/)
      .waitFor();
    await save();
    expect(await faultAt('Jacket pressure')).toContain('Raise the jacket pressure');
    expect(await dutiesSaved()).not.toContain('A cold jacket');
  });

  it('opens the working as typed, and a stored thermal process with its caution', async () => {
    await page.goto(`${app.url}/duties/demo-sweetcorn-retort`);
    await page.getByText('come from the process authority').first().waitFor();
    await page.getByText('Show the working as typed').click();
    await drawn().getByText('Steam condensed', { exact: false }).first().waitFor();
    await field('Process temperature').fill('119');
    await drawn().getByText('Process temperature is 119 °C here and 121.1 °C in the process data.').waitFor();
  });

  it('stays shut to those who may only read', async () => {
    const reader = await signIn(browser, app.url, 'supervisor');
    await reader.page.goto(`${app.url}/duties/demo-sweetcorn-retort`);
    await reader.page.getByText(/^Only a planner or utilities lead or administrator/).waitFor();
    expect(await reader.page.getByRole('button', { name: 'Save the duty' }).count()).toBe(0);
    await reader.context.close();
  });
});

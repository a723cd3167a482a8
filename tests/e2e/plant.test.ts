import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser } from '../support/browser';
import { signIn } from './people';

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

const follows = (page: Page) => page.getByTestId('follows');
const fact = async (page: Page, name: RegExp): Promise<string> =>
  follows(page).getByText(name).locator('xpath=following-sibling::dd').innerText();
const fill = async (page: Page, values: Readonly<Record<string, string>>): Promise<void> => {
  for (const [label, value] of Object.entries(values)) await page.getByLabel(label, { exact: true }).fill(value);
};

describe('the plant’s library', () => {
  it('takes a header and its boiler, shows what follows as typed, and leads to the capacity page', async () => {
    const { page, troubles } = await signIn(browser, app.url, 'utilities', { viewport: { width: 1440, height: 900 } });
    await page.goto(`${app.url}/plant/headers`);
    await page.getByRole('button', { name: 'Add a header' }).click();
    await fill(page, { Name: 'Hot header', 'Header pressure': '230', 'Dryness fraction': '1.2' });
    await page.getByRole('button', { name: 'Add the header' }).click();
    await page.getByText('Header pressure is 230 bar g; it must be 0 to 60 bar g.').waitFor();
    await page.getByText('Dryness fraction is 1.2; it must be 0.5 to 1.').waitFor();
    expect(await page.getByRole('row').count()).toBe(3);

    await fill(page, { 'Header pressure': '9', 'Dryness fraction': '1' });
    await expect.poll(() => fact(page, /^Temperature/)).toMatch(/^179\.9/);
    await page.getByRole('button', { name: 'Add the header' }).click();
    await page.getByText('Hot header is saved.').waitFor();

    await page.getByRole('navigation', { name: 'Parts of the plant' }).getByText('Boilers').click();
    await page.getByRole('button', { name: 'Add a boiler' }).click();
    await page.getByLabel('Feeds').selectOption({ label: 'Hot header' });
    await fill(page, {
      Name: 'Boiler 3',
      'Boiler pressure': '8',
      'Water in the boiler': '6',
      'Condensate return': '0.5',
    });
    await fill(page, { 'Rating from and at 100 °C': '3000' });
    const low = await fact(page, /^Net export/);
    await page.getByRole('button', { name: 'Add the boiler' }).click();
    await page.getByText('Boiler pressure is 8 bar g; it must be at least 9 bar g (Hot header).').waitFor();
    await fill(page, { 'Boiler pressure': '10', 'Rating from and at 100 °C': '4000' });
    await expect.poll(() => fact(page, /^Net export/)).not.toBe(low);
    const net = await fact(page, /^Net export/);
    await page.getByRole('button', { name: 'Add the boiler' }).click();
    await page.getByText('Boiler 3 is saved.').waitFor();
    expect(await page.getByRole('row', { name: /Boiler 3/ }).innerText()).toContain(net);

    await page.goto(`${app.url}/capacity/2026-11-30`);
    await page.getByRole('button', { name: /^Hot header/ }).click();
    await page.getByText('Boiler 3').first().waitFor();
    expect(troubles).toEqual([]);
  });

  it('says what still uses a header that somebody wants to retire', async () => {
    const { page } = await signIn(browser, app.url, 'admin', { viewport: { width: 1280, height: 900 } });
    await page.goto(`${app.url}/plant/headers?id=demo-kettles`);
    await page.getByRole('button', { name: 'Retire…' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Retire', exact: true }).click();
    await page.getByRole('dialog').getByText('Kettle 1').waitFor();
  });

  it('shows a supervisor the forms to be read', async () => {
    const { page, troubles } = await signIn(browser, app.url, 'supervisor');
    await page.goto(`${app.url}/plant/boilers?id=demo-boiler-1`);
    await follows(page).waitFor();
    expect(await page.getByLabel('Name', { exact: true }).isDisabled()).toBe(true);
    expect(await page.getByRole('button', { name: /^(Save|Add|Retire)/ }).count()).toBe(0);
    expect(troubles).toEqual([]);
  });
});

describe('practice rules', () => {
  it('are entered by one person and released by the quality lead', async () => {
    const lead = await signIn(browser, app.url, 'utilities', { viewport: { width: 1440, height: 900 } });
    await lead.page.goto(`${app.url}/plant/practice`);
    await lead.page.getByRole('button', { name: /^Enter: vents/ }).click();
    await lead.page.getByLabel('Vent group', { exact: true }).selectOption({ label: 'North manifold' });
    await fill(lead.page, {
      'Vents at once': '0',
      'Steam ons at once': '1',
      'Length of a steam on': '1',
      'Margin after a vent': '2',
    });
    await lead.page.getByRole('button', { name: 'Enter the rule' }).click();
    await lead.page.getByText('Vents at once is 0; it must be 1 to 40.').waitFor();
    await fill(lead.page, { 'Vents at once': '1' });
    await lead.page.getByRole('button', { name: /^It is common practice/ }).click();
    await lead.page.getByRole('button', { name: 'Enter the rule' }).click();
    await lead.page.getByText(/^The rule is entered/).waitFor();

    const quality = await signIn(browser, app.url, 'quality', { viewport: { width: 1440, height: 900 } });
    await quality.page.goto(`${app.url}/plant/practice`);
    await quality.page.getByRole('button', { name: 'Release North manifold' }).click();
    await quality.page.getByRole('dialog').getByRole('button', { name: 'Release', exact: true }).click();
    const inForce = quality.page.getByRole('region', { name: 'In force', exact: true });
    await inForce.getByText('Source: common practice, no source').waitFor();
    await quality.page.goto(`${app.url}/plant/vent-groups?id=demo-vents-north`);
    expect(await fact(quality.page, /^Margin after a vent/)).toBe('2 min');
    expect([...lead.troubles, ...quality.troubles]).toEqual([]);
  });
});

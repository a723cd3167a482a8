import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { firstRunCode } from '../../scripts/support/data';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser, openVisitor } from '../support/browser';
import { createTestDatabase } from '../support/database';

let app: TestApp;
let browser: Browser;

beforeAll(async () => {
  app = await startApp('2026-11-30T05:50:00Z', {}, createTestDatabase);
  browser = await launchBrowser();
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

describe('an installation without people', () => {
  it('is set up with the code that the start command prints, once', async () => {
    const code = await firstRunCode(app.databaseUrl);
    const { page, troubles } = await openVisitor(browser, { timezoneId: 'Europe/Dublin' });
    await page.goto(app.url);
    await page.waitForURL(/\/first-run/);
    expect(await page.getByLabel('Time zone').inputValue()).toBe('Europe/Dublin');
    await page.getByLabel('Code').fill('AAAA-AAAA-AAAA-AAAA');
    await page.getByLabel('Plant').fill('Moss Bank Cannery');
    await page.getByLabel('First and last name').fill('Una Brook');
    await page.getByLabel('E-mail address').fill('una@mossbank.example');
    await page.getByLabel('Password').fill('una brook 1');
    const make = page.getByRole('button', { name: 'Make the plant and sign in' });
    await make.click();
    await page.getByText('At least 12 characters', { exact: false }).first().waitFor();
    await page.getByLabel('Password').fill('nine retorts by noon');
    await make.click();
    await page.getByText('not the code that the start command printed', { exact: false }).waitFor();
    await page.getByLabel('Code').fill(code.toLowerCase());
    await make.click();
    await page.getByRole('button', { name: 'Una Brook' }).waitFor();

    await page.goto(`${app.url}/people`);
    await page.getByRole('heading', { name: 'People of Moss Bank Cannery' }).waitFor();
    await page.getByRole('rowheader', { name: /Una Brook/ }).waitFor();
    expect(await firstRunCode(app.databaseUrl)).toBe('');
    const late = await (await openVisitor(browser)).page.goto(`${app.url}/first-run`);
    expect(late?.status()).toBe(404);
    expect(troubles.filter((trouble) => !trouble.includes('400'))).toEqual([]);
  });

  it('keeps no mail to be read where no mail server of the start command runs', async () => {
    const { page } = await openVisitor(browser);
    await page.goto(`${app.url}/sign-in`);
    await page.getByLabel('E-mail address').fill('una@mossbank.example');
    await page.getByLabel('Password').fill('nine retorts by noon');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByRole('button', { name: 'Una Brook' }).waitFor();
    const answer = await page.goto(`${app.url}/mail`);
    expect(answer?.status()).toBe(404);
    await page.getByText('Messages go out through the mail server', { exact: false }).waitFor();
  });
});

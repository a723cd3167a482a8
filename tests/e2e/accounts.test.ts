import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser, openVisitor, type Visitor } from '../support/browser';
import { openMailbox } from '../support/ownMail';
import { signIn } from './people';

const NORA = { email: 'nora@tarnhollow.example', name: 'Nora Birch', password: 'nine retorts by noon' };
const NEW_PASSWORD = 'eleven kettles after rain';

let mailbox: Awaited<ReturnType<typeof openMailbox>>;
let app: TestApp;
let browser: Browser;
let admin: Visitor;

beforeAll(async () => {
  mailbox = await openMailbox();
  app = await startApp('2026-11-30T05:50:00Z', mailbox.env);
  browser = await launchBrowser();
  admin = await signIn(browser, app.url, 'admin', { viewport: { width: 1440, height: 900 } });
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
  await mailbox?.close();
});

/** The link in the newest message of a subject, as an administrator reads it at /mail. */
async function linkIn(subject: RegExp): Promise<string> {
  const { page } = admin;
  const message = page.getByRole('link', { name: subject }).first();
  await expect
    .poll(
      async () => {
        await page.goto(`${app.url}/mail`);
        return message.count();
      },
      { timeout: 30_000, interval: 500 },
    )
    .toBeGreaterThan(0);
  await message.click();
  const link = page.locator('main a[href*="/invitation/"], main a[href*="/reset/"]').first();
  return (await link.getAttribute('href')) ?? '';
}

async function fillSignIn(page: Page, email: string, password: string): Promise<void> {
  await page.goto(`${app.url}/sign-in`);
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
}

const signedInAs = (page: Page, name: string) => page.getByRole('button', { name }).waitFor();

describe('an invitation', () => {
  it('is refused at the field where it can’t be right, then sent', async () => {
    const { page } = admin;
    await page.goto(`${app.url}/people`);
    await page.getByRole('button', { name: 'Invite somebody…' }).click();
    const dialog = page.getByRole('dialog');
    await dialog.getByLabel('E-mail address').fill('nora');
    await dialog.getByRole('button', { name: 'Send the invitation' }).click();
    await dialog.getByText('Enter an e-mail address').waitFor();
    await dialog.getByText('Choose at least one role.').waitFor();
    await dialog.getByLabel('E-mail address').fill('planner@tarnhollow.example');
    await dialog.getByRole('checkbox', { name: /line supervisor/i }).check();
    await dialog.getByRole('button', { name: 'Send the invitation' }).click();
    await dialog.getByText('Petra Vale works here already.', { exact: false }).first().waitFor();
    await dialog.getByLabel('E-mail address').fill(NORA.email);
    await dialog.getByRole('button', { name: 'Send the invitation' }).click();
    await page.getByText(`An invitation goes to ${NORA.email}.`).waitFor();
    await page.getByRole('region', { name: 'Invited' }).getByText(NORA.email).waitFor();
  });

  it('is opened from the mailbox; a weak password is refused, a good one signs in', async () => {
    const link = await linkIn(/invites you to Tarn Hollow Kitchens/);
    const nora = await openVisitor(browser);
    const { page } = nora;
    await page.goto(link);
    await page.getByRole('heading', { name: 'Work at Tarn Hollow Kitchens' }).waitFor();
    await page.getByText(NORA.email).waitFor();
    await page.getByLabel('First and last name').fill(NORA.name);
    for (const [password, sentence] of [
      ['short', 'At least 12 characters'],
      ['Passw0rd2026!', 'among the first to be tried'],
      ['nora birch nora', 'your own name'],
    ] as const) {
      await page.getByLabel('Password').fill(password);
      await page.getByRole('button', { name: 'Join and sign in' }).click();
      await page.getByText(sentence, { exact: false }).first().waitFor();
    }
    await page.getByLabel('Password').fill(NORA.password);
    await page.getByRole('button', { name: 'Join and sign in' }).click();
    await page.waitForURL(/\/shift\//);
    await signedInAs(page, NORA.name);
    expect(nora.troubles.filter((trouble) => !trouble.includes('400'))).toEqual([]);

    await page.goto(link);
    await page.getByText('has been used', { exact: false }).waitFor();
    await admin.page.goto(`${app.url}/people`);
    await admin.page.getByRole('rowheader', { name: /Nora Birch/ }).waitFor();
    expect(await admin.page.getByRole('region', { name: 'Invited' }).count()).toBe(0);
  });
});

describe('a forgotten password', () => {
  it('is set by the link; what was signed in elsewhere is out', async () => {
    const elsewhere = await openVisitor(browser);
    await fillSignIn(elsewhere.page, NORA.email, NORA.password);
    await signedInAs(elsewhere.page, NORA.name);

    const { page } = await openVisitor(browser);
    await page.goto(`${app.url}/sign-in`);
    await page.getByRole('link', { name: 'Password forgotten?' }).click();
    await page.getByLabel('E-mail address').fill('somebody-else@tarnhollow.example');
    await page.getByRole('button', { name: 'Send the link' }).click();
    const said = page.getByText('If the address has an account', { exact: false });
    await said.waitFor();
    await page.goto(`${app.url}/reset`);
    await page.getByLabel('E-mail address').fill(NORA.email);
    await page.getByRole('button', { name: 'Send the link' }).click();
    await said.waitFor();

    await page.goto(await linkIn(/^Set a new password/));
    await page.getByLabel('New password').fill(NEW_PASSWORD);
    await page.getByRole('button', { name: 'Set it and sign in' }).click();
    await signedInAs(page, NORA.name);
    await elsewhere.page.goto(`${app.url}/shift`);
    await elsewhere.page.waitForURL(/\/sign-in/);
    await fillSignIn(elsewhere.page, NORA.email, NORA.password);
    await elsewhere.page.getByText('do not belong together', { exact: false }).waitFor();
  });
});

describe('a tablet on the floor', () => {
  it('is enrolled, signs in by badge and PIN, and out by its button', async () => {
    const { page } = admin;
    await page.goto(`${app.url}/people`);
    await page.getByRole('button', { name: `Change ${NORA.name}` }).click();
    const badge = page.getByRole('region', { name: 'Badge' });
    await badge.getByLabel('Badge number').fill('417');
    await badge.getByLabel('PIN').fill('1234');
    await badge.getByRole('button', { name: 'Give the badge' }).click();
    await badge.getByText('counts up or down', { exact: false }).first().waitFor();
    await badge.getByLabel('PIN').fill('8351');
    await badge.getByRole('button', { name: 'Give the badge' }).click();
    await page.getByRole('button', { name: 'Take the badge away' }).waitFor();

    const tablet = await signIn(browser, app.url, 'admin', { viewport: { width: 820, height: 1180 }, hasTouch: true });
    await tablet.page.goto(`${app.url}/tablet`);
    await tablet.page.getByLabel('Name of the tablet').fill('Retort bay, left');
    await tablet.page.getByRole('button', { name: 'Enrol this device' }).click();
    const press = async (digits: string, then: string): Promise<void> => {
      for (const digit of digits) await tablet.page.getByRole('button', { name: digit, exact: true }).tap();
      await tablet.page.getByRole('button', { name: then, exact: true }).tap();
    };
    await tablet.page.getByRole('heading', { name: 'Badge number' }).waitFor();
    await press('417', 'Next');
    await press('9999', 'Sign in');
    await tablet.page.getByRole('alert').getByText('do not belong together', { exact: false }).waitFor();
    await press('417', 'Next');
    await press('8351', 'Sign in');
    await tablet.page.waitForURL(/\/shift\//);
    await tablet.page.getByText(NORA.name).first().waitFor();
    await tablet.page.goto(`${app.url}/people/me`);
    await tablet.page.waitForURL(/\/shift\//);
    await tablet.page.getByRole('button', { name: 'Sign out' }).tap();
    await tablet.page.getByRole('heading', { name: 'Badge number' }).waitFor();
    await tablet.page.goto(`${app.url}/week`);
    await tablet.page.waitForURL(/\/tablet/);
    expect(tablet.troubles.filter((trouble) => !trouble.includes('401'))).toEqual([]);
  });
});

describe('somebody made inactive', () => {
  it('is out at once', async () => {
    const nora = await openVisitor(browser);
    await fillSignIn(nora.page, NORA.email, NEW_PASSWORD);
    await signedInAs(nora.page, NORA.name);
    const { page } = admin;
    await page.goto(`${app.url}/people`);
    await page.getByRole('button', { name: `Change ${NORA.name}` }).click();
    await page.getByRole('button', { name: 'Deactivate' }).click();
    await page.getByText('can’t sign in here', { exact: false }).waitFor();
    await nora.page.goto(`${app.url}/shift`);
    await nora.page.waitForURL(/\/sign-in/);
    await page.getByRole('button', { name: 'Close' }).click();
    await page.getByRole('button', { name: 'Change Ada Reed' }).click();
    await page.getByRole('button', { name: 'Deactivate' }).click();
    await page.getByText('last administrator', { exact: false }).waitFor();
    expect(admin.troubles.filter((trouble) => !/40[09]/.test(trouble))).toEqual([]);
  });

  it('and others than administrators see neither people nor mail', async () => {
    const planner = await signIn(browser, app.url, 'planner');
    for (const path of ['/people', '/mail']) {
      const response = await planner.page.goto(`${app.url}${path}`);
      expect(response?.status()).toBe(403);
      await planner.page.getByText(/Only a.* administrator of/).waitFor();
    }
  });
});

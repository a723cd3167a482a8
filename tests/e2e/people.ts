import type { Browser, BrowserContextOptions, Page } from 'playwright-core';
import { DEMO_PASSWORD } from '@/server/demo/people';
import { openVisitor, type Visitor } from '../support/browser';

/** A demo person's window, signed in. */
export async function signIn(
  browser: Browser,
  url: string,
  key: string,
  options: BrowserContextOptions = {},
): Promise<Visitor> {
  const visitor = await openVisitor(browser, options);
  const { page } = visitor;
  await page.goto(`${url}/sign-in`);
  await page.getByLabel('E-mail address').fill(`${key}@tarnhollow.example`);
  await page.getByLabel('Password').fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((address) => !address.pathname.startsWith('/sign-in'));
  return visitor;
}

/** What the board says of the main header: 'under the limit', or the kg over it. */
export const mainHeaderState = (page: Page) => page.getByTestId('over-demo-main');

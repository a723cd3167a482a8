import { type Browser, type BrowserContext, type BrowserContextOptions, type Page, chromium } from 'playwright-core';
import { findChromium } from '../../scripts/support/chromium';

/** No request may leave for the browser's maker, and no sandbox exists for root in a container. */
const FLAGS = [
  '--headless',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Starts Chromium. Close it when the test file ends. */
export async function launchBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: await findChromium(), args: FLAGS });
}

/** One person's window: a context of its own, and everything that went wrong in it. */
export interface Visitor {
  readonly context: BrowserContext;
  readonly page: Page;
  /** Errors of scripts, refused resources (content security policy included) and failed requests, in order. */
  readonly troubles: readonly string[];
}

/** Opens a window for a person. Times on the page are formatted for `timezoneId`, which tests set on purpose. */
export async function openVisitor(browser: Browser, options: BrowserContextOptions = {}): Promise<Visitor> {
  const context = await browser.newContext({
    viewport: { width: 1280, height: 800 },
    locale: 'en-GB',
    timezoneId: 'UTC',
    ...options,
  });
  const page = await context.newPage();
  const troubles: string[] = [];
  page.on('pageerror', (error) => troubles.push(`error: ${error.message}`));
  page.on('console', (message) => {
    if (message.type() === 'error') troubles.push(`console: ${message.text()}`);
  });
  page.on('response', (response) => {
    if (response.status() >= 500) troubles.push(`${response.status()}: ${response.url()}`);
  });
  return { context, page, troubles };
}

import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser } from '../support/browser';
import { mainHeaderState, signIn } from './people';

const WEEK = '2026-11-30';
/** Units that nobody may meet who reads US customary ones. */
const SI = /\d[\s\u2009\u00a0]*(kg\/h|t\/h|bar [ga]\b|bar\b|°C|kW\b|kJ)|\bkg\/h\b/g;

let app: TestApp;
let browser: Browser;

beforeAll(async () => {
  app = await startApp('2026-12-01T08:10:00Z');
  browser = await launchBrowser();
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

/** All that a page says to eyes and ears, without the formulas of a working. */
async function said(page: Page): Promise<string> {
  return page.locator('main').evaluate((main) => {
    const formulas = new Set(main.querySelectorAll('li.keep-together'));
    const isFormula = (element: Element | null): boolean => {
      for (let e = element; e; e = e.parentElement) if (formulas.has(e)) return true;
      return false;
    };
    const texts: string[] = [];
    const walker = document.createTreeWalker(main, NodeFilter.SHOW_TEXT);
    while (walker.nextNode()) {
      if (!isFormula(walker.currentNode.parentElement)) texts.push(walker.currentNode.textContent ?? '');
    }
    const spoken = [...main.querySelectorAll('[aria-label],[aria-valuetext],[title]')].filter((e) => !isFormula(e));
    const attributes = spoken.flatMap((e) => ['aria-label', 'aria-valuetext', 'title'].map((a) => e.getAttribute(a)));
    return [texts.join(' '), ...attributes].join('\n');
  });
}

async function choose(page: Page, units: string | RegExp): Promise<void> {
  await page.goto(`${app.url}/settings`);
  const choice = page.getByLabel('Units', { exact: true });
  const option = choice.locator('option').filter({ hasText: units });
  await choice.selectOption(await option.first().getAttribute('value'));
  await page.getByRole('button', { name: 'Keep these' }).click();
  await page.getByText('Kept.').waitFor();
}

/** A retort's and a kettle's load of the week. */
async function loadsOf(page: Page): Promise<string[]> {
  const week = (await (await page.request.get(`${app.url}/api/weeks/${WEEK}`)).json()) as {
    week: { activities: { id: string; stage: string | null }[] };
  };
  const first = (stage: string) => week.week.activities.find((activity) => activity.stage === stage)?.id;
  return [first('retort'), first('cook')].filter((id) => id !== undefined);
}

describe('a person who reads US customary units', () => {
  it('meets no SI unit on board, capacity, shift, process data and working but in formulas', async () => {
    const { page, troubles } = await signIn(browser, app.url, 'planner');
    await choose(page, /^US customary/);

    await page.goto(`${app.url}/week/${WEEK}`);
    await mainHeaderState(page).waitFor();
    const strip = page.getByRole('slider', { name: /minute of the week/ }).first();
    await strip.focus();
    await page.keyboard.press('ArrowRight');
    await page.getByTestId('who-draws').waitFor();
    const board = await said(page);
    expect(board.match(SI)).toBeNull();
    expect(board).toMatch(/psig/);
    expect(board).toMatch(/limit [\d\u2009]+\u00a0lb\/h/);

    await page.goto(`${app.url}/capacity/${WEEK}`);
    await page.getByText('Peak of the plan').waitFor();
    await page.getByRole('button', { name: 'Draw the load-duration curve' }).click();
    await page.getByText('hours of the week', { exact: true }).waitFor();
    const capacity = await said(page);
    expect(capacity.match(SI)).toBeNull();
    expect(capacity).toMatch(/lb\/h/);

    await page.goto(`${app.url}/shift/${WEEK}`);
    expect((await said(page)).match(SI)).toBeNull();

    await page.goto(`${app.url}/process-data`);
    const data = await said(page);
    expect(data.match(SI)).toBeNull();
    // 121.1 degC, as the demo's process authority gives it, is 249.98 degF.
    expect(data).toContain('249.98\u00a0°F');

    const loads = await loadsOf(page);
    expect(loads).toHaveLength(2);
    for (const id of loads) {
      await page.goto(`${app.url}/working/${encodeURIComponent(id)}`);
      const working = await said(page);
      expect(working.match(SI)).toBeNull();
      expect(working).toMatch(/psig/);
      expect(working).toMatch(/BTU/);
      await page.getByText(/stand in SI units/).waitFor();
      expect(await page.locator('li.keep-together').first().innerText()).toMatch(/kJ|kg|°C/);
    }
    expect(troubles).toEqual([]);
  });

  it('gets the page in those units from the server, and SI back when they are given up', async () => {
    const { page, troubles } = await signIn(browser, app.url, 'quality');
    const html = async () => (await page.request.get(`${app.url}/process-data`)).text();
    expect(await html()).toContain('121.1\u00a0°C');
    await choose(page, /^US customary/);
    expect(await html()).toContain('249.98\u00a0°F');
    expect(await html()).not.toContain('°C');
    await choose(page, /^As the plant/);
    expect(await html()).toContain('121.1\u00a0°C');
    expect(troubles).toEqual([]);
  });
});

describe('the plant’s settings', () => {
  it('show what an altitude means, refuse what can’t be at its field, and hold for those who chose nothing', async () => {
    const { page, troubles } = await signIn(browser, app.url, 'admin');
    await page
      .getByRole('button', { name: /Ada|admin/i })
      .first()
      .click();
    await page.getByRole('link', { name: 'Settings' }).click();
    const altitude = page.getByLabel('Altitude');
    const means = page.getByTestId('altitude-means');
    const save = page.getByRole('button', { name: 'Save the plant’s settings' });

    // ICAO Doc 7488: 0.8456 bar a at 1500 m; water boils there at 95.0 degC (IAPWS-IF97).
    await altitude.fill('1500');
    await expect.poll(() => means.innerText()).toMatch(/0\.846\u00a0bar a.* 95\u00a0°C/);

    for (const [typed, sentence] of [
      ['9000', /must be -500 to 5000 m/],
      ['1,5', /can’t be read/],
      ['', /Enter a figure/],
    ] as const) {
      await altitude.fill(typed);
      await save.click();
      await page.getByText(sentence).first().waitFor();
      expect(await altitude.evaluate((element) => element === document.activeElement)).toBe(true);
      expect(await altitude.getAttribute('aria-invalid')).toBe('true');
    }
    await page.reload();
    expect(await altitude.inputValue()).toBe('0');

    await page.getByLabel('Units of the plant').selectOption('usCustomary');
    await altitude.fill('1500');
    await save.click();
    await page.getByText('Saved, and in force for everybody.').waitFor();
    // 1500 m are 4921.26 ft.
    await expect.poll(() => altitude.inputValue()).toBe('4921.26');
    await altitude.fill('20000');
    await save.click();
    await page.getByText(/must be -1640\.\d+ to 16404\.\d* ft/).waitFor();

    const reader = await signIn(browser, app.url, 'supervisor');
    await reader.page.goto(`${app.url}/settings`);
    await reader.page.getByText(/^Only an administrator/).waitFor();
    await reader.page.getByText(/4\s921\sft/).waitFor();
    expect([...troubles, ...reader.troubles]).toEqual([]);
  });
});

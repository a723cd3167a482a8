/** Worked batches A, B and C (invented plant), entered as duties and read off their working in the browser. */
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { WeekDto } from '@/contracts/week';
import { evaluateWeek } from '@/core/pipeline';
import { startApp, type TestApp } from '../support/app';
import { launchBrowser, type Visitor } from '../support/browser';
import { blancherA, kettleB, retortC } from '../verification/dutyWorkedBatches';
import { signIn } from './people';

/** Monday, before the first shift of the demo week. */
const MONDAY_EARLY = '2026-11-30T05:50:00Z';
/** 7 bar g, dryness 0.98, as the worked batches are fed. */
const HEADER = 'demo-main';

let app: TestApp;
let browser: Browser;
let visitor: Visitor;

beforeAll(async () => {
  app = await startApp(MONDAY_EARLY);
  browser = await launchBrowser();
  visitor = await signIn(browser, app.url, 'utilities');
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

async function enter(name: string, model: string, inputs: object): Promise<string> {
  const response = await visitor.context.request.post(`${app.url}/api/duties`, {
    data: { name, tryOnHeaderId: HEADER, duty: { model, inputs } },
    headers: { origin: app.url },
  });
  expect(response.status(), await response.text()).toBe(201);
  return ((await response.json()) as { id: string }).id;
}

/** Every figure on the page, to two decimals. */
async function figuresOn(page: Page): Promise<Set<string>> {
  const text = await page.locator('article').innerText();
  const found = text.match(/\d{1,3}(?:\u2009\d{3})*(?:\.\d+)?/gu) ?? [];
  return new Set(found.map((figure) => Number(figure.replace(/\u2009/g, '')).toFixed(2)));
}

describe('the working of', () => {
  it.each([
    ['batch A, a steam blancher', 'steamBlancher', blancherA, ['614.94', '151.80', '75.00']],
    ['batch B, a jacketed kettle', 'jacketedKettle', kettleB, ['340.94', '207.45', '115.11', '7.56']],
    ['batch C, a still retort', 'stillRetort', retortC, ['1555.24', '359.23', '217.21', '119.81']],
  ])('%s, gives the figures that were worked by hand', async (name, model, inputs, expected) => {
    const { page, troubles } = visitor;
    const id = await enter(name, model, inputs);
    await page.goto(`${app.url}/duties/${id}`);
    await page.getByRole('link', { name: /working, for print/ }).click();
    await page.getByRole('heading', { name }).waitFor();
    const figures = await figuresOn(page);
    expect(expected.filter((figure) => !figures.has(figure))).toEqual([]);
    expect(troubles).toEqual([]);
  });

  it('a typed draw, names its source and its figures', async () => {
    const { page } = visitor;
    const phases = [{ kind: 'vent', minutes: 8, steamKgPerH: 2000 }];
    const id = await enter('Retort 4, by the meter', 'typed', { phases, source: 'steam meter 2, 12 November' });
    await page.goto(`${app.url}/working/duty/${id}?header=${HEADER}`);
    const text = await page.locator('article').innerText();
    expect(text).toContain('Source: steam meter 2, 12 November');
    expect(await figuresOn(page)).toContain('2000.00');
  });

  it('a batch, a cleaning that follows one and a warm-up before one, opens from the week', async () => {
    const { page, context, troubles } = visitor;
    const { week } = (await (await context.request.get(`${app.url}/api/weeks/2026-11-30`)).json()) as WeekDto;
    const { cleanings, gapDraws } = evaluateWeek(week);
    const warmUp = gapDraws.find(({ activity }) => activity.kind === 'warmUp');
    const read = async (id = ''): Promise<string> => {
      expect((await page.goto(`${app.url}/working/${encodeURIComponent(id)}`))?.status()).toBe(200);
      return page.locator('article').innerText();
    };
    expect(await read(warmUp?.runId)).toContain('The run alone');
    expect(await read(warmUp?.activity.id)).toContain('The warm-up alone');
    expect(await read(cleanings.find(({ modes }) => modes[0]?.dutyId)?.id)).toContain('Heat into the water');
    expect((await page.goto(`${app.url}/working/warm:no-such-run`))?.status()).toBe(404);
    expect(troubles.filter((trouble) => !trouble.includes('404'))).toEqual([]);
  });
});

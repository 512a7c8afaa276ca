import { HourlyYearAnswer } from '@furrowlight/shared/contract/weather';
import { Scenario } from '@furrowlight/shared/contract/scenarios';
import { runScenario } from '@furrowlight/shared/run/run-scenario';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { addCrop, drawField } from '../pages/fields';
import { ADVISOR, signIn } from '../pages/sign-in';
import { DESK, launchBrowser, openPage, PHONE, snap } from '../support/browser';
import { startProduct, type Product } from '../support/server';
import { epwFile } from '../support/weather-file';

let product: Product;
let browser: Browser;
let page: Page;
let faults: string[];

beforeAll(async () => {
  product = await startProduct();
  browser = await launchBrowser();
  ({ page, faults } = await openPage(browser, { viewport: DESK }));
  await signIn(page, product.url, ADVISOR);
});

afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

let fieldId = '';
let reviewUrl = '';
const scenarioIds: string[] = [];

/** Save a new scenario with a weather year, run it, and wait for its end; returns its id. */
async function layAndRun(name: string, weatherName: string, kind?: string): Promise<string> {
  await page.goto(`${product.url}/fields/${fieldId}/scenarios/new`);
  await page.getByLabel('Scenario name').fill(name);
  if (kind) await page.getByText(kind, { exact: true }).first().click();
  await page.getByLabel('Weather year').first().click();
  await page.getByRole('option', { name: weatherName }).click();
  await page.getByRole('button', { name: 'Work out the light budget' }).click();
  await page.getByRole('link', { name: 'Read the result' }).waitFor({ timeout: 90_000 });
  return page.url().split('/').pop() ?? '';
}

/** Ask the API with the page's own session. */
async function ask(path: string): Promise<unknown> {
  return page.evaluate(async (address) => (await fetch(address)).json() as Promise<unknown>, path);
}

describe('from an empty patch of map to the farmer', () => {
  it('draws a field and records its crop', async () => {
    fieldId = await drawField(page, product.url, 'Test Acre');
    await addCrop(page, 'Winter wheat');
    const text = await page.locator('main').innerText();
    expect(text).toMatch(/\d[.\d]* ?ha/);
    expect(text).toContain('Winter wheat');
    await snap(page, 'field');
  });

  it('puts a real weather file on the shelf', async () => {
    const file = epwFile();
    await page.goto(`${product.url}/weather?add=1`);
    await page.locator('input[type="file"]').setInputFiles({
      name: file.name,
      mimeType: 'text/plain',
      buffer: Buffer.from(file.content),
    });
    await page.getByRole('heading', { name: /EPW/ }).waitFor();
    if (file.isReal)
      expect(await page.locator('main').innerText()).toContain('offset by -0.8239 hours');
    await page.getByLabel('Name on the shelf').fill('Year under test');
    await page.getByRole('button', { name: 'Put it on the shelf' }).click();
    await page.getByRole('heading', { name: 'Year under test' }).waitFor();
  });

  it('lays rows, runs two scenarios, and shows the numbers the engine gives', async () => {
    scenarioIds.push(await layAndRun('Raised rows', 'Year under test'));
    await snap(page, 'designer');
    await page.getByRole('link', { name: 'Read the result' }).click();
    await page.getByRole('heading', { name: 'Light weave' }).waitFor();
    await snap(page, 'result');
    const scenario = Scenario.parse(await ask(`/api/scenarios/${scenarioIds[0]}`));
    const weather = HourlyYearAnswer.parse(await ask(`/api/weather/${scenario.weatherId}/year`));
    if (!scenario.frozen) throw new Error('A run scenario has frozen inputs.');
    const { site, layout, crops, options } = scenario.frozen;
    const again = runScenario({ site, layout, crops, options, weather });
    const [wheat] = again.crops;
    const shown = await page.locator('main').innerText();
    expect(shown).toContain(wheat.season.meanDli.toFixed(1));
    expect(shown.replaceAll('\u00a0', ' ')).toContain(
      `${(wheat.season.meanShare * 100).toFixed(0)} % of open field`,
    );
    const split = again.sunSplit.year;
    const parts = [
      split.electricity,
      split.panelHeat,
      split.reflected,
      split.cropPar,
      split.otherOnCrop,
    ];
    expect(parts.reduce((sum, part) => sum + part, 0)).toBeCloseTo(100, 9);
    for (const part of parts) expect(shown).toContain(part.toFixed(1));
    scenarioIds.push(await layAndRun('Upright rows', 'Year under test', 'Vertical'));
  });

  it('compares both beside the open field, season by season', async () => {
    await page.goto(`${product.url}/fields/${fieldId}/compare?ids=${scenarioIds.join(',')}`);
    await page.getByRole('heading', { name: 'Ledger of differences' }).waitFor();
    const text = await page.locator('main').innerText();
    for (const word of ['Raised rows', 'Upright rows', 'Winter', 'Summer', 'Open field']) {
      expect(text).toContain(word);
    }
    await snap(page, 'compare');
  });

  it('hands the farmer a link that opens on a phone without an account', async () => {
    await page.goto(`${product.url}/fields/${fieldId}`);
    await page.getByRole('button', { name: 'Make a review link' }).click();
    const form = page.locator('form', { has: page.getByText('What is shown') });
    for (const name of ['Raised rows', 'Upright rows']) await form.getByLabel(name).check();
    await form.getByLabel('Greeting').fill('Please look.');
    await form.getByRole('button', { name: 'Make the link' }).click();
    reviewUrl = await page.getByLabel('Review link').inputValue();
    const phone = await openPage(browser, { viewport: PHONE });
    await phone.page.goto(reviewUrl);
    await phone.page.getByText('Test Acre').first().waitFor();
    expect(phone.page.url()).not.toContain('#');
    const text = await phone.page.locator('body').innerText();
    expect(text).toContain('Winter wheat');
    expect(text).toMatch(/open field/);
    const width = await phone.page.evaluate(() => document.documentElement.scrollWidth);
    expect(width).toBeLessThanOrEqual(PHONE.width);
    await snap(phone.page, 'review');
    expect(phone.faults).toEqual([]);
    await phone.page.context().close();
  });

  it('closes the link at once when the advisor revokes it', async () => {
    await page.getByRole('button', { name: 'Done' }).click();
    await page.getByRole('button', { name: /^Revoke the link/ }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Revoke the link' }).click();
    await page
      .getByText(/revoked/i)
      .first()
      .waitFor();
    const phone = await openPage(browser, { viewport: PHONE });
    await phone.page.goto(reviewUrl);
    await phone.page
      .getByText(/no longer open/)
      .first()
      .waitFor();
    await phone.page.context().close();
  });

  it('keeps what was acknowledged when the server is killed', async () => {
    await product.crashAndRestart();
    await page.goto(`${product.url}/fields/${fieldId}`);
    await page.getByText('Raised rows').first().waitFor();
    const scenario = Scenario.parse(await ask(`/api/scenarios/${scenarioIds[0]}`));
    expect(scenario.latestRun?.status).toBe('done');
  });

  it('leaves no uncaught fault behind in the client', () => {
    expect(faults).toEqual([]);
  });
});

import axe from 'axe-core';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ADVISOR, FARMER, signIn } from '../pages/sign-in';
import { DESK, launchBrowser, openPage, PHONE } from '../support/browser';
import { startProduct, type Product } from '../support/server';

let product: Product;
let browser: Browser;

beforeAll(async () => {
  product = await startProduct();
  browser = await launchBrowser();
});

afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

interface Fault {
  id: string;
  nodes: number;
}

/** What the accessibility checker finds on the page as it stands (WCAG 2.2 A and AA). */
async function faultsOn(page: Page): Promise<Fault[]> {
  // Evaluated, not added as a script tag: the page's own policy refuses inline scripts.
  await page.evaluate(axe.source);
  return page.evaluate(async () => {
    const checker = (
      window as unknown as {
        axe: {
          run: (
            root: Document,
            options: unknown,
          ) => Promise<{ violations: { id: string; nodes: unknown[] }[] }>;
        };
      }
    ).axe;
    const { violations } = await checker.run(document, {
      runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'],
    });
    return violations.map(({ id, nodes }) => ({ id, nodes: nodes.length }));
  });
}

/** Addresses of the main pages, with the demo's first field that has results. */
async function routesOf(page: Page): Promise<string[]> {
  const first = await page.evaluate(async () => {
    const get = async (address: string) =>
      (await (await fetch(address)).json()) as { items: { id: string; scenarioCount?: number }[] };
    const field = (await get('/api/fields')).items.find((one) => (one.scenarioCount ?? 0) > 1);
    const scenarios = (await get(`/api/fields/${field?.id}/scenarios`)).items;
    return { field: field?.id ?? '', scenarios: scenarios.map((one) => one.id) };
  });
  const field = `/fields/${first.field}`;
  const scenario = `${field}/scenarios/${first.scenarios[0]}`;
  return [
    '/',
    '/farms',
    '/fields',
    field,
    `${field}/scenarios/new`,
    `${scenario}/result`,
    `${field}/compare?ids=${first.scenarios.slice(0, 2).join(',')}`,
    '/weather?add=1',
    '/how-we-know',
    '/help',
  ];
}

describe.each([
  ['light', DESK],
  ['dark', PHONE],
] as const)('in the %s theme', (colorScheme, viewport) => {
  it('gives the accessibility checker nothing to find on any main page', async () => {
    const { page, faults } = await openPage(browser, { viewport, colorScheme });
    await page.goto(`${product.url}/sign-in`);
    const found: Record<string, Fault[]> = {};
    found['/sign-in'] = await faultsOn(page);
    await signIn(page, product.url, ADVISOR);
    for (const route of await routesOf(page)) {
      await page.goto(product.url + route);
      await page.waitForLoadState('networkidle');
      await page.waitForTimeout(400);
      found[route.replace(/[A-Za-z0-9_-]{20}/g, ':id')] = await faultsOn(page);
    }
    const bad = Object.entries(found).filter(([, list]) => list.length > 0);
    expect(bad).toEqual([]);
    expect(faults).toEqual([]);
    await page.context().close();
  });
});

describe('a farmer', () => {
  it('sees the own farm and no other', async () => {
    const { page } = await openPage(browser, { viewport: DESK });
    await signIn(page, product.url, FARMER);
    const farms = await page.evaluate(
      async () =>
        ((await (await fetch('/api/farms')).json()) as { items: { name: string }[] }).items,
    );
    expect(farms.map(({ name }) => name)).toEqual(['Birkenhof']);
    await page.context().close();
  });
});

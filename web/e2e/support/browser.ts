import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { chromium, type Browser, type BrowserContextOptions, type Page } from 'playwright-core';

/** Debian's Chromium, quiet: no background services reach for the network. */
export async function launchBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
}

export const DESK = { width: 1440, height: 900 };
export const PHONE = { width: 390, height: 844 };

/** A page of its own (own cookies) that fails the test on an uncaught error in the client. */
export async function openPage(
  browser: Browser,
  options: BrowserContextOptions = { viewport: DESK },
): Promise<{ page: Page; faults: string[] }> {
  const context = await browser.newContext(options);
  const page = await context.newPage();
  page.setDefaultTimeout(30_000);
  const faults: string[] = [];
  page.on('pageerror', (error) => faults.push(error.message));
  page.on('console', (message) => {
    if (message.type() === 'error' && /Content Security Policy/.test(message.text())) {
      faults.push(message.text());
    }
  });
  return { page, faults };
}

const output = path.resolve(import.meta.dirname, '../output');

/** Save a picture for the people who look at failures. */
export async function snap(page: Page, name: string): Promise<void> {
  mkdirSync(output, { recursive: true });
  await page.screenshot({ path: path.join(output, `${name}.png`), fullPage: true });
}

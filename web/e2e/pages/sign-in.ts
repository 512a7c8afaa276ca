import type { Page } from 'playwright-core';

/** Password of the demo's accounts (demo-data/seed.mjs). */
const DEMO_PASSWORD = 'furrow-and-light-demo';

/** Sign in as a person of the demo and wait for the desk. */
export async function signIn(page: Page, url: string, email: string): Promise<void> {
  await page.goto(`${url}/sign-in`);
  await page.getByLabel(/e-mail/i).fill(email);
  await page
    .getByLabel(/^password/i)
    .first()
    .fill(DEMO_PASSWORD);
  await page
    .getByRole('button', { name: /sign in/i })
    .first()
    .click();
  await page.waitForURL((address) => !address.pathname.includes('sign-in'));
}

export const ADVISOR = 'advisor@lindental.example';
export const FARMER = 'farmer@lindental.example';

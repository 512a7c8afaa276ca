import type { Page } from 'playwright-core';

/** Draw a four-cornered field in the middle of the map and save it; returns its id. */
export async function drawField(page: Page, url: string, name: string): Promise<string> {
  await page.goto(`${url}/fields?add=draw`);
  const map = page.locator('.leaflet-container').first();
  await map.waitFor();
  // The map settles on the demo's fields before it takes corners.
  await page.waitForTimeout(1500);
  for (let i = 0; i < 4; i += 1) {
    await page.getByRole('button', { name: 'Closer' }).click();
    await page.waitForTimeout(350);
  }
  const box = await map.boundingBox();
  if (!box) throw new Error('The map has no size.');
  const corners = [
    [0.35, 0.3],
    [0.62, 0.34],
    [0.6, 0.66],
    [0.33, 0.62],
  ];
  for (const [x, y] of corners) {
    await page.mouse.click(box.x + box.width * x, box.y + box.height * y);
    await page.waitForTimeout(350);
  }
  await page.getByRole('button', { name: 'Finish' }).click();
  await page.getByLabel('Field name').fill(name);
  await page.getByLabel('Farm').first().click();
  await page.getByRole('option', { name: 'Birkenhof' }).click();
  await page.getByRole('button', { name: 'Save the field' }).click();
  await page.waitForURL(/\/fields\/[A-Za-z0-9_-]{8,}$/);
  return page.url().split('/').pop() ?? '';
}

/** Record a crop with its usual dates on the field in view. */
export async function addCrop(page: Page, crop: string): Promise<void> {
  await page.getByRole('button', { name: 'Add a season' }).click();
  const form = page.getByRole('dialog');
  await form.getByLabel('Crop').first().fill(crop);
  await page.getByRole('option', { name: crop }).click();
  await form.getByRole('button', { name: /save|add/i }).click();
  await form.waitFor({ state: 'hidden' });
}

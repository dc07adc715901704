import { readFile } from 'node:fs/promises';
import type { Page } from '@playwright/test';
import { expect, test } from './fixtures';

/** Cost per tonne on the answer, as a number; NaN while there is none. */
async function costPerTonne(page: Page): Promise<number> {
  const text = await page
    .locator('#answer')
    .getByText(/€[\d,]+\.\d\d/)
    .first()
    .textContent();
  return Number(/€([\d,]+\.\d\d)/.exec(text ?? '')?.[1].replaceAll(',', '') ?? Number.NaN);
}

async function settled(page: Page): Promise<void> {
  await expect(page.locator('[aria-busy="true"]')).toHaveCount(0);
  await expect(page.locator('#answer').getByText(/recomputing|out of date/)).toHaveCount(0);
}

const recipe = (page: Page) => page.locator('#answer').getByRole('table').first();

test('from the demo to a proven recipe, a limit dragged, a price edited, reloaded, exported and brought back', async ({
  page,
}) => {
  await page.setViewportSize({ width: 1440, height: 900 });
  await page.goto('/');

  // The first demo order is solved and proven without a click; its least cost is that of an independent slice search.
  await expect(page.locator('#answer')).toContainText('Cheapest under these figures and this blending rule');
  expect(Math.abs((await costPerTonne(page)) - 913)).toBeLessThan(0.92);
  await expect(recipe(page)).toContainText('SN 150');

  // A limit dragged: the recipe and the chart follow while the pointer is still down.
  const chart = page
    .locator('#answer')
    .getByRole('img', { name: /viscosity/i })
    .first();
  await expect(chart).toBeVisible();
  const end = page.getByRole('slider', { name: /Viscosity index.*least/i });
  const box = await end.boundingBox();
  if (!box) throw new Error('The end of the rail is not on the page.');
  await end.scrollIntoViewIfNeeded();
  await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
  await page.mouse.down();
  await page.mouse.move(box.x + box.width / 2 + 120, box.y + box.height / 2, { steps: 12 });
  await expect.poll(() => costPerTonne(page)).toBeGreaterThan(913.6);
  await page.mouse.up();
  await settled(page);
  const dragged = await costPerTonne(page);
  await expect(recipe(page)).toContainText('Group II');

  // One drag is one step back.
  await page.getByRole('button', { name: /^Undo/ }).click();
  await expect.poll(() => costPerTonne(page)).toBeLessThan(914);
  await page.getByRole('button', { name: /^Do again/ }).click();
  await expect.poll(() => costPerTonne(page)).toBeCloseTo(dragged, 2);

  // A price edited in place, with a decimal comma.
  const price = page.getByRole('gridcell', { name: /^940/ }).first();
  await price.click();
  await page.keyboard.type('970,5');
  await page.keyboard.press('Enter');
  await expect.poll(() => costPerTonne(page)).toBeGreaterThan(dragged);
  await settled(page);
  const edited = await costPerTonne(page);

  // Reload keeps everything.
  await page.reload();
  await settled(page);
  await expect.poll(() => costPerTonne(page)).toBeCloseTo(edited, 2);
  await expect(page.getByRole('gridcell', { name: /^970\.5/ }).first()).toBeVisible();

  // Export, clear, import: it all comes back.
  await page.getByRole('button', { name: 'Workbook', exact: true }).click();
  const download = page.waitForEvent('download');
  await page.getByRole('button', { name: /^Export workbook/ }).click();
  const file = await (await download).path();
  const exported = JSON.parse(await readFile(file, 'utf8'));
  expect(exported.format).toBe('basewright-workbook');
  await page.getByRole('button', { name: 'Workbook', exact: true }).click();
  await page.getByRole('button', { name: /^New empty workbook/ }).click();
  await expect(page.getByText('SN 150')).toHaveCount(0);
  await page.getByLabel('Workbook file to import').setInputFiles(file);
  await expect.poll(() => costPerTonne(page)).toBeCloseTo(edited, 2);
  await expect(page.getByRole('gridcell', { name: /^970\.5/ }).first()).toBeVisible();
});

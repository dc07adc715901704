import { readFile } from 'node:fs/promises';
import type { Locator, Page } from '@playwright/test';
import { expect, test } from './fixtures';

// Least cost of the first demo order [EUR/t], by an independent slice search (tests/oracle).
const LEAST_COST = 913;

const answer = (page: Page) => page.locator('#answer');

async function costPerTonne(page: Page): Promise<number> {
  const text = await answer(page)
    .getByText(/€[\d,]+\.\d\d/)
    .first()
    .textContent();
  return Number(/€([\d,]+\.\d\d)/.exec(text ?? '')?.[1].replaceAll(',', '') ?? Number.NaN);
}

const proven = (page: Page) =>
  expect(answer(page)).toContainText('Cheapest under these figures and this blending rule', { timeout: 30_000 });

async function fromMenu(page: Page, item: RegExp): Promise<void> {
  await page.getByRole('button', { name: 'Workbook', exact: true }).click();
  // A notice below the header may offer the same.
  await page.getByRole('button', { name: item }).first().click();
}

const nameField = (page: Page) => page.getByRole('textbox', { name: 'Name of the workbook' });

async function rename(page: Page, name: string): Promise<void> {
  await nameField(page).fill(name);
  await nameField(page).press('Enter');
  await expect(page.getByText('Saved on this computer')).toBeVisible();
}

/** Exports the workbook and returns what is in the file. */
async function exported(page: Page): Promise<{ name: string; products: { pricePerTonne?: number }[] }> {
  const download = page.waitForEvent('download');
  await fromMenu(page, /^Export workbook/);
  return JSON.parse(await readFile(await (await download).path(), 'utf8'));
}

test('without its main solver the page answers with the second one, at the same cost, and says so', async ({
  page,
  allowMessage,
}) => {
  allowMessage(/Failed to load resource|wasm|WebAssembly/i);
  await page.route('**/*.wasm', (route) => route.abort());
  await page.goto('/');
  await expect(answer(page)).toContainText('The main solver could not be loaded', { timeout: 45_000 });
  await expect(answer(page)).toContainText('a slower one answers');
  expect(Math.abs((await costPerTonne(page)) - LEAST_COST)).toBeLessThan(0.92);
});

test('a file that is no workbook, or a newer one, is refused with the reason and changes nothing', async ({ page }) => {
  await page.goto('/');
  await proven(page);
  const before = await exported(page);
  const file = page.getByLabel('Workbook file to import');
  const give = (name: string, text: string) =>
    file.setInputFiles({ name, mimeType: 'application/json', buffer: Buffer.from(text) });

  await give('garbage.json', '\u0000\u0001 no workbook at all {');
  await expect(page.getByText(/garbage\.json was not imported; the workbook on the page is as it was\./)).toBeVisible();

  await give('newer.json', JSON.stringify({ ...before, version: 99 }));
  await expect(page.getByText(/newer\.json was not imported.*written by a newer Basewright/)).toBeVisible();

  expect(await exported(page)).toEqual(before);
  await expect(page.getByRole('button', { name: 'Undo', exact: true })).toBeDisabled();
});

for (const [how, refuse] of [
  [
    'throws',
    () => {
      IDBFactory.prototype.open = () => {
        throw new DOMException('refused', 'SecurityError');
      };
    },
  ],
  ['is not there', () => Object.defineProperty(window, 'indexedDB', { value: undefined })],
] as const) {
  test(`where storage ${how} the page works, says that it cannot save, and exports`, async ({ page }) => {
    await page.addInitScript(refuse);
    await page.goto('/');
    await expect(page.getByText('Not saved', { exact: true })).toBeVisible();
    await expect(page.getByText(/This browser keeps nothing for this page .* Export the workbook/)).toBeVisible();
    await proven(page);
    await nameField(page).fill('Typed without storage');
    await nameField(page).press('Enter');
    expect((await exported(page)).name).toBe('Typed without storage');
  });
}

/** The cell of a stock below a heading of the table. */
async function cellOf(page: Page, stock: string, heading: RegExp): Promise<Locator> {
  const grid = page.getByRole('grid', { name: 'Stocks' });
  const headings = await grid.locator('thead th').allTextContents();
  const at = headings.findIndex((text) => heading.test(text));
  if (at < 0) throw new Error(`No heading like ${heading} among ${headings.join(' | ')}.`);
  const row = grid.getByRole('row').filter({ has: page.getByRole('rowheader', { name: stock, exact: true }) });
  return row.locator('> th, > td').nth(at);
}

test('a price that is no number and viscosities the wrong way round are said at the cell, and outlast a reload', async ({
  page,
}) => {
  await page.goto('/');
  await proven(page);
  const price = await cellOf(page, 'SN 150', /^Price/);
  const kv40 = await cellOf(page, 'SN 150', /^KV 40/);

  await price.click();
  await page.keyboard.type('about 900');
  await page.keyboard.press('Enter');
  await kv40.click();
  await page.keyboard.type('2');
  await page.keyboard.press('Enter');

  async function areSaid() {
    await expect(price).toHaveAttribute('aria-invalid', 'true');
    await price.click();
    await expect(price).toContainText(/“about 900” is not one number/);
    await expect(kv40).toHaveAttribute('aria-invalid', 'true');
    await kv40.click();
    await expect(kv40).toContainText(/KV ?40 must be above KV ?100/);
  }
  await areSaid();
  await expect(page.getByText('Saved on this computer')).toBeVisible();
  await page.reload();
  await areSaid();
});

test('a workbook that was replaced is brought back after a reload', async ({ page }) => {
  await page.goto('/');
  await rename(page, 'My own plant');
  await fromMenu(page, /^New empty workbook/);
  await expect(page.getByText('Undo brings the former one back.')).toBeVisible();
  await rename(page, 'Something else');
  await page.reload();
  await expect(nameField(page)).toHaveValue('Something else');
  await expect(page.getByRole('button', { name: 'Undo', exact: true })).toBeDisabled();

  await fromMenu(page, /^Other workbooks and earlier states/);
  const dialog = page.getByRole('dialog', { name: 'Other workbooks and earlier states' });
  await expect(dialog.getByText('on the page', { exact: true })).toHaveCount(1);
  await dialog.getByRole('button', { name: /^Open: My own plant, saved/ }).click();
  await expect(dialog).toBeHidden();
  await expect(nameField(page)).toHaveValue('My own plant');
  await proven(page);
  await page.getByRole('button', { name: 'Undo: opening My own plant' }).click();
  await expect(nameField(page)).toHaveValue('Something else');
});

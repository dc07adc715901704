import type { Page } from '@playwright/test';
import { expect, expectNoAxeViolations, test } from './fixtures';

const answer = (page: Page) => page.locator('#answer');

/** "€1,182.48 per tonne" or "€7.14/t": the amount. */
function amount(text: string | null | undefined): number {
  return Number(/€([\d,]+\.\d\d)/.exec(text ?? '')?.[1]?.replaceAll(',', '') ?? Number.NaN);
}

async function costPerTonne(page: Page): Promise<number> {
  return amount(
    await answer(page)
      .getByText(/^€[\d,]+\.\d\d per tonne$/)
      .textContent(),
  );
}

/** The answer is there, and so is all that is told of it. */
async function explained(page: Page): Promise<void> {
  await expect(page.locator('[aria-busy="true"]')).toHaveCount(0);
  await expect(answer(page).getByText(/recomputing|out of date|Working out|Looking for/)).toHaveCount(0);
}

const open = (page: Page, order: RegExp) => page.getByRole('button', { name: order }).first().click();

test('the price of a limit on screen is the difference of two orders solved on the page', async ({ page }) => {
  await page.goto('/');
  await open(page, /^Multigrade/);
  const price = page.getByText(/^1 unit looser saves €/);
  await expect(price).toBeVisible();
  await explained(page);
  const told = amount(await price.textContent());
  const asked = await costPerTonne(page);

  const least = page.getByRole('textbox', { name: /Viscosity index.*least/ });
  await expect(least).toHaveValue('155');
  await least.fill('154');
  await least.press('Enter');
  await expect.poll(() => costPerTonne(page)).toBeLessThan(asked);
  await explained(page);
  // Both costs are shown to a cent.
  expect(Math.abs(asked - (await costPerTonne(page)) - told)).toBeLessThan(0.011);

  // The story of the limit stands in its details.
  await page.getByRole('button', { name: 'Viscosity index', exact: true }).click();
  await expect(page.getByRole('heading', { name: 'What it costs: least 154' })).toBeVisible();
  await expect(page.getByText(/^Tighter by 1 \(155\) adds €/)).toBeVisible();
  await expect(page.getByText(/^Chance that one test result passes/).first()).toContainText('50 %');
});

test('an impossible order shows what is within reach, and a way out tried in a copy gives a proven recipe', async ({
  page,
}) => {
  await page.goto('/');
  await open(page, /^Thin base/);
  await expect(answer(page)).toContainText('These cannot hold together');
  await expect(answer(page)).toContainText('Noack volatility at most 8 % m/m');
  const way = answer(page)
    .getByRole('listitem')
    .filter({ hasText: /^Noack up to/ });
  await expect(way).toContainText('(asked at most 8.0)');
  const told = amount(await way.textContent());
  await expectNoAxeViolations(page);

  await way.getByRole('button', { name: /^Try it in a copy/ }).click();
  await expect(page.getByRole('textbox', { name: 'Name of the order' })).toHaveValue(/, eased$/);
  await expect(answer(page)).toContainText('Cheapest under these figures and this blending rule');
  await explained(page);
  expect(Math.abs((await costPerTonne(page)) - told)).toBeLessThan(0.011);

  await page.getByRole('button', { name: /^Undo/ }).click();
  await expect(page.getByRole('button', { name: /, eased/ })).toHaveCount(0);
  await open(page, /^Thin base/);
  await expect(answer(page)).toContainText('These cannot hold together');
});

test('another recipe is taken and given back, the recipe rounded, and the second engine asked', async ({ page }) => {
  await page.goto('/');
  await expect(answer(page)).toContainText('Stocks in use');
  await explained(page);
  await expectNoAxeViolations(page);
  const first = await costPerTonne(page);

  await answer(page).getByLabel('Round to what can be weighed').selectOption('5 kg');
  const rounded = answer(page).getByRole('table', { name: 'Recipe rounded to 5 kg' });
  await expect(rounded).toContainText('SN 500');
  await expect(answer(page)).toContainText(/rounding costs .* proven best in these steps/);

  await answer(page).getByRole('button', { name: 'Second opinion' }).click();
  await expect(answer(page)).toContainText(/The second engine agrees: €[\d,.]+\/t \(difference under €0.01\/t\)/);

  const other = answer(page)
    .getByRole('listitem')
    .filter({ hasText: /without SN 500/ });
  const told = amount(await other.textContent());
  expect(told).toBeGreaterThan(first);
  await other.getByRole('button', { name: /^Use instead/ }).click();
  await expect.poll(async () => Math.abs((await costPerTonne(page)) - told)).toBeLessThan(0.011);
  await page.getByRole('button', { name: /^Undo/ }).click();
  await expect.poll(() => costPerTonne(page)).toBeCloseTo(first, 2);
});

import type { Page } from '@playwright/test';
import { expect, expectNoAxeViolations, test } from './fixtures';

const SCHEMES = ['light', 'dark'] as const;

async function open(page: Page, width: number, colorScheme: (typeof SCHEMES)[number]): Promise<void> {
  await page.setViewportSize({ width, height: 900 });
  await page.emulateMedia({ colorScheme });
  await page.goto('/');
  await expect(page.getByRole('main')).toBeVisible();
  await settled(page);
  await page.waitForLoadState('networkidle');
}

async function settled(page: Page): Promise<void> {
  await expect(page.locator('[aria-busy="true"]')).toHaveCount(0);
}

async function expectNothingOverTheSide(page: Page): Promise<void> {
  const overhang = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
  expect(overhang).toBe(0);
}

for (const width of [1440, 1024, 390]) {
  for (const colorScheme of SCHEMES) {
    test(`axe finds nothing at ${width} px, ${colorScheme}, and nothing runs off the page's side`, async ({ page }) => {
      await open(page, width, colorScheme);
      await expectNoAxeViolations(page);
      await expectNothingOverTheSide(page);
    });
  }
}

const MENU = 'the workbook menu open';

/** What the page can be brought to, each from the demo's first order. */
const STATES: Record<string, (page: Page) => Promise<void>> = {
  'the details of a limit open': async (page) => {
    await page.getByRole('button', { name: 'Kinematic viscosity at 40 °C', exact: true }).click();
    await expect(page.getByRole('textbox', { name: /Stay inside by/ })).toBeVisible();
  },
  'limits that contradict each other': async (page) => {
    const least = page.getByRole('textbox', { name: /Kinematic viscosity at 40 °C, least/ });
    await least.fill('60');
    await least.press('Enter');
    await expect(page.getByText(/is above the most/).first()).toBeVisible();
    await settled(page);
  },
  'a cell that cannot be read': async (page) => {
    await page.getByRole('gridcell', { name: /^940/ }).first().click();
    await page.keyboard.type('9x4');
    await page.keyboard.press('Enter');
    await expect(page.getByRole('gridcell', { name: /9x4/ })).toBeVisible();
    await settled(page);
    // What is left out for it is said with the proof.
    await expect(page.locator('#answer')).toContainText('(1 left out)');
  },
  [MENU]: async (page) => {
    await page.getByRole('button', { name: 'Workbook', exact: true }).click();
    await expect(page.getByRole('button', { name: /^Export workbook/ })).toBeVisible();
  },
  'the dialog for a property of one’s own open': async (page) => {
    await page.getByRole('combobox', { name: 'Add a limit' }).selectOption({ label: 'a property of your own …' });
    await expect(page.getByRole('dialog')).toBeVisible();
  },
  'an order that cannot be met': async (page) => {
    const item = page.getByRole('button', { name: /^Thin base/ });
    if (await item.isVisible()) await item.click();
    else {
      const select = page.getByRole('combobox', { name: 'Order on the page' });
      const label = (await select.locator('option').filter({ hasText: 'Thin base' }).textContent()) ?? '';
      await select.selectOption({ label });
    }
    await expect(page.locator('#answer')).toContainText('can meet the order: proven');
    await settled(page);
  },
};

for (const [width, colorScheme] of [
  [1440, 'light'],
  [390, 'dark'],
] as const) {
  for (const [state, reach] of Object.entries(STATES)) {
    test(`axe finds nothing with ${state} at ${width} px, ${colorScheme}`, async ({ page }) => {
      await open(page, width, colorScheme);
      await reach(page);
      // On a phone the open menu lies over the links to the parts of the page.
      await expectNoAxeViolations(page, state === MENU ? ['main', 'nav'] : []);
      await expectNothingOverTheSide(page);
    });
  }
}

test('axe is awake: it finds a picture without words', async ({ page }) => {
  await page.goto('/');
  await expect(page.getByRole('main')).toBeVisible();
  await page.evaluate(() => {
    const picture = document.createElement('img');
    picture.src = 'data:image/gif;base64,R0lGODlhAQABAIAAAAAAAP///yH5BAEAAAAALAAAAAABAAEAAAIBRAA7';
    document.querySelector('main')?.append(picture);
  });
  await expect(expectNoAxeViolations(page)).rejects.toThrow('image-alt');
});

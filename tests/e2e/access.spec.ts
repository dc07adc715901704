import { expect, expectNoAxeViolations, test } from './fixtures';

for (const width of [1440, 1024, 390]) {
  for (const colorScheme of ['light', 'dark'] as const) {
    test(`axe finds nothing at ${width} px, ${colorScheme}, and nothing runs off the page's side`, async ({ page }) => {
      await page.setViewportSize({ width, height: 900 });
      await page.emulateMedia({ colorScheme });
      await page.goto('/');
      await expect(page.getByRole('main')).toBeVisible();
      await expect(page.locator('[aria-busy="true"]')).toHaveCount(0);
      await page.waitForLoadState('networkidle');
      await expectNoAxeViolations(page);
      const overhang = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(overhang).toBe(0);
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

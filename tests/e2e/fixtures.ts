import AxeBuilder from '@axe-core/playwright';
import { test as base, expect, type Page } from '@playwright/test';
import { APP_URL } from './globalSetup';
import { watchPage } from './watchPage';

export { expect };

interface Fixtures {
  /** Declares that messages matching the pattern are expected in this test; anything else fails it. */
  allowMessage: (pattern: RegExp) => void;
  allowedMessages: RegExp[];
}

/** A page of the built app whose every complaint, and every request to another origin, fails the test. */
export const test = base.extend<Fixtures>({
  // biome-ignore lint/correctness/noEmptyPattern: Playwright reads the pattern to learn what a fixture needs.
  baseURL: async ({}, use) => {
    const url = process.env[APP_URL];
    if (!url) throw new Error(`${APP_URL} is not set: global setup did not run.`);
    await use(url);
  },
  // biome-ignore lint/correctness/noEmptyPattern: Playwright reads the pattern to learn what a fixture needs.
  allowedMessages: async ({}, use) => use([]),
  allowMessage: async ({ allowedMessages }, use) => use((pattern) => void allowedMessages.push(pattern)),
  page: async ({ page, baseURL, allowedMessages }, use) => {
    const complaints = await watchPage(page, new URL(baseURL ?? '').origin);
    await use(page);
    expect(complaints().filter((text) => !allowedMessages.some((pattern) => pattern.test(text)))).toEqual([]);
  },
});

/**
 * Expects no accessibility violation by axe: WCAG 2.2 up to AA, and its best practices. `covered` names what lies under
 * something open, and is no target just then.
 */
export async function expectNoAxeViolations(page: Page, covered: readonly string[] = []): Promise<void> {
  const axe = covered.reduce((builder, selector) => builder.exclude(selector), new AxeBuilder({ page }));
  const { violations } = await axe
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'])
    .analyze();
  const readable = violations.map(({ id, help, nodes }) => ({
    id,
    help,
    where: nodes.map(({ target, failureSummary }) => `${target.join(' ')}: ${failureSummary ?? ''}`),
  }));
  expect(readable).toEqual([]);
}

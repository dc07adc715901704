import { render, screen } from '@testing-library/react';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { ScrollRegion } from '../../../app/parts/ScrollRegion';

/** As browsers do, it tells of every element once when it begins to be observed. */
class Sizes {
  constructor(private readonly tell: () => void) {}
  observe() {
    this.tell();
  }
  disconnect() {}
}

beforeEach(() => vi.stubGlobal('ResizeObserver', Sizes));
afterEach(() => {
  vi.restoreAllMocks();
  vi.unstubAllGlobals();
});

// jsdom lays nothing out: the widths are given here.
it.each([
  ['reached by key where it is wider than its place', 500, '0'],
  ['no stop on the way where all of it is in sight', 300, null],
])('what may scroll sideways is %s', (_what, contentWidth, tabIndex) => {
  vi.spyOn(Element.prototype, 'clientWidth', 'get').mockReturnValue(300);
  vi.spyOn(Element.prototype, 'scrollWidth', 'get').mockReturnValue(contentWidth);
  render(
    <ScrollRegion name="Recipe">
      <p>wide</p>
    </ScrollRegion>,
  );
  expect(screen.getByRole('region', { name: 'Recipe' }).getAttribute('tabindex')).toBe(tabIndex);
});

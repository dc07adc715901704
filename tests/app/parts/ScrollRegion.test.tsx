import { render, screen } from '@testing-library/react';
import { afterEach, expect, it, vi } from 'vitest';
import { ScrollRegion } from '../../../app/parts/ScrollRegion';

afterEach(() => void vi.restoreAllMocks());

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

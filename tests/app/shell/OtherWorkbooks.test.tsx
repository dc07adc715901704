import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, expect, it, vi } from 'vitest';
import { OtherWorkbooks } from '../../../app/shell/OtherWorkbooks';
import { type Shelf, setShelf } from '../../../app/state/shelf';
import { openWorkbook, undo, useWorkbook } from '../../../app/state/workbookStore';
import { emptyWorkbook, restoreWorkbook, serialiseWorkbook } from '../../../src';
import { resetStores } from '../state/testEnvironment';

const PRESENT = emptyWorkbook('p', 'Present');
const OTHER = emptyWorkbook('o', 'Other');
const BEFORE = { ...PRESENT, name: 'Present, before' };

const STORAGE: Shelf['storage'] = {
  list: async () => [
    { id: 'p', name: 'Present', savedAt: '2026-03-02T08:00:00Z' },
    { id: 'o', name: 'Other', savedAt: '2026-03-01T08:00:00Z' },
  ],
  read: async () => restoreWorkbook(serialiseWorkbook(OTHER)),
  versions: async () => [
    { workbookId: 'p', text: serialiseWorkbook(PRESENT), savedAt: '2026-03-02T08:00:00Z' },
    { workbookId: 'p', text: serialiseWorkbook(BEFORE), savedAt: '2026-03-02T07:00:00Z' },
  ],
};

const name = () => useWorkbook.getState().workbook.name;

function setUp(change: Partial<Shelf['storage']> = {}) {
  resetStores();
  openWorkbook(PRESENT);
  setShelf({ storage: { ...STORAGE, ...change }, settle: async () => {} });
  const onClose = vi.fn();
  render(<OtherWorkbooks open onClose={onClose} />);
  return { user: userEvent.setup(), onClose };
}

beforeEach(() => {
  setShelf(undefined);
  // jsdom knows the element, but not how to open it.
  HTMLDialogElement.prototype.showModal = function show() {
    this.open = true;
  };
});

it('lists the workbooks with the one on the page marked, and opens another as a step that can be undone', async () => {
  const { user, onClose } = setUp();
  const present = (await screen.findByText('Present')).closest('li');
  if (!present) throw new Error('No item.');
  expect(within(present).getByText('on the page')).toBeVisible();
  expect(within(present).queryByRole('button')).toBeNull();
  await user.click(screen.getByRole('button', { name: /^Open: Other, saved .*2026/ }));
  expect(name()).toBe('Other');
  expect(onClose).toHaveBeenCalledOnce();
  undo();
  expect(name()).toBe('Present');
});

it('lists only states that differ from the page, and brings one back', async () => {
  const { user } = setUp();
  const states = await screen.findAllByRole('button', { name: /^Bring back/ });
  expect(states).toHaveLength(1);
  await user.click(screen.getByRole('button', { name: /^Bring back/ }));
  expect(name()).toBe('Present, before');
});

it('says what is wrong with a workbook that cannot be opened, and changes nothing', async () => {
  const { user, onClose } = setUp({ read: async () => restoreWorkbook('{') });
  await user.click(await screen.findByRole('button', { name: /^Open: Other/ }));
  expect(await screen.findByRole('alert')).toHaveTextContent(/Other cannot be opened; .* as it was\..*JSON/);
  expect(name()).toBe('Present');
  expect(onClose).not.toHaveBeenCalled();
});

it('says so where what is kept cannot be read, and does not pass for empty', async () => {
  setUp({ list: () => Promise.reject(new Error('lost')) });
  expect(await screen.findByRole('alert')).toHaveTextContent('could not be read');
  expect(screen.queryByText('None is kept here.')).toBeNull();
});

import { act, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it } from 'vitest';
import { Header } from '../../../app/shell/Header';
import { setSave, setSetAside, useSave } from '../../../app/state/saveStore';
import { setTheme } from '../../../app/state/viewStore';
import { editWorkbook, openWorkbook, useWorkbook } from '../../../app/state/workbookStore';
import { emptyWorkbook, serialiseWorkbook } from '../../../src';

function setUp({ invented = false } = {}) {
  openWorkbook({ ...emptyWorkbook('workbook-1', 'My stocks'), invented });
  render(<Header />);
  return userEvent.setup();
}

/** A file as browsers have it; jsdom's knows no text(). */
function fileOf(text: string): File {
  const file = new File([text], 'stocks.json', { type: 'application/json' });
  return Object.assign(file, { text: () => Promise.resolve(text) });
}

const name = () => useWorkbook.getState().workbook.name;

afterEach(() => {
  setTheme('system');
  setSave({ state: 'saved' });
  setSetAside(undefined);
});

describe('the header', () => {
  it('renames the workbook, and takes that back and makes it again', async () => {
    const user = setUp();
    const field = screen.getByRole('textbox', { name: 'Name of the workbook' });
    await user.clear(field);
    await user.type(field, 'Spring prices{Enter}');
    expect(name()).toBe('Spring prices');
    await user.click(screen.getByRole('button', { name: 'Undo: rename the workbook' }));
    expect(name()).toBe('My stocks');
    await user.click(screen.getByRole('button', { name: 'Do again: rename the workbook' }));
    expect(name()).toBe('Spring prices');
  });

  it('offers no undo where there is nothing to undo', () => {
    setUp();
    expect(screen.getByRole('button', { name: 'Undo' })).toBeDisabled();
    act(() => editWorkbook('invent', (workbook) => Object.assign(workbook, { invented: true })));
    expect(screen.getByRole('button', { name: 'Undo: invent' })).toBeEnabled();
  });

  it('marks invented figures as invented, and no others', () => {
    setUp({ invented: true });
    expect(screen.getByText('invented figures')).toBeVisible();
    act(() => openWorkbook(emptyWorkbook('workbook-2', 'Real')));
    expect(screen.queryByText('invented figures')).toBeNull();
  });

  it('says that the workbook is not saved, why, and offers the way out', () => {
    setUp();
    act(() => setSave({ state: 'failed', message: 'The disk is full. Export the workbook.' }));
    expect(screen.getByText('Not saved')).toBeVisible();
    expect(screen.getByRole('alert')).toHaveTextContent('The disk is full.');
    expect(screen.getByRole('button', { name: 'Export workbook' })).toBeEnabled();
  });

  it('says beside the save state that two tabs are not guarded, where they are not', () => {
    setUp();
    expect(screen.getByText('Saved on this computer')).toBeVisible();
    act(() => useSave.setState({ unguarded: true }));
    expect(screen.getByText(/^Saved on this computer; .* two tabs are not guarded/)).toBeVisible();
    act(() => useSave.setState({ unguarded: false }));
  });

  it('tells of a workbook set aside where it has just happened, and not at every start after', () => {
    setUp();
    act(() => setSetAside({ text: '{', message: 'The workbook was set aside; the demo is open.' }));
    expect(screen.getByRole('status')).toHaveTextContent('set aside');
    act(() => setSetAside({ text: '{' }));
    expect(screen.queryByRole('status')).toBeNull();
    expect(screen.queryByText(/set aside|the demo is open/)).toBeNull();
    expect(screen.getByText('Export the workbook that could not be read')).toBeInTheDocument();
  });

  it('goes from the system’s colours to light, dark and back', async () => {
    const user = setUp();
    const theme = () => document.documentElement.dataset.theme;
    await user.click(screen.getByRole('button', { name: /^Colours/ }));
    expect(theme()).toBe('light');
    await user.click(screen.getByRole('button', { name: /^Colours/ }));
    expect(theme()).toBe('dark');
    await user.click(screen.getByRole('button', { name: /^Colours/ }));
    expect(theme()).toBeUndefined();
  });
});

describe('the workbook menu', () => {
  it('folds on Escape and gives the focus back', async () => {
    const user = setUp();
    const button = screen.getByRole('button', { name: 'Workbook' });
    await user.click(button);
    expect(screen.getByRole('button', { name: 'Open the demo' })).toBeVisible();
    await user.keyboard('{Escape}');
    expect(screen.queryByRole('button', { name: 'Open the demo' })).toBeNull();
    expect(button).toHaveFocus();
  });

  it('opens an empty workbook, which can be undone', async () => {
    const user = setUp();
    await user.click(screen.getByRole('button', { name: 'Workbook' }));
    await user.click(screen.getByRole('button', { name: 'New empty workbook' }));
    expect(name()).toBe('New workbook');
    await user.click(screen.getByRole('button', { name: /^Undo/ }));
    expect(name()).toBe('My stocks');
  });

  it('imports a workbook file', async () => {
    const user = setUp();
    const file = fileOf(serialiseWorkbook(emptyWorkbook('workbook-3', 'From a file')));
    await user.upload(screen.getByLabelText('Workbook file to import'), file);
    expect(await screen.findByRole('status')).toHaveTextContent('stocks.json imported');
    expect(name()).toBe('From a file');
    await user.click(screen.getByRole('button', { name: /^Undo/ }));
    expect(screen.queryByText(/imported\./)).toBeNull();
  });

  it('refuses a file that is no workbook with the reason, and changes nothing', async () => {
    const user = setUp();
    await user.upload(screen.getByLabelText('Workbook file to import'), fileOf('no workbook'));
    expect(await screen.findByRole('alert')).toHaveTextContent(
      /stocks.json was not imported; the workbook on the page is as it was. .*JSON/,
    );
    expect(name()).toBe('My stocks');
  });
});

import { fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { TextField, type TextFieldProps } from '../../../app/parts/TextField';

function setUp(props: Partial<TextFieldProps> = {}) {
  const onCommit = vi.fn();
  render(<TextField label="Name" value="VG 46" onCommit={onCommit} {...props} />);
  return { field: screen.getByRole('textbox', { name: 'Name' }), onCommit, user: userEvent.setup() };
}

describe('TextField', () => {
  it('commits on Enter, once, and on leaving the field', async () => {
    const { field, onCommit, user } = setUp();
    await user.type(field, ' hydraulic{Enter}');
    await user.tab();
    expect(onCommit).toHaveBeenCalledExactlyOnceWith('VG 46 hydraulic');
  });

  it('goes back on Escape', async () => {
    const { field, onCommit, user } = setUp();
    await user.type(field, 'x{Escape}');
    await user.tab();
    expect(field).toHaveValue('VG 46');
    expect(onCommit).not.toHaveBeenCalled();
  });

  it('keeps Escape from a dialog around it as long as there is a draft to give up', async () => {
    const { field, user } = setUp();
    await user.type(field, 'x');
    // HTML standard, close requests: a dialog closes on Escape unless the key press was prevented.
    expect(fireEvent.keyDown(field, { key: 'Escape' })).toBe(false);
    expect(field).toHaveValue('VG 46');
    expect(fireEvent.keyDown(field, { key: 'Escape' })).toBe(true);
  });

  it('keeps a text that is not taken, and says why', async () => {
    const { field, onCommit, user } = setUp({ check: (text) => (text ? undefined : 'A name is needed.') });
    await user.clear(field);
    await user.tab();
    expect(field).toHaveAccessibleDescription('A name is needed.');
    expect(onCommit).not.toHaveBeenCalled();
  });

  it('takes one line of text though it may be shown on several', async () => {
    const { field, onCommit, user } = setUp({ wrap: true });
    await user.clear(field);
    await user.click(field);
    await user.paste('VG 46\n hydraulic');
    await user.keyboard('{Enter}');
    expect(onCommit).toHaveBeenCalledExactlyOnceWith('VG 46 hydraulic');
  });

  it('starts a new line on Enter where several are meant', async () => {
    const { field, onCommit, user } = setUp({ rows: 2 });
    await user.type(field, '{Enter}new');
    expect(onCommit).not.toHaveBeenCalled();
    expect(field).toHaveValue('VG 46\nnew');
  });
});

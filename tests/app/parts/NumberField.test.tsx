import { fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { NumberField, type NumberFieldProps } from '../../../app/parts/NumberField';

type Options = Partial<NumberFieldProps> & { start?: number };

/** A field that keeps what it is told, as the page does. */
function Keeper({ start, onDraft, onCommit, ...options }: Options) {
  const [value, setValue] = useState(start);
  return (
    <>
      <NumberField
        label="least"
        unit="mm²/s"
        digits={2}
        {...options}
        value={value}
        onCommit={(next) => {
          onCommit?.(next);
          setValue(next);
        }}
        onDraft={
          onDraft &&
          ((next) => {
            onDraft(next);
            setValue(next);
          })
        }
      />
      <output data-testid="kept">{value}</output>
    </>
  );
}

function setUp({ live, ...options }: Options & { live?: boolean } = {}) {
  const onCommit = vi.fn<(value: number | undefined) => void>();
  const onDraft = vi.fn<(value: number) => void>();
  render(<Keeper {...options} onCommit={onCommit} onDraft={live ? onDraft : undefined} />);
  const field = screen.getByRole('textbox', { name: /least, mm²\/s/ });
  const kept = () => {
    const text = screen.getByTestId('kept').textContent;
    return text === '' ? undefined : Number(text);
  };
  return { field, kept, onCommit, onDraft, user: userEvent.setup() };
}

describe('NumberField', () => {
  it.each(['12,5', '12.5'])('takes %s and shows it in the user’s own decimal sign', async (text) => {
    const { field, onCommit, user } = setUp();
    await user.type(field, `${text}{Enter}`);
    expect(onCommit).toHaveBeenCalledExactlyOnceWith(12.5);
    expect(field).toHaveValue('12.50');
  });

  it('commits on leaving the field, and an emptied field as no number', async () => {
    const { field, onCommit, user } = setUp({ start: 44.6 });
    await user.clear(field);
    await user.tab();
    expect(onCommit).toHaveBeenCalledExactlyOnceWith(undefined);
  });

  it('says nothing when the field is left as it was', async () => {
    const { field, onCommit, user } = setUp({ start: 44.6 });
    await user.click(field);
    await user.tab();
    expect(onCommit).not.toHaveBeenCalled();
  });

  it('keeps what it cannot read as typed, says why beside it, and keeps the last good number', async () => {
    const { field, onCommit, user } = setUp({ start: 44.6 });
    await user.clear(field);
    await user.type(field, '1,234{Enter}');
    expect(field).toHaveValue('1,234');
    expect(field).toBeInvalid();
    expect(field).toHaveAccessibleDescription(
      '“1,234” can be read in two ways. Write 1234 or 1.234. Until then 44.60 counts.',
    );
    expect(onCommit).not.toHaveBeenCalled();
  });

  it('hands a text it cannot read to whoever keeps it', async () => {
    const onUnread = vi.fn();
    const { field, user } = setUp({ onUnread });
    await user.type(field, 'abut 12{Enter}');
    expect(onUnread).toHaveBeenCalledExactlyOnceWith('abut 12');
  });

  it('shows a kept text with its problem', () => {
    const { field } = setUp({ unreadText: '12..5' });
    expect(field).toHaveValue('12..5');
    expect(field).toHaveAccessibleDescription(/more than one way/);
  });

  it('does not take a number that cannot be right', async () => {
    const { field, onCommit, user } = setUp({ sense: { min: 0, max: 100 }, start: 5 });
    await user.clear(field);
    await user.type(field, '150{Enter}');
    expect(onCommit).not.toHaveBeenCalled();
    expect(field).toHaveAccessibleDescription('150 cannot be right: expected 0 to 100. Until then 5.00 counts.');
  });

  it('goes back on Escape', async () => {
    const { field, onCommit, user } = setUp({ start: 44.6 });
    await user.clear(field);
    await user.type(field, '50{Escape}');
    expect(field).toHaveValue('44.60');
    await user.tab();
    expect(onCommit).not.toHaveBeenCalled();
  });

  it('keeps Escape from a dialog around it as long as there is a draft to give up', async () => {
    const { field, user } = setUp({ start: 44.6 });
    await user.type(field, '5');
    // HTML standard, close requests: a dialog closes on Escape unless the key press was prevented.
    expect(fireEvent.keyDown(field, { key: 'Escape' })).toBe(false);
    expect(fireEvent.keyDown(field, { key: 'Escape' })).toBe(true);
  });

  it('goes back on Escape to the number it had on entering, though drafts were live', async () => {
    const { field, onCommit, onDraft, user } = setUp({ start: 44.6, live: true });
    await user.clear(field);
    await user.type(field, '50');
    expect(onDraft.mock.calls).toEqual([[5], [50]]);
    await user.keyboard('{Escape}');
    expect(onCommit).toHaveBeenCalledExactlyOnceWith(44.6);
    expect(field).toHaveValue('44.60');
  });

  it.each([
    ['4O.5', '“4O.5” is not a number. Until then 41.40 counts.'],
    ['4150', '4150 cannot be right: expected 0 to 100. Until then 41.40 counts.'],
  ])(
    'goes back to the number it had on entering where %s is not taken, and says that it counts',
    async (typed, said) => {
      const { field, kept, user } = setUp({ start: 41.4, live: true, sense: { min: 0, max: 100 } });
      await user.clear(field);
      await user.type(field, typed);
      expect(kept()).toBe(41.4);
      await user.tab();
      expect(field).toHaveValue(typed);
      expect(field).toHaveAccessibleDescription(said);
      expect(kept()).toBe(41.4);
    },
  );

  it('is without a number again where it had none on entering', async () => {
    const { field, kept, user } = setUp({ live: true });
    await user.type(field, '4O{Enter}');
    expect(field).toHaveAccessibleDescription('“4O” is not a number.');
    expect(kept()).toBeUndefined();
    await user.clear(field);
    await user.type(field, '40{Enter}');
    expect(field).toBeValid();
    expect(kept()).toBe(40);
  });

  it('steps by the reporting unit, ten of them with Shift, and commits once on leaving', async () => {
    const { field, onCommit, onDraft, user } = setUp({ start: 44.6, step: 0.1, live: true });
    await user.click(field);
    await user.keyboard('{ArrowUp}{ArrowUp}{ArrowDown}{Shift>}{ArrowUp}{/Shift}');
    expect(onDraft.mock.calls).toEqual([[44.7], [44.8], [44.7], [45.7]]);
    await user.tab();
    expect(onCommit).toHaveBeenCalledExactlyOnceWith(45.7);
  });
});

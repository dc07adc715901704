import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { keysInWords } from '../../../app/parts/keysInWords';
import { type KeyedCommand, useCommandKeys } from '../../../app/parts/useCommandKeys';

function Page({ commands }: { commands: readonly KeyedCommand[] }) {
  useCommandKeys(commands);
  return <input aria-label="a field" />;
}

function setUp(change: Partial<KeyedCommand> = {}) {
  const run = vi.fn();
  render(<Page commands={[{ keys: ['Mod+Shift+Z', 'Mod+Y'], enabled: () => true, run, ...change }]} />);
  return run;
}

describe('useCommandKeys', () => {
  it.each([{ ctrlKey: true }, { metaKey: true }])('takes Ctrl and Cmd alike', (modifier) => {
    const run = setUp();
    fireEvent.keyDown(document.body, { key: 'Z', shiftKey: true, ...modifier });
    expect(run).toHaveBeenCalledOnce();
  });

  it('takes every way a command is written', () => {
    const run = setUp();
    fireEvent.keyDown(document.body, { key: 'y', ctrlKey: true });
    expect(run).toHaveBeenCalledOnce();
  });

  it('runs nothing for other keys, and nothing that is not possible now', () => {
    const run = setUp({ enabled: () => false });
    fireEvent.keyDown(document.body, { key: 'y' });
    fireEvent.keyDown(document.body, { key: 'y', ctrlKey: true });
    expect(run).not.toHaveBeenCalled();
  });

  it('leaves unfinished typing its own undo', () => {
    const run = setUp();
    const field = screen.getByRole('textbox');
    field.dataset.dirty = 'true';
    fireEvent.keyDown(field, { key: 'y', ctrlKey: true });
    expect(run).not.toHaveBeenCalled();
    delete field.dataset.dirty;
    fireEvent.keyDown(field, { key: 'y', ctrlKey: true });
    expect(run).toHaveBeenCalledOnce();
  });
});

describe('keysInWords', () => {
  it('writes keys as the keyboard has them', () => {
    expect(keysInWords(['Mod+Shift+Z', 'Mod+Y'], false)).toBe('Ctrl+Shift+Z');
    expect(keysInWords('Mod+Shift+Z', true)).toBe('⌘⇧Z');
    expect(keysInWords(undefined, true)).toBeUndefined();
  });
});

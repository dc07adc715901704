import { useEffect } from 'react';

/** What a key binding needs of a command. `keys` are written "Mod+Z", "Mod+Shift+Z"; Mod is Ctrl, or Cmd on a Mac. */
export interface KeyedCommand {
  keys?: string | readonly string[];
  enabled(): boolean;
  run(): unknown;
}

/** Runs commands by their keys, everywhere on the page. A field with unfinished typing keeps its own undo. */
export function useCommandKeys(commands: readonly KeyedCommand[]): void {
  useEffect(() => {
    function onKeyDown(event: KeyboardEvent) {
      if (event.defaultPrevented || hasUnfinishedTyping(event.target)) return;
      const pressed = pressedKeys(event);
      const command = commands.find((candidate) => keysOf(candidate).includes(pressed));
      if (!command) return;
      event.preventDefault();
      if (command.enabled()) command.run();
    }
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, [commands]);
}

function keysOf({ keys }: KeyedCommand): string[] {
  const list = keys === undefined ? [] : typeof keys === 'string' ? [keys] : keys;
  return list.map((text) => text.toLowerCase().replace(/\b(ctrl|cmd|meta)\b/g, 'mod'));
}

function pressedKeys(event: KeyboardEvent): string {
  const parts: string[] = [];
  if (event.ctrlKey || event.metaKey) parts.push('mod');
  if (event.altKey) parts.push('alt');
  if (event.shiftKey) parts.push('shift');
  return [...parts, event.key.toLowerCase()].join('+');
}

function hasUnfinishedTyping(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && target.dataset.dirty === 'true';
}

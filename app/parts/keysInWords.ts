const isApple = () => /Mac|iP(hone|ad|od)/.test(navigator.userAgent);

/** "Mod+Shift+Z" as the keyboard has it: "Ctrl+Shift+Z", "⌘⇧Z". The first of several ways. */
export function keysInWords(keys: string | readonly string[] | undefined, apple = isApple()): string | undefined {
  const first = typeof keys === 'string' ? keys : keys?.[0];
  if (!first) return undefined;
  if (!apple) return first.replace('Mod', 'Ctrl');
  return first.replace('Mod', '⌘').replace('Shift', '⇧').replace('Alt', '⌥').replaceAll('+', '');
}

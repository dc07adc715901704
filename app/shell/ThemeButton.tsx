import { useEffect } from 'react';
import type { IconName } from '../parts/Icon';
import { IconButton } from '../parts/IconButton';
import { setTheme, type Theme, useView } from '../state/viewStore';

const NEXT: Record<Theme, Theme> = { system: 'light', light: 'dark', dark: 'system' };
const ICON: Record<Theme, IconName> = { system: 'contrast', light: 'sun', dark: 'moon' };
const WORDS: Record<Theme, string> = { system: 'as the system has it', light: 'light', dark: 'dark' };

/** Light, dark, or as the system has it. */
export function ThemeButton() {
  const theme = useView((view) => view.theme);

  useEffect(() => {
    if (theme === 'system') delete document.documentElement.dataset.theme;
    else document.documentElement.dataset.theme = theme;
  }, [theme]);

  return (
    <IconButton
      icon={ICON[theme]}
      label={`Colours: ${WORDS[theme]}. Change to ${WORDS[NEXT[theme]]}`}
      onClick={() => setTheme(NEXT[theme])}
    />
  );
}

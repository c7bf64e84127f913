import { useCallback, useState } from 'react';
import { readStored, writeStored } from './use-stored.ts';

export const themes = ['system', 'light', 'dark'] as const;
export type Theme = (typeof themes)[number];

const storedAs = 'theme';

const storedTheme = (): Theme => themes.find((theme) => theme === readStored(storedAs)) ?? 'system';

function show(theme: Theme): void {
  if (theme === 'system') delete document.documentElement.dataset['theme'];
  else document.documentElement.dataset['theme'] = theme;
}

/** Called once before the first drawing. */
export const showStoredTheme = (): void => show(storedTheme());

export function useTheme(): [Theme, (theme: Theme) => void] {
  const [theme, setTheme] = useState(storedTheme);
  const choose = useCallback((next: Theme) => {
    setTheme(next);
    writeStored(storedAs, next);
    show(next);
  }, []);
  return [theme, choose];
}

import { usePreferences } from './preferences';
import { themes, type Theme } from './themes';
import { useMedia } from './use-media';

/** The theme in force: the one chosen, else the system's. */
export function useTheme(): Theme {
  const { appearance } = usePreferences();
  const systemDark = useMedia('(prefers-color-scheme: dark)');
  if (appearance === 'system') return systemDark ? themes.dark : themes.light;
  return themes[appearance];
}

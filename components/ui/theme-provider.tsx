/** Provides the theme to everything below it and keeps a person's choice in this browser. */
import { useMemo, useState, type ReactNode } from 'react';
import { useColorScheme } from 'react-native';
import { GlobalStyle } from './global-style';
import { themes } from './theme';
import { ThemeContext, type ThemeState } from './theme-context';
import { keepThemePreference, readThemePreference, themeToShow, type ThemePreference } from './theme-preference';

interface ThemeProviderProps {
  /** The bench is dark until somebody chose otherwise. */
  onBench?: boolean;
  children: ReactNode;
}

export function ThemeProvider({ onBench = false, children }: ThemeProviderProps) {
  const system = useColorScheme() === 'dark' ? 'dark' : 'light';
  const [preference, setPreference] = useState<ThemePreference | null>(() => readThemePreference(window.localStorage));
  const name = themeToShow(preference, system, onBench);
  const state = useMemo<ThemeState>(
    () => ({
      name,
      colours: themes[name],
      preference,
      choose: (chosen) => {
        keepThemePreference(window.localStorage, chosen);
        setPreference(chosen);
      },
    }),
    [name, preference],
  );
  return (
    <ThemeContext value={state}>
      <GlobalStyle colours={state.colours} name={name} />
      {children}
    </ThemeContext>
  );
}

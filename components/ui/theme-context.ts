/** The theme of the tree below: its name, its colours, what was chosen, and how to choose. */
import { createContext, useContext } from 'react';
import { themes, type Colours, type ThemeName } from './theme';
import type { ThemePreference } from './theme-preference';

export interface ThemeState {
  readonly name: ThemeName;
  readonly colours: Colours;
  /** Null until a person chose. */
  readonly preference: ThemePreference | null;
  readonly choose: (preference: ThemePreference) => void;
}

export const ThemeContext = createContext<ThemeState>({ name: 'light', colours: themes.light, preference: null, choose: () => undefined });

export const useTheme = (): ThemeState => useContext(ThemeContext);

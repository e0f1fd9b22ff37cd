/**
 * Which theme is shown. A person's choice is kept in this browser; without one the system decides, except on the bench, which
 * is dark until somebody chose otherwise: pictures are read against a dark surround.
 */
import type { ThemeName } from './theme';

export const themePreferences = ['light', 'dark', 'system'] as const;
export type ThemePreference = (typeof themePreferences)[number];

const storageKey = 'pickglass.theme';

export function readThemePreference(storage: Pick<Storage, 'getItem'>): ThemePreference | null {
  const kept = storage.getItem(storageKey);
  return themePreferences.find((preference) => preference === kept) ?? null;
}

export function keepThemePreference(storage: Pick<Storage, 'setItem'>, preference: ThemePreference): void {
  storage.setItem(storageKey, preference);
}

/** The theme to show, from the choice (null: none was made), what the system asks, and whether this is the bench. */
export function themeToShow(choice: ThemePreference | null, system: ThemeName, onBench: boolean): ThemeName {
  if (choice === 'light' || choice === 'dark') return choice;
  if (choice === null && onBench) return 'dark';
  return system;
}

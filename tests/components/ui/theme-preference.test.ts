import { keepThemePreference, readThemePreference, themeToShow } from '@/components/ui/theme-preference';

describe('the theme that is shown', () => {
  test('is the one that was chosen, on the bench too', () => {
    expect(themeToShow('light', 'dark', true)).toBe('light');
    expect(themeToShow('dark', 'light', false)).toBe('dark');
  });

  test('follows the system when nobody chose, except on the bench, which is dark', () => {
    expect(themeToShow(null, 'light', false)).toBe('light');
    expect(themeToShow(null, 'light', true)).toBe('dark');
  });

  test('follows the system on the bench as well when that was asked for', () => {
    expect(themeToShow('system', 'light', true)).toBe('light');
  });

  test('is remembered in this browser, and a word that is no theme is ignored', () => {
    keepThemePreference(window.localStorage, 'dark');
    expect(readThemePreference(window.localStorage)).toBe('dark');
    window.localStorage.setItem('pickglass.theme', 'mauve');
    expect(readThemePreference(window.localStorage)).toBeNull();
    window.localStorage.clear();
  });
});

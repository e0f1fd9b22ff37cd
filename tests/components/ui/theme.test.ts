import { dark, light, themes, type Colours } from '@/components/ui/theme';

/** Relative luminance and contrast ratio, WCAG 2.2, definitions 'relative luminance' and 'contrast ratio'. */
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((start) => {
    const value = Number.parseInt(hex.slice(start, start + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}
function contrast(first: string, second: string): number {
  const [high = 0, low = 0] = [luminance(first), luminance(second)].sort((a, b) => b - a);
  return (high + 0.05) / (low + 0.05);
}

const grounds = ['cloth', 'clothRaised', 'clothSunk'] as const;
const words = ['ink', 'inkSoft', 'inkFaint', 'indigo', 'weld', 'madder', 'orchil'] as const;

describe('the two themes', () => {
  test('have the same tokens: one that is missing in either fails here, and does not compile', () => {
    expect(Object.keys(dark).sort()).toEqual(Object.keys(light).sort());
  });

  test('write every colour as six hexadecimal digits', () => {
    for (const theme of Object.values(themes)) for (const colour of Object.values(theme)) expect(colour).toMatch(/^#[0-9A-F]{6}$/);
  });

  // WCAG 2.2, success criterion 1.4.3: text has a contrast of at least 4.5:1.
  test.each(Object.entries(themes))('%s: words can be read on every ground', (_name, theme: Colours) => {
    const low = grounds.flatMap((ground) =>
      words.filter((word) => contrast(theme[ground], theme[word]) < 4.5).map((word) => `${word} on ${ground}`),
    );
    expect(low).toEqual([]);
    expect(contrast(theme.indigoFill, theme.onIndigo)).toBeGreaterThanOrEqual(4.5);
  });

  test.each(Object.entries(themes))('%s: words and dyes can be read on the mat around a picture', (_name, theme: Colours) => {
    const onMat = ['matInk', 'matInkSoft', 'madder', 'orchil'] as const;
    expect(onMat.filter((word) => contrast(theme.mat, theme[word]) < 4.5)).toEqual([]);
  });

  // WCAG 2.2, success criterion 1.4.11: the border of a control has a contrast of at least 3:1.
  test.each(Object.entries(themes))('%s: the border of a control can be seen', (_name, theme: Colours) => {
    expect(grounds.filter((ground) => contrast(theme[ground], theme.ruleStrong) < 3)).toEqual([]);
  });

  // The eye judges grey levels against the surround, so it must carry no tint: a fact of the trade (common practice).
  test.each(Object.entries(themes))('%s: the mat is neutral grey', (_name, theme: Colours) => {
    for (const name of ['mat', 'matRaised', 'matRule', 'matInk', 'matInkSoft'] as const) {
      const [red, green, blue] = [1, 3, 5].map((start) => theme[name].slice(start, start + 2));
      expect([green, blue]).toEqual([red, red]);
    }
  });
});

/**
 * The whole design language in one file: colours of both themes, type, rhythm, motion. One type for both themes: a token missing
 * in one of them does not compile. Around a picture (`mat…`) only neutral grey, so that nothing tints the eye.
 */

export interface Colours {
  /** Page and panel ground. */
  cloth: string;
  /** Sheet, field, pressed row. */
  clothRaised: string;
  /** Rail and filter band. */
  clothSunk: string;
  /** Hairline between rows; never the border of a control. */
  rule: string;
  /** Border of a control, ruler, slider thread (3:1). */
  ruleStrong: string;
  ink: string;
  inkSoft: string;
  inkFaint: string;
  /** Action: links, focus, the thread of a slider. */
  indigo: string;
  /** Ground of the one primary button. */
  indigoFill: string;
  onIndigo: string;
  /** Marks, selection, alert: as words. */
  weld: string;
  /** The same as lines. */
  weldThread: string;
  /** Danger, and the bad image. */
  madder: string;
  /** Comparison, simulated, corrected. */
  orchil: string;
  mat: string;
  matRaised: string;
  matRule: string;
  matInk: string;
  matInkSoft: string;
}

export const dark: Colours = {
  cloth: '#0D1219',
  clothRaised: '#121922',
  clothSunk: '#090D12',
  rule: '#26303C',
  ruleStrong: '#5D6B7C',
  ink: '#E4E7EA',
  inkSoft: '#B2BBC4',
  inkFaint: '#8A95A3',
  indigo: '#9DB1F7',
  indigoFill: '#3E55B4',
  onIndigo: '#FFFFFF',
  weld: '#E3C94F',
  weldThread: '#E3C94F',
  madder: '#F2836E',
  orchil: '#CBA3EA',
  mat: '#171717',
  matRaised: '#222222',
  matRule: '#3C3C3C',
  matInk: '#E2E2E2',
  matInkSoft: '#A3A3A3',
};

export const light: Colours = {
  cloth: '#F2EDE2',
  clothRaised: '#F9F6EF',
  clothSunk: '#E9E2D4',
  rule: '#D3CAB9',
  ruleStrong: '#857B68',
  ink: '#22201B',
  inkSoft: '#4D483E',
  inkFaint: '#655E50',
  indigo: '#2E4291',
  indigoFill: '#2E4291',
  onIndigo: '#FFFFFF',
  weld: '#6F5700',
  weldThread: '#8A6B00',
  madder: '#A02C1B',
  orchil: '#6E3287',
  mat: '#DADADA',
  matRaised: '#E8E8E8',
  matRule: '#B0B0B0',
  matInk: '#1C1C1C',
  matInkSoft: '#484848',
};

export const themes = { light, dark } as const;
export type ThemeName = keyof typeof themes;

/** Lines drawn on a picture: the same in both themes, 1.5 px with a 1 px casing on both sides. */
export const onImage = { mark: '#E3C94F', casing: '#000000', width: 1.5 } as const;

/** Families as they are registered in app/_layout. Mono: numbers, labels, headings. Sans: sentences, case titles too. */
export const fonts = {
  mono: 'JetBrainsMono_400Regular',
  monoMedium: 'JetBrainsMono_500Medium',
  monoSemiBold: 'JetBrainsMono_600SemiBold',
  sans: 'AtkinsonHyperlegible_400Regular',
  sansBold: 'AtkinsonHyperlegible_700Bold',
} as const;

/** Pixels. Nothing below 11. */
export const sizes = { caption: 11, small: 12, label: 13, detail: 14, heading: 15, body: 16, title: 20, display: 28 } as const;

/** The grid is 4 pixels: `space(3)` is 12. */
export const space = (steps: number): number => steps * 4;

export const radius = { none: 0, control: 2 } as const;
/** Smallest target of a finger. */
export const touchTarget = 44;
export const gutter = { phone: 16, wide: 24 } as const;

/** Milliseconds; zero when the system asks for reduced motion. */
export const motion = { quick: 90, sheet: 180 } as const;

/** Widths at which the layout gains columns, not features. */
export const breakpoints = { tablet: 720, wide: 1140 } as const;
export type LayoutWidth = 'phone' | 'tablet' | 'wide';
export const layoutFor = (width: number): LayoutWidth =>
  width >= breakpoints.wide ? 'wide' : width >= breakpoints.tablet ? 'tablet' : 'phone';

/**
 * Text in the two families: mono carries numbers, labels and headings, sans carries sentences (case titles too). A variant fixes
 * family, size and line height on the 4-pixel grid; a tone fixes the colour.
 */
import type { ReactNode } from 'react';
import { Text as NativeText, type StyleProp, type TextProps as NativeTextProps, type TextStyle } from 'react-native';
import { fonts, sizes, type Colours } from './theme';
import { useTheme } from './theme-context';

const mono = (size: number, lineHeight: number, fontFamily: string = fonts.mono): TextStyle => ({
  fontFamily,
  fontSize: size,
  lineHeight,
  letterSpacing: -0.01 * size,
});
const sans = (size: number, lineHeight: number, fontFamily: string = fonts.sans): TextStyle => ({ fontFamily, fontSize: size, lineHeight });

export const textVariants = {
  display: { ...mono(sizes.display, 36, fonts.monoSemiBold), letterSpacing: -0.04 * sizes.display },
  title: { ...mono(sizes.title, 28, fonts.monoSemiBold), letterSpacing: -0.02 * sizes.title },
  heading: mono(sizes.heading, 20, fonts.monoSemiBold),
  control: mono(sizes.detail, 20, fonts.monoMedium),
  label: mono(sizes.label, 20, fonts.monoMedium),
  labelStrong: mono(sizes.label, 20, fonts.monoSemiBold),
  mono: mono(sizes.label, 20),
  small: mono(sizes.small, 16),
  smallStrong: mono(sizes.small, 16, fonts.monoSemiBold),
  caption: mono(sizes.caption, 16),
  number: mono(sizes.heading, 20, fonts.monoMedium),
  sans: sans(sizes.body, 24),
  detail: sans(sizes.detail, 20),
  detailStrong: sans(sizes.detail, 20, fonts.sansBold),
  row: sans(sizes.heading, 20),
  caseTitle: sans(sizes.body, 20, fonts.sansBold),
} as const satisfies Record<string, TextStyle>;
export type TextVariant = keyof typeof textVariants;
export type TextTone = keyof Pick<
  Colours,
  'ink' | 'inkSoft' | 'inkFaint' | 'indigo' | 'weld' | 'madder' | 'orchil' | 'onIndigo' | 'matInk' | 'matInkSoft'
>;

export interface TextProps extends Omit<NativeTextProps, 'style'> {
  variant?: TextVariant;
  tone?: TextTone;
  /** Level of a heading, for those who hear the page. */
  level?: 1 | 2 | 3;
  style?: StyleProp<TextStyle>;
  children?: ReactNode;
}

export function Text({ variant = 'sans', tone = 'ink', level, style, ...rest }: TextProps) {
  const { colours } = useTheme();
  return (
    <NativeText
      {...(level ? { role: 'heading' as const, 'aria-level': level } : {})}
      {...rest}
      style={[textVariants[variant], { color: colours[tone] }, style]}
    />
  );
}

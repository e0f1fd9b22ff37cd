/** A glyph and its word. Meaning never rests on the colour alone. */
import { View } from 'react-native';
import { Glyph } from './glyph';
import type { GlyphName } from './glyph-paths';
import { stitchedLine } from './stitches';
import { Text, type TextTone } from './text';
import { useTheme } from './theme-context';

interface BadgeProps {
  glyph: GlyphName;
  word: string;
  tone?: TextTone;
  small?: boolean;
  strong?: boolean;
  /** Not yet: a stitched line under glyph and word. */
  stitched?: boolean;
}

export function Badge({ glyph, word, tone = 'ink', small = false, strong = false, stitched = false }: BadgeProps) {
  const { colours } = useTheme();
  return (
    <View
      style={[
        { flexDirection: 'row', alignItems: 'center', gap: small ? 6 : 8, minHeight: 20 },
        stitched ? [{ alignSelf: 'flex-start' as const }, stitchedLine(colours.ruleStrong)] : null,
      ]}
    >
      <Glyph name={glyph} colour={colours[tone]} />
      <Text variant={small ? 'small' : strong ? 'labelStrong' : 'mono'} tone={tone} style={{ lineHeight: 20 }} numberOfLines={1}>
        {word}
      </Text>
    </View>
  );
}

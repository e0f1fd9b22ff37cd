/** A trail: knots on a warp thread, the newest at the top. What is still to come hangs on stitches. */
import { View } from 'react-native';
import { Glyph } from '@/components/ui/glyph';
import type { GlyphName } from '@/components/ui/glyph-paths';
import { webStyle } from '@/components/ui/stitches';
import { Text } from '@/components/ui/text';
import { useTheme } from '@/components/ui/theme-context';

export interface Knot {
  readonly id: string;
  readonly glyph: GlyphName;
  readonly when: string;
  readonly text: string;
  /** Not happened yet: the thread to it is stitched. */
  readonly coming?: boolean;
}

interface TrailProps {
  label: string;
  knots: readonly Knot[];
  /** The sentence first, the time or the remark under it. */
  textFirst?: boolean;
}

export function Trail({ label, knots, textFirst = false }: TrailProps) {
  const { colours } = useTheme();
  const thread = (stitched: boolean) =>
    webStyle({
      position: 'absolute',
      left: 7,
      width: 2,
      backgroundImage: stitched
        ? `repeating-linear-gradient(180deg, ${colours.ruleStrong} 0 4px, transparent 4px 7px)`
        : `linear-gradient(${colours.ruleStrong}, ${colours.ruleStrong})`,
    });
  return (
    <View role="list" aria-label={label}>
      {knots.map((knot, index) => {
        const next = knots[index + 1];
        const when = (
          <Text variant="small" tone="inkFaint">
            {knot.when}
          </Text>
        );
        return (
          <View key={knot.id} role="listitem" style={{ paddingLeft: 28, paddingBottom: 14, minHeight: 40 }}>
            {next ? <View style={[thread(next.coming ?? false), { top: 10, bottom: -10 }]} /> : null}
            <View style={{ position: 'absolute', left: 0, top: 2, backgroundColor: colours.cloth }}>
              <Glyph name={knot.glyph} colour={colours.ink} />
            </View>
            {textFirst ? null : when}
            <Text variant="detail">{knot.text}</Text>
            {textFirst ? when : null}
          </View>
        );
      })}
    </View>
  );
}

/**
 * A picture on the mat with its phase-encode edge and, under it, what it is. The ladder lies below where phase was encoded left
 * and right, stands at the left where it was encoded up and down, and is missing where nobody knows.
 */
import { View } from 'react-native';
import { Badge } from '@/components/ui/badge';
import type { GlyphName } from '@/components/ui/glyph-paths';
import { Ladder, ladderThickness } from '@/components/ui/ladder';
import { Picture } from '@/components/ui/picture';
import { Selvedge } from '@/components/ui/selvedge';
import { Text, type TextTone } from '@/components/ui/text';
import type { PhaseEncode } from '@/server/contract/facts';

interface FigureProps {
  source: string;
  alt: string;
  size: number;
  /** Lines of k-space along the phase encoding. */
  lines: number;
  phaseEncode: PhaseEncode | null;
  /** What the ladder says: it counts lines under a k-space. */
  edge?: string;
  role: { word: string; glyph: GlyphName; tone: TextTone };
  note?: string;
  simulated?: boolean;
}

export function Figure({ source, alt, size, lines, phaseEncode, edge = 'phase encode', role, note, simulated = false }: FigureProps) {
  const upright = phaseEncode === 'column';
  const side = upright ? size - ladderThickness : size;
  return (
    <View role="figure" aria-label={alt} style={{ width: size + (simulated ? 18 : 0) }}>
      <View style={{ flexDirection: 'row', height: upright ? side : size + ladderThickness }}>
        {upright ? <Ladder length={side} lines={lines} upright word={edge} /> : null}
        <View>
          <View style={{ flexDirection: 'row' }}>
            <Picture source={source} alt={alt} size={side} mat={0} />
            {simulated ? <Selvedge height={side} /> : null}
          </View>
          {phaseEncode === 'row' ? <Ladder length={side} lines={lines} word={edge} /> : null}
        </View>
      </View>
      <View style={{ paddingTop: 4 }}>
        <Badge {...role} small />
        {note ? (
          <Text variant="small" tone="matInkSoft" numberOfLines={1}>
            {note}
          </Text>
        ) : null}
      </View>
    </View>
  );
}

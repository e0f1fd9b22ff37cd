/** The heads of the sample book's columns: the ladder over what runs along the phase encoding, the ruler over the readout. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { fonts } from '@/components/ui/theme';
import { ThemeContext, useTheme } from '@/components/ui/theme-context';
import { Ladder } from '@/components/ui/ladder';
import { alongWords, type Along } from './cause-words';

/** A plain scale: a tick every 8 pixels, the first one longer. */
function Ruler({ length, word }: { length: number; word: string }) {
  const { colours } = useTheme();
  const ticks = Array.from({ length: Math.floor(length / 8) }, (_, tick) => `M${8 * (tick + 1) + 0.5} 0V5`).join('');
  return (
    <svg width={length} height={30} viewBox={`0 0 ${length} 30`} shapeRendering="crispEdges" aria-hidden style={{ display: 'block' }}>
      <path d={`M.5 0V9${ticks}`} stroke={colours.ruleStrong} fill="none" />
      <text x={length / 2} y={23} textAnchor="middle" fill={colours.inkSoft} fontFamily={fonts.mono} fontSize={11}>
        {word}
      </text>
    </svg>
  );
}

/** The ladder is made for the mat; here it stands on the cloth. */
function LadderOnCloth({ length }: { length: number }) {
  const theme = useTheme();
  const { ink, ruleStrong } = theme.colours;
  return (
    <ThemeContext value={{ ...theme, colours: { ...theme.colours, matInk: ink, matInkSoft: ruleStrong } }}>
      <Ladder length={length} lines={512} word="runs along phase encode" />
    </ThemeContext>
  );
}

export function EdgeHead({ along, length }: { along: Along; length: number }) {
  if (along === 'phase-encode') return <LadderOnCloth length={length} />;
  if (along === 'readout') return <Ruler length={length} word="readout" />;
  return (
    <View style={{ paddingTop: 11 }}>
      <Text variant="caption">{alongWords[along]}</Text>
    </View>
  );
}

/** The header is silent on the phase-encode axis: the bench asks, and simulates nothing until it is told. */
import { View } from 'react-native';
import { Glyph } from '@/components/ui/glyph';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { PhaseEncodeChoice } from './phase-encode-choice';

export function PhaseEncodeQuestion() {
  const { colours } = useTheme();
  return (
    <View
      role="alert"
      style={{
        borderLeftWidth: 3,
        borderLeftColor: colours.weldThread,
        paddingLeft: space(3),
        paddingVertical: space(1),
        marginVertical: space(2),
      }}
    >
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space(2) }}>
        <Glyph name="danger" colour={colours.weld} />
        <Text variant="heading" tone="weld">
          Which way was phase encoded?
        </Text>
      </View>
      <Text variant="detail" tone="inkSoft">
        The header does not say, and every recipe turns with it. Look at the protocol: ghosts and wrap run along this axis.
      </Text>
      <PhaseEncodeChoice />
    </View>
  );
}

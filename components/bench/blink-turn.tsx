/** Blink by hand: each press turns to the other picture. It is the only way where the system asks for no motion. */
import { View } from 'react-native';
import { Badge } from '@/components/ui/badge';
import { Press } from '@/components/ui/press';
import { Text } from '@/components/ui/text';
import { space, touchTarget } from '@/components/ui/theme';
import { useBench } from './bench-context';

export function BlinkTurn() {
  const { blinksToBad, holdBlink } = useBench();
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space(3) }}>
      <Text variant="small" tone="inkSoft">
        on the table
      </Text>
      <Press
        aria-label={`turn to the ${blinksToBad ? 'simulated' : 'bad'} picture`}
        onPress={() => holdBlink(!blinksToBad)}
        style={() => ({ minWidth: 104, minHeight: touchTarget, justifyContent: 'center' })}
      >
        <Badge
          glyph={blinksToBad ? 'bad' : 'simulated'}
          word={blinksToBad ? 'bad' : 'simulated'}
          tone={blinksToBad ? 'madder' : 'orchil'}
          small
        />
      </Press>
    </View>
  );
}

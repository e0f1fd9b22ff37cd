/** A key and what it does, at the foot of a wide screen. */
import { View } from 'react-native';
import { Text } from './text';
import { radius, space } from './theme';
import { useTheme } from './theme-context';

interface KeyHintProps {
  keys: string;
  does: string;
}

export function KeyHint({ keys, does }: KeyHintProps) {
  const { colours } = useTheme();
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space(2) }}>
      <View style={{ borderWidth: 1, borderColor: colours.ruleStrong, borderRadius: radius.control, paddingHorizontal: 5 }}>
        <Text variant="small">{keys}</Text>
      </View>
      <Text variant="small" tone="inkSoft">
        {does}
      </Text>
    </View>
  );
}

/** A fact in two columns: what it is, and what it says. A rule under each. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';

export function FactLine({ name, value }: { name: string; value: string }) {
  const { colours } = useTheme();
  return (
    <View
      style={{
        minHeight: 30,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space(3),
        paddingVertical: space(1),
        borderBottomWidth: 1,
        borderBottomColor: colours.rule,
      }}
    >
      <Text variant="small" tone="inkSoft" style={{ width: 104 }}>
        {name}
      </Text>
      <Text variant="mono" style={{ flex: 1 }}>
        {value}
      </Text>
    </View>
  );
}

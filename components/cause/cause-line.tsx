/** A line of a cause's page: a word at the left, a sentence beside it, a hairline under both. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';

export function CauseLine({ name, children }: { name: string; children: ReactNode }) {
  const { colours } = useTheme();
  return (
    <View
      style={{ flexDirection: 'row', alignItems: 'baseline', paddingVertical: 6, borderBottomWidth: 1, borderBottomColor: colours.rule }}
    >
      <Text variant="small" tone="inkFaint" style={{ width: 108, paddingRight: space(3) }}>
        {name}
      </Text>
      <Text variant="detail" style={{ flex: 1 }}>
        {children}
      </Text>
    </View>
  );
}

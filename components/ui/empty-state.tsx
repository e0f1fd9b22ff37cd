/** Nothing here yet: what belongs here in a sentence, and the one thing to do about it. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from './text';
import { space } from './theme';
import { useTheme } from './theme-context';

interface EmptyStateProps {
  text: string;
  action?: ReactNode;
}

export function EmptyState({ text, action }: EmptyStateProps) {
  const { colours } = useTheme();
  return (
    <View
      style={{ borderTopWidth: 1, borderBottomWidth: 1, borderColor: colours.rule, paddingVertical: space(3), alignItems: 'flex-start' }}
    >
      <Text variant="detail" tone="inkSoft">
        {text}
      </Text>
      {action}
    </View>
  );
}

/** A heading of the eye, with a word at its right. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';

interface EyeHeadingProps {
  title: string;
  aside?: string;
  action?: ReactNode;
}

export function EyeHeading({ title, aside, action }: EyeHeadingProps) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space(2), minHeight: 44, paddingTop: space(1) }}>
      <Text variant="heading" level={2}>
        {title}
      </Text>
      {aside ? (
        <Text variant="small" tone="inkFaint" numberOfLines={1} style={{ flexShrink: 1 }}>
          {aside}
        </Text>
      ) : null}
      {action ? <View style={{ marginLeft: 'auto' }}>{action}</View> : null}
    </View>
  );
}

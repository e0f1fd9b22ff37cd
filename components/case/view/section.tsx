/** A section of a case: its head and, at the right, what can be done in it. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';

interface SectionProps {
  title: string;
  aside?: ReactNode;
  children: ReactNode;
}

export function Section({ title, aside, children }: SectionProps) {
  return (
    <View role="region" aria-label={title}>
      <View style={{ flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', minHeight: 56, paddingTop: space(3) }}>
        <Text variant="heading" level={2}>
          {title}
        </Text>
        {aside}
      </View>
      {children}
    </View>
  );
}

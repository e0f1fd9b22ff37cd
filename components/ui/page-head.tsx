/** The head of a place: on a phone the mark and its name, on a wide screen the name alone, the rail carries the mark. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Mark } from './mark';
import { Text } from './text';
import { gutter, space } from './theme';
import { useTheme } from './theme-context';
import { useLayout } from './use-layout';

interface PageHeadProps {
  title: string;
  /** At the right. */
  end?: ReactNode;
  /** Between title and end, on a wide screen. */
  children?: ReactNode;
}

export function PageHead({ title, end, children }: PageHeadProps) {
  const { colours } = useTheme();
  const wide = useLayout() === 'wide';
  return (
    <View
      style={
        wide
          ? { height: 72, paddingHorizontal: gutter.wide, flexDirection: 'row', alignItems: 'center', gap: space(6) }
          : { height: 56, paddingLeft: gutter.phone, paddingRight: space(1), flexDirection: 'row', alignItems: 'center', gap: space(3) }
      }
    >
      {wide ? null : <Mark size={24} colour={colours.ink} />}
      <Text variant="title" level={1}>
        {title}
      </Text>
      {children}
      <View style={{ marginLeft: 'auto', flexDirection: 'row', alignItems: 'center', gap: space(2) }}>{end}</View>
    </View>
  );
}

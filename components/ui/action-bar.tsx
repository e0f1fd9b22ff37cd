/** The actions of a screen, held at its foot; the filled one at the right. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { gutter, space } from './theme';
import { useTheme } from './theme-context';
import { useLayout } from './use-layout';

interface ActionBarProps {
  children: ReactNode;
}

export function ActionBar({ children }: ActionBarProps) {
  const { colours } = useTheme();
  const wide = useLayout() === 'wide';
  return (
    <View
      style={{
        flexDirection: 'row',
        justifyContent: wide ? 'flex-end' : 'flex-start',
        gap: space(2),
        paddingHorizontal: wide ? gutter.wide : gutter.phone,
        paddingTop: space(2),
        paddingBottom: space(3),
        backgroundColor: colours.cloth,
        borderTopWidth: 1,
        borderTopColor: colours.rule,
      }}
    >
      {children}
    </View>
  );
}

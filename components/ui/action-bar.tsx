/** The actions of a screen, held at its foot; the filled one at the right. */
import type { ReactNode } from 'react';
import { View } from 'react-native';
import { space } from './theme';
import { useTheme } from './theme-context';

interface ActionBarProps {
  children: ReactNode;
}

export function ActionBar({ children }: ActionBarProps) {
  const { colours } = useTheme();
  return (
    <View
      style={{
        flexDirection: 'row',
        gap: space(2),
        paddingHorizontal: space(4),
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

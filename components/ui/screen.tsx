/** A screen: its head, what scrolls, and the actions that stay at the foot. */
import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { useTheme } from './theme-context';
import { usePageTitle } from './use-page-title';

interface ScreenProps {
  title: string;
  head?: ReactNode;
  actions?: ReactNode;
  children: ReactNode;
  /** The content fills the height and scrolls by itself. */
  still?: boolean;
}

export function Screen({ title, head, actions, children, still = false }: ScreenProps) {
  const { colours } = useTheme();
  usePageTitle(title);
  return (
    <View role="main" style={{ flex: 1, backgroundColor: colours.cloth }}>
      {head}
      {still ? (
        <View style={{ flex: 1, minHeight: 0 }}>{children}</View>
      ) : (
        <ScrollView style={{ flex: 1 }} contentContainerStyle={{ flexGrow: 1 }}>
          {children}
        </ScrollView>
      )}
      {actions}
    </View>
  );
}

/** A dialog: an ink frame on laid threads. Escape closes it; focus stays inside and goes back to where it came from. */
import type { ReactNode } from 'react';
import { Modal, ScrollView, View } from 'react-native';
import { webStyle } from './stitches';
import { Text } from './text';
import { space } from './theme';
import { useTheme } from './theme-context';

interface DialogProps {
  title: string;
  text?: string;
  onClose: () => void;
  /** The fields. */
  children?: ReactNode;
  /** The buttons, the filled one last. */
  actions: ReactNode;
}

export function Dialog({ title, text, onClose, children, actions }: DialogProps) {
  const { colours } = useTheme();
  const laid = webStyle({
    backgroundImage: `repeating-linear-gradient(0deg, ${colours.rule} 0 1px, transparent 1px 4px)`,
  });
  return (
    <Modal transparent visible animationType="none" onRequestClose={onClose}>
      <View style={[{ position: 'absolute', inset: 0, opacity: 0.92, backgroundColor: colours.clothSunk }, laid]} />
      <View style={{ flex: 1, alignItems: 'center', justifyContent: 'center', padding: space(4) }}>
        <View
          role="dialog"
          aria-modal
          aria-label={title}
          style={{
            width: '100%',
            maxWidth: 440,
            maxHeight: '100%',
            borderWidth: 1,
            borderColor: colours.ink,
            backgroundColor: colours.cloth,
          }}
        >
          <ScrollView contentContainerStyle={{ padding: space(5), gap: space(3) }}>
            <Text variant="heading" level={2}>
              {title}
            </Text>
            {text ? (
              <Text variant="detail" tone="inkSoft">
                {text}
              </Text>
            ) : null}
            {children}
            <View style={{ flexDirection: 'row', gap: space(2), paddingTop: space(1) }}>{actions}</View>
          </ScrollView>
        </View>
      </View>
    </Modal>
  );
}

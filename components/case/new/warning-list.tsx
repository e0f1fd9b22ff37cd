/** What to know about an image before anything is concluded from it. */
import { View } from 'react-native';
import { Glyph } from '@/components/ui/glyph';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Image } from '@/server/contract/images';

export function WarningList({ warnings }: { warnings: Image['warnings'] }) {
  const { colours } = useTheme();
  return (
    <View
      role="list"
      aria-label="what to know about this image"
      style={{ paddingTop: space(2), borderBottomWidth: 1, borderBottomColor: colours.rule }}
    >
      {warnings.map(({ code, text }) => (
        <View
          key={code}
          role="listitem"
          style={{ flexDirection: 'row', gap: space(2), paddingVertical: 6, borderTopWidth: 1, borderTopColor: colours.rule }}
        >
          <View style={{ paddingTop: 2 }}>
            <Glyph name="note" colour={colours.orchil} />
          </View>
          <Text variant="detail" tone="inkSoft" style={{ flex: 1 }}>
            {text}
          </Text>
        </View>
      ))}
    </View>
  );
}

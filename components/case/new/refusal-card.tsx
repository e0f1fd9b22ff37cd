/** A file that was not taken: why and what helps, in the server's words, and the two ways on. Nothing of it was kept. */
import { View } from 'react-native';
import { Badge } from '@/components/ui/badge';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Refusal } from '@/server/contract/images';
import { FileButton } from './file-button';
import { refusalTitles } from './refusal-words';

interface RefusalCardProps {
  refusal: Refusal;
  onChooseAnother: (files: File[]) => void;
  onLeaveOut: () => void;
}

export function RefusalCard({ refusal, onChooseAnother, onLeaveOut }: RefusalCardProps) {
  const { colours } = useTheme();
  return (
    <View
      role="alert"
      style={{
        paddingTop: space(4),
        paddingBottom: space(5),
        paddingHorizontal: gutter.phone,
        paddingLeft: gutter.phone - 3,
        backgroundColor: colours.clothRaised,
        borderBottomWidth: 1,
        borderBottomColor: colours.rule,
        borderLeftWidth: 3,
        borderLeftColor: colours.madder,
      }}
    >
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space(3) }}>
        <Badge glyph="danger" word="refused" tone="madder" strong />
        <Text variant="small" tone="inkFaint" numberOfLines={1} style={{ flex: 1, textAlign: 'right' }}>
          {refusal.name}
        </Text>
      </View>
      <Text variant="heading" level={2} style={{ fontSize: 17, lineHeight: 24, paddingTop: space(2), paddingBottom: 6 }}>
        {refusalTitles[refusal.code]}
      </Text>
      <Text variant="detail" tone="inkSoft">
        {refusal.reason} Nothing of this file was kept.
      </Text>
      <View style={{ flexDirection: 'row', gap: space(2), paddingTop: space(3) }}>
        <FileButton label="choose another" grow onFiles={onChooseAnother} />
        <Button label="leave it out" kind="plain" onPress={onLeaveOut} />
      </View>
    </View>
  );
}

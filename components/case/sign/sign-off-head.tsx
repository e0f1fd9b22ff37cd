/** The head of the sign-off on a wide screen. */
import { View } from 'react-native';
import { GlyphButton } from '@/components/ui/glyph-button';
import { Text } from '@/components/ui/text';
import { fonts, gutter, space } from '@/components/ui/theme';
import type { Case } from '@/server/contract/cases';
import { caseNumber } from '../words';

export function SignOffHead({ found }: { found: Case }) {
  return (
    <View style={{ height: 72, flexDirection: 'row', alignItems: 'center', gap: space(3), paddingHorizontal: gutter.wide }}>
      <View style={{ marginLeft: -14 }}>
        <GlyphButton glyph="left" label="to the case" href={{ pathname: '/cases/[caseId]', params: { caseId: found.id } }} />
      </View>
      <Text variant="title" tone="inkFaint" style={{ fontFamily: fonts.mono }}>
        {caseNumber(found.number)}
      </Text>
      <Text variant="title" level={1}>
        Sign off
      </Text>
      <Text variant="detail" tone="inkSoft" numberOfLines={1} style={{ flex: 1, textAlign: 'right' }}>
        {found.title}
      </Text>
    </View>
  );
}

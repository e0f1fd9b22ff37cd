/** The signature under a closed case: who, when, the lines that were stood by and those left open, and the digest. */
import { View } from 'react-native';
import { Badge } from '@/components/ui/badge';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Case } from '@/server/contract/cases';
import { dayOf } from '../age';
import { roleWords } from '../words';

interface SignatureProps {
  signature: NonNullable<Case['signature']>;
  openedAt: string;
}

export function Signature({ signature, openedAt }: SignatureProps) {
  const { colours } = useTheme();
  const { member, at, attested, digest } = signature;
  return (
    <View
      role="group"
      aria-label="signature"
      style={{ marginTop: space(4), padding: space(4), borderWidth: 1, borderColor: colours.ink, gap: space(1) }}
    >
      <Badge glyph="closed" word={`signed by ${member.name}, ${roleWords[member.role]}`} strong />
      <Text variant="small" tone="inkSoft">
        {dayOf(at, openedAt)}
      </Text>
      {attested.map(({ line, stands }) => (
        <View key={line} style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space(3) }}>
          <View style={{ width: 88 }}>
            <Badge glyph={stands ? 'yes' : 'no'} word={stands ? 'stands' : 'open'} small tone={stands ? 'ink' : 'inkSoft'} />
          </View>
          <Text variant="detail" tone={stands ? 'ink' : 'inkSoft'} style={{ flex: 1, minWidth: 180 }}>
            {line}
          </Text>
        </View>
      ))}
      <Text variant="caption" tone="inkFaint" selectable style={{ paddingTop: space(1) }}>
        SHA-256 {digest}
      </Text>
    </View>
  );
}

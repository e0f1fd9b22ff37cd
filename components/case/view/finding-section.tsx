/** The finding: cause, how sure, in words, and the lesson. Those who may write it write it here. */
import { useState } from 'react';
import { View } from 'react-native';
import { useCauses } from '@/components/api/catalogue';
import { Badge } from '@/components/ui/badge';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkText } from '@/components/ui/link-text';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Case } from '@/server/contract/cases';
import { confidenceWords, roleWords } from '../words';
import { FindingForm } from './finding-form';
import { Section } from './section';
import { Signature } from './signature';

const hatched = new Set(['reproduced', 'removed', 'reproduced-and-removed']);

export function FindingSection({ found }: { found: Case }) {
  const { colours } = useTheme();
  const causes = useCauses();
  const [writing, setWriting] = useState(false);
  const { finding, may, signature } = found;
  const cause = finding?.cause ? (causes.data?.find(({ id }) => id === finding.cause)?.title ?? finding.cause) : 'cause not found';
  const change = may.writeFinding && finding && !writing ? <LinkText label="write it anew" onPress={() => setWriting(true)} /> : null;
  return (
    <Section title="Finding" aside={change}>
      {writing ? <FindingForm found={found} onDone={() => setWriting(false)} /> : null}
      {!writing && finding ? (
        <View>
          <View style={{ borderLeftWidth: 2, borderLeftColor: colours.ink, paddingLeft: space(4) }}>
            <Text>{finding.text}</Text>
          </View>
          <View
            style={{
              flexDirection: 'row',
              flexWrap: 'wrap',
              columnGap: space(3),
              paddingVertical: 6,
              marginTop: space(2),
              borderBottomWidth: 1,
              borderBottomColor: colours.rule,
            }}
          >
            <View style={{ minWidth: 156 }}>
              <Badge glyph={hatched.has(finding.confidence) ? 'yes' : 'no'} word={confidenceWords[finding.confidence]} small />
            </View>
            <Text variant="detail" tone="inkSoft">
              {cause}
            </Text>
          </View>
          {finding.lesson ? (
            <View style={{ paddingVertical: 6, borderBottomWidth: 1, borderBottomColor: colours.rule }}>
              <Text variant="small" tone="inkFaint">
                lesson
              </Text>
              <Text variant="detail">{finding.lesson}</Text>
            </View>
          ) : null}
          <Text variant="small" tone="inkFaint" style={{ paddingTop: 6 }}>
            {finding.author.name}, {roleWords[finding.author.role]}
          </Text>
        </View>
      ) : null}
      {!writing && !finding ? (
        <EmptyState
          text={may.writeFinding ? 'No finding yet. Write what caused it, or that it was not found.' : 'No finding yet.'}
          action={may.writeFinding ? <LinkText label="write the finding" onPress={() => setWriting(true)} /> : null}
        />
      ) : null}
      {signature ? <Signature signature={signature} openedAt={found.openedAt} /> : null}
    </Section>
  );
}

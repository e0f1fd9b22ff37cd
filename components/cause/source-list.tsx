/** Where a model is published, each with its standing: confirmed, from memory, common practice. Only the confirmed is solid. */
import { View } from 'react-native';
import { Badge } from '@/components/ui/badge';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { CatalogueEntry } from '@/server/contract/catalogue';

export function SourceList({ sources }: { sources: CatalogueEntry['sources'] }) {
  const { colours } = useTheme();
  return (
    <View role="list">
      {sources.map((source) => (
        <View
          role="listitem"
          key={`${source.citation} ${source.equation ?? ''}`}
          style={{
            flexDirection: 'row',
            flexWrap: 'wrap',
            alignItems: 'center',
            columnGap: space(3),
            paddingVertical: 6,
            borderBottomWidth: 1,
            borderBottomColor: colours.rule,
          }}
        >
          <Text variant="detail" style={{ flexShrink: 1 }}>
            {[source.citation, source.equation, source.doi && `doi:${source.doi}`].filter(Boolean).join(', ')}
          </Text>
          <Badge
            glyph={source.standing === 'confirmed' ? 'verified' : 'waits'}
            word={source.standing}
            tone={source.standing === 'confirmed' ? 'ink' : 'inkSoft'}
            stitched={source.standing !== 'confirmed'}
            small
          />
        </View>
      ))}
    </View>
  );
}

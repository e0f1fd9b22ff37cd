/** Cases in a short list: number, title and what stands beside them; the row is the way there. */
import type { Href } from 'expo-router';
import { View } from 'react-native';
import { thumbnailOf } from '@/components/api/images';
import { Picture } from '@/components/ui/picture';
import { Press } from '@/components/ui/press';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { CaseSummary } from '@/server/contract/cases';
import { caseNumber } from '../case/words';

interface CaseLinesProps {
  cases: readonly CaseSummary[];
  hrefOf: (summary: CaseSummary) => Href;
  /** What stands under the title. */
  underOf: (summary: CaseSummary) => string;
}

export function CaseLines({ cases, hrefOf, underOf }: CaseLinesProps) {
  const { colours } = useTheme();
  return (
    <View role="list">
      {cases.map((summary) => (
        <View key={summary.id} role="listitem">
          <Press
            href={hrefOf(summary)}
            aria-label={`${caseNumber(summary.number)} ${summary.title}, ${underOf(summary)}`}
            style={({ hovered }) => ({
              flexDirection: 'row',
              alignItems: 'center',
              gap: space(3),
              minHeight: 54,
              paddingVertical: 4,
              borderBottomWidth: 1,
              borderBottomColor: colours.rule,
              backgroundColor: hovered ? colours.clothSunk : 'transparent',
            })}
          >
            <Picture source={summary.pictureImageId ? thumbnailOf(summary.pictureImageId) : null} alt="" size={40} />
            <View style={{ flex: 1, minWidth: 0 }}>
              <Text variant="row" numberOfLines={1}>
                {summary.title}
              </Text>
              <Text variant="small" tone="inkFaint" numberOfLines={1}>
                {underOf(summary)}
              </Text>
            </View>
            <Text variant="small" tone="inkFaint">
              {caseNumber(summary.number)}
            </Text>
          </Press>
        </View>
      ))}
    </View>
  );
}

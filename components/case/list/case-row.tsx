/** A case in the list of a phone. The whole row is the way to it. */
import { View } from 'react-native';
import { thumbnailOf } from '@/components/api/images';
import { Picture } from '@/components/ui/picture';
import { Press } from '@/components/ui/press';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { CaseSummary } from '@/server/contract/cases';
import { ageOf } from '../age';
import { StateBadge } from '../state-badge';
import { caseNumber, sightingWords, stateWords } from '../words';

interface CaseRowProps {
  summary: CaseSummary;
  now: number;
}

export function CaseRow({ summary, now }: CaseRowProps) {
  const { colours } = useTheme();
  const { id, number, title, state, scanner, seen, pictureImageId, openedAt } = summary;
  const facts = [scanner?.name, ...seen.map((sighting) => sightingWords[sighting])].filter(Boolean).join(' · ');
  return (
    <Press
      href={{ pathname: '/cases/[caseId]', params: { caseId: id } }}
      aria-label={`${caseNumber(number)} ${title}, ${stateWords[state]}, ${facts}`}
      style={({ hovered }) => ({
        flexDirection: 'row',
        gap: 9,
        paddingTop: 11,
        paddingBottom: space(3),
        paddingLeft: gutter.phone - 3,
        paddingRight: gutter.phone,
        borderBottomWidth: 1,
        borderBottomColor: colours.rule,
        backgroundColor: hovered ? colours.clothSunk : 'transparent',
      })}
    >
      <Picture source={pictureImageId ? thumbnailOf(pictureImageId) : null} alt="" size={72} />
      <View style={{ flex: 1, minWidth: 0 }}>
        <View style={{ flexDirection: 'row', justifyContent: 'space-between' }}>
          <Text variant="small" tone="inkFaint">
            {caseNumber(number)}
          </Text>
          <Text variant="small" tone="inkFaint">
            {ageOf(openedAt, now)}
          </Text>
        </View>
        <Text variant="caseTitle" style={{ marginTop: 1, marginBottom: 3 }}>
          {title}
        </Text>
        <StateBadge state={state} small />
        <Text variant="small" tone="inkFaint" numberOfLines={1}>
          {facts}
        </Text>
      </View>
    </Press>
  );
}

/** The facts of a case in one column: what it was seen on, how, how often, at what cost. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Case } from '@/server/contract/cases';
import { costWords, directionWords, frequencyWords, roleWords, sightingWords } from '../words';
import { Section } from './section';

export function factsOf(found: Case): [string, string][] {
  const direction = found.direction === 'unknown' ? '' : directionWords[found.direction];
  const facts: [string, string][] = [
    ['scanner', found.scanner?.name ?? ''],
    ['coil', found.coil?.name ?? ''],
    ['sequence', found.protocol],
    ['region', found.bodyRegion],
    ['seen', found.seen.map((sighting) => sightingWords[sighting]).join(', ')],
    ['runs along', direction],
    ['how often', found.howOften === 'unknown' ? '' : frequencyWords[found.howOften]],
    ['cost', found.cost === 'unknown' ? '' : costWords[found.cost]],
    ['seen on', found.seenOn ?? ''],
    ['reported by', `${found.reporter.name}, ${roleWords[found.reporter.role]}`],
    ['with', found.assignee ? `${found.assignee.name}, ${roleWords[found.assignee.role]}` : ''],
  ];
  return facts.filter(([, value]) => value !== '');
}

interface SummarySectionProps {
  found: Case;
  aside?: React.ReactNode;
}

export function SummarySection({ found, aside }: SummarySectionProps) {
  const { colours } = useTheme();
  const prose: [string, string][] = [
    ['what was tried', found.tried],
    ['anything else', found.description],
  ];
  return (
    <Section title="Summary" aside={aside}>
      {factsOf(found).map(([name, value]) => (
        <View
          key={name}
          style={{ flexDirection: 'row', gap: space(3), paddingVertical: 5, borderBottomWidth: 1, borderBottomColor: colours.rule }}
        >
          <Text variant="small" tone="inkFaint" style={{ width: 88, lineHeight: 20 }}>
            {name}
          </Text>
          <Text variant="mono" style={{ flex: 1 }}>
            {value}
          </Text>
        </View>
      ))}
      {prose.map(([name, text]) =>
        text === '' ? null : (
          <View key={name} style={{ paddingVertical: space(2), borderBottomWidth: 1, borderBottomColor: colours.rule }}>
            <Text variant="small" tone="inkFaint" style={{ lineHeight: 20 }}>
              {name}
            </Text>
            <Text variant="detail">{text}</Text>
          </View>
        ),
      )}
    </Section>
  );
}

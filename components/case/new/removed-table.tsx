/** What was taken out of a file before any of it was kept, by kind. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { Image } from '@/server/contract/images';
import { removedKinds } from './removed-kinds';

export function RemovedTable({ deidentification }: { deidentification: Image['deidentification'] }) {
  const { colours } = useTheme();
  const { patient, privateGroups, others } = removedKinds(deidentification.removed);
  const rows: [string, number][] = [
    ['about the patient', patient],
    ['dates, people, places and the like', others],
    ['private groups', privateGroups],
    ['identifiers, replaced by new ones', deidentification.replaced.length],
  ];
  return (
    <View style={{ paddingTop: space(3) }}>
      <Text variant="label" level={2}>
        Taken out at the door
      </Text>
      {rows.map(([kind, count]) => (
        <View
          key={kind}
          style={{
            flexDirection: 'row',
            justifyContent: 'space-between',
            paddingVertical: 5,
            borderBottomWidth: 1,
            borderBottomColor: colours.rule,
          }}
        >
          <Text variant="detail" tone="inkSoft">
            {kind}
          </Text>
          <Text variant="mono">{count}</Text>
        </View>
      ))}
    </View>
  );
}

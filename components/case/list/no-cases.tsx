/** No case fits. With nothing filed at all: an empty table to lay the first image on. Under filters: the way out of them. */
import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { Ladder } from '@/components/ui/ladder';
import { LinkText } from '@/components/ui/link-text';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { stateWords } from '../words';
import { isNarrowed, readFilters, type CaseFilters } from './filters';

interface NoCasesProps {
  filters: CaseFilters;
  /** None in any state, whatever the filters. */
  nothingFiled: boolean;
  onChange: (filters: CaseFilters) => void;
}

const size = 230;

export function NoCases({ filters, nothingFiled, onChange }: NoCasesProps) {
  const { colours } = useTheme();
  if (!nothingFiled || isNarrowed(filters)) {
    const where = filters.state === 'open' ? 'open' : stateWords[filters.state];
    return (
      <View style={{ padding: gutter.phone }}>
        <EmptyState
          text={isNarrowed(filters) ? `No case is ${where} that fits these words and filters.` : `No case is ${where}.`}
          action={
            isNarrowed(filters) ? (
              <LinkText label="show all" onPress={() => onChange({ ...readFilters({}), state: filters.state })} />
            ) : null
          }
        />
      </View>
    );
  }
  return (
    <View>
      <View style={{ alignItems: 'center', backgroundColor: colours.mat, paddingTop: space(6), paddingBottom: space(3) }}>
        <View style={{ width: size, height: size, backgroundColor: '#000000', alignItems: 'center', justifyContent: 'center' }}>
          <Text variant="small" style={{ color: '#A3A3A3' }}>
            nothing on the table
          </Text>
        </View>
        <Ladder length={size} lines={256} />
      </View>
      <View style={{ width: '100%', maxWidth: 480, alignSelf: 'center', paddingHorizontal: space(6), paddingTop: space(6) }}>
        <Text variant="title" level={2}>
          No cases yet
        </Text>
        <Text tone="inkSoft" style={{ paddingTop: space(2), paddingBottom: space(5) }}>
          When an image comes back wrong, lay it here. One image and two taps are enough; the rest can wait until the patient is off the
          table.
        </Text>
        <Button label="new case from an image" kind="first" glyph="plus" tall href="/cases/new" />
      </View>
    </View>
  );
}

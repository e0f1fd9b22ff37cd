/** The band of filters under the states: scanner and what was seen. */
import { View } from 'react-native';
import { useScanners } from '@/components/api/registry';
import { Select } from '@/components/ui/select';
import { Text } from '@/components/ui/text';
import { gutter, space, touchTarget } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useLayout } from '@/components/ui/use-layout';
import { sightings } from '@/server/contract/sighting';
import { sightingWords } from '../words';
import type { CaseFilters } from './filters';

interface FilterBandProps {
  filters: CaseFilters;
  onChange: (filters: CaseFilters) => void;
  /** A word at the right, on a wide screen. */
  aside: string;
}

const any = { id: '', label: 'any' };

export function FilterBand({ filters, onChange, aside }: FilterBandProps) {
  const { colours } = useTheme();
  const wide = useLayout() === 'wide';
  const scanners = useScanners();
  const scannerRows = [any, ...(scanners.data ?? []).map((scanner) => ({ id: scanner.id, label: scanner.name, aside: scanner.room }))];
  const seenRows = [any, ...sightings.map((seen) => ({ id: seen, label: sightingWords[seen] }))];
  return (
    <View
      style={{
        minHeight: touchTarget,
        flexDirection: 'row',
        alignItems: 'center',
        gap: wide ? space(6) : space(5),
        paddingHorizontal: wide ? gutter.wide : gutter.phone,
        backgroundColor: colours.clothSunk,
        borderBottomWidth: 1,
        borderTopWidth: wide ? 1 : 0,
        borderColor: colours.rule,
      }}
    >
      <Select
        look="filter"
        label="scanner"
        rows={scannerRows}
        value={filters.scannerId}
        onChange={(scannerId) => onChange({ ...filters, scannerId })}
      />
      <Select
        look="filter"
        label="seen"
        rows={seenRows}
        value={filters.seen}
        onChange={(id) => onChange({ ...filters, seen: sightings.find((seen) => seen === id) ?? '' })}
      />
      {wide ? (
        <Text variant="small" tone="inkFaint" style={{ marginLeft: 'auto' }}>
          {aside}
        </Text>
      ) : null}
    </View>
  );
}

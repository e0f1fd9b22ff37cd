/** The heads of the columns; pressing one orders by it. */
import { useWindowDimensions, View } from 'react-native';
import { Glyph } from '@/components/ui/glyph';
import { Press } from '@/components/ui/press';
import { insideBar } from '@/components/ui/stitches';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { columnsFor, columnStyle, type CaseColumn } from './case-columns';
import { orderedBy, type CaseFilters } from './filters';

interface CaseTableHeadProps {
  filters: CaseFilters;
  onChange: (filters: CaseFilters) => void;
}

export function CaseTableHead({ filters, onChange }: CaseTableHeadProps) {
  const { colours } = useTheme();
  const columns = columnsFor(useWindowDimensions().width);
  const headOf = (column: CaseColumn) => {
    const on = column.order !== undefined && column.order === filters.order;
    const words = (
      <Text variant={on ? 'smallStrong' : 'small'} tone={on ? 'ink' : 'inkSoft'}>
        {column.head}
      </Text>
    );
    const { order } = column;
    if (order === undefined) return words;
    return (
      <Press
        onPress={() => onChange(orderedBy(filters, order))}
        aria-label={`order by ${column.head}`}
        style={({ hovered }) => [
          { height: 40, flexDirection: 'row', alignItems: 'center', gap: 2 },
          hovered ? insideBar('bottom', 2, colours.indigo) : null,
        ]}
      >
        {words}
        {on ? <Glyph name={filters.descending ? 'down' : 'up'} size={12} colour={colours.ink} /> : null}
      </Press>
    );
  };
  const direction = filters.descending ? 'descending' : 'ascending';
  return (
    <View
      role="row"
      style={{
        height: 40,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space(4),
        borderBottomWidth: 1,
        borderBottomColor: colours.ruleStrong,
      }}
    >
      {columns.map((column: CaseColumn) => (
        <View
          key={column.id}
          role="columnheader"
          {...(column.order === filters.order ? { 'aria-sort': direction } : {})}
          style={columnStyle(column)}
        >
          {headOf(column)}
        </View>
      ))}
    </View>
  );
}

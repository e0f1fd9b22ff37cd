/** A row of the table: a link lies over all of it, the chosen one is held by a weld bar. */
import type { ReactNode } from 'react';
import { useWindowDimensions, View } from 'react-native';
import { thumbnailOf } from '@/components/api/images';
import { Picture } from '@/components/ui/picture';
import { Press } from '@/components/ui/press';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { CaseSummary } from '@/server/contract/cases';
import { ageOf } from '../age';
import { StateBadge } from '../state-badge';
import { caseNumber, roleWords, sightingWords } from '../words';
import { columnsFor, columnStyle, type ColumnId } from './case-columns';

interface CaseTableRowProps {
  summary: CaseSummary;
  chosen: boolean;
  now: number;
}

const words = (text: string, faint = false): ReactNode => (
  <Text variant="mono" tone={faint ? 'inkFaint' : 'ink'} numberOfLines={1}>
    {text}
  </Text>
);

const shortDirection: Record<CaseSummary['direction'], string> = {
  'phase-encode': 'phase',
  'frequency-encode': 'readout',
  both: 'both',
  none: 'none',
  unknown: '',
};

const cellsOf = (summary: CaseSummary, now: number): Record<ColumnId, ReactNode> => ({
  number: <Text variant="label">{caseNumber(summary.number)}</Text>,
  picture: <Picture source={summary.pictureImageId ? thumbnailOf(summary.pictureImageId) : null} alt="" size={40} />,
  title: (
    <Text variant="row" numberOfLines={1}>
      {summary.title}
    </Text>
  ),
  state: <StateBadge state={summary.state} />,
  scanner: words(summary.scanner?.name ?? 'not said', summary.scanner === null),
  coil: words(summary.coil?.name ?? '', true),
  seen: words(summary.seen.map((sighting) => sightingWords[sighting]).join(', ')),
  direction: words(shortDirection[summary.direction], true),
  assignee: summary.assignee ? words(summary.assignee.name || roleWords[summary.assignee.role]) : words('nobody yet', true),
  age: words(ageOf(summary.openedAt, now)),
});

export function CaseTableRow({ summary, chosen, now }: CaseTableRowProps) {
  const { colours } = useTheme();
  const columns = columnsFor(useWindowDimensions().width);
  const cells = cellsOf(summary, now);
  return (
    <View role="row" aria-selected={chosen} style={{ height: 54 }}>
      <Press
        href={{ pathname: '/cases/[caseId]', params: { caseId: summary.id } }}
        aria-label={`${caseNumber(summary.number)} ${summary.title}`}
        style={({ hovered }) => ({
          position: 'absolute',
          top: 0,
          bottom: 0,
          left: -gutter.wide,
          right: -gutter.wide,
          backgroundColor: chosen ? colours.clothRaised : hovered ? colours.clothSunk : 'transparent',
        })}
      >
        {chosen ? <View style={{ width: 3, height: '100%', backgroundColor: colours.weldThread }} /> : null}
      </Press>
      <View
        pointerEvents="none"
        style={{
          flex: 1,
          flexDirection: 'row',
          alignItems: 'center',
          gap: space(4),
          borderBottomWidth: 1,
          borderBottomColor: colours.rule,
        }}
      >
        {columns.map((column) => (
          <View key={column.id} role="cell" style={columnStyle(column)}>
            {cells[column.id]}
          </View>
        ))}
      </View>
    </View>
  );
}

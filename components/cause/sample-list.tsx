/** The sample book of a phone: a stage under the other, its swatches beside each other; what the filters leave out is a line of names. */
import { useState } from 'react';
import { View } from 'react-native';
import { stitchedLine } from '@/components/ui/stitches';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { CatalogueEntry, Stage } from '@/server/contract/catalogue';
import { listGap as gap, nameLine, pictureWidth } from './book-columns';
import { fits, type CatalogueFilters } from './catalogue-filters';
import { causesByStage, stageWords } from './stage-words';
import { Swatch } from './swatch';
import { WarpKnot } from './warp-knot';

interface SampleListProps {
  causes: readonly CatalogueEntry[];
  filters: CatalogueFilters;
}

function StageOfList({ stage, causes, filters, first, last }: SampleListProps & { stage: Stage; first: boolean; last: boolean }) {
  const { colours } = useTheme();
  const [room, setRoom] = useState(0);
  const shown = causes.filter((cause) => fits(cause, filters));
  const rest = causes.filter((cause) => !fits(cause, filters));
  const width = pictureWidth(room);
  return (
    <View role="region" aria-label={stageWords[stage]} style={{ paddingLeft: 24 }}>
      <WarpKnot first={first} last={last} top={16} filled={shown.length > 0} />
      <View style={[{ paddingBottom: space(3) }, stitchedLine(colours.ruleStrong)]}>
        <View style={{ flexDirection: 'row', alignItems: 'baseline', justifyContent: 'space-between', paddingTop: 12, paddingBottom: 10 }}>
          <Text variant="heading" level={2}>
            {stageWords[stage]}
          </Text>
          <Text variant="small" tone="inkFaint">
            {rest.length > 0 ? `${shown.length} of ${causes.length}` : causes.length}
          </Text>
        </View>
        <View
          onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout.width)}
          style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: gap, rowGap: space(2) }}
        >
          {room > 0 ? shown.map((cause) => <Swatch key={cause.id} cause={cause} width={width} height={Math.round(0.8 * width)} />) : null}
        </View>
        {rest.length > 0 ? (
          <Text variant="detail" tone="inkFaint" style={{ paddingTop: space(1) }}>
            {nameLine(rest)}
          </Text>
        ) : null}
      </View>
    </View>
  );
}

export function SampleList({ causes, filters }: SampleListProps) {
  return (
    <View style={{ paddingHorizontal: gutter.phone, paddingBottom: space(4) }}>
      {causesByStage(causes).map(({ stage, causes: ofStage }, row, rows) => (
        <StageOfList key={stage} stage={stage} causes={ofStage} filters={filters} first={row === 0} last={row === rows.length - 1} />
      ))}
    </View>
  );
}

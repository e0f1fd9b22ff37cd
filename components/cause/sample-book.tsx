/**
 * The sample book of a wide screen: rows are the stages of the signal chain on their warp thread, columns the direction in which a
 * cause runs. Filtering never reshuffles: what does not fit stays in its place as a stitched outline.
 */
import { useState } from 'react';
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { bookColumns, swatchPitch } from './book-columns';
import { fits, type CatalogueFilters } from './catalogue-filters';
import { alongs, type Along } from './cause-words';
import { EdgeHead } from './edge-heads';
import { causesByStage, stageMeanings, stageWords } from './stage-words';
import { Swatch } from './swatch';
import { WarpKnot } from './warp-knot';

const nameWidth = 190;
const picture = 92;
/** The gap after the last swatch of a column. */
const gap = swatchPitch - picture;

interface SampleBookProps {
  causes: readonly CatalogueEntry[];
  filters: CatalogueFilters;
}

function Cell({ causes, filters, width }: SampleBookProps & { width: number }) {
  return (
    <View style={{ width, flexDirection: 'row', flexWrap: 'wrap', rowGap: space(3), paddingTop: 18, paddingBottom: space(3) }}>
      {causes.map((cause) => (
        <View key={cause.id} style={{ width: swatchPitch }}>
          <Swatch cause={cause} width={picture} height={picture} outlined={!fits(cause, filters)} />
        </View>
      ))}
    </View>
  );
}

function Heads({ across }: { across: Record<Along, number> }) {
  return (
    <View style={{ flexDirection: 'row', height: 52, paddingTop: space(3), paddingLeft: nameWidth }}>
      {alongs.map((along) => (
        <View key={along} style={{ width: across[along] * swatchPitch }}>
          <EdgeHead along={along} length={across[along] * swatchPitch - gap + 8} />
        </View>
      ))}
    </View>
  );
}

export function SampleBook({ causes, filters }: SampleBookProps) {
  const { colours } = useTheme();
  const [room, setRoom] = useState(0);
  const across = bookColumns(room - nameWidth);
  return (
    <View style={{ paddingHorizontal: gutter.wide }}>
      <View onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout.width)}>
        <Heads across={across} />
        {causesByStage(causes).map(({ stage, causes: ofStage }, row, rows) => (
          <View
            key={stage}
            role="region"
            aria-label={stageWords[stage]}
            style={{ flexDirection: 'row', borderTopWidth: 1, borderTopColor: colours.rule }}
          >
            <View style={{ width: nameWidth, paddingTop: 16, paddingLeft: 24, paddingRight: space(4) }}>
              <WarpKnot first={row === 0} last={row === rows.length - 1} top={20} filled={ofStage.some((cause) => fits(cause, filters))} />
              <Text variant="heading" level={2}>
                {stageWords[stage]}
              </Text>
              <Text variant="detail" tone="inkSoft">
                {stageMeanings[stage]}
              </Text>
            </View>
            {alongs.map((along) => (
              <Cell
                key={along}
                width={across[along] * swatchPitch}
                causes={ofStage.filter(({ runsAlong }) => runsAlong === along)}
                filters={filters}
              />
            ))}
          </View>
        ))}
      </View>
    </View>
  );
}

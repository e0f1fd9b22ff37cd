/** The case as it would be filed now, beside the form on a wide screen. What nobody said yet is a stitch. */
import { View } from 'react-native';
import { thumbnailOf } from '@/components/api/images';
import { Picture } from '@/components/ui/picture';
import { Text } from '@/components/ui/text';
import { gutter, space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { stitchedLine } from '@/components/ui/stitches';
import type { Scanner } from '@/server/contract/registry';
import { Section } from '../view/section';
import { costWords, directionWords, frequencyWords, sightingWords } from '../words';
import type { Draft, Suggestion } from './draft';

interface DraftAsideProps {
  draft: Draft;
  suggestion: Suggestion;
  scanner: Scanner | undefined;
}

const said = <Value extends string>(words: Record<Value, string>, value: Value): string => (value === 'unknown' ? '' : words[value]);

const linesOf = ({ draft, suggestion, scanner }: DraftAsideProps): [string, string][] => [
  ['scanner', scanner?.name ?? ''],
  ['coil', scanner?.coils.find(({ id }) => id === draft.coilId)?.name ?? ''],
  ['sequence', draft.protocol ?? suggestion.protocol],
  ['region', draft.bodyRegion ?? suggestion.bodyRegion],
  ['seen', draft.seen.map((sighting) => sightingWords[sighting]).join(', ')],
  ['runs along', said(directionWords, draft.direction)],
  ['how often', said(frequencyWords, draft.howOften)],
  ['cost', said(costWords, draft.cost)],
  ['tried', draft.tried],
];

export function DraftAside(props: DraftAsideProps) {
  const { colours } = useTheme();
  const { draft, suggestion } = props;
  const title = draft.title ?? suggestion.title;
  return (
    <View role="complementary" style={{ flex: 1, minWidth: 0 }}>
      <View
        style={{
          minHeight: 148,
          flexDirection: 'row',
          flexWrap: 'wrap',
          gap: space(3),
          padding: gutter.wide,
          backgroundColor: colours.mat,
        }}
      >
        {draft.images.length === 0 ? (
          <Text variant="small" tone="matInkSoft" style={{ alignSelf: 'center' }}>
            nothing on the table
          </Text>
        ) : null}
        {draft.images.map((imageId) => (
          <Picture key={imageId} source={thumbnailOf(imageId)} alt="" size={100} mat={0} />
        ))}
      </View>
      <View style={{ paddingHorizontal: gutter.wide }}>
        <Section title="So far">
          <Text variant="caseTitle" tone={title ? 'ink' : 'inkFaint'} style={{ paddingBottom: space(2) }}>
            {title || 'no title yet'}
          </Text>
          {linesOf(props).map(([name, value]) => (
            <View
              key={name}
              style={{ flexDirection: 'row', gap: space(3), paddingVertical: 5, borderBottomWidth: 1, borderBottomColor: colours.rule }}
            >
              <Text variant="small" tone="inkFaint" style={{ width: 88, lineHeight: 20 }}>
                {name}
              </Text>
              {value ? (
                <Text variant="mono" numberOfLines={2} style={{ flex: 1 }}>
                  {value}
                </Text>
              ) : (
                <View style={[{ width: 46, height: 11 }, stitchedLine(colours.ruleStrong)]} />
              )}
            </View>
          ))}
        </Section>
      </View>
    </View>
  );
}

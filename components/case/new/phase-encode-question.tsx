/** The header does not say which way the phase was encoded: asks, and shows on the image itself what each answer means. */
import { View } from 'react-native';
import { thumbnailOf, useCorrectFacts } from '@/components/api/images';
import { Badge } from '@/components/ui/badge';
import { Ladder } from '@/components/ui/ladder';
import { Notice } from '@/components/ui/notice';
import { Press } from '@/components/ui/press';
import { insideBar, webStyle } from '@/components/ui/stitches';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { PhaseEncode } from '@/server/contract/facts';
import type { Image } from '@/server/contract/images';

const answers: readonly { value: PhaseEncode; words: string; means: string }[] = [
  { value: 'row', words: 'left and right', means: 'ghosts move sideways' },
  { value: 'column', words: 'up and down', means: 'ghosts move up and down' },
];
const size = 96;

export function PhaseEncodeQuestion({ image }: { image: Image }) {
  const { colours } = useTheme();
  const correct = useCorrectFacts(image.id);
  const note = image.acquisition.phaseEncode.note;
  return (
    <View style={{ marginTop: space(3), paddingTop: space(3), borderTopWidth: 1, borderTopColor: colours.rule }}>
      <Badge glyph="untested" word={note ?? 'not in the header'} small />
      <Text variant="heading" level={3} style={{ paddingVertical: space(1) }}>
        Which way was the phase encoded?
      </Text>
      <View
        role="group"
        aria-label="Which way was the phase encoded?"
        style={{ flexDirection: 'row', gap: space(3), paddingTop: space(1) }}
      >
        {answers.map(({ value, words, means }) => (
          <Press
            key={value}
            onPress={() => correct.mutate({ phaseEncode: value })}
            disabled={correct.isPending}
            aria-label={`${words}: ${means}`}
            style={({ hovered }) => [
              { flex: 1, maxWidth: 200, backgroundColor: colours.mat, padding: space(3), alignItems: 'center', gap: 2 },
              hovered ? insideBar('bottom', 3, colours.indigo) : null,
            ]}
          >
            <View style={{ flexDirection: value === 'column' ? 'row' : 'column', height: size + 30, alignItems: 'flex-start' }}>
              {value === 'column' ? <Ladder length={size} lines={image.rows} upright word="phase" /> : null}
              <View
                style={[
                  { width: size, height: size },
                  webStyle({
                    backgroundColor: '#000',
                    backgroundImage: `url(${thumbnailOf(image.id)})`,
                    backgroundSize: 'contain',
                    backgroundPosition: 'center',
                    backgroundRepeat: 'no-repeat',
                  }),
                ]}
              />
              {value === 'row' ? <Ladder length={size} lines={image.columns} word="phase" /> : null}
            </View>
            <Text variant="label" tone="matInk">
              {words}
            </Text>
            <Text variant="small" tone="matInkSoft" style={{ textAlign: 'center' }}>
              {means}
            </Text>
          </Press>
        ))}
      </View>
      {correct.error ? (
        <View style={{ paddingTop: space(2) }}>
          <Notice kind="failed" text={correct.error.message} />
        </View>
      ) : null}
    </View>
  );
}

/** What do you see? One or more of nine signs, each a picture with its word. */
import { View } from 'react-native';
import { Press } from '@/components/ui/press';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { type Case } from '@/server/contract/cases';
import { sightings } from '@/server/contract/sighting';
import { sightingWords } from '../words';
import { SightingPicture } from './sighting-picture';

type Seen = Case['seen'];

interface SightingChoiceProps {
  value: Seen;
  onChange: (seen: Seen) => void;
  columns?: number;
}

export function SightingChoice({ value, onChange, columns = 3 }: SightingChoiceProps) {
  const { colours } = useTheme();
  const toggle = (sighting: Seen[number]): void =>
    onChange(value.includes(sighting) ? value.filter((other) => other !== sighting) : [...value, sighting]);
  return (
    <View>
      <View style={{ flexDirection: 'row', alignItems: 'baseline', justifyContent: 'space-between', paddingBottom: 6 }}>
        <Text variant="heading" level={2}>
          What do you see?
        </Text>
        <Text variant="small" tone="inkFaint">
          one or more
        </Text>
      </View>
      <View
        role="group"
        aria-label="What do you see?"
        style={{ flexDirection: 'row', flexWrap: 'wrap', marginHorizontal: -4, rowGap: space(2) }}
      >
        {sightings.map((sighting) => {
          const on = value.includes(sighting);
          return (
            <Press
              key={sighting}
              role="checkbox"
              aria-checked={on}
              aria-label={sightingWords[sighting]}
              pressOnSpace
              onPress={() => toggle(sighting)}
              style={() => ({ width: `${100 / columns}%`, paddingHorizontal: space(1) })}
            >
              {({ hovered }) => (
                <>
                  <View
                    style={{
                      padding: on ? 4 : 3,
                      margin: on ? -1 : 0,
                      backgroundColor: on ? colours.weldThread : hovered ? colours.matRule : colours.mat,
                    }}
                  >
                    <SightingPicture sighting={sighting} />
                  </View>
                  <Text
                    variant={on ? 'smallStrong' : 'small'}
                    tone={on ? 'ink' : 'inkSoft'}
                    numberOfLines={1}
                    style={{ lineHeight: 22, letterSpacing: -0.4 }}
                  >
                    {sightingWords[sighting]}
                  </Text>
                </>
              )}
            </Press>
          );
        })}
      </View>
    </View>
  );
}

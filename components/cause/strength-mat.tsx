/**
 * The cause at work: picture and k-space of the phantom that shows it best, and one slider from mild to strong. What the slider moves stands under
 * it with its value.
 */
import { useState } from 'react';
import { View } from 'react-native';
import { swatchOf } from '@/components/api/catalogue';
import { selvedgeWidth } from '@/components/ui/selvedge';
import { Slider } from '@/components/ui/slider';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { Figure } from '../case/view/figure';
import { movedWords } from './moved-words';

interface StrengthMatProps {
  cause: CatalogueEntry;
  /** Pixels at the left and right. */
  gutters: number;
}

/** Samples and pixels of a side. */
const side = 256;
const startPercent = 60;
const simulated = { word: 'simulated', glyph: 'simulated', tone: 'matInk' } as const;

/** Side of the two pictures that stand beside each other with their selvedges. */
export const pictureSide = (room: number): number => Math.max(96, Math.min(320, Math.floor((room - space(4)) / 2) - selvedgeWidth));

export function StrengthMat({ cause, gutters }: StrengthMatProps) {
  const { colours } = useTheme();
  const [room, setRoom] = useState(0);
  const [percent, setPercent] = useState(startPercent);
  const strength = percent / 100;
  const named = `the ${cause.phantom.title.toLowerCase()} phantom`;
  const figure = { lines: side, phaseEncode: 'row', simulated: true, role: simulated, size: pictureSide(room) } as const;
  const source = (domain: 'image' | 'kspace'): string => swatchOf(cause.id, { strength, domain, side: String(side) as '256' });
  return (
    <View>
      <View style={{ backgroundColor: colours.mat, paddingHorizontal: gutters, paddingTop: space(4), paddingBottom: space(3) }}>
        <View
          onLayout={({ nativeEvent }) => setRoom(nativeEvent.layout.width)}
          style={{ flexDirection: 'row', columnGap: space(4), minHeight: 96 }}
        >
          {room > 0 ? (
            <>
              <Figure
                {...figure}
                source={source('image')}
                alt={`${cause.title} on ${named}: picture`}
                note={`${cause.phantom.title.toLowerCase()} phantom, ${cause.phantom.fieldOfViewMm} mm`}
              />
              <Figure {...figure} source={source('kspace')} alt={`${cause.title} on ${named}: k-space`} edge="lines" note="k-space, log" />
            </>
          ) : null}
        </View>
        <Text variant="caption" tone="matInkSoft" style={{ paddingTop: space(2) }}>
          computed by the model on {named}: SIMULATED · NOT FOR DIAGNOSIS
        </Text>
      </View>
      <View style={{ paddingHorizontal: gutters, paddingTop: space(2) }} {...{ dataSet: { screenOnly: 'true' } }}>
        <Slider label="mild to strong" value={percent} initial={startPercent} min={0} max={100} step={5} unit="%" onChange={setPercent} />
      </View>
      <View style={{ paddingHorizontal: gutters }} role="status">
        <Text variant="small" tone="inkSoft">
          {movedWords(cause, strength)}
        </Text>
      </View>
    </View>
  );
}

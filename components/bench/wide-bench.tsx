/** The bench from 1140 pixels: the hand at the left (panes, compare, numbers, loom), the eye at the right. */
import { useState } from 'react';
import { ScrollView, useWindowDimensions, View } from 'react-native';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { BenchFrames, framesHeight } from './bench-frames';
import { BenchHeader } from './bench-header';
import { paneMargins, pictureSize, proportionOf } from './bench-measures';
import { BenchNotices } from './bench-notices';
import { useBench } from './bench-context';
import { CompareBar } from './compare-bar';
import { Eye } from './eye';
import { NumbersLine } from './numbers-line';
import { Panes } from './panes';
import { ProfileStrip } from './profile-strip';
import { RecipePanel } from './recipe-panel';
import { useKeepAsTrial } from './use-keep-as-trial';

const eyeWidth = 412;
const railWidth = 88;
/** Header, head and readout of a pane, edge below it, compare bar, numbers; and a recipe with its sliders. */
const fixedHeight = 48 + 32 + 40 + paneMargins.below + 48 + 44;
const recipeHeight = 252;
/** Nothing scrolls at 900; the profile is there where the screen is higher. */
const profileFrom = 980;

export function WideBench() {
  const { colours } = useTheme();
  const { frame, view, bad, source } = useBench();
  const screen = useWindowDimensions();
  const [handWidth, setHandWidth] = useState(screen.width - railWidth - eyeWidth);
  const keep = useKeepAsTrial();
  const room = {
    width: (handWidth - space(5)) / 2 - paneMargins.horizontal,
    height: screen.height - fixedHeight - recipeHeight - framesHeight({ bad, source }),
  };
  const size = pictureSize(room, proportionOf(frame));
  return (
    <View style={{ flex: 1, minHeight: 0 }}>
      <BenchHeader layout="wide" keep={keep} />
      <View style={{ flex: 1, minHeight: 0, flexDirection: 'row' }}>
        <ScrollView style={{ flex: 1, minWidth: 0 }} onLayout={({ nativeEvent }) => setHandWidth(nativeEvent.layout.width)}>
          <Panes size={size} gutter={space(4)} />
          <BenchFrames />
          <CompareBar shuttleLength={258} />
          <NumbersLine keep={keep} />
          <BenchNotices keep={keep} />
          <View style={{ paddingHorizontal: space(6), paddingBottom: space(3) }}>
            <RecipePanel look="loom" />
            {screen.height >= profileFrom ? (
              <View style={{ marginTop: space(3), paddingTop: space(2), borderTopWidth: 1, borderTopColor: colours.rule }}>
                <ProfileStrip domain={view.compare === 'side-by-side' ? view.domain : 'image'} />
              </View>
            ) : null}
          </View>
        </ScrollView>
        <View style={{ width: eyeWidth, borderLeftWidth: 1, borderLeftColor: colours.rule }}>
          <Eye scrolls />
        </View>
      </View>
    </View>
  );
}

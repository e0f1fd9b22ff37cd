/** The bench from 720 pixels: two panes, compare, numbers, then recipe and eye in two equal columns. */
import { ScrollView, useWindowDimensions, View } from 'react-native';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { BenchFrames } from './bench-frames';
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

export function TabletBench() {
  const { colours } = useTheme();
  const { frame, view } = useBench();
  const screen = useWindowDimensions();
  const keep = useKeepAsTrial();
  const size = pictureSize(
    { width: (screen.width - space(4)) / 2 - paneMargins.horizontal, height: screen.height / 2 },
    proportionOf(frame),
  );
  return (
    <View style={{ flex: 1, minHeight: 0 }}>
      <BenchHeader layout="tablet" keep={keep} />
      <ScrollView style={{ flex: 1 }}>
        <Panes size={size} gutter={space(1)} />
        <BenchFrames />
        <CompareBar shuttleLength={screen.width > 900 ? 220 : 150} />
        <NumbersLine keep={keep} />
        <BenchNotices keep={keep} />
        <View style={{ flexDirection: 'row' }}>
          <View
            style={{
              flex: 1,
              minWidth: 0,
              paddingHorizontal: space(5),
              borderRightWidth: 1,
              borderRightColor: colours.rule,
              paddingBottom: space(6),
            }}
          >
            <RecipePanel look="warp" />
            <View style={{ marginTop: space(3), paddingTop: space(2), borderTopWidth: 1, borderTopColor: colours.rule }}>
              <ProfileStrip domain={view.compare === 'side-by-side' ? view.domain : 'image'} />
            </View>
          </View>
          <View style={{ flex: 1, minWidth: 0 }}>
            <Eye scrolls={false} />
          </View>
        </View>
      </ScrollView>
    </View>
  );
}

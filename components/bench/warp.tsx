/** The recipe on a phone and a tablet: knots down a warp thread, the controls of the chosen one beneath it. */
import { View } from 'react-native';
import { Press } from '@/components/ui/press';
import { insideBar } from '@/components/ui/stitches';
import { Text } from '@/components/ui/text';
import { space, touchTarget } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { useBench } from './bench-context';
import { KnotControls } from './knot-controls';
import { KnotSquare } from './knot-square';
import { knotsOf, type RecipeKnot } from './knots';

interface WarpKnotProps {
  entry: RecipeKnot;
  chosen: boolean;
  ground: 'cloth' | 'clothRaised';
  onPress: () => void;
}

function WarpKnot({ entry, chosen, ground, onPress }: WarpKnotProps) {
  const { colours } = useTheme();
  const off = typeof entry.knot === 'number' && !entry.isOn;
  return (
    <Press
      aria-label={`${entry.word} ${off ? 'off' : entry.stage}`}
      aria-pressed={chosen}
      onPress={onPress}
      style={({ hovered }) => [
        { minHeight: touchTarget, flexDirection: 'row', alignItems: 'center', gap: space(3) },
        hovered ? insideBar('bottom', 2, colours.indigo) : null,
      ]}
    >
      <KnotSquare look={chosen ? 'chosen' : entry.isOn ? 'on' : 'off'} ground={ground} />
      <Text variant={chosen ? 'labelStrong' : 'mono'} tone={off ? 'inkFaint' : 'ink'} numberOfLines={1} style={{ flexShrink: 1 }}>
        {entry.word}
      </Text>
      <Text variant="small" tone="inkFaint" style={{ marginLeft: 'auto' }}>
        {off ? 'off' : entry.stage}
      </Text>
    </Press>
  );
}

export function Warp({ ground = 'cloth' }: { ground?: 'cloth' | 'clothRaised' }) {
  const { colours } = useTheme();
  const { history, causes, methods, runsOn, view, change } = useBench();
  const knots = knotsOf(history.present, { causes, methods }, runsOn);
  return (
    <View role="group" aria-label="recipe in physical order">
      <View style={{ position: 'absolute', left: 6, top: 22, bottom: 22, width: 2, backgroundColor: colours.ruleStrong }} />
      {knots.map((entry) => (
        <View key={entry.knot}>
          <WarpKnot entry={entry} chosen={view.knot === entry.knot} ground={ground} onPress={() => change({ knot: entry.knot })} />
          {view.knot === entry.knot ? (
            <View style={{ paddingLeft: 26, paddingBottom: space(3), paddingRight: 9 }}>
              <KnotControls columns={1} />
            </View>
          ) : null}
        </View>
      ))}
    </View>
  );
}

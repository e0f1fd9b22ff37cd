/** The recipe on a wide bench: knots on one thread from left to right; the controls of the chosen one lie below. */
import { View } from 'react-native';
import { Press } from '@/components/ui/press';
import { Text } from '@/components/ui/text';
import { useTheme } from '@/components/ui/theme-context';
import { AddStep } from './add-step';
import { useBench } from './bench-context';
import { KnotSquare } from './knot-square';
import { knotsOf, type RecipeKnot } from './knots';

interface LoomKnotProps {
  entry: RecipeKnot;
  chosen: boolean;
  onPress: () => void;
}

function LoomKnot({ entry, chosen, onPress }: LoomKnotProps) {
  const isStep = typeof entry.knot === 'number';
  return (
    <Press
      aria-label={`${entry.stage} ${entry.word}${isStep && !entry.isOn ? ', switched off' : ''}`}
      aria-pressed={chosen}
      onPress={onPress}
      style={() => ({ flex: 1, minWidth: 0, minHeight: 60 })}
    >
      {({ hovered }) => (
        <>
          <View style={{ height: 22, justifyContent: 'center' }}>
            <KnotSquare look={chosen ? 'chosen' : entry.isOn ? 'on' : 'off'} />
          </View>
          <Text variant="small" tone="inkFaint">
            {entry.stage}
          </Text>
          <Text
            variant={chosen ? 'labelStrong' : 'mono'}
            tone={isStep && !entry.isOn ? 'inkFaint' : 'ink'}
            numberOfLines={1}
            style={[{ paddingRight: 8 }, hovered ? { textDecorationLine: 'underline' } : null]}
          >
            {entry.word}
          </Text>
        </>
      )}
    </Press>
  );
}

export function Loom() {
  const { colours } = useTheme();
  const { history, causes, methods, runsOn, view, change } = useBench();
  const knots = knotsOf(history.present, { causes, methods }, runsOn);
  return (
    <View role="group" aria-label="recipe in physical order" style={{ flexDirection: 'row' }}>
      <View style={{ position: 'absolute', left: 0, right: 84, top: 10, height: 2, backgroundColor: colours.ruleStrong }} />
      {knots.map((entry) => (
        <LoomKnot key={entry.knot} entry={entry} chosen={view.knot === entry.knot} onPress={() => change({ knot: entry.knot })} />
      ))}
      <View style={{ width: 84 }}>
        <View style={{ height: 22, justifyContent: 'center' }}>
          <KnotSquare look="not-yet" />
        </View>
        <View style={{ marginTop: -14 }}>
          <AddStep />
        </View>
      </View>
    </View>
  );
}

/** Said wherever it matters: what a missing object phase would make look better than it is. */
import { View } from 'react-native';
import { Glyph } from '@/components/ui/glyph';
import { LinkText } from '@/components/ui/link-text';
import { fixed } from '@/components/ui/number-text';
import { Text } from '@/components/ui/text';
import { useTheme } from '@/components/ui/theme-context';
import { useBench } from './bench-context';
import { hasOwnPhase } from './own-phase';
import { usualObjectPhase } from './recipe-order';

export function PhaseCaution() {
  const { colours } = useTheme();
  const { source, history, dispatch, change } = useBench();
  const range = history.present.objectPhase?.range;
  const set = (): void => {
    dispatch({ kind: 'set-object-phase', range: usualObjectPhase });
    dispatch({ kind: 'let-go' });
  };
  if (hasOwnPhase(source)) {
    return (
      <Text variant="small" tone="inkSoft">
        The image is complex: the phase of the object is the one that was measured.
      </Text>
    );
  }
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8, minHeight: 28 }}>
      {range === undefined ? <Glyph name="danger" colour={colours.weld} size={14} /> : null}
      <Text variant="small" tone={range === undefined ? 'weld' : 'inkSoft'} style={{ flexShrink: 1 }}>
        {range === undefined
          ? 'The object has no phase: this model looks better than it is, and homodyne looks perfect.'
          : `The object carries a smooth phase of ±${fixed(range / 2, 2)} rad: a magnitude image has lost its own, and without one homodyne looks perfect.`}
      </Text>
      {range === undefined ? (
        <LinkText label="set ±0.8 rad" onPress={set} />
      ) : (
        <LinkText label="change" name="change the object phase" onPress={() => change({ knot: 'object' })} />
      )}
    </View>
  );
}

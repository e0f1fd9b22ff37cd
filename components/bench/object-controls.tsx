/** The object: which image the recipe acts on, and the smooth phase that is put on it, because a magnitude image has lost its own. */
import { View } from 'react-native';
import { Slider } from '@/components/ui/slider';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useBench } from './bench-context';
import { objectPhaseControl } from './issue-places';
import { hasOwnPhase } from './own-phase';
import { ControlGrid } from './parameter-grid';

const widestPhase = 6.28;

export function ObjectControls({ columns }: { columns: 1 | 3 }) {
  const { source, history, runsOn, issues, dispatch } = useBench();
  const range = history.present.objectPhase?.range ?? 0;
  return (
    <View style={{ flexDirection: columns === 3 ? 'row' : 'column', gap: columns === 3 ? 32 : space(1) }}>
      <View style={columns === 3 ? { width: '31%' } : null}>
        <ControlGrid columns={1}>
          {[
            <Slider
              key="phase"
              label="Object phase"
              unit="rad"
              min={0}
              max={widestPhase}
              step={0.01}
              initial={0}
              value={range}
              // One that a recipe brought along can still be taken off.
              disabled={hasOwnPhase(source) && range === 0}
              error={issues.atControl.get(objectPhaseControl)}
              onChange={(next) => dispatch({ kind: 'set-object-phase', range: next })}
              onLetGo={() => dispatch({ kind: 'let-go' })}
            />,
          ]}
        </ControlGrid>
      </View>
      <Text variant="detail" tone="inkSoft" style={{ flex: columns === 3 ? 1 : undefined, paddingTop: columns === 3 ? 8 : 0 }}>
        {runsOn === 'comparison'
          ? 'The recipe acts on the comparison image and is held against the bad one.'
          : 'This case has no comparison image: the recipe acts on the bad image itself, so its fault stays in and a second one is laid over it.'}
        {hasOwnPhase(source)
          ? ' The image is complex: its phase was measured, and none is made up for it.'
          : range === 0
            ? ' The object has no phase; where a cause needs one, it starts with ±0.8 rad.'
            : ' The image is a magnitude, its phase is gone: this smooth one stands for it. Without it homodyne looks perfect.'}
      </Text>
    </View>
  );
}

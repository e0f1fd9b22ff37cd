/** The recipe in physical order: a loom on a wide bench, a warp elsewhere. */
import { View } from 'react-native';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { AddStep } from './add-step';
import { useBench } from './bench-context';
import { KnotControls } from './knot-controls';
import { Loom } from './loom';
import { PhaseEncodeQuestion } from './phase-encode-question';
import { Warp } from './warp';

interface RecipePanelProps {
  look: 'loom' | 'warp';
  ground?: 'cloth' | 'clothRaised';
}

export function RecipePanel({ look, ground = 'cloth' }: RecipePanelProps) {
  const { phaseEncode } = useBench();
  return (
    <View>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space(2), height: 44 }}>
        <Text variant="heading" level={2}>
          Recipe
        </Text>
        <Text variant="small" tone="inkFaint">
          in physical order
        </Text>
        {look === 'warp' ? (
          <View style={{ marginLeft: 'auto' }}>
            <AddStep />
          </View>
        ) : null}
      </View>
      {phaseEncode === null ? <PhaseEncodeQuestion /> : null}
      {look === 'warp' ? <Warp ground={ground} /> : null}
      {look === 'loom' ? (
        <>
          <Loom />
          <View style={{ paddingTop: space(2) }}>
            <KnotControls columns={3} />
          </View>
        </>
      ) : null}
    </View>
  );
}

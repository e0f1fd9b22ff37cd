/** A step on the table: its sliders, what it looks like, off and on, remove. */
import { View } from 'react-native';
import { LinkText } from '@/components/ui/link-text';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useBench } from './bench-context';
import { stepControl } from './issue-places';
import { ParameterGrid } from './parameter-grid';
import { PhaseCaution } from './phase-caution';

interface StepControlsProps {
  index: number;
  columns: 1 | 3;
}

export function StepControls({ index, columns }: StepControlsProps) {
  const { history, causes, issues, dispatch, change } = useBench();
  const step = history.present.steps[index];
  const cause = causes.find(({ id }) => id === step?.cause);
  if (!step || !cause) return null;
  const isOn = step.enabled !== false;
  return (
    <View>
      <ParameterGrid
        parameters={cause.parameters}
        values={step.parameters}
        columns={columns}
        disabled={!isOn}
        errorOf={(parameter) => issues.atControl.get(stepControl(index, parameter))}
        onChange={(parameter, value) => dispatch({ kind: 'set-parameter', step: index, parameter, value })}
      />
      {cause.needsObjectPhase ? <PhaseCaution /> : null}
      <View
        style={{ flexDirection: columns === 3 ? 'row' : 'column', columnGap: space(6), alignItems: columns === 3 ? 'center' : 'stretch' }}
      >
        <Text variant="small" tone="inkFaint" numberOfLines={4} style={{ flexShrink: 1, flexGrow: 1 }}>
          {cause.looks.image}
        </Text>
        <View style={{ flexDirection: 'row', gap: space(6) }}>
          <LinkText
            label={isOn ? 'switch off' : 'switch on'}
            name={`${isOn ? 'switch off' : 'switch on'}: ${cause.title}`}
            onPress={() => dispatch({ kind: 'switch', step: index })}
          />
          <LinkText
            label="remove"
            name={`remove: ${cause.title}`}
            onPress={() => {
              dispatch({ kind: 'remove', step: index });
              change({ knot: 'object' });
            }}
          />
        </View>
      </View>
    </View>
  );
}

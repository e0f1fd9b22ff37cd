/** How the samples become an image: the method and its parameters. */
import { View } from 'react-native';
import { Tabs } from '@/components/ui/tabs';
import { Text } from '@/components/ui/text';
import { useBench } from './bench-context';
import { reconstructionControl } from './issue-places';
import { ParameterGrid } from './parameter-grid';
import { PhaseCaution } from './phase-caution';
import { initialValues } from './recipe-order';

export function ReconstructionControls({ columns }: { columns: 1 | 3 }) {
  const { history, methods, issues, dispatch } = useBench();
  const { method: chosen, parameters } = history.present.reconstruction;
  const method = methods.find(({ id }) => id === chosen);
  const choose = (id: string): void => {
    const next = methods.find((each) => each.id === id);
    if (next) dispatch({ kind: 'set-reconstruction', reconstruction: { method: id, parameters: initialValues(next.parameters) } });
  };
  return (
    <View>
      <View style={{ marginLeft: -16 }}>
        <Tabs
          label="reconstruction"
          tabs={methods.map(({ id, title }) => ({ value: id, label: title }))}
          value={chosen}
          onChange={choose}
          ruled={false}
        />
      </View>
      {method && method.parameters.length > 0 ? (
        <ParameterGrid
          parameters={method.parameters}
          values={parameters}
          columns={columns}
          errorOf={(parameter) => issues.atControl.get(reconstructionControl(parameter))}
          onChange={(parameter, value) => dispatch({ kind: 'set-reconstruction-parameter', parameter, value })}
        />
      ) : null}
      {method ? (
        <Text variant="small" tone="inkFaint" style={{ paddingTop: 4 }}>
          {method.looks.image}
        </Text>
      ) : null}
      {method?.needsObjectPhase ? <PhaseCaution /> : null}
    </View>
  );
}

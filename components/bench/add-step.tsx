/** Add a step from the catalogue, its parameters filled from the header where the header says them. */
import { useRef, useState } from 'react';
import { View } from 'react-native';
import { LinkText } from '@/components/ui/link-text';
import { anchorOf, Menu, type Anchor } from '@/components/ui/menu';
import { useBench } from './bench-context';
import { hasOwnPhase } from './own-phase';
import { initialValues, usualObjectPhase } from './recipe-order';

export function AddStep() {
  const { causes, source, history, dispatch, change, phaseEncode } = useBench();
  const trigger = useRef<View>(null);
  const [anchor, setAnchor] = useState<Anchor | null>(null);
  const add = (id: string): void => {
    setAnchor(null);
    const cause = causes.find((each) => each.id === id);
    if (!cause) return;
    const { seed, steps } = history.present;
    dispatch({
      kind: 'add',
      step: { cause: id, parameters: initialValues(cause.parameters) },
      objectPhase: cause.needsObjectPhase && !hasOwnPhase(source) ? { range: usualObjectPhase, seed } : undefined,
    });
    change({ knot: steps.length, tab: 'recipe' });
  };
  if (phaseEncode === null) return null;
  return (
    <View ref={trigger}>
      <LinkText label="add a step" onPress={() => setAnchor(anchorOf(trigger.current))} />
      {anchor ? (
        <Menu
          label="add a step"
          anchor={anchor}
          rows={causes.map(({ id, title, stage }) => ({ id, label: title, aside: stage }))}
          onChoose={add}
          onClose={() => setAnchor(null)}
        />
      ) : null}
    </View>
  );
}

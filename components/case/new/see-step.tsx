/** Step 2: what is seen, which way it runs, how often, and what it cost. */
import { View } from 'react-native';
import { Choice } from '@/components/ui/choice';
import { gutter, space } from '@/components/ui/theme';
import { useLayout } from '@/components/ui/use-layout';
import { costWords, directionWords, frequencyWords, optionsOf } from '../words';
import { SightingChoice } from './sighting-choice';
import type { DraftForm } from './use-draft';

export function SeeStep({ form: { draft, change } }: { form: DraftForm }) {
  const wide = useLayout() === 'wide';
  return (
    <View style={{ padding: gutter.phone, gap: space(4) }}>
      <SightingChoice columns={wide ? 5 : 3} value={draft.seen} onChange={(seen) => change('seen', seen)} />
      <Choice
        label="Which way does it run?"
        columns={2}
        options={optionsOf(directionWords)}
        value={draft.direction}
        onChange={(direction) => change('direction', direction)}
      />
      <Choice
        label="How often?"
        columns={2}
        options={optionsOf(frequencyWords)}
        value={draft.howOften}
        onChange={(howOften) => change('howOften', howOften)}
      />
      <Choice
        label="What did it cost?"
        columns={2}
        options={optionsOf(costWords)}
        value={draft.cost}
        onChange={(cost) => change('cost', cost)}
      />
    </View>
  );
}

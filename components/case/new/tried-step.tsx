/** Step 3: what was tried already, and what else helps whoever looks at the case. */
import { View } from 'react-native';
import { DayField } from '@/components/ui/day-field';
import { TextField } from '@/components/ui/text-field';
import { gutter, space } from '@/components/ui/theme';
import type { Suggestion } from './draft';
import { ProseField } from './prose-field';
import type { DraftForm } from './use-draft';

interface TriedStepProps {
  form: DraftForm;
  suggestion: Suggestion;
}

const fromHeader = (typed: string | null, suggested: string): boolean => typed === null && suggested !== '';

export function TriedStep({ form: { draft, change, errors }, suggestion }: TriedStepProps) {
  return (
    <View style={{ padding: gutter.phone, gap: space(4) }}>
      <ProseField
        label="what was tried"
        lines={4}
        value={draft.tried}
        onChange={(text) => change('tried', text)}
        error={errors.tried?.message}
        placeholder="scanned again, another coil, another protocol"
        maxLength={4000}
      />
      <ProseField
        label="anything else"
        lines={4}
        value={draft.description}
        onChange={(text) => change('description', text)}
        error={errors.description?.message}
        placeholder="when it started, what else was in the room"
        maxLength={4000}
      />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space(3) }}>
        <View style={{ flexGrow: 1, flexBasis: 160 }}>
          <TextField
            label="body region"
            value={draft.bodyRegion ?? suggestion.bodyRegion}
            onChange={(text) => change('bodyRegion', text)}
            fromHeader={fromHeader(draft.bodyRegion, suggestion.bodyRegion)}
            error={errors.bodyRegion?.message}
            maxLength={80}
          />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 160 }}>
          <TextField
            label="sequence or protocol"
            value={draft.protocol ?? suggestion.protocol}
            onChange={(text) => change('protocol', text)}
            fromHeader={fromHeader(draft.protocol, suggestion.protocol)}
            error={errors.protocol?.message}
            maxLength={120}
          />
        </View>
      </View>
      <DayField
        label="seen on"
        value={draft.seenOn ?? ''}
        onChange={(day) => change('seenOn', day || null)}
        error={errors.seenOn?.message}
        note="the day the fault was seen; dates in the image itself are gone"
      />
    </View>
  );
}

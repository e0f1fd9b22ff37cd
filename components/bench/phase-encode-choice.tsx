/** Along which axis phase was encoded: shown, corrected, or asked for. It is never guessed. */
import { View } from 'react-native';
import { useCorrectFacts } from '@/components/api/images';
import { Notice } from '@/components/ui/notice';
import { Tabs, type Tab } from '@/components/ui/tabs';
import type { PhaseEncode } from '@/server/contract/facts';
import { useCaseOnBench } from './bench-context';

const axes: readonly Tab<PhaseEncode>[] = [
  { value: 'column', label: 'up and down' },
  { value: 'row', label: 'left and right' },
];
const unknown: readonly Tab<PhaseEncode | 'unknown'>[] = [{ value: 'unknown', label: 'not known' }, ...axes];

export function PhaseEncodeChoice() {
  const { bad, phaseEncode } = useCaseOnBench();
  const correct = useCorrectFacts(bad.id);
  return (
    <View>
      <View style={{ marginLeft: -16 }}>
        <Tabs
          label="phase encoding"
          tabs={phaseEncode === null ? unknown : axes}
          value={phaseEncode ?? 'unknown'}
          onChange={(axis) => {
            if (axis !== 'unknown' && axis !== phaseEncode) correct.mutate({ phaseEncode: axis });
          }}
          ruled={false}
        />
      </View>
      {correct.error ? <Notice kind="failed" text={correct.error.message} /> : null}
    </View>
  );
}

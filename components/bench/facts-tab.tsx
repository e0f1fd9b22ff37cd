/** The scan facts with their origin, what they imply, and what was assumed. */
import { memo, useState } from 'react';
import { View } from 'react-native';
import { useImplications } from '@/components/api/implications';
import { NumberInput } from '@/components/ui/number-input';
import { significant } from '@/components/ui/number-text';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import type { Image } from '@/server/contract/images';
import { EyeHeading } from './eye-heading';
import { FactRow } from './fact-row';
import { benchFacts, factText, originWords, type BenchFact } from './fact-words';
import { useCaseOnBench } from './bench-context';
import { hasOwnPhase } from './own-phase';
import { PhaseEncodeChoice } from './phase-encode-choice';

const names = Object.keys(benchFacts) as BenchFact[];
const startFrequency = 0.3;

function ScanFactRows() {
  const { bad } = useCaseOnBench();
  const silent = names.filter((name) => bad.acquisition[name].value === null);
  return (
    <>
      {names
        .filter((name) => !silent.includes(name))
        .map((name) => {
          const fact = bad.acquisition[name];
          const words: { label: string; unit?: string } = benchFacts[name];
          return (
            <FactRow
              key={name}
              {...words}
              value={factText(fact.value)}
              note={originWords(fact)}
              tone={fact.origin === 'doubtful' ? 'weld' : 'ink'}
            />
          );
        })}
      {silent.length > 0 ? (
        <Text variant="small" tone="inkFaint" style={{ paddingVertical: space(2) }}>
          {`The header does not say: ${silent.map((name) => benchFacts[name].label).join(', ')}.`}
        </Text>
      ) : null}
    </>
  );
}

function Implications() {
  const { bad } = useCaseOnBench();
  const [frequency, setFrequency] = useState(startFrequency);
  const implications = useImplications(bad.id, frequency);
  if (implications.error) return <ProblemNotice error={implications.error} onRetry={() => void implications.refetch()} />;
  return (
    <>
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space(1), minHeight: 44 }}>
        <Text variant="detail">If something moves at</Text>
        <NumberInput
          quiet
          label="frequency of a ghost, Hz"
          width={60}
          value={frequency}
          decimals={3}
          min={0}
          max={1000}
          onChange={setFrequency}
        />
        <Text variant="detail">Hz</Text>
      </View>
      {implications.data?.map(({ id, label, value, unit, because }) => (
        <FactRow
          key={id}
          label={label}
          value={value === null ? '–' : significant(value, 3)}
          {...(value === null ? {} : { unit })}
          note={because}
        />
      ))}
    </>
  );
}

/** What stands between the samples and the picture. */
function assumedOf(image: Image): string {
  if (image.kspace === 'raw') return 'The image is the transform of raw data: nothing was filtered, filled in or corrected.';
  const maybe = 'The scanner may have filtered, interpolated and combined it before it was sent.';
  if (hasOwnPhase(image)) return `The image is complex: its phase is its own, and its k-space is not symmetric. ${maybe}`;
  return `The image is a magnitude: its phase is gone and its k-space is symmetric. ${maybe}`;
}

export const FactsTab = memo(function FactsTab() {
  const { bad } = useCaseOnBench();
  const origin = originWords(bad.acquisition.phaseEncode);
  return (
    <View>
      <EyeHeading title="Facts" aside="from the header, where nothing else is said" />
      <Text variant="detail">phase encoding</Text>
      <PhaseEncodeChoice />
      {origin ? (
        <Text variant="small" tone="inkFaint">
          {origin}
        </Text>
      ) : null}
      <ScanFactRows />
      <EyeHeading title="What they imply" aside="worked out" />
      <Implications />
      <EyeHeading title="What was assumed" />
      <Text variant="detail" tone="inkSoft" style={{ paddingBottom: space(4) }}>
        {assumedOf(bad)} What the header does not say is not guessed.
      </Text>
      {bad.warnings.map(({ code, text }) => (
        <Text key={code} variant="detail" tone="weld" style={{ paddingBottom: space(2) }}>
          {text}
        </Text>
      ))}
    </View>
  );
});

/** The trials of a case: what was simulated on the comparison image, and how near it came. */
import { View } from 'react-native';
import { useCauses } from '@/components/api/catalogue';
import { useTrials } from '@/components/api/trials';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkText } from '@/components/ui/link-text';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Text } from '@/components/ui/text';
import { space } from '@/components/ui/theme';
import { useTheme } from '@/components/ui/theme-context';
import { recipeWords } from './recipe-words';
import { Section } from './section';
import { TrialRow } from './trial-row';

interface TrialsSectionProps {
  caseId: string;
  wide: boolean;
}

function TrialsHead() {
  const { colours } = useTheme();
  const head = (word: string, style: object) => (
    <Text variant="small" tone="inkSoft" role="columnheader" style={style}>
      {word}
    </Text>
  );
  return (
    <View
      role="row"
      style={{ flexDirection: 'row', gap: space(4), height: 28, borderBottomWidth: 1, borderBottomColor: colours.ruleStrong }}
    >
      {head('no.', { width: 24 })}
      {head('image, k-space', { width: 148 })}
      {head('recipe', { flex: 1 })}
      {head('NRMSE', { width: 64, textAlign: 'right' })}
      {head('SSIM', { width: 64, textAlign: 'right' })}
      <View role="columnheader" aria-label="save, open" style={{ width: 77 }} />
    </View>
  );
}

export function TrialsSection({ caseId, wide }: TrialsSectionProps) {
  const trials = useTrials(caseId);
  const causes = useCauses();
  const body = (): React.ReactNode => {
    if (trials.error) return <ProblemNotice error={trials.error} onRetry={() => void trials.refetch()} />;
    if (!trials.data) return <LoadingWarp what="fetching the trials" rows={2} picture={64} />;
    if (trials.data.length === 0) {
      return (
        <EmptyState
          text="No trial yet. A trial is a cause tried on the comparison image."
          action={<LinkText label="try a cause on the bench" href={{ pathname: '/cases/[caseId]/bench', params: { caseId } }} />}
        />
      );
    }
    return (
      <View {...(wide ? { role: 'table' as const, 'aria-label': 'trials' } : {})}>
        {wide ? <TrialsHead /> : null}
        {trials.data.map((trial) => (
          <TrialRow key={trial.id} caseId={caseId} trial={trial} wide={wide} words={recipeWords(trial.recipe, causes.data ?? [])} />
        ))}
        <Text variant="detail" tone="inkSoft" style={{ paddingTop: space(2) }}>
          These images are simulated, not for diagnosis.
        </Text>
      </View>
    );
  };
  return <Section title="Trials">{body()}</Section>;
}

/** The bench of a case: fetches the case, its images, the catalogue and, where one is named, the trial whose recipe is opened. */
import { useCase } from '@/components/api/cases';
import { useCauses, useReconstructions } from '@/components/api/catalogue';
import { useImage } from '@/components/api/images';
import { useTrials } from '@/components/api/trials';
import { caseNumber } from '@/components/case/words';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkText } from '@/components/ui/link-text';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Screen } from '@/components/ui/screen';
import { imagesOf } from './bench-images';
import { BenchTable } from './bench-table';
import { hasOwnPhase } from './own-phase';
import { startRecipe } from './recipe-start';

interface BenchProps {
  caseId: string;
  trialId?: string | undefined;
  /** A cause or a reconstruction to start with; a trial that is opened has its own. */
  add?: string | undefined;
}

export function Bench({ caseId, trialId, add }: BenchProps) {
  const kase = useCase(caseId);
  const trials = useTrials(caseId);
  const trial = trials.data?.find(({ id }) => id === trialId);
  const images = kase.data ? imagesOf(kase.data) : null;
  const bad = useImage(images?.badId ?? null);
  const source = useImage(trial?.imageId ?? images?.sourceId ?? null);
  const causes = useCauses(bad.data?.id);
  const methods = useReconstructions();
  const waitsForTrial = trialId !== undefined && trials.isPending;
  const failed = [kase, trials, bad, source, causes, methods].find(({ isError }) => isError);
  const title = kase.data ? `Bench ${caseNumber(kase.data.number)}` : 'Bench';

  if (failed?.error) {
    return (
      <Screen title={title}>
        <ProblemNotice error={failed.error} onRetry={() => void failed.refetch()} />
      </Screen>
    );
  }
  if (kase.data && !images) {
    return (
      <Screen title={title}>
        <EmptyState
          text="This case has no image yet. The bench needs a bad one."
          action={<LinkText label="add an image to the case" href={`/cases/${caseId}`} />}
        />
      </Screen>
    );
  }
  if (!kase.data || !bad.data || !source.data || !causes.data || !methods.data || waitsForTrial) {
    return (
      <Screen title={title}>
        <LoadingWarp what="fetching the case and its images" rows={2} picture={192} />
      </Screen>
    );
  }
  return (
    <Screen title={title} still>
      <BenchTable
        key={`${bad.data.id} ${source.data.id} ${trialId ?? ''}`}
        kase={kase.data}
        bad={bad.data}
        source={source.data}
        causes={causes.data}
        methods={methods.data}
        frames={{ badFrame: trial?.compareWith?.frame ?? 0, sourceFrame: trial?.frame ?? 0 }}
        recipe={trial?.recipe ?? startRecipe(methods.data, causes.data, add, hasOwnPhase(source.data))}
      />
    </Screen>
  );
}

/** One case: fetched here, drawn for the room there is, with the questions that a step asks first. */
import { useCase } from '@/components/api/cases';
import { BarHead } from '@/components/ui/bar-head';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Screen } from '@/components/ui/screen';
import { useLayout } from '@/components/ui/use-layout';
import { CasePhone } from './case-phone';
import { CaseWide } from './case-wide';
import { StepDialog } from './step-dialog';
import { useCaseSteps } from './use-case-steps';

export function CaseScreen({ caseId }: { caseId: string }) {
  const wide = useLayout() === 'wide';
  const { data: found, error, refetch } = useCase(caseId);
  const steps = useCaseSteps(caseId);
  if (!found) {
    return (
      <Screen title="Case" head={<BarHead back="/cases" backLabel="to the cases" title="case" faint />}>
        {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : <LoadingWarp what="fetching the case" />}
      </Screen>
    );
  }
  return (
    <>
      {wide ? <CaseWide found={found} steps={steps} /> : <CasePhone found={found} steps={steps} />}
      {steps.asked ? <StepDialog found={found} step={steps.asked} move={steps.move} onClose={steps.close} /> : null}
    </>
  );
}

/** Closed cases whose finding was this cause: what it looked like here, and what fixed it. */
import { useCases } from '@/components/api/cases';
import { EmptyState } from '@/components/ui/empty-state';
import { ProblemNotice } from '@/components/ui/problem-notice';
import { Text } from '@/components/ui/text';
import { CaseLines } from './case-lines';

const most = 5;

export function ClosedCases({ causeId }: { causeId: string }) {
  const { data, error, refetch } = useCases({ cause: causeId, state: 'closed', limit: most });
  if (error) return <ProblemNotice error={error} onRetry={() => void refetch()} />;
  if (!data) {
    return (
      <Text variant="small" tone="inkSoft" role="status">
        fetching the cases
      </Text>
    );
  }
  if (data.cases.length === 0) return <EmptyState text="No closed case has this cause as its finding yet." />;
  return (
    <>
      <CaseLines
        cases={data.cases}
        hrefOf={({ id }) => ({ pathname: '/cases/[caseId]', params: { caseId: id } })}
        underOf={({ scanner, openedAt }) => [scanner?.name, openedAt.slice(0, 10)].filter(Boolean).join(' · ')}
      />
      {data.total > most ? (
        <Text variant="small" tone="inkFaint" style={{ paddingTop: 6 }}>
          {`the newest ${most} of ${data.total}`}
        </Text>
      ) : null}
    </>
  );
}

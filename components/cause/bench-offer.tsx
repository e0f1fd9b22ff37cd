/** The bench works on a case: the open ones that have an image, youngest first, each opening with this cause or reconstruction. */
import { useCases } from '@/components/api/cases';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkText } from '@/components/ui/link-text';
import { LoadingWarp } from '@/components/ui/loading-warp';
import { ProblemNotice } from '@/components/ui/problem-notice';
import type { CatalogueEntry } from '@/server/contract/catalogue';
import { stateWords } from '../case/words';
import { CaseLines } from './case-lines';

interface BenchOfferProps {
  cause: Pick<CatalogueEntry, 'id' | 'title' | 'stage'>;
  onClose: () => void;
}

export function BenchOffer({ cause, onClose }: BenchOfferProps) {
  const { data, error, refetch } = useCases({ state: 'open', limit: 50 });
  const withImage = data?.cases.filter(({ pictureImageId }) => pictureImageId !== null);
  return (
    <Dialog
      title={`${cause.title} on the bench`}
      text={`On which case? It opens with ${cause.stage === 'reconstruction' ? 'this reconstruction and a step that shows it' : 'this cause as a step, its values from the header where it says them'}.`}
      onClose={onClose}
      actions={<Button label="stay here" onPress={onClose} />}
    >
      {error ? <ProblemNotice error={error} onRetry={() => void refetch()} /> : null}
      {!data && !error ? <LoadingWarp what="fetching the open cases" rows={2} /> : null}
      {withImage?.length === 0 ? (
        <EmptyState text="No open case has an image." action={<LinkText label="new case from an image" href="/cases/new" />} />
      ) : null}
      {withImage && withImage.length > 0 ? (
        <CaseLines
          cases={withImage}
          hrefOf={({ id }) => ({ pathname: '/cases/[caseId]/bench', params: { caseId: id, add: cause.id } })}
          underOf={({ state, scanner }) => [stateWords[state], scanner?.name].filter(Boolean).join(' · ')}
        />
      ) : null}
    </Dialog>
  );
}

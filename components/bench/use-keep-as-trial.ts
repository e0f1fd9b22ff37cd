/** Keeps the recipe on the bench as a trial of the case: the server runs it once more and keeps numbers, picture and digest. */
import { useKeepTrial } from '@/components/api/trials';
import type { Trial } from '@/server/contract/case-parts';
import { useBench } from './bench-context';

export interface Keep {
  readonly run: () => void;
  readonly busy: boolean;
  readonly disabled: boolean;
  /** The trial, as long as its recipe lies on the bench. */
  readonly kept: Trial | undefined;
  readonly error: Error | null;
}

export function useKeepAsTrial(): Keep {
  const { kase, bad, source, history, phaseEncode, view } = useBench();
  const keep = useKeepTrial(kase.id);
  const recipe = history.present;
  return {
    run: () =>
      keep.mutate({
        imageId: source.id,
        frame: view.sourceFrame,
        compareWith: { imageId: bad.id, frame: view.badFrame },
        recipe,
        ...(phaseEncode ? { facts: { phaseEncode } } : {}),
      }),
    busy: keep.isPending,
    disabled: phaseEncode === null || recipe.steps.length === 0,
    kept: keep.variables?.recipe === recipe ? keep.data : undefined,
    error: keep.error,
  };
}

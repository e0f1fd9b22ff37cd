/** Joins what the bench is given (case, images, catalogue, a recipe to start with) into what its parts share. */
import { useCallback, useMemo, useReducer, useState } from 'react';
import { ApiProblem } from '@/components/api/api-problem';
import { usePixels, useSimulation } from '@/components/api/simulations';
import { centredGrid } from '@/components/image/display-plane';
import type { Case } from '@/server/contract/cases';
import type { Cause, Reconstruction } from '@/server/contract/catalogue';
import type { Image } from '@/server/contract/images';
import type { Recipe } from '@/server/contract/recipe';
import type { SimulationRequest } from '@/server/contract/simulations';
import type { BenchState, CaseOnBench } from './bench-context';
import { startView, type BenchView, type ChosenFrames } from './bench-view';
import { hasOwnPhase } from './own-phase';
import { placeIssues } from './issue-places';
import { firstKnot } from './knots';
import { recipeHistory, startHistory } from './recipe-history';
import { useBlink } from './use-blink';
import { useShown } from './use-shown';

export interface OnTheBench {
  readonly kase: Case;
  readonly bad: Image;
  readonly source: Image;
  readonly causes: readonly Cause[];
  readonly methods: readonly Reconstruction[];
  readonly recipe: Recipe;
  /** Those of a trial that is opened; else the first of each. */
  readonly frames: ChosenFrames;
}

type Shown = Pick<BenchView, 'kspaceOf' | 'badFrame' | 'sourceFrame'>;

/** The simulation that the bench asks for; without a phase-encode axis there is none: the bench asks and does not guess. */
function requestOf(
  { bad, source, phaseEncode }: CaseOnBench,
  recipe: Recipe,
  { kspaceOf, badFrame, sourceFrame }: Shown,
): SimulationRequest | null {
  if (phaseEncode === null) return null;
  return {
    imageId: source.id,
    frame: sourceFrame,
    recipe,
    outputs: ['image', kspaceOf === 'acquired' ? 'kspace' : 'kspaceOfImage'],
    compareWith: { imageId: bad.id, frame: badFrame },
    facts: { phaseEncode },
  };
}

/** The part that stays while the hand works. */
function useCase({ kase, bad, source, causes, methods }: OnTheBench): CaseOnBench {
  return useMemo(
    () => ({
      ...{ kase, bad, source, causes, methods },
      runsOn: source.id === bad.id ? ('bad' as const) : ('comparison' as const),
      phaseEncode: bad.acquisition.phaseEncode.value,
      frame: centredGrid(bad.rows, bad.columns, bad.spacingMm ?? [1, 1]),
    }),
    [kase, bad, source, causes, methods],
  );
}

/** Of a complex image the k-space as acquired is what there is to see first. */
const startOn = (bad: Image, view: BenchView): BenchView => (hasOwnPhase(bad) ? { ...view, kspaceOf: 'acquired' } : view);

export function useBenchState(given: OnTheBench): { onBench: CaseOnBench; state: BenchState } {
  const onBench = useCase(given);
  const { bad, frame } = onBench;
  const [view, setView] = useState(() => startOn(bad, startView(frame, bad.range, firstKnot(given.recipe), given.frames)));
  const change = useCallback((part: Partial<BenchView>) => setView((before) => ({ ...before, ...part })), []);
  const [history, dispatch] = useReducer(recipeHistory, given.recipe, startHistory);
  const { kspaceOf, badFrame, sourceFrame } = view;
  const request = useMemo(
    () => requestOf(onBench, history.present, { kspaceOf, badFrame, sourceFrame }),
    [onBench, history.present, kspaceOf, badFrame, sourceFrame],
  );
  const simulation = useSimulation(request);
  const badImage = usePixels(bad.id, 'image', badFrame).data?.planes;
  // A magnitude is its own image: the two are one and the same then.
  const badKspaceOf = hasOwnPhase(bad) && kspaceOf === 'image' ? 'kspaceOfImage' : 'kspace';
  const badKspace = usePixels(bad.id, badKspaceOf, badFrame).data?.planes;
  const shown = useShown({ badImage, badKspace, simulation: simulation.shown }, view);
  const issues = useMemo(() => placeIssues(simulation.error instanceof ApiProblem ? simulation.error.issues : []), [simulation.error]);
  const blink = useBlink(view.compare === 'blink');
  const badPlanes = { image: badImage, kspace: badKspace };
  return { onBench, state: { ...onBench, view, change, history, dispatch, simulation, issues, badPlanes, shown, ...blink } };
}

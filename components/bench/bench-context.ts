/**
 * Everything the parts of the bench share. What lies on the bench (case, images, catalogue) is a context of its own, because it stays
 * while a slider moves: parts that need no more are not drawn again.
 */
import { createContext, useContext, type Dispatch } from 'react';
import type { Planes, RunningSimulation } from '@/components/api/simulations';
import type { PlaneGrid } from '@/components/image/display-plane';
import type { Domain } from '@/components/image/edge-scale';
import type { ShownOf } from '@/components/image/layers';
import type { Case } from '@/server/contract/cases';
import type { Cause, Reconstruction } from '@/server/contract/catalogue';
import type { PhaseEncode } from '@/server/contract/facts';
import type { Image } from '@/server/contract/images';
import type { BenchView } from './bench-view';
import type { IssuePlaces } from './issue-places';
import type { RecipeAction, RecipeHistory } from './recipe-history';

export interface CaseOnBench {
  readonly kase: Case;
  readonly bad: Image;
  /** What the recipe acts on: the comparison image, or the bad image itself where there is none. */
  readonly source: Image;
  readonly runsOn: 'comparison' | 'bad';
  readonly causes: readonly Cause[];
  readonly methods: readonly Reconstruction[];
  readonly phaseEncode: PhaseEncode | null;
  readonly frame: PlaneGrid;
}

export interface BenchState extends CaseOnBench {
  readonly view: BenchView;
  readonly change: (part: Partial<BenchView>) => void;
  readonly history: RecipeHistory;
  readonly dispatch: Dispatch<RecipeAction>;
  readonly simulation: RunningSimulation;
  readonly issues: IssuePlaces;
  readonly badPlanes: Readonly<Record<Domain, Planes | undefined>>;
  readonly shown: Readonly<Record<Domain, ShownOf>>;
  /** Whether blink shows the bad picture now. */
  readonly blinksToBad: boolean;
  readonly holdBlink: (toBad: boolean) => void;
}

export const CaseContext = createContext<CaseOnBench | null>(null);
export const BenchContext = createContext<BenchState | null>(null);

const required = <Value>(value: Value | null): Value => {
  if (value === null) throw new RangeError('a part of the bench must stand inside the bench');
  return value;
};

/** The case, its images and the catalogue: what stays while the hand works. */
export const useCaseOnBench = (): CaseOnBench => required(useContext(CaseContext));

/** All of it, with the recipe, what it gives, and what is on the table. */
export const useBench = (): BenchState => required(useContext(BenchContext));

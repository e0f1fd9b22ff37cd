/** The planes of both domains with their colours: bad, simulated, and their difference where it is asked for. */
import { useMemo } from 'react';
import type { Planes, Simulation } from '@/components/api/simulations';
import { cyclicTable, divergingTable, greyTable } from '@/components/image/colour-table';
import { differencePlane } from '@/components/image/difference';
import type { DisplayPlane } from '@/components/image/display-plane';
import type { Domain } from '@/components/image/edge-scale';
import type { Shown, ShownOf } from '@/components/image/layers';
import { windowUnderGain, type Window } from '@/components/image/window-level';
import type { BenchView } from './bench-view';

interface KspacePair {
  readonly log: DisplayPlane;
  readonly phase: DisplayPlane;
}

/** The two planes in which k-space travels, whatever it is the k-space of. */
function kspaceOf(planes: Planes | undefined, name: string): KspacePair | null {
  const log = planes?.get(`${name}.log`);
  const phase = planes?.get(`${name}.phase`);
  return log && phase ? { log, phase } : null;
}

const asGrey = (plane: DisplayPlane, window: Window): Shown => ({ plane, table: greyTable(window, plane.low, plane.high) });
const asPhase = ({ log, phase }: KspacePair): Shown => ({ plane: phase, table: cyclicTable(phase.low, phase.high), mask: log });
const kspaceShown = (pair: KspacePair | null, look: BenchView['kspaceLook'], window: Window): Shown | null =>
  pair && (look === 'phase' ? asPhase(pair) : asGrey(pair.log, window));
const asDifference = (bad: DisplayPlane, simulated: DisplayPlane, gain: number, span: number): Shown => {
  const plane = differencePlane(bad, simulated, gain);
  return { plane, table: divergingTable(span, plane.low, plane.high) };
};

function useImageShown(bad: DisplayPlane | undefined, simulation: Simulation | null, view: BenchView): ShownOf {
  const { imageWindow, compare, differenceSpan } = view;
  const simulated = simulation?.planes.get('image');
  const gain = simulation?.metrics?.gain ?? null;
  const shownBad = useMemo(() => bad && asGrey(bad, imageWindow), [bad, imageWindow]);
  const shownSimulated = useMemo(() => simulated && asGrey(simulated, windowUnderGain(imageWindow, gain)), [simulated, imageWindow, gain]);
  const difference = useMemo(
    () => (compare === 'difference' && bad && simulated ? asDifference(bad, simulated, gain ?? 1, differenceSpan) : null),
    [compare, bad, simulated, gain, differenceSpan],
  );
  return useMemo(() => ({ bad: shownBad ?? null, simulated: shownSimulated ?? null, difference }), [shownBad, shownSimulated, difference]);
}

function useKspaceShown(badPlanes: Planes | undefined, simulation: Simulation | null, view: BenchView): ShownOf {
  const { logWindow, compare, kspaceLook, logDifferenceSpan } = view;
  const bad = useMemo(() => kspaceOf(badPlanes, 'kspace'), [badPlanes]);
  const simulated = useMemo(
    () => kspaceOf(simulation?.planes, view.kspaceOf === 'acquired' ? 'kspace' : 'kspaceOfImage'),
    [simulation, view.kspaceOf],
  );
  const shownBad = useMemo(() => kspaceShown(bad, kspaceLook, logWindow), [bad, kspaceLook, logWindow]);
  const shownSimulated = useMemo(() => kspaceShown(simulated, kspaceLook, logWindow), [simulated, kspaceLook, logWindow]);
  const difference = useMemo(
    () => (compare === 'difference' && bad && simulated ? asDifference(bad.log, simulated.log, 1, logDifferenceSpan) : null),
    [compare, bad, simulated, logDifferenceSpan],
  );
  return useMemo(() => ({ bad: shownBad, simulated: shownSimulated, difference }), [shownBad, shownSimulated, difference]);
}

interface Sources {
  readonly badImage: Planes | undefined;
  readonly badKspace: Planes | undefined;
  readonly simulation: Simulation | null;
}

export function useShown({ badImage, badKspace, simulation }: Sources, view: BenchView): Readonly<Record<Domain, ShownOf>> {
  const image = useImageShown(badImage?.get('image'), simulation, view);
  const kspace = useKspaceShown(badKspace, simulation, view);
  return useMemo(() => ({ image, kspace }), [image, kspace]);
}

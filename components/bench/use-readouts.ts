/** The readouts of both domains at the one cursor that they share. */
import type { Domain } from '@/components/image/edge-scale';
import { useBench } from './bench-context';
import { hasOwnPhase } from './own-phase';
import { imageReadout, kspaceReadout, type ReadoutItem } from './readout';

export function useReadouts(): Record<Domain, ReadoutItem[]> {
  const { bad, view, frame, phaseEncode, badPlanes, simulation } = useBench();
  const name = view.kspaceOf === 'acquired' ? 'kspace' : 'kspaceOfImage';
  const badKspace = name === 'kspace' && !hasOwnPhase(bad) ? undefined : badPlanes.kspace;
  const { shown } = simulation;
  return {
    image: imageReadout(view.cursor, frame, { bad: badPlanes.image, simulation: shown }),
    kspace: kspaceReadout(view.cursor, frame, phaseEncode, { bad: badKspace, simulation: shown }, name),
  };
}

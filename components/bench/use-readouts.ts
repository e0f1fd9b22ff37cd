/** The readouts of both domains at the one cursor that they share. */
import type { Domain } from '@/components/image/edge-scale';
import { useBench } from './bench-context';
import { imageReadout, kspaceReadout, type ReadoutItem } from './readout';

export function useReadouts(): Record<Domain, ReadoutItem[]> {
  const { view, frame, phaseEncode, badPlanes, simulation } = useBench();
  const name = view.kspaceOf === 'acquired' ? 'kspace' : 'kspaceOfImage';
  const { shown } = simulation;
  return {
    image: imageReadout(view.cursor, frame, { bad: badPlanes.image, simulation: shown }),
    kspace: kspaceReadout(view.cursor, frame, phaseEncode, { bad: badPlanes.kspace, simulation: shown }, name),
  };
}

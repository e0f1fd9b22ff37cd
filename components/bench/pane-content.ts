/** What a pane shows under a compare mode, and how that is called in its head. */
import type { Domain } from '@/components/image/edge-scale';
import type { PaneContent } from '@/components/image/layers';
import type { Image } from '@/server/contract/images';
import type { BenchView } from './bench-view';
import { hasOwnPhase, kspaceOrigin, type WithKspace } from './own-phase';

type Asked = Pick<BenchView, 'compare' | 'divider' | 'kspaceOf'>;

/**
 * Side by side the two panes show one picture each. A divider at an end leaves one picture alone, and blink shows one at a time.
 * Of a magnitude image k-space as acquired exists in the simulation only, so that it is never divided and never subtracted.
 */
export function contentOf(
  domain: Domain,
  { compare, divider, kspaceOf }: Asked,
  side: 'bad' | 'simulated',
  blinksToBad: boolean,
  bad: Pick<Image, 'component'>,
): PaneContent {
  const isSimulatedOnly = domain === 'kspace' && kspaceOf === 'acquired' && !hasOwnPhase(bad);
  if (isSimulatedOnly && (compare !== 'side-by-side' || side === 'simulated')) return 'simulated';
  switch (compare) {
    case 'side-by-side':
      return side;
    case 'blink':
      return blinksToBad ? 'bad' : 'simulated';
    case 'difference':
      return 'difference';
    case 'divider':
      return divider <= 0 ? 'simulated' : divider >= 1 ? 'bad' : 'both';
  }
}

/** The words at the right of a pane's head: what a reader must know before believing it. */
export function cautionOf(
  domain: Domain,
  content: PaneContent,
  { kspaceOf, badFrame }: Pick<BenchView, 'kspaceOf' | 'badFrame'>,
  bad: WithKspace,
): string {
  if (domain === 'image') return content === 'difference' ? 'bad − simulated' : '';
  if (content === 'difference') return 'in decades';
  if (kspaceOf === 'image') return 'of the image, not raw data';
  return content === 'simulated' ? 'as acquired' : kspaceOrigin(bad, badFrame);
}

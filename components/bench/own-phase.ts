/**
 * What a complex image has that a magnitude has not: a phase of its own, and a k-space that is not the transform of its magnitude. Where it
 * came as raw data, the k-space of a coil element is what the scanner sampled.
 */
import type { Image } from '@/server/contract/images';

/** An image as far as it says what its k-space is. */
export interface WithKspace extends Pick<Image, 'component' | 'kspace'> {
  readonly frameFacts: readonly { readonly label: string | null }[];
}

export const hasOwnPhase = ({ component }: Pick<Image, 'component'>): boolean => component === 'complex';

/** What the k-space of a frame is, for the line above it: of the frame as it is stored, phase included. */
export function kspaceOrigin({ component, kspace, frameFacts }: WithKspace, frame: number): string {
  if (kspace === 'raw') return isCombined(frameFacts[frame]?.label) ? 'all coils, of raw data' : 'the scanner’s raw data';
  return component === 'complex' ? 'of the complex image, not raw data' : 'of the image, not raw data';
}

/** Several coil elements together, which the reader of raw data labels so: worked out of the samples, and none of them. */
const isCombined = (label: string | null | undefined): boolean => label?.split(', ').includes('combined') ?? false;

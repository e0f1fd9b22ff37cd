/** What a trial can be saved as, in the words of a menu. */
import type { TrialFile } from '@/server/contract/exports';

export const trialFileRows: readonly { readonly id: TrialFile; readonly label: string; readonly aside: string }[] = [
  { id: 'derived.dcm', label: 'derived DICOM', aside: 'marked' },
  { id: 'image.png', label: 'image, PNG 8 bits', aside: 'marked' },
  { id: 'image16.png', label: 'image, PNG 16 bits', aside: 'marked' },
  { id: 'kspace.png', label: 'k-space, PNG 8 bits', aside: 'marked' },
  { id: 'kspace16.png', label: 'k-space, PNG 16 bits', aside: 'marked' },
  { id: 'image.npy', label: 'image, .npy array', aside: 'float32' },
  { id: 'kspace.npy', label: 'k-space, .npy array', aside: 'complex64' },
  { id: 'recipe.json', label: 'recipe, JSON', aside: 'opens again' },
];

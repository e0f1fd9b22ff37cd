/** Which images of a case the bench works on. */
import type { Case } from '@/server/contract/cases';

/** Roles that a recipe may run on, the most telling first. */
const comparisonRoles = ['comparison', 'phantom', 'other-slice'] as const;

export interface BenchImages {
  readonly badId: string;
  /** The same as `badId` where the case has nothing to compare with. */
  readonly sourceId: string;
}

export function imagesOf({ images, pictureImageId }: Pick<Case, 'images' | 'pictureImageId'>): BenchImages | null {
  const bad =
    images.find(({ imageId, role }) => role === 'bad' && imageId === pictureImageId) ??
    images.find(({ role }) => role === 'bad') ??
    images[0];
  if (!bad) return null;
  const comparisons = comparisonRoles.flatMap((wanted) => images.filter(({ role }) => role === wanted));
  const source = comparisons.find(({ imageId }) => imageId !== bad.imageId) ?? bad;
  return { badId: bad.imageId, sourceId: source.imageId };
}

/** What may be analysed: an image that was encoded in its own plane and shows the signal. Others may be looked at, and a reason says why. */
import type { ImageRow } from '../../db/queries/images';
import { AppError } from '../errors';

const onePart: Partial<Record<ImageRow['component'], string>> = {
  phase: 'this is the phase of a complex image: pair it with its magnitude, and simulate on the complex image',
  real: 'this is the real part of a complex image: pair it with the imaginary part, and simulate on the complex image',
  imaginary: 'this is the imaginary part of a complex image: pair it with the real part, and simulate on the complex image',
};

/** Why nothing is simulated on an image, or compared with it. */
export function whyNotAnalysed({ use, component }: Pick<ImageRow, 'use' | 'component'>): string | undefined {
  if (use === 'look-only') return 'the image was captured, computed or reformatted, not encoded in its own plane: it may only be looked at';
  return onePart[component];
}

/** Throws `not-computable` at the field that named the image. */
export function requireAnalysable(row: ImageRow, path: string[]): void {
  const message = whyNotAnalysed(row);
  if (message !== undefined) throw new AppError('not-computable', { detail: message, issues: [{ path, message }] });
}

/**
 * Where a derived picture lies in the patient: its grid is known relative to the source's, the source's place from the header.
 * Source: DICOM PS3.3 C.7.6.2.1.1; the first three cosines point along a row, the other three down a column.
 */
import type { Derivation, DerivedPicture } from './derivation';

export interface PlaneInPatient {
  readonly position: readonly [number, number, number];
  readonly orientation: readonly number[];
}

/** Undefined where the header does not say where the source lies: nothing is made up. */
export function planeInPatient(about: Derivation, picture: DerivedPicture): PlaneInPatient | undefined {
  const orientation = about.facts.imageOrientation.value;
  const spacing = about.facts.pixelSpacingMm.value;
  if (orientation === null || spacing === null || about.sourcePositionMm === null) return undefined;
  const down = picture.originMm[0] + Math.floor(about.sourceRows / 2) * spacing[0];
  const along = picture.originMm[1] + Math.floor(about.sourceColumns / 2) * spacing[1];
  const [x, y, z] = about.sourcePositionMm;
  const at = (value: number, axis: 0 | 1 | 2): number =>
    rounded(value + along * (orientation[axis] ?? NaN) + down * (orientation[axis + 3] ?? NaN));
  return { position: [at(x, 0), at(y, 1), at(z, 2)], orientation };
}

/** Micrometres: sums of decimals have tails. */
const rounded = (millimetres: number): number => Number(millimetres.toFixed(6));

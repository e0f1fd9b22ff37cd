/** Where the image lies and how large its pixels are, in millimetres. Source: DICOM PS3.3 C.7.6.2, C.10.7.1.3 (row spacing first). */
import type { Header } from '../header';
import { absent, doubtful, fromHeader, quantity, type Fact } from './fact';

/** A pixel of clinical or small-animal MR (common practice). */
const smallestPixelMm = 0.01;
const largestPixelMm = 100;
/** Nothing lies further from the isocentre. */
const furthestMm = 5000;
/** Direction cosines are written with few digits: 0.990960 beside 0.134158 misses unit length by 1e-5. */
const cosineTolerance = 1e-3;

export function pixelSpacingFact(header: Header): Fact<[number, number]> {
  const values = header.numbers('pixelSpacing');
  if (values.length === 0) return absent('The header gives no pixel spacing: distances in millimetres are unknown.');
  const [row, column] = values;
  const plausible = values.every((value) => value >= smallestPixelMm && value <= largestPixelMm);
  if (values.length !== 2 || row === undefined || column === undefined || !plausible) {
    return doubtful<[number, number]>(null, 'The pixel spacing in the header makes no sense: distances in millimetres are unknown.');
  }
  return fromHeader<[number, number]>([row, column]);
}

export const sliceThicknessFact = (header: Header): Fact<number> =>
  quantity(header, 'sliceThickness', { from: 0.01, to: 1000, unit: 'mm' });
export const sliceSpacingFact = (header: Header): Fact<number> => quantity(header, 'sliceSpacing', { from: 0.01, to: 1000, unit: 'mm' });

export function imagePositionFact(header: Header): Fact<[number, number, number]> {
  const values = header.numbers('imagePosition');
  if (values.length === 0) return absent();
  const [x, y, z] = values;
  const plausible = values.every((value) => Math.abs(value) <= furthestMm);
  if (values.length !== 3 || x === undefined || y === undefined || z === undefined || !plausible) {
    return doubtful<[number, number, number]>(null, 'The image position in the header is not three distances.');
  }
  return fromHeader<[number, number, number]>([x, y, z]);
}

/** Direction cosines of the row and of the column: two unit vectors at a right angle. */
export function imageOrientationFact(header: Header): Fact<number[]> {
  const values = header.numbers('imageOrientation');
  if (values.length === 0) return absent();
  const along = values.slice(0, 3);
  const down = values.slice(3);
  const dot = (a: readonly number[], b: readonly number[]) => a.reduce((sum, value, i) => sum + value * (b[i] ?? NaN), 0);
  const near = (value: number, target: number) => Math.abs(value - target) <= cosineTolerance;
  const orthonormal = values.length === 6 && near(dot(along, along), 1) && near(dot(down, down), 1) && near(dot(along, down), 0);
  return orthonormal
    ? fromHeader([...values])
    : doubtful<number[]>(null, 'The image orientation in the header is not two unit vectors at a right angle.');
}

/** Small DICOM files for these tests: 16 × 16 pixels of a sloping surface, with whatever a test wants changed in them. */
import { readDicom, type AcceptedImage } from '../../../server/dicom/read';
import { writeDicom, type Attributes, type ImageToWrite } from '../../../server/dicom/write';

export const side = 16;

/** The key of a department that does not exist. */
export const key = new TextEncoder().encode('a key for these tests, which is 32 bytes long or more');

/** Values 1 to 256, so that no pixel is zero. */
export const slope = Uint16Array.from({ length: side * side }, (_, index) => index + 1);

const uids = { study: '2.25.1', series: '2.25.2', image: '2.25.3' };

export const madeFile = (changes: Partial<ImageToWrite> = {}): Uint8Array =>
  writeDicom({ rows: side, columns: side, pixels: slope, uids, ...changes });

/** Reads a made file with these attributes, which must be accepted. */
export function readMade(attributes: Attributes, changes: Partial<ImageToWrite> = {}): AcceptedImage {
  return accepted(madeFile({ attributes, ...changes }));
}

export function accepted(bytes: Uint8Array): AcceptedImage {
  const read = readDicom(bytes, key);
  if ('refused' in read) throw new Error(`refused: ${read.refused.code}, ${read.refused.reason}`);
  const [image] = read.accepted;
  if (image === undefined || read.accepted.length > 1) throw new Error(`${read.accepted.length} images`);
  return image;
}

export function refused(bytes: Uint8Array): { code: string; reason: string } {
  const read = readDicom(bytes, key);
  if ('accepted' in read) throw new Error('accepted');
  return read.refused;
}

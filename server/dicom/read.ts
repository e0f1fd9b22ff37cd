/**
 * The door for DICOM files: bytes in, an image with its facts out, or the reason why not. Pure and synchronous; it runs in a
 * worker thread. Here: uncompressed little endian, one frame, MR magnitude. Of everything else in a file only the names of the
 * tags come out, as the account of what was removed.
 */
import type { Element } from 'dicom-parser';
import type { ScanFacts } from '../contract/facts';
import type { Image } from '../contract/images';
import { deidentificationOf } from './deidentification';
import { factsOf } from './facts';
import { headerOf, type Header } from './header';
import { refuseKindOfImage } from './kind-of-image';
import { elementsAfter, parse, type Parsed } from './parse';
import { readPixels } from './pixels';
import { isRefused, refuse, type Refused } from './refusal';
import { uncompressedLittleEndian, whyNotRead } from './transfer-syntax';
import { warningsOf } from './warnings';

export interface AcceptedImage extends Pick<Image, 'rows' | 'columns' | 'spacingMm' | 'range' | 'warnings' | 'deidentification'> {
  readonly frames: 1;
  readonly component: 'magnitude';
  /** Rescaled, [row, column]. */
  readonly values: Float32Array<ArrayBuffer>;
  readonly facts: ScanFacts;
}

export type Read = { readonly accepted: AcceptedImage } | Refused;

/** Reads one file. Its name is no input: names of exported files hold names of patients. */
export function readDicom(bytes: Uint8Array): Read {
  const read = readImage(bytes);
  return isRefused(read) ? read : { accepted: read };
}

function readImage(bytes: Uint8Array): AcceptedImage | Refused {
  const parsed = parse(bytes);
  if (isRefused(parsed)) return parsed;
  const header = headerOf(parsed.dataSet);
  const pixelData = pixelDataOf(parsed, header);
  if (isRefused(pixelData)) return pixelData;
  const pixels = readPixels(bytes, header, pixelData);
  if (isRefused(pixels)) return pixels;
  const facts = factsOf(header);
  const { rows, columns, values, range } = pixels;
  return {
    rows,
    columns,
    frames: 1,
    component: 'magnitude',
    values,
    range: [...range],
    spacingMm: facts.pixelSpacingMm.value,
    facts,
    warnings: warningsOf(header, facts, pixels),
    deidentification: deidentificationOf(parsed.dataSet.elements, elementsAfter(bytes, parsed, pixelData), header),
  };
}

/** The pixel data of an image that is taken. */
function pixelDataOf({ transferSyntax, pixelData }: Parsed, header: Header): Element | Refused {
  // A header that was cut off before its modality is not an image of another kind.
  const kind = pixelData === undefined && header.text('modality') === undefined ? undefined : refuseKindOfImage(header);
  if (kind !== undefined) return kind;
  if (pixelData === undefined || pixelData.length === 0) {
    return refuse('no-pixels', 'The file holds a header and no pixels, or was cut off before them. Export the image itself.');
  }
  if (!uncompressedLittleEndian.has(transferSyntax)) return refuse('transfer-syntax', `The pixels are ${whyNotRead(transferSyntax)}.`);
  if (pixelData.hadUndefinedLength !== true) return pixelData;
  return refuse(
    'transfer-syntax',
    'The pixels are packed as if compressed, though the header says they are not. Export the image again, uncompressed.',
  );
}

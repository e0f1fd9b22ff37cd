/**
 * The door for DICOM files: bytes in, an image with its facts out, or the reason why not. Pure and synchronous; it runs in a
 * worker thread. Here: uncompressed little endian, one frame, MR magnitude. Of everything else in a file only the names of the
 * tags come out, as the account of what was removed.
 */
import type { Element } from 'dicom-parser';
import type { FrameFacts, ScanFacts } from '../contract/facts';
import type { Image } from '../contract/images';
import { deidentificationOf } from './deidentification';
import { factsOf } from './facts';
import { headerOf, type Header } from './header';
import { refuseKindOfImage } from './kind-of-image';
import { elementsAfter, parse, type Parsed } from './parse';
import { readPixels } from './pixels';
import { isRefused, refuse, type Refused } from './refusal';
import { uncompressedLittleEndian, whyNotRead } from './transfer-syntax';
import { replacedUid, type IdentifierName, type UniqueIdentifiers } from './unique-identifiers';
import { warningsOf } from './warnings';

type Described = 'rows' | 'columns' | 'frames' | 'component' | 'use' | 'kspace' | 'spacingMm' | 'range' | 'frameFacts';

/** One image of a file that was taken. */
export interface AcceptedImage extends Pick<Image, Described | 'warnings' | 'deidentification'> {
  /** Rescaled, [frame, row, column]; of a complex image re and im in turn. */
  readonly values: Float32Array<ArrayBuffer>;
  readonly facts: ScanFacts;
  /** Replaced already: what the file had does not come out of the reader. */
  readonly identifiers: UniqueIdentifiers;
}

export type Read = { readonly accepted: readonly AcceptedImage[] } | Refused;

/**
 * Reads one file: one image or several, where it holds several components. Its name is no input: names of exported files hold names of
 * patients. `key` is the department's, which replaces unique identifiers.
 */
export function readDicom(bytes: Uint8Array, key: Uint8Array): Read {
  const read = readImage(bytes, key);
  return isRefused(read) ? read : { accepted: [read] };
}

function readImage(bytes: Uint8Array, key: Uint8Array): AcceptedImage | Refused {
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
    use: 'measured',
    kspace: 'derived',
    values,
    range: [...range],
    spacingMm: facts.pixelSpacingMm.value,
    facts,
    frameFacts: [frameFactsOf(facts)],
    identifiers: identifiersOf(header, key),
    warnings: warningsOf(header, facts, pixels),
    deidentification: deidentificationOf(parsed.dataSet.elements, elementsAfter(bytes, parsed, pixelData), header),
  };
}

const frameFactsOf = ({ imagePositionMm, timeOfDay, echoTimeMs }: ScanFacts): FrameFacts => ({
  positionMm: imagePositionMm.value,
  timeOfDay: timeOfDay.value,
  triggerDelayMs: null,
  echoTimeMs: echoTimeMs.value,
  label: null,
});

function identifiersOf(header: Header, key: Uint8Array): UniqueIdentifiers {
  const replaced = (name: IdentifierName) => {
    const uid = header.text(name);
    return uid === undefined ? null : replacedUid(key, uid);
  };
  return {
    study: replaced('studyInstance'),
    series: replaced('seriesInstance'),
    frameOfReference: replaced('frameOfReference'),
    image: replaced('sopInstance'),
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

/**
 * The door for DICOM files: bytes in, an image with its facts out, or the reason why not. Pure and synchronous; it runs in a
 * worker thread. Here: one frame, MR magnitude. Of everything else in a file only the names of the tags come out, as the account of
 * what was removed.
 */
import type { FrameFacts, ScanFacts } from '../contract/facts';
import type { Image } from '../contract/images';
import { noDecoders, type Decoders } from './codecs/decoders';
import { deidentificationOf } from './deidentification';
import { factsOf } from './facts';
import { framesOf, noPixels } from './frames';
import { headerOf, type Header } from './header';
import { refuseKindOfImage } from './kind-of-image';
import { elementsAfter, parse, type Parsed } from './parse';
import { layoutOf, readPixels } from './pixels';
import { isRefused, type Refused } from './refusal';
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
 * patients. `key` is the department's, which replaces unique identifiers. Compressed frames need decoders.
 */
export function readDicom(bytes: Uint8Array, key: Uint8Array, decoders: Decoders = noDecoders): Read {
  const read = readImage(bytes, key, decoders);
  return isRefused(read) ? read : { accepted: [read] };
}

function readImage(bytes: Uint8Array, key: Uint8Array, decoders: Decoders): AcceptedImage | Refused {
  const parsed = parse(bytes);
  if (isRefused(parsed)) return parsed;
  const header = headerOf(parsed.dataSet);
  const unfit = whyNotTaken(parsed, header);
  if (unfit !== undefined) return unfit;
  const layout = layoutOf(header);
  if (isRefused(layout)) return layout;
  const frames = framesOf(parsed, layout, 1, decoders);
  if (isRefused(frames)) return frames;
  const [frame] = frames;
  if (frame === undefined) return noPixels;
  const pixels = readPixels(frame, layout, header);
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
    deidentification: deidentificationOf(parsed.dataSet.elements, elementsAfter(parsed), header),
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

function whyNotTaken({ pixelData }: Parsed, header: Header): Refused | undefined {
  // A header that was cut off before its modality is not an image of another kind.
  const isCutOff = pixelData === undefined && header.text('modality') === undefined;
  const kind = isCutOff ? undefined : refuseKindOfImage(header);
  return kind ?? (pixelData === undefined || pixelData.length === 0 ? noPixels : undefined);
}

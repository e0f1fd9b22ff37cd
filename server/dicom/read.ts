/**
 * The door for DICOM files: bytes in, images with their facts out, or the reason why not. Pure and synchronous; it runs in a worker thread.
 * Frames of one component and one plane are one image, [frame, row, column]; a mosaic is one image of its slices. Of everything else in a file
 * only the names of the tags come out, as the account of what was removed.
 */
import { createHash } from 'node:crypto';
import type { ScanFacts } from '../contract/facts';
import type { Image } from '../contract/images';
import { noDecoders, type Decoders } from './codecs/decoders';
import { deidentificationOf } from './deidentification';
import { factsOf } from './facts';
import { framesOf, noPixels } from './frames';
import { frameFactsOf } from './frame-facts';
import { headerOf, type Header } from './header';
import { frameCount, imagesOfFrames, refuseTooMany, type ImageFrames } from './image-frames';
import { kindOf, type Kind } from './kind-of-image';
import { cutMosaic, factsOfSlice, isMosaic, mosaicOf, slicePositions, type Mosaic } from './mosaic';
import { elementsAfter, parse, type Parsed } from './parse';
import { layoutOf, readPixels, type Layout, type StoredFrame } from './pixels';
import { isRefused, type Refused } from './refusal';
import { fileKeyOf, replacedUid, type IdentifierName, type UniqueIdentifiers } from './unique-identifiers';
import { warningsOf } from './warnings';

type Described = 'rows' | 'columns' | 'frames' | 'component' | 'use' | 'kspace' | 'confirmedNoText' | 'spacingMm' | 'range' | 'frameFacts';

/** One image of a file that was taken. */
export interface AcceptedImage extends Pick<Image, Described | 'warnings' | 'deidentification'> {
  /** Rescaled, [frame, row, column]; of a complex image re and im in turn. */
  readonly values: Float32Array<ArrayBuffer>;
  readonly facts: ScanFacts;
  /** Replaced already: what the file had does not come out of the reader. */
  readonly identifiers: UniqueIdentifiers;
}

/** `fileKey`: the same for the same bytes, so that a file that was sent already is known. */
export type Read = { readonly accepted: readonly AcceptedImage[]; readonly fileKey: string } | Refused;

/**
 * Reads one file: one image or several, where it holds several components. Its name is no input: names of exported files hold names of
 * patients. `key` is the department's, which replaces unique identifiers. Compressed frames need decoders.
 */
export function readDicom(bytes: Uint8Array, key: Uint8Array, decoders: Decoders = noDecoders): Read {
  const read = readImages(bytes, key, decoders);
  return isRefused(read) ? read : { accepted: read, fileKey: fileKeyOf(key, createHash('sha256').update(bytes).digest('hex')) };
}

function readImages(bytes: Uint8Array, key: Uint8Array, decoders: Decoders): readonly AcceptedImage[] | Refused {
  const parsed = parse(bytes);
  if (isRefused(parsed)) return parsed;
  const header = headerOf(parsed.dataSet);
  const kind = kindOfFile(parsed, header);
  if (isRefused(kind)) return kind;
  const stored = storedFramesOf(parsed, header, decoders);
  if (isRefused(stored)) return stored;
  const images = imagesOfFrames(stored.frames.map((frame) => frame.header));
  if (isRefused(images)) return images;
  const ofFile = {
    ...{ use: kind.use, confirmedNoText: kind.confirmedNoText, kspace: 'derived' as const },
    identifiers: identifiersOf(header, key),
    deidentification: deidentificationOf(parsed.dataSet, elementsAfter(parsed), header),
  };
  return images.map((image) => ({ ...describedImage(stored, image, kind), ...ofFile }));
}

function kindOfFile({ pixelData }: Parsed, header: Header): Kind | Refused {
  // A header that was cut off before its modality is not an image of another kind.
  if (pixelData === undefined && header.text('modality') === undefined) return noPixels;
  const kind = kindOf(header);
  return isRefused(kind) || (pixelData !== undefined && pixelData.length > 0) ? kind : noPixels;
}

interface StoredFrames {
  readonly layout: Layout;
  readonly frames: readonly StoredFrame[];
  /** Where the frames are slices that were cut out of one picture. */
  readonly mosaic?: Mosaic;
}

/** Every frame with the header seen for it. A mosaic of one frame becomes its slices. */
function storedFramesOf(parsed: Parsed, header: Header, decoders: Decoders): StoredFrames | Refused {
  const layout = layoutOf(header);
  if (isRefused(layout)) return layout;
  const count = frameCount(header);
  if (typeof count !== 'number') return count;
  const tooMany = refuseTooMany(count, layout.rows * layout.columns);
  if (tooMany !== undefined) return tooMany;
  const mosaic = count === 1 && isMosaic(header) ? mosaicOf(header, layout) : undefined;
  if (mosaic !== undefined && isRefused(mosaic)) return mosaic;
  const frames = framesOf(parsed, layout, count, decoders);
  if (isRefused(frames)) return frames;
  const [only] = frames;
  if (mosaic === undefined || only === undefined) {
    return { layout, frames: frames.map((frame, i) => ({ bytes: frame, header: headerOf(parsed.dataSet, i) })) };
  }
  return { layout: mosaic.tile, frames: cutMosaic(only, mosaic).map((slice) => ({ bytes: slice, header })), mosaic };
}

function describedImage({ layout, frames: all, mosaic }: StoredFrames, { component, frames: places }: ImageFrames, kind: Kind) {
  const frames = places.map((place) => all[place]).filter((frame) => frame !== undefined);
  const headers = frames.map((frame) => frame.header);
  const [header] = headers;
  if (header === undefined) throw new RangeError('an image must have at least one frame, got none');
  const pixels = readPixels(frames, layout, component);
  const ofHeader = factsOf(header);
  const positions = mosaic && slicePositions(header, ofHeader, mosaic, frames.length);
  const facts = positions ? factsOfSlice(ofHeader, positions[0]) : ofHeader;
  const frameFacts = frameFactsOf(headers, places);
  const { rows, columns, values, range } = pixels;
  return {
    ...{ rows, columns, component, values, facts },
    frames: frames.length,
    range: [...range] as [number, number],
    spacingMm: facts.pixelSpacingMm.value,
    frameFacts: positions ? frameFacts.map((frame, i) => ({ ...frame, positionMm: positions[i] ?? null })) : frameFacts,
    warnings: warningsOf({ header, facts, pixels, component, kind }),
  };
}

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

/**
 * A small writer of DICOM files: Part 10, MR Image Storage, one frame, 16 bits, for demonstration images and tests. It writes
 * what it is given and checks nothing, so that files with traps can be made. Sources: DICOM PS3.10 section 7, PS3.3 A.4, C.8.3.1.
 */
import { allowList, type AttributeName } from './allow-list';
import { encodeElements, joined, type ElementToWrite, type ElementValue, type VrEncoding } from './elements';
import { mrImageStorage } from './kind-of-image';
import { explicitLittleEndian, implicitLittleEndian } from './transfer-syntax';

export type Attributes = Partial<Record<AttributeName, ElementValue>>;

export interface ImageToWrite {
  readonly rows: number;
  readonly columns: number;
  /** [row, column]. */
  readonly pixels: Uint16Array | Int16Array;
  /** Values by the names of the allow-list; they replace what is written by default. */
  readonly attributes?: Attributes;
  /** Anything else; an element replaces one with the same tag, file meta information included. */
  readonly extra?: readonly ElementToWrite[];
  /** Tags not to be written, `GGGG,EEEE`. */
  readonly without?: readonly string[];
  /** Unique identifiers of study, series and image; `uidOf` makes them of UUIDs. */
  readonly uids: { readonly study: string; readonly series: string; readonly image: string };
  /** `explicit` where left out. */
  readonly vrEncoding?: VrEncoding;
}

/** Names this writer in its files, as PS3.10 asks for: an identifier made of a UUID once. */
export const implementationClass = '2.25.56549397983632776333917931728191179833';
const preamble = new Uint8Array(128);
const prefix = new TextEncoder().encode('DICM');

/** A DICOM unique identifier of a UUID: 2.25. and its value in decimals (PS3.5 annex B.2). */
export const uidOf = (uuid: string): string => `2.25.${BigInt(`0x${uuid.replaceAll('-', '')}`)}`;

export function writeDicom(image: ImageToWrite): Uint8Array {
  const extra = image.extra ?? [];
  const isMeta = ({ tag }: ElementToWrite) => tag.startsWith('0002');
  const without = new Set(image.without);
  const kept = (elements: readonly ElementToWrite[]) => elements.filter(({ tag }) => !without.has(tag));
  const { uids, vrEncoding } = image;
  const written = { sopClass: mrImageStorage, sopInstance: uids.image, vrEncoding };
  const meta = kept(overlaid(metaElements(written), extra.filter(isMeta)));
  const named = Object.entries(image.attributes ?? {}).map(([name, value]) => namedElement(name as AttributeName, value));
  const dataSet = kept(overlaid(defaultElements(image), [...named, ...extra.filter((element) => !isMeta(element))]));
  return joined([head(meta), encodeElements(dataSet, vrEncoding)]);
}

interface Written {
  readonly sopClass: string;
  readonly sopInstance: string;
  /** `explicit` where left out. */
  readonly vrEncoding?: VrEncoding | undefined;
}

/** A file of exactly these elements; later ones replace earlier ones with the same tag. */
export const partTen = (dataSet: readonly ElementToWrite[], written: Written): Uint8Array =>
  joined([head(metaElements(written)), encodeElements(overlaid(dataSet, []), written.vrEncoding)]);

function head(meta: readonly ElementToWrite[]): Uint8Array {
  const metaBytes = encodeElements(meta);
  const metaLength = encodeElements([{ tag: '0002,0000', vr: 'UL', value: metaBytes.length }]);
  return joined([preamble, prefix, metaLength, metaBytes]);
}

/** Later elements replace earlier ones with the same tag. */
const overlaid = (under: readonly ElementToWrite[], over: readonly ElementToWrite[]): ElementToWrite[] => [
  ...new Map([...under, ...over].map((element) => [element.tag.toUpperCase(), element])).values(),
];

function namedElement(name: AttributeName, value: ElementValue): ElementToWrite {
  const { tag, vr } = allowList[name];
  return { tag: `${tag.slice(1, 5)},${tag.slice(5)}`.toUpperCase(), vr, value };
}

const metaElements = ({ sopClass, sopInstance, vrEncoding }: Written): ElementToWrite[] => [
  { tag: '0002,0001', vr: 'OB', value: Uint8Array.of(0, 1) },
  { tag: '0002,0002', vr: 'UI', value: sopClass },
  { tag: '0002,0003', vr: 'UI', value: sopInstance },
  { tag: '0002,0010', vr: 'UI', value: vrEncoding === 'implicit' ? implicitLittleEndian : explicitLittleEndian },
  { tag: '0002,0012', vr: 'UI', value: implementationClass },
];

function defaultElements({ rows, columns, pixels, uids }: ImageToWrite): ElementToWrite[] {
  const named: Attributes = {
    imageType: ['ORIGINAL', 'PRIMARY', 'OTHER'],
    sopClass: mrImageStorage,
    modality: 'MR',
    samplesPerPixel: 1,
    photometricInterpretation: 'MONOCHROME2',
    rows,
    columns,
    bitsAllocated: 16,
    bitsStored: 16,
    highBit: 15,
    pixelRepresentation: pixels instanceof Int16Array ? 1 : 0,
  };
  return [
    ...Object.entries(named).map(([name, value]) => namedElement(name as AttributeName, value)),
    { tag: '0008,0018', vr: 'UI', value: uids.image },
    { tag: '0020,000D', vr: 'UI', value: uids.study },
    { tag: '0020,000E', vr: 'UI', value: uids.series },
    { tag: '7FE0,0010', vr: 'OW', value: littleEndian(pixels) },
  ];
}

function littleEndian(pixels: Uint16Array | Int16Array): Uint8Array {
  const bytes = new Uint8Array(2 * pixels.length);
  const view = new DataView(bytes.buffer);
  pixels.forEach((pixel, index) => view.setUint16(2 * index, pixel & 0xffff, true));
  return bytes;
}

/**
 * From bytes to a data set up to its pixel data, or the reason why not. dicom-parser walks the elements; this file decides what
 * is DICOM at all, and finds every cut: the parser itself lets some pass (implicit VR, undefined lengths).
 * File format: DICOM PS3.10 section 7; a bare data set without preamble, as some exports are, is taken when it reads cleanly.
 */
import dicomParser, { type DataSet, type Element } from 'dicom-parser';
import { pixelDataTag } from './allow-list';
import { TooManyElements, walkElements } from './counted-elements';
import { itemsFrom, type Items } from './encapsulation';
import { inflated } from './inflate';
import { cut, isRefused, refuse, type Refused } from './refusal';
import { deflated, deflatedReference, encapsulated, explicitLittleEndian, implicitLittleEndian, whyNotRead } from './transfer-syntax';

export interface Parsed {
  /** Its byte array is the file, or what came out of it where the file is deflated. */
  readonly dataSet: DataSet;
  /** How the data set is written, once inflated. */
  readonly transferSyntax: string;
  /** Where the file has one; its bytes are inside the byte array. */
  readonly pixelData: Element | undefined;
  /** What encapsulated pixel data consist of. */
  readonly items: Items | undefined;
}

const preambleLength = 128;
const undefinedLength = 0xffffffff;
/** The first element of the meta information, its group length, takes twelve bytes behind the prefix. */
const metaStart = preambleLength + 4 + 12;
/** Meta information is a few hundred bytes long: a dozen identifiers and titles. */
const longestMeta = 1 << 16;

export function parse(bytes: Uint8Array): Parsed | Refused {
  if (bytes.length === 0) return refuse('empty', 'The file is empty (0 bytes). Copy or export it again.');
  const container = containerOf(bytes);
  if (isRefused(container)) return container;
  if (container.transferSyntax === deflatedReference) return refuse('transfer-syntax', `The pixels are ${whyNotRead(deflatedReference)}.`);
  if (container.transferSyntax !== deflated) return parseDataSet(bytes, container);
  const whole = inflated(bytes.subarray(container.start));
  return isRefused(whole) ? whole : parseDataSet(whole, { ...container, transferSyntax: explicitLittleEndian, start: 0 });
}

function parseDataSet(bytes: Uint8Array, { transferSyntax, start, meta }: Container): Parsed | Refused {
  const { dataSet, stumbled } = walkElements(bytes, start, transferSyntax, pixelDataTag);
  if (stumbled !== undefined) return refusedFor(stumbled);
  if (isCut(dataSet, bytes.length)) return cut;
  Object.assign(dataSet.elements, meta);
  const pixelData = dataSet.elements[pixelDataTag];
  if (pixelData?.hadUndefinedLength !== true || !encapsulated(transferSyntax)) {
    return { dataSet, transferSyntax, pixelData, items: undefined };
  }
  const items = itemsFrom(bytes, pixelData.dataOffset);
  return isRefused(items) ? items : { dataSet, transferSyntax, pixelData, items };
}

/** How much of what follows the pixels is looked at for its tags: signatures and padding are short. */
const longestTail = 1 << 20;

/** The elements behind the pixel data, as far as they can be read: for the account of tags only. */
export function elementsAfter({ dataSet, transferSyntax, pixelData, items }: Parsed): DataSet['elements'] {
  if (pixelData === undefined) return {};
  const end = items?.end ?? pixelData.dataOffset + pixelData.length;
  const tail = new Uint8Array(dataSet.byteArray.subarray(end, end + longestTail));
  return walkElements(tail, 0, transferSyntax, '').dataSet.elements;
}

/** How the data set is written and where it starts. */
interface Container {
  readonly transferSyntax: string;
  readonly start: number;
  /** Elements of the meta information, where there is one. */
  readonly meta?: DataSet['elements'];
}

function containerOf(bytes: Uint8Array): Container | Refused {
  if (!hasPrefix(bytes)) return isCutPreamble(bytes) ? cut : bareContainer(bytes);
  // What follows may be deflated, which cannot be walked; but the length, too, may be wrong.
  const found = metaOf(bytes.subarray(0, saidEndOfMeta(bytes)));
  const header = isRefused(found) || found.transferSyntax === undefined ? metaOf(bytes.subarray(0, longestMeta)) : found;
  if (isRefused(header)) return header;
  const { transferSyntax, elements: meta } = header;
  if (transferSyntax !== undefined) return { transferSyntax, start: endOf(meta), meta };
  return refuse('unreadable', 'The file does not say how it is written (no transfer syntax). It may be cut off: export it again.');
}

function metaOf(bytes: Uint8Array): { transferSyntax: string | undefined; elements: DataSet['elements'] } | Refused {
  try {
    const header = dicomParser.readPart10Header(bytes, { untilTag: '' });
    return { transferSyntax: header.string('x00020010'), elements: header.elements };
  } catch (thrown) {
    return refusedFor(thrown);
  }
}

const endOf = (meta: DataSet['elements']): number =>
  Object.values(meta).reduce((end, { dataOffset, length }) => Math.max(end, dataOffset + length), preambleLength + 4);

/** Where the meta information ends by its own word. One that does not begin with its length, as it must, or goes on behind it, is read on
 *  until another group comes. */
function saidEndOfMeta(bytes: Uint8Array): number {
  if (bytes.length < metaStart) return bytes.length;
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const at = preambleLength + 4;
  const saysLength = view.getUint32(at, true) === 0x0000_0002 && textAt(bytes, at + 4, 2) === 'UL';
  const end = saysLength ? metaStart + view.getUint32(at + 8, true) : bytes.length;
  const goesOn = end + 2 <= bytes.length && view.getUint16(end, true) === 0x0002;
  return Math.min(goesOn ? bytes.length : end, longestMeta);
}

function hasPrefix(bytes: Uint8Array): boolean {
  return textAt(bytes, preambleLength, 4) === 'DICM';
}

/** All that is left of a file is zeros of a preamble, or these and a part of the prefix. */
function isCutPreamble(bytes: Uint8Array): boolean {
  if (bytes.length >= preambleLength + 4) return false;
  return bytes.subarray(0, preambleLength).every((byte) => byte === 0) && 'DICM'.startsWith(textAt(bytes, preambleLength, 4));
}

/** A bare data set starts with an element of group 0008 of a believable length; explicit VR shows as two capital letters. */
function bareContainer(bytes: Uint8Array): Container | Refused {
  if (bytes.length < 8) return notDicom;
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (view.getUint16(0, true) !== 0x0008 || view.getUint16(2, true) > 0x0070) return notDicom;
  if (/^[A-Z]{2}$/.test(textAt(bytes, 4, 2))) return { transferSyntax: explicitLittleEndian, start: 0 };
  return view.getUint32(4, true) <= 1024 ? { transferSyntax: implicitLittleEndian, start: 0 } : notDicom;
}

const textAt = (bytes: Uint8Array, from: number, length: number): string => String.fromCharCode(...bytes.subarray(from, from + length));

const notDicom = refuse(
  'not-dicom',
  'This is not a DICOM file, whatever its name says. Export the image from the scanner or the archive as DICOM.',
);

/** True where an element claims more bytes than there are, or the parser ran into the end while it looked for a delimiter. */
function isCut(dataSet: DataSet, length: number): boolean {
  if (dataSet.warnings.some((warning) => warning.startsWith('eof encountered'))) return true;
  return Object.values(dataSet.elements).some((element) => {
    // The parser's own note of a bare file's transfer syntax has no place in the file.
    if (element.dataOffset === undefined) return false;
    if (element.tag === pixelDataTag && element.length === undefinedLength) return false;
    return element.dataOffset + element.length > length;
  });
}

/** The parser throws strings and errors; which of them says that bytes were missing is in its words. */
function refusedFor(thrown: unknown): Refused {
  if (thrown instanceof TooManyElements) return tooManyElements;
  const words = thrown instanceof Error ? thrown.message : String(thrown);
  if (/past end|over(read|run)|maxP ?osition|greater than or equal to 'byteArray' length/.test(words)) return cut;
  return refuse('unreadable', 'The file starts like DICOM, but its elements cannot be read: it is damaged. Export it again.');
}

const tooManyElements = refuse(
  'too-large',
  'The header holds more elements than those of the longest series that one file may have. Export the series in parts.',
);

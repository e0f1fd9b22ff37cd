/**
 * From bytes to a data set up to its pixel data, or the reason why not. dicom-parser walks the elements; this file decides what
 * is DICOM at all, and finds every cut: the parser itself lets some pass (implicit VR, undefined lengths).
 * File format: DICOM PS3.10 section 7; a bare data set without preamble, as some exports are, is taken when it reads cleanly.
 */
import dicomParser, { type DataSet, type Element, type ParseDicomOptions } from 'dicom-parser';
import { pixelDataTag } from './allow-list';
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

export function parse(bytes: Uint8Array): Parsed | Refused {
  if (bytes.length === 0) return refuse('empty', 'The file is empty (0 bytes). Copy or export it again.');
  const container = containerOf(bytes);
  if (isRefused(container)) return container;
  if (container.transferSyntax === deflatedReference) return refuse('transfer-syntax', `The pixels are ${whyNotRead(deflatedReference)}.`);
  if (container.transferSyntax !== deflated) return parseDataSet(bytes, container);
  const whole = inflated(bytes.subarray(container.start));
  return isRefused(whole) ? whole : parseDataSet(whole, { ...container, transferSyntax: explicitLittleEndian, bare: true });
}

/** `meta`: elements of the meta information where `bytes` are a bare data set. */
function parseDataSet(bytes: Uint8Array, { transferSyntax, bare, meta }: Container): Parsed | Refused {
  const dataSet = guarded(() => parseDicom(bytes, { untilTag: pixelDataTag, ...(bare ? { TransferSyntaxUID: transferSyntax } : {}) }));
  if (isRefused(dataSet)) return dataSet;
  if (isCut(dataSet, bytes.length)) return cut;
  Object.assign(dataSet.elements, meta);
  const pixelData = dataSet.elements[pixelDataTag];
  if (pixelData?.hadUndefinedLength !== true || !encapsulated(transferSyntax)) {
    return { dataSet, transferSyntax, pixelData, items: undefined };
  }
  const items = itemsFrom(bytes, pixelData.dataOffset);
  return isRefused(items) ? items : { dataSet, transferSyntax, pixelData, items };
}

/** The parser inflates what calls itself deflated, wherever it stands and without a limit: never here. */
function parseDicom(bytes: Uint8Array, options: ParseDicomOptions): DataSet {
  const inflater = () => {
    throw new Error('deflated inside a data set');
  };
  return dicomParser.parseDicom(bytes, { ...options, inflater });
}

/** How much of what follows the pixels is looked at for its tags: signatures and padding are short. */
const longestTail = 1 << 20;

/** The elements behind the pixel data, as far as they can be read: for the account of tags only. */
export function elementsAfter({ dataSet, transferSyntax, pixelData, items }: Parsed): DataSet['elements'] {
  if (pixelData === undefined) return {};
  const end = items?.end ?? pixelData.dataOffset + pixelData.length;
  const tail = new Uint8Array(dataSet.byteArray.subarray(end, end + longestTail));
  try {
    return parseDicom(tail, { TransferSyntaxUID: transferSyntax }).elements;
  } catch (thrown) {
    return elementsBefore(thrown);
  }
}

/** What the parser had read when it stumbled. */
function elementsBefore(thrown: unknown): DataSet['elements'] {
  const dataSet: unknown = typeof thrown === 'object' && thrown !== null && 'dataSet' in thrown ? thrown.dataSet : undefined;
  return isDataSet(dataSet) ? dataSet.elements : {};
}

const isDataSet = (value: unknown): value is DataSet =>
  typeof value === 'object' && value !== null && 'elements' in value && typeof value.elements === 'object';

/** How the data set is written, whether it comes without preamble and meta information, and else where it starts. */
interface Container {
  readonly transferSyntax: string;
  readonly bare: boolean;
  readonly start: number;
  readonly meta?: DataSet['elements'];
}

function containerOf(bytes: Uint8Array): Container | Refused {
  if (!hasPrefix(bytes)) return isCutPreamble(bytes) ? cut : bareContainer(bytes);
  const start = endOfMeta(bytes);
  // What follows may be deflated, which cannot be walked; but the length, too, may be wrong.
  const found = metaOf(bytes.subarray(0, start));
  const header = isRefused(found) || found.transferSyntax === undefined ? metaOf(bytes) : found;
  if (isRefused(header)) return header;
  const { transferSyntax, elements: meta } = header;
  if (transferSyntax !== undefined) return { transferSyntax, bare: false, start, meta };
  return refuse('unreadable', 'The file does not say how it is written (no transfer syntax). It may be cut off: export it again.');
}

function metaOf(bytes: Uint8Array): { transferSyntax: string | undefined; elements: DataSet['elements'] } | Refused {
  return guarded(() => {
    const header = dicomParser.readPart10Header(bytes, { untilTag: '' });
    return { transferSyntax: header.string('x00020010'), elements: header.elements };
  });
}

/** Where the data set starts. A file that does not begin with the group length, as it must, is read on until another group comes. */
function endOfMeta(bytes: Uint8Array): number {
  if (bytes.length < metaStart) return bytes.length;
  const view = new DataView(bytes.buffer, bytes.byteOffset + preambleLength + 4, 12);
  const saysLength = view.getUint32(0, true) === 0x0000_0002 && textAt(bytes, preambleLength + 8, 2) === 'UL';
  return saysLength ? Math.min(bytes.length, metaStart + view.getUint32(8, true)) : bytes.length;
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
  if (/^[A-Z]{2}$/.test(textAt(bytes, 4, 2))) return { transferSyntax: explicitLittleEndian, bare: true, start: 0 };
  return view.getUint32(4, true) <= 1024 ? { transferSyntax: implicitLittleEndian, bare: true, start: 0 } : notDicom;
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

/** The parser throws strings, errors and objects that hold either; which of them says that bytes were missing is in its words. */
function guarded<Result extends object>(action: () => Result): Result | Refused {
  try {
    return action();
  } catch (thrown) {
    const inner = typeof thrown === 'object' && thrown !== null && 'exception' in thrown ? thrown.exception : thrown;
    const words = inner instanceof Error ? inner.message : String(inner);
    if (/past end|over(read|run)|maxP ?osition|greater than or equal to 'byteArray' length/.test(words)) return cut;
    return refuse('unreadable', 'The file starts like DICOM, but its elements cannot be read: it is damaged. Export it again.');
  }
}

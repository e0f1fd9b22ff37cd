/**
 * From bytes to a data set up to its pixel data, or the reason why not. dicom-parser walks the elements; this file decides what
 * is DICOM at all, and finds every cut: the parser itself lets some pass (implicit VR, undefined lengths).
 * File format: DICOM PS3.10 section 7; a bare data set without preamble, as some exports are, is taken when it reads cleanly.
 */
import dicomParser, { type DataSet, type Element } from 'dicom-parser';
import { pixelDataTag } from './allow-list';
import { isRefused, refuse, type Refused } from './refusal';
import { deflated, explicitLittleEndian, implicitLittleEndian, whyNotRead } from './transfer-syntax';

export interface Parsed {
  readonly dataSet: DataSet;
  readonly transferSyntax: string;
  /** Where the file has one; its bytes, if not encapsulated, are inside the file. */
  readonly pixelData: Element | undefined;
}

const preambleLength = 128;
const undefinedLength = 0xffffffff;

export function parse(bytes: Uint8Array): Parsed | Refused {
  if (bytes.length === 0) return refuse('empty', 'The file is empty (0 bytes). Copy or export it again.');
  const container = containerOf(bytes);
  if (isRefused(container)) return container;
  const { transferSyntax, bare } = container;
  if (deflated.has(transferSyntax)) return refuse('transfer-syntax', `The file is ${whyNotRead(transferSyntax)}.`);
  const dataSet = guarded(() =>
    dicomParser.parseDicom(bytes, { untilTag: pixelDataTag, ...(bare ? { TransferSyntaxUID: transferSyntax } : {}) }),
  );
  if (isRefused(dataSet)) return dataSet;
  const pixelData = dataSet.elements[pixelDataTag];
  if (isCut(dataSet, bytes.length)) return cut;
  return { dataSet, transferSyntax, pixelData };
}

const cut = refuse(
  'truncated',
  'The file ends in the middle of an element: it was cut off while it was copied, or a length in it is damaged. Export it again.',
);
const notDicom = refuse(
  'not-dicom',
  'This is not a DICOM file, whatever its name says. Export the image from the scanner or the archive as DICOM.',
);

/** How much of what follows the pixels is looked at for its tags: signatures and padding are short. */
const longestTail = 1 << 20;

/** The elements behind the pixel data, as far as they can be read: for the account of tags only. */
export function elementsAfter(bytes: Uint8Array, { transferSyntax }: Parsed, pixelData: Element): DataSet['elements'] {
  const end = pixelData.dataOffset + pixelData.length;
  const tail = bytes.subarray(end, end + longestTail);
  try {
    return dicomParser.parseDicom(tail, { TransferSyntaxUID: transferSyntax }).elements;
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

/** How the data set is written, and whether it comes without preamble and file meta information. */
function containerOf(bytes: Uint8Array): { transferSyntax: string; bare: boolean } | Refused {
  if (hasPrefix(bytes)) {
    const transferSyntax = guarded(() => ({ uid: dicomParser.readPart10Header(bytes, { untilTag: '' }).string('x00020010') }));
    if (isRefused(transferSyntax)) return transferSyntax;
    if (transferSyntax.uid !== undefined) return { transferSyntax: transferSyntax.uid, bare: false };
    return refuse('unreadable', 'The file does not say how it is written (no transfer syntax). It may be cut off: export it again.');
  }
  if (isCutPreamble(bytes)) return cut;
  return bareContainer(bytes);
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
function bareContainer(bytes: Uint8Array): { transferSyntax: string; bare: boolean } | Refused {
  if (bytes.length < 8) return notDicom;
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (view.getUint16(0, true) !== 0x0008 || view.getUint16(2, true) > 0x0070) return notDicom;
  if (/^[A-Z]{2}$/.test(textAt(bytes, 4, 2))) return { transferSyntax: explicitLittleEndian, bare: true };
  return view.getUint32(4, true) <= 1024 ? { transferSyntax: implicitLittleEndian, bare: true } : notDicom;
}

const textAt = (bytes: Uint8Array, from: number, length: number): string => String.fromCharCode(...bytes.subarray(from, from + length));

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

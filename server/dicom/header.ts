/**
 * A data set seen through the allow-list: values are asked for by name, as texts or as numbers, and nothing else can be asked.
 * Never throws on a strange value: what cannot be read as asked is left out. Encodings: DICOM PS3.5 section 6.2.
 */
import type { DataSet, Element } from 'dicom-parser';
import { allowList, type AttributeName } from './allow-list';

export interface Header {
  /** The values of a textual attribute without their padding; none where it is absent or empty. */
  texts(name: AttributeName): readonly string[];
  /** The values of a numeric attribute. A value that is no finite number is NaN, so that counts stay true. */
  numbers(name: AttributeName): readonly number[];
  /** The first value, where there is exactly one of them or more. */
  text(name: AttributeName): string | undefined;
  number(name: AttributeName): number | undefined;
}

/** No attribute of the allow-list is longer in an honest file; a longer value is noise. */
const longestValue = 1024;
const decimal = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

export function headerOf(dataSet: DataSet): Header {
  const find = (name: AttributeName): { element: Element; vr: string } | undefined => {
    const { tag, vr } = allowList[name];
    const element = dataSet.elements[tag];
    if (element === undefined || element.length === 0 || element.length > longestValue || element.items !== undefined) return undefined;
    return { element, vr: element.vr === undefined || element.vr === 'UN' ? vr : element.vr };
  };
  const texts = (name: AttributeName): readonly string[] => {
    const found = find(name);
    return found === undefined || found.vr in binary ? [] : textsOf(dataSet, found.element);
  };
  const numbers = (name: AttributeName): readonly number[] => {
    const found = find(name);
    if (found === undefined) return [];
    const reader = binary[found.vr];
    if (reader !== undefined) return binaryNumbers(dataSet, found.element, reader);
    return textsOf(dataSet, found.element).map((text) => (decimal.test(text) ? Number(text) : NaN));
  };
  return {
    texts,
    numbers,
    text: (name) => texts(name)[0],
    number: (name) => {
      const first = numbers(name)[0];
      return Number.isFinite(first) ? first : undefined;
    },
  };
}

/** The tags of those attributes that have a value in this data set. */
export function tagsWithValue(header: Header, names: readonly AttributeName[]): string[] {
  return names.filter((name) => header.texts(name).length > 0 || header.numbers(name).length > 0).map((name) => allowList[name].tag);
}

interface BinaryReader {
  readonly width: number;
  readonly read: (dataSet: DataSet, tag: string, index: number) => number | undefined;
}

const binary: Readonly<Record<string, BinaryReader>> = {
  US: { width: 2, read: (dataSet, tag, index) => dataSet.uint16(tag, index) },
  SS: { width: 2, read: (dataSet, tag, index) => dataSet.int16(tag, index) },
  UL: { width: 4, read: (dataSet, tag, index) => dataSet.uint32(tag, index) },
  SL: { width: 4, read: (dataSet, tag, index) => dataSet.int32(tag, index) },
  FL: { width: 4, read: (dataSet, tag, index) => dataSet.float(tag, index) },
  FD: { width: 8, read: (dataSet, tag, index) => dataSet.double(tag, index) },
};

function binaryNumbers(dataSet: DataSet, element: Element, { width, read }: BinaryReader): number[] {
  const values: number[] = [];
  for (let index = 0; (index + 1) * width <= element.length; index++) {
    const value = read(dataSet, element.tag, index);
    values.push(value !== undefined && Number.isFinite(value) ? value : NaN);
  }
  return values;
}

/** Bytes as Latin-1, cut at the first NUL (which some writers pad with), split at backslashes, trimmed. */
function textsOf(dataSet: DataSet, element: Element): string[] {
  const bytes = dataSet.byteArray.subarray(element.dataOffset, element.dataOffset + element.length);
  const end = bytes.indexOf(0);
  const whole = Array.from(end === -1 ? bytes : bytes.subarray(0, end), (byte) => String.fromCharCode(byte)).join('');
  if (whole.trim() === '') return [];
  return whole.split('\\').map((value) => value.trim());
}

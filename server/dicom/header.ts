/**
 * A data set seen through the allow-list, for one frame: values are asked for by name, as texts or as numbers, and nothing else can be asked.
 * What the frame has for itself counts before what all frames share, and this before the top level (PS3.3 C.7.6.16).
 * Never throws on a strange value: what cannot be read as asked is left out. Encodings: DICOM PS3.5 section 6.2.
 */
import type { DataSet, Element } from 'dicom-parser';
import { allowList, type Attribute, type AttributeName } from './allow-list';
import { groupsOfFrame, itemOf } from './functional-groups';

export interface Header {
  /** The values of a textual attribute without their padding; none where it is absent or empty. */
  texts(name: AttributeName): readonly string[];
  /** The values of a numeric attribute. A value that is no finite number is NaN, so that counts stay true. */
  numbers(name: AttributeName): readonly number[];
  /** The first value, where there is exactly one of them or more. */
  text(name: AttributeName): string | undefined;
  number(name: AttributeName): number | undefined;
  /** The bytes of an attribute as they are. */
  bytes(name: AttributeName): Uint8Array | undefined;
}

interface Found {
  readonly dataSet: DataSet;
  readonly element: Element;
  readonly vr: string;
}

/** No attribute of the allow-list is longer in an honest file; a longer value is noise. */
const longestValue = 1024;
const decimal = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/;

/** @param frame counts for enhanced files; a classic one says the same of all its frames */
export function headerOf(dataSet: DataSet, frame = 0): Header {
  const groups = groupsOfFrame(dataSet, frame);
  const find = (name: AttributeName): Found | undefined => findIn(placesOf(dataSet, groups, allowList[name]), allowList[name]);
  const texts = (name: AttributeName): readonly string[] => {
    const found = find(name);
    return found === undefined || isLong(found) || found.vr in binary ? [] : textsOf(found.dataSet, found.element);
  };
  const numbers = (name: AttributeName): readonly number[] => {
    const found = find(name);
    if (found === undefined || isLong(found)) return [];
    const reader = binary[found.vr];
    if (reader !== undefined) return binaryNumbers(found.dataSet, found.element, reader);
    return textsOf(found.dataSet, found.element).map((text) => (decimal.test(text) ? Number(text) : NaN));
  };
  return {
    texts,
    numbers,
    text: (name) => texts(name)[0],
    number: (name) => {
      const first = numbers(name)[0];
      return Number.isFinite(first) ? first : undefined;
    },
    bytes: (name) => {
      const found = find(name);
      return found && found.dataSet.byteArray.subarray(found.element.dataOffset, found.element.dataOffset + found.element.length);
    },
  };
}

const isLong = ({ element }: Found): boolean => element.length > longestValue;

function placesOf(dataSet: DataSet, groups: readonly DataSet[], { group }: Attribute): readonly DataSet[] {
  if (group === undefined) return [dataSet];
  const items = groups.map((item) => itemOf(item, group, 0)).filter((item) => item !== undefined);
  return [...items, dataSet];
}

/** The first of these places where the attribute has a value. */
function findIn(places: readonly DataSet[], { tag, vr }: Attribute): Found | undefined {
  for (const dataSet of places) {
    const element = dataSet.elements[tag];
    if (element === undefined || element.length === 0 || element.items !== undefined) continue;
    return { dataSet, element, vr: element.vr === undefined || element.vr === 'UN' ? vr : element.vr };
  }
  return undefined;
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

/**
 * One list of numbers out of the private image header that Siemens scanners write as (0029,1010). Only the entry that is asked for by name is
 * looked at; every length is checked against the bytes that are there. Form, from the public documentation of NiBabel (Siemens CSA header):
 * SV10, four bytes, the number of entries, a mark; an entry is a name of 64 bytes, five integers (among them the number of items), items;
 * an item is four integers, of which the second is its length, and text padded to four bytes.
 */

const magic = 'SV10';
const headLength = 16;
const nameLength = 64;
const entryLength = nameLength + 20;
const itemLength = 16;
const mostEntries = 256;
const mostItems = 256;

const textOf = (bytes: Uint8Array): string => {
  const end = bytes.indexOf(0);
  return String.fromCharCode(...(end === -1 ? bytes : bytes.subarray(0, end)));
};

/** Empty where the header is another one, is damaged, or has no such entry. */
export function numbersOfPrivateHeader(bytes: Uint8Array, name: string): number[] {
  if (bytes.length < headLength || textOf(bytes.subarray(0, 4)) !== magic) return [];
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const entries = Math.min(mostEntries, view.getUint32(8, true));
  let at = headLength;
  for (let entry = 0; entry < entries && at + entryLength <= bytes.length; entry++) {
    const isWanted = textOf(bytes.subarray(at, at + nameLength)) === name;
    const items = view.getUint32(at + nameLength + 12, true);
    if (items > mostItems) return [];
    const read = readItems(bytes, view, at + entryLength, items);
    if (read === undefined) return [];
    if (isWanted) return read.texts.filter((text) => text !== '').map(Number);
    at = read.end;
  }
  return [];
}

function readItems(bytes: Uint8Array, view: DataView, start: number, items: number): { texts: string[]; end: number } | undefined {
  const texts: string[] = [];
  let at = start;
  for (let item = 0; item < items; item++) {
    if (at + itemLength > bytes.length) return undefined;
    const length = view.getUint32(at + 4, true);
    at += itemLength;
    if (at + length > bytes.length) return undefined;
    // Numbers are short; text of another kind is passed over.
    texts.push(length <= nameLength ? textOf(bytes.subarray(at, at + length)).trim() : '');
    at += Math.ceil(length / 4) * 4;
  }
  return { texts, end: at };
}

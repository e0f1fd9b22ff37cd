/**
 * Data elements to bytes, little endian, with explicit or implicit VR. Lengths are even and known in advance; elements come out
 * in the order of their tags. Source: DICOM PS3.5 sections 6.2, 7.1 and 7.5.
 */

/** Number, text, several of either, the items of a sequence, or the bytes as they are. */
export type ElementValue = string | number | readonly string[] | readonly number[] | readonly (readonly ElementToWrite[])[] | Uint8Array;

export interface ElementToWrite {
  /** `GGGG,EEEE`, hexadecimal. */
  readonly tag: string;
  readonly vr: string;
  readonly value: ElementValue;
}

export type VrEncoding = 'explicit' | 'implicit';

export function encodeElements(elements: readonly ElementToWrite[], vrEncoding: VrEncoding = 'explicit'): Uint8Array {
  const sorted = [...elements].sort((a, b) => a.tag.toUpperCase().localeCompare(b.tag.toUpperCase(), 'en'));
  return joined(sorted.map((element) => encodeElement(element, vrEncoding)));
}

export function joined(parts: readonly Uint8Array[]): Uint8Array {
  const whole = new Uint8Array(parts.reduce((length, part) => length + part.length, 0));
  let offset = 0;
  for (const part of parts) {
    whole.set(part, offset);
    offset += part.length;
  }
  return whole;
}

/** VRs whose explicit form has two reserved bytes and a length of four. */
const longVrs = new Set(['OB', 'OD', 'OF', 'OL', 'OV', 'OW', 'SQ', 'SV', 'UC', 'UN', 'UR', 'UT', 'UV']);

function encodeElement({ tag, vr, value }: ElementToWrite, vrEncoding: VrEncoding): Uint8Array {
  const body = padded(encodeValue(vr, value, vrEncoding), vr);
  if (vrEncoding === 'implicit') return joined([encodeTag(tag), uint32(body.length), body]);
  if (longVrs.has(vr)) return joined([encodeTag(tag), textBytes(vr), uint16(0), uint32(body.length), body]);
  if (body.length > 0xffff) throw new RangeError(`value of ${tag} must be at most 65535 bytes for VR ${vr}, got ${body.length}`);
  return joined([encodeTag(tag), textBytes(vr), uint16(body.length), body]);
}

const numberWriters: Readonly<Record<string, { width: number; write: (view: DataView, offset: number, value: number) => void }>> = {
  US: { width: 2, write: (view, offset, value) => view.setUint16(offset, value, true) },
  SS: { width: 2, write: (view, offset, value) => view.setInt16(offset, value, true) },
  UL: { width: 4, write: (view, offset, value) => view.setUint32(offset, value, true) },
  SL: { width: 4, write: (view, offset, value) => view.setInt32(offset, value, true) },
  FL: { width: 4, write: (view, offset, value) => view.setFloat32(offset, value, true) },
  FD: { width: 8, write: (view, offset, value) => view.setFloat64(offset, value, true) },
};

function encodeValue(vr: string, value: ElementValue, vrEncoding: VrEncoding): Uint8Array {
  if (value instanceof Uint8Array) return value;
  const values: readonly (string | number | readonly ElementToWrite[])[] = typeof value === 'object' ? value : [value];
  const writer = numberWriters[vr];
  if (writer !== undefined) return encodeNumbers(values.map(Number), writer);
  if (vr === 'SQ') {
    const items = values.filter((item) => typeof item === 'object');
    return joined(items.map((item) => encodeItem(item, vrEncoding)));
  }
  return textBytes(values.map((part) => (typeof part === 'number' ? decimalString(part) : String(part))).join('\\'));
}

function encodeNumbers(values: readonly number[], { width, write }: (typeof numberWriters)[string]): Uint8Array {
  const bytes = new Uint8Array(values.length * width);
  const view = new DataView(bytes.buffer);
  values.forEach((value, index) => write(view, index * width, value));
  return bytes;
}

function encodeItem(elements: readonly ElementToWrite[], vrEncoding: VrEncoding): Uint8Array {
  const body = encodeElements(elements, vrEncoding);
  return joined([encodeTag('FFFE,E000'), uint32(body.length), body]);
}

/** Text is padded with a space, everything else with a zero byte. */
function padded(body: Uint8Array, vr: string): Uint8Array {
  if (body.length % 2 === 0) return body;
  return joined([body, Uint8Array.of(vr === 'UI' || vr === 'OB' || vr === 'UN' ? 0 : 0x20)]);
}

/** A decimal string holds at most 16 characters. */
function decimalString(value: number): string {
  const exact = String(value);
  return exact.length <= 16 ? exact : value.toPrecision(9).slice(0, 16);
}

const textBytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const uint16 = (value: number): Uint8Array => Uint8Array.of(value & 0xff, value >>> 8);
const uint32 = (value: number): Uint8Array => joined([uint16(value & 0xffff), uint16(value >>> 16)]);

function encodeTag(tag: string): Uint8Array {
  const match = /^([0-9a-f]{4}),([0-9a-f]{4})$/i.exec(tag);
  if (match === null) throw new RangeError(`tag must be written as GGGG,EEEE, got ${tag}`);
  return joined([uint16(parseInt(match[1] ?? '', 16)), uint16(parseInt(match[2] ?? '', 16))]);
}

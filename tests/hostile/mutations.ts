/**
 * Ways of breaking a file: each takes a real one and gives back what somebody might send instead, by mistake or on purpose. Which way, where
 * and how far is drawn from a seeded stream, so that a file that did harm can be made again from its number.
 */
import { joined } from '../../server/dicom/elements';
import { codestreamLie, deflateBomb, runLengthBomb, zipBomb } from './bombs';
import type { Chance } from './chance';
import { rangeOfTag, spliced, written, type Material, type Place } from './places';

export interface Hostile {
  readonly bytes: Uint8Array;
  /** Under which it is uploaded. */
  readonly name?: string;
}

type Break = (material: Material, chance: Chance) => Uint8Array | Hostile;

const vrs = ['AE', 'AS', 'AT', 'CS', 'DA', 'DS', 'DT', 'FD', 'FL', 'IS', 'LO', 'LT', 'OB', 'OF', 'OW', 'PN', 'SH', 'SL', 'SQ', 'SS', 'ST'];
const moreVrs = ['TM', 'UI', 'UL', 'UN', 'US', 'UT', 'XX', '\0\0', '<>'];
const textVrs = new Set(['AE', 'AS', 'CS', 'DA', 'DS', 'DT', 'IS', 'LO', 'LT', 'PN', 'SH', 'ST', 'TM', 'UI', 'UT']);
/** The first is odd where lengths must be even; the last stands for a length that is not known. */
const absurdLengths = [1, 0, 0xfffe, 0xffff, 0x10000, 0x7fffffff, 0x80000000, 0xfffffffe, 0xffffffff];
const openLength = 0xffffffff;

export const markup = [
  '<script>alert(1)</script>',
  '"><img src=x onerror=alert(1)>',
  "'; drop table images; --",
  '${process.exit(1)}',
  '{{7*7}}',
  '\u001b[31m\r\nSet-Cookie: a=b',
  '%s%n%x',
];
export const pathLikeNames = [
  '../../../../etc/passwd',
  '..\\..\\windows\\system32\\config',
  '/dev/zero',
  'a/../../b.dcm',
  'con',
  '.',
  '..',
  `${'a'.repeat(4000)}.dcm`,
  'x\0.dcm',
  'https://example.org/x.dcm',
  '<img src=x onerror=alert(1)>.dcm',
];

const text = (value: string): Uint8Array => new TextEncoder().encode(value.length % 2 === 0 ? value : `${value} `);
const little = (bytes: 2 | 4, value: number): Uint8Array => {
  const view = new DataView(new ArrayBuffer(bytes));
  if (bytes === 2) view.setUint16(0, value & 0xffff, true);
  else view.setUint32(0, value >>> 0, true);
  return new Uint8Array(view.buffer);
};

/** Most of what a reader decides is decided in the header. */
const somewhere = ({ bytes, places }: Material, chance: Chance): number => {
  const header = places.at(-1)?.dataAt ?? bytes.length;
  return chance.below(4) > 0 ? 128 + chance.below(Math.max(1, header - 128)) : chance.below(bytes.length);
};

const flipBits: Break = (material, chance) => {
  const copy = material.bytes.slice();
  for (let n = 1 + chance.below(12); n > 0; n--) {
    const at = somewhere(material, chance);
    copy[at] = (copy[at] ?? 0) ^ (1 << chance.below(8));
  }
  return copy;
};

const overwriteBytes: Break = (material, chance) => {
  const copy = material.bytes.slice();
  for (let n = 1 + chance.below(4); n > 0; n--) {
    const at = somewhere(material, chance);
    const length = Math.min(1 + chance.below(64), copy.length - at);
    copy.set(chance.below(2) === 0 ? new Uint8Array(length).fill(chance.oneOf([0, 0xff, 0x20])) : chance.bytes(length), at);
  }
  return copy;
};

const cutAnywhere: Break = ({ bytes, places }, chance) =>
  bytes.slice(0, chance.below(2) === 0 ? chance.below(bytes.length) : (chance.oneOf(places).start + chance.below(12)) % bytes.length);

const duplicateElement: Break = ({ bytes, places }, chance) => {
  const { start, end } = chance.oneOf(places);
  const at = chance.oneOf(places).start;
  return spliced(bytes, at, at, bytes.subarray(start, end));
};

const removeElement: Break = ({ bytes, places }, chance) => {
  const { start, end } = chance.oneOf(places);
  return spliced(bytes, start, end);
};

const wrongVr: Break = ({ bytes, places }, chance) => {
  const copy = bytes.slice();
  const explicit = places.filter(({ vr }) => vr !== undefined);
  for (let n = 1 + chance.below(3); n > 0; n--) copy.set(text(chance.oneOf([...vrs, ...moreVrs])), chance.oneOf(explicit).start + 4);
  return copy;
};

const absurdLength: Break = ({ bytes, places }, chance) => {
  const copy = bytes.slice();
  const { lengthAt, lengthBytes, littleEndian } = chance.oneOf(places);
  const length = chance.oneOf(absurdLengths);
  const view = new DataView(copy.buffer);
  if (lengthBytes === 2) view.setUint16(lengthAt, length & 0xffff, littleEndian);
  else view.setUint32(lengthAt, length, littleEndian);
  return copy;
};

const before = (material: Material, chance: Chance): number =>
  chance.oneOf(material.places.filter(({ tag }) => !tag.startsWith('0002'))).start;
/** Into the data set; of a deflated file, whose elements are hidden, behind the meta information. */
const inserted = (material: Material, chance: Chance, ...parts: readonly Uint8Array[]): Uint8Array => {
  const isHidden = material.places.every(({ tag }) => tag.startsWith('0002'));
  const at = isHidden ? material.dataSetAt : before(material, chance);
  return spliced(material.bytes, at, at, ...parts);
};

const item = (length: number): Uint8Array => joined([little(4, 0xe000_fffe), little(4, length)]);

const openWithoutEnd: Break = (material, chance) => {
  const vr = chance.oneOf(['SQ', 'UN', 'OB', 'OW', 'LO']);
  const tag = chance.oneOf(['0008,1140', '0009,1001', '5200,9229', '5200,9230', '7FE0,0010', '0028,0010']);
  return inserted(material, chance, written(material, tag, vr, chance.below(2) === 0 ? item(openLength) : new Uint8Array(0), openLength));
};

const depth = 1000;
/** A thousand sequences inside one another, closed in order, or never. */
const deepSequence: Break = (material, chance) => {
  const tag = chance.oneOf(['0008,1140', '0009,1001', '5200,9229', '0040,A730']);
  const open = joined([written(material, tag, 'SQ', new Uint8Array(0), openLength), item(openLength)]);
  const close = joined([little(4, 0xe00d_fffe), little(4, 0), little(4, 0xe0dd_fffe), little(4, 0)]);
  const levels = Array<Uint8Array>(depth * chance.oneOf([1, 1, 20])).fill(open);
  const closing = chance.below(2) === 0 ? levels.map(() => close) : [];
  return inserted(material, chance, ...levels, ...closing);
};

/** A thousand levels of known length, as a file without a single delimiter has them. */
const deepKnownLengths: Break = (material, chance) => {
  let inner: Uint8Array = new Uint8Array(0);
  for (let level = 0; level < depth; level++) inner = written(material, '0008,1140', 'SQ', joined([item(inner.length), inner]));
  return inserted(material, chance, inner);
};

/** Elements by the hundred thousand, or a sequence of as many empty items. */
const countless: Break = (material, chance) => {
  const count = chance.oneOf([20_000, 100_000, 400_000]);
  if (chance.below(2) === 0) return inserted(material, chance, written(material, '0008,1140', 'SQ', joined(Array(count).fill(item(0)))));
  const one = written(material, '0009,1001', 'LO', new Uint8Array(0));
  const all = joined(Array<Uint8Array>(count).fill(one));
  for (let i = 0; i < count; i++) all.set(little(4, 0x1000_0009 + 0x1_0000 * (i & 0xfff) + 2 * (i >> 12)), i * one.length);
  return inserted(material, chance, all);
};

const sizeTags = ['0028,0010', '0028,0011', '0028,0008', '0028,0100', '0028,0101', '0028,0102', '0028,0002', '0018,1310', '0019,100A'];
const absurdNumbers: readonly (readonly [vr: string, value: Uint8Array])[] = [
  ...[0, 1, 7, 4096, 4097, 0xffff].map((value) => ['US', little(2, value)] as const),
  ...[0, 0x7fffffff, 0xffffffff].map((value) => ['UL', little(4, value)] as const),
  ...['4294967296', '1000000000', '1000000001', '-1', '1e9', '2147483648', '0', '128', '', '1\\2\\3'].map(
    (value) => ['IS', text(value)] as const,
  ),
  ...['NaN', 'Infinity', '1e308', '-0.0000001', '9'.repeat(500)].map((value) => ['DS', text(value)] as const),
  ['FD', new Uint8Array(new Float64Array([Infinity]).buffer)],
  ['SQ', item(0)],
];

const absurdSizes: Break = (material, chance) => {
  let { bytes } = material;
  // From behind, so that the places before stay where they are.
  const tags = [...new Set(Array.from({ length: 1 + chance.below(3) }, () => chance.oneOf(sizeTags)))].sort().reverse();
  for (const tag of tags) {
    const [from, to] = rangeOfTag(material, tag);
    bytes = spliced(bytes, from, to, written(material, tag, ...chance.oneOf(absurdNumbers)));
  }
  return bytes;
};

const isText = ({ bytes }: Material, { tag, vr, dataAt, end }: Place): boolean =>
  vr === undefined
    ? end - dataAt < 1024 && bytes.subarray(dataAt, end).every((byte) => byte >= 0x20 && byte < 0x7f)
    : textVrs.has(vr) && !tag.startsWith('0002');

/** Every text of the data set but `kept` says something that another program might run. */
const markupEverywhere: Break = (material, chance) => {
  let { bytes } = material;
  const kept = new Set(chance.below(2) === 0 ? ['0008,0008', '0008,0016', '0008,0060', '0028,0004', '0028,0008'] : []);
  const places = material.places.filter((place) => !kept.has(place.tag) && isText(material, place));
  for (const { tag, vr = 'UN', start, end } of places.toReversed()) {
    bytes = spliced(bytes, start, end, written(material, tag, vr, text(chance.oneOf(markup))));
  }
  return { bytes, name: chance.oneOf(markup) };
};

const pathLike: Break = (material, chance) => {
  const [from, to] = rangeOfTag(material, chance.oneOf(['0008,0018', '0020,000D', '0020,000E', '0008,103E', '0004,1500']));
  const name = chance.oneOf(pathLikeNames);
  return { bytes: spliced(material.bytes, from, to, written(material, '0008,103E', 'LO', text(name.slice(0, 200)))), name };
};

const noiseBehind: Break = ({ bytes }, chance) => joined([bytes, chance.bytes(1 + chance.below(5000))]);

/** By name; a file of a run takes the way that its number points at. */
export const breaks: Readonly<Record<string, Break>> = {
  'bits flipped': flipBits,
  'bytes overwritten': overwriteBytes,
  cut: cutAnywhere,
  'element twice': duplicateElement,
  'element missing': removeElement,
  'wrong VR': wrongVr,
  'absurd length': absurdLength,
  'undefined length, no end': openWithoutEnd,
  'sequences 1,000 deep': deepSequence,
  'known lengths 1,000 deep': deepKnownLengths,
  'countless elements': countless,
  'absurd sizes': absurdSizes,
  'markup in every text': markupEverywhere,
  'path-like names': pathLike,
  'noise behind the pixels': noiseBehind,
  'size of the codestream': codestreamLie,
  'bomb of deflate': deflateBomb,
  'bomb of run lengths': runLengthBomb,
  'bomb of ZIP': zipBomb,
};

export interface Mutated extends Hostile {
  readonly number: number;
  readonly way: string;
  readonly material: Material;
}

/** File `number` of a run. `chanceFor` gives its stream. */
export function mutated(number: number, materials: readonly Material[], chance: Chance): Mutated {
  const ways = Object.entries(breaks);
  const [way, apply] = ways[number % ways.length] ?? chance.oneOf(ways);
  const material = chance.oneOf(materials);
  const broken = apply(material, chance);
  return { ...(broken instanceof Uint8Array ? { bytes: broken } : broken), number, way, material };
}

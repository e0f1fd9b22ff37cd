/**
 * Where the elements of a file stand, so that mutations can aim: at a VR, a length, a value, or between two elements. What is written back
 * keeps the file's own encoding and says whatever it is told to. Encodings: DICOM PS3.5 section 7.1.
 */
import dicomParser, { type DataSet } from 'dicom-parser';
import { joined } from '../../server/dicom/elements';
import { deflated, explicitBigEndian } from '../../server/dicom/transfer-syntax';

export interface Place {
  /** `GGGG,EEEE`. */
  readonly tag: string;
  /** None in an implicit file. */
  readonly vr: string | undefined;
  readonly start: number;
  readonly lengthAt: number;
  readonly lengthBytes: 2 | 4;
  readonly dataAt: number;
  readonly end: number;
  readonly littleEndian: boolean;
}

export interface Material {
  readonly name: string;
  readonly bytes: Uint8Array;
  readonly transferSyntax: string;
  /** In the order of the file, those of the meta information included; of a deflated file only these. */
  readonly places: readonly Place[];
  /** Where the data set starts. */
  readonly dataSetAt: number;
}

const longVrs = new Set(['OB', 'OD', 'OF', 'OL', 'OV', 'OW', 'SQ', 'SV', 'UC', 'UN', 'UR', 'UT', 'UV']);

export function materialOf(name: string, bytes: Uint8Array): Material {
  const meta = dicomParser.readPart10Header(bytes, { untilTag: '' });
  const transferSyntax = meta.string('x00020010') ?? '';
  const whole: DataSet = transferSyntax === deflated ? meta : dicomParser.parseDicom(bytes);
  const found = Object.values(whole.elements).sort((a, b) => a.dataOffset - b.dataOffset);
  const placed = found.map(({ tag, vr, dataOffset, length }) => {
    const isMeta = tag.startsWith('x0002');
    const lengthBytes: 2 | 4 = vr === undefined || longVrs.has(vr) ? 4 : 2;
    const lengthAt = dataOffset - lengthBytes;
    const start = dataOffset - (vr !== undefined && lengthBytes === 4 ? 12 : 8);
    const littleEndian = isMeta || transferSyntax !== explicitBigEndian;
    const spelled = `${tag.slice(1, 5)},${tag.slice(5)}`.toUpperCase();
    return { tag: spelled, vr, start, lengthAt, lengthBytes, dataAt: dataOffset, said: dataOffset + length, littleEndian };
  });
  // Lengths may be open and pixels packed: an element ends where the next one starts.
  const places = placed.map(({ said, ...place }, index) => ({ ...place, end: placed[index + 1]?.start ?? said }));
  const dataSetAt = places.find(({ tag }) => !tag.startsWith('0002'))?.start ?? places.at(-1)?.end ?? bytes.length;
  return { name, bytes, transferSyntax, places, dataSetAt };
}

/** The file with everything from `from` to `to` replaced. */
export const spliced = (bytes: Uint8Array, from: number, to: number, ...instead: readonly Uint8Array[]): Uint8Array =>
  joined([bytes.subarray(0, from), ...instead, bytes.subarray(to)]);

/** An element as this file would write it. `length` is what it says of itself; the truth where left out. */
export function written(material: Material, tag: string, vr: string, value: Uint8Array, length = value.length): Uint8Array {
  const littleEndian = material.transferSyntax !== explicitBigEndian;
  const isExplicit = material.places.at(-1)?.vr !== undefined;
  const isLong = !isExplicit || longVrs.has(vr);
  const head = new Uint8Array(isExplicit && isLong ? 12 : 8);
  const view = new DataView(head.buffer);
  view.setUint16(0, parseInt(tag.slice(0, 4), 16), littleEndian);
  view.setUint16(2, parseInt(tag.slice(5), 16), littleEndian);
  if (isExplicit) head.set(new TextEncoder().encode(vr), 4);
  if (isLong) view.setUint32(head.length - 4, length, littleEndian);
  else view.setUint16(6, length, littleEndian);
  return joined([head, value]);
}

/** Where an element with this tag stands, or would stand. */
export function rangeOfTag({ places, bytes }: Material, tag: string): readonly [start: number, end: number] {
  const place = places.find((one) => one.tag === tag);
  if (place !== undefined) return [place.start, place.end];
  const next = places.find((one) => one.tag > tag)?.start ?? bytes.length;
  return [next, next];
}

/**
 * Small files that ask for much: deflated zeros, run lengths, ZIP archives, codestreams that claim a larger picture together with their header.
 * What is slow to make is made once.
 */
import { constants, crc32, deflateRawSync } from 'node:zlib';
import { joined } from '../../server/dicom/elements';
import { deflated } from '../../server/dicom/transfer-syntax';
import { encapsulatedFile, runLengthSyntax, sized, uint32 } from '../server/dicom/made-encapsulated';
import { madeFile } from '../server/dicom/made-image';
import { zipOf } from '../server/zip-archive';
import type { Chance } from './chance';
import { materialOf, rangeOfTag, spliced, written, type Material } from './places';

const mebibyte = 1024 * 1024;

/** Deflated zeros: blocks that are flushed whole may follow one another. */
const zeroBlock = deflateRawSync(new Uint8Array(mebibyte), { finishFlush: constants.Z_FULL_FLUSH });
const noMore = deflateRawSync(new Uint8Array(0));
const deflatedZeros = (mebibytes: number): Uint8Array => joined([...Array<Uint8Array>(mebibytes).fill(zeroBlock), noMore]);

const deflatedHead = (() => {
  const whole = madeFile({ without: ['7FE0,0010'], extra: [{ tag: '0002,0010', vr: 'UI', value: deflated }] });
  const [metaEnd] = [materialOf('head', madeFile({ extra: [{ tag: '0002,0010', vr: 'UI', value: deflated }] })).dataSetAt];
  return { meta: whole.subarray(0, metaEnd), dataSet: whole.subarray(metaEnd) };
})();

/** A deflated data set whose last element is as long as it says, up to ten times the limit for a file. */
export function deflateBomb(_material: Material, chance: Chance): Uint8Array {
  const mebibytes = chance.oneOf([1, 32, 63, 64, 65, 640]);
  const head = joined([Uint8Array.of(0xe0, 0x7f, 0x10, 0, 0x4f, 0x57, 0, 0), uint32((mebibytes * mebibyte) >>> 0)]);
  const start = deflateRawSync(joined([deflatedHead.dataSet, head]), { finishFlush: constants.Z_FULL_FLUSH });
  return joined([deflatedHead.meta, start, deflatedZeros(mebibytes)]);
}

/** Frames of nothing but runs: 128 pixels of each byte in two bytes. The largest is a picture that is taken. */
export function runLengthBomb(_material: Material, chance: Chance): Uint8Array {
  const [side, frames] = chance.oneOf([
    [256, 1],
    [512, 1],
    [512, 64],
    [1024, 4],
    [512, 128],
    [4096, 1],
    [4096, 2],
    [4096, 4096],
  ] as const);
  const segment = new Uint8Array((2 * side * side) / 128);
  for (let at = 0; at < segment.length; at += 2) segment[at] = 129;
  const header = new Uint32Array(16);
  header.set([2, 64, 64 + segment.length]);
  const frame = joined([new Uint8Array(header.buffer), segment, segment]);
  const attributes = { ...sized(side, side, 16), numberOfFrames: frames };
  return encapsulatedFile({ transferSyntax: runLengthSyntax, fragments: Array<Uint8Array>(Math.min(frames, 130)).fill(frame), attributes });
}

/** An entry of zeros, without packing them: only its check sum and size are worked out. */
function zeroEntry(mebibytes: number): Buffer {
  const zeros = Buffer.alloc(mebibytes * mebibyte);
  return zipOf([{ name: 'zeros.dcm', bytes: zeros, says: { crc: crc32(zeros) } }]);
}

const kept = new Map<number, Buffer>();
function zeroArchive(mebibytes: number): Buffer {
  const archive = kept.get(mebibytes) ?? zeroEntry(mebibytes);
  kept.set(mebibytes, archive);
  return archive;
}

export function zipBomb({ bytes }: Material, chance: Chance): { bytes: Uint8Array; name: string } {
  const file = Buffer.from(bytes);
  const packed = zipOf([{ name: '../../etc/x.dcm', bytes: file }]);
  const kinds = [
    () => zeroArchive(chance.oneOf([1, 60, 200])),
    () => zipOf([{ name: '/dev/null', bytes: Buffer.alloc(8 * mebibyte), says: { size: chance.oneOf([0, 1000, 0xfffffffe]) } }]),
    () => zipOf([{ name: 'inner.zip', bytes: packed }]),
    () => zipOf(Array.from({ length: chance.oneOf([200, 2100]) }, (_, i) => ({ name: `${i}.dcm`, bytes: Buffer.alloc(0) }))),
    () =>
      zipOf([
        { name: 'a', bytes: file },
        { name: 'b', bytes: file, says: { offset: 0 } },
      ]),
    () => packed.subarray(0, chance.below(packed.length)),
    () => flippedIn(packed, chance),
  ];
  return { bytes: chance.oneOf(kinds)(), name: '../../series.zip' };
}

function flippedIn(archive: Buffer, chance: Chance): Buffer {
  const copy = Buffer.from(archive);
  // The headers at both ends say what is in it.
  for (let n = 1 + chance.below(6); n > 0; n--) {
    const at = chance.below(2) === 0 ? copy.length - 1 - chance.below(100) : chance.below(60);
    copy[at] = (copy[at] ?? 0) ^ (1 << chance.below(8));
  }
  return copy;
}

const claims = [8, 255, 1024, 4096, 4097, 0xffff];
const frameHeaders = new Set([0xc0, 0xc1, 0xc3, 0xf7]);

/** Header and codestream agree on a size that the coded data do not fill. */
export function codestreamLie(material: Material, chance: Chance): Uint8Array {
  const [rows, columns] = [chance.oneOf(claims), chance.oneOf(claims)];
  let { bytes } = material;
  const at = (material.places.find(({ tag }) => tag === '7FE0,0010') ?? material.places[0])?.dataAt ?? 0;
  const claimed = bytes.slice();
  const view = new DataView(claimed.buffer);
  for (let i = at; i + 40 < claimed.length; i++) {
    if (claimed[i] !== 0xff) continue;
    const marker = claimed[i + 1] ?? 0;
    if (marker === 0x4f && claimed[i + 3] === 0x51) {
      for (const [offset, value] of [
        [8, columns],
        [12, rows],
        [24, columns],
        [28, rows],
      ] as const)
        view.setUint32(i + offset, value);
      break;
    }
    if (!frameHeaders.has(marker)) continue;
    view.setUint16(i + 5, rows);
    view.setUint16(i + 7, columns);
    break;
  }
  bytes = claimed;
  for (const [tag, value] of [
    ['0028,0011', columns],
    ['0028,0010', rows],
  ] as const) {
    const [from, to] = rangeOfTag(material, tag);
    bytes = spliced(bytes, from, to, written(material, tag, 'US', Uint8Array.of(value & 0xff, value >> 8)));
  }
  return bytes;
}

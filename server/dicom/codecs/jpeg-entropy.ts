/**
 * The entropy code of JPEG: a table of Huffman codes, the intervals between restarts, and differences read bit by bit.
 * Source: ITU-T T.81 annexes B.2.4.2, C, F.1.2.1 and F.2.2.
 */
import type { Refused } from '../refusal';
import { cutCodestream, damagedCodestream } from './codestream';
import { markers, type JpegHeader } from './jpeg-header';

/** For every 16 bits that may come: the length of the code with which they start, times 32, and its category; 0 where none does. */
export type HuffmanTable = Uint16Array;

const longestCode = 16;
/** Bytes behind an interval that may be looked at. */
const margin = 4;
/** Categories are the numbers of bits of a difference. */
const largestCategory = 16;

/** The table of this number, of those for differences (class 0); the last one where a number is defined twice. */
export function huffmanTableOf(segments: JpegHeader['segments'], destination: number): HuffmanTable | Refused {
  let table: HuffmanTable | undefined;
  for (const { body } of segments.filter(({ marker }) => marker === markers.huffmanTables)) {
    for (let at = 0; at < body.length;) {
      const counts = body.subarray(at + 1, at + 1 + longestCode);
      const nCodes = counts.reduce((sum, count) => sum + count, 0);
      const categories = body.subarray(at + 1 + longestCode, at + 1 + longestCode + nCodes);
      if (counts.length < longestCode || categories.length < nCodes) return damagedCodestream;
      if (body[at] === destination) {
        table = tableOf(counts, categories);
        if (table === undefined) return damagedCodestream;
      }
      at += 1 + longestCode + nCodes;
    }
  }
  return table ?? damagedCodestream;
}

/** Codes of a length follow one another, and those of the next length continue behind them. */
function tableOf(counts: Uint8Array, categories: Uint8Array): HuffmanTable | undefined {
  const table = new Uint16Array(1 << longestCode);
  let filled = 0;
  let next = 0;
  for (const [index, count] of counts.entries()) {
    const share = 1 << (longestCode - index - 1);
    for (const category of categories.subarray(next, next + count)) {
      if (category > largestCategory || filled + share > table.length) return undefined;
      table.fill(32 * (index + 1) + category, filled, filled + share);
      filled += share;
    }
    next += count;
  }
  return table;
}

/** The bytes between restarts, each FF00 made FF; every restart must be there, in its order, and nothing else. */
export function intervalsOf(coded: Uint8Array, nIntervals: number): readonly Uint8Array[] | Refused {
  const intervals: Uint8Array[] = [];
  // What is read behind the end is zeros, and is found out by the count of bits.
  let interval = new Uint8Array(coded.length + nIntervals * margin);
  let length = 0;
  for (let at = 0; at < coded.length; at++) {
    const byte = coded[at] as number;
    const next = coded[at + 1] ?? 0xff;
    // FF before a marker fills the place; as bits that nobody needs it does no harm.
    if (byte !== 0xff || next === 0 || next === 0xff) {
      interval[length++] = byte;
      if (byte === 0xff && next === 0) at++;
      continue;
    }
    const restart = intervals.length % 8;
    if (next !== 0xd0 + restart) return damagedCodestream;
    intervals.push(interval.subarray(0, length + margin));
    if (intervals.length === nIntervals) return damagedCodestream;
    interval = interval.subarray(length + margin);
    length = 0;
    at++;
  }
  intervals.push(interval.subarray(0, length + margin));
  return intervals.length === nIntervals ? intervals : cutCodestream;
}

export interface SampleReader {
  difference(): number;
  /** Whether there were too few bits, or some that are no code. */
  failed(): boolean;
}

/** Reads the differences of an interval, which ends with the margin. */
export function sampleReader(interval: Uint8Array, table: HuffmanTable): SampleReader {
  const nBits = 8 * (interval.length - margin);
  let position = 0;
  let noCode = false;
  const next16 = () => {
    const at = Math.min(position >>> 3, interval.length - 3);
    const three = ((interval[at] as number) << 16) | ((interval[at + 1] as number) << 8) | (interval[at + 2] as number);
    return (three >>> (8 - (position & 7))) & 0xffff;
  };
  return {
    difference() {
      const entry = table[next16()] as number;
      if (entry === 0) noCode = true;
      position += entry >>> 5;
      const category = entry & 31;
      if (category === 0) return 0;
      if (category === largestCategory) return 1 << 15;
      const bits = next16() >>> (16 - category);
      position += category;
      // Those of the lower half are negative (T.81 figure F.12).
      return bits < 1 << (category - 1) ? bits - (1 << category) + 1 : bits;
    },
    failed: () => noCode || position > nBits,
  };
}

/**
 * Lossless JPEG, Huffman coded, of one component: each sample is predicted from its neighbours, and the difference coded. Written here,
 * because the package for it decodes cut and damaged streams to full-size images, and leaves out the point transform.
 * Letters as in the source: Ra left, Rb above, Rc above left, P precision, Pt point transform. Source: ITU-T T.81 annexes C, F.2.2 and H.
 */
import type { Layout } from '../pixels';
import { isRefused, type Refused } from '../refusal';
import { asFrame, cutCodestream, damagedCodestream, otherCodestream, whyUnfit } from './codestream';
import { huffmanTableOf, intervalsOf, sampleReader, type HuffmanTable, type SampleReader } from './jpeg-entropy';
import { jpegHeaderOf, markers, type JpegHeader } from './jpeg-header';

export function decodeJpegLossless(codestream: Uint8Array, layout: Layout): Uint8Array | Refused {
  const header = jpegHeaderOf(codestream, [markers.lossless]);
  if (isRefused(header)) return header;
  const unfit = whyUnfit(header, layout);
  if (unfit !== undefined) return unfit;
  const scan = scanOf(header);
  return isRefused(scan) ? scan : decodeScan(header, scan, layout);
}

type Predictor = (ra: number, rb: number, rc: number) => number;

/** Table H.1. */
const predictors: readonly (Predictor | undefined)[] = [
  undefined,
  (ra) => ra,
  (_, rb) => rb,
  (_, __, rc) => rc,
  (ra, rb, rc) => ra + rb - rc,
  (ra, rb, rc) => ra + ((rb - rc) >> 1),
  (ra, rb, rc) => rb + ((ra - rc) >> 1),
  (ra, rb) => (ra + rb) >> 1,
];

interface Scan {
  readonly predict: Predictor;
  readonly pointTransform: number;
  readonly table: HuffmanTable;
  /** Rows between two restarts, at which the prediction starts anew. */
  readonly rowsOfInterval: number;
}

function scanOf({ scan, segments, rows, columns, precision }: JpegHeader): Scan | Refused {
  const [nComponents, , tables = 0, selection = 0, , approximation = 0] = scan;
  const predict = predictors[selection];
  const pointTransform = approximation & 0xf;
  if (nComponents !== 1 || predict === undefined || pointTransform >= precision) return damagedCodestream;
  const table = huffmanTableOf(segments, tables >> 4);
  if (isRefused(table)) return table;
  const [high = 0, low = 0] = segments.findLast(({ marker }) => marker === markers.restartInterval)?.body ?? [];
  const samplesOfInterval = 256 * high + low;
  // Restarts fall between rows (T.81 H.1.1).
  if (samplesOfInterval % columns !== 0) return otherCodestream;
  return { predict, pointTransform, table, rowsOfInterval: samplesOfInterval === 0 ? rows : samplesOfInterval / columns };
}

function decodeScan(header: JpegHeader, { predict, pointTransform, table, rowsOfInterval }: Scan, layout: Layout): Uint8Array | Refused {
  const { rows, columns, precision, coded } = header;
  const intervals = intervalsOf(coded, Math.ceil(rows / rowsOfInterval));
  if (isRefused(intervals)) return intervals;
  const samples = new Uint16Array(rows * columns);
  const start = 1 << (precision - pointTransform - 1);
  for (const [index, interval] of intervals.entries()) {
    const first = index * rowsOfInterval;
    const band = samples.subarray(first * columns, Math.min(rows, first + rowsOfInterval) * columns);
    const reader = sampleReader(interval, table);
    decodeBand(band, columns, { reader, predict, start });
    if (reader.failed()) return cutCodestream;
  }
  // Differences are taken modulo 2¹⁶, values are not: one beyond P bits is no value.
  if (samples.some((sample) => sample >>> (precision - pointTransform) !== 0)) return damagedCodestream;
  return asFrame(littleEndian(samples, pointTransform, precision), header, layout);
}

/** The rows between two restarts: the first is predicted along itself, the first sample of each other from above. */
function decodeBand(
  band: Uint16Array,
  columns: number,
  { reader, predict, start }: { reader: SampleReader; predict: Predictor; start: number },
): void {
  const at = (index: number) => band[index] as number;
  for (let index = 0; index < band.length; index++) {
    const column = index % columns;
    let prediction = start;
    if (index >= columns) {
      prediction = column === 0 ? at(index - columns) : predict(at(index - 1), at(index - columns), at(index - columns - 1));
    } else if (column > 0) {
      prediction = at(index - 1);
    }
    band[index] = prediction + reader.difference();
  }
}

function littleEndian(samples: Uint16Array, pointTransform: number, precision: number): Uint8Array {
  if (precision <= 8) return Uint8Array.from(samples, (sample) => sample << pointTransform);
  const bytes = new Uint8Array(2 * samples.length);
  samples.forEach((sample, index) => {
    const value = sample << pointTransform;
    bytes[2 * index] = value & 0xff;
    bytes[2 * index + 1] = value >>> 8;
  });
  return bytes;
}

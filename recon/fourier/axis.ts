/**
 * Centred, orthonormal transform along one axis of a plane. Blocks of lines are gathered into lanes, transformed together and scattered.
 * The half turns that move index floor(n/2) to the front and back again are done while gathering and scattering, so that
 * they cost nothing; being rotations, not checkerboard signs, they hold for odd sizes too. A line of zeros stays one, and is passed over:
 * k-space of which every second line was taken costs half a transform less.
 */
import type { Lanes } from './lanes';
import { emptyLanes } from './lanes';
import { planOf } from './plan';

export type Axis = 0 | 1;
export type Direction = 'forward' | 'inverse';
export type Size = readonly [rows: number, columns: number];

/** Lines in one block. Nine and not eight or sixteen: with a power of two the inputs of a butterfly lie multiples of 4 kB apart, share one set
 *  of the first-level cache and throw each other out (512²: 10 ms instead of 6.6). */
const blockLines = 9;

/** Samples of a line that are copied before those of the next line: rows that are a power of two apart share a set of the cache too. */
const tileSamples = 4;

/** The samples of a line as two runs [first, end), and the row of the lanes at which each begins: the centre comes first. */
const runsOf = (n: number): readonly (readonly [first: number, end: number, row: number])[] => {
  const centre = Math.floor(n / 2);
  return [
    [centre, n, 0],
    [0, centre, n - centre],
  ];
};

let scratch = { data: emptyLanes(0), spare: emptyLanes(0) };

function scratchOf(size: number): { data: Lanes; spare: Lanes } {
  if (scratch.data.re.length < size) scratch = { data: emptyLanes(size), spare: emptyLanes(size) };
  return scratch;
}

/** Where the lines of an axis lie in a row-major plane. */
interface Layout {
  readonly n: number;
  readonly nLines: number;
  /** Distance in memory between neighbouring samples of a line, and between neighbouring lines. */
  readonly sampleStride: number;
  readonly lineStride: number;
}

const layoutOf = (rows: number, columns: number, axis: Axis): Layout =>
  axis === 0
    ? { n: rows, nLines: columns, sampleStride: columns, lineStride: 1 }
    : { n: columns, nLines: rows, sampleStride: 1, lineStride: columns };

/** Numbers of the lines along `axis` that hold anything but zeros. The search begins in the centre, where k-space is seldom empty. */
export function filledLines({ re, im }: Lanes, [rows, columns]: Size, axis: Axis): Int32Array {
  const { n, nLines, sampleStride, lineStride } = layoutOf(rows, columns, axis);
  const isFilled = (line: number): boolean => {
    for (const [first, end] of runsOf(n)) {
      for (let sample = first; sample < end; sample++) {
        const i = line * lineStride + sample * sampleStride;
        if (re[i] !== 0 || im[i] !== 0) return true;
      }
    }
    return false;
  };
  return Int32Array.from({ length: nLines }, (_, line) => line).filter(isFilled);
}

/** Sample at centre + j goes to row j of the lanes. */
function gather(plane: Lanes, block: Lanes, { n, sampleStride, lineStride }: Layout, lines: Int32Array): void {
  const { re, im } = plane;
  const { re: blockRe, im: blockIm } = block;
  const lanes = lines.length;
  for (const [first, end, row] of runsOf(n)) {
    for (let tile = first; tile < end; tile += tileSamples) {
      const tileEnd = Math.min(tile + tileSamples, end);
      for (let lane = 0; lane < lanes; lane++) {
        const start = (lines[lane] as number) * lineStride;
        let to = (row + tile - first) * lanes + lane;
        for (let sample = tile; sample < tileEnd; sample++) {
          const from = start + sample * sampleStride;
          blockRe[to] = re[from] as number;
          blockIm[to] = im[from] as number;
          to += lanes;
        }
      }
    }
  }
}

/** Row j of the lanes goes to sample centre + j, scaled by 1/√n. */
function scatter(block: Lanes, plane: Lanes, { n, sampleStride, lineStride }: Layout, lines: Int32Array): void {
  const { re, im } = plane;
  const { re: blockRe, im: blockIm } = block;
  const lanes = lines.length;
  const scale = 1 / Math.sqrt(n);
  for (const [first, end, row] of runsOf(n)) {
    for (let tile = first; tile < end; tile += tileSamples) {
      const tileEnd = Math.min(tile + tileSamples, end);
      for (let lane = 0; lane < lanes; lane++) {
        const start = (lines[lane] as number) * lineStride;
        let from = (row + tile - first) * lanes + lane;
        for (let sample = tile; sample < tileEnd; sample++) {
          const to = start + sample * sampleStride;
          re[to] = (blockRe[from] as number) * scale;
          im[to] = (blockIm[from] as number) * scale;
          from += lanes;
        }
      }
    }
  }
}

/** Writes the transform of the given lines of `from` [row, column] along `axis` to the same lines of `to`, which may be `from`. */
export function transformLines(
  { from, to }: { from: Lanes; to: Lanes },
  [rows, columns]: Size,
  axis: Axis,
  direction: Direction,
  lines: Int32Array,
): void {
  const layout = layoutOf(rows, columns, axis);
  const plan = planOf(layout.n);
  const { data, spare } = scratchOf(layout.n * blockLines);
  // exp(+i…) is exp(−i…) with real and imaginary parts exchanged before and after.
  const turned = (plane: Lanes): Lanes => (direction === 'forward' ? plane : { re: plane.im, im: plane.re });
  for (let first = 0; first < lines.length; first += blockLines) {
    const block = lines.subarray(first, first + blockLines);
    gather(turned(from), data, layout, block);
    scatter(plan(data, spare, block.length), turned(to), layout, block);
  }
}

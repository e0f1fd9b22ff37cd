/**
 * Centred, orthonormal transform along one axis of a plane, in place. Blocks of lines are gathered into lanes, transformed
 * together and scattered back. The half turns that move index floor(n/2) to the front and back again are done while
 * gathering and scattering, so that they cost nothing; being rotations, not checkerboard signs, they hold for odd sizes too.
 */
import type { Lanes } from './lanes';
import { emptyLanes } from './lanes';
import { planOf } from './plan';

export type Axis = 0 | 1;
export type Direction = 'forward' | 'inverse';

/** Lines in one block: 16 lanes of 512 complex samples are 128 kB, which stays in the second-level cache. */
const blockLines = 16;

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

/** Sample at centre + j goes to row j of the lanes. */
function gather(plane: Lanes, block: Lanes, { n, sampleStride, lineStride }: Layout, first: number, lanes: number): void {
  const { re, im } = plane;
  const { re: blockRe, im: blockIm } = block;
  let sample = Math.floor(n / 2);
  for (let j = 0; j < n; j++) {
    let from = sample * sampleStride + first * lineStride;
    const end = (j + 1) * lanes;
    for (let to = j * lanes; to < end; to++) {
      blockRe[to] = re[from] as number;
      blockIm[to] = im[from] as number;
      from += lineStride;
    }
    sample = sample + 1 === n ? 0 : sample + 1;
  }
}

/** Row j of the lanes goes to sample centre + j, scaled by 1/√n. */
function scatter(block: Lanes, plane: Lanes, { n, sampleStride, lineStride }: Layout, first: number, lanes: number): void {
  const { re, im } = plane;
  const { re: blockRe, im: blockIm } = block;
  const scale = 1 / Math.sqrt(n);
  let sample = Math.floor(n / 2);
  for (let j = 0; j < n; j++) {
    let to = sample * sampleStride + first * lineStride;
    const end = (j + 1) * lanes;
    for (let from = j * lanes; from < end; from++) {
      re[to] = (blockRe[from] as number) * scale;
      im[to] = (blockIm[from] as number) * scale;
      to += lineStride;
    }
    sample = sample + 1 === n ? 0 : sample + 1;
  }
}

/** Replaces `plane` [row, column] by its transform along `axis`. */
export function transformInPlace(plane: Lanes, rows: number, columns: number, axis: Axis, direction: Direction): void {
  const layout = layoutOf(rows, columns, axis);
  const plan = planOf(layout.n);
  const { data, spare } = scratchOf(layout.n * blockLines);
  // exp(+i…) is exp(−i…) with real and imaginary parts exchanged before and after.
  const turned = direction === 'forward' ? plane : { re: plane.im, im: plane.re };
  for (let first = 0; first < layout.nLines; first += blockLines) {
    const lanes = Math.min(blockLines, layout.nLines - first);
    gather(turned, data, layout, first, lanes);
    scatter(plan(data, spare, lanes), turned, layout, first, lanes);
  }
}

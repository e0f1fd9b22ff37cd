/**
 * Polygons of constant density, in the image and in k-space from the same vertices. Lengths in metres, x to the right, y downwards.
 *   S(k) = ρ·i/(2π|k|²) · Σ (kx·dy − ky·dx) · sinc(k·d) · exp(−i2πk·c)
 * over the edges d between vertices, c their midpoints, sinc(t) = sin(πt)/(πt), area counted positive from x towards y; S(0) = ρ·area.
 * Source: Lee & Mittra, IEEE Trans Antennas Propag 1983;31:99; Wuttke, arXiv 1703.00255 (the divergence theorem on exp(−i2πk·r)).
 */
import type { Grid } from '../grid';

export interface Point {
  readonly x: number;
  readonly y: number;
}

export interface Polygon {
  /** Added to what lies beneath. */
  readonly density: number;
  /** At least three, in either sense of turning; edges do not cross. */
  readonly vertices: readonly Point[];
}

/** Every edge as [from, to], the last back to the first. */
function edgesOf(vertices: readonly Point[]): [Point, Point][] {
  return vertices.map((from, i) => [from, vertices[(i + 1) % vertices.length] ?? from]);
}

/** Area, positive where the vertices go from x towards y: clockwise on the screen. */
export const signedArea = (vertices: readonly Point[]): number =>
  edgesOf(vertices).reduce((sum, [from, to]) => sum + (from.x * to.y - to.x * from.y) / 2, 0);

/** S(kx, ky) of one polygon, density times square metres. Returns a function, so that the edges are worked out once. */
export function polygonSpectrum({ density, vertices }: Polygon): (kx: number, ky: number) => { re: number; im: number } {
  const area = signedArea(vertices);
  const edges = edgesOf(vertices);
  const dx = Float64Array.from(edges, ([from, to]) => to.x - from.x);
  const dy = Float64Array.from(edges, ([from, to]) => to.y - from.y);
  const cx = Float64Array.from(edges, ([from, to]) => (from.x + to.x) / 2);
  const cy = Float64Array.from(edges, ([from, to]) => (from.y + to.y) / 2);
  return (kx, ky) => {
    const square = kx * kx + ky * ky;
    if (square === 0) return { re: density * Math.abs(area), im: 0 };
    let re = 0;
    let im = 0;
    for (let i = 0; i < dx.length; i++) {
      const [ex, ey] = [dx[i] as number, dy[i] as number];
      const t = Math.PI * (kx * ex + ky * ey);
      // Below 1e-4 the next term of the series, t⁴/120, is under rounding.
      const sinc = Math.abs(t) < 1e-4 ? 1 - (t * t) / 6 : Math.sin(t) / t;
      const flux = (kx * ey - ky * ex) * sinc;
      const phase = -2 * Math.PI * (kx * (cx[i] as number) + ky * (cy[i] as number));
      re += flux * Math.cos(phase);
      im += flux * Math.sin(phase);
    }
    const scale = (density * Math.sign(area)) / (2 * Math.PI * square);
    return { re: -im * scale, im: re * scale };
  };
}

/** Lines through a pixel on which the area within it is measured. */
const subdivision = 16;

/** Adds the polygon to `values` on `grid`: each pixel its mean density, exact along rows, by 16 lines a pixel across them. */
export function paintPolygon({ density, vertices }: Polygon, grid: Grid, values: Float64Array): void {
  // In pixels: pixel [row, column] spans row to row + 1 and column to column + 1.
  const inPixels = vertices.map(({ x, y }) => ({
    x: (x - grid.origin[1]) / grid.spacing[1] + 0.5,
    y: (y - grid.origin[0]) / grid.spacing[0] + 0.5,
  }));
  const edges = edgesOf(inPixels);
  const heights = inPixels.map(({ y }) => y);
  const firstRow = Math.max(0, Math.floor(Math.min(...heights)));
  const lastRow = Math.min(grid.rows - 1, Math.floor(Math.max(...heights)));
  for (let row = firstRow; row <= lastRow; row++) {
    for (let line = 0; line < subdivision; line++) {
      const crossings = crossingsAt(edges, row + (line + 0.5) / subdivision);
      for (let i = 0; i + 1 < crossings.length; i += 2) {
        const span = [crossings[i] as number, crossings[i + 1] as number] as const;
        paintSpan(values, { start: row * grid.columns, columns: grid.columns }, span, density / subdivision);
      }
    }
  }
}

/** Where the line y crosses the edges, from left to right; between the first and the second it is inside, and so on. */
function crossingsAt(edges: readonly (readonly [Point, Point])[], y: number): number[] {
  const crossings: number[] = [];
  for (const [from, to] of edges) {
    if (from.y <= y === to.y <= y) continue;
    crossings.push(from.x + ((y - from.y) * (to.x - from.x)) / (to.y - from.y));
  }
  return crossings.sort((a, b) => a - b);
}

/** Adds `weight` times the part of each pixel of a row that lies between `from` and `to`. */
function paintSpan(
  values: Float64Array,
  { start, columns }: { start: number; columns: number },
  [from, to]: readonly [number, number],
  weight: number,
): void {
  const first = Math.max(0, Math.floor(from));
  const last = Math.min(columns - 1, Math.floor(to));
  for (let column = first; column <= last; column++) {
    const part = Math.min(to, column + 1) - Math.max(from, column);
    values[start + column] = (values[start + column] as number) + weight * part;
  }
}

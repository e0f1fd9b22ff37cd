/**
 * Bad minus simulated, on the grid of the bad image. A simulated plane on another grid is read between its samples by
 * millimetres (bilinear); where it does not reach, nothing is compared and the difference is shown as zero.
 */
import { fullScale, sameGrid, valueAt, type DisplayPlane, type PlaneGrid } from './display-plane';

/** Bilinear value at a position in millimetres, or null outside the samples of the plane. */
export function valueAtMm(plane: DisplayPlane, y: number, x: number): number | null {
  const row = (y - plane.origin[0]) / plane.spacing[0];
  const column = (x - plane.origin[1]) / plane.spacing[1];
  if (row < 0 || column < 0 || row > plane.rows - 1 || column > plane.columns - 1) return null;
  const top = Math.min(Math.floor(row), Math.max(0, plane.rows - 2));
  const left = Math.min(Math.floor(column), Math.max(0, plane.columns - 2));
  const at = (r: number, c: number) => valueAt(plane, Math.min(r, plane.rows - 1), Math.min(c, plane.columns - 1)) ?? 0;
  const down = row - top;
  const right = column - left;
  const upper = at(top, left) * (1 - right) + at(top, left + 1) * right;
  const lower = at(top + 1, left) * (1 - right) + at(top + 1, left + 1) * right;
  return upper * (1 - down) + lower * down;
}

/** A display plane that holds `values` between −peak and +peak. */
function signedPlane(values: Float32Array, peak: number, grid: PlaneGrid): DisplayPlane {
  const bound = peak > 0 ? peak : 1;
  const samples = new Uint16Array(values.length);
  for (let i = 0; i < values.length; i++) samples[i] = Math.round((((values[i] as number) + bound) / (2 * bound)) * fullScale);
  const { rows, columns, spacing, origin } = grid;
  return { name: 'difference', rows, columns, spacing, origin, low: -bound, high: bound, samples };
}

/** bad − gain · simulated. */
export function differencePlane(bad: DisplayPlane, simulated: DisplayPlane, gain: number): DisplayPlane {
  const values = new Float32Array(bad.rows * bad.columns);
  const alike = sameGrid(bad, simulated);
  let peak = 0;
  for (let row = 0; row < bad.rows; row++) {
    const y = bad.origin[0] + row * bad.spacing[0];
    for (let column = 0; column < bad.columns; column++) {
      const other = alike ? valueAt(simulated, row, column) : valueAtMm(simulated, y, bad.origin[1] + column * bad.spacing[1]);
      if (other === null) continue;
      const difference = (valueAt(bad, row, column) ?? 0) - gain * other;
      values[row * bad.columns + column] = difference;
      peak = Math.max(peak, Math.abs(difference));
    }
  }
  return signedPlane(values, peak, bad);
}

/** The few samples around the cursor, as a plane of their own; beyond the picture they are the lowest value. */
import type { Cursor } from './cursor';
import type { DisplayPlane } from './display-plane';

export const glassSamples = 13;

export function cropAround(plane: DisplayPlane, { row, column }: Cursor, n = glassSamples): DisplayPlane {
  const top = row - Math.floor(n / 2);
  const left = column - Math.floor(n / 2);
  const samples = new Uint16Array(n * n);
  for (let r = 0; r < n; r++) {
    for (let c = 0; c < n; c++) {
      const inside = top + r >= 0 && top + r < plane.rows && left + c >= 0 && left + c < plane.columns;
      if (inside) samples[r * n + c] = plane.samples[(top + r) * plane.columns + left + c] ?? 0;
    }
  }
  const origin = [plane.origin[0] + top * plane.spacing[0], plane.origin[1] + left * plane.spacing[1]] as const;
  return { ...plane, rows: n, columns: n, origin, samples };
}

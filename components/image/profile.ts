/** Values along a line through the cursor, and the path that draws them. */
import type { Cursor } from './cursor';
import { valueNear, type DisplayPlane, type PlaneGrid } from './display-plane';
import type { Axis } from './edge-scale';

/** One value for each sample of `frame` along the axis; null where the plane does not reach. A plane on another grid is read nearest. */
export function profileThrough(plane: DisplayPlane, cursor: Cursor, axis: Axis, frame: PlaneGrid): (number | null)[] {
  const n = axis === 'rows' ? frame.rows : frame.columns;
  return Array.from({ length: n }, (_, i) => {
    const row = axis === 'rows' ? i : cursor.row;
    const column = axis === 'rows' ? cursor.column : i;
    return valueNear(plane, frame.origin[0] + row * frame.spacing[0], frame.origin[1] + column * frame.spacing[1]);
  });
}

/** SVG path data: the samples from left to right, `low` at the bottom and `high` at the top; a gap where nothing is known. */
export function profilePath(
  values: readonly (number | null)[],
  [low, high]: readonly [number, number],
  width: number,
  height: number,
): string {
  const range = high - low || 1;
  let pen = 'M';
  return values
    .map((value, i) => {
      if (value === null) {
        pen = 'M';
        return '';
      }
      const x = ((i + 0.5) / values.length) * width;
      const y = height * (1 - Math.min(1, Math.max(0, (value - low) / range)));
      const point = `${pen}${x.toFixed(1)} ${y.toFixed(1)}`;
      pen = 'L';
      return point;
    })
    .join('');
}

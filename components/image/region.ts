/**
 * The part of a picture that is on the table, in samples: sample i covers [i, i + 1). Zoom and pan change the region only;
 * the pixels are never painted again for it.
 */
import type { PlaneGrid } from './display-plane';

export interface Region {
  readonly top: number;
  readonly left: number;
  readonly rows: number;
  readonly columns: number;
}

export const wholeRegion = (grid: PlaneGrid): Region => ({ top: 0, left: 0, rows: grid.rows, columns: grid.columns });

/** A region never leaves the picture, and never shows fewer than these samples along an axis. */
const fewest = 16;

function bounded(region: Region, grid: PlaneGrid): Region {
  const scale = Math.min(1, Math.max(fewest / Math.min(grid.rows, grid.columns), region.rows / grid.rows));
  const rows = grid.rows * scale;
  const columns = grid.columns * scale;
  return {
    rows,
    columns,
    top: Math.min(grid.rows - rows, Math.max(0, region.top)),
    left: Math.min(grid.columns - columns, Math.max(0, region.left)),
  };
}

/** Magnifies by `factor` so that the sample under the point, given as fractions of the picture, stays where it is. */
export function zoomRegion(region: Region, factor: number, at: { readonly x: number; readonly y: number }, grid: PlaneGrid): Region {
  const smallest = fewest / Math.min(grid.rows, grid.columns);
  const scale = Math.min(1, Math.max(smallest, region.rows / grid.rows / factor));
  const rows = grid.rows * scale;
  const columns = grid.columns * scale;
  return bounded(
    { rows, columns, top: region.top + at.y * (region.rows - rows), left: region.left + at.x * (region.columns - columns) },
    grid,
  );
}

/** Moves the picture by fractions of what is visible; to the right and down are positive. */
export const panRegion = (region: Region, right: number, down: number, grid: PlaneGrid): Region =>
  bounded({ ...region, top: region.top - down * region.rows, left: region.left - right * region.columns }, grid);

export const magnification = (region: Region, grid: PlaneGrid): number => grid.rows / region.rows;

/** Where a plane lies on a picture of another grid that shows `region`: fractions of the picture, by millimetres. */
export function placement(
  plane: PlaneGrid,
  frame: PlaneGrid,
  region: Region,
): { left: number; top: number; width: number; height: number } {
  const along = (axis: 0 | 1, start: number, visible: number, n: number) => {
    const firstEdge = plane.origin[axis] - plane.spacing[axis] / 2;
    const frameEdge = frame.origin[axis] - frame.spacing[axis] / 2;
    return {
      from: ((firstEdge - frameEdge) / frame.spacing[axis] - start) / visible,
      extent: (n * plane.spacing[axis]) / frame.spacing[axis] / visible,
    };
  };
  const vertical = along(0, region.top, region.rows, plane.rows);
  const horizontal = along(1, region.left, region.columns, plane.columns);
  return { left: horizontal.from, width: horizontal.extent, top: vertical.from, height: vertical.extent };
}

/** The region moved as little as needed so that the sample is on the table. */
export function regionShowing(region: Region, row: number, column: number, grid: PlaneGrid): Region {
  const moved = (start: number, visible: number, index: number) => Math.min(index, Math.max(start, index + 1 - visible));
  return bounded({ ...region, top: moved(region.top, region.rows, row), left: moved(region.left, region.columns, column) }, grid);
}

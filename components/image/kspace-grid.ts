/** The grid of k-space that belongs to a grid of an image: cycles per metre, Δk = 1 / (N · Δ), zero frequency at floor(N/2). */
import { cyclesPerMetre } from './cursor';
import type { DisplayPlane, PlaneGrid } from './display-plane';

export function kspaceGrid({ rows, columns, spacing }: PlaneGrid): PlaneGrid {
  const [rowStep, columnStep] = [cyclesPerMetre(1, rows, spacing[0]), cyclesPerMetre(1, columns, spacing[1])];
  return {
    rows,
    columns,
    spacing: [rowStep, columnStep],
    origin: [-Math.floor(rows / 2) * rowStep, -Math.floor(columns / 2) * columnStep],
  };
}

/** A plane of k-space as the server sends it, with the pixel size of its image, on its own grid. */
export const onKspaceGrid = (plane: DisplayPlane): DisplayPlane => ({ ...plane, ...kspaceGrid(plane) });

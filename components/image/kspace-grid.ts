/**
 * The grid of k-space that belongs to a grid of an image: cycles per metre, Δk = 1 / (N · Δ), zero frequency at floor(N/2). The server's
 * planes of k-space come on this grid.
 */
import { cyclesPerMetre } from './cursor';
import type { PlaneGrid } from './display-plane';

export function kspaceGrid({ rows, columns, spacing }: PlaneGrid): PlaneGrid {
  const [rowStep, columnStep] = [cyclesPerMetre(1, rows, spacing[0]), cyclesPerMetre(1, columns, spacing[1])];
  return {
    rows,
    columns,
    spacing: [rowStep, columnStep],
    origin: [-Math.floor(rows / 2) * rowStep, -Math.floor(columns / 2) * columnStep],
  };
}

/**
 * The cursor: a sample [row, column] of the picture, and what it means in millimetres and in cycles per metre.
 * k = line / (N · Δ): line is counted from the zero frequency at floor(N/2), Δ is the pixel size.
 */
import type { PlaneGrid } from './display-plane';
import type { Region } from './region';

export interface Cursor {
  readonly row: number;
  readonly column: number;
}

export type PhaseEncode = 'row' | 'column';

const within = (index: number, n: number): number => Math.min(n - 1, Math.max(0, index));

/** The sample under a point of the picture, which is `size` large and shows `region` of the grid. */
export function cursorAt(
  point: { readonly x: number; readonly y: number },
  size: { readonly width: number; readonly height: number },
  region: Region,
  grid: PlaneGrid,
): Cursor {
  return {
    row: within(Math.floor(region.top + (point.y / size.height) * region.rows), grid.rows),
    column: within(Math.floor(region.left + (point.x / size.width) * region.columns), grid.columns),
  };
}

/** Where the sample is, millimetres from the centre of the uploaded image; y grows downwards. */
export function positionMm(cursor: Cursor, grid: PlaneGrid): { x: number; y: number } {
  return { x: grid.origin[1] + cursor.column * grid.spacing[1], y: grid.origin[0] + cursor.row * grid.spacing[0] };
}

export interface KspacePosition {
  /** Phase-encode line, counted from the centre of k-space. */
  readonly line: number;
  /** Sample along the readout, counted from its centre. */
  readonly sample: number;
  /** Cycles per metre. */
  readonly kPhaseEncode: number;
  readonly kReadout: number;
}

const millimetresPerMetre = 1000;

/** Cycles per metre of a frequency index, which is counted from the centre, on an axis of `n` pixels of `spacingMm`. */
export const cyclesPerMetre = (index: number, n: number, spacingMm: number): number => (index * millimetresPerMetre) / (n * spacingMm);

export function kspacePosition(cursor: Cursor, grid: PlaneGrid, phaseEncode: PhaseEncode): KspacePosition {
  const alongRows = cursor.row - Math.floor(grid.rows / 2);
  const alongColumns = cursor.column - Math.floor(grid.columns / 2);
  const kRows = cyclesPerMetre(alongRows, grid.rows, grid.spacing[0]);
  const kColumns = cyclesPerMetre(alongColumns, grid.columns, grid.spacing[1]);
  return phaseEncode === 'column'
    ? { line: alongRows, sample: alongColumns, kPhaseEncode: kRows, kReadout: kColumns }
    : { line: alongColumns, sample: alongRows, kPhaseEncode: kColumns, kReadout: kRows };
}

const steps: Readonly<Record<string, readonly [row: number, column: number]>> = {
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
  ArrowLeft: [0, -1],
  ArrowRight: [0, 1],
};
const longStep = 10;

/** The cursor after a key, or null where the key is not for it. Arrows go one sample, with shift ten; Home goes to the centre. */
export function cursorAfterKey(cursor: Cursor, key: string, shift: boolean, grid: PlaneGrid): Cursor | null {
  if (key === 'Home') return { row: Math.floor(grid.rows / 2), column: Math.floor(grid.columns / 2) };
  const step = steps[key];
  if (!step) return null;
  const length = shift ? longStep : 1;
  return { row: within(cursor.row + length * step[0], grid.rows), column: within(cursor.column + length * step[1], grid.columns) };
}

/** The cursor of one grid on another of a different size, at the same fraction of it. */
export function cursorOnGrid(cursor: Cursor, from: PlaneGrid, to: PlaneGrid): Cursor {
  if (from.rows === to.rows && from.columns === to.columns) return cursor;
  const shifted = (index: number, n: number, m: number) => within(index - Math.floor(n / 2) + Math.floor(m / 2), m);
  return { row: shifted(cursor.row, from.rows, to.rows), column: shifted(cursor.column, from.columns, to.columns) };
}

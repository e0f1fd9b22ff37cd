/**
 * A ring of receive elements with Gaussian sensitivities, |C_j(r)| = exp(−|r − r_j|²/2w²), and their sum of squares. Positions and w are
 * parts of the longer side of the field of view; angles run clockwise from the right, as on a clock face with the rows downwards.
 * Ring and width: common practice in simulation; real sensitivities fall off near the element more steeply.
 */
import type { Grid } from './grid';

export interface CoilRing {
  readonly elements: number;
  /** Distance of the elements from the centre. */
  readonly radius: number;
  readonly width: number;
  /** Where the first element lies, radians. */
  readonly firstAngle: number;
}

/** exp(−(p − position)²/w²) for every sample of an axis, p from the centre sample. */
function squaredAlong(n: number, sampleSize: number, position: number, width: number): Float64Array {
  return Float64Array.from({ length: n }, (_, i) => {
    const distance = ((i - Math.floor(n / 2)) * sampleSize - position) / width;
    return Math.exp(-distance * distance);
  });
}

/** Σ_j gain[j]·|C_j|², [row, column]; elements without a gain count fully. A Gaussian is the product of one along each axis. */
export function sumOfSquares(
  { rows, columns, spacing }: Pick<Grid, 'rows' | 'columns' | 'spacing'>,
  ring: CoilRing,
  gains: readonly number[] = [],
): Float64Array {
  const fieldOfView = Math.max(rows * spacing[0], columns * spacing[1]);
  const sum = new Float64Array(rows * columns);
  for (let j = 0; j < ring.elements; j++) {
    const angle = ring.firstAngle + (2 * Math.PI * j) / ring.elements;
    const down = squaredAlong(rows, spacing[0] / fieldOfView, ring.radius * Math.sin(angle), ring.width);
    const across = squaredAlong(columns, spacing[1] / fieldOfView, ring.radius * Math.cos(angle), ring.width);
    const gain = gains[j] ?? 1;
    for (let row = 0; row < rows; row++) {
      const weight = gain * (down[row] as number);
      for (let column = 0; column < columns; column++) {
        const i = row * columns + column;
        sum[i] = (sum[i] as number) + weight * (across[column] as number);
      }
    }
  }
  return sum;
}

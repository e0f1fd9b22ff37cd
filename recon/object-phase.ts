/**
 * A smooth synthetic phase for an object of which only the magnitude is known. The k-space of a bare magnitude is Hermitian, and
 * partial Fourier, folding and one-sided spikes look better on it than they ever do on a scanner.
 *   θ(r) = θ0 + a·x + b·y + c·xy + d(x² − y²) + e(x² + y²),   x and y from −1 to 1 over the plane.
 * The shape is common practice: receive phase and field offset are smooth over a head.
 */
import type { ComplexPlane, Grid } from './grid';
import { randomOf } from './random';

/** `range`: largest minus smallest phase over the plane, radians, 0 to 2π. */
export interface ObjectPhase {
  readonly range: number;
  readonly seed: number;
}

/** −1 to 1 over `n` samples, 0 at the centre of the plane. */
const normalised = (index: number, n: number): number => (n === 1 ? 0 : (2 * index) / (n - 1) - 1);

/** θ [row, column] in radians, spread over exactly `range` about a random constant. A plane of one pixel has no spread. */
export function objectPhase({ rows, columns }: Pick<Grid, 'rows' | 'columns'>, { range, seed }: ObjectPhase): Float64Array {
  if (!(range >= 0 && range <= 2 * Math.PI)) throw RangeError(`objectPhase.range must be 0 to 2π, got ${range}`);
  const random = randomOf(seed, 'object phase');
  const constant = 2 * Math.PI * random.uniform();
  const [a, b, c, d, e] = [random.normal(), random.normal(), random.normal(), random.normal(), random.normal()];
  const theta = new Float64Array(rows * columns);
  let low = Infinity;
  let high = -Infinity;
  for (let row = 0; row < rows; row++) {
    const y = normalised(row, rows);
    for (let column = 0; column < columns; column++) {
      const x = normalised(column, columns);
      const value = a * x + b * y + c * x * y + d * (x * x - y * y) + e * (x * x + y * y);
      theta[row * columns + column] = value;
      low = Math.min(low, value);
      high = Math.max(high, value);
    }
  }
  const scale = high > low ? range / (high - low) : 0;
  const middle = (low + high) / 2;
  return theta.map((value) => constant + (value - middle) * scale);
}

/** I · exp(iθ). */
export function withObjectPhase(object: ComplexPlane, phase: ObjectPhase): ComplexPlane {
  const theta = objectPhase(object, phase);
  const re = new Float64Array(theta.length);
  const im = new Float64Array(theta.length);
  for (let i = 0; i < theta.length; i++) {
    const cosine = Math.cos(theta[i] as number);
    const sine = Math.sin(theta[i] as number);
    const a = object.re[i] as number;
    const b = object.im[i] as number;
    re[i] = a * cosine - b * sine;
    im[i] = a * sine + b * cosine;
  }
  return { ...object, re, im };
}

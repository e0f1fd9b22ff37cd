/**
 * The Fourier transform of this project, its convention fixed here once: centred and orthonormal,
 *   K(kx, ky) = 1/√(N·M) · Σ_x Σ_y I(x, y) exp(−i2π(kx·x/N + ky·y/M)),   I the same sum over K with +i,
 * where x, kx run over the N columns and y, ky over the M rows, each counted from index floor(n/2). Any size, odd too.
 *
 * Engine: our own mixed radix in float64, synchronous, Bluestein for lengths with a prime above 13. The WebAssembly transforms of
 * the registry are float32, load a second file asynchronously and need `node:` or a URL for it, which this layer must not know.
 *
 * A plane of k-space carries the grid of k: spacing 1/(n·Δ) in cycles per metre, origin −floor(n/2) of them. The way back restores
 * Δ and a centred image. A centred image always suffices: every plane that is transformed here has its origin at its
 * own centre, and the one cause that changes the field of view keeps the pixel size and centres the new window.
 */
import type { Axis, Direction } from './fourier/axis';
import { filledLines, transformLines } from './fourier/axis';
import { transformReal } from './fourier/real-plane';
import type { ComplexPlane, Grid, Plane } from './grid';
import { centredGrid } from './grid';
import { unwrittenArray } from './spare-arrays';

/** The grid of the other domain along the given axes: spacing 1/(n·Δ), centred. It is its own inverse. */
export function reciprocalGrid({ rows, columns, spacing }: Grid, axes: readonly Axis[] = [0, 1]): Grid {
  return centredGrid(rows, columns, [
    axes.includes(0) ? 1 / (rows * spacing[0]) : spacing[0],
    axes.includes(1) ? 1 / (columns * spacing[1]) : spacing[1],
  ]);
}

/** The axis with the most empty lines comes first: they cost nothing, and after the other axis they would not be empty any more. */
function transformed(plane: ComplexPlane, axes: readonly Axis[], direction: Direction): ComplexPlane {
  const { rows, columns } = plane;
  const size = [rows, columns] as const;
  const result = { ...reciprocalGrid(plane, axes), re: unwrittenArray(rows * columns), im: unwrittenArray(rows * columns) };
  const passes = axes.map((axis) => ({ axis, lines: filledLines(plane, size, axis), nLines: size[1 - axis] as number }));
  passes.sort((a, b) => a.lines.length / a.nLines - b.lines.length / b.nLines);
  passes.forEach(({ axis, lines, nLines }, pass) => {
    if (pass > 0) return transformLines({ from: result, to: result }, size, axis, direction, filledLines(result, size, axis));
    if (lines.length < nLines) for (const part of [result.re, result.im]) part.fill(0);
    transformLines({ from: plane, to: result }, size, axis, direction, lines);
  });
  return result;
}

/** Image to k-space. */
export const transform = (image: ComplexPlane): ComplexPlane => transformed(image, [1, 0], 'forward');

/** The same of a real image in half the time: the other half of its k-space is K(−k) = conj K(k). */
export const transformOfReal = (image: Plane): ComplexPlane => ({ ...reciprocalGrid(image), ...transformReal(image) });

/** k-space to image. */
export const inverse = (kspace: ComplexPlane): ComplexPlane => transformed(kspace, [1, 0], 'inverse');

/** Image to k-space along one axis only: axis 0 transforms every column, axis 1 every row. */
export const transformAlong = (plane: ComplexPlane, axis: Axis): ComplexPlane => transformed(plane, [axis], 'forward');

/** k-space to image along one axis only. */
export const inverseAlong = (plane: ComplexPlane, axis: Axis): ComplexPlane => transformed(plane, [axis], 'inverse');

/**
 * Shapes of constant density, ellipses and polygons, whose densities add: one list gives the picture and, exactly, its k-space.
 */
import { reciprocalGrid } from '../fourier';
import type { ComplexPlane, Grid, Plane } from '../grid';
import { complexZeros } from '../grid';
import type { Ellipse } from './ellipse';
import { ellipseSignal, paintEllipse } from './ellipse';
import type { Polygon } from './polygon';
import { paintPolygon, polygonSpectrum } from './polygon';

export type Shape = Ellipse | Polygon;

/** A shape without its density. */
export type Outline = Omit<Ellipse, 'density'> | Omit<Polygon, 'density'>;

/** S(kx, ky) of one shape, density times square metres; k in cycles per metre. */
const spectrumOf = (shape: Shape): ((kx: number, ky: number) => { re: number; im: number }) =>
  'vertices' in shape ? polygonSpectrum(shape) : (kx, ky) => ellipseSignal(shape, kx, ky);

/**
 * Exact k-space of the shapes, [row, column] on the reciprocal of `image`, in the scale of the orthonormal transform of its pixels.
 * Densities are real, so that S(−k) is the conjugate of S(k), and half of the samples are copied from the other half.
 */
export function shapeKspace(shapes: readonly Shape[], image: Grid): ComplexPlane {
  const kspace = complexZeros(reciprocalGrid(image));
  const { rows, columns, spacing, re, im } = kspace;
  const scale = 1 / (image.spacing[0] * image.spacing[1] * Math.sqrt(image.rows * image.columns));
  const spectra = shapes.map(spectrumOf);
  for (let row = 0; row < rows; row++) {
    const v = row - Math.floor(rows / 2);
    for (let column = 0; column < columns; column++) {
      const u = column - Math.floor(columns / 2);
      const i = row * columns + column;
      const mirror = i - 2 * (v * columns + u);
      const isCopy = mirror < i && Math.floor(columns / 2) - u < columns && Math.floor(rows / 2) - v < rows;
      if (isCopy) {
        re[i] = re[mirror] as number;
        im[i] = -(im[mirror] as number);
        continue;
      }
      let sumRe = 0;
      let sumIm = 0;
      for (const spectrum of spectra) {
        const signal = spectrum(u * spacing[1], v * spacing[0]);
        sumRe += signal.re;
        sumIm += signal.im;
      }
      re[i] = sumRe * scale;
      im[i] = sumIm * scale;
    }
  }
  return kspace;
}

/** The shapes drawn on `grid`: each pixel is the mean density over its area. */
export function shapeImage(shapes: readonly Shape[], grid: Grid): Plane {
  const { rows, columns, spacing, origin } = grid;
  const values = new Float64Array(rows * columns);
  for (const shape of shapes) {
    if ('vertices' in shape) paintPolygon(shape, grid, values);
    else paintEllipse(shape, grid, values);
  }
  return { rows, columns, spacing, origin, values };
}

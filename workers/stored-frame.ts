/** A frame as it is stored, as a plane on its grid in metres. Where the header gives no spacing, 1 mm is assumed, as the contract says. */
import { asComplex, centredGrid, magnitude, type ComplexPlane, type Plane } from '../recon/grid';
import type { ImageSource } from './job';

/** The object that a recipe acts on: as measured where the image is complex, else a real plane. */
export function objectOf(source: ImageSource): ComplexPlane {
  return source.isComplex ? complexPlaneOf(source) : asComplex(realPlaneOf(source));
}

/** What is looked at and measured: the values as stored, or their magnitude where they are complex. */
export function pictureOf(source: ImageSource): Plane {
  return source.isComplex ? magnitude(complexPlaneOf(source)) : realPlaneOf(source);
}

function gridOf({ rows, columns, spacingMm }: ImageSource) {
  const [rowMm, columnMm] = spacingMm ?? [1, 1];
  return centredGrid(rows, columns, [rowMm / 1000, columnMm / 1000]);
}

function storedValues({ values, frame, rows, columns, isComplex }: ImageSource): Float32Array {
  const n = rows * columns * (isComplex ? 2 : 1);
  return new Float32Array(values, frame * n * Float32Array.BYTES_PER_ELEMENT, n);
}

const realPlaneOf = (source: ImageSource): Plane => ({ ...gridOf(source), values: Float64Array.from(storedValues(source)) });

function complexPlaneOf(source: ImageSource): ComplexPlane {
  const stored = storedValues(source);
  const re = new Float64Array(stored.length / 2);
  const im = new Float64Array(stored.length / 2);
  for (let i = 0; i < re.length; i++) {
    re[i] = stored[2 * i] as number;
    im[i] = stored[2 * i + 1] as number;
  }
  return { ...gridOf(source), re, im };
}

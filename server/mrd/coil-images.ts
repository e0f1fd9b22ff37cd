/**
 * Images of the coil elements of one plane, and one image of them all that keeps a phase. The elements are added with the conjugate of their
 * sensitivities, which gives the best signal-to-noise ratio where their noise is equal and independent (Roemer et al., Magn Reson Med
 * 1990;16:192, from memory). Sensitivities are taken from the centre of k-space (McKenzie et al., Magn Reson Med 2002;47:529, from memory).
 * They hold the phase of the object at low resolution too, which would be lost; so their phase is counted from that of a virtual element, the
 * one mixture of all that receives most (Parker et al., Magn Reson Med 2014;72:563, from memory). The weights have unit length, so that
 * noise stays what it is in one element.
 */
import { inverse } from '../../recon/fourier';
import { centredGrid, type ComplexPlane } from '../../recon/grid';

interface Planes {
  readonly rows: number;
  readonly columns: number;
  readonly channels: number;
}

/** [channel, row, column] re, im of k-space becomes that of the images, in place. */
export function transformInPlace(samples: Float32Array, { rows, columns, channels }: Planes): void {
  for (let channel = 0; channel < channels; channel++) {
    const image = inverse(planeOf(samples, channel, { rows, columns }));
    const from = 2 * channel * rows * columns;
    for (let i = 0; i < rows * columns; i++) {
      samples[from + 2 * i] = image.re[i] as number;
      samples[from + 2 * i + 1] = image.im[i] as number;
    }
  }
}

function planeOf(samples: Float32Array, channel: number, { rows, columns }: Omit<Planes, 'channels'>): ComplexPlane {
  const n = rows * columns;
  const re = new Float64Array(n);
  const im = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    re[i] = samples[2 * (channel * n + i)] as number;
    im[i] = samples[2 * (channel * n + i) + 1] as number;
  }
  return { ...centredGrid(rows, columns, [1, 1]), re, im };
}

/** How much of k-space to each side of its centre the sensitivities are taken from. */
const centreFraction = 1 / 8;
const leastCentre = 4;

/** Falls from 1 at the centre to 0 beyond it (Hann). */
function centreWindow(n: number): Float64Array {
  const half = Math.max(leastCentre, Math.round(n * centreFraction));
  return Float64Array.from({ length: n }, (_, i) => {
    const distance = Math.abs(i - Math.floor(n / 2)) / half;
    return distance >= 1 ? 0 : 0.5 * (1 + Math.cos(Math.PI * distance));
  });
}

/** What tells how the elements are added: from k-space, before it is transformed. */
export interface Sensitivities {
  /** Σ conj(L)·c, and Σ|L|², and the virtual element, per pixel; re and im in turn where complex. */
  readonly lowResolution: (channel: number) => ComplexPlane;
  readonly virtual: Float64Array;
}

/** Copies the centre of k-space, which is small, and finds the virtual element of it. */
export function sensitivitiesOf(samples: Float32Array, { rows, columns, channels }: Planes): Sensitivities {
  const [overRows, overColumns] = [centreWindow(rows), centreWindow(columns)];
  const centre = [...overRows.keys()].flatMap((row) =>
    (overRows[row] as number) === 0
      ? []
      : [...overColumns.keys()].flatMap((column) => (overColumns[column] === 0 ? [] : [row * columns + column])),
  );
  const kept = new Float64Array(2 * channels * centre.length);
  for (let channel = 0; channel < channels; channel++) {
    for (const [i, place] of centre.entries()) {
      const weight = (overRows[Math.floor(place / columns)] as number) * (overColumns[place % columns] as number);
      const from = 2 * (channel * rows * columns + place);
      const to = 2 * (channel * centre.length + i);
      kept[to] = weight * (samples[from] as number);
      kept[to + 1] = weight * (samples[from + 1] as number);
    }
  }
  const lowResolution = (channel: number): ComplexPlane => {
    const plane = { ...centredGrid(rows, columns, [1, 1]), re: new Float64Array(rows * columns), im: new Float64Array(rows * columns) };
    for (const [i, place] of centre.entries()) {
      plane.re[place] = kept[2 * (channel * centre.length + i)] as number;
      plane.im[place] = kept[2 * (channel * centre.length + i) + 1] as number;
    }
    return inverse(plane);
  };
  return { lowResolution, virtual: strongestMixture(kept, channels, centre.length) };
}

const powerIterations = 50;

/** The dominant eigenvector of Σ c·cᴴ over samples, [channel] re, im, by powers: u ← Σ c·(cᴴu). */
function strongestMixture(samples: Float64Array, channels: number, n: number): Float64Array {
  let mixture = new Float64Array(2 * channels).map((_, i) => (i % 2 === 0 ? 1 : 0));
  for (let iteration = 0; iteration < powerIterations; iteration++) {
    const next = new Float64Array(2 * channels);
    for (let i = 0; i < n; i++) {
      let re = 0;
      let im = 0;
      for (let channel = 0; channel < channels; channel++) {
        const [a, b] = complexAt(samples, channel * n + i);
        const [u, v] = complexAt(mixture, channel);
        re += a * u + b * v;
        im += a * v - b * u;
      }
      for (let channel = 0; channel < channels; channel++) {
        const [a, b] = complexAt(samples, channel * n + i);
        next[2 * channel] = (next[2 * channel] as number) + a * re - b * im;
        next[2 * channel + 1] = (next[2 * channel + 1] as number) + a * im + b * re;
      }
    }
    const length = Math.sqrt(next.reduce((sum, value) => sum + value * value, 0));
    if (!(length > 0)) return mixture;
    mixture = next.map((value) => value / length);
  }
  return mixture;
}

const complexAt = (values: Float64Array | Float32Array, i: number): [number, number] => [
  values[2 * i] as number,
  values[2 * i + 1] as number,
];

/** The combined image, [row, column] re, im, of the images of the elements. */
export function combine(
  images: Float32Array,
  { lowResolution, virtual }: Sensitivities,
  { rows, columns, channels }: Planes,
): Float32Array {
  const n = rows * columns;
  const sum = new Float64Array(2 * n);
  const reference = new Float64Array(2 * n);
  const power = new Float64Array(n);
  for (let channel = 0; channel < channels; channel++) {
    const low = lowResolution(channel);
    const [u, v] = complexAt(virtual, channel);
    for (let i = 0; i < n; i++) {
      const [c, d] = complexAt(images, channel * n + i);
      const a = low.re[i] as number;
      const b = low.im[i] as number;
      sum[2 * i] = (sum[2 * i] as number) + a * c + b * d;
      sum[2 * i + 1] = (sum[2 * i + 1] as number) + a * d - b * c;
      reference[2 * i] = (reference[2 * i] as number) + u * a + v * b;
      reference[2 * i + 1] = (reference[2 * i + 1] as number) + u * b - v * a;
      power[i] = (power[i] as number) + a * a + b * b;
    }
  }
  const combined = new Float32Array(2 * n);
  for (let i = 0; i < n; i++) {
    const [re, im] = complexAt(sum, i);
    const [x, y] = complexAt(reference, i);
    const length = Math.sqrt(x * x + y * y) * Math.sqrt(power[i] as number);
    if (!(length > 0)) continue;
    combined[2 * i] = (re * x - im * y) / length;
    combined[2 * i + 1] = (re * y + im * x) / length;
  }
  return combined;
}

/**
 * Planes as bytes, little-endian, row-major, one after the other (server/contract/planes.ts). Exact form: real planes as float32,
 * complex ones as complex64. Display form: uint16 between `low` and `high`, a complex plane as `<name>.log` (log10 of the magnitude
 * over its maximum, not below −8) and `<name>.phase` (−π to π). Nothing pads: a plane may begin at an odd multiple of two bytes.
 */
import type { ComplexPlane, Grid, Plane } from '../recon/grid';
import type { PlaneDescription, PlaneForm, Planes } from './job';

export type NamedPlane = { readonly name: string } & (
  { readonly domain: 'image'; readonly plane: Plane } | { readonly domain: 'kspace'; readonly plane: ComplexPlane }
);

interface Encoded {
  readonly description: PlaneDescription;
  readonly samples: Float32Array | Uint16Array;
}

export const logFloor = -8;
const fullScale = 65_535;

/** Encodes `planes` in their order. */
export function encodePlanes(planes: readonly NamedPlane[], form: PlaneForm): Planes {
  const encoded = planes.flatMap((plane) => (form === 'exact' ? [exact(plane)] : display(plane)));
  const bytes = new Uint8Array(encoded.reduce((sum, { samples }) => sum + samples.byteLength, 0));
  let offset = 0;
  for (const { samples } of encoded) {
    bytes.set(new Uint8Array(samples.buffer, samples.byteOffset, samples.byteLength), offset);
    offset += samples.byteLength;
  }
  return { planes: encoded.map(({ description }) => description), bytes };
}

function exact(named: NamedPlane): Encoded {
  if (named.domain === 'image') {
    return { description: { ...describe(named), type: 'float32' }, samples: Float32Array.from(named.plane.values) };
  }
  const { re, im } = named.plane;
  const samples = new Float32Array(2 * re.length);
  for (let i = 0; i < re.length; i++) {
    samples[2 * i] = re[i] as number;
    samples[2 * i + 1] = im[i] as number;
  }
  return { description: { ...describe(named), type: 'complex64' }, samples };
}

function display(named: NamedPlane): Encoded[] {
  if (named.domain === 'image') {
    const [low, high] = extremes(named.plane.values);
    return [scaled(named, named.name, named.plane.values, low, high)];
  }
  return [
    scaled(named, `${named.name}.log`, logMagnitude(named.plane), logFloor, 0),
    scaled(named, `${named.name}.phase`, phase(named.plane), -Math.PI, Math.PI),
  ];
}

/** Values between low and high as 0 to 65535; those beyond are clamped. A flat plane is all zeros with high above low. */
function scaled(named: NamedPlane, name: string, values: Float64Array, low: number, high: number): Encoded {
  const top = high > low ? high : low + 1;
  const factor = fullScale / (top - low);
  const samples = new Uint16Array(values.length);
  for (let i = 0; i < values.length; i++) {
    const level = ((values[i] as number) - low) * factor + 0.5;
    samples[i] = level < 0 ? 0 : level > fullScale ? fullScale : level;
  }
  return { description: { ...describe(named), name, type: 'uint16', low, high: top }, samples };
}

/** Log magnitudes drawn black and white in a small picture of k-space: four decades. */
export const kspaceWindow = [-4, 0] as const;

/** log10(|K| / max|K|), not below the floor; an empty plane is all floor. */
export function logMagnitude({ re, im }: ComplexPlane): Float64Array {
  const values = new Float64Array(re.length);
  let largest = 0;
  for (let i = 0; i < values.length; i++) {
    const a = re[i] as number;
    const b = im[i] as number;
    const power = a * a + b * b;
    values[i] = power;
    if (power > largest) largest = power;
  }
  for (let i = 0; i < values.length; i++) {
    const power = values[i] as number;
    values[i] = power > 0 ? Math.max(logFloor, 0.5 * Math.log10(power / largest)) : logFloor;
  }
  return values;
}

function phase({ re, im }: ComplexPlane): Float64Array {
  const values = new Float64Array(re.length);
  for (let i = 0; i < values.length; i++) values[i] = Math.atan2(im[i] as number, re[i] as number);
  return values;
}

function extremes(values: Float64Array): [number, number] {
  let low = Infinity;
  let high = -Infinity;
  for (const value of values) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  return [low, high];
}

/** Name, size and place. Image grids are in metres and travel in millimetres; k-space grids are in cycles per metre already. */
function describe({ name, domain, plane }: NamedPlane): Omit<PlaneDescription, 'type'> {
  const unit = domain === 'image' ? 1000 : 1;
  const { rows, columns, spacing, origin }: Grid = plane;
  const pair = ([row, column]: readonly [number, number]): [number, number] => [written(row * unit), written(column * unit)];
  return { name, rows, columns, spacing: pair(spacing), origin: pair(origin) };
}

/** Twelve digits: 2 mm is written as 2, not as 1.9999999999999996. */
const written = (value: number): number => Number(value.toPrecision(12));

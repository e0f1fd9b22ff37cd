/**
 * Planes as bytes, little-endian, row-major, one after the other (server/contract/planes.ts). Exact form: real planes as float32,
 * complex ones as complex64. Display form: uint16 between `low` and `high`, a complex plane as `<name>.log` (log10 of the magnitude
 * over its maximum, not below −8) and `<name>.phase` (−π to π). Nothing pads: a plane may begin at an odd multiple of two bytes.
 */
import { magnitude, type ComplexPlane, type Grid, type Plane } from '../recon/grid';
import { logFloor, writeLevels, writeLogLevels, writePhaseLevels } from './display-levels';
import type { PlaneDescription, PlaneForm, Planes } from './job';

export type NamedPlane = { readonly name: string } & (
  | { readonly domain: 'image'; readonly plane: Plane }
  /** An image that has a phase of its own: in display form its magnitude, under its name, and its phase. */
  | { readonly domain: 'complex-image'; readonly plane: ComplexPlane }
  | { readonly domain: 'kspace'; readonly plane: ComplexPlane }
);

/** Part of an answer: what it is, how many bytes it takes, and how they are written. */
interface Part {
  readonly description: PlaneDescription;
  readonly byteLength: number;
  readonly write: (buffer: ArrayBuffer, offset: number) => void;
}

/** Encodes `planes` in their order, each sample once, where it travels. */
export function encodePlanes(planes: readonly NamedPlane[], form: PlaneForm): Planes {
  const parts = planes.flatMap((plane) => (form === 'exact' ? [exact(plane)] : display(plane)));
  const buffer = new ArrayBuffer(parts.reduce((sum, { byteLength }) => sum + byteLength, 0));
  let offset = 0;
  for (const { write, byteLength } of parts) {
    write(buffer, offset);
    offset += byteLength;
  }
  return { planes: parts.map(({ description }) => description), bytes: new Uint8Array(buffer) };
}

function exact(named: NamedPlane): Part {
  const n = named.plane.rows * named.plane.columns;
  if (named.domain === 'image') {
    return {
      description: { ...describe(named), type: 'float32' },
      byteLength: n * Float32Array.BYTES_PER_ELEMENT,
      write: (buffer, offset) => new Float32Array(buffer, offset, n).set(named.plane.values),
    };
  }
  return {
    description: { ...describe(named), type: 'complex64' },
    byteLength: 2 * n * Float32Array.BYTES_PER_ELEMENT,
    write: (buffer, offset) => interleave(named.plane, new Float32Array(buffer, offset, 2 * n)),
  };
}

function interleave({ re, im }: ComplexPlane, samples: Float32Array): void {
  for (let i = 0; i < re.length; i++) {
    samples[2 * i] = re[i] as number;
    samples[2 * i + 1] = im[i] as number;
  }
}

function display(named: NamedPlane): Part[] {
  if (named.domain === 'image') return [realLevels(named, named.plane.values)];
  const { name, plane } = named;
  const modulus =
    named.domain === 'kspace'
      ? inLevels(named, `${name}.log`, [logFloor, 0], (levels) => writeLogLevels(plane, levels))
      : realLevels(named, magnitude(plane).values);
  return [modulus, inLevels(named, `${name}.phase`, [-Math.PI, Math.PI], (levels) => writePhaseLevels(plane, levels))];
}

function realLevels(named: NamedPlane, values: Float64Array): Part {
  const [low, most] = extremes(values);
  // A flat plane is all zeros with high above low.
  const high = most > low ? most : low + 1;
  return inLevels(named, named.name, [low, high], (levels) => writeLevels(values, [low, high], levels));
}

function inLevels(named: NamedPlane, name: string, [low, high]: readonly [number, number], write: (levels: Uint16Array) => void): Part {
  const n = named.plane.rows * named.plane.columns;
  return {
    description: { ...describe(named), name, type: 'uint16', low, high },
    byteLength: n * Uint16Array.BYTES_PER_ELEMENT,
    write: (buffer, offset) => write(new Uint16Array(buffer, offset, n)),
  };
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

function extremes(values: Float64Array): [number, number] {
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < values.length; i++) {
    const value = values[i] as number;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  return [low, high];
}

/** Name, size and place. Image grids are in metres and travel in millimetres; k-space grids are in cycles per metre already. */
function describe({ name, domain, plane }: NamedPlane): Omit<PlaneDescription, 'type'> {
  const unit = domain === 'kspace' ? 1 : 1000;
  const { rows, columns, spacing, origin }: Grid = plane;
  const pair = ([row, column]: readonly [number, number]): [number, number] => [written(row * unit), written(column * unit)];
  return { name, rows, columns, spacing: pair(spacing), origin: pair(origin) };
}

/** Twelve digits: 2 mm is written as 2, not as 1.9999999999999996. */
const written = (value: number): number => Number(value.toPrecision(12));

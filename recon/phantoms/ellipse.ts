/**
 * Ellipses of constant density, in the image and in k-space from the same numbers. Lengths in metres from the image centre, x to the
 * right and y downwards, k in cycles per metre.
 *   S(k) = ρ·a·b · J1(2πq)/q · exp(−i2π(kx·x0 + ky·y0)),  q = |(a·ku, b·kv)|,  ku and kv along the semi-axes; S(0) = ρ·π·a·b.
 * Source: Van de Walle, IEEE Trans Med Imaging 2000;19:1160 (from memory); Koay, Magn Reson Med 2007;58:430, doi 10.1002/mrm.21292.
 */
import { besselJ1 } from '../bessel';
import type { Grid } from '../grid';

export interface Ellipse {
  /** Added to what lies beneath. */
  readonly density: number;
  /** Semi-axes, metres: a along x and b along y before the turn. */
  readonly a: number;
  readonly b: number;
  readonly x: number;
  readonly y: number;
  /** Radians, from x towards y: clockwise on the screen. */
  readonly angle: number;
}

/** S(kx, ky) of one ellipse, density times square metres. */
export function ellipseSignal({ density, a, b, x, y, angle }: Ellipse, kx: number, ky: number): { re: number; im: number } {
  const cosine = Math.cos(angle);
  const sine = Math.sin(angle);
  const u = a * (kx * cosine + ky * sine);
  const v = b * (ky * cosine - kx * sine);
  const q = Math.sqrt(u * u + v * v);
  // J1(2πq)/q tends to π; below 1e-9 the next term of the series, π(πq)²/2, is under rounding.
  const size = density * a * b * (q < 1e-9 ? Math.PI : besselJ1(2 * Math.PI * q) / q);
  const phase = -2 * Math.PI * (kx * x + ky * y);
  return { re: size * Math.cos(phase), im: size * Math.sin(phase) };
}

/** Points per pixel and axis where an edge crosses the pixel. */
const supersampling = 16;

/** The part of the pixel about (x, y) that lies within the ellipse, 0 to 1. */
function coverage(shape: Ellipse, x: number, y: number, [height, width]: Grid['spacing']): number {
  const cosine = Math.cos(shape.angle);
  const sine = Math.sin(shape.angle);
  const radius = (px: number, py: number): number => {
    const u = ((px - shape.x) * cosine + (py - shape.y) * sine) / shape.a;
    const v = ((py - shape.y) * cosine - (px - shape.x) * sine) / shape.b;
    return Math.sqrt(u * u + v * v);
  };
  const atCentre = radius(x, y);
  // The normalised radius changes by at most 1/min(a, b) a metre.
  const reach = Math.sqrt(height * height + width * width) / 2 / Math.min(shape.a, shape.b);
  if (atCentre > 1 + reach) return 0;
  if (atCentre < 1 - reach) return 1;
  let within = 0;
  for (let i = 0; i < supersampling; i++) {
    const py = y + ((i + 0.5) / supersampling - 0.5) * height;
    for (let j = 0; j < supersampling; j++) {
      if (radius(x + ((j + 0.5) / supersampling - 0.5) * width, py) <= 1) within++;
    }
  }
  return within / supersampling ** 2;
}

/** Adds the ellipse to `values` on `grid`: each pixel its mean density over the area of the pixel, edges by 16 × 16 points. */
export function paintEllipse(shape: Ellipse, { rows, columns, spacing, origin }: Grid, values: Float64Array): void {
  const reach = Math.max(shape.a, shape.b);
  const firstRow = Math.max(0, Math.floor((shape.y - reach - origin[0]) / spacing[0]));
  const lastRow = Math.min(rows - 1, Math.ceil((shape.y + reach - origin[0]) / spacing[0]));
  const firstColumn = Math.max(0, Math.floor((shape.x - reach - origin[1]) / spacing[1]));
  const lastColumn = Math.min(columns - 1, Math.ceil((shape.x + reach - origin[1]) / spacing[1]));
  for (let row = firstRow; row <= lastRow; row++) {
    for (let column = firstColumn; column <= lastColumn; column++) {
      const part = coverage(shape, origin[1] + column * spacing[1], origin[0] + row * spacing[0], spacing);
      const i = row * columns + column;
      values[i] = (values[i] as number) + shape.density * part;
    }
  }
}

/**
 * Samples as the 16-bit levels that a screen draws, 0 to 65535, written where they travel. Logarithm and angle come from tables, linear
 * between their entries: within a thousandth of a level of the exact value, several times as fast, and the same on every machine.
 */
import type { ComplexPlane } from '../recon/grid';

const fullScale = 65_535;

/** log10 of a magnitude over the largest that is drawn at level 0. */
export const logFloor = -8;

/** Values between low and high as 0 to 65535; those beyond are clamped. */
export function writeLevels(values: Float64Array, [low, high]: readonly [number, number], levels: Uint16Array): void {
  const factor = fullScale / (high - low);
  for (let i = 0; i < levels.length; i++) {
    const level = ((values[i] as number) - low) * factor + 0.5;
    levels[i] = level < 0 ? 0 : level > fullScale ? fullScale : level;
  }
}

const { mantissaBits, tableBits } = { mantissaBits: 23, tableBits: 11 };
const entries = 2 ** tableBits;
const bitsBelow = mantissaBits - tableBits;
const maskBelow = 2 ** bitsBelow - 1;
const exponentBias = 127;

/** ½·log10 of a power is log10 of its magnitude: of 1 to 2, one entry more than is looked up, so that there is always a next one. */
const halfLog = Float64Array.from({ length: entries + 1 }, (_, i) => 0.5 * Math.log10(1 + i / entries));
const halfLogOfTwo = 0.5 * Math.log10(2);

/** log10(|K| / max|K|) from the floor to 0. The power as float32 (24 bits: 3e-8 of log10, a level is 1e-4) shows its exponent and mantissa
 *  as bits. */
export function writeLogLevels({ re, im }: ComplexPlane, levels: Uint16Array): void {
  let largest = 0;
  for (let i = 0; i < levels.length; i++) {
    const a = re[i] as number;
    const b = im[i] as number;
    const power = a * a + b * b;
    if (power > largest) largest = power;
  }
  const factor = fullScale / -logFloor;
  const inverse = largest > 0 ? 1 / largest : 0;
  const least = 10 ** (2 * logFloor);
  const number = new Float32Array(1);
  const bits = new Uint32Array(number.buffer);
  for (let i = 0; i < levels.length; i++) {
    const a = re[i] as number;
    const b = im[i] as number;
    const power = (a * a + b * b) * inverse;
    if (!(power > least)) {
      levels[i] = 0;
      continue;
    }
    number[0] = power;
    const pattern = bits[0] as number;
    const entry = (pattern >>> bitsBelow) & (entries - 1);
    const below = halfLog[entry] as number;
    const fraction = (pattern & maskBelow) / (maskBelow + 1);
    const mantissa = below + ((halfLog[entry + 1] as number) - below) * fraction;
    const log = ((pattern >>> mantissaBits) - exponentBias) * halfLogOfTwo + mantissa;
    levels[i] = (log - logFloor) * factor + 0.5;
  }
}

const arcEntries = 1024;
const arcTangent = Float64Array.from({ length: arcEntries + 2 }, (_, i) => Math.atan(i / arcEntries));

/** The phase from −π to π, 0 where there is nothing: that of one eighth of the circle, mirrored into the others. */
export function writePhaseLevels({ re, im }: ComplexPlane, levels: Uint16Array): void {
  const factor = fullScale / (2 * Math.PI);
  for (let i = 0; i < levels.length; i++) {
    const a = re[i] as number;
    const b = im[i] as number;
    const x = Math.abs(a);
    const y = Math.abs(b);
    const larger = x > y ? x : y;
    const position = larger > 0 ? (arcEntries * (x > y ? y : x)) / larger : 0;
    const entry = position | 0;
    const below = arcTangent[entry] as number;
    let angle = below + ((arcTangent[entry + 1] as number) - below) * (position - entry);
    if (y > x) angle = Math.PI / 2 - angle;
    if (a < 0) angle = Math.PI - angle;
    levels[i] = ((b < 0 ? -angle : angle) + Math.PI) * factor + 0.5;
  }
}

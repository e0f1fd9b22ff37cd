/**
 * A complex image of its parts as scanners store them: magnitude and phase in radians, or real and imaginary part. Values come out re and im in
 * turn, float32, which is what the parts had.
 */

/** `polar`: magnitude and phase; `cartesian`: real and imaginary part. */
export type Parts = 'polar' | 'cartesian';

export function complexOf(parts: Parts, first: Float32Array, second: Float32Array): Float32Array<ArrayBuffer> {
  if (first.length !== second.length)
    throw new RangeError(`parts must have as many values as each other, got ${first.length} and ${second.length}`);
  const values = new Float32Array(2 * first.length);
  for (let i = 0; i < first.length; i++) {
    const a = first[i] as number;
    const b = second[i] as number;
    values[2 * i] = parts === 'polar' ? a * Math.cos(b) : a;
    values[2 * i + 1] = parts === 'polar' ? a * Math.sin(b) : b;
  }
  return values;
}

/** |z| of values that are re and im in turn. */
export function magnitudeOf(values: Float32Array): Float32Array<ArrayBuffer> {
  return Float32Array.from({ length: values.length / 2 }, (_, i) => Math.hypot(values[2 * i] as number, values[2 * i + 1] as number));
}

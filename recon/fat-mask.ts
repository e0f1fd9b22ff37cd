/**
 * An assumed fat mask. One magnitude image cannot tell fat from water: what is brightest is taken for fat, as it is under the skin on T1-,
 * proton-density- and fast-spin-echo T2-weighted images. Where that does not hold (fluid on T2, contrast agent, a bright coil), neither
 * do the pictures made with it. Common practice.
 */
import type { ComplexPlane } from './grid';
import { magnitude } from './grid';
import { quantity } from './parameter';
import { percentile } from './statistics';

/** Half width of the soft edge, as a part of the 99th percentile: a hard one would ring when fat is moved. */
const softness = 0.08;

export const fatThreshold = quantity({
  label: 'Taken for fat above',
  unit: 'of P99',
  min: 0.2,
  max: 1,
  step: 0.01,
  initial: 0.75,
});

/** The part of each pixel that is taken for fat, 0 to 1: a smooth step about `threshold` of the 99th percentile of the magnitude. */
export function assumedFat(object: ComplexPlane, threshold: number): Float64Array {
  const { values } = magnitude(object);
  const brightness = percentile(values, 99);
  if (brightness === 0) return values;
  return values.map((value) => {
    const part = Math.min(1, Math.max(0, (value / brightness - threshold + softness) / (2 * softness)));
    return part * part * (3 - 2 * part);
  });
}

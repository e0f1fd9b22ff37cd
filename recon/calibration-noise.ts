/**
 * Noise of a calibration of few samples: what is left of it in a map of coil sensitivity is smooth. A complex normal at each of 24 × 24
 * nodes, linear between them. Number of nodes and interpolation are common practice; between nodes the noise is a little weaker.
 */
import type { Random } from './random';
import type { ComplexArray } from './unfolding';
import { complexArray } from './unfolding';

const nNodes = 24;

/** Nodes [element, line, sample] over a picture of `nLines` × `nSamples`. */
export interface CalibrationNoise extends ComplexArray {
  readonly nElements: number;
  readonly nLines: number;
  readonly nSamples: number;
}

/** `size`: standard deviation at a node, root of the mean square of the modulus. */
export function calibrationNoise(
  { nElements, nLines, nSamples }: Pick<CalibrationNoise, 'nElements' | 'nLines' | 'nSamples'>,
  size: number,
  random: Random,
): CalibrationNoise {
  const nodes = complexArray(nElements * nNodes * nNodes);
  for (let i = 0; i < nodes.re.length; i++) {
    nodes.re[i] = size * Math.SQRT1_2 * random.normal();
    nodes.im[i] = size * Math.SQRT1_2 * random.normal();
  }
  return { ...nodes, nElements, nLines, nSamples };
}

/** Where place `index` of `n` lies between the nodes: whole part the node before it, rest how far on to the next. */
const nodePlace = (index: number, n: number): number => (n > 1 ? Math.min(nNodes - 1 - 1e-9, (index * (nNodes - 1)) / (n - 1)) : 0);

/** Adds the noise at (line, sample) to the sensitivities of all elements, which stand in `maps` from index `at` on. */
export function addCalibrationNoise(noise: CalibrationNoise, line: number, sample: number, maps: ComplexArray, at: number): void {
  const { re, im } = noise;
  const down = nodePlace(line, noise.nLines);
  const across = nodePlace(sample, noise.nSamples);
  const y = down % 1;
  const x = across % 1;
  const topLeft = (1 - y) * (1 - x);
  const topRight = (1 - y) * x;
  const left = y * (1 - x);
  const right = y * x;
  const node = Math.floor(down) * nNodes + Math.floor(across);
  for (let j = 0, i = node; j < noise.nElements; j++, i += nNodes * nNodes) {
    maps.re[at + j] =
      (maps.re[at + j] as number) +
      topLeft * (re[i] as number) +
      topRight * (re[i + 1] as number) +
      left * (re[i + nNodes] as number) +
      right * (re[i + nNodes + 1] as number);
    maps.im[at + j] =
      (maps.im[at + j] as number) +
      topLeft * (im[i] as number) +
      topRight * (im[i + 1] as number) +
      left * (im[i + nNodes] as number) +
      right * (im[i + nNodes + 1] as number);
  }
}

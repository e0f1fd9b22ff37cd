/**
 * Partial Fourier by projection onto convex sets. Each round gives the magnitude of the estimate the phase of the symmetric band,
 * I ← |I|·exp(iθ), and puts the samples that were taken back into its k-space; the missing side fills up from round to round. A short
 * side along the phase encoding, along the readout or both.
 * Source: Haacke, Lindskog, Lin, J Magn Reson 1991;92:126, doi 10.1016/0022-2364(91)90253-P.
 *
 * Where no side is short the result is the zero-filled one: lines skipped on both sides cannot be made up by conjugation.
 */
import { partialFourier } from '../causes/partial-fourier';
import { defineReconstruction } from '../cause';
import type { Encoded } from '../cause';
import { inverse, inverseAlong, transform, transformAlong } from '../fourier';
import type { ComplexPlane } from '../grid';
import { linesAlong, weightLines } from '../lines';
import type { Lines } from '../lines';
import { quantity } from '../parameter';
import { reachOf, shortfall } from '../reach';
import { giveBackPlane } from '../spare-arrays';
import { moreLines, smootherPhase } from '../partial-fourier-remedies';

/** A copy with the samples within the reach of the shorter side along `lines`, |k| < ks. */
function symmetricBand<P extends ComplexPlane>(kspace: P, lines: Lines, ks: number): P {
  const im = new Float64Array(lines.nLines);
  return weightLines(kspace, lines, { re: im.map((_, line) => (Math.abs(line - lines.centre) < ks ? 1 : 0)), im });
}

/** Divides every sample by its modulus; one that vanishes becomes 1, a phase of 0. */
function makeUnit({ re, im }: ComplexPlane): void {
  for (let i = 0; i < re.length; i++) {
    const a = re[i] as number;
    const b = im[i] as number;
    const size = Math.sqrt(a * a + b * b);
    re[i] = size > 0 ? a / size : 1;
    im[i] = size > 0 ? b / size : 0;
  }
}

/** Replaces `estimate` by |estimate|·`unit`. */
function takePhase({ re, im }: ComplexPlane, unit: ComplexPlane): void {
  for (let i = 0; i < re.length; i++) {
    const x = re[i] as number;
    const y = im[i] as number;
    const size = Math.sqrt(x * x + y * y);
    re[i] = size * (unit.re[i] as number);
    im[i] = size * (unit.im[i] as number);
  }
}

/** Replaces the samples of `estimate` that were taken by what was taken. */
function restoreTaken({ re, im }: ComplexPlane, kspace: Encoded): void {
  for (let i = 0; i < re.length; i++) {
    if (kspace.taken[i] === 0) continue;
    re[i] = kspace.re[i] as number;
    im[i] = kspace.im[i] as number;
  }
}

/** Whether each of `lines` was taken whole or not at all. */
function isTakenWhole({ taken }: Encoded, { nLines, samplesPerLine, lineStride, sampleStride }: Lines): boolean {
  for (let line = 0; line < nLines; line++) {
    const start = line * lineStride;
    for (let sample = 1; sample < samplesPerLine; sample++) if (taken[start + sample * sampleStride] !== taken[start]) return false;
  }
  return true;
}

/** The samples to go by, and the way there and back between them and the image. */
interface Rounds {
  readonly known: Encoded;
  readonly forth: (image: ComplexPlane) => ComplexPlane;
  readonly back: (samples: ComplexPlane) => ComplexPlane;
}

/** Where whole lines are missing, the transform along the lines and its inverse cancel from round to round: it is done once, and the rounds
 *  go across the lines only, in half the time. */
function roundsOf(kspace: Encoded, short: readonly Lines[]): Rounds {
  const [lines, other] = short;
  if (!lines || other || !isTakenWhole(kspace, lines)) return { known: kspace, forth: transform, back: inverse };
  const [across, along] = lines.sampleStride === 1 ? ([0, 1] as const) : ([1, 0] as const);
  return {
    known: { ...inverseAlong(kspace, along), taken: kspace.taken },
    forth: (image) => transformAlong(image, across),
    back: (samples) => inverseAlong(samples, across),
  };
}

export const pocs = defineReconstruction({
  id: 'pocs',
  title: 'POCS',
  seen: ['shading', 'signal-loss'],
  runsAlong: 'phase-encode',
  formula: String.raw`I_{j+1} = \mathcal{F}^{-1}\left\{ m K + (1 - m)\, \mathcal{F}\{ |I_j|\, e^{i\theta} \} \right\}`,
  drivers: [
    { fact: 'Partial Fourier fraction', does: 'sets how wide the symmetric band is from which the phase is known, 2f − 1 of k-space' },
    { fact: 'TE, in a gradient echo', does: 'lets the phase of the object grow, near air and metal most' },
    { fact: 'POCS rounds', does: 'sharpen the missing side; the first few do most' },
  ],
  needsObjectPhase: true,
  parameters: {
    iterations: quantity({ label: 'Iterations', unit: 'rounds', min: 1, max: 100, step: 1, initial: 10 }),
  },
  looks: {
    image:
      'Sharper with every round, and closer to the object than homodyne; dark or bright still where its phase changes within the blur of the symmetric band.',
    kspace: 'The samples that were taken stay as they are; the missing side is filled in from them.',
  },
  sources: [
    {
      citation:
        'Haacke EM, Lindskog ED, Lin W. A fast, iterative, partial-Fourier technique capable of local phase recovery. J Magn Reson 92:126',
      year: 1991,
      doi: '10.1016/0022-2364(91)90253-P',
      standing: 'confirmed',
    },
    {
      citation: 'McGibney G et al. Quantitative evaluation of several partial Fourier reconstruction algorithms. Magn Reson Med 30:51',
      year: 1993,
      standing: 'confirmed',
    },
  ],
  remedies: [
    moreLines('Take more of the missing side: 6/8, 7/8 or all lines'),
    ...smootherPhase,
    {
      change: 'More rounds',
      who: 'physicist',
      price: 'Slower reconstruction; the scan itself stays as it is',
      moves: {},
    },
  ],
  // With ten rounds hardly anything of a smooth phase is left to be seen: the swatch has fewer and fewer.
  strength: { iterations: [20, 1] },
  shownOn: { steps: [{ cause: partialFourier, strength: { fraction: [0.625, 0.625] } }] },
  reconstruct(kspace, { iterations }, { acquisition }) {
    const directions = (['phase-encode', 'readout'] as const).map((direction) => linesAlong(kspace, acquisition, direction));
    const short = directions.filter((lines) => shortfall(reachOf(kspace, lines)) > 0);
    if (short.length === 0) return inverse(kspace);
    const band = short.reduce((part, lines) => {
      const { below, above } = reachOf(kspace, lines);
      return symmetricBand(part, lines, Math.max(1, Math.min(below, above)));
    }, kspace);
    const phase = inverse(band);
    makeUnit(phase);
    const { known, forth, back } = roundsOf(kspace, short);
    let estimate = back(known);
    for (let round = 0; round < iterations; round++) {
      takePhase(estimate, phase);
      const filled = forth(estimate);
      restoreTaken(filled, known);
      giveBackPlane(estimate);
      estimate = back(filled);
      giveBackPlane(filled);
    }
    return estimate;
  },
});

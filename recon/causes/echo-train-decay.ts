/**
 * Decay along the echo train: the line of echo e is weighted W = exp(−(e − e0)·s/T2), e0 the echo of the line of zero phase encoding, so
 * that W(ky = 0) = 1 and the brightness of the image stays. In an echo-planar scan T2 stands for T2*. Bands make steps and blur the
 * image along the phase encoding, or sharpen edges where the weight rises outwards; combs make ghosts at multiples of N/E.
 *
 * Assumed: one T2 for the whole object, refocusing that is perfect, and groups of lines as in echo-train.ts.
 */
import { defineCause } from '../cause';
import type { EchoOrder } from '../echo-train';
import { echoNumbers } from '../echo-train';
import { linesOf, weightLines } from '../lines';
import { choice, quantity } from '../parameter';

export const echoTrainDecay = defineCause({
  id: 'echo-train-decay',
  title: 'Decay along the echo train',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['blur', 'ghosts', 'signal-loss'],
  runsAlong: 'phase-encode',
  phantom: 'vials',
  formula: String.raw`K'(k_x, k_y) = K(k_x, k_y)\, e^{-(e(k_y) - e(0))\, s / T_2}`,
  drivers: [
    { fact: 'Echo train length', does: 'is E; with the echo spacing it sets how long the train lasts' },
    { fact: 'Echo spacing', does: 'is s; a higher bandwidth shortens it' },
    { fact: 'T2 of the tissue', does: 'sets how much is left of the last echo: what decays fast blurs most' },
    { fact: 'Order of the phase encoding', does: 'decides which part of k-space the late echoes fill' },
  ],
  parameters: {
    echoTrainLength: quantity({
      label: 'Echo train length',
      unit: 'echoes',
      min: 1,
      max: 256,
      step: 1,
      initial: 16,
      fromHeader: {
        fact: 'Echo train length',
        read: ({ echoTrainLength }) => (echoTrainLength !== undefined && echoTrainLength > 1 ? echoTrainLength : undefined),
      },
    }),
    echoSpacing: quantity({ label: 'Echo spacing', unit: 'ms', min: 0.5, max: 20, step: 0.25, initial: 10 }),
    transverseRelaxation: quantity({ label: 'T2', unit: 'ms', min: 20, max: 2000, step: 10, initial: 80 }),
    order: choice<EchoOrder>({
      label: 'Order of the phase encoding',
      options: [
        { value: 'linear', label: 'Linear' },
        { value: 'centric', label: 'Centric' },
        { value: 'reverse', label: 'Reverse' },
        { value: 'interleaved', label: 'Interleaved' },
      ],
      initial: 'centric',
    }),
  },
  identity: { echoTrainLength: 1, echoSpacing: 10, transverseRelaxation: 80, order: 'linear' },
  looks: {
    image:
      'Blur along the phase encoding, most of all of tissue with a short T2; small objects fade. Interleaved, copies at multiples of one E-th of the field of view instead.',
    kspace: 'Lines grow dark towards one edge (linear, reverse) or both (centric), in steps; interleaved, a comb of every E-th line.',
  },
  sources: [
    {
      citation:
        'Constable RT, Gore JC. The loss of small objects in variable TE imaging: implications for FSE, RARE, and EPI. Magn Reson Med 28:9',
      year: 1992,
      standing: 'from memory',
    },
    {
      citation: 'Hennig J, Nauerth A, Friedburg H. RARE imaging: a fast imaging method for clinical MR. Magn Reson Med 3:823',
      year: 1986,
      doi: '10.1002/mrm.1910030602',
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Shorten the echo train',
      who: 'technologist',
      price: 'Longer in proportion, or fewer slices; less T2 blur also means other contrast; fewer pulses in a TR lower SAR',
      moves: { time: 'rises', contrast: 'changes', sar: 'falls' },
    },
    {
      change: 'Shorten the echo spacing with a higher bandwidth',
      who: 'technologist',
      price: 'SNR falls with the square root; gradients work harder: nerve stimulation rises, check the conditions of an implant',
      moves: { snr: 'falls', nerveStimulation: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Parallel imaging, so that fewer echoes fill k-space',
      who: 'technologist',
      price: 'Shorter; SNR falls with the square root of the factor, and by the geometry of the coil',
      moves: { time: 'falls', snr: 'falls' },
    },
    {
      change: 'Refocusing angles that vary along the train',
      who: 'physicist',
      price: 'Contrast changes; SAR falls or rises with the angles: check the conditions of an implant',
      moves: { contrast: 'changes', sar: 'changes', implantConditions: 'changes' },
    },
  ],
  apply(kspace, { echoTrainLength, echoSpacing, transverseRelaxation, order }, { acquisition }) {
    const lines = linesOf(kspace, acquisition);
    const echoes = echoNumbers(kspace, lines, echoTrainLength, order);
    const atCentre = Math.max(0, echoes[lines.centre] as number);
    const re = Float64Array.from(echoes, (echo) => (echo < 0 ? 0 : Math.exp((-(echo - atCentre) * echoSpacing) / transverseRelaxation)));
    return weightLines(kspace, lines, { re, im: new Float64Array(lines.nLines) });
  },
});

/**
 * The half-field ghost of echo-planar imaging (N/2, Nyquist ghost): echoes read forwards and backwards differ in phase, in place and in
 * size. In the hybrid domain, image along the readout x and k-space along n,
 *   H'(x, n) = H(x, n)·(1 + s_n·ε/2)·exp(i·s_n·Φ(x)),  Φ(x) = φ0 + 2πψ·x/Nx,  s_n = ±1 by turns,
 * so that I'(x, y) = cosΦ·I(x, y) + i·sinΦ·I(x, y − N/2): parent cosΦ, ghost sinΦ half a field of view away, and ε/2 from the sizes.
 * With S shots the sign lasts for S lines, and ghosts lie at odd multiples of N/(2S), 1/(S·sin(πm/2S)) as strong.
 *
 * n counts lines that are taken: with acceleration R the ghost lies half of the reduced field away. Shots are assumed to start with the
 * same polarity.
 */
import { phaseEncodeAxis } from '../acquisition';
import { defineCause } from '../cause';
import type { Encoded } from '../cause';
import { inverseAlong, transformAlong } from '../fourier';
import { linesOf, takenOrder, weightLines } from '../lines';
import type { Lines } from '../lines';
import { quantity } from '../parameter';

/** ±1 for every line: the direction in which it is read; 0 where it is not taken. */
function polarities(kspace: Encoded, lines: Lines, nShots: number): Int32Array {
  return takenOrder(kspace, lines).map((n) => (n < 0 ? 0 : Math.floor(n / nShots) % 2 === 0 ? 1 : -1));
}

/** Multiplies line n of a hybrid plane by exp(i·s_n·slope·x), x from the centre of the readout. */
function shiftEchoes({ re, im }: Encoded, lines: Lines, polarity: Int32Array, slope: number): void {
  const centre = Math.floor(lines.samplesPerLine / 2);
  for (let sample = 0; sample < lines.samplesPerLine; sample++) {
    const cosine = Math.cos(slope * (sample - centre));
    const sine = Math.sin(slope * (sample - centre));
    for (let line = 0; line < lines.nLines; line++) {
      const i = line * lines.lineStride + sample * lines.sampleStride;
      const s = sine * (polarity[line] as number);
      const a = re[i] as number;
      const b = im[i] as number;
      re[i] = a * cosine - b * s;
      im[i] = a * s + b * cosine;
    }
  }
}

/** Samples that are not taken stay zero: a transform along the readout leaves rounding in a line of which a part is not taken. */
function keepTaken({ re, im, taken }: Encoded): void {
  for (let i = 0; i < taken.length; i++) {
    if (taken[i] === 1) continue;
    re[i] = 0;
    im[i] = 0;
  }
}

export const halfFieldGhost = defineCause({
  id: 'half-field-ghost',
  title: 'Half-field ghost',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['ghosts'],
  runsAlong: 'phase-encode',
  formula: String.raw`I'(x, y) = \cos\Phi(x)\, I(x, y) + i \sin\Phi(x)\, I(x, y - N/2),\quad \Phi(x) = \varphi_0 + 2\pi \psi x / N_x`,
  drivers: [
    { fact: 'Echo-planar readout', does: 'reads every other echo backwards; other sequences do not have this ghost' },
    { fact: 'Number of shots', does: 'brings the ghosts closer: odd multiples of 1/(2 × shots) of the field of view' },
    { fact: 'Readout gradient and its delays', does: 'set the shift of the echoes, and the phase that grows along the readout' },
    { fact: 'Acceleration', does: 'divides the distance of the ghost by R' },
  ],
  needsObjectPhase: true,
  parameters: {
    phase: quantity({ label: 'Constant phase', unit: 'rad', min: 0, max: 0.8, step: 0.01, initial: 0.15 }),
    shift: quantity({ label: 'Echo shift', unit: 'samples', min: 0, max: 1, step: 0.01, initial: 0 }),
    imbalance: quantity({ label: 'Difference in amplitude', unit: 'of mean', min: 0, max: 0.3, step: 0.01, initial: 0 }),
    shots: quantity({ label: 'Shots', unit: 'shots', min: 1, max: 16, step: 1, initial: 1 }),
  },
  identity: { phase: 0, shift: 0, imbalance: 0, shots: 1 },
  looks: {
    image:
      'A copy of the object displaced by half the field of view along the phase encoding, with dark and bright fringes where it overlaps; with an echo shift the copy is empty along the middle and strong at both sides.',
    kspace:
      'In raw data the phase, and with a shift the place of the echo, alternate from line to line. The k-space of a magnitude image does not show it as such, and no correction can be found from it: that takes complex data.',
  },
  sources: [
    {
      citation: 'Buonocore MH, Gao L. Ghost artifact reduction for echo planar imaging using image phase correction. Magn Reson Med 38:89',
      year: 1997,
      standing: 'confirmed',
    },
    {
      citation: 'Buonocore MH, Zhu DC. High spatial resolution EPI using an odd number of interleaves. Magn Reson Med 41:1199',
      year: 1999,
      standing: 'confirmed',
    },
    {
      citation: 'Hu X, Le TH. Artifact reduction in EPI with phase-encoded reference scan. Magn Reson Med 36:166',
      year: 1996,
      standing: 'confirmed',
    },
    {
      citation: 'Bruder H et al. Image reconstruction for echo planar imaging. Magn Reson Med 23:311',
      year: 1992,
      doi: '10.1002/mrm.1910230211',
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Run the scan again, so that its reference for the phase correction is taken anew',
      who: 'technologist',
      price: 'Seconds to a minute',
      moves: { time: 'once' },
    },
    {
      change: 'Shim again over the region; patient and coil must have settled',
      who: 'technologist',
      price: 'Seconds to a minute',
      moves: { time: 'once' },
    },
    {
      change: 'Fat saturation, so that the ghost of fat is not on the organ',
      who: 'technologist',
      price: 'More RF and a longer minimum TR: SAR rises, check the conditions of an implant',
      moves: { time: 'rises', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Turn an oblique slice onto the axes of the gradients',
      who: 'technologist',
      price: 'Another plane than was asked for; other gradients work hardest: check nerve stimulation and the conditions of an implant',
      moves: { nerveStimulation: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Lower bandwidth along the readout',
      who: 'technologist',
      price:
        'More distortion along the phase encoding, longer TE and other contrast; SNR rises with the square root; gradients switch less hard: nerve stimulation falls',
      moves: { snr: 'rises', contrast: 'changes', nerveStimulation: 'falls' },
    },
    {
      change: 'Measure the ghost level on a phantom and hold it against the last check',
      who: 'physicist',
      price: 'Minutes on the scanner',
      moves: { time: 'once' },
    },
    {
      change: 'Calibrate gradient delays and eddy-current compensation',
      who: 'licensed service',
      price: 'Hours to days in which the scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { phase, shift, imbalance, shots }, { acquisition }) {
    const lines = linesOf(kspace, acquisition);
    const polarity = polarities(kspace, lines, shots);
    const weight = {
      re: Float64Array.from(polarity, (s) => (1 + (s * imbalance) / 2) * Math.cos(phase)),
      im: Float64Array.from(polarity, (s) => (1 + (s * imbalance) / 2) * s * Math.sin(phase)),
    };
    const weighted = weightLines(kspace, lines, weight);
    if (shift === 0) return weighted;
    const readout = phaseEncodeAxis(acquisition.phaseEncode) === 0 ? 1 : 0;
    const hybrid = { ...inverseAlong(weighted, readout), taken: kspace.taken.slice() };
    shiftEchoes(hybrid, lines, polarity, (2 * Math.PI * shift) / lines.samplesPerLine);
    const shifted = { ...transformAlong(hybrid, readout), taken: hybrid.taken };
    keepTaken(shifted);
    return shifted;
  },
});

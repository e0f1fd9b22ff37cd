/**
 * Periodic motion as a phase error of each line, K'(n) = K(n)·exp(i·a·sin(2π·f·T·n + φ)), T = TR · averages: through-plane motion or
 * flow that comes round with frequency f. By Jacobi–Anger the ghost of order j has amplitude J_j(a) and lies
 * j·frac(T·f) of the phase field of view away, whatever the matrix.
 *
 * Assumed: one line each T, in order from one edge of k-space to the other; averages are the inner loop and a is the swing that
 * is left after averaging. n counts lines that are taken, so that skipped lines take no time and the ghost then moves by
 * frac(T·f)/R. Where the header gives no TR, 500 ms is assumed; where it gives no averages, one.
 */
import type { Acquisition } from '../acquisition';
import { defineCause } from '../cause';
import { linesOf, takenLines, weightLines } from '../lines';
import { quantity } from '../parameter';

const assumedRepetitionTime = 0.5;

/** Seconds from one line to the next. */
export const lineInterval = ({ repetitionTime, averages }: Acquisition): number =>
  (repetitionTime ?? assumedRepetitionTime) * (averages ?? 1);

export const periodicMotion = defineCause({
  id: 'periodic-motion',
  title: 'Periodic motion',
  stage: 'object',
  domain: 'kspace',
  seen: ['ghosts'],
  runsAlong: 'phase-encode',
  formula: String.raw`K'(k_x, n) = K(k_x, n)\, e^{\,i a \sin(2\pi f T n + \varphi)},\quad T = T_R \, N_{\mathrm{avg}}`,
  drivers: [
    { fact: 'TR × averages', does: 'sets how far apart the copies lie: frac(TR × averages × frequency) of the phase field of view' },
    { fact: 'Phase-encode axis', does: 'sets the direction in which the copies run' },
    { fact: 'Acceleration', does: 'divides the distance of the copies by R' },
  ],
  parameters: {
    frequency: quantity({ label: 'Frequency', unit: 'Hz', min: 0.05, max: 3, step: 0.005, initial: 0.25 }),
    phaseSwing: quantity({ label: 'Phase swing', unit: 'rad', min: 0, max: 2, step: 0.01, initial: 0.6 }),
    start: quantity({ label: 'Start of cycle', unit: '°', min: 0, max: 360, step: 1, initial: 0 }),
  },
  identity: { frequency: 0.25, phaseSwing: 0, start: 0 },
  looks: {
    image:
      'Faint copies of the whole object along the phase encoding, whatever way the motion goes, at equal steps of frac(TR × averages × frequency) of the field of view. Where the header has no TR, 500 ms is assumed.',
    kspace:
      'The phase swings from line to line with the period of the motion; the magnitude stays. The k-space of the magnitude image shows faint bands across the phase encoding instead.',
  },
  sources: [
    { citation: 'Wood ML, Henkelman RM. MR image artifacts from periodic motion. Med Phys 12:143', year: 1985, standing: 'confirmed' },
    {
      citation: 'Wood ML, Henkelman RM. Suppression of respiratory motion artifacts in magnetic resonance imaging. Med Phys 13:794',
      year: 1986,
      doi: '10.1118/1.595851',
      standing: 'confirmed',
    },
    {
      citation: 'Haacke EM, Patrick JL. Reducing motion artifacts in two-dimensional Fourier transform imaging. Magn Reson Imaging 4:359',
      year: 1986,
      standing: 'from memory',
    },
  ],
  remedies: [
    {
      change: 'Breath-hold, or coach quiet breathing with a belt',
      who: 'technologist',
      price: 'The scan must fit one breath; the patient must be able to',
    },
    {
      change: 'Trigger or gate on breathing or pulse, or use a navigator',
      who: 'technologist',
      price: 'Longer, often twice; TR follows the patient, and contrast with it',
    },
    {
      change: 'Saturation band over the moving tissue, or fat saturation',
      who: 'technologist',
      price: 'More RF (SAR rises) and a longer minimum TR',
    },
    {
      change: 'Flow compensation',
      who: 'technologist',
      price: 'Longer shortest TE; gradients switch harder: nerve stimulation and the conditions of an implant',
    },
    { change: 'More averages', who: 'technologist', price: 'Longer in proportion; SNR rises with the square root' },
    {
      change: 'Swap phase and frequency encoding: the ghosts then run the other way, clear of the organ',
      who: 'technologist',
      price: 'Wrap-around turns with them; oversample if the long side is now phase encoded',
    },
    { change: 'Change TR so that the ghost falls outside the organ', who: 'physicist', price: 'Contrast changes with TR' },
  ],
  apply(kspace, { frequency: f, phaseSwing: a, start }, { acquisition }) {
    const lines = linesOf(kspace, acquisition);
    const taken = takenLines(kspace, lines);
    const T = lineInterval(acquisition);
    const phi = (start * Math.PI) / 180;
    const weight = { re: new Float64Array(lines.nLines).fill(1), im: new Float64Array(lines.nLines) };
    let n = 0;
    for (let line = 0; line < lines.nLines; line++) {
      if (!taken[line]) continue;
      const phase = a * Math.sin(2 * Math.PI * f * T * n + phi);
      weight.re[line] = Math.cos(phase);
      weight.im[line] = Math.sin(phase);
      n++;
    }
    return weightLines(kspace, lines, weight);
  },
});

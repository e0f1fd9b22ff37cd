/**
 * Phase errors from line to line, K'(n) = K(n)·exp(iε_n), with
 *   ε_n = σ·g_n + a·sin(2πf·T·n) + D·n/N + B·(2n/N − 1)²,
 * g_n normal: instability (the energy 1 − exp(−σ²) goes into a haze); f the mains: ghosts at frac(T·f) of the field of view; D a drift of
 * the frequency over the scan (the image moves by −D/2π pixels); B its bend (blur). T = TR · averages, n counts taken lines.
 */
import { defineCause } from '../cause';
import { linesOf, takenOrder, weightLines } from '../lines';
import { choice, quantity } from '../parameter';
import { lineInterval } from '../line-timing';

export const linePhaseErrors = defineCause({
  id: 'line-phase-errors',
  title: 'Phase errors from line to line',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['ghosts', 'noise', 'blur'],
  runsAlong: 'phase-encode',
  formula: String.raw`K'(k_x, n) = K(k_x, n)\, e^{\,i\varepsilon_n},\quad \varepsilon_n = \sigma g_n + a \sin(2\pi f T n) + D\, n/N + B\,(2n/N - 1)^2`,
  drivers: [
    { fact: 'TR × averages', does: 'sets where ghosts of the mains lie: frac(TR × averages × 50 or 60 Hz) of the field of view' },
    { fact: 'TE', does: 'multiplies every error of the frequency: a gradient echo at long TE shows it first' },
    { fact: 'Phase-encode axis', does: 'sets the direction of haze, ghosts and blur' },
  ],
  parameters: {
    instability: quantity({ label: 'Random, standard deviation', unit: 'rad', min: 0, max: 1, step: 0.01, initial: 0.2 }),
    hum: quantity({ label: 'Mains hum', unit: 'rad', min: 0, max: 1, step: 0.01, initial: 0 }),
    mains: choice<'50' | '60'>({
      label: 'Mains frequency',
      options: [
        { value: '50', label: '50 Hz' },
        { value: '60', label: '60 Hz' },
      ],
      initial: '50',
    }),
    drift: quantity({ label: 'Drift over the scan', unit: 'rad', min: -20, max: 20, step: 0.1, initial: 0 }),
    bend: quantity({ label: 'Bend of the drift', unit: 'rad', min: -10, max: 10, step: 0.1, initial: 0 }),
  },
  identity: { instability: 0, hum: 0, mains: '50', drift: 0, bend: 0 },
  looks: {
    image:
      'Random errors: a haze along the phase encoding beside everything bright. Mains hum: faint copies at a fixed distance that moves with TR. Drift: the image is displaced; bent, blurred along the phase encoding. Where the header has no TR, 500 ms is assumed.',
    kspace: 'The phase jumps or runs from line to line; the magnitude stays. The k-space of a magnitude image shows little of it.',
  },
  sources: [
    {
      citation: 'Henkelman RM, Bronskill MJ. Artifacts in magnetic resonance imaging. Rev Magn Reson Med 2:1',
      year: 1987,
      standing: 'from memory',
    },
    {
      citation: 'Wood ML, Henkelman RM. MR image artifacts from periodic motion. Med Phys 12:143 (where ghosts of a period fall)',
      year: 1985,
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Repeat the scan, then on a phantom: an instability stays without a patient',
      who: 'technologist',
      price: 'Minutes on the scanner',
      moves: { time: 'once' },
    },
    {
      change: 'Trigger the scan to the mains, or choose TR a whole number of its periods',
      who: 'technologist',
      price: 'TR in steps of 20 ms (50 Hz) or 16.7 ms (60 Hz): a little longer or shorter, and contrast with it',
      moves: { time: 'changes', contrast: 'changes' },
    },
    {
      change: 'Shorten TE, or take a spin echo',
      who: 'technologist',
      price: 'Other contrast; a refocusing pulse raises SAR: check the conditions of an implant; SNR rises with a shorter TE',
      moves: { snr: 'rises', contrast: 'changes', sar: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Track the frequency over half an hour on a phantom, with heavy gradients before: drift shows as a slope',
      who: 'physicist',
      price: 'An hour on the scanner',
      moves: { time: 'once' },
    },
    {
      change:
        'Check gradient amplifiers, frequency synthesiser and eddy-current compensation; try with the cold head off for a few minutes',
      who: 'licensed service',
      price: 'Hours in which the scanner is out of use; helium is not to be put at risk',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { instability, hum, mains, drift, bend }, { acquisition, random }) {
    const lines = linesOf(kspace, acquisition);
    const order = takenOrder(kspace, lines);
    const N = order.reduce((count, n) => count + (n >= 0 ? 1 : 0), 0);
    const step = 2 * Math.PI * Number(mains) * lineInterval(acquisition);
    const weight = { re: new Float64Array(lines.nLines), im: new Float64Array(lines.nLines) };
    for (let line = 0; line < lines.nLines; line++) {
      const n = order[line] as number;
      if (n < 0) continue;
      const along = n / N;
      const error = instability * random.normal() + hum * Math.sin(step * n) + drift * along + bend * (2 * along - 1) ** 2;
      weight.re[line] = Math.cos(error);
      weight.im[line] = Math.sin(error);
    }
    return weightLines(kspace, lines, weight);
  },
});

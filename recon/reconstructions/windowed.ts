/**
 * Filters of k-space against ringing: every sample times W(r), r = |k|/kmax, kmax the edge of what was taken along each axis, W(0) = 1.
 *   Hamming 0.54 + 0.46 cos πr · Hann ½ + ½ cos πr · Tukey 1 up to 1 − a, then ½ + ½ cos(π(r − 1 + a)/a): axis by axis;
 *   Fermi 1/(1 + exp((r − r0)/w)) over W(0): of the radius in the plane.
 * Sources: Harris, Proc IEEE 1978;66:51 (windows); Bernstein, King, Zhou, Handbook of MRI Pulse Sequences 2004 (Fermi).
 */
import { truncation } from '../causes/truncation';
import type { Context, Encoded } from '../cause';
import { defineReconstruction } from '../cause';
import { inverse } from '../fourier';
import { linesAlong } from '../lines';
import type { Lines } from '../lines';
import { choice, quantity } from '../parameter';
import { reachOf } from '../reach';

const windows = {
  hamming: (r: number) => 0.54 + 0.46 * Math.cos(Math.PI * r),
  hann: (r: number) => 0.5 + 0.5 * Math.cos(Math.PI * r),
  tukey: (r: number, a: number) => (r <= 1 - a ? 1 : 0.5 + 0.5 * Math.cos((Math.PI * (r - 1 + a)) / a)),
};

type WindowName = keyof typeof windows | 'fermi';

/** |k|/kmax of every line. kmax is where the first line that is not taken would lie, so that r < 1 but for the line −N/2. */
function radii(kspace: Encoded, lines: Lines): Float64Array {
  const { below, above } = reachOf(kspace, lines);
  const kmax = Math.max(below, above + 1);
  return Float64Array.from({ length: lines.nLines }, (_, line) => Math.min(1, Math.abs(line - lines.centre) / kmax));
}

/** A copy of `kspace` times W of the two radii of each sample. */
function weighted(kspace: Encoded, { acquisition }: Context, weight: (rLine: number, rSample: number) => number): Encoded {
  const lines = linesAlong(kspace, acquisition, 'phase-encode');
  const rLines = radii(kspace, lines);
  const rSamples = radii(kspace, linesAlong(kspace, acquisition, 'readout'));
  const re = new Float64Array(kspace.re.length);
  const im = new Float64Array(kspace.im.length);
  for (let line = 0; line < lines.nLines; line++) {
    for (let sample = 0; sample < lines.samplesPerLine; sample++) {
      const i = line * lines.lineStride + sample * lines.sampleStride;
      const w = weight(rLines[line] as number, rSamples[sample] as number);
      re[i] = w * (kspace.re[i] as number);
      im[i] = w * (kspace.im[i] as number);
    }
  }
  return { ...kspace, re, im };
}

export const windowed = defineReconstruction({
  id: 'windowed',
  title: 'Filtered',
  seen: ['blur'],
  runsAlong: 'both',
  formula: String.raw`K' = W(r)\, K,\quad r = |k| / k_{\max};\quad W_{\text{Tukey}}(r) = \tfrac12 + \tfrac12 \cos\frac{\pi (r - 1 + a)}{a} \text{ for } r > 1 - a`,
  drivers: [
    { fact: 'Acquired matrix', does: 'sets how wide the ringing is that the filter damps, and the blur that it adds' },
    { fact: 'k-space filtering', does: 'in the header says that one was used, seldom which' },
  ],
  parameters: {
    window: choice<WindowName>({
      label: 'Window',
      options: [
        { value: 'hamming', label: 'Hamming' },
        { value: 'hann', label: 'Hann' },
        { value: 'tukey', label: 'Tukey' },
        { value: 'fermi', label: 'Fermi' },
      ],
      initial: 'hamming',
    }),
    taper: quantity({ label: 'Taper', unit: 'of k max', min: 0, max: 1, step: 0.05, initial: 0.5, when: { window: ['tukey'] } }),
    radius: quantity({ label: 'Radius', unit: 'of k max', min: 0.3, max: 1.2, step: 0.05, initial: 0.9, when: { window: ['fermi'] } }),
    width: quantity({ label: 'Width', unit: 'of k max', min: 0.01, max: 0.3, step: 0.01, initial: 0.05, when: { window: ['fermi'] } }),
  },
  identity: { window: 'tukey', taper: 0, radius: 0.9, width: 0.05 },
  looks: {
    image: 'Less ringing and less grain, paid for with blur: edges up to twice as wide.',
    kspace: 'Fades towards the edge of what was taken instead of breaking off.',
  },
  sources: [
    {
      citation:
        'Bernstein MA, Fain SB, Riederer SJ. Effect of windowing and zero-filled reconstruction of MRI data on spatial resolution and acquisition strategy. J Magn Reson Imaging 14:270',
      year: 2001,
      doi: '10.1002/jmri.1183',
      standing: 'confirmed',
    },
    {
      citation: 'Harris FJ. On the use of windows for harmonic analysis with the discrete Fourier transform. Proc IEEE 66:51',
      year: 1978,
      doi: '10.1109/PROC.1978.10837',
      standing: 'confirmed',
    },
    { citation: 'Bernstein MA, King KF, Zhou XJ. Handbook of MRI Pulse Sequences', year: 2004, standing: 'confirmed' },
  ],
  remedies: [
    {
      change: 'A weaker filter, or none',
      who: 'technologist',
      price: 'Ringing comes back, and more noise',
      moves: { snr: 'falls' },
    },
    {
      change: 'Take more lines, so that ringing is narrow and needs no strong filter',
      who: 'technologist',
      price: 'Longer in proportion; SNR of a pixel falls',
      moves: { time: 'rises', snr: 'falls' },
    },
    {
      change: 'Hold filtered and unfiltered pictures of a phantom against each other, and choose the filter of the protocol',
      who: 'physicist',
      price: 'Half an hour of scanner time',
      moves: { time: 'once' },
    },
  ],
  shownOn: { steps: [{ cause: truncation }], parameters: { window: 'tukey' } },
  reconstruct(kspace, { window, taper, radius, width }, context) {
    if (window === 'fermi') {
      const fermi = (r: number): number => 1 / (1 + Math.exp((r - radius) / width));
      const atCentre = fermi(0);
      return inverse(weighted(kspace, context, (ky, kx) => fermi(Math.sqrt(ky * ky + kx * kx)) / atCentre));
    }
    const along = windows[window];
    return inverse(weighted(kspace, context, (ky, kx) => along(ky, taper) * along(kx, taper)));
  },
});

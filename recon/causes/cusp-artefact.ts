/**
 * Cusp artefact of fast spin echo: far from the centre of the magnet the field no longer rises with the gradient but turns, so that
 * tissue out there has the frequencies of the middle of the picture and folds into it. At the turn x0 many places share one frequency:
 * the signal piles up as a caustic, ∝ 1/√(x0 − x) on one side of x0. Every echo refocuses it with a phase of its own, which spreads the
 * spot along the phase encoding: by about E pixels in bands, into dots N/E apart in combs.
 *
 * Added to k-space: A · X(kx) · exp(−i2π·ky·y0/N) · exp(iθ_e). A is relative to the brightness of the object (its 99th percentile): the
 * peak of the spot before it is spread. The phases θ_e are drawn evenly; how they come about in a real train is not modelled.
 */
import { defineCause } from '../cause';
import type { Encoded } from '../cause';
import type { EchoOrder } from '../echo-train';
import { echoNumbers } from '../echo-train';
import { objectLevel } from '../levels';
import { linesOf } from '../lines';
import type { Lines } from '../lines';
import { choice, quantity } from '../parameter';
import type { Random } from '../random';

interface Samples {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** ∫ du/(2√u) over pixel j of the tail, from the turn outwards: 1, √2 − 1, √3 − √2 … */
const caustic = (tail: number): Float64Array => Float64Array.from({ length: tail }, (_, j) => Math.sqrt(j + 1) - Math.sqrt(j));

/** Σ_j profile_j · exp(−i2πk(x0 − j)/N) over √N for every k: the orthonormal transform of a profile that falls off from x0 downwards. */
function transformOfTail(profile: Float64Array, x0: number, nSamples: number): Samples {
  const re = new Float64Array(nSamples);
  const im = new Float64Array(nSamples);
  for (let sample = 0; sample < nSamples; sample++) {
    const k = sample - Math.floor(nSamples / 2);
    profile.forEach((value, j) => {
      const angle = (-2 * Math.PI * k * (x0 - j)) / nSamples;
      re[sample] = (re[sample] as number) + (value * Math.cos(angle)) / Math.sqrt(nSamples);
      im[sample] = (im[sample] as number) + (value * Math.sin(angle)) / Math.sqrt(nSamples);
    });
  }
  return { re, im };
}

/** exp(−i2π·ky·y0/N + iθ_e)/√N for every line; 0 where it is not taken. */
function spreadPoint(echoes: Int32Array, { nLines, centre }: Lines, y0: number, random: Random): Samples {
  const nEchoes = echoes.reduce((most, echo) => Math.max(most, echo + 1), 1);
  const phases = Float64Array.from({ length: nEchoes }, () => 2 * Math.PI * random.uniform());
  const re = new Float64Array(nLines);
  const im = new Float64Array(nLines);
  echoes.forEach((echo, line) => {
    if (echo < 0) return;
    const angle = (phases[echo] as number) - (2 * Math.PI * (line - centre) * y0) / nLines;
    re[line] = Math.cos(angle) / Math.sqrt(nLines);
    im[line] = Math.sin(angle) / Math.sqrt(nLines);
  });
  return { re, im };
}

/** kspace + a · Y(ky) · X(kx) where samples are taken. */
function withProduct(kspace: Encoded, lines: Lines, alongLines: Samples, alongSamples: Samples, a: number): Encoded {
  const re = kspace.re.slice();
  const im = kspace.im.slice();
  for (let line = 0; line < lines.nLines; line++) {
    const yr = a * (alongLines.re[line] as number);
    const yi = a * (alongLines.im[line] as number);
    for (let sample = 0; sample < lines.samplesPerLine; sample++) {
      const i = line * lines.lineStride + sample * lines.sampleStride;
      if (kspace.taken[i] === 0) continue;
      const xr = alongSamples.re[sample] as number;
      const xi = alongSamples.im[sample] as number;
      re[i] = (re[i] as number) + yr * xr - yi * xi;
      im[i] = (im[i] as number) + yr * xi + yi * xr;
    }
  }
  return { ...kspace, re, im };
}

export const cuspArtefact = defineCause({
  id: 'cusp-artefact',
  title: 'Cusp artefact',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['lines', 'fold-in'],
  runsAlong: 'phase-encode',
  formula: String.raw`K' = K + A\, X(k_x)\, e^{-i 2\pi k_y y_0 / N}\, e^{\,i\theta_{e(k_y)}},\quad x\text{-profile} \propto \frac{1}{\sqrt{x_0 - x}}`,
  drivers: [
    { fact: 'Echo train', does: 'gives the spot a new phase with every echo and spreads it along the phase encoding' },
    { fact: 'Slice orientation', does: 'shows it in sagittal and coronal slices, whose plane reaches the end of the gradient coil' },
    { fact: 'Coil elements', does: 'let it in where one sees the far tissue' },
  ],
  parameters: {
    strength: quantity({ label: 'Strength', unit: '× object', min: 0, max: 20, step: 0.1, initial: 4 }),
    readoutPlace: quantity({ label: 'Place along the readout', unit: 'of FOV', min: -0.5, max: 0.49, step: 0.01, initial: 0.05 }),
    phasePlace: quantity({ label: 'Place along the phase encoding', unit: 'of FOV', min: -0.5, max: 0.49, step: 0.01, initial: 0 }),
    tail: quantity({ label: 'Tail along the readout', unit: 'px', min: 1, max: 32, step: 1, initial: 6 }),
    echoTrainLength: quantity({
      label: 'Echo train length',
      unit: 'echoes',
      min: 1,
      max: 64,
      step: 1,
      initial: 16,
      fromHeader: { fact: 'Echo train length', read: ({ echoTrainLength }) => echoTrainLength },
    }),
    order: choice<EchoOrder>({
      label: 'Order of the phase encoding',
      options: [
        { value: 'linear', label: 'Linear' },
        { value: 'centric', label: 'Centric' },
        { value: 'reverse', label: 'Reverse' },
        { value: 'interleaved', label: 'Interleaved' },
      ],
      initial: 'linear',
    }),
  },
  identity: { strength: 0, readoutPlace: 0, phasePlace: 0, tail: 1, echoTrainLength: 1, order: 'linear' },
  looks: {
    image:
      'A bright spot, a feather or a row of dots along the phase encoding, narrow along the readout, mostly near the middle of a sagittal or coronal fast spin echo; it is there in air as well.',
    kspace: 'A faint wave over the whole plane, whose phase jumps from echo to echo; seen, if at all, in the outer parts.',
  },
  sources: [
    {
      citation: 'Rangwala NA, Zhou XJ. Reduction of fast spin echo cusp artifact using a slice-tilting gradient. Magn Reson Med 64:220',
      year: 2010,
      standing: 'confirmed',
    },
    {
      citation:
        'Kim JK et al. The FSE cusp artifact: a phase wrap-in artifact seen on routine clinical MR images of the knee. Clin Imaging 23:31',
      year: 1999,
      standing: 'from memory',
    },
  ],
  remedies: [
    {
      change: 'Switch off coil elements that reach beyond the anatomy, or seat the coil so that they do not',
      who: 'technologist',
      price: 'A minute at the table; signal falls at the edge of the coil',
      moves: { time: 'once', snr: 'falls' },
    },
    {
      change: 'Swap phase and frequency encoding: the streak turns and may leave the organ',
      who: 'technologist',
      price:
        'Motion ghosts and wrap-around turn with it: oversample, which takes longer, if the long side is now phase encoded; other gradients work hardest: check nerve stimulation and the conditions of an implant',
      moves: { time: 'changes', nerveStimulation: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Change the field of view or oversample along the phase encoding, so that the spot folds elsewhere',
      who: 'technologist',
      price: 'Longer, or coarser pixels; SNR rises with either',
      moves: { time: 'changes', snr: 'rises' },
    },
    {
      change: 'Saturation band over the far tissue, or a screening cloth where the site has an approved one',
      who: 'technologist',
      price:
        'More RF and a longer minimum TR: SAR rises, check the conditions of an implant; a cloth may heat if it is damaged: follow the local rule',
      moves: { time: 'rises', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Tilt the excited slice against the refocused one, where the sequence offers it',
      who: 'physicist',
      price: 'A little SNR: less of the slice is refocused',
      moves: { snr: 'falls' },
    },
  ],
  apply(kspace, { strength, readoutPlace, phasePlace, tail, echoTrainLength, order }, { acquisition, random }) {
    const lines = linesOf(kspace, acquisition);
    const echoes = echoNumbers(kspace, lines, echoTrainLength, order);
    const x0 = Math.round(readoutPlace * lines.samplesPerLine);
    const y0 = Math.round(phasePlace * lines.nLines);
    const amplitude = strength * objectLevel(kspace).percentile99;
    const alongSamples = transformOfTail(caustic(tail), x0, lines.samplesPerLine);
    return withProduct(kspace, lines, spreadPoint(echoes, lines, y0, random), alongSamples, amplitude);
  },
});

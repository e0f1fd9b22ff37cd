/**
 * A radio signal that reaches the receiver, Δf off the centre frequency: on every line of the readout
 *   K'(kx, n) = K + A·exp(i(φ_n − 2π·kx·x0/N)),   x0 = Δf/BW pixels from the centre; beyond the field of view it folds.
 * Out of step with the sequence φ_n is random: a line along the phase encoding at x0. In step φ_n = n·δ: a dot, at −N·δ/2π along the
 * phase encoding. Drift moves Δf evenly over the scan; a bandwidth lets the phase walk from sample to sample, by 2π·B/(N·BW) rad² each, to
 * a Lorentzian of full width B. n counts lines that are taken: skipped lines take no time. Where the header gives no bandwidth, 200 Hz a
 * pixel is assumed.
 *
 * Free induction of an imperfect refocusing pulse is not phase encoded: the same signal on each line, here the centre line of k-space as
 * it decays from the first sample of the readout. It draws a line along the readout, in the middle, or N·δ/2π from it where the RF phase
 * steps by δ. A is such that the root mean square of the line is a multiple of the object's 99th percentile; a dot is √N brighter.
 */
import type { Encoded } from '../cause';
import { defineCause } from '../cause';
import { objectLevel } from '../levels';
import type { Lines } from '../lines';
import { linesOf, takenLines } from '../lines';
import { choice, quantity } from '../parameter';
import type { Random } from '../random';
import { fromDegrees, fromPercent } from '../units';

const assumedBandwidthPerPixel = 200;

/** The samples of one readout. */
interface Readout {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** exp(−i2π·kx·x0/N), kx from −floor(N/2); `walk` is the variance of the phase step from sample to sample, rad². */
function tone(n: number, x0: number, walk: number, random: Random): Readout {
  const signal = { re: new Float64Array(n), im: new Float64Array(n) };
  const turn = (-2 * Math.PI * x0) / n;
  let [re, im] = [Math.cos(turn * Math.floor(n / 2)), -Math.sin(turn * Math.floor(n / 2))];
  let [stepRe, stepIm] = [Math.cos(turn), Math.sin(turn)];
  for (let i = 0; i < n; i++) {
    signal.re[i] = re;
    signal.im[i] = im;
    if (walk > 0) {
      const step = turn + Math.sqrt(walk) * random.normal();
      stepRe = Math.cos(step);
      stepIm = Math.sin(step);
    }
    const before = re;
    re = before * stepRe - im * stepIm;
    im = before * stepIm + im * stepRe;
  }
  return signal;
}

/** The centre line as it would be read from its middle on, zero where it ends; root mean square 1, or nothing where there is none. */
function freeInduction(kspace: Encoded, lines: Lines): Readout {
  const n = lines.samplesPerLine;
  const signal = { re: new Float64Array(n), im: new Float64Array(n) };
  let power = 0;
  for (let i = 0; i + Math.floor(n / 2) < n; i++) {
    const from = lines.centre * lines.lineStride + (i + Math.floor(n / 2)) * lines.sampleStride;
    const a = kspace.re[from] as number;
    const b = kspace.im[from] as number;
    signal.re[i] = a;
    signal.im[i] = b;
    power += a * a + b * b;
  }
  const scale = power > 0 ? Math.sqrt(n / power) : 0;
  return { re: signal.re.map((value) => value * scale), im: signal.im.map((value) => value * scale) };
}

/** Adds amplitude·exp(iφ)·signal to the taken samples of a line. */
function addToLine(kspace: Encoded, lines: Lines, line: number, signal: Readout, amplitude: number, phase: number): void {
  const [re, im] = [amplitude * Math.cos(phase), amplitude * Math.sin(phase)];
  for (let sample = 0; sample < lines.samplesPerLine; sample++) {
    const i = line * lines.lineStride + sample * lines.sampleStride;
    if (kspace.taken[i] === 0) continue;
    const a = signal.re[sample] as number;
    const b = signal.im[sample] as number;
    kspace.re[i] = (kspace.re[i] as number) + re * a - im * b;
    kspace.im[i] = (kspace.im[i] as number) + re * b + im * a;
  }
}

export const rfInterference = defineCause({
  id: 'rf-interference',
  title: 'RF interference',
  stage: 'receive',
  domain: 'kspace',
  seen: ['lines', 'noise'],
  runsAlong: 'both',
  formula: String.raw`K'(k_x, n) = K + A\, e^{\,i(\varphi_n - 2\pi k_x x_0 / N)},\quad x_0 = \Delta f / BW`,
  drivers: [
    { fact: 'Bandwidth per pixel', does: 'puts the line Δf/BW pixels from the centre along the readout' },
    { fact: 'Imaging frequency', does: 'plus Δf is the frequency of the source: it stays when bandwidth or centre frequency change' },
    { fact: 'Phase-encode axis', does: 'is the direction of the line, but for free induction, which runs along the readout' },
  ],
  parameters: {
    kind: choice({
      label: 'Signal',
      options: [
        { value: 'out-of-step', label: 'Tone, out of step with the sequence' },
        { value: 'in-step', label: 'Tone, in step with the sequence' },
        { value: 'free-induction', label: 'Free induction, not phase encoded' },
      ],
      initial: 'out-of-step',
    }),
    brightness: quantity({ label: 'Brightness of the line', unit: '% of object', min: 0, max: 300, step: 5, initial: 60 }),
    offset: quantity({
      label: 'Off centre frequency',
      unit: 'Hz',
      min: -50000,
      max: 50000,
      step: 50,
      initial: 3200,
      when: { kind: ['out-of-step', 'in-step'] },
    }),
    drift: quantity({
      label: 'Drift over the scan',
      unit: 'Hz',
      min: 0,
      max: 5000,
      step: 50,
      initial: 0,
      when: { kind: ['out-of-step', 'in-step'] },
    }),
    bandwidth: quantity({
      label: 'Bandwidth of the source',
      unit: 'Hz',
      min: 0,
      max: 5000,
      step: 10,
      initial: 0,
      when: { kind: ['out-of-step', 'in-step'] },
    }),
    phaseStep: quantity({
      label: 'Phase step a line',
      unit: '°',
      min: 0,
      max: 360,
      step: 5,
      initial: 0,
      when: { kind: ['in-step', 'free-induction'] },
    }),
  },
  identity: { kind: 'out-of-step', brightness: 0, offset: 3200, drift: 0, bandwidth: 0, phaseStep: 0 },
  looks: {
    image:
      'A line of bright and dark dots along the phase encoding, through object and air alike; a dot where the source keeps step, a band where it drifts or is broad. Free induction: a line along the readout in the middle or at the edge. Without a bandwidth in the header, 200 Hz a pixel is assumed.',
    kspace:
      'A veil of even strength over all samples, seen in the outer part; where it is strong, fine stripes across the readout. Free induction: bright at the start of every readout.',
  },
  sources: [
    {
      citation: 'Pusey E et al. Magnetic resonance imaging artifacts: mechanism and clinical significance. RadioGraphics 6:891',
      year: 1986,
      standing: 'confirmed',
    },
    {
      citation: 'Zhuo J, Gullapalli RP. MR artifacts, safety, and quality control. RadioGraphics 26:275',
      year: 2006,
      standing: 'confirmed',
    },
    {
      citation: 'Graves MJ, Mitchell DG. Body MRI artifacts in clinical practice. J Magn Reson Imaging 38:269',
      year: 2013,
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Close the door of the room and look at its seal',
      who: 'technologist',
      price: 'Nothing but a minute',
      moves: { time: 'once' },
    },
    {
      change: 'Take monitors, pumps and lamps that the patient does not need out of the room',
      who: 'technologist',
      price: 'A minute or two; what watches the patient must stay watched',
      moves: { time: 'once' },
    },
    {
      change: 'Repeat with another bandwidth: a real tone stays at its frequency, a line of the sequence does not',
      who: 'technologist',
      price:
        'The time of the scan once more; SNR and chemical shift change; with a higher bandwidth nerve stimulation rises: check the conditions of an implant',
      moves: { time: 'once', snr: 'changes', nerveStimulation: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Free induction: raise the refocusing angle, or the crushers, by another protocol',
      who: 'physicist',
      price:
        'SAR rises with the angle: check the conditions of an implant; crushers lengthen the shortest TE, and contrast changes; nerve stimulation rises with them',
      moves: { contrast: 'changes', sar: 'rises', nerveStimulation: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Scan noise with RF off over the whole receiver band',
      who: 'physicist',
      price: 'Half an hour of scanner time',
      moves: { time: 'once' },
    },
    {
      change: 'Measure the shielding of the room, check filter plate and waveguides',
      who: 'licensed service',
      price: 'Hours to days in which the scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { kind, brightness, offset, drift, bandwidth, phaseStep }, { acquisition, random }) {
    const lines = linesOf(kspace, acquisition);
    const nSamples = lines.samplesPerLine;
    const bandwidthPerPixel = acquisition.bandwidthPerPixel ?? assumedBandwidthPerPixel;
    const lineBrightness = fromPercent(brightness) * objectLevel(kspace).percentile99;
    const disturbed = { ...kspace, re: kspace.re.slice(), im: kspace.im.slice() };
    const taken = takenLines(kspace, lines).flatMap((isTaken, line) => (isTaken ? [line] : []));
    const decay = kind === 'free-induction' ? freeInduction(kspace, lines) : undefined;
    const amplitude = lineBrightness / Math.sqrt(decay ? lines.nLines : nSamples);
    const walk = (2 * Math.PI * bandwidth) / (nSamples * bandwidthPerPixel);
    taken.forEach((line, n) => {
      const phase = kind === 'out-of-step' ? 2 * Math.PI * random.uniform() : n * fromDegrees(phaseStep);
      const now = taken.length > 1 ? n / (taken.length - 1) - 0.5 : 0;
      const signal = decay ?? tone(nSamples, (offset + drift * now) / bandwidthPerPixel, walk, random);
      addToLine(disturbed, lines, line, signal, amplitude, phase);
    });
    return disturbed;
  },
});

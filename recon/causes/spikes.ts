/**
 * Spikes: single samples, or a burst of neighbours in one readout, that a discharge made much larger, K'(kx0, ky0) = K + A·exp(iφ).
 * In the image each adds a plane wave of modulus |A|/√(NM), period N/|k|: stripes where it meets signal, an even veil in air.
 * A is a part of max|K|, divided by the number of averages: a discharge falls into one of them. kx is counted along the readout
 * and ky along the phase encoding, in cycles over the field of view; beyond the matrix, and where nothing is taken, nothing is received.
 */
import type { Encoded } from '../cause';
import { defineCause } from '../cause';
import { largestModulus } from '../levels';
import type { Lines } from '../lines';
import { linesOf, takenLines } from '../lines';
import { choice, quantity } from '../parameter';
import type { Random } from '../random';
import { fromDegrees, fromPercent } from '../units';

/** Adds A·exp(iφ) to one sample of one line, if it exists and was taken. */
function addSpike(kspace: Encoded, lines: Lines, line: number, sample: number, amplitude: number, phase: number): void {
  if (line < 0 || line >= lines.nLines || sample < 0 || sample >= lines.samplesPerLine) return;
  const i = line * lines.lineStride + sample * lines.sampleStride;
  if (kspace.taken[i] === 0) return;
  kspace.re[i] = (kspace.re[i] as number) + amplitude * Math.cos(phase);
  kspace.im[i] = (kspace.im[i] as number) + amplitude * Math.sin(phase);
}

interface Spike {
  readonly line: number;
  readonly sample: number;
  readonly phase: number;
}

/** Anywhere in the lines that were taken, with any phase. */
function seededSpikes(kspace: Encoded, lines: Lines, n: number, random: Random): Spike[] {
  const candidates = takenLines(kspace, lines).flatMap((isTaken, line) => (isTaken ? [line] : []));
  return Array.from({ length: n }, () => ({
    line: candidates[Math.floor(random.uniform() * candidates.length)] ?? -1,
    sample: Math.floor(random.uniform() * lines.samplesPerLine),
    phase: 2 * Math.PI * random.uniform(),
  }));
}

export const spikes = defineCause({
  id: 'spikes',
  title: 'Spikes',
  stage: 'receive',
  domain: 'kspace',
  seen: ['lines'],
  runsAlong: 'both',
  phantom: 'abdomen',
  formula: String.raw`K'(k_{x0}, k_{y0}) = K + A e^{i\varphi}\;\Rightarrow\; I' = I + \tfrac{A}{\sqrt{NM}}\, e^{\,i(2\pi (k_{x0} x + k_{y0} y)/N + \varphi)}`,
  drivers: [
    { fact: 'Averages', does: 'divide a spike: it falls into one of them' },
    { fact: 'Sequence', does: 'echo-planar and diffusion scans drive the gradients hardest, and shake loose what sparks' },
  ],
  needsObjectPhase: true,
  parameters: {
    place: choice({
      label: 'Where',
      options: [
        { value: 'seeded', label: 'Anywhere' },
        { value: 'given', label: 'At one place' },
      ],
      initial: 'seeded',
    }),
    amplitude: quantity({ label: 'Amplitude', unit: '% of max |K|', min: 0, max: 100, step: 0.5, initial: 10 }),
    count: quantity({ label: 'Spikes', unit: 'spikes', min: 1, max: 20, step: 1, initial: 1, when: { place: ['seeded'] } }),
    burst: quantity({ label: 'Samples hit by each', unit: 'samples', min: 1, max: 32, step: 1, initial: 1 }),
    kReadout: quantity({
      label: 'Place along the readout',
      unit: 'cycles',
      min: -256,
      max: 256,
      step: 1,
      initial: 30,
      when: { place: ['given'] },
    }),
    kPhaseEncode: quantity({
      label: 'Place along the phase encoding',
      unit: 'cycles',
      min: -256,
      max: 256,
      step: 1,
      initial: 40,
      when: { place: ['given'] },
    }),
    phase: quantity({ label: 'Phase', unit: '°', min: 0, max: 360, step: 5, initial: 0, when: { place: ['given'] } }),
  },
  identity: { place: 'seeded', amplitude: 0, count: 1, burst: 1, kReadout: 30, kPhaseEncode: 40, phase: 0 },
  strength: { amplitude: [5, 60] },
  looks: {
    image:
      'Fine parallel stripes over the whole object, at any angle; several spikes cross into a herringbone, and a burst makes the stripes fade with distance. In air an even veil.',
    kspace:
      'A bright isolated dot, or a short dash. The k-space of the magnitude image shows it twice, at k and −k, each about half as bright; only complex data show it once.',
  },
  sources: [
    {
      citation: 'Foo TK et al. Spike noise removal in MR imaging. IEEE Trans Med Imaging 13:133',
      year: 1994,
      standing: 'from memory',
    },
    {
      citation: 'Kao YH, MacFall JR. Correction of MR k-space data corrupted by spike noise. IEEE Trans Med Imaging 19:671',
      year: 2000,
      standing: 'from memory',
    },
    {
      citation:
        'Campbell-Washburn AE et al. Using the robust principal component analysis algorithm to remove RF spike artifacts from MR images. Magn Reson Med 75:2517',
      year: 2016,
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Repeat the scan',
      who: 'technologist',
      price: 'The time of the scan; often the next one is free of it',
      moves: { time: 'once' },
    },
    {
      change: 'Keep the room at 40 to 60 % humidity, and blankets of wool or synthetics out',
      who: 'technologist',
      price: 'Nothing but a minute',
      moves: { time: 'once' },
    },
    {
      change: 'Take loose metal, lamps and leads out of the bore, and seat connectors of coils again',
      who: 'technologist',
      price: 'A few minutes',
      moves: { time: 'once' },
    },
    {
      change: 'Run the spike test with and without the coil, and with the sequence that showed it',
      who: 'physicist',
      price: 'Half an hour of scanner time',
      moves: { time: 'once' },
    },
    {
      change: 'Tighten gradient cables, screws and filter plate; replace lamps',
      who: 'licensed service',
      price: 'Hours to days in which the scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { place, amplitude, count, burst, kReadout, kPhaseEncode, phase }, { acquisition, random }) {
    const lines = linesOf(kspace, acquisition);
    const A = (fromPercent(amplitude) * largestModulus(kspace)) / (acquisition.averages ?? 1);
    const centreSample = Math.floor(lines.samplesPerLine / 2);
    const given = { line: lines.centre + kPhaseEncode, sample: centreSample + kReadout, phase: fromDegrees(phase) };
    const hit = { ...kspace, re: kspace.re.slice(), im: kspace.im.slice() };
    for (const spike of place === 'given' ? [given] : seededSpikes(kspace, lines, count, random)) {
      addSpike(hit, lines, spike.line, spike.sample, A, spike.phase);
      for (let next = 1; next < burst; next++) {
        addSpike(hit, lines, spike.line, spike.sample + next, A, 2 * Math.PI * random.uniform());
      }
    }
    return hit;
  },
});

/**
 * Cross-talk: slices are not cut sharp, and what a neighbour excites has less time to recover, S' = S·(1 − o·q). o is the part of the slice
 * that its neighbours overlap, q = 1 − (1 − exp(−TR'/T1))/(1 − exp(−TR/T1)) what is lost there when the time since the last pulse is TR'.
 * Parallel slices with Gaussian profiles, full width at half maximum the thickness t, and a gap of g·t: o = 2·erfc(√ln 2·(1 + g)), both
 * neighbours together, the smaller of two overlapping profiles counted. A crossing slice darkens a band: o is then its profile.
 *
 * Assumed: one T1 for all tissue, so that a single image can be used; contrast changes more than this shows.
 */
import { defineCause } from '../cause';
import { complementaryError } from '../error-function';
import type { Grid } from '../grid';
import { linesOf } from '../lines';
import { choice, quantity } from '../parameter';
import type { Acquisition } from '../acquisition';
import { fromDegrees, fromMillimetres } from '../units';
import { weighted } from '../weighting';

/** The part of a slice that both neighbours overlap; `gap` in thicknesses. */
export const neighbourOverlap = (gap: number): number => 2 * complementaryError(Math.sqrt(Math.LN2) * (1 + gap));

/** Signal after `part` of TR over that after TR, T1 and TR in one unit. */
export const saturationRatio = (part: number, TR: number, T1: number): number => Math.expm1((-part * TR) / T1) / Math.expm1(-TR / T1);

/** Profile of a crossing slice over a picture: Gaussian about a line at `position` of the field of view, `angle` from the readout. */
function crossingBand(
  grid: Grid,
  acquisition: Acquisition,
  { position, width, angle }: { position: number; width: number; angle: number },
): Float64Array {
  const { nLines, samplesPerLine, centre, lineStride, sampleStride } = linesOf(grid, acquisition);
  const [phasePixel, readoutPixel] = sampleStride === 1 ? grid.spacing : [grid.spacing[1], grid.spacing[0]];
  const [cosine, sine] = [Math.cos(angle), Math.sin(angle)];
  const band = new Float64Array(nLines * samplesPerLine);
  for (let line = 0; line < nLines; line++) {
    const p = (line - centre - position * nLines) * phasePixel;
    for (let sample = 0; sample < samplesPerLine; sample++) {
      const q = (sample - Math.floor(samplesPerLine / 2)) * readoutPixel;
      const distance = (p * cosine - q * sine) / width;
      band[line * lineStride + sample * sampleStride] = Math.exp(-4 * Math.LN2 * distance * distance);
    }
  }
  return band;
}

export const crossTalk = defineCause({
  id: 'cross-talk',
  title: 'Cross-talk between slices',
  stage: 'object',
  domain: 'image',
  seen: ['signal-loss', 'shading'],
  runsAlong: 'both',
  phantom: 'abdomen',
  formula: String.raw`S' = S \left(1 - o \left(1 - \frac{1 - e^{-T_R'/T_1}}{1 - e^{-T_R/T_1}}\right)\right),\quad o = 2\,\mathrm{erfc}\!\left(\sqrt{\ln 2}\,(1 + g)\right)`,
  drivers: [
    { fact: 'Slice thickness and spacing', does: 'give the gap g between slices, in thicknesses' },
    { fact: 'Order of slices', does: 'sets how soon after a neighbour a slice is read: interleaved, half of TR' },
    { fact: 'TR', does: 'sets how much recovers; long TR forgives' },
  ],
  parameters: {
    stack: choice<'parallel' | 'crossing'>({
      label: 'Other slices',
      options: [
        { value: 'parallel', label: 'Parallel neighbours on both sides' },
        { value: 'crossing', label: 'One that crosses this slice' },
      ],
      initial: 'parallel',
    }),
    gap: quantity({ label: 'Gap', unit: 'of thickness', min: 0, max: 1, step: 0.01, initial: 0, when: { stack: ['parallel'] } }),
    effective: quantity({ label: 'Time since the neighbour', unit: 'of TR', min: 0.02, max: 1, step: 0.01, initial: 0.5 }),
    repetitionTime: quantity({
      label: 'TR',
      unit: 'ms',
      min: 10,
      max: 15000,
      step: 10,
      initial: 500,
      fromHeader: { fact: 'TR', read: ({ repetitionTime }) => (repetitionTime === undefined ? undefined : 1000 * repetitionTime) },
    }),
    longitudinalRelaxation: quantity({ label: 'T1 of the tissue', unit: 'ms', min: 200, max: 4000, step: 10, initial: 800 }),
    position: quantity({
      label: 'Off centre along phase encoding',
      unit: 'of FOV',
      min: -0.5,
      max: 0.5,
      step: 0.01,
      initial: 0.2,
      when: { stack: ['crossing'] },
    }),
    width: quantity({ label: 'Width of the band', unit: 'mm', min: 1, max: 40, step: 0.5, initial: 8, when: { stack: ['crossing'] } }),
    angle: quantity({ label: 'Angle to the readout', unit: '°', min: -90, max: 90, step: 1, initial: 0, when: { stack: ['crossing'] } }),
  },
  identity: {
    stack: 'crossing',
    gap: 0,
    effective: 1,
    repetitionTime: 500,
    longitudinalRelaxation: 800,
    position: 0.2,
    width: 8,
    angle: 0,
  },
  looks: {
    image:
      'With parallel slices all of the image is darker, long T1 most, and more T1-weighted than was meant; where stacks cross, a dark band runs through it. One T1 is assumed for all tissue.',
    kspace: 'k-space does not show this cause.',
  },
  sources: [
    {
      citation: 'Kucharczyk W et al. Effect of multislice interference on image contrast in T2- and T1-weighted MR images. AJNR 9:443',
      year: 1988,
      standing: 'from memory',
    },
    { citation: 'Bernstein MA, King KF, Zhou XJ. Handbook of MRI Pulse Sequences', year: 2004, standing: 'confirmed' },
  ],
  remedies: [
    {
      change: 'A gap of 10 to 30 % between slices',
      who: 'technologist',
      price: 'Tissue in the gap is not seen; fewer slices cover as much; SNR rises as neighbours saturate less',
      moves: { snr: 'rises' },
    },
    {
      change: 'Interleave the slices: first every second one, then the others',
      who: 'technologist',
      price: 'No longer, where TR has room; motion between the two halves shows as steps across the stack',
      moves: {},
    },
    { change: 'Two passes, odd slices and even slices apart', who: 'technologist', price: 'Twice the time', moves: { time: 'rises' } },
    {
      change: 'Turn crossing stacks so that they meet outside the region that matters, or scan them apart',
      who: 'technologist',
      price: 'Angles follow the anatomy less well, or the scan is longer',
      moves: { time: 'changes' },
    },
    {
      change: 'Pulses with a sharper profile',
      who: 'physicist',
      price:
        'Longer pulses, longer shortest TE, and contrast with it; SAR rises or falls with the pulse: check the conditions of an implant',
      moves: { contrast: 'changes', sar: 'changes', implantConditions: 'changes' },
    },
  ],
  apply(object, { stack, gap, effective, repetitionTime, longitudinalRelaxation, ...band }, { acquisition }) {
    const lost = 1 - saturationRatio(effective, repetitionTime, longitudinalRelaxation);
    if (stack === 'parallel') return weighted(object, new Float64Array(object.re.length).fill(1 - neighbourOverlap(gap) * lost));
    const where = { position: band.position, width: fromMillimetres(band.width), angle: fromDegrees(band.angle) };
    return weighted(
      object,
      crossingBand(object, acquisition, where).map((part) => 1 - part * lost),
    );
  },
});

/**
 * Pulsatile flow: what lies in a vessel changes from line to line, K'(n) = K{I − v} + K{v}·(1 + m·cos ωn)·exp(i(φ̄ + a·sin ωn)), v the part of
 * the image inside a round region, ω = 2πf·T. Inflow changes how bright blood is, its speed turns its phase. Ghosts of the lumen alone, of
 * amplitude J_j(a) for the phase and m/2 for the brightness, lie j·frac(T·f) of the phase field of view away.
 *
 * Assumed: one line each T = TR · averages, in order, what averaging leaves; lines that are skipped take time too. Blood that flows obliquely
 * is also imaged in the wrong place: not modelled. Source of the ghosts: Perman et al. 1986; of their places: Wood & Henkelman 1985.
 */
import type { Acquisition } from '../acquisition';
import { defineCause } from '../cause';
import { inverse, transform } from '../fourier';
import type { Grid } from '../grid';
import { lineInterval } from '../line-timing';
import { linesOf, weightLines } from '../lines';
import { quantity } from '../parameter';
import { fromDegrees } from '../units';
import { weighted } from '../weighting';

interface Lumen {
  readonly alongPhaseEncode: number;
  readonly alongReadout: number;
  readonly radius: number;
}

/** The part of each pixel inside a round region, with an edge one pixel wide. Centre from the middle of the picture and radius in parts of the
 *  field of view, the radius in parts of the one along the readout. */
function lumenOf(grid: Grid, acquisition: Acquisition, { alongPhaseEncode, alongReadout, radius }: Lumen): Float64Array {
  const { nLines, samplesPerLine, centre, lineStride, sampleStride } = linesOf(grid, acquisition);
  const [phasePixel, readoutPixel] = sampleStride === 1 ? grid.spacing : [grid.spacing[1], grid.spacing[0]];
  const pixel = Math.sqrt(phasePixel * readoutPixel);
  const inside = new Float64Array(nLines * samplesPerLine);
  for (let line = 0; line < nLines; line++) {
    const p = (line - centre - alongPhaseEncode * nLines) * phasePixel;
    for (let sample = 0; sample < samplesPerLine; sample++) {
      const q = (sample - Math.floor(samplesPerLine / 2) - alongReadout * samplesPerLine) * readoutPixel;
      const within = (radius * samplesPerLine * readoutPixel - Math.sqrt(p * p + q * q)) / pixel + 0.5;
      inside[line * lineStride + sample * sampleStride] = Math.min(1, Math.max(0, within));
    }
  }
  return inside;
}

export const pulsatileFlow = defineCause({
  id: 'pulsatile-flow',
  title: 'Pulsatile flow',
  stage: 'object',
  domain: 'kspace',
  seen: ['ghosts'],
  runsAlong: 'phase-encode',
  phantom: 'abdomen',
  formula: String.raw`K'(n) = K\{I - v\} + K\{v\}\, (1 + m \cos\omega n)\, e^{\,i(\bar\varphi + a \sin\omega n)},\quad \omega = 2\pi f\, T_R N_{\mathrm{avg}}`,
  drivers: [
    {
      fact: 'TR × averages',
      does: 'sets how far apart the copies of the vessel lie: frac(TR × averages × pulse rate) of the phase field of view',
    },
    { fact: 'Pulse', does: 'is the frequency: 50 to 100 beats a minute are 0.8 to 1.7 Hz' },
    { fact: 'Flow compensation, saturation bands, triggering', does: 'take away the phase, the signal or the change from line to line' },
    { fact: 'Phase-encode axis', does: 'sets the direction in which the copies run' },
  ],
  parameters: {
    alongPhaseEncode: quantity({
      label: 'Vessel off centre along phase encoding',
      unit: 'of FOV',
      min: -0.5,
      max: 0.5,
      step: 0.005,
      initial: 0.1,
    }),
    alongReadout: quantity({ label: 'Vessel off centre along readout', unit: 'of FOV', min: -0.5, max: 0.5, step: 0.005, initial: 0 }),
    radius: quantity({ label: 'Radius of the vessel', unit: 'of FOV', min: 0, max: 0.15, step: 0.005, initial: 0.03 }),
    frequency: quantity({ label: 'Pulse', unit: 'Hz', min: 0.5, max: 3, step: 0.005, initial: 1.2 }),
    phaseSwing: quantity({ label: 'Phase swing', unit: 'rad', min: 0, max: 3, step: 0.05, initial: 1 }),
    meanPhase: quantity({ label: 'Mean phase', unit: 'rad', min: -3.1, max: 3.1, step: 0.1, initial: 0 }),
    brightness: quantity({ label: 'Change of brightness', unit: 'of signal', min: 0, max: 1, step: 0.05, initial: 0.3 }),
    start: quantity({ label: 'Start of cycle', unit: '°', min: 0, max: 360, step: 1, initial: 0 }),
  },
  identity: {
    alongPhaseEncode: 0.1,
    alongReadout: 0,
    radius: 0.03,
    frequency: 1.2,
    phaseSwing: 0,
    meanPhase: 0,
    brightness: 0,
    start: 0,
  },
  // The aorta of the abdomen.
  strength: {
    phaseSwing: [0.25, 2.5],
    brightness: [0.1, 0.75],
    alongPhaseEncode: [0.02, 0.02],
    alongReadout: [0.04, 0.04],
    radius: [0.025, 0.025],
  },
  looks: {
    image:
      'A row of dots of the size of the vessel along the phase encoding, bright and dark where they lie over tissue, at equal steps of frac(TR × averages × pulse) of the field of view; the vessel itself is fainter. Where the header has no TR, 500 ms is assumed.',
    kspace: 'A small part of the signal changes with the pulse from line to line; by eye k-space does not show this cause.',
  },
  sources: [
    {
      citation: 'Perman WH et al. Artifacts from pulsatile flow in MR imaging. J Comput Assist Tomogr 10:473',
      year: 1986,
      standing: 'confirmed',
    },
    { citation: 'Wood ML, Henkelman RM. MR image artifacts from periodic motion. Med Phys 12:143', year: 1985, standing: 'confirmed' },
    {
      citation: 'Larson TC et al. Spatial misregistration of vascular flow during MR imaging of the CNS. AJNR 11:1041',
      year: 1990,
      standing: 'from memory',
    },
  ],
  remedies: [
    {
      change: 'Saturation band upstream of the slice',
      who: 'technologist',
      price: 'More RF and a longer minimum TR: SAR rises, check the conditions of an implant',
      moves: { time: 'rises', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Flow compensation',
      who: 'technologist',
      price:
        'Longer shortest TE, and contrast with it; gradients switch harder: nerve stimulation rises, check the conditions of an implant',
      moves: { contrast: 'changes', nerveStimulation: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Trigger on the pulse',
      who: 'technologist',
      price: 'Longer; TR follows the heart, and contrast with it',
      moves: { time: 'rises', contrast: 'changes' },
    },
    {
      change: 'Swap phase and frequency encoding: the row of dots then runs the other way, clear of the organ',
      who: 'technologist',
      price:
        'Wrap-around turns with it: oversample, which takes longer, if the long side is now phase encoded; other gradients work hardest: check nerve stimulation and the conditions of an implant',
      moves: { time: 'changes', nerveStimulation: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Black-blood preparation',
      who: 'physicist',
      price: 'Longer, fewer slices, other contrast; SAR rises: check the conditions of an implant',
      moves: { time: 'rises', contrast: 'changes', sar: 'rises', implantConditions: 'changes' },
    },
  ],
  apply(kspace, { frequency, phaseSwing: a, meanPhase, brightness: m, start, ...lumen }, { acquisition }) {
    const lines = linesOf(kspace, acquisition);
    const image = inverse(kspace);
    const vessel = transform(weighted(image, lumenOf(image, acquisition, lumen)));
    const omega = 2 * Math.PI * frequency * lineInterval(acquisition);
    const weight = { re: new Float64Array(lines.nLines), im: new Float64Array(lines.nLines) };
    for (let n = 0; n < lines.nLines; n++) {
      const angle = omega * n + fromDegrees(start);
      const size = 1 + m * Math.cos(angle);
      const phase = meanPhase + a * Math.sin(angle);
      weight.re[n] = size * Math.cos(phase) - 1;
      weight.im[n] = size * Math.sin(phase);
    }
    const change = weightLines(vessel, lines, weight);
    const changed = { ...kspace, re: kspace.re.slice(), im: kspace.im.slice(), taken: kspace.taken.slice() };
    for (let i = 0; i < changed.re.length; i++) {
      if (changed.taken[i] === 0) continue;
      changed.re[i] = (changed.re[i] as number) + (change.re[i] as number);
      changed.im[i] = (changed.im[i] as number) + (change.im[i] as number);
    }
    return changed;
  },
});

/**
 * Periodic motion that comes round with frequency f, ω = 2πf. Through-plane motion or flow turns the phase of each line,
 * K'(n) = K(n)·exp(i·a·sin(ωt + φ)); by Jacobi–Anger the ghost of order j has amplitude J_j(a) and lies j·frac(T·f) of the phase field of view
 * away, whatever the matrix, T = TR · averages. A displacement of A pixels turns it by exp(−i2πk·A·sin(ωt + φ)/N), so that edges ghost
 * more than what is even; a signal that comes and goes, 1 + m·cos(ωt + φ), has ghosts of m/2. Source: Wood & Henkelman, Med Phys 1985;12:143.
 *
 * Assumed: one line each T, in order from one edge of k-space to the other, all of the object moving as one; averages as `line-courses.ts` says.
 * n counts lines that are taken, so that skipped lines take no time and the ghost then moves by frac(T·f)/R.
 */
import type { Acquisition } from '../acquisition';
import type { Encoded } from '../cause';
import { defineCause } from '../cause';
import type { Averaging } from '../line-courses';
import { timesOf } from '../line-courses';
import type { Lines } from '../lines';
import { linesOf, takenLines, weightLines } from '../lines';
import { choice, quantity } from '../parameter';
import { fromMillimetres } from '../units';

type Moves = 'phase' | 'along-phase-encode' | 'along-readout' | 'amplitude';

/** For each line the phases ωt + φ of the cycle at which it is taken; none where it is not. */
function cyclesOf(
  kspace: Encoded,
  lines: Lines,
  { frequency, start, averaging }: { frequency: number; start: number; averaging: Averaging },
  acquisition: Acquisition,
): number[][] {
  const taken = takenLines(kspace, lines);
  const nTaken = taken.filter(Boolean).length;
  const phi = (start * Math.PI) / 180;
  let n = 0;
  return taken.map((isTaken) =>
    isTaken ? timesOf(n++, nTaken, averaging, acquisition).map((t) => 2 * Math.PI * frequency * t + phi) : [],
  );
}

/** Each line times the mean, over its averages, of size·exp(i·phase). */
function weightedLines(
  kspace: Encoded,
  lines: Lines,
  cycles: number[][],
  of: (cycle: number, line: number) => { size: number; phase: number },
): Encoded {
  const weight = { re: new Float64Array(lines.nLines).fill(1), im: new Float64Array(lines.nLines) };
  cycles.forEach((averages, line) => {
    if (averages.length === 0) return;
    const terms = averages.map((cycle) => of(cycle, line));
    weight.re[line] = terms.reduce((sum, { size, phase }) => sum + size * Math.cos(phase), 0) / averages.length;
    weight.im[line] = terms.reduce((sum, { size, phase }) => sum + size * Math.sin(phase), 0) / averages.length;
  });
  return weightLines(kspace, lines, weight);
}

/** Each line of an object that is displaced by `swing`·sin(cycle) pixels along the readout: the mean over its averages. */
function swungAlongReadout(kspace: Encoded, lines: Lines, cycles: number[][], swing: number): Encoded {
  const moved = { ...kspace, re: kspace.re.slice(), im: kspace.im.slice(), taken: kspace.taken.slice() };
  const { samplesPerLine, lineStride, sampleStride } = lines;
  cycles.forEach((averages, line) => {
    for (let sample = 0; sample < samplesPerLine && averages.length > 0; sample++) {
      const turn = (-2 * Math.PI * (sample - Math.floor(samplesPerLine / 2)) * swing) / samplesPerLine;
      let re = 0;
      let im = 0;
      for (const cycle of averages) {
        const phase = turn * Math.sin(cycle);
        re += Math.cos(phase) / averages.length;
        im += Math.sin(phase) / averages.length;
      }
      const i = line * lineStride + sample * sampleStride;
      const a = moved.re[i] as number;
      const b = moved.im[i] as number;
      moved.re[i] = a * re - b * im;
      moved.im[i] = a * im + b * re;
    }
  });
  return moved;
}

export const periodicMotion = defineCause({
  id: 'periodic-motion',
  title: 'Periodic motion',
  stage: 'object',
  domain: 'kspace',
  seen: ['ghosts'],
  runsAlong: 'phase-encode',
  phantom: 'abdomen',
  formula: String.raw`K'(k_x, n) = K(k_x, n)\, e^{\,i a \sin(2\pi f T n + \varphi)},\quad T = T_R \, N_{\mathrm{avg}};\quad a = -2\pi k A / N \text{ for a displacement}`,
  drivers: [
    { fact: 'TR × averages', does: 'sets how far apart the copies lie: frac(TR × averages × frequency) of the phase field of view' },
    { fact: 'Phase-encode axis', does: 'sets the direction in which the copies run' },
    { fact: 'Acceleration', does: 'divides the distance of the copies by R' },
    { fact: 'Breathing and pulse', does: 'are the frequency: 0.15 to 0.4 Hz for breathing, 0.8 to 1.7 Hz for the heart' },
  ],
  parameters: {
    moves: choice<Moves>({
      label: 'What moves',
      options: [
        { value: 'phase', label: 'Phase: through-plane motion, flow' },
        { value: 'along-phase-encode', label: 'Place along phase encoding' },
        { value: 'along-readout', label: 'Place along readout' },
        { value: 'amplitude', label: 'Brightness' },
      ],
      initial: 'phase',
    }),
    frequency: quantity({ label: 'Frequency', unit: 'Hz', min: 0.05, max: 3, step: 0.005, initial: 0.25 }),
    phaseSwing: quantity({ label: 'Phase swing', unit: 'rad', min: 0, max: 2, step: 0.01, initial: 0.6, when: { moves: ['phase'] } }),
    displacement: quantity({
      label: 'Displacement',
      unit: 'mm',
      min: 0,
      max: 20,
      step: 0.1,
      initial: 5,
      when: { moves: ['along-phase-encode', 'along-readout'] },
    }),
    modulation: quantity({
      label: 'Change of brightness',
      unit: 'of signal',
      min: 0,
      max: 0.5,
      step: 0.01,
      initial: 0.2,
      when: { moves: ['amplitude'] },
    }),
    start: quantity({ label: 'Start of cycle', unit: '°', min: 0, max: 360, step: 1, initial: 0 }),
    averaging: choice<Averaging>({
      label: 'Averages',
      options: [
        { value: 'left-over', label: 'The swing is what they leave' },
        { value: 'inner-loop', label: 'Each line is averaged before the next' },
        { value: 'outer-loop', label: 'All lines are taken, then again' },
      ],
      initial: 'left-over',
    }),
  },
  identity: { moves: 'phase', frequency: 0.25, phaseSwing: 0, displacement: 5, modulation: 0.2, start: 0, averaging: 'left-over' },
  strength: { phaseSwing: [0.1, 0.9] },
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
      price: 'A shorter scan that fits one breath, with less SNR or detail; the patient must be able to',
      moves: { time: 'falls', snr: 'falls' },
    },
    {
      change: 'Trigger or gate on breathing or pulse, or use a navigator',
      who: 'technologist',
      price: 'Longer, often twice; TR follows the patient, and contrast with it',
      moves: { time: 'rises', contrast: 'changes' },
    },
    {
      change: 'Saturation band over the moving tissue, or fat saturation',
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
      change: 'More averages',
      who: 'technologist',
      price: 'Longer in proportion; SNR rises with the square root; the absorbed energy rises with the time',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Swap phase and frequency encoding: the ghosts then run the other way, clear of the organ',
      who: 'technologist',
      price:
        'Wrap-around turns with them: oversample, which takes longer, if the long side is now phase encoded; other gradients work hardest: check nerve stimulation and the conditions of an implant',
      moves: { time: 'changes', nerveStimulation: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Change TR so that the ghost falls outside the organ',
      who: 'physicist',
      price:
        'Longer or shorter, SNR and contrast with it; a shorter TR raises SAR, a longer one lowers it: check the conditions of an implant',
      moves: { time: 'changes', snr: 'changes', contrast: 'changes', sar: 'changes', implantConditions: 'changes' },
    },
  ],
  apply(kspace, { moves, phaseSwing, displacement, modulation, ...course }, { acquisition }) {
    const lines = linesOf(kspace, acquisition);
    const cycles = cyclesOf(kspace, lines, course, acquisition);
    // 1/(n·Δ) of k-space times n is 1/Δ: metres times it are pixels.
    const pixels = (axis: 0 | 1): number =>
      fromMillimetres(displacement) * kspace.spacing[axis] * (axis === 0 ? kspace.rows : kspace.columns);
    const [phaseAxis, readoutAxis] = lines.sampleStride === 1 ? ([0, 1] as const) : ([1, 0] as const);
    if (moves === 'along-readout') return swungAlongReadout(kspace, lines, cycles, pixels(readoutAxis));
    if (moves === 'amplitude') {
      return weightedLines(kspace, lines, cycles, (cycle) => ({ size: 1 + modulation * Math.cos(cycle), phase: 0 }));
    }
    if (moves === 'phase') return weightedLines(kspace, lines, cycles, (cycle) => ({ size: 1, phase: phaseSwing * Math.sin(cycle) }));
    const perLine = (-2 * Math.PI * pixels(phaseAxis)) / lines.nLines;
    return weightedLines(kspace, lines, cycles, (cycle, line) => ({ size: 1, phase: perLine * (line - lines.centre) * Math.sin(cycle) }));
  },
});

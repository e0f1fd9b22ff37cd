/**
 * Randomly skipped lines, zero-filled: round(N/R) of N lines are taken, C adjoining ones about the centre among them, the others drawn
 * with the weight (1 − |ky|/kmax)^q, q = 0 evenly. The copies of regular skipping dissolve into a haze along the phase encoding:
 * of M of N lines the point spread has Σ|PSF|² = M/N whatever their choice, M²/N² of it at the centre.
 *
 * Drawn without replacement by keys u^(1/w), the M largest (Efraimidis & Spirakis, Inf Process Lett 2006;97:181).
 */
import type { Random } from '../random';
import { defineCause } from '../cause';
import type { Lines } from '../lines';
import { keepLines, linesOf } from '../lines';
import { quantity } from '../parameter';

/** 1 for each line that is taken. One number is drawn for every line, so that the choice of C and R does not shift the stream. */
function drawLines({ nLines, centre }: Lines, nTaken: number, nCalibration: number, density: number, random: Random): Uint8Array {
  const taken = new Uint8Array(nLines);
  const first = centre - Math.floor(nCalibration / 2);
  const kmax = centre + 1;
  const keys = Float64Array.from({ length: nLines }, (_, line) => {
    const logarithm = Math.log(random.uniform());
    if (line >= first && line < first + nCalibration) return Infinity;
    // log of u^(1/w): the order stays, and nothing underflows.
    return logarithm / Math.pow(1 - Math.abs(line - centre) / kmax, density);
  });
  const order = Array.from(keys.keys()).sort((a, b) => (keys[a] === keys[b] ? a - b : (keys[b] as number) - (keys[a] as number)));
  const nCalibrated = keys.filter((key) => key === Infinity).length;
  for (const line of order.slice(0, Math.max(nTaken, nCalibrated))) taken[line] = 1;
  return taken;
}

export const randomUndersampling = defineCause({
  id: 'random-undersampling',
  title: 'Randomly skipped lines',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['noise', 'ghosts', 'blur'],
  runsAlong: 'phase-encode',
  phantom: 'abdomen',
  formula: String.raw`K'(k_y) = m(k_y)\,K(k_y),\quad P\{m = 1\} \propto \left(1 - |k_y| / k_{\max}\right)^q,\quad \sum m = N / R`,
  drivers: [
    { fact: 'Acceleration', does: 'is R: one line in R is taken, drawn at random' },
    { fact: 'Density of the sampling', does: 'decides between haze (even) and blur with less haze (dense in the middle)' },
    { fact: 'Phase-encode axis', does: 'sets the direction in which the haze runs' },
  ],
  needsObjectPhase: true,
  parameters: {
    accelerationFactor: quantity({
      label: 'Acceleration',
      unit: '×',
      min: 1,
      max: 8,
      step: 0.1,
      initial: 3,
      fromHeader: {
        fact: 'Parallel-imaging factor along the phase encoding',
        read: ({ accelerationFactor: r }) => (r !== undefined && r > 1 ? r : undefined),
      },
    }),
    density: quantity({ label: 'Density towards the centre', unit: 'power q', min: 0, max: 6, step: 0.5, initial: 2 }),
    calibrationLines: quantity({ label: 'Calibration lines', unit: 'lines', min: 0, max: 64, step: 1, initial: 8 }),
  },
  identity: { accelerationFactor: 1, density: 0, calibrationLines: 0 },
  looks: {
    image:
      'A haze like noise along the phase encoding instead of clean copies, brightest beside bright edges; with lines dense in the middle less haze and more blur.',
    kspace: 'Lines are empty in no regular order, fewer in the middle. The k-space of the magnitude image has them filled in part.',
  },
  sources: [
    {
      citation:
        'Lustig M, Donoho D, Pauly JM. Sparse MRI: the application of compressed sensing for rapid MR imaging. Magn Reson Med 58:1182',
      year: 2007,
      doi: '10.1002/mrm.21391',
      standing: 'confirmed',
    },
    {
      citation: 'Efraimidis PS, Spirakis PG. Weighted random sampling with a reservoir. Inf Process Lett 97:181',
      year: 2006,
      doi: '10.1016/j.ipl.2005.11.003',
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Lower the acceleration factor',
      who: 'technologist',
      price: 'Longer in proportion; SNR rises with the square root',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Strengthen or lengthen the iterative reconstruction, where the protocol offers it',
      who: 'technologist',
      price: 'Slower reconstruction, the scan itself stays as it is; too strong a setting smooths fine detail away or invents it',
      moves: {},
    },
    {
      change: 'Acquire the calibration again after the patient has settled, with the elements that see the anatomy',
      who: 'technologist',
      price: 'Seconds to a minute',
      moves: { time: 'once' },
    },
    {
      change: 'Compare with a fully sampled scan of a phantom',
      who: 'physicist',
      price: 'Minutes on the scanner',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { accelerationFactor, density, calibrationLines }, { acquisition, random }) {
    const lines = linesOf(kspace, acquisition);
    const nTaken = Math.max(1, Math.round(lines.nLines / accelerationFactor));
    const taken = drawLines(lines, nTaken, calibrationLines, density, random);
    return keepLines(kspace, lines, (line) => taken[line] === 1);
  },
});

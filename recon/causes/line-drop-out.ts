/**
 * Line drop-out: lines reach the reconstruction as zeros, or too small. One line lost at ky0 takes a wave out of the image,
 * I' = I − (1 − g)·P(x)·exp(i2π·ky0·y/N), P the transform of that line along the readout: stripes N/|ky0| apart, as strong as the line.
 *
 * The lines stay marked as taken: the reconstruction does not know that they are lost, and fills nothing in.
 */
import { defineCause } from '../cause';
import type { Random } from '../random';
import { linesOf, weightLines } from '../lines';
import type { Lines } from '../lines';
import { choice, quantity } from '../parameter';

/** `count` different lines of the plane, drawn evenly. */
function scattered({ nLines }: Lines, count: number, random: Random): number[] {
  const lines = Array.from({ length: nLines }, (_, line) => line);
  const drawn: number[] = [];
  while (drawn.length < count && lines.length > 0) drawn.push(...lines.splice(Math.floor(random.uniform() * lines.length), 1));
  return drawn;
}

/** `count` lines in a row from the one at `position` of the way from the centre to the edge; those beyond the edge are none. */
function neighbouring({ nLines, centre }: Lines, count: number, position: number): number[] {
  const first = Math.min(nLines - 1, centre + Math.round(position * centre));
  return Array.from({ length: count }, (_, i) => first + i).filter((line) => line < nLines);
}

export const lineDropOut = defineCause({
  id: 'line-drop-out',
  title: 'Line drop-out',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['lines', 'shading'],
  runsAlong: 'phase-encode',
  phantom: 'abdomen',
  formula: String.raw`I'(x, y) = I(x, y) - (1 - g) \sum_{k_y \in S} P_{k_y}(x)\, e^{\,i 2\pi k_y y / N}`,
  drivers: [
    { fact: 'Phase-encode axis', does: 'sets the direction across which the stripes run' },
    { fact: 'Which line is lost', does: 'sets the spacing of the stripes, N over its number from the centre, and how strong they are' },
  ],
  needsObjectPhase: true,
  parameters: {
    count: quantity({ label: 'Lines lost', unit: 'lines', min: 1, max: 10, step: 1, initial: 1 }),
    gain: quantity({ label: 'What is left of them', unit: 'of amplitude', min: 0, max: 1, step: 0.05, initial: 0 }),
    pattern: choice<'neighbouring' | 'scattered'>({
      label: 'Which',
      options: [
        { value: 'neighbouring', label: 'Neighbouring, from the place below' },
        { value: 'scattered', label: 'Scattered at random' },
      ],
      initial: 'neighbouring',
    }),
    position: quantity({
      label: 'Place of the first',
      unit: 'of k max',
      min: -1,
      max: 1,
      step: 0.01,
      initial: 0.05,
      when: { pattern: ['neighbouring'] },
    }),
  },
  identity: { count: 1, gain: 1, pattern: 'neighbouring', position: 0 },
  looks: {
    image:
      'Even stripes across the phase encoding over the whole picture; from a line near the centre broad and strong, from an outer one fine and faint. The centre line lost leaves an outline with a dark inside.',
    kspace:
      'A black line in raw data. The k-space of a magnitude image shows a weaker pair instead, at +ky and −ky, with a quarter to a half of the power of the lines beside it.',
  },
  sources: [
    {
      citation: 'Henkelman RM, Bronskill MJ. Artifacts in magnetic resonance imaging. Rev Magn Reson Med 2:1',
      year: 1987,
      standing: 'from memory',
    },
    { citation: 'One line of the inverse discrete Fourier transform, left out', standing: 'common practice' },
  ],
  remedies: [
    {
      change: 'Repeat the scan: what came once does not come again at the same line',
      who: 'technologist',
      price: 'The time of the scan',
      moves: { time: 'once' },
    },
    {
      change: 'Save the raw data before it is overwritten, and note the time',
      who: 'technologist',
      price: 'A minute; the next patient waits',
      moves: { time: 'once' },
    },
    {
      change: 'Look through the logs for time-outs of the receiver or the reconstruction and for gradient or RF trips',
      who: 'physicist',
      price: 'An hour at the desk; the scanner goes on',
      moves: { time: 'once' },
    },
    {
      change: 'Check the receive path and its cables, gradient and RF amplifiers',
      who: 'licensed service',
      price: 'Hours to days in which the scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { count, gain, pattern, position }, { acquisition, random }) {
    const lines = linesOf(kspace, acquisition);
    const lost = pattern === 'scattered' ? scattered(lines, count, random) : neighbouring(lines, count, position);
    const weight = { re: new Float64Array(lines.nLines).fill(1), im: new Float64Array(lines.nLines) };
    for (const line of lost) weight.re[line] = gain;
    return weightLines(kspace, lines, weight);
  },
});

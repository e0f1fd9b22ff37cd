/** Cross-talk: overlap of Gaussian slices and what is lost there, against values made outside, and the band of a crossing slice. */
import { crossTalk as crossTalkCause, neighbourOverlap, saturationRatio } from '../../../recon/causes/cross-talk';
import { complementaryError } from '../../../recon/error-function';
import { simulate } from '../../../recon/simulate';
import { objectReference } from '../../reference/object';
import { box } from '../planes';

const crossTalk = (parameters: Record<string, number | string>) => ({
  steps: [{ cause: 'cross-talk', parameters: { repetitionTime: 500, longitudinalRelaxation: 800, effective: 0.5, ...parameters } }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});
const even = box(48, [0, 48], [0, 48]);

test.each(objectReference.sliceOverlap)('With a gap of %f thicknesses both neighbours overlap %f of a slice', (gap, overlap) => {
  // The reference has six decimals.
  expect(neighbourOverlap(gap)).toBeCloseTo(overlap, 5);
});

test('Half the time to recover leaves 0.5775 of the signal at T1 800 ms and TR 500 ms', () => {
  expect(saturationRatio(0.5, 500, 800)).toBeCloseTo(objectReference.saturationRatio, 9);
  // (1 − x)/(1 − x²) = 1/(1 + x), x = exp(−TR/(2·T1)).
  expect(saturationRatio(0.5, 500, 800)).toBeCloseTo(1 / (1 + Math.exp(-250 / 800)), 14);
});

test('Parallel neighbours darken the whole image evenly, by the overlap times what is lost', () => {
  const { image } = simulate(even, crossTalk({ stack: 'parallel', gap: 0.1 }), { phaseEncode: 'row' });
  const [, overlap] = objectReference.sliceOverlap[1];
  image.values.forEach((value) => expect(value).toBeCloseTo(1 - overlap * (1 - objectReference.saturationRatio), 5));
});

test('The longer T1, the more is lost', () => {
  const lost = (longitudinalRelaxation: number) =>
    simulate(even, crossTalk({ stack: 'parallel', gap: 0, longitudinalRelaxation }), { phaseEncode: 'row' }).image.values[0] ?? NaN;
  expect(lost(3000)).toBeLessThan(lost(800));
  expect(lost(800)).toBeLessThan(lost(250));
});

test('A slice that crosses leaves a band of its profile: darkest at its middle, half as deep half a width away', () => {
  const recipe = crossTalk({ stack: 'crossing', position: 0.25, width: 8, angle: 0 });
  const { image } = simulate(even, recipe, { phaseEncode: 'column' });
  const depth = (row: number) => 1 - (image.values[row * 48 + 5] ?? NaN);
  expect(depth(36)).toBeCloseTo(1 - objectReference.saturationRatio, 9);
  expect(depth(40) / depth(36)).toBeCloseTo(0.5, 9);
  expect(depth(32) / depth(36)).toBeCloseTo(0.5, 9);
  expect(depth(4)).toBeLessThan(1e-9);
});

test('Turned by 90° the band runs along the phase encoding', () => {
  const { image } = simulate(even, crossTalk({ stack: 'crossing', position: 0, width: 8, angle: 90 }), { phaseEncode: 'column' });
  for (let row = 0; row < 48; row++) expect(1 - (image.values[row * 48 + 24] ?? NaN)).toBeCloseTo(1 - objectReference.saturationRatio, 9);
});

test.each([
  // Abramowitz & Stegun, table 7.1 (from memory, as 1 − erf), and DLMF 7.2.2 at 0.
  [0, 1],
  [0.5, 1 - 0.5204998778],
  [1, 1 - 0.8427007929],
  [2, 1 - 0.995322265],
])('erfc(%f) is %f, as printed to ten digits', (x, expected) => {
  expect(complementaryError(x)).toBeCloseTo(expected, 9);
});

test('Series and fraction of erfc meet at the crossover', () => {
  // The slope there is 2/√π·e⁻⁴ = 0.021: a step of 1e-9 may differ by 2.1e-11.
  expect(Math.abs(complementaryError(2 - 1e-9) - complementaryError(2) - 2.0666985e-11)).toBeLessThan(1e-14);
});

test('An angle turns the band from the readout towards smaller lines, in millimetres where pixels are not square', () => {
  if (crossTalkCause.domain !== 'image') throw Error('it acts on the image');
  const object = { ...even, spacing: [2e-3, 1e-3] as const };
  const initial = Object.fromEntries(Object.entries(crossTalkCause.parameters).map(([id, parameter]) => [id, parameter.initial]));
  const values = { ...initial, stack: 'crossing', position: 0, width: 8, angle: 45, repetitionTime: 500, longitudinalRelaxation: 800 };
  const random = { uniform: () => 0, normal: () => 0 };
  for (const phaseEncode of ['column', 'row'] as const) {
    const { re } = crossTalkCause.apply({ ...object, spacing: phaseEncode === 'column' ? [2e-3, 1e-3] : [1e-3, 2e-3] }, values, {
      acquisition: { phaseEncode },
      random,
    });
    // Lines of 2 mm, samples of 1 mm: 45° through the centre is two samples a line, both growing together.
    const at = (line: number, sample: number) => re[phaseEncode === 'column' ? line * 48 + sample : sample * 48 + line] ?? NaN;
    for (const line of [-6, 5, 9]) {
      expect(1 - at(24 + line, 24 + 2 * line)).toBeCloseTo(1 - objectReference.saturationRatio, 9);
      // The band's full width at half maximum is 8 mm across: 12 lines along the phase encoding lie beyond it by far.
      expect(1 - at(24 + line, 24 - 2 * line)).toBeLessThan(0.2);
    }
  }
});

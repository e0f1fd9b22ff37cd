/** A receiver that holds the largest samples at its limit. */
import { transform } from '../../../recon/fourier';
import { simulate } from '../../../recon/simulate';
import { absolute, box, energy, noisePlane } from '../planes';

const clipped = (object: Parameters<typeof simulate>[0], level: number) =>
  simulate(
    object,
    { steps: [{ cause: 'clipping', parameters: { level } }], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 },
    { phaseEncode: 'column' },
  );

describe('Clipping', () => {
  test.each([0.05, 0.2, 0.9])('at %f of the largest sample leaves no part of a sample beyond, and those within as they were', (level) => {
    // Zhuo & Gullapalli, RadioGraphics 2006;26:275 (from memory): data clipping.
    const clean = transform(noisePlane(24, 18));
    const largest = Math.max(...Array.from(clean.re.keys()).map((i) => Math.hypot(clean.re[i] ?? NaN, clean.im[i] ?? NaN)));
    const { kspace } = clipped(noisePlane(24, 18), level);
    for (const part of ['re', 'im'] as const) {
      kspace[part].forEach((value, i) => {
        const before = clean[part][i] ?? NaN;
        // The limit itself carries the rounding of max |K|.
        expect(Math.abs(value)).toBeLessThanOrEqual(level * largest * (1 + 1e-15));
        if (Math.abs(before) < level * largest) expect(value).toBe(before);
        else expect(Math.sign(value)).toBe(Math.sign(before));
      });
    }
  });

  test('makes the centre of k-space a plateau', () => {
    const object = box(64, [20, 45], [22, 43]);
    const { kspace } = clipped(object, 0.2);
    const limit = 0.2 * absolute(transform(object), 32, 32);
    for (const i of [32 * 64 + 32, 33 * 64 + 32, 32 * 64 + 33, 31 * 64 + 32]) expect(kspace.re[i]).toBeCloseTo(limit, 12);
  });

  test('of the centre sample alone takes the same from every pixel: (1 − L)·K(0)/√(NM), air included', () => {
    // A disturbed uniform object: of its k-space only the centre sample is above half of the largest.
    const object = box(32, [0, 32], [0, 32]);
    for (let i = 0; i < 512; i++) object.re[i] = 1.2;
    const centre = absolute(transform(object), 16, 16);
    const { image } = clipped(object, 0.5);
    const loss = (0.5 * centre) / 32;
    expect(image.values[5 * 32 + 5]).toBeCloseTo(1.2 - loss, 11);
    expect(image.values[20 * 32 + 5]).toBeCloseTo(1 - loss, 11);
  });

  test('puts a halo into the air, and takes energy away', () => {
    const object = box(64, [20, 45], [22, 43]);
    const simulation = clipped(object, 0.2);
    expect(simulation.image.values[5 * 64 + 5]).toBeGreaterThan(0.005);
    expect(energy(simulation.kspace)).toBeLessThan(0.6 * energy(object));
  });
});

/** Gain and angle errors of the two channels: the ghost turned by 180°. */
import { inverse, transform } from '../../../recon/fourier';
import { withObjectPhase } from '../../../recon/object-phase';
import { simulate } from '../../../recon/simulate';
import { reference } from '../../reference/values';
import { absolute, box, noisePlane } from '../planes';

const recipe = (gain: number, angle: number) => ({
  steps: [{ cause: 'quadrature-imbalance', parameters: { gain, angle } }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});
const received = (object: Parameters<typeof simulate>[0], gain: number, angle: number) =>
  simulate(object, recipe(gain, angle), { phaseEncode: 'column' });

describe('Quadrature imbalance', () => {
  test.each(reference.quadratureGhost)('of gain %f and %i° makes a ghost of %f, turned by 180° about the centre', (gain, angle, ratio) => {
    // An object off the centre, with a phase, clear of its ghost.
    const object = withObjectPhase(box(64, [8, 16], [40, 52]), { range: 1.6, seed: 3 });
    const { image } = received(object, gain, angle);
    const parent = image.values[10 * 64 + 45] ?? NaN;
    // (row, column) goes to (−row, −column) about (32, 32).
    const ghost = image.values[(64 - 10) * 64 + 64 - 45] ?? NaN;
    expect(ghost / parent).toBeCloseTo(ratio, 9);
    expect(image.values[20 * 64 + 20]).toBeLessThan(1e-12);
  });

  test('is K1·I(r) + K2·I*(−r), computed apart from the model; odd sizes too', () => {
    const object = noisePlane(15, 21);
    const image = inverse(received(object, 1.2, 7).kspace);
    const psi = (7 * Math.PI) / 180;
    const K1 = { re: (1 + 1.2 * Math.cos(psi)) / 2, im: (1.2 * Math.sin(psi)) / 2 };
    const K2 = { re: (1 - 1.2 * Math.cos(psi)) / 2, im: (1.2 * Math.sin(psi)) / 2 };
    for (let row = 0; row < 15; row++) {
      for (let column = 0; column < 21; column++) {
        const i = row * 21 + column;
        const j = (14 - row) * 21 + 20 - column;
        const [a, b, c, d] = [object.re[i] ?? NaN, object.im[i] ?? NaN, object.re[j] ?? NaN, -(object.im[j] ?? NaN)];
        expect(image.re[i]).toBeCloseTo(K1.re * a - K1.im * b + K2.re * c - K2.im * d, 11);
        expect(image.im[i]).toBeCloseTo(K1.re * b + K1.im * a + K2.re * d + K2.im * c, 11);
      }
    }
  });

  test('leaves the real channel as it was', () => {
    const object = noisePlane(16, 12);
    const { kspace } = received(object, 1.1, 5);
    const clean = transform(object);
    kspace.re.forEach((re, i) => expect(re).toBe(clean.re[i]));
  });

  test('only mixes where the object is symmetric and without phase: no ghost beside it', () => {
    const object = box(64, [20, 45], [24, 41]);
    const { image } = received(object, 1.25, 0);
    // 20 … 44 about 32 is symmetric: K is real, and the imaginary channel, which carries the error, is empty.
    expect(absolute(object, 22, 30)).toBeCloseTo(image.values[22 * 64 + 30] ?? NaN, 11);
  });
});

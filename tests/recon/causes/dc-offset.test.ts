/** A constant offset of the receiver: one dot; drifting, a dotted line. */
import { inverse, transform } from '../../../recon/fourier';
import type { ComplexPlane } from '../../../recon/grid';
import { centredGrid, complexZeros } from '../../../recon/grid';
import type { Step } from '../../../recon/recipe';
import { simulate } from '../../../recon/simulate';
import { absolute, box } from '../planes';

/** Signal 1 everywhere: its P99 is 1. */
const uniform = (size: number): ComplexPlane => box(size, [0, size], [0, size]);

/** What was added, in the image. */
function offset(size: number, parameters: { brightness: number; drift: number; phase: number }, phaseEncode: 'row' | 'column' = 'column') {
  const recipe = { steps: [{ cause: 'dc-offset', parameters }], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 };
  const { kspace } = simulate(uniform(size), recipe, { phaseEncode });
  const clean = transform(uniform(size));
  return inverse({
    ...kspace,
    re: kspace.re.map((re, i) => re - (clean.re[i] ?? NaN)),
    im: kspace.im.map((im, i) => im - (clean.im[i] ?? NaN)),
  });
}

test('Constant in all samples, it is its own value at the centre pixel and nothing elsewhere', () => {
  // Closed form: the transform of a constant. Odd sizes too: the centre is floor(N/2).
  for (const size of [64, 45]) {
    const centre = Math.floor(size / 2);
    const dot = offset(size, { brightness: 5, drift: 0, phase: 90 });
    dot.re.forEach((re, i) => {
      expect(re).toBeCloseTo(0, 11);
      expect(dot.im[i]).toBeCloseTo(i === centre * size + centre ? 5 : 0, 11);
    });
  }
});

test('The dot is as bright on a matrix that is not square', () => {
  const object = complexZeros(centredGrid(30, 48, [1e-3, 1e-3]));
  object.re.fill(1);
  const steps = [{ cause: 'dc-offset', parameters: { brightness: 2, drift: 0, phase: 0 } }];
  const { image } = simulate(object, { steps, reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 }, { phaseEncode: 'row' });
  expect(image.values[15 * 48 + 24]).toBeCloseTo(3, 11);
  expect(image.values[15 * 48 + 25]).toBeCloseTo(1, 11);
});

test('Drifting evenly from line to line, it is a dotted line through the centre along the phase encoding, c·d/(2(N−1)·sin(π|y|/N))', () => {
  // Closed form: Σ n·q^n = −N/(1 − q) for q = exp(i2πy/N), and |1 − q| = 2·sin(π|y|/N).
  const drifting = offset(64, { brightness: 4, drift: 50, phase: 0 });
  expect(absolute(drifting, 32, 32)).toBeCloseTo(4, 11);
  for (const y of [1, -1, 3, 20, -32]) {
    expect(absolute(drifting, 32 + y, 32)).toBeCloseTo((4 * 0.5) / (2 * 63 * Math.sin((Math.PI * Math.abs(y)) / 64)), 11);
  }
  expect(absolute(drifting, 30, 33)).toBeCloseTo(0, 11);
});

test('The dotted line follows the phase encoding', () => {
  const drifting = offset(64, { brightness: 4, drift: 50, phase: 0 }, 'row');
  expect(absolute(drifting, 32, 35)).toBeGreaterThan(0.05);
  expect(absolute(drifting, 35, 32)).toBeCloseTo(0, 11);
});

test('Two averages with the RF phase reversed cancel it', () => {
  const object = box(32, [10, 20], [12, 25]);
  const acquire = (phase: number) =>
    simulate(
      object,
      {
        steps: [{ cause: 'dc-offset', parameters: { brightness: 3, drift: 0, phase } }],
        reconstruction: { method: 'zero-filled', parameters: {} },
        seed: 1,
      },
      { phaseEncode: 'column' },
    ).kspace;
  // Reversing the RF reverses the signal; subtracting the second scan is adding one whose offset alone is reversed.
  const [first, second, clean] = [acquire(0), acquire(180), transform(object)];
  first.re.forEach((re, i) => expect((re + (second.re[i] ?? NaN)) / 2).toBeCloseTo(clean.re[i] ?? NaN, 12));
});

test('Lines that are not taken hold no offset', () => {
  const steps: Step[] = [
    { cause: 'uniform-undersampling', parameters: { accelerationFactor: 2, calibrationLines: 0 } },
    { cause: 'dc-offset', parameters: { brightness: 3, drift: 0, phase: 0 } },
  ];
  const { image } = simulate(
    box(64, [30, 34], [10, 20]),
    { steps, reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 },
    { phaseEncode: 'column' },
  );
  // Every second line: the dot folds too, half at the centre and half at the edge, 32 rows on. P99 of an object of 40 of 4096 pixels is 1 or,
  // at the rank between them, a little less, and is set right for the lines that were skipped.
  expect((image.values[32 * 64 + 32] ?? NaN) / (image.values[32] ?? NaN)).toBeCloseTo(1, 9);
});

test('The dot is relative to the brightest hundredth of the object, not to its mean', () => {
  const object = uniform(64);
  object.re.fill(4, 0, 8 * 64);
  const steps = [{ cause: 'dc-offset', parameters: { brightness: 2, drift: 0, phase: 0 } }];
  const { image } = simulate(object, { steps, reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 }, { phaseEncode: 'row' });
  expect(image.values[32 * 64 + 32]).toBeCloseTo(1 + 2 * 4, 10);
});

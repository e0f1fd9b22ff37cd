/** Moiré: fringes of period L/(8rc) where anatomy lies over itself, worked out from the phase that the header of the model states. */
import { simulate } from '../../../recon/simulate';
import { box } from '../planes';

const moire = (parameters: Record<string, number>) => ({
  steps: [{ cause: 'moire', parameters }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});
const even = box(96, [0, 96], [40, 50]);

test('Where an even object lies over itself the two add up as 2|cos(8πc·r·t/L)|, t from the middle of the overlap', () => {
  const [L, n, c] = [96, 72, 4];
  const { image } = simulate(even, moire({ fraction: 0.75, cycles: c }), { phaseEncode: 'column' });
  expect(image.rows).toBe(n);
  const overlap: number[] = [];
  for (let row = 0; row < n; row++) {
    const y = row - n / 2;
    const value = image.values[row * 96 + 45] ?? NaN;
    // A pixel holds y and y ± n where that lies within the object, −48 ≤ y < 48.
    const partner = y < 0 ? y + n : y - n;
    if (partner < -L / 2 || partner >= L / 2) expect(value).toBeCloseTo(1, 10);
    else {
      const t = y < 0 ? y + n / 2 : y - n / 2;
      expect(value).toBeCloseTo(2 * Math.abs(Math.cos((8 * Math.PI * c * (n / L) * t) / L)), 9);
      overlap.push(value);
    }
  }
  expect(overlap).toHaveLength(L - n);
  expect(Math.max(...overlap) - Math.min(...overlap)).toBeGreaterThan(1.5);
});

test('Without phase the overlap is even: plain wrap-around', () => {
  const { image } = simulate(even, moire({ fraction: 0.75, cycles: 0 }), { phaseEncode: 'column' });
  expect(image.values[2 * 96 + 45]).toBeCloseTo(2, 12);
  expect(image.values[36 * 96 + 45]).toBeCloseTo(1, 12);
});

test('Without folding there are no fringes: only the phase of the object changes', () => {
  const { image } = simulate(even, moire({ fraction: 1, cycles: 10 }), { phaseEncode: 'column' });
  image.values.forEach((value, i) => expect(value).toBeCloseTo(even.re[i] ?? NaN, 11));
});

test('Fringes run across the phase encoding, whichever axis it is', () => {
  const wide = box(96, [40, 50], [0, 96]);
  const { image } = simulate(wide, moire({ fraction: 0.75, cycles: 4 }), { phaseEncode: 'row' });
  const upright = simulate(even, moire({ fraction: 0.75, cycles: 4 }), { phaseEncode: 'column' }).image;
  for (let k = 0; k < 72; k++) expect(image.values[45 * 72 + k]).toBeCloseTo(upright.values[k * 96 + 45] ?? NaN, 10);
});

test('The folded field of view is rounded to the nearest whole line', () => {
  expect(simulate(even, moire({ fraction: 0.76, cycles: 1 }), { phaseEncode: 'column' }).image.rows).toBe(73);
});

/** A cubic warp: where points go, how bright they become, and what a distance test says. */
import { cubicCoefficient, sourceOf } from '../../../recon/causes/gradient-non-linearity';
import { centredGrid, complexZeros } from '../../../recon/grid';
import type { ComplexPlane, Plane } from '../../../recon/grid';
import { simulate } from '../../../recon/simulate';
import { disc } from '../uniformity';

const warped = (object: ComplexPlane, displacement: number): Plane =>
  simulate(
    object,
    {
      steps: [{ cause: 'gradient-non-linearity', parameters: { displacement } }],
      reconstruction: { method: 'zero-filled', parameters: {} },
      seed: 1,
    },
    { phaseEncode: 'column' },
  ).image;

/** Blobs of σ 2 px at distances of `at` pixels to the right of the centre; 96 pixels of 5 mm: 48 cm. */
function blobs(at: readonly number[]): ComplexPlane {
  const plane = complexZeros(centredGrid(96, 96, [5e-3, 5e-3]));
  for (let i = 0; i < plane.re.length; i++) {
    const [y, x] = [Math.floor(i / 96) - 48, (i % 96) - 48];
    plane.re[i] = at.reduce((sum, d) => sum + Math.exp(-((x - d) ** 2 + y * y) / 8), 0);
  }
  return plane;
}

/** Centre of mass, in columns from the centre, within 8 px of `near` on both axes. */
function centreOfMass({ values }: Plane, near: number): number {
  let sum = 0;
  let moment = 0;
  for (let y = -8; y <= 8; y++) {
    for (let x = Math.round(near) - 8; x <= Math.round(near) + 8; x++) {
      const value = values[(48 + y) * 96 + 48 + x] ?? NaN;
      sum += value;
      moment += value * x;
    }
  }
  return moment / sum;
}

const total = (values: ArrayLike<number>): number => Array.from(values).reduce((sum, value) => sum + value, 0);

describe('The cubic warp', () => {
  test('has the displacement asked for at 20 cm and an eighth of it at 10 cm', () => {
    expect(cubicCoefficient(8e-3) * 0.2 ** 3).toBeCloseTo(8e-3, 15);
    const image = warped(blobs([-40, 20, 40]), 8);
    // 20 cm are 40 px, 8 mm 1.6 px. Bilinear values keep a centre of mass; the cubic is not linear over a blob of σ 2 px:
    // ½·6κr·σ² = 3·1.6/40³·40·4 = 0.012 px, twice over for the brightness across.
    expect(Math.abs(centreOfMass(image, 40) - 38.4)).toBeLessThan(0.03);
    expect(Math.abs(centreOfMass(image, -40) + 38.4)).toBeLessThan(0.03);
    expect(Math.abs(centreOfMass(image, 20) - 19.8)).toBeLessThan(0.03);
  });

  test('pushes outwards below 0', () => {
    expect(Math.abs(centreOfMass(warped(blobs([36]), -8), 36) - (36 + 1.6 * (36 / 40) ** 3))).toBeLessThan(0.03);
  });

  test('errs by κ·r² in the distance of two opposite points: 4 % of 40 cm at 8 mm', () => {
    // NEMA MS 2 (from memory): 100·(measured − true)/true over a diameter.
    const image = warped(blobs([-40, 40]), 8);
    const error = (100 * (centreOfMass(image, 40) - centreOfMass(image, -40) - 80)) / 80;
    // 0.03 px at either end.
    expect(Math.abs(error + 4)).toBeLessThan(0.08);
  });

  test('keeps signal: what is drawn together is brighter', () => {
    const object = blobs([-30, 10, 36]);
    // Bilinear values of a blob of σ 2 px lie up to f″/8 = 3 % low at its top and as high on its flanks; most of that cancels. Without
    // the factor of the area a fifth of the outer blobs would be lost.
    expect(Math.abs(total(warped(object, 15).values) / total(object.re) - 1)).toBeLessThan(0.01);
  });

  test('makes a uniform region brighter by 1/((1 − κr²)(1 − 3κr²))', () => {
    const image = warped(disc(96, 47, 5e-3), 10);
    const kappa = cubicCoefficient(10e-3);
    // What appears 30 px from the centre comes from r: r − κr³ = 15 cm.
    const r = 0.15 * (sourceOf(kappa * 0.15 ** 2)?.scale ?? NaN);
    expect(r - kappa * r ** 3).toBeCloseTo(0.15, 12);
    expect(image.values[48 * 96 + 78]).toBeCloseTo(1 / ((1 - kappa * r * r) * (1 - 3 * kappa * r * r)), 9);
    expect(image.values[48 * 96 + 48]).toBeCloseTo(1, 12);
  });

  test('has no source beyond the turning point, r = 1/√(3κ), which appears at two thirds of it', () => {
    // Closed form: r' = r(1 − κr²) is largest there, and κr'² = 4/27.
    expect(sourceOf(4 / 27 + 1e-9)).toBeUndefined();
    // Newton's method gains one bit a time at the double root: 2^−12 of the way is left.
    expect(Math.abs((sourceOf(4 / 27 - 1e-6)?.scale ?? NaN) - 1.5)).toBeLessThan(0.01);
  });

  test('of a field of view of 20 cm at 5 mm moves nothing by more than a pixel of 1 mm', () => {
    // The corner lies 14 cm out: 5 mm·(14/20)³ = 1.8 mm; the edge 10 cm: 0.6 mm.
    expect(cubicCoefficient(5e-3) * 0.1 ** 3).toBeLessThan(1e-3);
  });
});

test('Distances are metres along both axes: a uniform region of oblong pixels is brighter by its distance alone', () => {
  const oblong = { ...disc(96, 47, 5e-3), spacing: [5e-3, 2.5e-3] as const };
  const image = warped(oblong, 10);
  const kappa = cubicCoefficient(10e-3);
  const r = 0.075 * (sourceOf(kappa * 0.075 ** 2)?.scale ?? NaN);
  const expected = 1 / ((1 - kappa * r * r) * (1 - 3 * kappa * r * r));
  // 7.5 cm to the right are 30 columns of 2.5 mm; downwards, 15 rows of 5 mm.
  expect(image.values[48 * 96 + 78]).toBeCloseTo(expected, 9);
  expect(image.values[63 * 96 + 48]).toBeCloseTo(expected, 9);
});

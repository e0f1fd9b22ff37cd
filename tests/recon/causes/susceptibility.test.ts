/** The field about a ball and a rod (Schenck 1996), which way it points in a picture, and what it does to the image. */
import type { Acquisition } from '../../../recon/acquisition';
import { describeCause } from '../../../recon/catalogue';
import { susceptibility } from '../../../recon/causes/susceptibility';
import type { Dipole } from '../../../recon/dipole-field';
import { dipoleField, outsideBody } from '../../../recon/dipole-field';
import { fieldDirectionOf } from '../../../recon/field-direction';
import { centredGrid } from '../../../recon/grid';
import { simulate } from '../../../recon/simulate';
import { box } from '../planes';

const acquisition: Acquisition = { phaseEncode: 'column' };
const grid = centredGrid(65, 65, [1e-3, 1e-3]);
const dipole: Dipole = {
  shape: 'ball',
  radius: 0.005,
  susceptibility: 9e-6,
  alongPhaseEncode: 0,
  alongReadout: 0,
  height: 0,
  toNormal: 0,
  inPlane: 0,
};
const scan = { frequency: 64e6, sliceThickness: 0.004 };
/** Hertz of Δχ/3 = 3 ppm at 64 MHz. */
const third = 192;
const at = (values: Float64Array, p: number, q: number): number => values[(32 + p) * 65 + 32 + q] ?? NaN;

describe('The field of a ball', () => {
  test('along the main field is twice as large as across it and of the other sign, and falls with the third power', () => {
    const { hertz } = dipoleField(grid, acquisition, { ...dipole, toNormal: Math.PI / 2, inPlane: 0 }, scan);
    // 3cos²θ − 1 = 2 along and −1 across.
    expect(at(hertz, 10, 0)).toBeCloseTo(third * 2 * 0.5 ** 3, 9);
    expect(at(hertz, 0, 10)).toBeCloseTo(-third * 0.5 ** 3, 9);
    expect(at(hertz, 20, 0)).toBeCloseTo(at(hertz, 10, 0) / 8, 9);
    expect(at(hertz, 5, 0)).toBeCloseTo(2 * third, 9);
  });

  test('in a plane across the main field is the same all around', () => {
    const { hertz } = dipoleField(grid, acquisition, dipole, scan);
    for (const [p, q] of [
      [10, 0],
      [0, 10],
      [6, 8],
      [-8, 6],
    ] as const)
      expect(at(hertz, p, q)).toBeCloseTo(-third / 8, 9);
  });

  test('vanishes at the magic angle of 54.74°', () => {
    const { hertz } = dipoleField(grid, acquisition, { ...dipole, toNormal: Math.PI / 2, inPlane: Math.acos(1 / Math.sqrt(3)) }, scan);
    expect(at(hertz, 12, 0)).toBeCloseTo(0, 9);
  });

  test('changes through the slice by its slope there', () => {
    const away = { ...dipole, height: 0.008, toNormal: 0.4, inPlane: 0.3 };
    const step = 1e-6;
    const { acrossSlice } = dipoleField(grid, acquisition, away, scan);
    const above = dipoleField(grid, acquisition, { ...away, height: away.height + step / 2 }, scan).hertz;
    const below = dipoleField(grid, acquisition, { ...away, height: away.height - step / 2 }, scan).hertz;
    for (const [p, q] of [
      [0, 0],
      [7, -3],
      [-11, 4],
    ] as const) {
      // Central difference over 1 µm: its error is the third derivative times 4e-14, and rounding 1e-13 of 200 Hz over 1e-6.
      expect(at(acrossSlice, p, q)).toBeCloseTo(((at(above, p, q) - at(below, p, q)) / step) * scan.sliceThickness, 5);
    }
  });

  test('averages to nothing over a sphere about it (Laplace)', () => {
    // Twelve directions, the corners of an icosahedron, integrate 3cos²θ − 1 exactly: here over heights and places in the plane.
    const golden = (1 + Math.sqrt(5)) / 2;
    const length = Math.sqrt(1 + golden ** 2);
    let sum = 0;
    for (const [x, y, z] of [
      [0, 1, golden],
      [1, golden, 0],
      [golden, 0, 1],
    ] as const) {
      for (const [s, t] of [
        [1, 1],
        [1, -1],
        [-1, 1],
        [-1, -1],
      ] as const) {
        const [p, q, h] = [x * (x ? s : 1), y * (y && !x ? s : y ? t : 1), z * t].map((value) => (0.012 * value) / length);
        const point = { ...centredGrid(1, 1, [1e-3, 1e-3]) };
        const off = { alongPhaseEncode: -(p ?? NaN) / 1e-3, alongReadout: -(q ?? NaN) / 1e-3, height: h ?? NaN };
        sum += dipoleField(point, acquisition, { ...dipole, ...off, toNormal: 0.7, inPlane: 0.2 }, scan).hertz[0] ?? NaN;
      }
    }
    expect(sum).toBeCloseTo(0, 8);
  });
});

describe('The field of a rod through the slice', () => {
  const rod: Dipole = { ...dipole, shape: 'rod', toNormal: Math.PI / 2 };
  test('across the main field is (Δχ/2)(a/r)²cos 2ψ', () => {
    const { hertz } = dipoleField(grid, acquisition, rod, scan);
    expect(at(hertz, 10, 0)).toBeCloseTo(1.5 * third * 0.25, 9);
    expect(at(hertz, 0, 10)).toBeCloseTo(-1.5 * third * 0.25, 9);
    expect(at(hertz, 7, 7)).toBeCloseTo(0, 9);
  });

  test('along the main field is none', () => {
    const { hertz } = dipoleField(grid, acquisition, { ...rod, toNormal: 0 }, scan);
    expect(hertz.every((value) => Math.abs(value) < 1e-12)).toBe(true);
  });
});

test('The body has no signal; a ball beside the slice leaves none out', () => {
  expect(at(outsideBody(grid, acquisition, dipole), 0, 3)).toBe(0);
  expect(at(outsideBody(grid, acquisition, dipole), 0, 5)).toBeCloseTo(0.5, 12);
  expect(outsideBody(grid, acquisition, { ...dipole, height: 0.006 }).every((part) => part === 1)).toBe(true);
});

describe('The image of metal', () => {
  const recipe = (parameters: Record<string, number | string>) => ({
    steps: [
      { cause: 'susceptibility', parameters: { alongPhaseEncode: 0, toNormal: 0, radius: 4, bandwidth: 200, echoTime: 10, ...parameters } },
    ],
    reconstruction: { method: 'zero-filled', parameters: {} },
    seed: 1,
  });
  const even = box(96, [4, 92], [4, 92]);
  const total = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0);
  const brightest = (values: Float64Array) => values.reduce((most, value) => Math.max(most, value), 0);

  test('in a spin echo keeps all signal but that of the body, and piles it up in a rim', () => {
    const { image } = simulate(even, recipe({ sequence: 'spin-echo' }), acquisition);
    // The body: π·4² pixels, to the grain of its edge; the frame of 4 pixels catches what moves at the border.
    expect(Math.abs(total(image.values) - 88 * 88 + Math.PI * 16)).toBeLessThan(1);
    expect(brightest(image.values)).toBeGreaterThan(2);
  });

  test('in a gradient echo loses more, the more the longer TE', () => {
    const left = (echoTime: number) => total(simulate(even, recipe({ sequence: 'gradient-echo', echoTime }), acquisition).image.values);
    expect(left(20)).toBeLessThan(left(5));
    expect(left(5)).toBeLessThan(total(simulate(even, recipe({ sequence: 'spin-echo' }), acquisition).image.values));
  });

  test('is bent less with more bandwidth', () => {
    const off = (bandwidth: number) =>
      simulate(even, recipe({ sequence: 'spin-echo', bandwidth }), acquisition).image.values.reduce(
        (sum, value, i) => sum + Math.abs(value - (even.re[i] ?? NaN)),
        0,
      );
    expect(off(800)).toBeLessThan(0.5 * off(100));
  });
});

describe('The direction of the main field', () => {
  const axial = [1, 0, 0, 0, 1, 0];
  const coronal = [1, 0, 0, 0, 0, -1];
  const sagittal = [0, 1, 0, 0, 0, -1];
  const angles = (orientation: number[], phaseEncode: 'row' | 'column', position = 'HFS') => {
    const fieldDirection = fieldDirectionOf(orientation, position);
    const parameters = describeCause(susceptibility, fieldDirection ? { phaseEncode, fieldDirection } : { phaseEncode }).parameters;
    return ['toNormal', 'inPlane'].map((id) => parameters.find((parameter) => parameter.id === id)?.initial);
  };

  test('is along the normal of an axial slice, and along the columns of a coronal or sagittal one', () => {
    expect(angles(axial, 'column')).toEqual([0, 0]);
    expect(angles(coronal, 'column')).toEqual([90, 0]);
    expect(angles(coronal, 'row')).toEqual([90, 90]);
    expect(angles(sagittal, 'row')).toEqual([90, 90]);
  });

  test('of a slice tilted by 30° from axial lies 30° off its normal', () => {
    const tilt = Math.PI / 6;
    expect(angles([1, 0, 0, 0, Math.cos(tilt), Math.sin(tilt)], 'column')).toEqual([30, 0]);
  });

  test('is not concluded for a patient on the side, or from half an orientation', () => {
    expect(fieldDirectionOf(axial, 'HFDR')).toBeUndefined();
    expect(fieldDirectionOf([1, 0, 0], 'HFS')).toBeUndefined();
  });
});

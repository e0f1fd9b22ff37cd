/** The transform against its definition, against an independent package, and by the theorems that it must obey. */
import { assert, integer, property, tuple } from 'fast-check';
import { fft } from 'fft-js';
import { inverse, inverseAlong, transform, transformAlong, transformOfReal } from '../../recon/fourier';
import { centredGrid, complexZeros } from '../../recon/grid';
import { giveBackPlane } from '../../recon/spare-arrays';
import { explicitTransform } from './explicit-transform';
import { absolute, energy, largestDifference, noisePlane } from './planes';

/** Rounding of float64 grows with the sums: 1e-16 × the modulus of the largest sample (about 5) × passes, with room to spare. */
const rounding = 1e-13;

describe('The transform equals the explicit sum', () => {
  // 16: radix 4. 12 × 18: 2, 3, 4. 15 × 21: odd, 3, 5, 7. 22 × 13: 11, 13. 40 × 6: 8 and 5, 2 and 3. 17 × 34 and 1 × 19: primes that need the chirp.
  const sizes = [
    [16, 16],
    [12, 18],
    [15, 21],
    [22, 13],
    [40, 6],
    [17, 34],
    [1, 19],
    [5, 1],
  ] as const;
  test.each(sizes)('on %i rows and %i columns, there and back', (rows, columns) => {
    const plane = noisePlane(rows, columns);
    // The explicit sum rounds its angles too: 2π · rows · columns turns at 1e-16.
    expect(largestDifference(transform(plane), { ...plane, ...explicitTransform(plane, 'forward') })).toBeLessThan(rounding);
    expect(largestDifference(inverse(plane), { ...plane, ...explicitTransform(plane, 'inverse') })).toBeLessThan(rounding);
  });
});

describe('The transform equals fft-js', () => {
  test.each([8, 64, 256])('along a line of %i samples', (n) => {
    const plane = noisePlane(1, n);
    // fft-js counts from index 0 and does not scale.
    const rotated = Array.from({ length: n }, (_, j) => {
      const i = (j + n / 2) % n;
      return [plane.re[i] ?? NaN, plane.im[i] ?? NaN] as const;
    });
    const expected = fft(rotated);
    const result = transformAlong(plane, 1);
    expected.forEach(([re, im], j) => {
      const i = (j + n / 2) % n;
      expect(result.re[i]).toBeCloseTo(re / Math.sqrt(n), 12);
      expect(result.im[i]).toBeCloseTo(im / Math.sqrt(n), 12);
    });
  });
});

describe('What is passed over would have been the same', () => {
  // Even and odd on either axis, a single row and a single column.
  test.each([
    [16, 18],
    [15, 21],
    [12, 17],
    [13, 10],
    [1, 9],
    [8, 1],
  ])('A real plane of %i rows and %i columns has the explicit sum as its transform too', (rows, columns) => {
    const { re: values, im: _, ...grid } = noisePlane(rows, columns);
    const expected = explicitTransform({ ...grid, re: values, im: new Float64Array(values.length) }, 'forward');
    expect(largestDifference(transformOfReal({ ...grid, values }), { ...grid, ...expected })).toBeLessThan(rounding);
  });

  test.each(['rows', 'columns'])('Empty %s of k-space, on either side of the centre and through it', (emptied) => {
    const plane = noisePlane(20, 18);
    plane.re.forEach((_, i) => {
      const line = emptied === 'rows' ? Math.floor(i / 18) : i % 18;
      if (line % 3 !== 0) return;
      plane.re[i] = 0;
      plane.im[i] = 0;
    });
    expect(largestDifference(inverse(plane), { ...plane, ...explicitTransform(plane, 'inverse') })).toBeLessThan(rounding);
  });

  test('Nothing at all has nothing as its transform, whatever was transformed before', () => {
    giveBackPlane(transform(noisePlane(8, 6)));
    expect(energy(transform(complexZeros(centredGrid(8, 6, [1, 1]))))).toBe(0);
  });
});

describe('Theorems of the transform', () => {
  const sizes = tuple(integer({ min: 1, max: 70 }), integer({ min: 1, max: 70 }), integer({ min: 0, max: 1e6 }));
  const seeded = { seed: 7, numRuns: 60 };

  test('The way back restores the plane, for any size', () => {
    assert(
      property(sizes, ([rows, columns, seed]) => {
        const plane = noisePlane(rows, columns, seed);
        expect(largestDifference(inverse(transform(plane)), plane)).toBeLessThan(rounding);
      }),
      seeded,
    );
  });

  test('Energy is the same in both domains (Parseval)', () => {
    assert(
      property(sizes, ([rows, columns, seed]) => {
        const plane = noisePlane(rows, columns, seed);
        expect(energy(transform(plane)) / energy(plane)).toBeCloseTo(1, 12);
      }),
      seeded,
    );
  });

  test('Both axes one after the other make the plane transform', () => {
    const plane = noisePlane(24, 35);
    expect(largestDifference(transformAlong(transformAlong(plane, 0), 1), transform(plane))).toBeLessThan(rounding);
    expect(largestDifference(inverseAlong(inverseAlong(plane, 1), 0), inverse(plane))).toBeLessThan(rounding);
  });

  test.each([
    [32, 3],
    [27, -4],
    [31, 5],
  ])('On %i rows the phase factor exp(−i2π·ky·d/M) moves the image by %i rows', (rows, d) => {
    const plane = noisePlane(rows, 9);
    const kspace = transform(plane);
    for (let row = 0; row < rows; row++) {
      const angle = (-2 * Math.PI * (row - Math.floor(rows / 2)) * d) / rows;
      for (let i = row * 9; i < (row + 1) * 9; i++) {
        const a = kspace.re[i] ?? NaN;
        const b = kspace.im[i] ?? NaN;
        kspace.re[i] = a * Math.cos(angle) - b * Math.sin(angle);
        kspace.im[i] = a * Math.sin(angle) + b * Math.cos(angle);
      }
    }
    const moved = complexZeros(plane);
    for (let row = 0; row < rows; row++) {
      const from = (((row - d) % rows) + rows) % rows;
      moved.re.set(plane.re.subarray(from * 9, (from + 1) * 9), row * 9);
      moved.im.set(plane.im.subarray(from * 9, (from + 1) * 9), row * 9);
    }
    expect(largestDifference(inverse(kspace), moved)).toBeLessThan(rounding);
  });

  test('A constant c is c·√(N·M) at the zero frequency and nothing elsewhere', () => {
    const plane = complexZeros(centredGrid(15, 20, [1, 1]));
    plane.re.fill(3);
    const kspace = transform(plane);
    expect(absolute(kspace, 7, 10)).toBeCloseTo(3 * Math.sqrt(300), 10);
    expect(energy(kspace)).toBeCloseTo(9 * 300, 8);
  });

  test('A magnitude has Hermitian k-space: K(−k) is the conjugate of K(k)', () => {
    const plane = noisePlane(16, 16);
    plane.im.fill(0);
    const { re, im } = transform(plane);
    for (const [row, column] of [
      [3, 5],
      [8, 1],
      [12, 15],
    ] as const) {
      const i = row * 16 + column;
      const opposite = (16 - row) * 16 + 16 - column;
      expect(re[opposite]).toBeCloseTo(re[i] ?? NaN, 12);
      expect(im[opposite]).toBeCloseTo(-(im[i] ?? NaN), 12);
    }
  });
});

describe('The grid of k-space', () => {
  test('has a spacing of one cycle over the field of view, in cycles per metre, about zero; the way back restores the image grid', () => {
    const image = complexZeros(centredGrid(15, 20, [2e-3, 1e-3]));
    const kspace = transform(image);
    expect(kspace.spacing[0]).toBeCloseTo(1 / (15 * 2e-3), 10);
    expect(kspace.spacing[1]).toBeCloseTo(1 / (20 * 1e-3), 10);
    expect(kspace.origin[0]).toBeCloseTo(-7 / (15 * 2e-3), 10);
    const back = inverse(kspace);
    expect(back.spacing[0]).toBeCloseTo(2e-3, 15);
    expect(back.origin[1]).toBeCloseTo(-10e-3, 15);
    expect(transformAlong(image, 1).spacing[0]).toBe(2e-3);
  });

  test('and the plane that was transformed stays as it was', () => {
    const plane = noisePlane(17, 16);
    const before = { re: plane.re.slice(), im: plane.im.slice() };
    inverse(transform(plane));
    expect(plane.re).toEqual(before.re);
    expect(plane.im).toEqual(before.im);
  });
});

/** Phase errors from line to line: haze, mains ghosts, shift and blur, each against its closed form. */
import { jv } from 'cephes';
import { linePhaseErrors } from '../../../recon/causes/line-phase-errors';
import { partialFourier } from '../../../recon/causes/partial-fourier';
import { inverse } from '../../../recon/fourier';
import type { ComplexPlane } from '../../../recon/grid';
import type { ParameterValues } from '../../../recon/recipe';
import { encodingReference as reference } from '../../reference/encoding-values';
import { actOnKspace, actOnObject, columnEncoded } from '../act-on-kspace';
import { absolute, box, energy, noisePlane } from '../planes';
import { column } from '../point-spread';

const none: ParameterValues = { instability: 0, hum: 0, mains: '50', drift: 0, bend: 0 };
const imageOf = (object: ComplexPlane, values: ParameterValues, repetitionTime = 0.5) =>
  inverse(actOnObject(linePhaseErrors, object, { ...none, ...values }, { ...columnEncoded, repetitionTime }));

describe('Random errors', () => {
  test.each([0.1, 0.3, 0.5])('of %f rad put the energy 1 − exp(−σ²) into the haze', (sigma) => {
    const n = 4096;
    const image = inverse(
      actOnKspace(
        linePhaseErrors,
        column(n, () => 1),
        { ...none, instability: sigma },
      ),
    );
    const coherent = absolute(image, n / 2, 0) ** 2 / n;
    // |mean exp(iε)|² over 4096 lines: its standard deviation is under σ²·√2/√4096 = 0.022·σ²; four of them.
    expect(Math.abs(coherent - Math.exp(-(sigma ** 2)))).toBeLessThan(0.09 * sigma ** 2);
    expect(energy(image)).toBeCloseTo(n, 6);
  });
});

describe('Mains hum', () => {
  test('of 60 Hz at TR 33 ms makes ghosts −0.02 of the field of view away, J1(a) bright', () => {
    // 100 lines hold two whole periods of −0.02 cycles a line: the ghosts fall on pixels 48 and 52.
    const image = imageOf(box(100, [49, 51], [40, 60]), { hum: 0.1, mains: '60' }, 0.033);
    const shift = 100 * reference.mainsGhost;
    for (const side of [-1, 1]) {
      // J2(0.1) = 0.001 and J0 do not overlap: the box is as wide as the spacing.
      expect(absolute(image, 50 + side * shift, 50)).toBeCloseTo(jv(1, 0.1), 9);
    }
    expect(absolute(image, 50, 50)).toBeCloseTo(jv(0, 0.1), 4);
  });

  test('makes none where TR is a whole number of its periods', () => {
    const object = box(64, [30, 34], [20, 44]);
    expect(absolute(imageOf(object, { hum: 0.5, mains: '50' }, 0.04), 40, 30)).toBeLessThan(1e-9);
    expect(absolute(imageOf(object, { hum: 0.5, mains: '60' }, 0.05), 40, 30)).toBeLessThan(1e-9);
    expect(absolute(imageOf(object, { hum: 0.5, mains: '50' }, 0.0425), 40, 30)).toBeGreaterThan(0.1);
  });
});

describe('Drift', () => {
  test('of D rad over the scan moves the image by −D/2π pixels: exp(−i2πkd/N) moves by +d', () => {
    const object = noisePlane(32, 6);
    const image = imageOf(object, { drift: -2 * Math.PI * 3 });
    for (let row = 0; row < 32; row++) expect(absolute(image, (row + 3) % 32, 2)).toBeCloseTo(absolute(object, row, 2), 11);
  });

  test('that bends blurs: a point spreads over about 8B/2π pixels, its energy kept', () => {
    const point = column(256, () => 1);
    const image = inverse(actOnKspace(linePhaseErrors, point, { ...none, bend: 10 }));
    const bright = Array.from({ length: 256 }, (_, row) => absolute(image, row, 0)).filter(
      (value) => value > 0.5 * 16 * Math.sqrt(1 / 12.7),
    );
    // The phase runs at 2B·(2n/N − 1)·2/N a line: from −4B to 4B rad over the scan, 8B/2π = 12.7 px. Fresnel ripples at its ends: 3 px.
    expect(Math.abs(bright.length - 12.7)).toBeLessThan(3);
    expect(energy(image)).toBeCloseTo(256, 8);
  });
});

test('The magnitude of k-space stays', () => {
  const object = noisePlane(16, 8);
  const before = actOnObject(linePhaseErrors, object, none);
  const after = actOnObject(linePhaseErrors, object, { instability: 1, hum: 1, mains: '60', drift: 9, bend: -4 });
  after.re.forEach((_, i) => expect(absolute(after, 0, i)).toBeCloseTo(absolute(before, 0, i), 12));
});

describe('Line by line', () => {
  const a = 2 * Math.PI * 60 * 0.033;

  test('ε_n = a·sin(2πf·T·n) + D·n/N + B·(2n/N − 1)², n from the first line', () => {
    const { re, im } = actOnKspace(
      linePhaseErrors,
      column(10, () => 1),
      { ...none, hum: 0.4, mains: '60', drift: 1.5, bend: 0.7 },
      { ...columnEncoded, repetitionTime: 0.033 },
    );
    for (let n = 0; n < 10; n++) {
      const error = 0.4 * Math.sin(a * n) + 0.15 * n + 0.7 * (n / 5 - 1) ** 2;
      expect(re[n]).toBeCloseTo(Math.cos(error), 12);
      expect(im[n]).toBeCloseTo(Math.sin(error), 12);
    }
  });

  test('averages lengthen the time from line to line', () => {
    const of = (repetitionTime: number, averages: number) =>
      actOnKspace(
        linePhaseErrors,
        column(16, () => 1),
        { ...none, hum: 0.4 },
        { ...columnEncoded, repetitionTime, averages },
      );
    expect(of(0.013, 3)).toEqual(of(0.039, 1));
  });

  test('n and N count the lines that are taken: skipped lines take no time', () => {
    // Twelve of sixteen lines: the first four are left out.
    const ones = column(16, () => 1);
    const partial = actOnKspace(partialFourier, ones, { fraction: 0.75 });
    const { re, im } = actOnKspace(linePhaseErrors, partial, { ...none, drift: 2, bend: -0.6 });
    for (let n = 0; n < 12; n++) {
      const error = (2 * n) / 12 - 0.6 * (n / 6 - 1) ** 2;
      expect(re[4 + n]).toBeCloseTo(Math.cos(error), 12);
      expect(im[4 + n]).toBeCloseTo(Math.sin(error), 12);
    }
  });
});

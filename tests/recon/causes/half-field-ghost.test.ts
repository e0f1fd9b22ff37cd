/** The half-field ghost: closed form, numpy, and the published distance of ghosts of more shots. */
import type { Acquisition } from '../../../recon/acquisition';
import { ellipticalCoverage } from '../../../recon/causes/elliptical-coverage';
import { halfFieldGhost } from '../../../recon/causes/half-field-ghost';
import { uniformUndersampling } from '../../../recon/causes/uniform-undersampling';
import { inverse, transform } from '../../../recon/fourier';
import type { ComplexPlane } from '../../../recon/grid';
import { asComplex, magnitude } from '../../../recon/grid';
import type { ParameterValues } from '../../../recon/recipe';
import { encodingReference as reference } from '../../reference/encoding-values';
import { actOnKspace, actOnObject, columnEncoded } from '../act-on-kspace';
import { absolute, box, energy, noisePlane } from '../planes';

const none: ParameterValues = { phase: 0, shift: 0, imbalance: 0, shots: 1 };
const ghosted = (object: ComplexPlane, values: ParameterValues, acquisition: Acquisition = columnEncoded) =>
  inverse(actOnObject(halfFieldGhost, object, { ...none, ...values }, acquisition));

describe('A constant phase between odd and even echoes', () => {
  test.each([0.05, 0.1, 0.2] as const)('of %f rad leaves cos φ of the parent and makes a ghost of sin φ half a field away', (phase) => {
    const image = ghosted(box(64, [28, 36], [20, 44]), { phase });
    expect(absolute(image, 30, 30)).toBeCloseTo(reference.halfField[phase].parent, 9);
    expect(absolute(image, 62, 30)).toBeCloseTo(reference.halfField[phase].ghost, 9);
    expect(absolute(image, 62, 30) / absolute(image, 30, 30)).toBeCloseTo(reference.halfField[phase].ratio, 9);
  });

  test('of π/6 makes a ghost of half the brightness', () => {
    const image = ghosted(box(64, [28, 36], [20, 44]), { phase: Math.PI / 6 });
    expect(absolute(image, 30, 30)).toBeCloseTo(reference.halfFieldStrong.parent, 9);
    expect(absolute(image, 62, 30)).toBeCloseTo(0.5, 9);
    expect(absolute(image, 62, 30) / absolute(image, 30, 30)).toBeCloseTo(reference.halfFieldStrong.ratio, 9);
  });

  test('gives the ratio of the outside simulation', () => {
    const image = ghosted(box(128, [40, 60], [50, 70]), { phase: 0.1 });
    expect(absolute(image, 50 + 64, 60) / absolute(image, 50, 60)).toBeCloseTo(reference.halfFieldSimulated, 9);
  });

  test('cannot be seen in the k-space of the magnitude image: both polarities have the phase 0 there', () => {
    // A box that does not meet its ghost: the magnitude is real, its k-space Hermitian, and odd and even lines differ in size only.
    const { im } = transform(asComplex(magnitude(ghosted(box(64, [29, 36], [29, 36]), { phase: 0.2 }))));
    im.forEach((value) => expect(Math.abs(value)).toBeLessThan(1e-12));
  });
});

describe('An echo shift', () => {
  test.each(['column', 'row'] as const)(
    'gives cosΦ·I(y) + i·sinΦ·I(y − N/2), Φ = φ0 + 2πψx/N (phase encoding along the %s)',
    (phaseEncode) => {
      const object = noisePlane(24, 24);
      const image = ghosted(object, { phase: 0.2, shift: 0.6 }, { phaseEncode });
      for (let y = 0; y < 24; y++) {
        for (let x = 0; x < 24; x++) {
          const at = (line: number) => (phaseEncode === 'column' ? line * 24 + x : x * 24 + line);
          const phi = 0.2 + (2 * Math.PI * 0.6 * (x - 12)) / 24;
          const [here, there] = [at(y), at((y + 12) % 24)];
          const re = Math.cos(phi) * (object.re[here] ?? NaN) - Math.sin(phi) * (object.im[there] ?? NaN);
          const im = Math.cos(phi) * (object.im[here] ?? NaN) + Math.sin(phi) * (object.re[there] ?? NaN);
          expect(image.re[here]).toBeCloseTo(re, 11);
          expect(image.im[here]).toBeCloseTo(im, 11);
        }
      }
    },
  );

  test('keeps the energy: it only turns phases', () => {
    const object = noisePlane(20, 17);
    expect(energy(ghosted(object, { phase: 0.3, shift: 0.8 }))).toBeCloseTo(energy(object), 8);
  });
});

describe('A difference in amplitude', () => {
  test('of ε makes a ghost of ε/2', () => {
    const image = ghosted(box(64, [28, 36], [20, 44]), { imbalance: 0.1 });
    expect(absolute(image, 62, 30)).toBeCloseTo(0.05, 12);
    expect(absolute(image, 30, 30)).toBeCloseTo(1, 12);
  });
});

describe('Several shots', () => {
  test.each([2, 3, 4])('%i of them put ghosts at odd multiples of N/(2S), sin φ/(S·sin(πm/2S)) strong', (shots) => {
    const image = ghosted(box(96, [47, 50], [40, 56]), { phase: 0.1, shots });
    for (let m = 1; m < 2 * shots; m++) {
      // Coefficients of a square wave of S up, S down; even ones vanish.
      const expected = m % 2 === 1 ? Math.sin(0.1) / (shots * Math.sin((Math.PI * m) / (2 * shots))) : 0;
      expect(absolute(image, (48 + (48 * m) / shots) % 96, 48)).toBeCloseTo(expected, 10);
    }
  });

  test('with acceleration R the ghost lies half of the reduced field away', () => {
    const undersampled = actOnObject(uniformUndersampling, box(64, [30, 34], [20, 44]), { accelerationFactor: 2 });
    const image = inverse(actOnKspace(halfFieldGhost, undersampled, { ...none, phase: 0.1 }));
    expect(absolute(image, 32 + 16, 30)).toBeCloseTo(Math.sin(0.1) / 2, 10);
    expect(absolute(image, 32, 30)).toBeCloseTo(Math.cos(0.1) / 2, 10);
  });
});

test('A difference in amplitude and a phase act together: each line times (1 + s·ε/2)·exp(i·s·φ)', () => {
  const object = noisePlane(12, 7);
  const before = transform(object);
  const after = actOnObject(halfFieldGhost, object, { ...none, phase: 0.3, imbalance: 0.2 });
  for (let line = 0; line < 12; line++) {
    const s = line % 2 === 0 ? 1 : -1;
    const [re, im] = [(1 + s * 0.1) * Math.cos(0.3), (1 + s * 0.1) * s * Math.sin(0.3)];
    const [a, b] = [before.re[line * 7 + 2] ?? NaN, before.im[line * 7 + 2] ?? NaN];
    expect(after.re[line * 7 + 2]).toBeCloseTo(a * re - b * im, 12);
    expect(after.im[line * 7 + 2]).toBeCloseTo(a * im + b * re, 12);
  }
});

test('Samples that were not taken stay empty where only a part of a line was taken', () => {
  const corners = actOnObject(ellipticalCoverage, noisePlane(20, 20), { size: 0.8 });
  const { re, im, taken } = actOnKspace(halfFieldGhost, corners, { ...none, shift: 0.7 });
  taken.forEach((isTaken, i) => {
    if (isTaken === 0) expect([re[i], im[i]]).toEqual([0, 0]);
  });
});

/** Laws that every phantom of materials obeys, for whatever sequence. */
import { transform } from '../../recon/fourier';
import type { ComplexPlane } from '../../recon/grid';
import { magnitude } from '../../recon/grid';
import { phantoms } from '../../recon/phantoms';
import type { Sequence } from '../../recon/phantoms/contrast';
import { fatWaterDifference } from '../../recon/phantoms/contrast';
import type { Scan } from '../../recon/phantoms/phantom';
import { fillOf, phantomGrid, phantomImage, phantomKspace } from '../../recon/phantoms/phantom';
import { energy } from '../recon/planes';

const n = 48;
const sinc = (t: number): number => (t === 0 ? 1 : Math.sin(Math.PI * t) / (Math.PI * t));
const spinEcho: Sequence = { kind: 'spin-echo', repetitionTime: 0.5, echoTime: 0.012 };
const scan: Scan = { sequence: spinEcho, fieldStrength: 1.5 };
/** Fat a quarter turn from water: a signal that is complex as a whole. */
const quarterTurn: Scan = {
  sequence: { kind: 'spoiled-gradient-echo', repetitionTime: 0.12, echoTime: 0.25 / fatWaterDifference(1.5), flipAngle: 1.2 },
  fieldStrength: 1.5,
};

test('No two phantoms have the same id', () => {
  expect(new Set(phantoms.map(({ id }) => id)).size).toBe(phantoms.length);
});

describe.each(phantoms.map((phantom) => [phantom.id, phantom] as const))('%s', (_id, phantom) => {
  const grid = phantomGrid(phantom, n);

  const drawn = new Map([scan, quarterTurn].map((of) => [of, phantomImage(phantom, grid, of)]));
  const exact = new Map([scan, quarterTurn].map((of) => [of, phantomKspace(phantom, grid, of)]));
  const planes = (of: Scan): readonly [picture: ComplexPlane, kspace: ComplexPlane] => {
    const [picture, kspace] = [drawn.get(of), exact.get(of)];
    if (!picture || !kspace) throw Error('only the two scans of this file were worked out');
    return [picture, kspace];
  };

  test.each([scan, quarterTurn])('is the same in k-space and as a picture, by %j', (of) => {
    const [picture, kspace] = planes(of);
    const transformed = transform(picture);
    const largest = Math.max(...magnitude(kspace).values);
    // A pixel is a mean over its area: sample (u, v) is weakened by sinc(u/N)·sinc(v/N), which is taken into account, and sampling the
    // means adds aliases, most of them from bars as fine as a pixel: the two phantoms without such stay under 1e-3. A shape that is
    // misplaced by a pixel in one of the two costs more than a hundredth.
    for (let v = -4; v <= 4; v++) {
      for (let u = -4; u <= 4; u++) {
        const i = (n / 2 + v) * n + n / 2 + u;
        const response = sinc(u / n) * sinc(v / n);
        const difference = Math.hypot(
          (transformed.re[i] ?? NaN) - response * (kspace.re[i] ?? NaN),
          (transformed.im[i] ?? NaN) - response * (kspace.im[i] ?? NaN),
        );
        expect(difference / largest).toBeLessThan(3e-3);
      }
    }
  });

  test('has Hermitian k-space where every material is in phase, and not where fat is turned', () => {
    const broken = (of: Scan): number => {
      const [, { re, im }] = planes(of);
      let worst = 0;
      for (let row = 1; row < n; row++) {
        for (let column = 1; column < n; column++) {
          const [i, mirror] = [row * n + column, (n - row) * n + n - column];
          worst = Math.max(worst, Math.hypot((re[i] ?? NaN) - (re[mirror] ?? NaN), (im[i] ?? NaN) + (im[mirror] ?? NaN)));
        }
      }
      return worst;
    };
    expect(broken(scan)).toBe(0);
    const hasFat = phantom.id !== 'resolution';
    expect(broken(quarterTurn) > 1e-3).toBe(hasFat);
  });

  test('leaves air around itself, so that nothing folds in before a fault is added', () => {
    const fill = fillOf(phantom, grid);
    for (let i = 0; i < n; i++) expect([fill[i], fill[(n - 1) * n + i], fill[i * n], fill[i * n + n - 1]]).toEqual([0, 0, 0, 0]);
  });

  test('holds as much signal in k-space as in its picture', () => {
    const [picture, kspace] = planes(scan);
    // The closed form holds what a mean over pixels loses at edges: up to h²/6 for each pixel an edge runs through, a tenth of all.
    expect(energy(kspace)).toBeGreaterThan(energy(picture));
    expect(energy(kspace) / energy(picture)).toBeLessThan(1.1);
  });
});

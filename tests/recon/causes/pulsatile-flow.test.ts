/** Pulsatile flow: a row of vessel-sized ghosts (Perman et al. 1986), their places (Wood & Henkelman 1985) and brightness (Jacobi–Anger). */
import { jv } from 'cephes';
import type { Acquisition } from '../../../recon/acquisition';
import { inverse, transform } from '../../../recon/fourier';
import { simulate } from '../../../recon/simulate';
import { absolute, box, largestDifference, noisePlane } from '../planes';

const acquisition: Acquisition = { phaseEncode: 'column', repetitionTime: 0.1, averages: 1 };
/** Still tissue on the left, a vessel of 6 rows and columns in the middle of an empty band. */
const object = box(96, [10, 86], [5, 30]);
for (let row = 45; row < 51; row++) object.re.fill(1, row * 96 + 60, row * 96 + 66);
const vessel = { alongPhaseEncode: 0, alongReadout: 15 / 96, radius: 0.065, start: 0, meanPhase: 0 };
const flow = (parameters: Record<string, number>) => ({
  steps: [{ cause: 'pulsatile-flow', parameters: { ...vessel, frequency: 1.25, phaseSwing: 0, brightness: 0, ...parameters } }],
  reconstruction: { method: 'zero-filled', parameters: {} },
  seed: 1,
});
/** 0.1 s · 1.25 Hz: 1/8 of the field of view, 12 of 96 lines: twelve whole cycles. */
const step = 12;

test('Ghosts of order j lie j·frac(TR·f) of the field of view away and have the amplitude J_j of the phase swing', () => {
  const { image } = simulate(object, flow({ phaseSwing: 0.8 }), acquisition);
  for (const j of [0, 1, 2, 3]) {
    // Orders j − 8 fall on order j: J_5(0.8) = 1e-4 on J_3.
    expect(Math.abs((image.values[(48 + step * j) * 96 + 63] ?? NaN) - Math.abs(jv(j, 0.8)))).toBeLessThan(
      2 * Math.abs(jv(8 - j, 0.8)) + 1e-9,
    );
  }
  expect(image.values[(48 + step / 2) * 96 + 63]).toBeCloseTo(0, 9);
});

test('A change of brightness by m has one ghost on each side, of m/2', () => {
  const { image } = simulate(object, flow({ brightness: 0.4 }), acquisition);
  expect(image.values[48 * 96 + 63]).toBeCloseTo(1, 10);
  for (const side of [-1, 1]) expect(image.values[(48 + side * step) * 96 + 63]).toBeCloseTo(0.2, 10);
  expect(image.values[(48 + 2 * step) * 96 + 63]).toBeCloseTo(0, 10);
});

test('What lies outside the vessel does not ghost', () => {
  const { image } = simulate(object, flow({ phaseSwing: 2, brightness: 0.5 }), acquisition);
  for (let row = 0; row < 96; row++) {
    for (let column = 0; column < 50; column++)
      expect(image.values[row * 96 + column]).toBeCloseTo(object.re[row * 96 + column] ?? NaN, 10);
  }
});

test('A mean phase alone turns the vessel and makes no ghost', () => {
  const { image } = simulate(object, flow({ meanPhase: 1.5 }), acquisition);
  image.values.forEach((value, i) => expect(value).toBeCloseTo(object.re[i] ?? NaN, 10));
});

test('A vessel of no size beside the grid changes little: its half pixel at most', () => {
  const input = noisePlane(24, 24);
  const before = transform(input);
  const { kspace } = simulate(input, flow({ radius: 0, phaseSwing: 1 }), { ...acquisition });
  // One pixel, at half weight, turned by at most 1 rad: |ΔK| ≤ ½·|e^i − 1|·|I|/√(N·M), |I| below 4.
  expect(largestDifference(kspace, before)).toBeLessThan((0.5 * 4) / 24);
});

test('A cycle that starts at 0° has the vessel brightest at the first line and darkest half a cycle on', () => {
  const vesselAlone = box(96, [45, 50], [60, 66]);
  const before = transform(vesselAlone);
  const { kspace } = simulate(vesselAlone, flow({ brightness: 0.4 }), acquisition);
  expect(absolute(kspace, 0, 48) / absolute(before, 0, 48)).toBeCloseTo(1.4, 9);
  expect(absolute(kspace, 4, 48) / absolute(before, 4, 48)).toBeCloseTo(0.6, 9);
});

test('The mean phase is that of the blood: its pixels turn by it, and nothing else does', () => {
  const image = inverse(simulate(object, flow({ meanPhase: 0.5 }), acquisition).kspace);
  expect(Math.atan2(image.im[48 * 96 + 63] ?? NaN, image.re[48 * 96 + 63] ?? NaN)).toBeCloseTo(0.5, 10);
  expect(image.im[48 * 96 + 20]).toBeCloseTo(0, 10);
});

test('The radius is a part of the field of view along the readout, where the picture is not square', () => {
  // 40 lines of 80 samples: 0.1 of the readout are eight pixels to either side, of the last of which half is vessel: seven are turned over.
  const wide = { ...noisePlane(40, 80) };
  wide.re.fill(1);
  wide.im.fill(0);
  const image = inverse(simulate(wide, flow({ alongReadout: 0, radius: 0.1, meanPhase: 3.1 }), acquisition).kspace);
  const turned = Array.from({ length: 80 }, (_, column) => column).filter((column) => (image.re[20 * 80 + column] ?? NaN) < 0);
  expect(turned).toHaveLength(15);
});

test('Nothing flows into samples that were not taken', () => {
  const steps = [{ cause: 'uniform-undersampling', parameters: { accelerationFactor: 2 } }, ...flow({ phaseSwing: 1 }).steps];
  const { kspace } = simulate(object, { ...flow({}), steps }, acquisition);
  kspace.taken.forEach((taken, i) => {
    if (taken === 0) expect([kspace.re[i], kspace.im[i]]).toEqual([0, 0]);
  });
});

/** The magic angle: where T2 is longest, what was measured at 3 T and seen at 1.5 T, and a tendon in a picture. */
import { magicAngle, tendonT2 } from '../../../recon/causes/magic-angle';
import type { ParameterValues } from '../../../recon/recipe';
import { simulate } from '../../../recon/simulate';
import { objectReference } from '../../reference/object';
import { box, noisePlane } from '../planes';

const degrees = Math.PI / 180;
const { tendonT2: measured, magicAngleDegrees } = objectReference;
const T2 = (theta: number) => tendonT2(theta * degrees, measured.atMagicAngle, measured.alongTheField);
/** Signal over that of TE 0. */
const signal = (theta: number, TE: number) => Math.exp(-TE / T2(theta));

describe('T2 of tendon', () => {
  test('is longest at 54.7356°, where 3cos²θ = 1', () => {
    const angles = Array.from({ length: 90001 }, (_, i) => i / 1000);
    const longest = angles.reduce((best, angle) => (T2(angle) > T2(best) ? angle : best));
    // Steps of 0.001°.
    expect(Math.abs(longest - magicAngleDegrees)).toBeLessThan(6e-4);
  });

  test('runs between what Du et al. measured along the field and at 55°', () => {
    expect(T2(0)).toBeCloseTo(measured.alongTheField, 12);
    expect(T2(magicAngleDegrees)).toBeCloseTo(measured.atMagicAngle, 9);
    // Across the field (3cos²θ − 1)² is 1, a quarter of that along it.
    expect(1 / T2(90) - 1 / measured.atMagicAngle).toBeCloseTo((1 / measured.alongTheField - 1 / measured.atMagicAngle) / 4, 12);
  });

  test('at short TE gives what Erickson et al. saw: bright at 55°, between at 45° and 65°, dark at 0° and 90°', () => {
    const TE = 15;
    for (const between of [45, 65]) {
      expect(signal(between, TE)).toBeLessThan(0.8 * signal(55, TE));
      expect(signal(between, TE)).toBeGreaterThan(3 * signal(90, TE));
    }
    expect(signal(0, TE)).toBeLessThan(0.01 * signal(55, TE));
    expect(signal(90, TE)).toBeLessThan(0.2 * signal(55, TE));
  });

  test('beyond the critical TE of 37 ms leaves less than a tenth of the tendon, whatever its angle', () => {
    expect(signal(magicAngleDegrees, objectReference.criticalEchoTime)).toBeLessThan(0.1);
    expect(signal(magicAngleDegrees, 10)).toBeGreaterThan(0.5);
  });

  test('along the field is not longer than at the magic angle, whatever is asked for', () => {
    expect(tendonT2(0, 5, 20)).toBeCloseTo(5, 12);
  });
});

const pictured = (object: Parameters<typeof simulate>[0], parameters: ParameterValues, phaseEncode: 'row' | 'column' = 'column') =>
  simulate(
    object,
    { steps: [{ cause: 'magic-angle', parameters }], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 },
    { phaseEncode },
  ).image.values;

describe('A tendon in a picture', () => {
  // 1 mm pixels. A straight strip through the middle, 12 mm wide, in an object of 1.
  const even = box(64, [0, 64], [0, 64]);
  const straight: ParameterValues = { bend: 0, thickness: 12, length: 60, brightness: 0.8, echoTime: 15, toNormal: 90, inPlane: 0 };

  test.each([0, 30, 55, 90])('at %i° to a field in the plane is as bright as its angle says, the rest as before', (direction) => {
    const values = pictured(even, { ...straight, direction });
    expect(values[32 * 64 + 32]).toBeCloseTo(0.8 * signal(direction, 15), 11);
    expect(values[2 * 64 + 61]).toBeCloseTo(1, 11);
    expect(values[61 * 64 + 2]).toBeCloseTo(1, 11);
  });

  test('is as bright at TE 0 as asked, relative to the brightest hundredth of the object', () => {
    const twoLevels = { ...even, re: even.re.map((value, i) => (i % 64 < 6 ? 5 * value : value)) };
    expect(pictured(twoLevels, { ...straight, direction: 0, echoTime: 0 })[32 * 64 + 32]).toBeCloseTo(0.8 * 5, 11);
  });

  test('turns with the field in the plane, and is across a field through the slice', () => {
    expect(pictured(even, { ...straight, direction: 80, inPlane: 25 })[32 * 64 + 32]).toBeCloseTo(0.8 * signal(55, 15), 11);
    expect(pictured(even, { ...straight, direction: 20, toNormal: 0 })[32 * 64 + 32]).toBeCloseTo(0.8 * signal(90, 15), 11);
    // Half-way: cos θ = sin 40°·cos 0.
    expect(pictured(even, { ...straight, direction: 0, toNormal: 40 })[32 * 64 + 32]).toBeCloseTo(0.8 * signal(50, 15), 11);
  });

  test('takes its angle from the header: a field along the rows of phase-encode lines is along the readout', () => {
    const { parameters } = magicAngle;
    const [toNormal, inPlane] = ['toNormal', 'inPlane'].map((id) => {
      const parameter = parameters[id];
      return parameter?.kind === 'quantity' ? parameter.fromHeader?.read({ phaseEncode: 'column', fieldDirection: [0, 1, 0] }) : NaN;
    });
    expect([toNormal, inPlane]).toEqual([90, 90]);
  });

  test('that is bent is brightest where it runs at 55° to the field', () => {
    const values = pictured(box(96, [0, 96], [0, 96]), { ...straight, thickness: 5, length: 90, direction: 45, bend: 90 });
    // A quarter of a circle of radius 57.3 mm, its middle at the centre; angle of its direction from 0 to 90°.
    const radius = 90 / (Math.PI / 2);
    const along = Array.from({ length: 81 }, (_, i) => {
      const angle = (5 + i) * degrees;
      const p = radius * (Math.sin(angle) - Math.sin(Math.PI / 4));
      const q = radius * (Math.cos(Math.PI / 4) - Math.cos(angle));
      return values[(48 + Math.round(p)) * 96 + 48 + Math.round(q)] ?? NaN;
    });
    const brightest = 5 + along.indexOf(Math.max(...along));
    // A pixel of 1 mm is one degree of the arc.
    expect(Math.abs(brightest - magicAngleDegrees)).toBeLessThan(1.5);
  });

  test('keeps the phase of what it replaces, and does not replace anything else', () => {
    const object = noisePlane(48, 48);
    if (magicAngle.domain !== 'image') throw Error('it acts on the image');
    const initial = Object.fromEntries(Object.entries(magicAngle.parameters).map(([id, parameter]) => [id, parameter.initial]));
    const random = { uniform: () => 0, normal: () => 0 };
    const after = magicAngle.apply(object, { ...initial, length: 20 }, { acquisition: { phaseEncode: 'row' }, random });
    let changed = 0;
    for (let i = 0; i < after.re.length; i++) {
      const [a, b, x, y] = [object.re[i] ?? NaN, object.im[i] ?? NaN, after.re[i] ?? NaN, after.im[i] ?? NaN];
      expect(a * y - b * x).toBeCloseTo(0, 12);
      expect(a * x + b * y).toBeGreaterThanOrEqual(0);
      changed += a === x && b === y ? 0 : 1;
    }
    // 20 mm by 6 mm and half a pixel around it.
    expect(changed).toBeGreaterThan(20 * 6);
    expect(changed).toBeLessThan(21 * 7 + 30);
  });
});

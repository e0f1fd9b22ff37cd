/** Signal equations against the Bloch equation stepped pulse by pulse, published numbers, and the contrast that every textbook shows. */
import { centredGrid, magnitude } from '../../../recon/grid';
import { abdomenPhantom } from '../../../recon/phantoms/abdomen';
import type { Sequence } from '../../../recon/phantoms/contrast';
import { ernstAngle, fatWaterDifference, phaseTimes, signalOf } from '../../../recon/phantoms/contrast';
import type { FieldStrength, Material } from '../../../recon/phantoms/material';
import { material } from '../../../recon/phantoms/material';
import { phantomGrid, phantomImage } from '../../../recon/phantoms/phantom';
import { tissues } from '../../../recon/phantoms/tissues';
import { reference } from '../../reference/values';

const water = (t1Ms: number, t2Ms: number, fatFraction = 0): Material =>
  material('test', { protonDensity: 1, fatFraction, t1Ms: [t1Ms, t1Ms], t2Ms: [t2Ms, t2Ms], source: 'test' });
const spinEcho = (trMs: number, teMs: number): Sequence => ({ kind: 'spin-echo', repetitionTime: trMs / 1000, echoTime: teMs / 1000 });
const gradientEcho = (trMs: number, teMs: number, degrees: number): Sequence => ({
  kind: 'spoiled-gradient-echo',
  repetitionTime: trMs / 1000,
  echoTime: teMs / 1000,
  flipAngle: (degrees * Math.PI) / 180,
});
const size = (of: Material, sequence: Sequence, field: FieldStrength = 1.5): number => {
  const { re, im } = signalOf(of, sequence, field);
  return Math.hypot(re, im);
};

describe('The spin echo', () => {
  test('is what the Bloch equation gives, pulse by pulse, in the steady state', () => {
    const [trMs, teMs, t1Ms, t2Ms] = [420, 36, 870, 65];
    let along = 1;
    let echo = 0;
    const recover = (ms: number) => (along = 1 + (along - 1) * Math.exp(-ms / t1Ms));
    for (let pulse = 0; pulse < 50; pulse++) {
      echo = along * Math.exp(-teMs / t2Ms); // 90°: all of it turns into the plane, nothing is left along the field
      along = 0;
      recover(teMs / 2);
      along = -along; // 180°
      recover(trMs - teMs / 2);
    }
    expect(size(water(t1Ms, t2Ms), spinEcho(trMs, teMs))).toBeCloseTo(echo, 12);
  });

  test('gives the worked example of a published table (Quant Imaging Med Surg 2020;10:1080, table 5)', () => {
    // White matter ρ 0.61, T1 510 ms, T2 67 ms at TR 600, TE 20 ms: 69 % of full recovery, 74 % left of decay; grey matter 0.69, 760, 77.
    const published = { white: 0.61 * 0.69 * 0.74, grey: 0.69 * (1 - Math.exp(-600 / 760)) * Math.exp(-20 / 77) };
    const of = (protonDensity: number, t1: number, t2: number) =>
      size(material('table', { protonDensity, t1Ms: [t1, t1], t2Ms: [t2, t2], source: 'table 5' }), spinEcho(600, 20));
    // The table has two digits and leaves out the recovery lost to the 180° pulse, exp(−TR/T1)·(exp(TE/2T1)−1)·2: 1.2 % here.
    expect(of(0.61, 510, 67) / published.white).toBeGreaterThan(0.97);
    expect(of(0.61, 510, 67) / published.white).toBeLessThan(1);
    expect(of(0.69, 760, 77) / published.grey).toBeCloseTo(
      1 - (2 * Math.exp(-600 / 760) * Math.expm1(10 / 760)) / (1 - Math.exp(-600 / 760)),
      9,
    );
  });

  test('loses signal to a neighbouring slice that halves its TR, as worked out (T1 800 ms, 500 to 250 ms)', () => {
    const ratio = size(water(800, 1e9), spinEcho(250, 0)) / size(water(800, 1e9), spinEcho(500, 0));
    expect(ratio).toBeCloseTo(reference.saturationRatio, 6);
  });

  test('refocuses fat, whatever the echo time', () => {
    for (const teMs of [3, 7.7, 20]) expect(signalOf(tissues.fat, spinEcho(500, teMs), 3).im).toBe(0);
  });
});

describe('The spoiled gradient echo', () => {
  test('is what the Bloch equation gives, pulse by pulse, in the steady state', () => {
    const [trMs, teMs, t1Ms, t2Ms, degrees] = [30, 5, 700, 50, 25];
    const alpha = (degrees * Math.PI) / 180;
    let along = 1;
    let echo = 0;
    for (let pulse = 0; pulse < 500; pulse++) {
      echo = along * Math.sin(alpha) * Math.exp(-teMs / t2Ms);
      along = 1 + (along * Math.cos(alpha) - 1) * Math.exp(-trMs / t1Ms);
    }
    expect(size(water(t1Ms, t2Ms), gradientEcho(trMs, teMs, degrees))).toBeCloseTo(echo, 12);
  });

  test.each([
    [20, 800],
    [500, 350],
  ])('is strongest at the Ernst angle, cos α = exp(−TR/T1) (TR %i ms, T1 %i ms)', (trMs, t1Ms) => {
    const best = (ernstAngle(trMs / 1000, t1Ms / 1000) * 180) / Math.PI;
    const at = (degrees: number) => size(water(t1Ms, 1e9), gradientEcho(trMs, 0, degrees));
    expect(at(best)).toBeGreaterThan(at(best - 0.5));
    expect(at(best)).toBeGreaterThan(at(best + 0.5));
    // Ernst & Anderson 1966: √((1 − E1)/(1 + E1)) at the best angle.
    const e1 = Math.exp(-trMs / t1Ms);
    expect(at(best)).toBeCloseTo(Math.sqrt((1 - e1) / (1 + e1)), 12);
    expect(best).toBeCloseTo(reference.ernstAngleDegrees[trMs === 20 ? 'tr20t1800' : 'tr500t1350'], 6);
  });

  test('sees less where the field is uneven, by exp(−TE·R2′)', () => {
    const even = gradientEcho(100, 10, 40);
    expect(size(tissues.white, { ...even, reversibleDecayRate: 20 } as Sequence)).toBeCloseTo(
      size(tissues.white, even) * Math.exp(-0.2),
      12,
    );
  });
});

describe('Fat and water', () => {
  test.each([1.5, 3] as const)('first oppose and first agree at the known echo times of %d T', (field) => {
    const { opposed, inPhase } = phaseTimes(field);
    // The reference has six decimals of a millisecond.
    expect(opposed * 1000).toBeCloseTo(reference.fatWater[field].opposedMs, 6);
    expect(inPhase * 1000).toBeCloseTo(reference.fatWater[field].inPhaseMs, 6);
    expect(fatWaterDifference(field)).toBeCloseTo(reference.fatWater[field].hertz, 5);
  });

  test('are told apart by their sum and difference (Dixon, Radiology 1984;153:189)', () => {
    const { opposed, inPhase } = phaseTimes(1.5);
    const at = (seconds: number) => signalOf(water(300, 1e9, 0.3), gradientEcho(120, seconds * 1000, 70), 1.5).re;
    const [both, difference] = [at(inPhase), at(opposed)];
    expect((both - difference) / 2 / both).toBeCloseTo(0.3, 6);
    // Half and half cancels: the black rim of a border between fat and water.
    expect(size(water(300, 1e9, 0.5), gradientEcho(120, opposed * 1000, 70))).toBeLessThan(1e-9);
  });
});

describe('TR, TE, flip angle and field strength', () => {
  const { white, grey, fluid, liver, spleen } = tissues;

  test('make white matter brighter than grey and fluid dark with short times, and the reverse with long ones', () => {
    const t1Weighted = [fluid, grey, white].map((tissue) => size(tissue, spinEcho(500, 12)));
    const t2Weighted = [white, grey, fluid].map((tissue) => size(tissue, spinEcho(4000, 90)));
    expect(t1Weighted).toEqual([...t1Weighted].sort((a, b) => a - b));
    expect(t2Weighted).toEqual([...t2Weighted].sort((a, b) => a - b));
  });

  test('make the liver brighter than the spleen in T1 weighting and darker in T2 weighting', () => {
    for (const field of [1.5, 3] as const) {
      expect(size(liver, gradientEcho(120, 4.4, 70), field)).toBeGreaterThan(size(spleen, gradientEcho(120, 4.4, 70), field));
      expect(size(liver, spinEcho(4000, 80), field)).toBeLessThan(size(spleen, spinEcho(4000, 80), field));
    }
  });

  test('turn from proton density to T1 weighting as the flip angle grows', () => {
    const contrast = (degrees: number) => size(white, gradientEcho(100, 4, degrees)) / size(grey, gradientEcho(100, 4, degrees));
    expect(contrast(5)).toBeLessThan(1);
    expect(contrast(60)).toBeGreaterThan(1.2);
  });

  test('saturate tissue more at 3 T, where T1 is longer by 21 % on average (de Bazelaire 2004, abstract)', () => {
    const abdominal = Object.values(tissues).filter(({ source }) => source.startsWith('de Bazelaire'));
    const longer = abdominal.reduce((sum, { t1 }) => sum + t1[3] / t1[1.5] - 1, 0) / abdominal.length;
    // The published mean is over twelve tissues, eight of which are here.
    expect(longer).toBeGreaterThan(0.14);
    expect(longer).toBeLessThan(0.28);
    for (const tissue of abdominal) expect(size(tissue, spinEcho(400, 0), 3)).toBeLessThan(size(tissue, spinEcho(400, 0), 1.5));
  });

  test('refuse an echo after the next pulse', () => {
    expect(() => signalOf(white, spinEcho(50, 80), 3)).toThrow(/repetitionTime must be above echoTime .*, got 0.05 and 0.08 s/);
  });
});

describe('The abdomen', () => {
  const valueAt = (sequence: Sequence, millimetres: readonly [x: number, y: number]): number => {
    const { spacing } = phantomGrid(abdomenPhantom, 256);
    const spot = { ...centredGrid(1, 1, spacing), origin: [millimetres[1] / 1000, millimetres[0] / 1000] as const };
    return magnitude(phantomImage(abdomenPhantom, spot, { sequence, fieldStrength: 1.5 })).values[0] ?? NaN;
  };

  test('shows the signal of each organ where the organ lies', () => {
    const sequence = spinEcho(500, 12);
    for (const [place, tissue] of [
      [[10, -70], tissues.liver],
      [[120, 30], tissues.spleen],
      [[0, 45], tissues.marrow],
      [[155, 0], tissues.fat],
      [[7, 16], tissues.blood],
      [[60, 90], tissues.muscle],
      [[83, 34], tissues.kidneyCortex],
      [[90, -35], tissues.stomachFluid],
    ] as const) {
      expect(valueAt(sequence, place)).toBeCloseTo(size(tissue, sequence), 12);
    }
    expect(valueAt(sequence, [75, -58.5])).toBeCloseTo(0, 12);
  });

  test('has a black rim where organs touch fat when the two are opposed', () => {
    const border = [-90, -67] as const;
    const { opposed, inPhase } = phaseTimes(1.5);
    const row = (seconds: number) =>
      Array.from({ length: 24 }, (_, i) => valueAt(gradientEcho(120, seconds * 1000, 70), [border[0], border[1] - 6 + 0.5 * i]));
    expect(Math.min(...row(opposed))).toBeLessThan(0.5 * Math.min(...row(inPhase)));
  });
});

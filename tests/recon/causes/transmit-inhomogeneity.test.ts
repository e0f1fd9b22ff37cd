/** An uneven transmit field: signal against flip angle, and the size of the pattern. */
import type { Acquisition } from '../../../recon/acquisition';
import { ernstSignal, spinEchoSignal, wavelength } from '../../../recon/causes/transmit-inhomogeneity';
import { gyromagneticRatio } from '../../../recon/encoding';
import { describeCause } from '../../../recon/catalogue';
import { causeOf } from '../../../recon/recipe-check';
import { simulate } from '../../../recon/simulate';
import { reference } from '../../reference/values';
import { box } from '../planes';

const parameters = { sequence: 'spin-echo', centre: 80, edge: 100, wavelength: 16, flipAngle: 30, t1: 800 };
const uniform = box(64, [0, 64], [0, 64]);
const excited = (values: Partial<Record<keyof typeof parameters, number | string>>, acquisition: Acquisition = { phaseEncode: 'row' }) =>
  simulate(
    uniform,
    {
      steps: [{ cause: 'transmit-inhomogeneity', parameters: { ...parameters, ...values } }],
      reconstruction: { method: 'zero-filled', parameters: {} },
      seed: 1,
    },
    acquisition,
  ).image.values;
const centre = 32 * 64 + 32;

describe('A spin echo', () => {
  test('of which both pulses are at 80 % keeps 0.86 of its signal', () => {
    // Reference to seven digits.
    expect(spinEchoSignal(0.8)).toBeCloseTo(reference.spinEchoAt80Percent, 7);
    expect(excited({})[centre]).toBeCloseTo(reference.spinEchoAt80Percent, 7);
  });

  test('loses the same above and below the right angle', () => {
    expect(excited({ centre: 120 })[centre]).toBeCloseTo(reference.spinEchoAt80Percent, 7);
  });
});

describe('A gradient echo', () => {
  test('has most signal at the Ernst angle, arccos(exp(−TR/T1))', () => {
    // Ernst & Anderson, Rev Sci Instrum 1966;37:93 (from memory).
    const E1 = Math.exp(-0.1 / 0.8);
    const best = Math.acos(E1);
    for (const away of [-0.02, 0.02]) expect(ernstSignal(best + away, E1)).toBeLessThan(ernstSignal(best, E1));
    // Closed form of the largest signal: √((1 − E1)/(1 + E1)).
    expect(ernstSignal(best, E1)).toBeCloseTo(Math.sqrt((1 - E1) / (1 + E1)), 12);
  });

  test('of a small angle and a long TR follows the sine of the angle', () => {
    const image = excited({ sequence: 'gradient-echo', flipAngle: 10, t1: 100, centre: 50 }, { phaseEncode: 'row', repetitionTime: 3 });
    expect(image[centre]).toBeCloseTo(Math.sin(Math.PI / 36) / Math.sin(Math.PI / 18), 10);
  });

  test('is the steady state of its formula, with TR from the header', () => {
    const image = excited({ sequence: 'gradient-echo', centre: 70 }, { phaseEncode: 'row', repetitionTime: 0.05 });
    const E1 = Math.exp(-50 / 800);
    const signal = (degrees: number) => Math.sin((degrees * Math.PI) / 180) / (1 - E1 * Math.cos((degrees * Math.PI) / 180));
    expect(image[centre]).toBeCloseTo(signal(21) / signal(30), 12);
  });

  test('without TR in the header takes 150 ms, as the description says', () => {
    const assumed = excited({ sequence: 'gradient-echo' });
    expect(assumed).toEqual(excited({ sequence: 'gradient-echo' }, { phaseEncode: 'row', repetitionTime: 0.15 }));
  });
});

describe('The pattern', () => {
  test('has the wavelength of the field in tissue and in water', () => {
    // Reference to six digits.
    expect(wavelength(3 * gyromagneticRatio, 58)).toBeCloseTo(reference.wavelength.tissueAt3T, 6);
    expect(wavelength(1.5 * gyromagneticRatio, 80)).toBeCloseTo(reference.wavelength.waterAt1T5, 6);
  });

  test('falls to the edge value a quarter of a wavelength from the centre: cos²(2πr/λ)', () => {
    // λ 16 cm: 40 px of 1 mm to the edge value, 20 px half way, b₊ = 0.9.
    const image = excited({});
    expect(image[32 * 64 + 52]).toBeCloseTo(Math.sin((Math.PI / 2) * 0.9) ** 3, 10);
    expect(image[0]).toBeCloseTo(1, 12);
  });

  test('starts with flip angle and frequency of the header', () => {
    const cause = causeOf('transmit-inhomogeneity');
    if (!cause) throw Error('the catalogue has it');
    const acquisition: Acquisition = { phaseEncode: 'row', imagingFrequency: 63.87e6, flipAngle: Math.PI / 9 };
    const initial = new Map(describeCause(cause, acquisition).parameters.map(({ id, initial: value }) => [id, value]));
    expect(initial.get('flipAngle')).toBe(20);
    // c/(63.87 MHz·√58) = 61.6 cm, on the step of 1 cm.
    expect(initial.get('wavelength')).toBe(62);
  });
});

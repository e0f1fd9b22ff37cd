import { describeCause, describeReconstruction } from '../../recon/catalogue';
import { causes } from '../../recon/causes';
import { partialFourier } from '../../recon/causes/partial-fourier';
import { initialOf } from '../../recon/initial';
import { choice, quantity } from '../../recon/parameter';
import { reconstructions } from '../../recon/reconstructions';
import type { Moves } from '../../recon/cause';
import { causeSchema, reconstructionSchema } from '../../server/contract/catalogue';

describe('The catalogue', () => {
  test('has the shape of the contract, with nothing besides', () => {
    for (const cause of causes) {
      const described = describeCause(cause, { phaseEncode: 'row', accelerationFactor: 2 });
      expect(causeSchema.parse(described)).toEqual(described);
    }
    for (const method of reconstructions)
      expect(reconstructionSchema.parse(describeReconstruction(method))).toEqual(describeReconstruction(method));
  });

  test('has one entry of each name, causes and reconstructions together: a name is the address of its page', () => {
    const ids = [...causes, ...reconstructions].map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
  });

  test('fills initial values from the scan facts and names the fact', () => {
    const [fraction] = describeCause(partialFourier, { phaseEncode: 'row', partialFourierFraction: 0.63 }).parameters;
    expect(fraction).toMatchObject({ id: 'fraction', initial: 0.625, fromHeader: 'Partial Fourier fraction in the header' });
    const [silent] = describeCause(partialFourier, { phaseEncode: 'row' }).parameters;
    expect(silent).toMatchObject({ initial: 0.75 });
    expect(silent).not.toHaveProperty('fromHeader');
  });
});

describe('The value that a parameter starts with', () => {
  const read = quantity({
    label: 'Flip',
    unit: '°',
    min: 0.4,
    max: 1,
    step: 0.01,
    initial: 0.5,
    fromHeader: { fact: 'Echo time', read: ({ echoTime }) => echoTime },
  });
  const started = (echoTime: number) => initialOf(read, { phaseEncode: 'row', echoTime }).value;

  test('is clamped to the range and rounded to the step', () => {
    expect([started(0.7512), started(7), started(-1), started(0.75)]).toEqual([0.75, 1, 0.4, 0.75]);
    expect(started(NaN)).toBe(0.5);
  });

  test('of a choice is its own', () => {
    const side = choice({
      label: 'Side',
      options: [
        { value: 'left', label: 'Left' },
        { value: 'right', label: 'Right' },
      ],
      initial: 'right',
    });
    expect(initialOf(side, { phaseEncode: 'row' })).toEqual({ value: 'right' });
  });
});

/**
 * How each price is said. Sentences of TE, pulses and trains are about those, not about the time of the scan; 'contrast agent' is not a
 * contrast.
 */
const said: Record<keyof Moves, RegExp> = {
  time: /\b(longer|shorter|twice the|times as long|seconds?|minutes?|hours?|days|half an hour|the time of)\b/i,
  snr: /\bSNR\b|\bsignal falls\b|\bmore noise\b/,
  contrast: /\bcontrast\b(?! agent)/i,
  sar: /\bSAR\b/,
  nerveStimulation: /\bnerve stimulation\b/,
  implantConditions: /\bimplant\b/,
};
const notOfTheScan = /\bno longer\b|\b(longer|shorter) (shortest )?(TE|TR|pulses|trains)\b/gi;
const prices = Object.keys(said) as (keyof Moves)[];

const remedies = [...causes, ...reconstructions].flatMap((entry) =>
  entry.remedies.map((remedy) => ({ name: `${entry.id}: ${remedy.change}`, ...remedy })),
);
/** Those whose words say that they do this, each with what it moves. */
const movesOf = (does: RegExp): [string, Moves][] => {
  const found = remedies.filter(({ change }) => does.test(change)).map(({ name, moves }): [string, Moves] => [name, moves]);
  expect(found).not.toEqual([]);
  return found;
};

/** Sources of these rules: the contents of a scanner's safety display and of an implant's conditions (IEC 60601-2-33, from memory; common practice). */
describe('The price of a remedy', () => {
  test.each(prices)('names %s in its sentence when it is in its column, and only then', (price) => {
    const isSaid = (sentence: string) => said[price].test(price === 'time' ? sentence.replace(notOfTheScan, '') : sentence);
    expect(remedies.filter((remedy) => isSaid(remedy.price) !== (remedy.moves[price] !== undefined))).toEqual([]);
  });

  test('sends to the conditions of an implant whatever may raise SAR or nerve stimulation', () => {
    for (const { name, moves } of remedies) {
      const mayRise = [moves.sar, moves.nerveStimulation].some((move) => move === 'rises' || move === 'changes');
      if (mayRise) expect([name, moves.implantConditions]).toEqual([name, 'changes']);
    }
  });

  test('of more RF pulses is SAR: saturation, suppression of fat by a pulse, inversion', () => {
    for (const [name, { sar }] of movesOf(/\bsaturat|\bsuppress fat|\binversion/i)) expect([name, sar]).toEqual([name, 'rises']);
    for (const [name, { sar }] of movesOf(/\bspin echo\b|\brefocusing\b/i)) expect([name, sar]).toEqual([name, expect.anything()]);
  });

  test('of a stronger or faster gradient is nerve stimulation: higher bandwidth, flow compensation', () => {
    for (const [name, moves] of movesOf(/\b(raise|higher|highest)\b[^,;]*\bbandwidth\b|\bflow compensation\b/i))
      expect([name, moves.nerveStimulation]).toEqual([name, 'rises']);
  });

  test('of a swap of the axes is that other gradients work hardest', () => {
    for (const [name, moves] of movesOf(/\bswap phase\b/i)) expect([name, moves.nerveStimulation]).toEqual([name, 'changes']);
  });

  test('of a bandwidth is SNR, with the opposite sign', () => {
    for (const [name, { snr }] of movesOf(/\b(raise|higher|highest)\b[^,;]*\bbandwidth\b/i)) expect([name, snr]).toEqual([name, 'falls']);
    for (const [name, { snr }] of movesOf(/\blower\b[^,;]*\bbandwidth\b/i)) expect([name, snr]).toEqual([name, 'rises']);
  });

  test('of more averages is time, and SNR is gained', () => {
    for (const [name, moves] of movesOf(/\bmore averages\b/i)) expect([name, moves]).toEqual([name, { time: 'rises', snr: 'rises' }]);
  });
});

import { describeCause, describeReconstruction } from '../../recon/catalogue';
import { causes } from '../../recon/causes';
import { partialFourier } from '../../recon/causes/partial-fourier';
import { initialOf } from '../../recon/initial';
import { choice, quantity } from '../../recon/parameter';
import { reconstructions } from '../../recon/reconstructions';
import { causeSchema, methodSchema } from '../../server/contract/catalogue';

describe('The catalogue', () => {
  test('has the shape of the contract, with nothing besides', () => {
    for (const cause of causes) {
      const described = describeCause(cause, { phaseEncode: 'row', accelerationFactor: 2 });
      expect(causeSchema.parse(described)).toEqual(described);
    }
    for (const method of reconstructions)
      expect(methodSchema.parse(describeReconstruction(method))).toEqual(describeReconstruction(method));
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

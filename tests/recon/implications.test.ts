import type { Acquisition } from '../../recon/acquisition';
import { gyromagneticRatio } from '../../recon/encoding';
import { centredGrid } from '../../recon/grid';
import { implications } from '../../recon/implications';
import { implicationSchema } from '../../server/contract/images';

const acquisition: Acquisition = {
  phaseEncode: 'column',
  bandwidthPerPixel: 130,
  imagingFrequency: 63.87e6,
  repetitionTime: 0.5,
  averages: 2,
  acquiredPhase: 200,
  echoTrainLength: 16,
};
const grid = centredGrid(256, 192, [0.9e-3, 0.8e-3]);
const byId = (...given: Parameters<typeof implications>) => Object.fromEntries(implications(...given).map((item) => [item.id, item]));

describe('What the scan facts imply', () => {
  test('is worked out in the units of the console, with the formula beside it', () => {
    const panel = byId(acquisition, grid, 0.15);
    // By hand: 130/(42.577 · 0.8) mT/m; 130/0.8 Hz/mm; 1000/130 ms; 3.5 · 63.87/130 px; 0.5 · 2 · 0.15; 256 of that; 200/16 rounded up.
    expect(panel['readout-gradient']).toMatchObject({ value: expect.closeTo(1e9 * (130 / (gyromagneticRatio * 800)), 9), unit: 'mT/m' });
    expect(panel['readout-gradient']?.value).toBeCloseTo(3.8166, 4);
    expect(panel['hertz-per-millimetre']).toMatchObject({ value: expect.closeTo(162.5, 9), unit: 'Hz/mm' });
    expect(panel['readout-time']).toMatchObject({ value: expect.closeTo(7.6923, 4), unit: 'ms' });
    expect(panel['fat-shift']).toMatchObject({ value: expect.closeTo(1.71958, 5), unit: 'px' });
    expect(panel['ghost-fraction']).toMatchObject({ value: expect.closeTo(0.15, 12) });
    expect(panel['ghost-pixels']).toMatchObject({ value: expect.closeTo(38.4, 9), unit: 'px' });
    expect(panel['echo-trains']).toMatchObject({ value: 13 });
  });

  test('has the shape of the contract', () => {
    for (const item of implications(acquisition, grid)) expect(implicationSchema.parse(item)).toEqual(item);
  });

  test('is null where a fact is missing, and names the fact', () => {
    const panel = byId({ phaseEncode: 'row' }, { rows: 256, columns: 192 });
    expect(panel['readout-gradient']).toMatchObject({
      value: null,
      because: 'needs the bandwidth per pixel and the pixel spacing along the readout',
    });
    expect(panel['ghost-pixels']).toMatchObject({ value: null, because: 'needs TR and the frequency of the motion' });
  });

  test('says that one average was assumed where the header is silent', () => {
    const panel = byId({ ...acquisition, averages: undefined }, grid, 0.3);
    expect(panel['ghost-fraction']).toMatchObject({
      value: expect.closeTo(0.15, 12),
      because: 'one average assumed: the header is silent',
    });
  });

  test('works nothing out along an axis that nobody has told, unless both are alike', () => {
    const silent = { ...acquisition, phaseEncode: undefined };
    expect(byId(silent, grid, 0.15)['ghost-pixels']).toMatchObject({ value: null, because: 'needs the phase-encode axis' });
    expect(byId(silent, grid, 0.15)['readout-gradient']?.value).toBeNull();
    expect(byId(silent, centredGrid(256, 256, [1e-3, 1e-3]), 0.15)['ghost-pixels']?.value).toBeCloseTo(38.4, 9);
  });
});

/**
 * Raw data: what is read of ISMRMRD files. Every sample of the coded files says in which line and column it belongs, so that one that is
 * turned, moved, lost or added twice shows. The files are written by another program (h5py), by the format's own description.
 */
import type { ComplexPlane } from '../../../recon/grid';
import { kspaceOf, openReader, rawFile, withHeader } from './raw-files';

const reader = openReader();
afterAll(() => reader.close());

const [rows, columns] = [12, 16];
/** Values are kept as float32: 24 bits of the largest, which is about √(rows·columns) above a sample when all add up; doubled twice. */
const roundOff = 4 * 2 ** -24 * columns * Math.sqrt(rows * columns);

interface Place {
  readonly row: number;
  readonly column: number;
}

/** Largest distance between a plane and what its samples should be: zero where `isTaken` says so, else the code of the place times `weight`. */
function farthest({ re, im }: ComplexPlane, isTaken: (place: Place) => boolean = () => true, weight = 1): number {
  let worst = 0;
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const factor = isTaken({ row, column }) ? weight : 0;
      const i = row * columns + column;
      worst = Math.max(worst, Math.abs((re[i] ?? NaN) - factor * (row + 1)), Math.abs((im[i] ?? NaN) - factor * (column + 1)));
    }
  }
  return worst;
}

describe('samples', () => {
  test('the k-space of a single coil is the samples of the file, noise and navigators left out', async () => {
    const image = await reader.accepted(rawFile('one-coil'));
    expect(image).toMatchObject({ rows, columns, frames: 1, component: 'complex', kspace: 'raw', use: 'measured' });
    expect(farthest(kspaceOf(image, 0))).toBeLessThan(roundOff);
    expect(image.warnings.map(({ code }) => code)).toEqual(['raw', 'not-of-the-image']);
  });

  test('lines that were read backwards are turned round', async () => {
    expect(farthest(kspaceOf(await reader.accepted(rawFile('reversed')), 0))).toBeLessThan(roundOff);
  });

  test('lines that were not acquired stay empty, and a warning counts them', async () => {
    const image = await reader.accepted(rawFile('undersampled'));
    expect(farthest(kspaceOf(image, 0), ({ row }) => row % 2 === 0)).toBeLessThan(roundOff);
    expect(image.warnings).toContainEqual(expect.objectContaining({ code: 'undersampled', text: expect.stringMatching(/^6 of 12 lines/) }));
    expect(image.facts.phaseEncodingSteps.value).toBe(6);
    expect(image.facts.partialFourier.value).toBe('none');
  });

  test('partial Fourier shows: one side of the lines is empty', async () => {
    const image = await reader.accepted(rawFile('partial'));
    expect(farthest(kspaceOf(image, 0), ({ row }) => row >= 4)).toBeLessThan(roundOff);
    expect(image.facts.partialFourier.value).toBe('phase');
  });

  test('an asymmetric echo lies about its centre sample, read forwards or backwards', async () => {
    const image = await reader.accepted(rawFile('asymmetric'));
    expect(farthest(kspaceOf(image, 0), ({ column }) => column >= 5)).toBeLessThan(roundOff);
    expect(image.facts.partialFourier.value).toBe('readout');
    expect(image.warnings.map(({ code }) => code)).toContain('asymmetric-echo');
  });

  test('averages of a line are averaged', async () => {
    const image = await reader.accepted(rawFile('averages'));
    expect(farthest(kspaceOf(image, 0))).toBeLessThan(roundOff);
    expect(image.facts.averages.value).toBe(2);
  });

  test('slices and contrasts are frames in order, each at its place with its echo time', async () => {
    const image = await reader.accepted(rawFile('slices'));
    expect(image.frames).toBe(4);
    for (const frame of [0, 1, 2, 3]) expect(farthest(kspaceOf(image, frame), undefined, 1 + frame)).toBeLessThan(4 * roundOff);
    expect(image.frameFacts.map(({ label, echoTimeMs }) => [label, echoTimeMs])).toEqual([
      ['contrast 1, slice 1', 12],
      ['contrast 1, slice 2', 12],
      ['contrast 2, slice 1', 24],
      ['contrast 2, slice 2', 24],
    ]);
    // 240 mm over 16 samples and 12 lines: the first pixel lies 8 columns and 6 rows before the centre, which is at 0, 0 and 7 mm a slice.
    expect(image.frameFacts[1]?.positionMm).toEqual([-120, -120, 7]);
    expect(image.facts.imageOrientation.value).toEqual([1, 0, 0, 0, 1, 0]);
  });
});

describe('coil elements', () => {
  const side = 24;

  test('each element is a frame behind one of them all, with the name of its header where that is a code', async () => {
    const image = await reader.accepted(rawFile('four-coils'));
    expect(image.frameFacts.map(({ label }) => label)).toEqual(['combined', 'coil 1 (H1)', 'coil 2', 'coil 3', 'coil 4']);
    expect(image.warnings.map(({ code }) => code)).toEqual(['raw', 'oversampled']);
  });

  test('all together are as bright as the root of the sum of squares, and carry the phase of the object', async () => {
    const { values, rows: lines, columns: samples } = await reader.accepted(rawFile('four-coils'));
    expect([lines, samples]).toEqual([side, 2 * side]);
    const n = lines * samples;
    const at = (frame: number, i: number) => [values[2 * (frame * n + i)] ?? NaN, values[2 * (frame * n + i) + 1] ?? NaN] as const;
    const errors: number[] = [];
    const phases: number[] = [];
    for (let row = 6; row < 18; row++) {
      for (let column = 18; column < 30; column++) {
        const i = row * samples + column;
        const squares = [1, 2, 3, 4].map((frame) => Math.hypot(...at(frame, i)) ** 2).reduce((sum, square) => sum + square, 0);
        const [re, im] = at(0, i);
        errors.push(Math.hypot(re, im) / Math.sqrt(squares) - 1);
        const [y, x] = [(row - side / 2) / side, (column - side) / side];
        phases.push(Math.atan2(im, re) - (1.2 * x - 0.8 * y));
      }
    }
    // No weights of unit length give more than the root; those of low resolution lost 0.5 % at most here, and get twice that.
    expect(Math.max(...errors)).toBeLessThan(1e-6);
    expect(Math.min(...errors)).toBeGreaterThan(-0.01);
    // But for a constant, the phase is that which the object was made with: it strayed over 0.027 rad here, and gets twice that.
    const turned = phases.map((phase) => Math.atan2(Math.sin(phase - (phases[0] ?? 0)), Math.cos(phase - (phases[0] ?? 0))));
    expect(Math.max(...turned) - Math.min(...turned)).toBeLessThan(0.055);
  });

  test('oversampling of the readout is kept: the picture is as wide as the encoded field of view', async () => {
    const image = await reader.accepted(rawFile('four-coils'));
    expect(image.spacingMm).toEqual([10, 10]);
    expect(image.warnings.find(({ code }) => code === 'oversampled')?.text).toMatch(/480 mm.*240 mm/);
  });
});

describe('facts and identity', () => {
  test('facts come from the header and the readouts', async () => {
    const { facts } = await reader.accepted(rawFile('one-coil'));
    expect(facts).toMatchObject({
      phaseEncode: { value: 'column' },
      repetitionTimeMs: { value: 500 },
      flipAngleDegrees: { value: 70 },
      fieldStrengthTesla: { value: 1.5 },
      imagingFrequencyMHz: { value: 63.87 },
      // 16 samples of 5 µs: 1/(80 µs).
      bandwidthPerPixelHz: { value: 12_500 },
      manufacturer: { value: 'Invented Magnets' },
      model: { value: null },
    });
  });

  test('nothing of subject, study and site comes out, but the tags of what was left behind', async () => {
    const { values: _, ...told } = await reader.accepted(rawFile('one-coil'));
    expect(JSON.stringify(told)).not.toMatch(/canary|1961|2021/i);
    expect(told.deidentification.removed).toEqual([
      '0008,0020',
      '0008,0080',
      '0008,1030',
      '0010,0010',
      '0010,0020',
      '0010,0030',
      '0018,1030',
    ]);
    expect(told.identifiers).toEqual({ study: null, series: null, frameOfReference: null, image: null });
  });
});

describe('refusals', () => {
  const refusals: readonly [string, () => Uint8Array, string, RegExp][] = [
    ['three dimensions', () => withHeader('partial', '<z>1</z>', '<z>4</z>'), 'raw-kind', /three-dimensional/],
    ['noise only', () => rawFile('noise-only'), 'no-pixels', /no acquisition of an image/],
    ['HDF5 of something else', () => rawFile('no-raw-data'), 'not-mr', /no raw data of MR/],
    [
      'a matrix without end',
      () =>
        withHeader(
          'partial',
          '<y>12</y><z>1</z></matrixSize><fieldOfView_mm><x>240</x>',
          '<y>9999</y><z>1</z></matrixSize><fieldOfView_mm><x>9</x>',
        ),
      'size',
      /more than 2048/,
    ],
    ['readouts longer than the matrix', () => withHeader('partial', '<x>16</x>', '<x>8</x>'), 'unreadable', /longer than the matrix/],
    ['one line', () => withHeader('partial', '<y>12</y>', '<y>1</y>'), 'raw-kind', /no phase encoding/],
    [
      'lines outside the matrix',
      () => withHeader('partial', '<center>6</center>', '<center>1</center>'),
      'unreadable',
      /outside the matrix/,
    ],
    [
      'a document type',
      () => withHeader('partial', '<ismrmrdHeader xmlns="http://', '<!DOCTYPE a [<!ENTITY b "c">'),
      'unreadable',
      /document type/,
    ],
    ['a cut file', () => rawFile('partial').slice(0, 6000), 'unreadable', /damaged or cut/],
  ];
  test.each(refusals)('%s is refused with the reason', async (_name, bytes, code, reason) => {
    expect(await reader.read(bytes())).toEqual({ refused: { code, reason: expect.stringMatching(reason) } });
  });

  test.each(['radial', 'spiral', 'epi', 'other'])('a trajectory that is %s is refused by its name', async (trajectory) => {
    const outcome = await reader.read(withHeader('partial', 'cartesian', trajectory));
    expect(outcome).toEqual({ refused: { code: 'not-cartesian', reason: expect.stringContaining(trajectory) } });
  });
});

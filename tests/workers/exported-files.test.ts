/** PNG and .npy as other programs read them: numpy for the arrays, a decoder for the pictures. */
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { decode } from 'fast-png';
import { withNumpy } from '../server/debian-tool';
import { simulatedOn, withCauses } from '../server/exports/simulated';
import { headFile } from '../server/files';
import { exportedFile } from '../../workers/exported-file';
import { encodeNpy } from '../../workers/npy';

const folder = mkdtempSync(join(tmpdir(), 'pickglass-arrays-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const { simulation, about } = simulatedOn(headFile(), withCauses(['partial-fourier', {}]));
const kept = (name: string, bytes: Uint8Array): string => {
  const path = join(folder, name);
  writeFileSync(path, bytes);
  return path;
};

describe('arrays, as numpy loads them', () => {
  it('of an image are float32 in rows, with the values of the simulation', () => {
    const path = kept('image.npy', exportedFile(simulation, 'image.npy', about));
    const [type, shape, order, sum, one] = withNumpy(
      '(lambda a: [a.dtype.str, a.shape, bool(a.flags.c_contiguous), float(a.astype("f8").sum()), float(a[100, 37])])(np.load(sys.argv[1]))',
      path,
    ) as [string, number[], boolean, number, number];
    const values = Float32Array.from(simulation.image.values);
    expect([type, shape, order]).toEqual(['<f4', [256, 256], true]);
    expect(one).toBe(values[100 * 256 + 37]);
    // The same float32 values, added up in another order in float64.
    expect(sum).toBeCloseTo(
      values.reduce((total, value) => total + value, 0),
      4,
    );
  });

  it('of k-space are complex64, and the image is their transform', () => {
    const path = kept('kspace.npy', exportedFile(simulation, 'kspace.npy', about));
    const [type, re, im, empty] = withNumpy(
      '(lambda k: [k.dtype.str, float(k[128, 131].real), float(k[128, 131].imag), int((k == 0).all(axis=0).sum())])(np.load(sys.argv[1]))',
      path,
    ) as [string, number, number, number];
    const at = 128 * 256 + 131;
    expect([type, re, im]).toEqual(['<c8', Math.fround(simulation.kspace.re[at] ?? NaN), Math.fround(simulation.kspace.im[at] ?? NaN)]);
    // Lines that partial Fourier leaves out are empty columns here, where phase is encoded along the row.
    expect(empty).toBeGreaterThan(20);
  });

  it('of one axis and of a header near a multiple of 64 bytes load too', () => {
    const lengths = Array.from({ length: 70 }, (_, i) => 10 ** (i % 7));
    const paths = lengths.slice(0, 6).map((length) => kept(`${length}.npy`, encodeNpy(new Uint8Array(4 * length), [length], '<f4')));
    expect(withNumpy('[np.load(p).shape[0] for p in sys.argv[1:]]', ...paths)).toEqual([1, 10, 100, 1000, 10_000, 100_000]);
    for (const path of paths) expect(path).toMatch(/npy$/);
  });

  it('are not written with another number of values than their shape', () => {
    expect(() => encodeNpy(new Uint8Array(12), [2, 2], '<f4')).toThrow(RangeError);
  });
});

describe('pictures', () => {
  it.each([
    ['image.png', 8],
    ['image16.png', 16],
    ['kspace.png', 8],
    ['kspace16.png', 16],
  ] as const)('%s has %d bits, and says in its pixels and in its text what it is', (form, depth) => {
    const png = decode(exportedFile(simulation, form, about));
    expect([png.width, png.height, png.depth, png.channels]).toEqual([256, 256, depth, 1]);
    expect(png.text.Title).toBe('SIMULATED, NOT FOR DIAGNOSIS');
    const white = 2 ** depth - 1;
    const strip = Array.from(png.data.slice(245 * 256));
    expect(strip.every((level) => level === 0 || level === white)).toBe(true);
    // 28 letters of six dots each in 256 columns: the twelfth begins at 44 + 66.
    const rows = Array.from({ length: 7 }, (_, y) => strip.slice((2 + y) * 256 + 110, (2 + y) * 256 + 151));
    expect(rows.map((row) => row.map((level) => (level === white ? '#' : ' ')).join(''))).toEqual([
      '#   #  ###  #####       #####  ###  #### ',
      '##  # #   #   #         #     #   # #   #',
      '# # # #   #   #         #     #   # #   #',
      '#  ## #   #   #         ####  #   # #### ',
      '#   # #   #   #         #     #   # # #  ',
      '#   # #   #   #         #     #   # #  # ',
      '#   #  ###    #         #      ###  #   #',
    ]);
  });

  it('of 16 bits give the values back by the slope that is written in them', () => {
    const png = decode(exportedFile(simulation, 'image16.png', about));
    const slope = Number(/value = (\S+) x level/.exec(png.text.Comment ?? '')?.[1]);
    const { values } = simulation.image;
    const worst = Array.from(png.data.slice(0, 245 * 256)).reduce(
      (most, level, i) => Math.max(most, Math.abs(level * slope - (values[i] ?? NaN))),
      0,
    );
    expect(worst).toBeLessThanOrEqual((slope / 2) * (1 + 1e-9));
  });

  it('of k-space are brightest at its centre', () => {
    const png = decode(exportedFile(simulation, 'kspace.png', about));
    expect(png.data[128 * 256 + 128]).toBe(255);
  });
});

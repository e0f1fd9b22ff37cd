/** Planes as bytes: the layout that the contract promises, byte by byte. */
import type { Grid } from '../../recon/grid';
import { encodePlanes, logMagnitude } from '../../workers/encode-planes';

const grid: Grid = { rows: 1, columns: 3, spacing: [0.001, 0.002], origin: [0, -0.002] };
const image = { name: 'image', domain: 'image', plane: { ...grid, values: Float64Array.of(0, 5, 10) } } as const;
const kspace = {
  name: 'kspace',
  domain: 'kspace',
  plane: { ...grid, spacing: [4, 8], origin: [0, -8], re: Float64Array.of(1, 0, 0), im: Float64Array.of(0, -10, 0) },
} as const;

it('the exact form is float32 and interleaved complex64, little-endian, one plane after the other', () => {
  const { planes, bytes } = encodePlanes([image, kspace], 'exact');
  const view = new DataView(bytes.buffer);
  expect(Array.from({ length: 9 }, (_, i) => view.getFloat32(4 * i, true))).toEqual([0, 5, 10, 1, 0, 0, -10, 0, 0]);
  expect(planes).toEqual([
    { name: 'image', rows: 1, columns: 3, type: 'float32', spacing: [1, 2], origin: [0, -2] },
    { name: 'kspace', rows: 1, columns: 3, type: 'complex64', spacing: [4, 8], origin: [0, -8] },
  ]);
});

it('the display form is uint16 between low and high, without padding after an odd number of samples', () => {
  const { planes, bytes } = encodePlanes([image, kspace], 'display');
  const view = new DataView(bytes.buffer);
  const levels = Array.from({ length: 9 }, (_, i) => view.getUint16(2 * i, true));
  expect(bytes.byteLength).toBe(18);
  expect(planes.map(({ name, low, high }) => [name, low, high])).toEqual([
    ['image', 0, 10],
    ['kspace.log', -8, 0],
    ['kspace.phase', -Math.PI, Math.PI],
  ]);
  expect(levels.slice(0, 3)).toEqual([0, 32768, 65535]);
  // Magnitudes 1, 10 and 0: a tenth of the maximum is −1 of −8 … 0, nothing at all is the floor.
  expect(levels.slice(3, 6)).toEqual([Math.round((7 / 8) * 65535), 65535, 0]);
  // Phases 0, −π/2 and, where there is nothing, 0.
  expect(levels.slice(6)).toEqual([32768, Math.round(65535 / 4), 32768]);
});

it('a flat plane is all zeros and keeps its value in low', () => {
  const flat = { name: 'image', domain: 'image', plane: { ...grid, values: Float64Array.of(7, 7, 7) } } as const;
  const { planes, bytes } = encodePlanes([flat], 'display');
  expect([...bytes]).toEqual([0, 0, 0, 0, 0, 0]);
  expect([planes[0]?.low, planes[0]?.high]).toEqual([7, 8]);
});

it('the log magnitude of an empty plane is the floor, and never infinite', () => {
  expect([...logMagnitude({ ...grid, re: new Float64Array(3), im: new Float64Array(3) })]).toEqual([-8, -8, -8]);
});

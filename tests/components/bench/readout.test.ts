/** Readouts at the cursor: coordinates by the Fourier relation k = line / (N · Δ), worked out by hand. */
import { imageReadout, kspaceReadout } from '@/components/bench/readout';
import { centredGrid, type DisplayPlane, type PlaneGrid } from '@/components/image/display-plane';
import { kspaceGrid } from '@/components/image/kspace-grid';

const frame = centredGrid(4, 4, [250, 250]);
const plane = (name: string, grid: PlaneGrid, low: number, high: number, sample: number): DisplayPlane => ({
  name,
  ...grid,
  low,
  high,
  samples: new Uint16Array(16).fill(sample),
});
const grid = kspaceGrid(frame);
const bad = new Map([
  ['image', plane('image', frame, 0, 100, 65535)],
  ['kspace.log', plane('kspace.log', grid, -8, 0, 65535)],
  ['kspace.phase', plane('kspace.phase', grid, -Math.PI, Math.PI, 65535)],
]);
const metrics = { nrmse: 0, gain: 2, ssim: 1, ghostRatio: null, ghostRatioOfBad: null };
const untaken = {
  key: '',
  metrics,
  planes: new Map([
    ['image', plane('image', frame, 0, 40, 65535)],
    ['kspace.log', plane('kspace.log', grid, -8, 0, 0)],
    ['kspace.phase', plane('kspace.phase', grid, -3, 3, 0)],
  ]),
};
const text = (items: { label: string; value: string; unit: string }[]) =>
  items.map(({ label, value, unit }) => `${label} ${value}${unit && ` ${unit}`}`);

describe('the readout', () => {
  it('gives row, column, millimetres, and the simulated value under the gain of the comparison', () => {
    expect(text(imageReadout({ row: 1, column: 3 }, frame, { bad, simulation: untaken }))).toEqual([
      'row 1',
      'column 3',
      'x 250.0 mm',
      'y \u2212250.0 mm',
      'bad 100',
      'simulated 80.0',
    ]);
  });

  it('gives line, sample, cycles per metre, log magnitude and phase', () => {
    // One line of a field of view of 1 m is 1 cycle per metre.
    expect(text(kspaceReadout({ row: 1, column: 3 }, frame, 'column', { bad, simulation: null }, 'kspaceOfImage'))).toEqual([
      'line \u22121',
      'sample 1',
      'k pe \u22121 1/m',
      'k ro 1 1/m',
      'log K 0.00',
      'phase 180 °',
    ]);
  });

  it('speaks of rows and columns where the phase-encode axis is not known', () => {
    const items = kspaceReadout({ row: 1, column: 3 }, frame, null, { bad, simulation: null }, 'kspaceOfImage');
    expect(text(items).slice(0, 4)).toEqual(['row \u22121', 'column 1', 'ky \u22121 1/m', 'kx 1 1/m']);
  });

  it('says nothing of a sample that was never taken', () => {
    const items = kspaceReadout({ row: 1, column: 3 }, frame, 'column', { bad: undefined, simulation: untaken }, 'kspace');
    expect(items.slice(4).map(({ value }) => value)).toEqual(['–', '–']);
  });
});

/** Scales of the edges: millimetres of an image; lines and cycles per metre of its k-space. Worked out by hand. */
import { centredGrid } from '@/components/image/display-plane';
import { edgeOf } from '@/components/image/edge-scale';
import { kspaceGrid } from '@/components/image/kspace-grid';
import { wholeRegion } from '@/components/image/region';

const image = centredGrid(256, 256, [0.9, 0.9]);
const kspace = kspaceGrid(image);
const whole = wholeRegion(image);

describe('an edge', () => {
  it('of an image runs from the outer edge of its first sample to that of its last', () => {
    const { scale, words } = edgeOf({ domain: 'image', axis: 'rows', grid: image, region: whole, phaseEncode: 'row', length: 400 });
    expect(words).toBe('readout mm');
    // 256 samples of 0.9 mm, the centre of sample 128 at zero; binary fractions in the last bits only.
    expect(scale.first).toBeCloseTo(-115.65, 9);
    expect(scale.last).toBeCloseTo(114.75, 9);
  });

  it('of k-space counts lines along the phase encoding and cycles per metre along the readout', () => {
    const along = edgeOf({ domain: 'kspace', axis: 'columns', grid: kspace, region: whole, phaseEncode: 'row', length: 400 });
    expect(along).toMatchObject({ words: 'phase-encode line', isPhaseEncode: true, scale: { first: -128.5, last: 127.5 } });
    const across = edgeOf({ domain: 'kspace', axis: 'rows', grid: kspace, region: whole, phaseEncode: 'row', length: 400 });
    expect(across.words).toBe('readout 1/m');
    // Half a sampling frequency and half a sample: 128.5 / (256 · 0.0009 m).
    expect(across.scale.first).toBeCloseTo(-128.5 / 0.2304, 9);
  });

  it('promises nothing where the phase-encode axis is not known', () => {
    const edge = edgeOf({ domain: 'kspace', axis: 'rows', grid: kspace, region: whole, phaseEncode: null, length: 400 });
    expect(edge).toMatchObject({ words: 'ky 1/m', isPhaseEncode: false });
  });
});

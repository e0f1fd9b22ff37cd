/**
 * Elliptical coverage: the corners of k-space are not acquired, only what lies within the ellipse (ky/(sN/2))² + (kx/(sM/2))² ≤ 1,
 * π/4 of the samples at s = 1. A point becomes 2·J1(πr)/(πr), wider than the sinc of the rectangle but with lower side lobes.
 *
 * A scanner leaves out the corners of two phase encodings of a 3-D scan. The plane here is one in which both lie: a picture
 * reformatted across the readout.
 */
import { defineCause } from '../cause';
import { quantity } from '../parameter';
import { copyOf, copyOfBytes } from '../spare-arrays';

export const ellipticalCoverage = defineCause({
  id: 'elliptical-coverage',
  title: 'Elliptical coverage',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['blur'],
  runsAlong: 'both',
  phantom: 'resolution',
  formula: String.raw`K'(k_x, k_y) = 0 \quad\text{where}\quad \left(\frac{k_x}{s M / 2}\right)^2 + \left(\frac{k_y}{s N / 2}\right)^2 > 1`,
  drivers: [
    { fact: 'Coverage of k-space', does: 'says elliptical where the corners were left out, and percent sampling then stands near 78.5' },
    { fact: '3-D acquisition', does: 'has two phase encodings, whose corners cost time and hold little signal' },
  ],
  parameters: {
    size: quantity({ label: 'Size of the ellipse', unit: 'of k max', min: 0.5, max: 1.5, step: 0.05, initial: 1 }),
  },
  identity: { size: 1.5 },
  looks: {
    image:
      'Diagonal edges a little softer than upright ones would have it, and rounder ringing about small bright spots; shown in a plane that holds both phase encodings of a 3-D scan.',
    kspace: 'The corners are empty, cut off along an ellipse.',
  },
  sources: [
    {
      citation:
        'Bernstein MA, Fain SB, Riederer SJ. Effect of windowing and zero-filled reconstruction of MRI data on spatial resolution and acquisition strategy. J Magn Reson Imaging 14:270',
      year: 2001,
      doi: '10.1002/jmri.1183',
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Switch elliptical coverage off',
      who: 'technologist',
      price: 'About a quarter longer (4/π); SNR rises a little',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Raise the matrix along both phase encodings and keep the ellipse',
      who: 'technologist',
      price: 'Longer in proportion; SNR of a voxel falls',
      moves: { time: 'rises', snr: 'falls' },
    },
  ],
  apply(kspace, { size }) {
    const { rows, columns } = kspace;
    const cut = { ...kspace, re: copyOf(kspace.re), im: copyOf(kspace.im), taken: copyOfBytes(kspace.taken) };
    for (let row = 0; row < rows; row++) {
      const y = (row - Math.floor(rows / 2)) / ((size * rows) / 2);
      for (let column = 0; column < columns; column++) {
        const x = (column - Math.floor(columns / 2)) / ((size * columns) / 2);
        if (x * x + y * y <= 1) continue;
        const i = row * columns + column;
        cut.re[i] = 0;
        cut.im[i] = 0;
        cut.taken[i] = 0;
      }
    }
    return cut;
  },
});

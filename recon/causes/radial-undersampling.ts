/**
 * Too few projections: k-space is taken along P spokes through its centre, evenly over half a turn, and reconstructed by ramp-weighted
 * regridding. The image is the object convolved with the point spread of projections.ts: clean within a circle 2P/π pixels across about
 * every bright point, streaks beyond it. Nyquist asks for P = (π/2)·N.
 *
 * Approximated: the projections are those of the pixels of the object, regridding is exact, gradient delays do not exist, and what acts
 * on lines (motion, decay) acts on the Cartesian lines, not on spokes. The k-space shown is the regridded one, the disc of it. Pixels
 * are taken to be square.
 */
import { defineCause } from '../cause';
import { inverse, inverseAlong, transform, transformOfReal } from '../fourier';
import type { ComplexPlane, Grid } from '../grid';
import { centredGrid } from '../grid';
import { quantity } from '../parameter';
import { projectionSpread } from '../projections';
import { giveBackPlane, zeroArray } from '../spare-arrays';

/** The transform of the point spread on twice the size, real; kept for the last size and number of spokes, while other sliders move. */
let kept: { key: string; transfer: Float64Array } | undefined;

function transferOf(rows: number, columns: number, nSpokes: number): Float64Array {
  const key = `${rows} ${columns} ${nSpokes}`;
  if (kept?.key !== key) kept = { key, transfer: transformOfReal(projectionSpread(rows, columns, nSpokes)).re };
  return kept.transfer;
}

/** `plane` about the centre of `grid`: zeros around it, or cut down to it. */
function recentred(plane: ComplexPlane, grid: Grid): ComplexPlane {
  const { rows, columns, spacing, origin } = grid;
  const result = { rows, columns, spacing, origin, re: zeroArray(rows * columns), im: zeroArray(rows * columns) };
  const rowShift = Math.floor(plane.rows / 2) - Math.floor(grid.rows / 2);
  const columnShift = Math.floor(plane.columns / 2) - Math.floor(grid.columns / 2);
  for (let row = Math.max(0, -rowShift); row < Math.min(grid.rows, plane.rows - rowShift); row++) {
    for (let column = Math.max(0, -columnShift); column < Math.min(grid.columns, plane.columns - columnShift); column++) {
      const from = (row + rowShift) * plane.columns + column + columnShift;
      result.re[row * grid.columns + column] = plane.re[from] as number;
      result.im[row * grid.columns + column] = plane.im[from] as number;
    }
  }
  return result;
}

/** The object convolved with the spread of `nSpokes` projections; twice the size, so that nothing comes round. */
function projected(image: ComplexPlane, nSpokes: number): ComplexPlane {
  const padded = recentred(image, centredGrid(2 * image.rows, 2 * image.columns, image.spacing));
  const wide = transform(padded);
  giveBackPlane(padded);
  const transfer = transferOf(wide.rows, wide.columns, nSpokes);
  const scale = Math.sqrt(wide.rows * wide.columns);
  for (let i = 0; i < transfer.length; i++) {
    const factor = scale * (transfer[i] as number);
    wide.re[i] = factor * (wide.re[i] as number);
    wide.im[i] = factor * (wide.im[i] as number);
  }
  // One axis after the other: rows that are cut off need no second transform.
  const rows = inverseAlong(wide, 0);
  giveBackPlane(wide);
  const narrow = recentred(rows, { ...rows, rows: image.rows });
  giveBackPlane(rows);
  return recentred(inverseAlong(narrow, 1), image);
}

/** 1 within the circle |k| ≤ ½ cycle a pixel, which the spokes reach. */
function disc(rows: number, columns: number): Uint8Array {
  const inside = new Uint8Array(rows * columns);
  for (let row = 0; row < rows; row++) {
    const y = (row - Math.floor(rows / 2)) / (rows / 2);
    for (let column = 0; column < columns; column++) {
      const x = (column - Math.floor(columns / 2)) / (columns / 2);
      inside[row * columns + column] = x * x + y * y <= 1 ? 1 : 0;
    }
  }
  return inside;
}

export const radialUndersampling = defineCause({
  id: 'radial-undersampling',
  title: 'Too few projections',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['lines', 'noise'],
  runsAlong: 'both',
  phantom: 'abdomen',
  formula: String.raw`I' = I * \frac{\pi}{P} \sum_{p=1}^{P} h(\mathbf{r} \cdot \mathbf{n}_p),\quad h(t) = \int_{-1/2}^{1/2} |k|\, e^{\,i 2\pi k t}\, dk`,
  drivers: [
    { fact: 'Number of spokes', does: 'is P: the clean circle about a bright point is 2P/π pixels across' },
    { fact: 'Matrix', does: 'sets what would be enough: π/2 spokes for every pixel across' },
    { fact: 'Radial or rotating-strip sequence', does: 'samples so; Cartesian sequences do not streak' },
  ],
  parameters: {
    spokes: quantity({ label: 'Spokes', unit: 'spokes', min: 8, max: 804, step: 4, initial: 64 }),
  },
  strength: { spokes: [200, 16] },
  looks: {
    image:
      'Fine straight streaks that fan out from everything bright, beginning at a distance of P/π pixels from it; edges as sharp as before.',
    kspace:
      'The disc that the spokes reach, brighter along the spokes towards its edge, the corners empty. Shown after regridding: the spokes themselves are no lines of it.',
  },
  sources: [
    {
      citation: 'Larson PEZ, Gurney PT, Nishimura DG. Anisotropic field-of-views in radial imaging. IEEE Trans Med Imaging 27:47',
      year: 2008,
      standing: 'confirmed',
    },
    {
      citation:
        'Ramachandran GN, Lakshminarayanan AV. Three-dimensional reconstruction from radiographs and electron micrographs. PNAS 68:2236',
      year: 1971,
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Take more spokes',
      who: 'technologist',
      price: 'Longer in proportion; SNR rises with the square root',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Saturate fat, or put a band over bright tissue at the edge: what is bright streaks most',
      who: 'technologist',
      price: 'More RF and a longer minimum TR: SAR rises, check the conditions of an implant',
      moves: { time: 'rises', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Switch off coil elements that see bright tissue outside the region',
      who: 'technologist',
      price: 'A minute at the table; signal falls there',
      moves: { time: 'once', snr: 'falls' },
    },
    {
      change: 'A coarser matrix, or a smaller field of view, at the same number of spokes',
      who: 'physicist',
      price:
        'Detail, or room around the object; SNR rises with larger pixels; it falls with a smaller field of view, whose gradients work harder: check nerve stimulation and the conditions of an implant',
      moves: { snr: 'changes', nerveStimulation: 'changes', implantConditions: 'changes' },
    },
  ],
  apply(kspace, { spokes }) {
    const taken = disc(kspace.rows, kspace.columns);
    const regridded = transform(projected(inverse(kspace), spokes));
    for (let i = 0; i < taken.length; i++) {
      if (taken[i] === 1) continue;
      regridded.re[i] = 0;
      regridded.im[i] = 0;
    }
    return { ...regridded, taken };
  },
});

/**
 * Zero-filled interpolation: k-space is laid into the middle of a larger matrix of zeros, so that the image has more and smaller
 * pixels over the same field of view, I'(x) the trigonometric interpolation of I. No detail is added. The scale √(n'/n) of each axis
 * keeps the brightness under the orthonormal transform.
 */
import type { Encoded } from '../cause';
import { defineReconstruction } from '../cause';
import { inverse } from '../fourier';
import type { ComplexPlane } from '../grid';
import { centredGrid, complexZeros } from '../grid';
import { choice, quantity } from '../parameter';

/** `kspace` in the middle of rows × columns zeros, its zero frequency at the centre of both. */
function padded(kspace: Encoded, rows: number, columns: number): ComplexPlane {
  const result = complexZeros(centredGrid(rows, columns, kspace.spacing));
  const scale = Math.sqrt((rows * columns) / (kspace.rows * kspace.columns));
  const firstRow = Math.floor(rows / 2) - Math.floor(kspace.rows / 2);
  const firstColumn = Math.floor(columns / 2) - Math.floor(kspace.columns / 2);
  for (let row = 0; row < kspace.rows; row++) {
    let to = (row + firstRow) * columns + firstColumn;
    const end = (row + 1) * kspace.columns;
    for (let from = row * kspace.columns; from < end; from++, to++) {
      result.re[to] = scale * (kspace.re[from] as number);
      result.im[to] = scale * (kspace.im[from] as number);
    }
  }
  return result;
}

export const interpolated = defineReconstruction({
  id: 'interpolated',
  title: 'Interpolated',
  changesMatrix: true,
  seen: ['blur'],
  runsAlong: 'both',
  formula: String.raw`I'(\mathbf{r}) = \sqrt{n'/n}\; \mathcal{F}_{n'}^{-1}\{ K \text{ within zeros} \},\quad n' > n`,
  drivers: [
    { fact: 'Acquired matrix', does: 'sets the detail: what the picture shows besides is interpolated' },
    { fact: 'Rows and columns of the picture', does: 'more than the acquired matrix say that it was interpolated' },
  ],
  parameters: {
    size: choice({
      label: 'Interpolate to',
      options: [
        { value: 'twice', label: 'Twice the matrix' },
        { value: 'matrix', label: 'A given matrix' },
      ],
      initial: 'twice',
    }),
    matrix: quantity({ label: 'Matrix, longer side', unit: 'px', min: 16, max: 1024, step: 16, initial: 512, when: { size: ['matrix'] } }),
  },
  identity: { size: 'matrix', matrix: 16 },
  looks: {
    image:
      'Smaller pixels and smooth edges, but no more detail: blur and ringing of the acquired matrix stay. A matrix below the acquired one changes nothing.',
    kspace: 'The acquired samples in the middle, a frame of zeros about them; in the k-space of the image the frame is nearly empty.',
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
      change: 'Acquire the matrix that is shown',
      who: 'technologist',
      price:
        'Longer in proportion along the phase encoding; SNR of a pixel falls; stronger gradients: nerve stimulation rises, check the conditions of an implant',
      moves: { time: 'rises', snr: 'falls', nerveStimulation: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Switch interpolation off where the size of a pixel is taken for the resolution',
      who: 'technologist',
      price: 'The scan itself stays as it is; the picture is coarser to look at',
      moves: {},
    },
    {
      change: 'Measure the resolution on a phantom, and note the acquired pixel in the protocol',
      who: 'physicist',
      price: 'Half an hour of scanner time',
      moves: { time: 'once' },
    },
  ],
  phantom: 'resolution',
  // The phantom has half the pixels of the picture, 64 or 128: the mild end interpolates neither.
  strength: { matrix: [64, 256] },
  shownOn: { steps: [], parameters: { size: 'matrix' }, samples: 0.5 },
  reconstruct(kspace, { size, matrix }) {
    const factor = size === 'twice' ? 2 : Math.max(1, matrix / Math.max(kspace.rows, kspace.columns));
    if (factor === 1) return inverse(kspace);
    return inverse(padded(kspace, Math.round(factor * kspace.rows), Math.round(factor * kspace.columns)));
  },
});

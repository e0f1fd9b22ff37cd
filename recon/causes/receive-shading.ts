/**
 * Receive shading, I' = I·b(r) with b = exp of a polynomial of order 3: from one side to the other, from the centre to the edge, and
 * steeper towards the coil. With u along the direction of the coil and ρ the distance from the centre, both 1 at the edges,
 *   ln b = ½·ln(T)·u + ½·ln(S)·u³ − ln(C)·ρ²,
 * so that T·S is the ratio of the two sides and C that of centre to edge. b is 1 at the centre. The phase of the coil is left out.
 */
import { defineCause } from '../cause';
import { quantity } from '../parameter';
import { fromDegrees } from '../units';
import { weighted } from '../weighting';

export const receiveShading = defineCause({
  id: 'receive-shading',
  title: 'Receive shading',
  stage: 'object',
  domain: 'image',
  seen: ['shading'],
  runsAlong: 'none',
  phantom: 'resolution',
  formula: String.raw`I' = I\,b,\quad \ln b = \tfrac12 \ln(T)\,u + \tfrac12 \ln(S)\,u^3 - \ln(C)\,\rho^2`,
  drivers: [
    { fact: 'Receive coil and the elements in use', does: 'set how the sensitivity falls off from the elements into the body' },
    { fact: 'Image type', does: 'says whether the scanner has already levelled the sensitivity' },
  ],
  parameters: {
    sideRatio: quantity({ label: 'Bright side over dark side', unit: '×', min: 1, max: 10, step: 0.1, initial: 3 }),
    steepening: quantity({ label: 'More than that, close to the coil', unit: '×', min: 1, max: 5, step: 0.1, initial: 1 }),
    centreRatio: quantity({ label: 'Centre over edge', unit: '×', min: 0.3, max: 3, step: 0.05, initial: 1 }),
    direction: quantity({ label: 'Coil lies, clockwise from the right', unit: '°', min: 0, max: 360, step: 5, initial: 90 }),
  },
  identity: { sideRatio: 1, steepening: 1, centreRatio: 1, direction: 90 },
  looks: {
    image: 'Bright near the coil and dark far from it, smoothly, without an edge; noise does not follow the shading.',
    kspace: 'k-space does not show this cause by eye: only the few samples about the centre change.',
  },
  sources: [
    {
      citation:
        'Sled JG, Zijdenbos AP, Evans AC. A nonparametric method for automatic correction of intensity nonuniformity in MRI data. IEEE Trans Med Imaging 17:87',
      year: 1998,
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Seat the coil and its connectors again, centre the part in it',
      who: 'technologist',
      price: 'Minutes for a new set-up of the patient',
      moves: { time: 'once' },
    },
    {
      change: 'Select the elements that cover the part',
      who: 'technologist',
      price: 'A minute at the console; SNR rises, as distant elements add noise only',
      moves: { time: 'once', snr: 'rises' },
    },
    {
      change: 'Use the receive-sensitivity normalisation of the console',
      who: 'technologist',
      price: 'A calibration of seconds; noise becomes uneven instead: it is raised where the coil hears little',
      moves: { time: 'once' },
    },
    {
      change: 'Measure uniformity and SNR of each element on a phantom',
      who: 'physicist',
      price: 'Minutes for each element; the coil is out of use meanwhile',
      moves: { time: 'once' },
    },
    {
      change: 'Repair the coil where the phantom fails',
      who: 'licensed service',
      price: 'Days in which the coil is away',
      moves: { time: 'once' },
    },
  ],
  apply(object, { sideRatio: T, steepening: S, centreRatio: C, direction }) {
    const { rows, columns } = object;
    const [linear, cubic, radial] = [Math.log(T) / 2, Math.log(S) / 2, Math.log(C)];
    const [right, down] = [Math.cos(fromDegrees(direction)), Math.sin(fromDegrees(direction))];
    const b = new Float64Array(rows * columns);
    for (let row = 0; row < rows; row++) {
      const y = (row - Math.floor(rows / 2)) / (rows / 2);
      for (let column = 0; column < columns; column++) {
        const x = (column - Math.floor(columns / 2)) / (columns / 2);
        const u = right * x + down * y;
        b[row * columns + column] = Math.exp(linear * u + cubic * u * u * u - radial * (x * x + y * y));
      }
    }
    return weighted(object, b);
  },
});

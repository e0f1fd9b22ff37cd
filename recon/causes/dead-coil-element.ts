/**
 * An element of the receive coil that is dead or weak. The image of n elements is their root sum of squares, levelled by the full
 * ring, so that with the gain a of the broken one, j,
 *   I' = I·√(Σ_i a_i²|C_i|² / Σ_i |C_i|²),   a_j = a, all others 1.
 * The elements of coils.ts; their phases, and the noise that each adds, are left out.
 */
import { defineCause } from '../cause';
import { sumOfSquares } from '../coils';
import { quantity } from '../parameter';
import { fromDegrees, fromPercent } from '../units';
import { weighted } from '../weighting';

export const deadCoilElement = defineCause({
  id: 'dead-coil-element',
  title: 'Dead coil element',
  stage: 'object',
  domain: 'image',
  seen: ['shading', 'signal-loss'],
  runsAlong: 'none',
  phantom: 'vials',
  formula: String.raw`I' = I \sqrt{\frac{\sum_i a_i^2 |C_i|^2}{\sum_i |C_i|^2}},\quad |C_i| = e^{-|r - r_i|^2 / 2w^2}`,
  drivers: [
    { fact: 'Elements in use', does: 'say how many elements share the signal, and whether one was left out of the scan' },
    { fact: 'Image type', does: 'says whether the image was levelled by a calibration made with the full coil' },
  ],
  parameters: {
    elements: quantity({ label: 'Elements of the ring', unit: 'elements', min: 4, max: 16, step: 1, initial: 8 }),
    remaining: quantity({ label: 'Sensitivity that is left', unit: '%', min: 0, max: 100, step: 5, initial: 0 }),
    position: quantity({ label: 'Broken element lies, clockwise from the right', unit: '°', min: 0, max: 360, step: 5, initial: 0 }),
    radius: quantity({ label: 'Radius of the ring', unit: 'of FOV', min: 0.6, max: 0.8, step: 0.05, initial: 0.7 }),
    width: quantity({ label: 'Reach of an element', unit: 'of FOV', min: 0.3, max: 0.6, step: 0.05, initial: 0.3 }),
  },
  identity: { elements: 8, remaining: 100, position: 0, radius: 0.7, width: 0.3 },
  looks: {
    image:
      'A dark sector at the edge of the object on the side of the broken element, fading towards the centre; the other side is unharmed.',
    kspace: 'k-space does not show this cause by eye: only the few samples about the centre change.',
  },
  sources: [
    {
      citation: 'Roemer PB et al. The NMR phased array. Magn Reson Med 16:192',
      year: 1990,
      equation: 'root sum of squares of the elements',
      standing: 'confirmed',
    },
    { citation: 'Gaussian sensitivities on a ring', standing: 'common practice' },
  ],
  remedies: [
    {
      change: 'Seat the connector of the coil again and look at the element list',
      who: 'technologist',
      price: 'A minute, and a repeat',
      moves: { time: 'once' },
    },
    {
      change: 'Change to another coil, or to the body coil',
      who: 'technologist',
      price: 'Minutes for a new set-up; less SNR with the body coil',
      moves: { time: 'once', snr: 'falls' },
    },
    {
      change: 'Test every element on a phantom, its SNR against the record',
      who: 'physicist',
      price: 'Minutes for each element; the coil is out of use meanwhile',
      moves: { time: 'once' },
    },
    {
      change: 'Repair the element, its preamplifier or cable',
      who: 'licensed service',
      price: 'Days in which the coil is away',
      moves: { time: 'once' },
    },
  ],
  apply(object, { elements, remaining, position, radius, width }) {
    const ring = { elements, radius, width, firstAngle: fromDegrees(position) };
    const all = sumOfSquares(object, ring);
    const b = sumOfSquares(object, ring, [fromPercent(remaining) ** 2]);
    for (let i = 0; i < b.length; i++) b[i] = Math.sqrt((b[i] as number) / (all[i] as number));
    return weighted(object, b);
  },
});

/**
 * What parallel imaging leaves behind: one line in R is taken, and the sensitivities of the coil elements tell the R places of a folded
 * pixel apart (`parallel-imaging.ts`). Copies N/R apart stay where the maps lie elsewhere than the elements, where they are noisy, and where
 * anatomy outside the field of view, which no map knows, has folded in. Noise grows to g·√R, most where the places are hard to tell apart.
 *
 * It acts on the image, where the elements receive it, with a noise of its own: the chain has one plane of k-space, not one for each
 * element. Causes that act on lines act on the unfolded picture.
 */
import { defineCause } from '../cause';
import { magnitude } from '../grid';
import { linesOf } from '../lines';
import { foldedAndUnfolded } from '../parallel-imaging';
import { quantity } from '../parameter';
import { percentile } from '../statistics';
import { fromMillimetres, fromPercent } from '../units';

/** Distance of the elements from the centre, of the longer side of the field of view. Common practice. */
const ringRadius = 0.7;

export const parallelImagingResidual = defineCause({
  id: 'parallel-imaging-residual',
  title: 'Residual of parallel imaging',
  stage: 'encoding',
  domain: 'image',
  seen: ['fold-in', 'ghosts', 'noise'],
  runsAlong: 'phase-encode',
  formula: String.raw`v = (S'^{H} S')^{-1} S'^{H} \left(\textstyle\sum_p S_p I_p + \sqrt{R}\, n\right),\quad \mathrm{SNR} = \frac{\mathrm{SNR}_{\text{all lines}}}{g \sqrt{R}}`,
  drivers: [
    { fact: 'Acceleration', does: 'is R: what is not unfolded lies one R-th of the field of view away, and noise grows with g·√R' },
    { fact: 'Phase-encode axis', does: 'is the direction along which the elements must differ from one another' },
    { fact: 'Elements in use', does: 'set how well places are told apart: g rises as R comes near the number of elements along the axis' },
    { fact: 'Field of view along the phase encoding', does: 'must hold all of the anatomy: what reaches out comes back in the middle' },
  ],
  needsObjectPhase: true,
  changesMatrix: true,
  parameters: {
    accelerationFactor: quantity({
      label: 'Acceleration',
      unit: '×',
      min: 1,
      max: 4,
      step: 1,
      initial: 2,
      fromHeader: {
        fact: 'Parallel-imaging factor along the phase encoding',
        read: ({ accelerationFactor: r }) => (r !== undefined && r > 1 ? r : undefined),
      },
    }),
    displacement: quantity({ label: 'Maps lie off along the phase encoding by', unit: 'mm', min: -40, max: 40, step: 1, initial: 15 }),
    fraction: quantity({ label: 'Phase field of view', unit: 'of full', min: 0.5, max: 1, step: 0.01, initial: 1 }),
    mapNoise: quantity({ label: 'Noise of the maps', unit: '%', min: 0, max: 50, step: 1, initial: 0 }),
    noise: quantity({ label: 'Noise with all lines', unit: '% of P99', min: 0, max: 20, step: 0.5, initial: 1 }),
    elements: quantity({ label: 'Elements of the ring', unit: 'elements', min: 4, max: 16, step: 1, initial: 8 }),
    width: quantity({ label: 'Reach of an element', unit: 'of FOV', min: 0.3, max: 0.6, step: 0.05, initial: 0.3 }),
  },
  identity: { accelerationFactor: 1, displacement: 0, fraction: 1, mapNoise: 0, noise: 0, elements: 8, width: 0.3 },
  strength: { displacement: [5, 25], noise: [0.5, 3] },
  looks: {
    image:
      'Faint arcs and edges of the anatomy one R-th of the field of view away along the phase encoding; with a field of view that is too small a bright band of fold-in in the middle of the picture, not at its edge; grain that is coarser in the middle than at the edge. The coil is an assumed ring of elements.',
    kspace:
      'Lines that were skipped are filled with a wrong amplitude: a weak pattern with a period of R lines, which only complex data show.',
  },
  sources: [
    { citation: 'Pruessmann KP et al. SENSE: sensitivity encoding for fast MRI. Magn Reson Med 42:952', year: 1999, standing: 'confirmed' },
    { citation: 'Deshmane A et al. Parallel MR imaging. J Magn Reson Imaging 36:55', year: 2012, standing: 'confirmed' },
    { citation: 'Gaussian sensitivities on a ring', standing: 'common practice' },
  ],
  remedies: [
    {
      change: 'Acquire the calibration again after the patient and the coil have settled',
      who: 'technologist',
      price: 'Seconds to a minute',
      moves: { time: 'once' },
    },
    {
      change: 'Make the phase field of view larger than the anatomy, or oversample along the phase encoding',
      who: 'technologist',
      price: 'Longer in proportion, or coarser pixels; SNR rises with either',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Lower the acceleration factor',
      who: 'technologist',
      price: 'Longer in proportion; SNR rises with the square root, and as g falls',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Swap phase and frequency encoding, so that lines are skipped along the axis on which the elements differ',
      who: 'technologist',
      price:
        'Motion ghosts and wrap-around turn with it; other gradients work hardest: check nerve stimulation and the conditions of an implant',
      moves: { nerveStimulation: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Use a coil with more elements along the phase encoding, all of them selected and seated',
      who: 'technologist',
      price: 'A few minutes for a new set-up of the patient; SNR rises',
      moves: { time: 'once', snr: 'rises' },
    },
    {
      change: 'Measure g and the residual on a phantom, element by element',
      who: 'physicist',
      price: 'Half an hour of scanner time',
      moves: { time: 'once' },
    },
  ],
  apply(object, { accelerationFactor, displacement, fraction, mapNoise, noise, elements, width }, { acquisition, random }) {
    const scan = {
      accelerationFactor,
      fraction,
      ring: { elements, radius: ringRadius, width, firstAngle: 0 },
      displacement: fromMillimetres(displacement),
      mapNoise: fromPercent(mapNoise),
      noise: noise === 0 ? 0 : fromPercent(noise) * percentile(magnitude(object).values, 99),
    };
    return foldedAndUnfolded(object, linesOf(object, acquisition), scan, random);
  },
});

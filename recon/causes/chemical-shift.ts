/**
 * Chemical shift: fat resonates δ = 3.5 ppm below water and is imaged elsewhere, I'(r) = W(r) + F(r − Δ)·exp(iφ).
 * First kind: Δ = δ·f0/BW pixels along the readout, δ·f0·ESP·N/R along the phase encoding of an echo-planar scan. Second kind, in a
 * gradient echo: φ = 2π·δ·f0·TE, so that fat and water cancel in pixels that hold both, at borders, when they are out of phase.
 *
 * Assumed: what is brightest is fat (`fat-mask.ts`), one line of it. The shift through the slice is not modelled.
 */
import { defineCause } from '../cause';
import { assumedFat, fatThreshold } from '../fat-mask';
import type { ComplexPlane } from '../grid';
import { choice, quantity } from '../parameter';
import { displacementOf, phasePerHertz, readoutParameters } from '../sequence';
import { shifted } from '../shift';
import { fromMegahertz } from '../units';
import { weighted } from '../weighting';

/** In place, a plane that belongs to the caller. */
function add(sum: ComplexPlane, part: ComplexPlane, sign: 1 | -1): void {
  for (let i = 0; i < sum.re.length; i++) {
    sum.re[i] = (sum.re[i] as number) + sign * (part.re[i] as number);
    sum.im[i] = (sum.im[i] as number) + sign * (part.im[i] as number);
  }
}

export const chemicalShift = defineCause({
  id: 'chemical-shift',
  title: 'Chemical shift',
  stage: 'object',
  domain: 'image',
  seen: ['lines', 'distortion'],
  runsAlong: 'readout',
  phantom: 'abdomen',
  formula: String.raw`I'(\mathbf{r}) = W(\mathbf{r}) + F(\mathbf{r} - \Delta\,\mathbf{e})\, e^{i\varphi},\quad \Delta = \frac{\delta f_0}{\mathrm{BW}},\quad \varphi = 2\pi\, \delta f_0\, T_E`,
  drivers: [
    { fact: 'Bandwidth per pixel', does: 'divides the shift along the readout' },
    { fact: 'Imaging frequency', does: 'multiplies the shift: twice the field, twice the pixels' },
    { fact: 'TE', does: 'sets, in a gradient echo, whether fat and water add up or cancel at borders' },
    { fact: 'Echo spacing and acceleration', does: 'set the shift along the phase encoding of an echo-planar scan, often many pixels' },
  ],
  parameters: {
    difference: quantity({ label: 'Fat below water', unit: 'ppm', min: 0, max: 5, step: 0.05, initial: 3.5 }),
    towards: choice<'end' | 'start'>({
      label: 'Fat moves towards',
      options: [
        { value: 'end', label: 'the right, or the bottom' },
        { value: 'start', label: 'the left, or the top' },
      ],
      initial: 'end',
    }),
    fatThreshold,
    ...readoutParameters,
  },
  identity: {
    difference: 0,
    towards: 'end',
    fatThreshold: 0.75,
    sequence: 'gradient-echo',
    imagingFrequency: 63.87,
    bandwidth: 200,
    echoTime: 6.7,
    echoSpacing: 0.6,
  },
  looks: {
    image:
      'A dark band on one side of fat and a bright one on the other, along the readout; in an echo-planar scan a whole shifted fat image along the phase encoding; in a gradient echo out of phase a dark line all around. What is brightest is assumed to be fat.',
    kspace: 'k-space does not show this cause: fat only gains a phase that grows along one axis.',
  },
  sources: [
    {
      citation: 'Hood MN et al. Chemical shift: the artifact and clinical tool revisited. RadioGraphics 19:357',
      year: 1999,
      doi: '10.1148/radiographics.19.2.g99mr07357',
      standing: 'confirmed',
    },
    {
      citation: 'Dixon WT. Simple proton spectroscopic imaging. Radiology 153:189',
      year: 1984,
      doi: '10.1148/radiology.153.1.6089263',
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Raise the bandwidth per pixel',
      who: 'technologist',
      price: 'SNR falls with the square root; stronger readout gradient: nerve stimulation rises, check the conditions of an implant',
      moves: { snr: 'falls', nerveStimulation: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Suppress fat, by its frequency or by inversion recovery',
      who: 'technologist',
      price:
        'Longer; more RF, so SAR rises: check the conditions of an implant; inversion costs SNR, changes contrast and must not be used after contrast agent',
      moves: { time: 'rises', snr: 'falls', contrast: 'changes', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Swap phase and frequency encoding, so that the band lies off the organ',
      who: 'technologist',
      price:
        'Motion ghosts and wrap-around turn with it: oversample, which takes longer, if the long side is now phase encoded; other gradients work hardest: check nerve stimulation and the conditions of an implant',
      moves: { time: 'changes', nerveStimulation: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'In a gradient echo, take a TE at which fat and water are in phase',
      who: 'technologist',
      price: 'Other T2* contrast',
      moves: { contrast: 'changes' },
    },
    {
      change: 'Separate fat and water from two or three echoes',
      who: 'physicist',
      price: 'Longer; fat and water may be exchanged where the field is uneven; the added echoes raise SNR',
      moves: { time: 'rises', snr: 'rises' },
    },
  ],
  apply(object, { difference, towards, fatThreshold: threshold, ...readout }, { acquisition }) {
    const offset = difference * 1e-6 * fromMegahertz(readout.imagingFrequency);
    const { axis, pixelsPerHertz } = displacementOf(readout, object, acquisition);
    const fat = weighted(object, assumedFat(object, threshold));
    const image = { ...object, re: object.re.slice(), im: object.im.slice() };
    add(image, fat, -1);
    // Fat lies below water: a negative offset, whose direction in the picture the polarity of the gradient decides.
    add(image, shifted(fat, axis, (towards === 'end' ? 1 : -1) * offset * pixelsPerHertz, -offset * phasePerHertz(readout)), 1);
    return image;
  },
});

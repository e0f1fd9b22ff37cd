/**
 * A main field that is not even: x' = x + Δf(r)/BW along the readout of a spin or gradient echo, y' = y + Δf(r)·ESP·N/R along the phase
 * encoding of an echo-planar scan, mass kept. A gradient echo also loses |sinc(δf·TE)| where the field changes by δf across a voxel.
 * The field is a smooth one of the given spread, drawn from the seed of the recipe, and an offset (`field-map.ts`).
 *
 * Assumed: the slice stays where it is; its own displacement, Δf over the bandwidth of the pulse, is not modelled.
 */
import { defineCause } from '../cause';
import { smoothField } from '../field-map';
import { encodeOffResonance } from '../off-resonance-encoding';
import { quantity } from '../parameter';
import { readoutParameters } from '../sequence';

export const offResonance = defineCause({
  id: 'off-resonance',
  title: 'Uneven main field',
  stage: 'object',
  domain: 'image',
  seen: ['distortion', 'signal-loss', 'blur'],
  runsAlong: 'both',
  phantom: 'resolution',
  formula: String.raw`I'\!\left(x + \frac{\Delta f}{\mathrm{BW}}\right) = \frac{I(x)}{\left|1 + \partial_x \Delta f / \mathrm{BW}\right|}\, \left|\mathrm{sinc}(\delta f\, T_E)\right| e^{-i 2\pi \Delta f\, T_E}`,
  drivers: [
    { fact: 'Bandwidth per pixel', does: 'divides the displacement along the readout' },
    { fact: 'Echo spacing and acceleration', does: 'set the displacement along the phase encoding of an echo-planar scan' },
    { fact: 'TE', does: 'sets how much a gradient echo loses; a spin echo loses nothing' },
    { fact: 'Imaging frequency', does: 'multiplies everything: the field is off by parts of itself' },
  ],
  parameters: {
    fieldRange: quantity({ label: 'Spread of the field', unit: 'ppm', min: 0, max: 10, step: 0.1, initial: 2 }),
    offset: quantity({ label: 'Centre frequency off by', unit: 'Hz', min: -500, max: 500, step: 1, initial: 0 }),
    acrossSlice: quantity({
      label: 'Change across the slice',
      unit: 'ppm',
      min: 0,
      max: 5,
      step: 0.05,
      initial: 0.2,
      when: { sequence: ['gradient-echo'] },
    }),
    ...readoutParameters,
  },
  identity: {
    fieldRange: 0,
    offset: 0,
    acrossSlice: 0,
    sequence: 'gradient-echo',
    imagingFrequency: 63.87,
    bandwidth: 200,
    echoTime: 6.7,
    echoSpacing: 0.6,
  },
  looks: {
    image:
      'The picture is bent, stretched and dark in one place, pressed together and bright in another: slightly along the readout, by many pixels along the phase encoding of an echo-planar scan. A gradient echo is dark where the field is steep. The field itself is an assumed one.',
    kspace:
      'k-space does not show this cause in a spin echo; in a gradient echo the echo of steep places lies off the centre, which only complex data show.',
  },
  sources: [
    {
      citation:
        'Jezzard P, Balaban RS. Correction for geometric distortion in echo planar images from B0 field variations. Magn Reson Med 34:65',
      year: 1995,
      doi: '10.1002/mrm.1910340111',
      standing: 'confirmed',
    },
    {
      citation: 'Bernstein MA, King KF, Zhou XJ. Handbook of MRI Pulse Sequences',
      year: 2004,
      standing: 'confirmed',
    },
  ],
  remedies: [
    { change: 'Shim again over the region that matters', who: 'technologist', price: 'Seconds to a minute', moves: { time: 'once' } },
    {
      change: 'Raise the bandwidth per pixel',
      who: 'technologist',
      price: 'SNR falls with the square root; stronger readout gradient: nerve stimulation rises, check the conditions of an implant',
      moves: { snr: 'falls', nerveStimulation: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Echo-planar: accelerate, or read in several shots or segments, so that a step through k-space takes less time',
      who: 'technologist',
      price: 'Less SNR, or longer and open to motion between shots',
      moves: { time: 'changes', snr: 'falls' },
    },
    {
      change: 'Spin echo, or a shorter TE; thinner slices',
      who: 'technologist',
      price:
        'Other contrast; a refocusing pulse raises SAR; thinner slices cost SNR and take a stronger gradient, so that nerve stimulation rises: check the conditions of an implant',
      moves: { snr: 'falls', contrast: 'changes', sar: 'changes', nerveStimulation: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Take a field map, or the scan with reversed phase encoding, and correct the distortion',
      who: 'physicist',
      price: 'Some minutes; signal that is piled up is not told apart again',
      moves: { time: 'once' },
    },
    {
      change: 'Check the shim of the magnet on a phantom',
      who: 'licensed service',
      price: 'Hours of the scanner',
      moves: { time: 'once' },
    },
  ],
  apply(object, { fieldRange, offset, acrossSlice, ...readout }, { acquisition, random }) {
    const hertz = smoothField(object, acquisition, random, fieldRange * readout.imagingFrequency);
    const field = {
      hertz: hertz.map((value) => value + offset),
      acrossSlice: new Float64Array(hertz.length).fill(acrossSlice * readout.imagingFrequency),
    };
    return encodeOffResonance(object, field, readout, acquisition);
  },
});

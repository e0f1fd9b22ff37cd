/**
 * Banding of balanced steady-state free precession: S' = S·|sin(π·Δf·TR + ½β)|, β the increment of the RF phase from pulse to pulse. With
 * β = 180° the signal is full on resonance and vanishes at Δf = ±1/(2TR) and every 1/TR beyond. Flip angles are taken as large against
 * the effect of T1 and T2, so that the pass band is the bare sine; the change of phase by 180° from band to band is left out, a magnitude
 * image does not show it. The field is a smooth assumed one (`field-map.ts`).
 */
import { defineCause } from '../cause';
import { smoothField } from '../field-map';
import { quantity } from '../parameter';
import { readoutParameters } from '../sequence';
import { fromDegrees, fromMilliseconds } from '../units';
import { weighted } from '../weighting';

const longestBalanced = 0.03;

export const banding = defineCause({
  id: 'banding',
  title: 'Banding of balanced gradient echoes',
  stage: 'object',
  domain: 'image',
  seen: ['lines', 'signal-loss'],
  runsAlong: 'both',
  phantom: 'resolution',
  formula: String.raw`S' = S \left|\sin\!\left(\pi\, \Delta f\, T_R + \tfrac{1}{2}\beta\right)\right|`,
  drivers: [
    { fact: 'TR', does: 'sets the distance of the bands in frequency, 1/TR; shorter is better' },
    { fact: 'Imaging frequency', does: 'multiplies how far the field is off, and so the number of bands' },
  ],
  parameters: {
    fieldRange: quantity({ label: 'Spread of the field', unit: 'ppm', min: 0, max: 20, step: 0.1, initial: 5 }),
    offset: quantity({ label: 'Centre frequency off by', unit: 'Hz', min: -500, max: 500, step: 1, initial: 0 }),
    increment: quantity({ label: 'RF phase increment', unit: '°', min: 0, max: 360, step: 5, initial: 180 }),
    repetitionTime: quantity({
      label: 'TR',
      unit: 'ms',
      min: 2,
      max: 30,
      step: 0.1,
      initial: 5,
      fromHeader: {
        fact: 'TR',
        read: ({ repetitionTime: TR }) => (TR !== undefined && TR <= longestBalanced ? 1000 * TR : undefined),
      },
    }),
    imagingFrequency: readoutParameters.imagingFrequency,
  },
  identity: { fieldRange: 0, offset: 0, increment: 180, repetitionTime: 5, imagingFrequency: 63.87 },
  looks: {
    image:
      'Dark curved bands where the field passes ±1/(2TR), more and closer together where it is steep: at the edge of the picture, near air and metal. The field itself is an assumed one.',
    kspace: 'k-space does not show this cause.',
  },
  sources: [
    {
      citation:
        'Nayak KS et al. Wideband SSFP: alternating repetition time balanced steady state free precession with increased band spacing. Magn Reson Med 58:931',
      year: 2007,
      standing: 'confirmed',
    },
    {
      citation: 'Scheffler K, Hennig J. Is TrueFISP a gradient-echo or a spin-echo sequence? Magn Reson Med 49:395',
      year: 2003,
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Shorten TR: higher bandwidth, asymmetric echo, coarser matrix along the readout',
      who: 'technologist',
      price:
        'A shorter scan, less SNR or resolution; gradients switch harder, so nerve stimulation rises; SAR rises as pulses follow faster: check the conditions of an implant',
      moves: { time: 'falls', snr: 'falls', sar: 'rises', nerveStimulation: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Shim again over the region, set the centre frequency there',
      who: 'technologist',
      price: 'Seconds to a minute',
      moves: { time: 'once' },
    },
    {
      change: 'Move the centre frequency by hand, so that the bands leave the organ (a scout at several offsets shows which)',
      who: 'technologist',
      price: 'A scout of seconds to a minute; the bands go elsewhere',
      moves: { time: 'once' },
    },
    {
      change: 'Two or four scans with other RF phase increments, added up',
      who: 'physicist',
      price: 'Two or four times as long; SNR rises with the square root',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'A spoiled gradient echo instead',
      who: 'technologist',
      price: 'Less SNR and other contrast: fluid is no longer bright; smaller flip angles lower SAR',
      moves: { snr: 'falls', contrast: 'changes', sar: 'falls' },
    },
  ],
  apply(object, { fieldRange, offset, increment, repetitionTime, imagingFrequency }, { acquisition, random }) {
    const field = smoothField(object, acquisition, random, fieldRange * imagingFrequency);
    const TR = fromMilliseconds(repetitionTime);
    const half = fromDegrees(increment) / 2;
    return weighted(
      object,
      field.map((hertz) => Math.abs(Math.sin(Math.PI * (hertz + offset) * TR + half))),
    );
  },
});

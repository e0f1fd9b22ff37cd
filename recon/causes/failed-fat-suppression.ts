/**
 * Fat suppression that fails where the field is off: I' = W·(1 − s·p(Δf)) + F·(1 − s·p(Δf − δ)), δ = 3.5 ppm, p the response of the
 * suppression pulse, 1 within its half width about the frequency that fat has where the field is right. Where the field is off by more than
 * the half width, fat stays bright; where it is off by as much as fat lies below water, water is suppressed instead.
 *
 * Assumed: what is brightest is fat (`fat-mask.ts`): meant for an image without suppression. The field is a smooth one (`field-map.ts`).
 */
import { defineCause } from '../cause';
import { fatShift } from '../encoding';
import { assumedFat, fatThreshold } from '../fat-mask';
import { smoothField } from '../field-map';
import { quantity } from '../parameter';
import { weighted } from '../weighting';

/** Softness of the edge of the pulse, as a part of its half width. */
const edge = 0.2;

/** Response, 0 to 1, of a pulse of half width `half` at `offset` from its centre. */
export function pulseResponse(offset: number, half: number): number {
  const part = Math.min(1, Math.max(0, (1 + edge - Math.abs(offset) / half) / (2 * edge)));
  return part * part * (3 - 2 * part);
}

export const failedFatSuppression = defineCause({
  id: 'failed-fat-suppression',
  title: 'Failed fat suppression',
  stage: 'object',
  domain: 'image',
  seen: ['shading', 'signal-loss'],
  runsAlong: 'both',
  phantom: 'abdomen',
  formula: String.raw`I' = W \left(1 - s\, p(\Delta f)\right) + F \left(1 - s\, p(\Delta f - \delta)\right)`,
  drivers: [
    { fact: 'Fat suppression by frequency', does: 'is what fails; inversion recovery does not depend on the field' },
    { fact: 'Imaging frequency', does: 'sets how far apart fat and water lie in hertz: little room at low field' },
  ],
  parameters: {
    fieldRange: quantity({ label: 'Spread of the field', unit: 'ppm', min: 0, max: 12, step: 0.1, initial: 6 }),
    offset: quantity({ label: 'Centre frequency off by', unit: 'ppm', min: -5, max: 5, step: 0.1, initial: 0 }),
    halfWidth: quantity({ label: 'Half width of the suppression pulse', unit: 'ppm', min: 0.5, max: 3, step: 0.1, initial: 1.5 }),
    suppression: quantity({ label: 'Suppression', unit: 'of signal', min: 0, max: 1, step: 0.01, initial: 0.95 }),
    fatThreshold,
  },
  identity: { fieldRange: 6, offset: 0, halfWidth: 1.5, suppression: 0, fatThreshold: 0.75 },
  looks: {
    image:
      'Fat is dark in one region and bright in another, with a smooth border that does not follow the anatomy; where the field is far off, water is dark instead. What is brightest is assumed to be fat, and the field is an assumed one.',
    kspace: 'k-space does not show this cause.',
  },
  sources: [
    {
      citation: 'Delfaut EM et al. Fat suppression in MR imaging: techniques and pitfalls. RadioGraphics 19:373',
      year: 1999,
      standing: 'from memory',
    },
    { citation: 'Bernstein MA, King KF, Zhou XJ. Handbook of MRI Pulse Sequences', year: 2004, standing: 'confirmed' },
  ],
  remedies: [
    {
      change: 'Shim over the region and check the centre frequency on the spectrum',
      who: 'technologist',
      price: 'A minute or two',
      moves: { time: 'once' },
    },
    {
      change: 'Inversion recovery instead of a frequency-selective pulse',
      who: 'technologist',
      price:
        'Longer; less SNR, other contrast; SAR rises: check the conditions of an implant; not after contrast agent, which it suppresses too',
      moves: { time: 'rises', snr: 'falls', contrast: 'changes', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Separate fat and water from two or three echoes',
      who: 'technologist',
      price: 'Longer; fat and water may be exchanged in a region; the added echoes raise SNR',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Bring the region to the middle of the magnet; take metal off; pads against the skin where air and skin meet at an angle',
      who: 'technologist',
      price: 'Minutes for a new set-up of the patient',
      moves: { time: 'once' },
    },
    { change: 'Check the shim on a phantom', who: 'licensed service', price: 'Hours of the scanner', moves: { time: 'once' } },
  ],
  apply(object, { fieldRange, offset, halfWidth, suppression, fatThreshold: threshold }, { acquisition, random }) {
    const field = smoothField(object, acquisition, random, fieldRange);
    const fat = assumedFat(object, threshold);
    const difference = fatShift * 1e6;
    const kept = fat.map((part, i) => {
      const ppm = (field[i] as number) + offset;
      // The pulse is centred on fat, δ below water: fat is off its centre by the field alone, water by the field and δ.
      return 1 - suppression * (part * pulseResponse(ppm, halfWidth) + (1 - part) * pulseResponse(ppm + difference, halfWidth));
    });
    return weighted(object, kept);
  },
});

/**
 * Receiver gain set too high: the converter holds the real and the imaginary part of the signal within ±L·max|K|. What is lost is
 * the strongest signal, from about the centre of k-space.
 */
import { defineCause } from '../cause';
import { largestModulus } from '../levels';
import { quantity } from '../parameter';
import { unwrittenArray } from '../spare-arrays';

export const clipping = defineCause({
  id: 'clipping',
  title: 'Clipping',
  stage: 'receive',
  domain: 'kspace',
  seen: ['shading', 'ghosts', 'other'],
  runsAlong: 'none',
  phantom: 'abdomen',
  formula: String.raw`\operatorname{Re} K' = \max(-L\hat K, \min(L\hat K, \operatorname{Re} K)),\ \operatorname{Im}\ \text{alike},\quad \hat K = \max |K|`,
  drivers: [
    { fact: 'Receiver gain', does: 'sets the level; it stands in no standard attribute of the header' },
    { fact: 'Contrast agent and fat', does: 'make the strongest signal stronger than it was when the gain was set' },
  ],
  needsObjectPhase: true,
  parameters: {
    level: quantity({ label: 'Level that the receiver holds', unit: '× max |K|', min: 0.05, max: 1, step: 0.05, initial: 0.2 }),
  },
  identity: { level: 1 },
  strength: { level: [0.6, 0.05] },
  looks: {
    image: 'Washed out, with a pale halo that reaches into the air and weak broad contrast, some of it inverted; edges stay.',
    kspace: 'A flat plateau in the centre: the largest samples are all equal in their real or imaginary part.',
  },
  sources: [
    {
      citation: 'Zhuo J, Gullapalli RP. MR artifacts, safety, and quality control. RadioGraphics 26:275',
      year: 2006,
      equation: 'data clipping',
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Repeat the automatic adjustment with the patient and coil as they are now',
      who: 'technologist',
      price: 'Seconds to a minute',
      moves: { time: 'once' },
    },
    {
      change: 'Lower the receiver gain by hand',
      who: 'technologist',
      price: 'A minute; a little more noise if it is too low',
      moves: { time: 'once', snr: 'falls' },
    },
    {
      change: 'Saturate or suppress fat where it is what is too bright',
      who: 'technologist',
      price: 'Longer; SAR rises: check the conditions of an implant',
      moves: { time: 'rises', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Check the automatic adjustment on a bright phantom',
      who: 'physicist',
      price: 'Half an hour of scanner time',
      moves: { time: 'once' },
    },
    {
      change: 'Check receiver gain stages and converter',
      who: 'licensed service',
      price: 'Hours to days in which the scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { level }) {
    const limit = level * largestModulus(kspace);
    const clip = (values: Float64Array): Float64Array => {
      const clipped = unwrittenArray(values.length);
      for (let i = 0; i < values.length; i++) clipped[i] = Math.max(-limit, Math.min(limit, values[i] as number));
      return clipped;
    };
    return { ...kspace, re: clip(kspace.re), im: clip(kspace.im) };
  },
});

/**
 * The two channels of the receiver differ in gain by g and are off 90° by ψ:
 *   s' = Re s + i·g·(Im s·cos ψ + Re s·sin ψ) = K1·s + K2·s*,   K1 = (1 + g·e^{iψ})/2,   K2 = (1 − g·e^{−iψ})/2.
 * The conjugate of k-space is the image turned by 180° about its centre, conjugated: a ghost of |K2/K1|.
 */
import { defineCause } from '../cause';
import { quantity } from '../parameter';
import { copyOf, unwrittenArray } from '../spare-arrays';
import { fromDegrees } from '../units';

export const quadratureImbalance = defineCause({
  id: 'quadrature-imbalance',
  title: 'Quadrature imbalance',
  stage: 'receive',
  domain: 'kspace',
  seen: ['ghosts'],
  runsAlong: 'both',
  phantom: 'abdomen',
  formula: String.raw`s' = K_1 s + K_2 s^{*},\quad K_1 = \tfrac12(1 + g e^{i\psi}),\quad K_2 = \tfrac12(1 - g e^{-i\psi})`,
  drivers: [{ fact: 'Averages', does: 'with the RF phase stepped through the channels, four of them cancel the imbalance' }],
  needsObjectPhase: true,
  parameters: {
    gain: quantity({ label: 'Gain of one channel over the other', unit: '×', min: 0.8, max: 1.25, step: 0.01, initial: 1.15 }),
    angle: quantity({ label: 'Error of the right angle', unit: '°', min: 0, max: 10, step: 0.5, initial: 3 }),
  },
  identity: { gain: 1, angle: 0 },
  looks: {
    image:
      'A faint copy of the object, turned by 180° about the centre of the image; off-centre objects show it apart from themselves, and a magnitude image without phase hides it in centred ones.',
    kspace:
      'k-space shows no local sign: each sample takes up a little of the conjugate of the one opposite. Only complex data show the difference.',
  },
  sources: [
    {
      citation: 'Henkelman RM, Bronskill MJ. Artifacts in magnetic resonance imaging. Rev Magn Reson Med 2:1',
      year: 1987,
      standing: 'from memory',
    },
  ],
  remedies: [
    {
      change: 'Averages with the RF phase cycled',
      who: 'technologist',
      price: 'Longer in proportion; SNR rises with the square root',
      moves: { time: 'rises', snr: 'rises' },
    },
    {
      change: 'Scan an off-centre phantom, to tell this ghost from others',
      who: 'physicist',
      price: 'Half an hour of scanner time',
      moves: { time: 'once' },
    },
    {
      change: 'Balance or replace the receiver',
      who: 'licensed service',
      price: 'Hours to days in which the scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { gain: g, angle }) {
    const cosine = g * Math.cos(fromDegrees(angle));
    const sine = g * Math.sin(fromDegrees(angle));
    const im = unwrittenArray(kspace.im.length);
    for (let i = 0; i < im.length; i++) im[i] = cosine * (kspace.im[i] as number) + sine * (kspace.re[i] as number);
    return { ...kspace, re: copyOf(kspace.re), im };
  },
});

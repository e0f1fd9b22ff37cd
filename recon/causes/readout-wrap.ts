/**
 * Wrap-around along the readout: the receiver samples 1/(n·Δ) apart and its filter lets frequencies beyond the band through, so that
 * what lies outside the n pixels of the field of view folds in, I'(x) = Σ_m w_m·I(x + x0 + m·n), w_0 = 1 and w_m the part that the
 * filter passes. A digital filter passes nothing; this is a filter that is off, at fault, or of an old receiver.
 */
import { phaseEncodeAxis } from '../acquisition';
import type { Encoded } from '../cause';
import { defineCause } from '../cause';
import { fold } from '../fold';
import { inverseAlong, transformAlong } from '../fourier';
import { fullyTaken } from '../lines';
import { quantity } from '../parameter';

export const readoutWrap = defineCause({
  id: 'readout-wrap',
  title: 'Wrap-around along the readout',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['fold-in'],
  runsAlong: 'readout',
  formula: String.raw`I'(x) = I(x) + w \sum_{m \ne 0} I(x + m\, r N),\quad |x| < r N / 2`,
  drivers: [
    { fact: 'Receiver filter', does: 'sets w: a digital filter of today passes nothing from outside the band' },
    { fact: 'Field of view along the readout', does: 'is the fraction r of the full field of view' },
    { fact: 'Frequency-encode axis', does: 'sets the side from which anatomy folds in' },
  ],
  needsObjectPhase: true,
  changesMatrix: true,
  parameters: {
    fraction: quantity({ label: 'Readout field of view', unit: 'of full', min: 0.4, max: 1, step: 0.01, initial: 0.75 }),
    passed: quantity({ label: 'Passed by the filter', unit: 'of amplitude', min: 0, max: 1, step: 0.01, initial: 1 }),
    offCentre: quantity({ label: 'Off-centre', unit: 'of full', min: -0.25, max: 0.25, step: 0.01, initial: 0 }),
  },
  identity: { fraction: 1, passed: 1, offCentre: 0 },
  strength: { fraction: [0.78, 0.5] },
  looks: {
    image:
      'What reaches out of the field of view along the readout comes in again on the opposite side, as bright as the receiver filter lets it; where the phases of the two differ they subtract.',
    kspace: 'Not visible: there are fewer samples along the readout, further apart, but none is missing and none is marked.',
  },
  sources: [
    {
      citation: 'Pusey E et al. Magnetic resonance imaging artifacts: mechanism and clinical significance. RadioGraphics 6:891',
      year: 1986,
      doi: '10.1148/radiographics.6.5.3685515',
      standing: 'confirmed',
    },
    {
      citation: 'Zhuo J, Gullapalli RP. MR artifacts, safety, and quality control. RadioGraphics 26:275',
      year: 2006,
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Switch the readout filter or readout oversampling on, where the protocol has it off',
      who: 'technologist',
      price: 'No longer; more samples are handled',
      moves: {},
    },
    {
      change: 'Make the field of view along the readout larger than the anatomy',
      who: 'technologist',
      price: 'Coarser pixels, and SNR rises with them; or a larger readout matrix, longer TE and other contrast',
      moves: { snr: 'rises', contrast: 'changes' },
    },
    {
      change: 'Switch off coil elements that only see the outside; arms out of the plane',
      who: 'technologist',
      price: 'A minute at the table; signal falls at the edge of the coil',
      moves: { time: 'once', snr: 'falls' },
    },
    {
      change: 'Test on a phantom larger than the field of view: a fold-in along the readout is a fault of the filter',
      who: 'physicist',
      price: 'Minutes on the scanner',
      moves: { time: 'once' },
    },
    {
      change: 'Check the receiver filter',
      who: 'licensed service',
      price: 'Hours to days in which the scanner is out of use',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { fraction, passed, offCentre }, { acquisition }): Encoded {
    const axis = phaseEncodeAxis(acquisition.phaseEncode) === 0 ? 1 : 0;
    const length = axis === 0 ? kspace.rows : kspace.columns;
    const n = Math.max(1, Math.round(fraction * length));
    const offset = Math.round(offCentre * length);
    return fullyTaken(transformAlong(fold(inverseAlong(kspace, axis), axis, n, offset, passed), axis));
  },
});

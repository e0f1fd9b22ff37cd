/**
 * Wrap-around: the field of view along the phase encoding is smaller than the object, I'(y) = Σ_m I(y + y0 + m·n), n = round(r·N),
 * for the n pixels about the centre y0 of the new window. The sum is complex and comes before any magnitude. The pixel size stays;
 * the lines of k-space lie 1/(n·Δ) apart. It stands before every cause that leaves lines out: it decides which lines there are.
 */
import { phaseEncodeAxis } from '../acquisition';
import type { Encoded } from '../cause';
import { defineCause } from '../cause';
import { fold, phaseFieldOfView } from '../fold';
import { inverseAlong, transformAlong } from '../fourier';
import { fullyTaken } from '../lines';
import { quantity } from '../parameter';

export const fieldOfViewReduction = defineCause({
  id: 'field-of-view-reduction',
  title: 'Wrap-around',
  stage: 'encoding',
  domain: 'kspace',
  seen: ['fold-in'],
  runsAlong: 'phase-encode',
  phantom: 'abdomen',
  formula: String.raw`I'(y) = \sum_m I(y + m\, r N),\quad |y| < r N / 2`,
  drivers: [
    { fact: 'Percent phase field of view', does: 'is the fraction r of the full field of view' },
    { fact: 'Phase-encode axis', does: 'sets the side from which anatomy folds in' },
    { fact: 'Phase oversampling', does: 'moves the fold outside the picture' },
  ],
  needsObjectPhase: true,
  changesMatrix: true,
  parameters: {
    fraction: phaseFieldOfView,
    offCentre: quantity({ label: 'Off-centre', unit: 'of full', min: -0.25, max: 0.25, step: 0.01, initial: 0 }),
  },
  identity: { fraction: 1, offCentre: 0 },
  strength: { fraction: [0.85, 0.5] },
  looks: {
    image:
      'What reaches out of the field of view on one side along the phase encoding comes in again on the opposite side, laid over what is there; where the phases of the two differ they subtract.',
    kspace: 'Not visible: there are fewer lines, further apart, but none is missing and none is marked.',
  },
  sources: [
    {
      citation: 'Zhuo J, Gullapalli RP. MR artifacts, safety, and quality control. RadioGraphics 26:275',
      year: 2006,
      standing: 'confirmed',
    },
    {
      citation: 'Pusey E et al. Magnetic resonance imaging artifacts: mechanism and clinical significance. RadioGraphics 6:891',
      year: 1986,
      doi: '10.1148/radiographics.6.5.3685515',
      standing: 'confirmed',
    },
    { citation: 'Bernstein MA, King KF, Zhou XJ. Handbook of MRI Pulse Sequences', year: 2004, standing: 'confirmed' },
  ],
  remedies: [
    {
      change: 'Make the phase field of view larger than the anatomy',
      who: 'technologist',
      price: 'Longer, or coarser pixels, in proportion; SNR rises with either',
      moves: { time: 'changes', snr: 'rises' },
    },
    {
      change: 'Oversample along the phase encoding',
      who: 'technologist',
      price: 'Longer in proportion, and SNR rises with the square root; or as long as before with fewer averages, and SNR stays',
      moves: { time: 'changes', snr: 'changes' },
    },
    {
      change: 'Swap phase and frequency encoding, so that the short side of the anatomy is phase encoded',
      who: 'technologist',
      price:
        'Motion ghosts and chemical shift turn with it; as long as before, or shorter, as fewer lines are enough for the short side; other gradients work hardest: check nerve stimulation and the conditions of an implant',
      moves: { time: 'changes', nerveStimulation: 'changes', implantConditions: 'changes' },
    },
    {
      change: 'Saturation bands over the anatomy outside the field of view',
      who: 'technologist',
      price: 'More RF and a longer minimum TR: SAR rises, check the conditions of an implant',
      moves: { time: 'rises', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Arms out of the plane; switch off coil elements that only see the outside',
      who: 'technologist',
      price: 'A minute at the table; signal falls at the edge of the coil',
      moves: { time: 'once', snr: 'falls' },
    },
  ],
  apply(kspace, { fraction, offCentre }, { acquisition }): Encoded {
    const axis = phaseEncodeAxis(acquisition.phaseEncode);
    const length = axis === 0 ? kspace.rows : kspace.columns;
    const n = Math.max(1, Math.round(fraction * length));
    const offset = Math.round(offCentre * length);
    return fullyTaken(transformAlong(fold(inverseAlong(kspace, axis), axis, n, offset), axis));
  },
});

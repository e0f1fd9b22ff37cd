/** Demo cases of heads: ghosts, fold-in, corduroy, a half-field ghost. */
import type { Fault } from './pictures';
import { headEpi, headT1, headT2 } from './protocols';
import type { Story } from './story';

/** 0.46 Hz at TR 500 ms puts the first ghost at 0.23 of the field of view. */
const ghosting = (phaseSwing: number): Fault => ({
  steps: [{ cause: 'periodic-motion', parameters: { frequency: 0.46, phaseSwing, start: 40 } }],
});

export const ghostsOnT1: Story = {
  title: 'Ghosts on every T1 head since Monday',
  protocol: headT1,
  ...{ seen: ['ghosts'], direction: 'phase-encode', howOften: 'every-scan', cost: 'repeated', seenDaysAgo: 1 },
  description:
    'Faint copies of the skull above and below the head, at the same distance in every slice. T2 of the same patients looks clean.',
  tried: 'Repeated with firmer padding: no change. Another coil: no change.',
  shown: [
    { role: 'bad', picture: { protocol: headT1, seed: 11, fault: ghosting(0.55) } },
    { role: 'comparison', picture: { protocol: headT1, seed: 12 } },
  ],
  then: [
    { by: 'lead-technologist', assignTo: 'physicist' },
    {
      ...{ by: 'technologist', on: 0 },
      mark: {
        kind: 'arrow',
        points: [
          [236, 48],
          [209, 72],
        ],
        text: 'Edge of the copy',
      },
    },
    { by: 'lead-technologist', note: 'The copies move when TR changes. Nothing moved in the room but the new injector.' },
    {
      ...{ by: 'physicist', on: 1, against: 0, trial: ghosting(0.5) },
      note: 'Distance of the copy fits 0.46 Hz; the swing is a little low',
    },
  ],
};

const phaseFieldOfView = 70;
export const armFoldedIn: Story = {
  title: 'Arm-side band folded onto the head',
  protocol: headT2,
  ...{ seen: ['fold-in'], direction: 'phase-encode', howOften: 'once', cost: 'usable', seenDaysAgo: 0 },
  description: 'A curved band over one side of the head, as if something from the other side had come in.',
  tried: '',
  shown: [
    {
      role: 'bad',
      picture: {
        protocol: { ...headT2, percentPhaseFieldOfView: phaseFieldOfView },
        ...{ seed: 21, withArm: true },
        fault: {
          steps: [{ cause: 'field-of-view-reduction', parameters: { fraction: phaseFieldOfView / 100, offCentre: 0 } }],
          // The object has a phase, as every object has: where folded parts disagree in it, they subtract.
          objectPhase: { range: 1.6, seed: 3 },
        },
      },
    },
  ],
  then: [],
};

const spike = (amplitude: number): Fault => ({
  steps: [{ cause: 'spikes', parameters: { place: 'given', amplitude, kReadout: 38, kPhaseEncode: -52, phase: 60 } }],
  objectPhase: { range: 1.6, seed: 5 },
});

export const corduroy: Story = {
  title: 'Corduroy over one slice of a T2 head',
  protocol: headT2,
  ...{ seen: ['lines'], direction: 'none', howOften: 'on-and-off', cost: 'repeated', seenDaysAgo: 26 },
  description: 'Fine slanting stripes over the whole slice, air included. The slices before and after are clean. Third time this month.',
  tried: 'Repeated the sequence: gone. It came back with the next patient, in another slice.',
  shown: [
    { role: 'bad', picture: { protocol: headT2, seed: 31, fault: spike(90) } },
    { role: 'other-slice', picture: { protocol: headT2, seed: 32 } },
  ],
  then: [
    { by: 'lead-technologist', assignTo: 'physicist' },
    {
      ...{ by: 'physicist', on: 0 },
      mark: {
        ...{ kind: 'ellipse', domain: 'kspace', text: 'One bright dot, away from the centre: a single spike' },
        points: [
          [70, 160],
          [82, 172],
        ],
      },
    },
    {
      ...{ by: 'physicist', on: 1, against: 0, trial: spike(90) },
      note: 'One sample at 38 cycles along the readout, 52 against it: the same stripes',
    },
    { by: 'technologist', note: 'Humidity in Room 1 was 24 % on all three days: the humidifier was out of water.' },
    {
      by: 'lead-technologist',
      note: 'Two screws of the bridge under the table were loose. Tightened; noise scan with the table moving: no spikes in 200 slices.',
    },
    { by: 'lead-technologist', attach: { role: 'verification', picture: { protocol: headT2, seed: 33 } } },
    {
      by: 'physicist',
      finding: {
        ...{ cause: 'spikes', confidence: 'reproduced-and-removed' },
        text: 'Single spikes in k-space, by static discharge in dry air between loose metal parts under the table.',
        lesson: 'Stripes that cross the air as well as the head are a spike. Look at humidity and loose metal before calling service.',
      },
    },
    { by: 'lead-technologist', step: 'ask-for-sign-off' },
    {
      by: 'physicist',
      signed: {
        stands: ['The cause is spikes.', 'The fault was reproduced by a trial.', 'The fix was shown to work.'],
        open: ['Every other cause was excluded.'],
      },
    },
  ],
};

const halfField = (phase: number): Fault => ({
  steps: [{ cause: 'half-field-ghost', parameters: { phase, shift: 0, imbalance: 0, shots: 1 } }],
  objectPhase: { range: 1.2, seed: 4 },
});

export const secondHead: Story = {
  title: 'A second head half a field away on EPI',
  protocol: headEpi,
  ...{ seen: ['ghosts'], direction: 'phase-encode', howOften: 'every-scan', cost: 'abandoned', seenDaysAgo: 6 },
  description:
    'A copy of the head, half of the field of view away and split by the edge, in all volumes of the run. Worse than last month.',
  tried: 'Shimmed again: a little weaker. Repeated with the reference scan of the phase correction: the same.',
  shown: [
    { role: 'bad', picture: { protocol: headEpi, seed: 41, fault: halfField(0.24) } },
    { role: 'comparison', picture: { protocol: headEpi, seed: 42 } },
  ],
  then: [
    { by: 'lead-technologist', assignTo: 'physicist' },
    { ...{ by: 'physicist', on: 1, against: 0, trial: halfField(0.18) }, note: 'Too weak' },
    { ...{ by: 'physicist', on: 1, against: 0, trial: halfField(0.24) }, note: 'A constant phase of 0.24 rad between odd and even lines' },
    {
      by: 'lead-technologist',
      finding: {
        ...{ cause: 'half-field-ghost', confidence: 'reproduced', lesson: '' },
        text: 'Odd and even echoes differ in phase by about 0.24 rad: ghost level 12 %, against 3 % at acceptance.',
      },
    },
    { by: 'lead-technologist', step: 'ask-for-sign-off' },
    { by: 'physicist', returned: 'Measure the ghost level on the phantom first, with readout left to right and right to left.' },
    { by: 'technologist', note: 'Phantom booked for tomorrow, 7:30, before the first patient.' },
  ],
};

/** Demo cases of abdomens: breathing, interference, fat suppression, metal, shading. */
import type { Fault } from './pictures';
import { abdomenProtonDensity, abdomenT1At3, abdomenT1FatSaturated, abdomenT1SpinEcho, abdomenT2, liverT1 } from './protocols';
import type { Story } from './story';

/** Breathing at 0.27 Hz: TR 150 ms puts the ghosts 0.04 of the field of view apart. */
const breathing = (displacement: number): Fault => ({
  steps: [
    {
      cause: 'periodic-motion',
      parameters: { moves: 'along-phase-encode', frequency: 0.27, displacement, start: 20, averaging: 'left-over' },
    },
  ],
});

export const breathingGhosts: Story = {
  title: 'Belly wall repeated through the liver',
  protocol: liverT1,
  ...{ seen: ['ghosts', 'blur'], direction: 'phase-encode', howOften: 'on-and-off', cost: 'repeated', seenDaysAgo: 19 },
  description: 'Bright arcs run in parallel to the front of the belly and cross the liver. The patient says he held his breath.',
  tried: 'Explained the breath-hold again and repeated: better, not gone.',
  shown: [
    { role: 'bad', picture: { protocol: liverT1, seed: 51, fault: breathing(1.6) } },
    { role: 'comparison', picture: { protocol: liverT1, seed: 52 } },
  ],
  then: [
    { by: 'lead-technologist', assignTo: 'physicist' },
    {
      ...{ by: 'technologist', on: 0 },
      mark: {
        ...{ kind: 'arrow', text: 'Copies of the fat of the belly wall' },
        points: [
          [128, 20],
          [128, 44],
        ],
      },
    },
    { ...{ by: 'physicist', on: 1, against: 0, trial: breathing(2.6) }, note: 'The distance fits 0.27 Hz; 2.6 mm is too much' },
    { ...{ by: 'physicist', on: 1, against: 0, trial: breathing(1.6) }, note: '1.6 mm at 0.27 Hz: sixteen shallow breaths a minute' },
    {
      by: 'lead-technologist',
      note: 'The hold lasts 19 s. With fewer slices it is 13 s, in two holds: five patients of five were clean.',
    },
    { by: 'technologist', attach: { role: 'verification', picture: { protocol: liverT1, seed: 53 } } },
    {
      by: 'physicist',
      finding: {
        ...{ cause: 'periodic-motion', confidence: 'reproduced-and-removed' },
        text: 'Shallow breathing, less than 2 mm at 0.27 Hz, during a breath-hold of 19 s that was too long for the patient.',
        lesson:
          'Ask for a trial hold before the scan. Below 15 s: two holds. Not at all: trigger on breathing, or turn the phase encoding.',
      },
    },
    { by: 'physicist', step: 'ask-for-sign-off' },
    {
      by: 'physicist',
      signed: {
        stands: ['The cause is periodic motion.', 'The fault was reproduced by a trial.', 'The fix was shown to work.'],
        open: ['Every other cause was excluded.'],
      },
    },
  ],
};

/** 32 pixels off centre at 300 Hz a pixel. */
const tone = (brightness: number): Fault => ({
  steps: [{ cause: 'rf-interference', parameters: { kind: 'out-of-step', brightness, offset: 9600, drift: 0, bandwidth: 0 } }],
});

export const dottedLine: Story = {
  title: 'Dotted line down every scan in Room 2',
  protocol: abdomenT2,
  ...{ seen: ['lines'], direction: 'phase-encode', howOften: 'every-scan', cost: 'usable', seenDaysAgo: 9 },
  description:
    'A broken bright line from top to bottom, at the same column whatever is scanned. All coils. It is there without a patient, too.',
  tried: 'Door opened and closed again, injector unplugged: no change.',
  shown: [
    { role: 'bad', picture: { protocol: abdomenT2, seed: 61, fault: tone(70) } },
    { role: 'noise-only', picture: { protocol: abdomenT2, seed: 62, isEmpty: true, fault: { steps: tone(70).steps } } },
    { role: 'comparison', picture: { protocol: abdomenT2, seed: 63 } },
  ],
  then: [
    { by: 'lead-technologist', assignTo: 'physicist' },
    { ...{ by: 'physicist', on: 2, against: 0, trial: tone(70) }, note: 'A tone 9.6 kHz off centre, out of step with the sequence' },
    {
      by: 'physicist',
      note: 'With 600 Hz a pixel the line moves to half the distance: it stays at one absolute frequency, so it comes from outside the sequence.',
    },
    { by: 'technologist', note: 'The cleaners changed two lamps inside the room last Thursday. With both out the noise scan is clean.' },
    { by: 'lead-technologist', attach: { role: 'verification', picture: { protocol: abdomenT2, seed: 64 } } },
    {
      by: 'physicist',
      finding: {
        ...{ cause: 'rf-interference', confidence: 'reproduced-and-removed' },
        text: 'The driver of a lamp inside the screened room sends at 123.21 MHz. Without the lamp the line is gone.',
        lesson: 'A line that stays when the patient leaves is in the room. Ask what was changed there before the screen is tested.',
      },
    },
    { by: 'lead-technologist', step: 'ask-for-sign-off' },
  ],
};

const fatLeft = (fieldRange: number, offset: number): Fault => ({
  steps: [{ cause: 'failed-fat-suppression', parameters: { fieldRange, offset } }],
});

export const brightFat: Story = {
  title: 'Fat bright at one flank in spite of fat saturation',
  protocol: abdomenT1FatSaturated,
  ...{ seen: ['other', 'shading'], direction: 'none', howOften: 'on-and-off', cost: 'repeated', seenDaysAgo: 2 },
  description:
    'Fat is dark in the middle and bright towards one side and the back. Worst in broad patients, always after the table was moved.',
  tried: '',
  shown: [
    { role: 'bad', picture: { protocol: abdomenT1FatSaturated, seed: 71, fault: fatLeft(5.5, -0.2) } },
    { role: 'comparison', picture: { protocol: abdomenT1At3, seed: 72 } },
  ],
  then: [{ by: 'lead-technologist', note: 'Please add whether the shim was run again after the table moved.' }],
};

const metal: Fault = {
  steps: [
    {
      cause: 'susceptibility',
      parameters: { shape: 'ball', difference: 900, radius: 3, alongPhaseEncode: 0.02, alongReadout: 0.06, height: 0 },
    },
  ],
};

export const unexpectedVoid: Story = {
  title: 'Safety: unexpected void with a bright rim beside the spine',
  protocol: abdomenT1SpinEcho,
  ...{ seen: ['signal-loss', 'distortion'], direction: 'frequency-encode', howOften: 'once', cost: 'abandoned', seenDaysAgo: 12 },
  description:
    'A black hole with a bright edge in front of the spine on the first sequence. Nothing on the screening form. The scan was stopped and the patient taken out at once.',
  tried: 'Nothing: no further sequence before the patient was screened again.',
  shown: [{ role: 'bad', picture: { protocol: abdomenT1SpinEcho, seed: 81, fault: metal } }],
  then: [
    {
      ...{ by: 'technologist', on: 0 },
      mark: {
        ...{ kind: 'ellipse', text: 'Void, and signal piled up along the readout' },
        points: [
          [126, 118],
          [162, 146],
        ],
      },
    },
    { by: 'lead-technologist', assignTo: 'physicist' },
    {
      by: 'lead-technologist',
      note: 'Screened again with the family: a vessel was closed with coils nine years ago. Card found: MR Conditional, 1.5 T and 3 T, whole-body SAR up to 2 W/kg.',
    },
    {
      by: 'physicist',
      note: 'Conditions kept in Normal Operating Mode. The scan was finished on the word of the radiologist, with wider bandwidth; no condition was altered for the picture.',
    },
    {
      by: 'physicist',
      finding: {
        ...{ cause: 'susceptibility', confidence: 'consistent' },
        text: 'Embolisation coil in front of the spine that the screening form did not name. The void has the size of a metal of some 900 ppm.',
        lesson:
          'An unexpected void is a safety question first: stop, take the patient out, screen again. Only then think about the picture.',
      },
    },
    { by: 'lead-technologist', step: 'ask-for-sign-off' },
    {
      by: 'physicist',
      signed: {
        stands: ['The cause is metal and susceptibility.'],
        open: ['The fault was reproduced by a trial.', 'The fix was shown to work.', 'Every other cause was excluded.'],
      },
    },
  ],
};

const frontOnly: Fault = {
  steps: [{ cause: 'receive-shading', parameters: { sideRatio: 4, steepening: 1.3, centreRatio: 0.9, direction: 270 } }],
};

export const brightInFront: Story = {
  title: 'Abdomen bright in front, grey at the back',
  protocol: abdomenProtonDensity,
  ...{ seen: ['shading', 'noise'], direction: 'none', howOften: 'once', cost: 'usable', seenDaysAgo: 0 },
  description:
    'Signal falls steadily from the front to the back; kidneys and spine are grainy. The other sequences of this patient are the same.',
  tried: 'Coil plugged in again: no change.',
  shown: [{ role: 'bad', picture: { protocol: abdomenProtonDensity, seed: 91, fault: frontOnly } }],
  then: [],
};

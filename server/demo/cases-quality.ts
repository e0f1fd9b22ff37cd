/** Demo cases of quality assurance: a dead element and its return, truncation, echo train decay, gradient non-linearity. */
import type { Fault } from './pictures';
import { discT1, discT1At3, headT1At15, vialsT2 } from './protocols';
import type { Story } from './story';

const silent = (remaining: number, width = 0.3): Fault => ({
  steps: [{ cause: 'dead-coil-element', parameters: { elements: 8, remaining, position: 315, radius: 0.6, width } }],
});

const firstTitle = 'Dark sector in the weekly scan of the disc';

export const darkSector: Story = {
  title: firstTitle,
  protocol: discT1,
  ...{ seen: ['shading', 'signal-loss'], direction: 'none', howOften: 'every-scan', cost: 'usable', seenDaysAgo: 61 },
  description: 'The disc is dark towards the upper right. Uniformity 71 %, limit 87 %. Last week it was 91 %.',
  tried: 'Disc turned by a quarter: the dark sector stays where it is. Coil plugged in again: the same.',
  shown: [
    { role: 'bad', picture: { protocol: discT1, seed: 101, fault: silent(0) } },
    { role: 'comparison', picture: { protocol: discT1, seed: 102 } },
  ],
  then: [
    { by: 'lead-technologist', assignTo: 'physicist' },
    {
      ...{ by: 'physicist', on: 1, against: 0, trial: silent(0) },
      note: 'One element of eight around the ring, silent: at the upper right',
    },
    { by: 'physicist', note: 'Pictures of the single elements: number 7 shows noise only. Coil H16-0521 taken out of service and tagged.' },
    {
      by: 'lead-technologist',
      note: 'Service cleaned the contacts of the plug. Element 7 is back; SNR of all elements within 5 % of acceptance.',
    },
    { by: 'technologist', attach: { role: 'verification', picture: { protocol: discT1, seed: 103 } } },
    {
      by: 'physicist',
      finding: {
        ...{ cause: 'dead-coil-element', confidence: 'reproduced-and-removed' },
        text: 'Element 7 of Head 16 (H16-0521) had no contact at the plug.',
        lesson:
          'A dark sector that stays when the phantom is turned is the coil. Keep the pictures of the single elements with the weekly scan.',
      },
    },
    { by: 'lead-technologist', step: 'ask-for-sign-off' },
    {
      by: 'physicist',
      signed: {
        stands: ['The cause is dead coil element.', 'The fault was reproduced by a trial.', 'The fix was shown to work.'],
        open: ['Every other cause was excluded.'],
      },
    },
  ],
};

export const darkSectorAgain: Story = {
  title: 'Dark sector is back, now on a patient',
  protocol: headT1At15,
  ...{ seen: ['shading'], direction: 'none', howOften: 'every-scan', cost: 'repeated', seenDaysAgo: 3 },
  description:
    'The head is darker at the front left (upper right of the picture), on every sequence with Head 16. The weekly scan was still within its limit.',
  tried: 'Coil plugged in again: better for two sequences, then as before.',
  shown: [
    { role: 'bad', picture: { protocol: headT1At15, seed: 111, fault: silent(0, 0.45) } },
    { role: 'comparison', picture: { protocol: headT1At15, seed: 112 } },
  ],
  then: [
    { by: 'lead-technologist', assignTo: 'physicist' },
    {
      by: 'physicist',
      note: `Same coil (H16-0521) and same side as in ‘${firstTitle}’, two months ago: compare the pictures of the single elements.`,
    },
    { ...{ by: 'physicist', on: 1, against: 0, trial: silent(50, 0.45) }, note: 'Half of its sensitivity: too bright' },
    {
      ...{ by: 'physicist', on: 1, against: 0, trial: silent(0, 0.45) },
      note: 'One element silent, the same as two months ago',
    },
    { by: 'lead-technologist', note: 'Coil out of service until the plug is exchanged. Heads go to Room 2.' },
  ],
};

const halfTheLines = 50;
const cutShort: Fault = { steps: [{ cause: 'truncation', parameters: { fraction: halfTheLines / 100, direction: 'phase-encode' } }] };

export const ringsAlongEdges: Story = {
  title: 'Rings along every edge of the disc',
  protocol: { ...discT1At3, percentSampling: halfTheLines },
  ...{ seen: ['lines', 'blur'], direction: 'phase-encode', howOften: 'every-scan', cost: 'usable', seenDaysAgo: 40 },
  description:
    'Fine lines in parallel to the upper and lower edges, and the level bars of 1.4 mm are no longer told apart. Upright bars are as always.',
  tried: '',
  shown: [
    { role: 'bad', picture: { protocol: { ...discT1At3, percentSampling: halfTheLines }, seed: 121, fault: cutShort } },
    { role: 'comparison', picture: { protocol: discT1At3, seed: 122 } },
  ],
  then: [
    { by: 'lead-technologist', assignTo: 'physicist' },
    { ...{ by: 'physicist', on: 1, against: 0, trial: cutShort }, note: 'Half of the lines along the phase encoding: the same rings' },
    { by: 'technologist', note: 'The protocol was copied from the quick check: 128 lines instead of 256.' },
    {
      by: 'physicist',
      finding: {
        ...{ cause: 'truncation', confidence: 'reproduced' },
        text: 'The protocol acquires 128 of 256 lines. No fault of the scanner; weekly values since the change are not to be compared.',
        lesson: 'Read the acquired matrix, not the size of the picture, before a loss of resolution is reported.',
      },
    },
    { by: 'lead-technologist', step: 'ask-for-sign-off' },
    {
      by: 'physicist',
      signed: {
        stands: ['The cause is truncation.', 'The fault was reproduced by a trial.', 'Every other cause was excluded.'],
        open: ['The fix was shown to work.'],
      },
    },
  ],
};

const longTrain = 32;
export const smearedVials: Story = {
  title: 'Vials of short T2 smeared in the weekly scan',
  protocol: { ...vialsT2, echoTrainLength: longTrain },
  ...{ seen: ['blur'], direction: 'phase-encode', howOften: 'every-scan', cost: 'usable', seenDaysAgo: 1 },
  description: 'Edges of the vials are soft from top to bottom and sharp from left to right. SNR is as always.',
  tried: 'Repeated: the same.',
  shown: [
    {
      role: 'bad',
      picture: {
        ...{ protocol: { ...vialsT2, echoTrainLength: longTrain }, seed: 131 },
        fault: {
          steps: [
            {
              cause: 'echo-train-decay',
              parameters: { echoTrainLength: longTrain, echoSpacing: 10, transverseRelaxation: 90, order: 'centric' },
            },
          ],
        },
      },
    },
    { role: 'comparison', picture: { protocol: vialsT2, seed: 132 } },
  ],
  then: [{ by: 'lead-technologist', note: 'Echo train 32 here, 8 in the comparison. Who changed the protocol?' }],
};

const bent: Fault = { steps: [{ cause: 'gradient-non-linearity', parameters: { displacement: 16 } }] };

export const shortDisc: Story = {
  title: 'Disc measures short, and its bars bend',
  protocol: discT1At3,
  ...{ seen: ['distortion'], direction: 'both', howOften: 'every-scan', cost: 'usable', seenDaysAgo: 15 },
  description: 'Diameter 186 mm up and down, 186 mm across; it should be 190 mm. The middle of the disc is as it should be.',
  tried: 'Disc set up again by the laser: the same.',
  shown: [
    { role: 'bad', picture: { protocol: discT1At3, seed: 141, fault: bent } },
    { role: 'comparison', picture: { protocol: discT1At3, seed: 142 } },
  ],
  then: [
    { by: 'physicist', assignTo: 'physicist' },
    {
      ...{ by: 'physicist', on: 1, against: 0, trial: bent },
      note: 'Pulled in by the third power of the distance: the gradients, not corrected for',
    },
    { by: 'lead-technologist', note: 'The correction of distortion is switched off in the imported protocol.' },
    {
      by: 'physicist',
      finding: {
        ...{ cause: 'gradient-non-linearity', confidence: 'reproduced' },
        text: 'The correction for gradient non-linearity was off. With it the diameter is 190 mm.',
        lesson: 'After an import of protocols compare the corrections, too, not only times and matrix.',
      },
    },
    { by: 'physicist', step: 'ask-for-sign-off' },
  ],
};

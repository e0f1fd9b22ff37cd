/**
 * Rigid motion: the object is somewhere else while some of the lines are taken, p(n) = (shift along phase encoding, along readout,
 * rotation). Sudden: from one place to another at one moment. Random walk: normal steps that add up to the given standard deviation by
 * the end. Drift: evenly from the start place to the given one; along the phase encoding that is half the way and a quadratic phase, a blur.
 *
 * Assumed: nothing moves within a shot, and shots follow one another at equal times (`line-timing.ts`). What is not in the plane before,
 * because the object turns or moves through the slice, is not modelled.
 */
import { defineCause } from '../cause';
import { shotsOf } from '../line-timing';
import { linesOf } from '../lines';
import { choice, quantity } from '../parameter';
import type { Pose } from '../pose';
import { withPoses } from '../pose';
import type { Random } from '../random';
import { fromMillimetres } from '../units';

type Course = 'sudden' | 'random-walk' | 'drift';

/** How far along its way, 0 to 1, a motion of one degree of freedom is at each shot; a random walk may leave that range. */
function way(course: Course, nShots: number, onset: number, random: Random): Float64Array {
  const part = new Float64Array(nShots);
  let walked = 0;
  for (let shot = 0; shot < nShots; shot++) {
    if (course === 'sudden') part[shot] = shot >= Math.round(onset * nShots) ? 1 : 0;
    else if (course === 'drift') part[shot] = nShots === 1 ? 0 : shot / (nShots - 1);
    else {
      part[shot] = walked;
      walked += random.normal() / Math.sqrt(nShots);
    }
  }
  return part;
}

export const rigidMotion = defineCause({
  id: 'rigid-motion',
  title: 'Rigid motion',
  stage: 'object',
  domain: 'kspace',
  seen: ['blur', 'ghosts'],
  runsAlong: 'phase-encode',
  formula: String.raw`K'(\mathbf{k}, n) = K\!\left(R_{\alpha(n)}^{-1}\mathbf{k}\right) e^{-i 2\pi\, \mathbf{k} \cdot \mathbf{d}(n)}`,
  drivers: [
    { fact: 'TR, lines and averages', does: 'set how long the scan takes, and so how likely and how large a movement is' },
    { fact: 'Echo train length', does: 'sets how many lines stand still together; a shot is assumed to freeze the motion' },
    { fact: 'Phase-encode axis', does: 'sets the direction of haze and ringing, whatever way the object moves' },
  ],
  parameters: {
    course: choice<Course>({
      label: 'Course',
      options: [
        { value: 'sudden', label: 'Sudden: from one place to another' },
        { value: 'random-walk', label: 'Random walk: size is its SD at the end' },
        { value: 'drift', label: 'Drift: size is the whole way' },
      ],
      initial: 'sudden',
    }),
    alongPhaseEncode: quantity({ label: 'Along phase encoding', unit: 'mm', min: 0, max: 20, step: 0.1, initial: 3 }),
    alongReadout: quantity({ label: 'Along readout', unit: 'mm', min: 0, max: 20, step: 0.1, initial: 0 }),
    rotation: quantity({ label: 'Rotation', unit: '°', min: 0, max: 10, step: 0.1, initial: 2 }),
    onset: quantity({ label: 'Moment', unit: 'of scan', min: 0, max: 1, step: 0.01, initial: 0.4, when: { course: ['sudden'] } }),
    linesPerShot: quantity({
      label: 'Lines in a shot',
      unit: 'lines',
      min: 1,
      max: 512,
      step: 1,
      initial: 1,
      fromHeader: { fact: 'Echo train length', read: ({ echoTrainLength }) => echoTrainLength },
    }),
  },
  identity: { course: 'sudden', alongPhaseEncode: 0, alongReadout: 0, rotation: 0, onset: 0.4, linesPerShot: 1 },
  looks: {
    image:
      'Blur, and a haze of ghosts without order along the phase encoding; after a sudden movement near the middle of the scan double contours, near its end fine ringing along edges.',
    kspace:
      'The phase jumps or wanders from line to line; a shift leaves the magnitude as it was, a rotation breaks its pattern. The k-space of the magnitude image does not show the jump.',
  },
  sources: [
    {
      citation:
        'Zaitsev M, Maclaren J, Herbst M. Motion artifacts in MRI: a complex problem with many partial solutions. J Magn Reson Imaging 42:887',
      year: 2015,
      doi: '10.1002/jmri.24850',
      standing: 'confirmed',
    },
    {
      citation:
        'Atkinson D et al. Automatic correction of motion artifacts in magnetic resonance images using an entropy focus criterion. IEEE Trans Med Imaging 16:903',
      year: 1997,
      doi: '10.1109/42.650886',
      standing: 'confirmed',
    },
  ],
  remedies: [
    {
      change: 'Make the patient comfortable, explain, pad and fix the head or limb, and repeat',
      who: 'technologist',
      price: 'A few minutes at the table and the time of one scan',
      moves: { time: 'once' },
    },
    {
      change: 'Shorten the scan: fewer averages, acceleration, longer echo trains',
      who: 'technologist',
      price: 'A shorter scan with less SNR; longer trains blur more, change contrast and raise SAR: check the conditions of an implant',
      moves: { time: 'falls', snr: 'falls', contrast: 'changes', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'A radial scan, or one of turning strips that each hold the centre of k-space',
      who: 'technologist',
      price:
        'Longer for the same resolution; motion then shows as streaks or mild blur; contrast changes; more refocusing pulses raise SAR: check the conditions of an implant',
      moves: { time: 'rises', contrast: 'changes', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Single-shot acquisition, one slice in one train',
      who: 'technologist',
      price:
        'A scan of seconds; less SNR, resolution and contrast, blur from decay along the train; SAR rises: check the conditions of an implant',
      moves: { time: 'falls', snr: 'falls', contrast: 'changes', sar: 'rises', implantConditions: 'changes' },
    },
    {
      change: 'Navigators or a camera that steer the scan after the patient, where the scanner has them',
      who: 'physicist',
      price: 'The scan is somewhat longer; to be set up and tested for each protocol',
      moves: { time: 'rises' },
    },
    {
      change: 'Sedation under the rule of the site',
      who: 'technologist',
      price: 'Its risks, and the time of waiting and waking; needs the physician in charge and monitoring',
      moves: { time: 'once' },
    },
  ],
  apply(kspace, { course, onset, linesPerShot, ...size }, { acquisition, random }) {
    const lines = linesOf(kspace, acquisition);
    const nShots = shotsOf(lines.nLines, linesPerShot);
    const alongPhaseEncode = way(course, nShots, onset, random);
    const alongReadout = way(course, nShots, onset, random);
    const rotation = way(course, nShots, onset, random);
    const poses = Array.from({ length: lines.nLines }, (_, line): Pose => {
      const shot = line % nShots;
      return {
        alongPhaseEncode: fromMillimetres(size.alongPhaseEncode) * (alongPhaseEncode[shot] as number),
        alongReadout: fromMillimetres(size.alongReadout) * (alongReadout[shot] as number),
        rotation: (size.rotation * Math.PI * (rotation[shot] as number)) / 180,
      };
    });
    return withPoses(kspace, lines, poses);
  },
});

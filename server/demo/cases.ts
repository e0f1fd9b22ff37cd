/** The two demo cases: one under investigation with a trial and a mark, one just reported. */
import type { Acquisition } from '../../recon/acquisition';
import { fromMegahertz, fromMilliseconds } from '../../recon/units';
import type { Role } from '../contract/route';
import type { Dependencies } from '../dependencies';
import type { Attributes } from '../dicom/write';
import { comment, markImage } from '../services/case-notes';
import { fileCase } from '../services/change-case';
import { moveCase } from '../services/move-case';
import type { Caller } from '../services/sessions';
import { keepTrial } from '../services/trials';
import { storeImages } from '../services/upload-images';
import { demoPicture } from './pictures';

type As = (role: Role) => Caller;
interface Place {
  readonly scannerId: string | undefined;
  readonly coilId: string | undefined;
}

const axial: Attributes = {
  imageOrientation: [1, 0, 0, 0, 1, 0],
  imagePosition: [-120, -120, 12.5],
  patientPosition: 'HFS',
  acquisitionType: '2D',
  bodyPart: 'HEAD',
  manufacturer: 'Saltmarsh Imaging',
};

const t1Header: Attributes = {
  ...axial,
  model: 'Tern',
  fieldStrength: 3,
  imagingFrequency: 123.2,
  receiveCoil: 'Head 20',
  scanningSequence: 'SE',
  repetitionTime: 500,
  echoTime: 12,
  flipAngle: 90,
  averages: 1,
  echoTrainLength: 1,
  pixelBandwidth: 220,
  sliceThickness: 4,
};
const t1: Acquisition = {
  phaseEncode: 'column',
  repetitionTime: fromMilliseconds(500),
  averages: 1,
  imagingFrequency: fromMegahertz(123.2),
};

/** 0.46 Hz at TR 500 ms puts the first ghost at 0.23 of the field of view. */
const motion = { frequency: 0.46, phaseSwing: 0.55, start: 40 };
const trialSeed = 7;

export async function fileGhostCase(deps: Dependencies, as: As, place: Place): Promise<void> {
  const technologist = as('technologist');
  const fault = { steps: [{ cause: 'periodic-motion', parameters: motion }] };
  const [bad, comparison] = await storeImages(deps, technologist, [
    demoPicture({ seed: 11, acquisition: t1, header: t1Header, fault }),
    demoPicture({ seed: 12, acquisition: t1, header: t1Header }),
  ]);
  if (bad === undefined || comparison === undefined) throw new Error('the pictures of the demo case were not stored');

  const filed = await fileCase(deps.db, technologist, {
    ...place,
    title: 'Ghosts on every T1 head since Monday',
    seen: ['ghosts'],
    direction: 'phase-encode',
    howOften: 'every-scan',
    cost: 'repeated',
    bodyRegion: 'Head',
    protocol: 'T1 axial, spin echo',
    description:
      'Faint copies of the skull above and below the head, at the same distance in every slice. T2 of the same patients looks clean.',
    tried: 'Repeated with firmer padding: no change. Another coil: no change.',
    seenOn: lastMonday(new Date()),
    images: [
      { imageId: bad.id, role: 'bad' },
      { imageId: comparison.id, role: 'comparison' },
    ],
  });
  await moveCase(deps.db, as('lead-technologist'), filed.id, { action: 'assign', memberId: as('physicist').memberId });
  await markImage(deps.db, technologist, filed.id, {
    ...{ imageId: bad.id, frame: 0, domain: 'image' as const, kind: 'arrow' as const },
    points: [
      [226, 216],
      [203, 190],
    ],
    text: 'Edge of the copy',
  });
  await comment(deps.db, as('lead-technologist'), filed.id, {
    text: 'The copies move when TR changes. Nothing moved in the room but the new injector.',
  });
  const wish = {
    ...{ caseId: filed.id, imageId: comparison.id, frame: 0, compareWith: { imageId: bad.id, frame: 0 } },
    note: 'Distance of the copy fits 0.46 Hz; the swing is a little low',
    recipe: {
      steps: [{ cause: 'periodic-motion', parameters: { ...motion, phaseSwing: 0.5 } }],
      reconstruction: { method: 'zero-filled', parameters: {} },
      seed: trialSeed,
    },
  };
  await keepTrial(deps, as('physicist'), wish, new AbortController().signal);
}

const t2Header: Attributes = {
  ...axial,
  model: 'Heron',
  fieldStrength: 1.5,
  imagingFrequency: 63.86,
  receiveCoil: 'Head 16',
  scanningSequence: 'SE',
  sequenceVariant: 'SK',
  repetitionTime: 3800,
  echoTime: 96,
  flipAngle: 150,
  averages: 2,
  echoTrainLength: 15,
  pixelBandwidth: 190,
  percentPhaseFieldOfView: 70,
  sliceThickness: 5,
};
const t2: Acquisition = { phaseEncode: 'row', repetitionTime: fromMilliseconds(3800), averages: 2 };

export async function fileFoldInCase(deps: Dependencies, as: As, place: Place): Promise<void> {
  const technologist = as('technologist');
  const fault = {
    steps: [{ cause: 'field-of-view-reduction', parameters: { fraction: 0.7, offCentre: 0 } }],
    // The object has a phase, as every object has: where folded parts disagree in it, they subtract.
    objectPhase: { range: 1.6, seed: 3 },
  };
  const [bad] = await storeImages(deps, technologist, [demoPicture({ seed: 21, withArm: true, acquisition: t2, header: t2Header, fault })]);
  if (bad === undefined) throw new Error('the picture of the demo case was not stored');
  await fileCase(deps.db, technologist, {
    ...place,
    title: 'Arm-side band folded onto the head',
    seen: ['fold-in'],
    direction: 'phase-encode',
    howOften: 'once',
    cost: 'usable',
    bodyRegion: 'Head',
    protocol: 'T2 axial, fast spin echo',
    description: 'A bright curved band over one side of the head, as if something from the other side had come in.',
    tried: '',
    seenOn: null,
    images: [{ imageId: bad.id, role: 'bad' }],
  });
}

/** The date of the Monday on or before `day`, in UTC. */
function lastMonday(day: Date): string {
  const monday = new Date(day);
  monday.setUTCDate(day.getUTCDate() - ((day.getUTCDay() + 6) % 7));
  return monday.toISOString().slice(0, 10);
}

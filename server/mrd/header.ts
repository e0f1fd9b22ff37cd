/**
 * What is taken of the XML header of a raw data file. The list is the rule: subjectInformation, studyInformation, dates, institutions and
 * identifiers are not on it, so that nothing of them is ever looked at; of those that are there only the names are counted as removed.
 * Format: ISMRMRD, the ISMRM raw data format (Inati et al., Magn Reson Med 2017;77:411), its schema ismrmrd.xsd.
 */
import { isHarmless } from '../dicom/facts/names';
import { broken, MrdFault } from './fault';
import { readElements, type Elements } from './xml';

/** Size along readout, phase encoding and partition. */
interface Space {
  readonly matrix: readonly [number, number, number];
  readonly fieldOfViewMm: readonly [number, number, number];
}

export interface MrdHeader {
  readonly encoded: Space;
  readonly reconstructed: Space;
  /** The line of zero phase encoding. */
  readonly centreLine: number;
  readonly accelerationFactor: number | undefined;
  readonly repetitionTimesMs: readonly number[];
  readonly echoTimesMs: readonly number[];
  readonly inversionTimesMs: readonly number[];
  readonly flipAnglesDegrees: readonly number[];
  readonly fieldStrengthTesla: number | undefined;
  readonly imagingFrequencyMHz: number | undefined;
  readonly manufacturer: string | undefined;
  readonly model: string | undefined;
  /** Names of coil elements, by number, as far as they may be kept. */
  readonly coilNames: ReadonlyMap<number, string>;
  /** DICOM tags of what the header also holds, and was left behind. */
  readonly removed: readonly string[];
}

const axes = ['x', 'y', 'z'] as const;
const spaces = ['encodedSpace', 'reconSpace'].flatMap((space) =>
  ['matrixSize', 'fieldOfView_mm'].flatMap((size) => axes.map((axis) => `encoding/${space}/${size}/${axis}`)),
);
const allowed = new Set([
  ...spaces,
  'encoding/trajectory',
  'encoding/encodingLimits/kspace_encoding_step_1/center',
  'encoding/parallelImaging/accelerationFactor/kspace_encoding_step_1',
  'sequenceParameters/TR',
  'sequenceParameters/TE',
  'sequenceParameters/TI',
  'sequenceParameters/flipAngle_deg',
  'experimentalConditions/H1resonanceFrequency_Hz',
  'acquisitionSystemInformation/systemFieldStrength_T',
  'acquisitionSystemInformation/systemVendor',
  'acquisitionSystemInformation/systemModel',
  'acquisitionSystemInformation/coilLabel/coilNumber',
  'acquisitionSystemInformation/coilLabel/coilName',
]);

/** Elements that may lead to a person, with the DICOM attribute of the same meaning: seen, never read. */
const leftBehind: Readonly<Record<string, string>> = {
  'subjectInformation/patientName': '0010,0010',
  'subjectInformation/patientID': '0010,0020',
  'subjectInformation/patientBirthdate': '0010,0030',
  'subjectInformation/patientGender': '0010,0040',
  'subjectInformation/patientHeight_m': '0010,1020',
  'subjectInformation/patientWeight_kg': '0010,1030',
  'studyInformation/studyDate': '0008,0020',
  'studyInformation/studyTime': '0008,0030',
  'studyInformation/accessionNumber': '0008,0050',
  'studyInformation/referringPhysicianName': '0008,0090',
  'studyInformation/studyDescription': '0008,1030',
  'studyInformation/studyInstanceUID': '0020,000D',
  'studyInformation/studyID': '0020,0010',
  'measurementInformation/seriesDate': '0008,0021',
  'measurementInformation/seriesTime': '0008,0031',
  'measurementInformation/seriesDescription': '0008,103E',
  'measurementInformation/protocolName': '0018,1030',
  'measurementInformation/seriesInstanceUIDRoot': '0020,000E',
  'measurementInformation/frameOfReferenceUID': '0020,0052',
  'acquisitionSystemInformation/institutionName': '0008,0080',
  'acquisitionSystemInformation/stationName': '0008,1010',
  'acquisitionSystemInformation/deviceSerialNumber': '0018,1000',
};

export function readHeader(xml: string): MrdHeader {
  const removed = new Set<string>();
  const isAsked = (path: string): boolean => {
    const tag = leftBehind[path];
    if (tag !== undefined) removed.add(tag);
    return allowed.has(path);
  };
  const elements = readElements(xml, isAsked, ['encoding']);
  requireCartesian(textAt(elements, 'encoding/trajectory'));
  const encoded = spaceOf(elements, 'encodedSpace');
  const centre = numbersAt(elements, 'encoding/encodingLimits/kspace_encoding_step_1/center')[0];
  const frequency = numbersAt(elements, 'experimentalConditions/H1resonanceFrequency_Hz')[0];
  const system = 'acquisitionSystemInformation';
  return {
    ...{ encoded, reconstructed: spaceOf(elements, 'reconSpace') },
    centreLine: centre ?? Math.floor(encoded.matrix[1] / 2),
    accelerationFactor: numbersAt(elements, 'encoding/parallelImaging/accelerationFactor/kspace_encoding_step_1')[0],
    repetitionTimesMs: numbersAt(elements, 'sequenceParameters/TR'),
    echoTimesMs: numbersAt(elements, 'sequenceParameters/TE'),
    inversionTimesMs: numbersAt(elements, 'sequenceParameters/TI'),
    flipAnglesDegrees: numbersAt(elements, 'sequenceParameters/flipAngle_deg'),
    fieldStrengthTesla: numbersAt(elements, `${system}/systemFieldStrength_T`)[0],
    imagingFrequencyMHz: frequency === undefined ? undefined : frequency / 1e6,
    manufacturer: harmless(textAt(elements, `${system}/systemVendor`)),
    model: harmless(textAt(elements, `${system}/systemModel`)),
    coilNames: coilNamesOf(elements),
    removed: [...removed].sort(),
  };
}

const textAt = (elements: Elements, path: string): string | undefined => elements.get(path)?.[0];
const numbersAt = (elements: Elements, path: string): readonly number[] =>
  (elements.get(path) ?? [])
    .filter((text) => text !== '')
    .map(Number)
    .filter((value) => Number.isFinite(value) && value >= 0);
const harmless = (text: string | undefined): string | undefined =>
  text !== undefined && text !== '' && isHarmless(text) ? text : undefined;

function requireCartesian(trajectory: string | undefined): void {
  if (trajectory === undefined) throw broken('its header does not say how k-space was covered');
  if (trajectory.toLowerCase() === 'cartesian') return;
  const known = ['epi', 'radial', 'goldenangle', 'spiral', 'other'].find((name) => name === trajectory.toLowerCase());
  throw new MrdFault(
    'not-cartesian',
    `The raw data are not on a Cartesian grid${known ? ` (trajectory: ${known})` : ''}: samples between the lines of the grid are not read here.`,
  );
}

function spaceOf(elements: Elements, space: 'encodedSpace' | 'reconSpace'): Space {
  const threeOf = (size: string, fits: (value: number) => boolean): [number, number, number] => {
    const [x, y, z] = axes.map((axis) => numbersAt(elements, `encoding/${space}/${size}/${axis}`)[0]);
    if (x === undefined || y === undefined || z === undefined || ![x, y, z].every(fits)) {
      throw broken('its header gives no usable matrix and field of view');
    }
    return [x, y, z];
  };
  return {
    matrix: threeOf('matrixSize', (value) => Number.isInteger(value) && value >= 1 && value <= 65_535),
    fieldOfViewMm: threeOf('fieldOfView_mm', (value) => value > 0 && value < 1e5),
  };
}

/** The name of a coil element is a code with a number in it; a plain word could be anybody. */
const coilCode = /^(?=.*\d)[A-Za-z0-9:_ -]{1,16}$/;

function coilNamesOf(elements: Elements): ReadonlyMap<number, string> {
  const numbers = elements.get('acquisitionSystemInformation/coilLabel/coilNumber') ?? [];
  const names = elements.get('acquisitionSystemInformation/coilLabel/coilName') ?? [];
  if (numbers.length !== names.length) return new Map();
  const pairs = numbers.map((number, i) => [Number(number), names[i] ?? ''] as const);
  return new Map(pairs.filter(([, name]) => coilCode.test(name) && isHarmless(name)));
}

/**
 * Pictures of the demo cases: a phantom scanned by a protocol, noise added in k-space, put through our own models where one is to be bad,
 * and written as DICOM with an invented header. They are read through the same door as every upload, and the fault is modelled with
 * the acquisition that the door reads from that header: what the bench starts from is what the picture was made with.
 */
import { randomBytes, randomUUID } from 'node:crypto';
import type { Acquisition } from '../../recon/acquisition';
import { complexZeros, magnitude, type ComplexPlane, type Plane } from '../../recon/grid';
import { oval } from '../../recon/phantoms/outline';
import { phantomGrid, phantomImage, replaces, type MaterialShape, type Phantom } from '../../recon/phantoms/phantom';
import { tissues } from '../../recon/phantoms/tissues';
import { randomOf } from '../../recon/random';
import type { Recipe } from '../../recon/recipe';
import { simulate } from '../../recon/simulate';
import { acquisitionOf } from '../dicom/acquisition';
import { readDicom, type AcceptedImage } from '../dicom/read';
import { uidOf, writeDicom, type Attributes } from '../dicom/write';
import { headerOf, scanOf, type Protocol } from './protocols';

/** Noise of each channel over the brightest tissue: a clean scan (common practice: signal to noise of 40 to 100). */
const noise = 0.012;
/** Stored value of the brightest tissue. */
const fullScale = 1400;
/** Of what is random in a fault, and in the trial that reproduces it. */
export const faultSeed = 7;

const { fat, muscle, bone } = tissues;
/** An arm beside the head, outside what a reduced phase field of view covers. */
const arm: readonly MaterialShape[] = [
  { outline: oval([21, 30], [-98.5, 36]), adds: [[fat, 1]] },
  { outline: oval([18, 26.5], [-98.5, 36]), adds: replaces(muscle, fat) },
  { outline: oval([6, 7], [-97.5, 37]), adds: replaces(bone, muscle) },
];

export type Fault = Pick<Recipe, 'steps' | 'objectPhase'>;

export interface DemoPicture {
  readonly protocol: Protocol;
  /** Of its noise. */
  readonly seed: number;
  readonly withArm?: boolean;
  /** Nothing lies in the scanner. */
  readonly isEmpty?: boolean;
  /** What goes wrong; left out, the picture is clean. */
  readonly fault?: Fault;
}

/** The picture, as it comes through the door. */
export function demoPicture(picture: DemoPicture): AcceptedImage {
  const { protocol, seed, fault } = picture;
  const object = withNoise(objectOf(picture), seed);
  const clean = throughTheDoor(magnitude(object), protocol);
  if (fault === undefined) return clean;
  const recipe: Recipe = { ...fault, reconstruction: { method: 'zero-filled', parameters: {} }, seed: faultSeed };
  return throughTheDoor(simulate(object, recipe, readAcquisition(clean)).image, protocol);
}

function readAcquisition({ facts }: AcceptedImage): Acquisition {
  const { phaseEncode, ...rest } = acquisitionOf(facts);
  if (phaseEncode === undefined) throw new Error('the header of a demo picture does not say its phase-encode axis');
  return { ...rest, phaseEncode };
}

/** Scanned phantoms: several pictures are of the same scan. */
const scanned = new Map<string, ComplexPlane>();

/** What the scanner sees without noise, the brightest at 1. */
function objectOf({ protocol, withArm = false, isEmpty = false }: DemoPicture): ComplexPlane {
  const { phantom, matrix } = protocol;
  if (isEmpty) return complexZeros(phantomGrid(phantom, matrix));
  const scan = scanOf(protocol);
  const key = JSON.stringify([phantom.id, matrix, withArm, scan]);
  const known = scanned.get(key);
  if (known) return known;
  const withAll: Phantom = withArm ? { ...phantom, shapes: [...phantom.shapes, ...arm] } : phantom;
  const plane = phantomImage(withAll, phantomGrid(phantom, matrix), scan);
  const brightest = magnitude(plane).values.reduce((most, value) => Math.max(most, value), 0);
  const scaled = { ...plane, re: plane.re.map((value) => value / brightest), im: plane.im.map((value) => value / brightest) };
  scanned.set(key, scaled);
  return scaled;
}

/** Lets the scans go once the pictures are made. */
export const forgetScans = (): void => scanned.clear();

/** Complex white noise: of independent samples it is the same in the image as in k-space. */
function withNoise(object: ComplexPlane, seed: number): ComplexPlane {
  const random = randomOf(seed, 'noise of the demo picture');
  const noisy = (values: Float64Array) => values.map((value) => value + noise * random.normal());
  return { ...object, re: noisy(object.re), im: noisy(object.im) };
}

function throughTheDoor(plane: Plane, protocol: Protocol): AcceptedImage {
  const read = readDicom(asFile(plane, { ...headerOf(protocol), ...phaseEncodeHeader(protocol, plane) }), randomBytes(32));
  if ('refused' in read) throw new Error(`a demo picture was refused: ${read.refused.reason}`);
  const [accepted] = read.accepted;
  if (accepted === undefined) throw new Error('a demo picture holds no image');
  return accepted;
}

function asFile({ rows, columns, spacing, values }: Plane, header: Attributes): Uint8Array {
  const pixels = Uint16Array.from(values, (value) => Math.min(65535, Math.round(value * fullScale)));
  const uids = { study: uidOf(randomUUID()), series: uidOf(randomUUID()), image: uidOf(randomUUID()) };
  const pixelSpacing = spacing.map((metres) => Number((metres * 1000).toPrecision(6)));
  return writeDicom({ rows, columns, pixels, uids, attributes: { ...header, pixelSpacing } });
}

/** Acquisition Matrix is frequency rows, frequency columns, phase rows, phase columns; two of them are zero (DICOM PS3.3 C.8.3.1). */
function phaseEncodeHeader({ phaseEncode, percentSampling = 100 }: Protocol, { rows, columns }: Plane): Attributes {
  const acquired = (lines: number): number => Math.round((lines * percentSampling) / 100);
  return {
    phaseEncodingDirection: phaseEncode === 'column' ? 'COL' : 'ROW',
    acquisitionMatrix: phaseEncode === 'column' ? [columns, 0, 0, acquired(rows)] : [0, rows, acquired(columns), 0],
  };
}

/**
 * Pictures of the demo cases: the analytic head, noise added in k-space, put through our own models where one is to be bad, and
 * written as DICOM with an invented header. They are then read through the same door as every upload.
 */
import { randomBytes, randomUUID } from 'node:crypto';
import type { Acquisition, PhaseEncode } from '../../recon/acquisition';
import { asComplex, type ComplexPlane, type Plane } from '../../recon/grid';
import type { Ellipse } from '../../recon/phantoms/ellipse';
import { headGrid, headShapes } from '../../recon/phantoms/head';
import { shapeImage } from '../../recon/phantoms/shape';
import { randomOf } from '../../recon/random';
import type { Recipe } from '../../recon/recipe';
import { simulate } from '../../recon/simulate';
import { readDicom, type AcceptedImage } from '../dicom/read';
import { uidOf, writeDicom, type Attributes } from '../dicom/write';

const matrix = 256;
/** Noise of each channel over the brightest tissue: a clean head scan (common practice: signal to noise of 40 to 100). */
const noise = 0.012;
/** Stored value of density 1. */
const fullScale = 1400;

/** An arm beside the head, outside what the phase field of view covers: muscle, fat under the skin, bone. */
const arm: readonly Ellipse[] = [
  { density: 0.95, a: 0.021, b: 0.03, x: -0.0985, y: 0.036, angle: 0 },
  { density: -0.5, a: 0.018, b: 0.0265, x: -0.0985, y: 0.036, angle: 0 },
  { density: -0.35, a: 0.006, b: 0.007, x: -0.0975, y: 0.037, angle: 0 },
];

export interface DemoPicture {
  readonly seed: number;
  readonly withArm?: boolean;
  /** What goes wrong; left out, the picture is clean. */
  readonly fault?: Pick<Recipe, 'steps' | 'objectPhase'>;
  readonly acquisition: Acquisition;
  readonly header: Attributes;
}

/** The picture, as it comes through the door. */
export function demoPicture({ seed, withArm = false, fault, acquisition, header }: DemoPicture): AcceptedImage {
  const shapes = withArm ? [...headShapes, ...arm] : headShapes;
  const object = withNoise(asComplex(shapeImage(shapes, headGrid(matrix))), seed);
  const recipe: Recipe = { steps: [], ...fault, reconstruction: { method: 'zero-filled', parameters: {} }, seed };
  const { image } = simulate(object, recipe, acquisition);
  const file = asFile(image, { ...header, ...phaseEncodeHeader(acquisition.phaseEncode, image) });
  const read = readDicom(file, randomBytes(32));
  if ('refused' in read) throw new Error(`a demo picture was refused: ${read.refused.reason}`);
  const [accepted] = read.accepted;
  if (accepted === undefined) throw new Error('a demo picture holds no image');
  return accepted;
}

/** Complex white noise: of independent samples it is the same in the image as in k-space. */
function withNoise(object: ComplexPlane, seed: number): ComplexPlane {
  const random = randomOf(seed, 'noise of the demo picture');
  const noisy = (values: Float64Array) => values.map((value) => value + noise * random.normal());
  return { ...object, re: noisy(object.re), im: noisy(object.im) };
}

function asFile({ rows, columns, spacing, values }: Plane, header: Attributes): Uint8Array {
  const pixels = Uint16Array.from(values, (value) => Math.round(value * fullScale));
  const uids = { study: uidOf(randomUUID()), series: uidOf(randomUUID()), image: uidOf(randomUUID()) };
  const pixelSpacing = spacing.map((metres) => Number((metres * 1000).toPrecision(6)));
  return writeDicom({ rows, columns, pixels, uids, attributes: { ...header, pixelSpacing } });
}

/** Acquisition Matrix is frequency rows, frequency columns, phase rows, phase columns; two of them are zero (DICOM PS3.3 C.8.3.1). */
const phaseEncodeHeader = (phaseEncode: PhaseEncode, { rows, columns }: Plane): Attributes => ({
  phaseEncodingDirection: phaseEncode === 'column' ? 'COL' : 'ROW',
  acquisitionMatrix: phaseEncode === 'column' ? [columns, 0, 0, rows] : [0, rows, columns, 0],
});

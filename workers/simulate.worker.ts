/** Runs transforms, recipes and small pictures on a worker thread. Parses the message, calls recon, hands the bytes back. */
import { performance } from 'node:perf_hooks';
import { complexOf, magnitudeOf } from '../recon/complex-image';
import { transform, transformOfReal } from '../recon/fourier';
import { prepare, simulate, type PreparedObject, type Simulation } from '../recon/simulate';
import type { Recipe } from '../recon/recipe';
import { rangeOf } from '../server/dicom/value-range';
import { compareNumbers, type Reference } from './compare-numbers';
import { encodePlanes, kspaceWindow, logMagnitude, type NamedPlane } from './encode-planes';
import { digestOf, exportedFile } from './exported-file';
import { handBack } from './hand-back';
import { measure } from './measure';
import type {
  ExportJob,
  ExportResult,
  ImageSource,
  MeasureJob,
  MeasureResult,
  PairJob,
  PairResult,
  PixelsJob,
  PlaneName,
  Planes,
  SimulateJob,
  SimulateResult,
  SwatchJob,
  ThumbnailJob,
  ThumbnailResult,
  TrialJob,
  TrialResult,
} from './job';
import { smallPicture } from './small-picture';
import { objectOf, pictureOf } from './stored-frame';
import { drawSwatch } from './swatch';

type Job = SimulateJob | TrialJob | ExportJob | PixelsJob | ThumbnailJob | SwatchJob | MeasureJob | PairJob;

/** Objects kept with their transform while sliders move: the image, the one beside it, with and without a phase. */
const preparedLimit = 4;
const prepared = new Map<string, PreparedObject>();

export default function runJob(
  job: Job,
): SimulateResult | TrialResult | ExportResult | Planes | ThumbnailResult | MeasureResult | PairResult {
  switch (job.kind) {
    case 'simulate':
      return runSimulation(job);
    case 'trial':
      return runTrial(job);
    case 'export':
      return runExport(job);
    case 'pixels':
      return readPixels(job);
    case 'thumbnail':
      return drawThumbnail(job);
    case 'swatch':
      return drawSwatch(job);
    case 'measure':
      return measure(pictureOf(job.source), job);
    case 'pair':
      return pair(job);
  }
}

function runSimulation({ source, recipe, acquisition, outputs, compareWith, form }: SimulateJob): SimulateResult {
  const start = performance.now();
  const simulation = simulate(preparedObject(source, recipe), recipe, acquisition);
  const numbers = compareNumbers(simulation.image, compareWith && referenceOf(compareWith), acquisition);
  const planes = encodePlanes(
    outputs.map((name) => namedPlane(simulation, name)),
    form,
  );
  simulation.giveBack();
  return handBack({ ...planes, numbers: { ...numbers, computedInMs: performance.now() - start } }, [planes.bytes.buffer]);
}

function runTrial({ source, recipe, acquisition, compareWith, window }: TrialJob): TrialResult {
  const { image, kspaceOfImage } = simulate(preparedObject(source, recipe), recipe, acquisition);
  const log = logMagnitude(kspaceOfImage());
  return {
    digest: digestOf(image),
    numbers: compareNumbers(image, compareWith && referenceOf(compareWith), acquisition),
    imageThumbnail: smallPicture({ values: image.values, grid: image, window, simulated: true }),
    kspaceThumbnail: smallPicture({ values: log, grid: { ...image, spacing: [1, 1] }, window: kspaceWindow, simulated: true }),
  };
}

function runExport({ source, recipe, acquisition, form, about }: ExportJob): ExportResult {
  const simulation = simulate(preparedObject(source, recipe), recipe, acquisition);
  const bytes = exportedFile(simulation, form, about);
  return handBack({ bytes, digest: digestOf(simulation.image) }, [bytes.buffer]);
}

function readPixels({ source, domain, form }: PixelsJob): Planes {
  const planes = encodePlanes([pixelPlanes[domain](source)], form);
  return handBack(planes, [planes.bytes.buffer]);
}

const storedPlane = (source: ImageSource): NamedPlane =>
  source.isComplex
    ? { name: 'image', domain: 'complex-image', plane: objectOf(source) }
    : { name: 'image', domain: 'image', plane: pictureOf(source) };
const kspacePlane = (source: ImageSource): NamedPlane => ({
  name: 'kspace',
  domain: 'kspace',
  plane: preparedObject(source, undefined).kspace(),
});

const kspaceOfImagePlane = (source: ImageSource): NamedPlane => ({
  name: 'kspace',
  domain: 'kspace',
  plane: transformOfReal(pictureOf(source)),
});
const pixelPlanes = { image: storedPlane, kspace: kspacePlane, kspaceOfImage: kspaceOfImagePlane } as const;

function pair({ parts, first, second }: PairJob): PairResult {
  const values = complexOf(parts, new Float32Array(first), new Float32Array(second));
  const bytes = new Uint8Array(values.buffer);
  return handBack({ values: bytes, range: rangeOf(magnitudeOf(values)) }, [bytes.buffer]);
}

function drawThumbnail({ source, domain, window }: ThumbnailJob): ThumbnailResult {
  const plane = pictureOf(source);
  if (domain === 'image') return { bytes: smallPicture({ values: plane.values, grid: plane, window }) };
  const values = logMagnitude(transform(objectOf(source)));
  return { bytes: smallPicture({ values, grid: { ...plane, spacing: [1, 1] }, window: kspaceWindow }) };
}

function namedPlane({ image, kspace, kspaceOfImage }: Simulation, name: PlaneName): NamedPlane {
  if (name === 'image') return { name, domain: 'image', plane: image };
  return { name, domain: 'kspace', plane: name === 'kspace' ? kspace : kspaceOfImage() };
}

const referenceOf = (source: ImageSource): Reference => ({ key: `${source.imageId} ${source.frame}`, plane: () => pictureOf(source) });

/** The object of a recipe, from the few that were used last. */
function preparedObject(source: ImageSource, recipe: Pick<Recipe, 'objectPhase'> | undefined): PreparedObject {
  const phase = recipe?.objectPhase;
  const key = [source.imageId, source.frame, phase?.range, phase?.seed].join(' ');
  const object = prepared.get(key) ?? prepare(objectOf(source), phase);
  prepared.delete(key);
  prepared.set(key, object);
  const [oldest] = prepared.keys();
  if (prepared.size > preparedLimit && oldest !== undefined) prepared.delete(oldest);
  return object;
}

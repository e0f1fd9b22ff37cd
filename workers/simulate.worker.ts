/** Runs transforms, recipes and small pictures on a worker thread. Parses the message, calls recon, hands the bytes back. */
import { createHash } from 'node:crypto';
import { performance } from 'node:perf_hooks';
import { transform } from '../recon/fourier';
import { prepare, simulate, type PreparedObject, type Simulation } from '../recon/simulate';
import type { Recipe } from '../recon/recipe';
import { compareNumbers, type Reference } from './compare-numbers';
import { encodePlanes, kspaceWindow, logMagnitude, type NamedPlane } from './encode-planes';
import { handBack } from './hand-back';
import { measure } from './measure';
import type {
  ImageSource,
  MeasureJob,
  MeasureResult,
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

type Job = SimulateJob | TrialJob | PixelsJob | ThumbnailJob | SwatchJob | MeasureJob;

/** Objects kept with their transform while sliders move: the image, the one beside it, with and without a phase. */
const preparedLimit = 4;
const prepared = new Map<string, PreparedObject>();

export default function runJob(job: Job): SimulateResult | TrialResult | Planes | ThumbnailResult | MeasureResult {
  switch (job.kind) {
    case 'simulate':
      return runSimulation(job);
    case 'trial':
      return runTrial(job);
    case 'pixels':
      return readPixels(job);
    case 'thumbnail':
      return drawThumbnail(job);
    case 'swatch':
      return drawSwatch(job);
    case 'measure':
      return measure(pictureOf(job.source), job);
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
  const { bytes } = encodePlanes([{ name: 'image', domain: 'image', plane: image }], 'exact');
  const log = logMagnitude(kspaceOfImage());
  return {
    digest: createHash('sha256').update(bytes).digest('hex'),
    numbers: compareNumbers(image, compareWith && referenceOf(compareWith), acquisition),
    imageThumbnail: smallPicture({ values: image.values, grid: image, window, simulated: true }),
    kspaceThumbnail: smallPicture({ values: log, grid: { ...image, spacing: [1, 1] }, window: kspaceWindow, simulated: true }),
  };
}

function readPixels({ source, domain, form }: PixelsJob): Planes {
  const plane = pictureOf(source);
  const named: NamedPlane =
    domain === 'image' ? { name: 'image', domain, plane } : { name: 'kspace', domain, plane: preparedObject(source, undefined).kspace() };
  const planes = encodePlanes([named], form);
  return handBack(planes, [planes.bytes.buffer]);
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

/**
 * The picture of a cause or a reconstruction in the catalogue: its model runs on the phantom that shows it best, and the result is drawn into a square as large as the
 * phantom's field of view, or as the part of k-space that a clean scan covers. No strip is burned in: the sample book draws the stitched
 * edge beside each, and says of all of them that they are simulated.
 */
import { encode } from 'fast-png';
import type { Encoded, Reconstruction } from '../recon/cause';
import { transform } from '../recon/fourier';
import { asComplex, type ComplexPlane, type Grid } from '../recon/grid';
import { phantomGrid, type Phantom } from '../recon/phantoms/phantom';
import { entryOf } from '../recon/recipe-check';
import { randomOf } from '../recon/random';
import { prepare, simulate, type PreparedObject } from '../recon/simulate';
import type { Recipe } from '../recon/recipe';
import { swatchAcquisition, swatchObject, swatchPhantom, swatchRecipe, swatchSamples } from '../recon/swatch';
import { kspaceWindow, logMagnitude } from './encode-planes';
import type { SwatchJob, ThumbnailResult } from './job';

/** The brightest tissue of the phantom is 1; a little more, so that what adds to it is still seen. */
const imageWindow = [0, 1.1] as const;

/** Noise of each channel over the brightest tissue: a clean head scan (common practice: signal to noise of 40 to 100). */
const noise = 0.01;

/** Each phantom at each size, with and without a phase. */
const objects = new Map<string, PreparedObject>();

/** Pictures that were drawn last, about 10 kB each: everybody opens the same book. */
const kept = new Map<string, Uint8Array>();
const keptLimit = 256;

export function drawSwatch(job: SwatchJob): ThumbnailResult {
  const key = [job.causeId, job.strength, job.domain, job.side].join(' ');
  const bytes = kept.get(key) ?? encodeSwatch(job);
  kept.delete(key);
  kept.set(key, bytes);
  const [oldest] = kept.keys();
  if (kept.size > keptLimit && oldest !== undefined) kept.delete(oldest);
  return { bytes };
}

function encodeSwatch({ causeId, strength, domain, side }: SwatchJob): Uint8Array {
  const entry = entryOf(causeId);
  if (entry === undefined) throw new RangeError(`causeId must be in the catalogue, got ${causeId}`);
  const recipe = swatchRecipe(entry, strength);
  const phantom = swatchPhantom(entry);
  const scanned = objectOf(phantom, side * swatchSamples(entry), recipe.objectPhase);
  const { image, kspace: acquired } = simulate(scanned, recipe, swatchAcquisition);
  const kspace = 'reconstruct' in entry ? asReconstructed(entry, acquired, recipe) : acquired;
  const drawn = {
    image: () => draw({ values: image.values, grid: image, window: imageWindow }, phantomGrid(phantom, side), side),
    kspace: () => draw({ values: logMagnitude(kspace), grid: kspace, window: kspaceWindow }, objectOf(phantom, side).kspace(), side),
  };
  const data = domain === 'half' ? halves(drawn.image(), drawn.kspace(), side) : drawn[domain]();
  return encode({ width: side, height: side, data, channels: 1, depth: 8 });
}

/** What a reconstruction made of the samples: the k-space of its image, before the magnitude is taken. */
function asReconstructed(method: Reconstruction, kspace: Encoded, { reconstruction, seed }: Recipe): ComplexPlane {
  const context = { acquisition: swatchAcquisition, random: randomOf(seed, method.id) };
  return transform(method.reconstruct(kspace, reconstruction.parameters, context));
}

function objectOf(phantom: Phantom, side: number, phase?: PreparedObject['phase']): PreparedObject {
  const key = `${phantom.id} ${side} ${phase?.range} ${phase?.seed}`;
  const known = objects.get(key);
  if (known) return known;
  const object = prepare(withNoise(asComplex(swatchObject(phantom, side))), phase);
  objects.set(key, object);
  return object;
}

/** White complex noise, the same every time. Without it k-space would be that of a drawing, not of a scan. */
function withNoise(object: ComplexPlane): ComplexPlane {
  const random = randomOf(7, 'noise of the swatches');
  const noisy = (values: Float64Array) => values.map((value) => value + noise * random.normal());
  return { ...object, re: noisy(object.re), im: noisy(object.im) };
}

interface Drawing {
  readonly values: Float64Array;
  readonly grid: Grid;
  readonly window: readonly [number, number];
}

/** Grey levels on the square of `frame`: the nearest sample at each place, black where the plane does not reach. */
function draw({ values, grid, window: [low, high] }: Drawing, frame: Grid, side: number): Uint8Array {
  const rows = samplesAt(frame.origin[0], frame.spacing[0], side, grid.origin[0], grid.spacing[0], grid.rows);
  const columns = samplesAt(frame.origin[1], frame.spacing[1], side, grid.origin[1], grid.spacing[1], grid.columns);
  const levels = new Uint8Array(side * side);
  rows.forEach((row, y) => {
    columns.forEach((column, x) => {
      if (row === undefined || column === undefined) return;
      const value = values[row * grid.columns + column] as number;
      levels[y * side + x] = Math.max(0, Math.min(255, Math.round((255 * (value - low)) / (high - low))));
    });
  });
  return levels;
}

/** For each place of the frame along one axis, the index of the nearest sample, or undefined beyond the last. */
function samplesAt(from: number, step: number, n: number, origin: number, spacing: number, count: number): (number | undefined)[] {
  return Array.from({ length: n }, (_, place) => {
    const index = Math.round((from + place * step - origin) / spacing);
    return index >= 0 && index < count ? index : undefined;
  });
}

/** The left half of the picture, and beside it the middle half of k-space: its centre stays whole. */
const halves = (picture: Uint8Array, kspace: Uint8Array, side: number): Uint8Array =>
  picture.map((level, i) => (i % side < side / 2 ? level : (kspace[i - side / 4] as number)));

/**
 * The same seed gives the same bytes, whatever the number of threads and whatever a thread did before: threads keep transforms, planes
 * between steps and arrays to write again, and none of it may show.
 */
import { createHash } from 'node:crypto';
import { join } from 'node:path';
import { causes } from '../../recon/causes';
import { headGrid, headImage } from '../../recon/phantoms/head';
import { randomOf } from '../../recon/random';
import type { Recipe } from '../../recon/recipe';
import { reconstructions } from '../../recon/reconstructions';
import type { ImageSource, SimulateJob } from '../../workers/job';
import { openWorkers, workersIn } from '../../workers/pool';

jest.setTimeout(240_000);

/** The head with noise, so that no sample is zero by itself. */
function sourceOf(side: number): ImageSource {
  const random = randomOf(side, 'noise of the test');
  const values = new SharedArrayBuffer(side * side * Float32Array.BYTES_PER_ELEMENT);
  new Float32Array(values).set(headImage(headGrid(side)).values.map((value) => Math.abs(value + 0.05 * random.normal())));
  return { imageId: `head ${side}`, frame: 0, rows: side, columns: side, spacingMm: [1.1, 1.1], isComplex: false, values };
}

/** A power of two, and a size that passes by way of 3, 5 and 2. */
const sources = [sourceOf(32), sourceOf(30)];

/** Every cause by itself and after skipped lines, with a phase where it asks for one; every reconstruction of partial Fourier. */
const recipes: Recipe[] = [
  ...causes.flatMap(({ id, needsObjectPhase }): Recipe[] => {
    const phase = needsObjectPhase ? { objectPhase: { range: 2, seed: 3 } } : {};
    const reconstruction = { method: 'zero-filled', parameters: {} };
    const skipped = { cause: 'uniform-undersampling', parameters: {} };
    const step = { cause: id, parameters: {} };
    return [[step], [skipped, step]].map((steps) => ({ steps, reconstruction, seed: 11, ...phase }));
  }),
  ...reconstructions.map(({ id }) => ({
    steps: [{ cause: 'partial-fourier', parameters: {} }],
    reconstruction: { method: id, parameters: {} },
    seed: 11,
  })),
];

const jobs = sources.flatMap((source) =>
  recipes.map((recipe): SimulateJob => ({
    ...{ kind: 'simulate', source, recipe, compareWith: source, form: 'exact' },
    acquisition: { phaseEncode: 'column', repetitionTime: 0.5, echoTrainLength: 4 },
    outputs: ['image', 'kspace', 'kspaceOfImage'],
  })),
);

/** Digest of planes and numbers of every job, in the order of `jobs`; the threads get them in the order that `arranged` makes. */
async function digests(threads: number, arranged: (indices: number[]) => number[]): Promise<string[]> {
  const workers = openWorkers(workersIn(join(__dirname, '../../workers'), '.ts'), threads);
  try {
    const results: string[] = [];
    const waiting = arranged(jobs.map((_, index) => index));
    const ask = async (): Promise<void> => {
      for (let index = waiting.shift(); index !== undefined; index = waiting.shift()) {
        const { bytes, planes, numbers } = await workers.simulate(jobs[index] as SimulateJob);
        const { computedInMs: _time, ...lasting } = numbers;
        results[index] = createHash('sha256')
          .update(bytes)
          .update(JSON.stringify([planes, lasting]))
          .digest('hex');
      }
    };
    // Twice as many callers as threads: none of them waits for work.
    await Promise.all(Array.from({ length: 2 * threads }, ask));
    return results;
  } finally {
    await workers.close();
  }
}

test('All recipes give the same bytes from one thread, from two in the reverse order, and from three with every recipe asked twice', async () => {
  const one = await digests(1, (indices) => indices);
  const two = await digests(2, (indices) => indices.reverse());
  const three = await digests(3, (indices) => [...indices, ...indices]);
  expect(new Set(one).size).toBeGreaterThan(jobs.length / 2);
  // Named, so that a failure says which cause keeps something.
  const named = (results: string[]) => results.map((digest, i) => [jobs[i]?.recipe.steps.map(({ cause }) => cause).join(', '), digest]);
  expect(named(two)).toEqual(named(one));
  expect(named(three)).toEqual(named(one));
});

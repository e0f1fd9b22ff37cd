/** The threads: what is stopped, what is not waited for, and that values are shared and not copied. */
import { join } from 'node:path';
import { performance } from 'node:perf_hooks';
import { openWorkers, workersIn, type WorkerPool } from '../../workers/pool';
import type { SimulateJob } from '../../workers/job';
import { discFile } from '../server/files';

jest.setTimeout(60_000);

const key = new Uint8Array(32);

let workers: WorkerPool;
beforeAll(() => {
  workers = openWorkers(workersIn(join(__dirname, '../../workers'), '.ts'), 1);
});
afterAll(() => workers.close());

/** A job over `side` × `side` pixels, each of them 1. */
function job(side: number, imageId = String(side)): SimulateJob {
  const values = new SharedArrayBuffer(side * side * 4);
  new Float32Array(values).fill(1);
  return {
    ...{ kind: 'simulate', acquisition: { phaseEncode: 'column' }, outputs: ['image'], form: 'exact' },
    source: { imageId, frame: 0, rows: side, columns: side, spacingMm: null, isComplex: false, values },
    recipe: { steps: [], reconstruction: { method: 'zero-filled', parameters: {} }, seed: 1 },
  };
}

it('a job whose caller has left already is not begun', async () => {
  await expect(workers.simulate(job(8), AbortSignal.abort())).rejects.toMatchObject({ name: 'AbortError' });
});

it('a long job is stopped soon after its caller left, and the next one finds a thread', async () => {
  await workers.simulate(job(8));
  const controller = new AbortController();
  const start = performance.now();
  // A prime side of 4,093 takes the slow way of the transform: many seconds, were it not stopped.
  const long = workers.simulate(job(4093), controller.signal);
  setTimeout(() => controller.abort(), 50);
  await expect(long).rejects.toMatchObject({ name: 'AbortError' });
  // 50 ms until the caller leaves, 500 ms of grace, and the rest is a busy machine.
  expect(performance.now() - start).toBeLessThan(5000);
  await expect(workers.simulate(job(8))).resolves.toMatchObject({ planes: [{ rows: 8 }] });
});

it('a file that takes too long to read is given up, and the next one is read', async () => {
  const large = discFile({ rows: 4096, columns: 4096 });
  const small = discFile();
  await expect(workers.readDicom({ bytes: small, key }, 30_000)).resolves.toMatchObject({ accepted: [{ rows: 32 }] });
  // 16.8 million pixels are rescaled and sorted for their percentiles: far more than 5 ms of work anywhere.
  await expect(workers.readDicom({ bytes: large, key }, 5)).resolves.toBeUndefined();
  await expect(workers.readDicom({ bytes: small, key }, 30_000)).resolves.toMatchObject({ accepted: [{ rows: 32 }] });
});

it('the limit for reading a file does not count the time that it waits for others', async () => {
  const large = discFile({ rows: 2048, columns: 2048 });
  const start = performance.now();
  await workers.readDicom({ bytes: large, key }, 30_000);
  const one = performance.now() - start;
  const all = await Promise.all(Array.from({ length: 8 }, () => workers.readDicom({ bytes: large, key }, Math.ceil(3 * one + 500))));
  expect(all.map((read) => read !== undefined && 'accepted' in read)).toEqual(Array(8).fill(true));
});

it('planes come back as the values that went in, which stay shared and unchanged', async () => {
  const asked = job(16);
  const { bytes } = await workers.simulate(asked);
  const image = new Float32Array(bytes.buffer, bytes.byteOffset, 256);
  // Forth and back in float64, rounded to float32 once.
  expect(Math.max(...image.map((value) => Math.abs(value - 1)))).toBeLessThan(1e-7);
  expect(new Float32Array(asked.source.values).every((value) => value === 1)).toBe(true);
});

it('an image without a spacing is taken to have pixels of 1 mm', async () => {
  const { planes } = await workers.simulate(job(8));
  expect(planes[0]).toMatchObject({ spacing: [1, 1], origin: [-4, -4] });
});

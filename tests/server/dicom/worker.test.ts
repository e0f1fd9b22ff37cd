/** The task of the worker thread, run on one. */
import { join } from 'node:path';
import { Piscina } from 'piscina';
import type { Read } from '../../../server/dicom/read';
import { key, madeFile, slope } from './made-image';

const pool = new Piscina({
  filename: join(__dirname, '../../../workers/read-dicom.worker.ts'),
  execArgv: ['--import', 'tsx'],
  minThreads: 1,
  maxThreads: 1,
});
afterAll(() => pool.destroy());

test('an image comes back whole from a worker thread', async () => {
  const read = (await pool.run({ bytes: madeFile(), key })) as Read;
  expect('accepted' in read && [...(read.accepted[0]?.values ?? [])]).toEqual([...slope]);
}, 30_000);

test('a refusal comes back with its code', async () => {
  const read = (await pool.run({ bytes: new Uint8Array(0), key })) as Read;
  expect(read).toMatchObject({ refused: { code: 'empty' } });
}, 30_000);

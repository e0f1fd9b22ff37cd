/** The task of the worker thread, run on one. */
import { readFileSync } from 'node:fs';
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

test('compressed files are read one after another, also behind one over which a decoder breaks down', async () => {
  const bytes = new Uint8Array(readFileSync(join(__dirname, '../../reference/dicom/jpeg-ls.dcm')));
  const outcomes: Read[] = [];
  for (const file of [bytes, bytes.slice().fill(0x55, 20_000, 30_000), bytes])
    outcomes.push((await pool.run({ bytes: file, key })) as Read);
  expect(outcomes).toMatchObject([{ accepted: [{ rows: 256 }] }, { refused: { code: 'unreadable' } }, { accepted: [{ rows: 256 }] }]);
}, 30_000);

test('a refusal comes back with its code', async () => {
  const read = (await pool.run({ bytes: new Uint8Array(0), key })) as Read;
  expect(read).toMatchObject({ refused: { code: 'empty' } });
}, 30_000);

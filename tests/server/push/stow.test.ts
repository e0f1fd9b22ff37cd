/** STOW-RS with a scanner's token: DICOM PS3.18 section 10.5. What becomes of its objects is what becomes of an upload's. */
import request from 'supertest';
import { openApplication, type Application } from '../application';
import { discFile, headFile } from '../files';
import { pageOf } from './scanner-tools';

let application: Application;
let token: string;
beforeAll(async () => {
  application = await openApplication({ variables: { UPLOAD_FILE_MIB: '1', UPLOAD_TOTAL_MIB: '4', UPLOAD_FILES: '5' } });
  const administrator = await application.as('administrator');
  token = (await administrator.post(`/api/scanners/${application.own.scannerId}/tokens`).expect(201)).body.token;
});
beforeEach(async () => {
  await application.deps.sql`delete from images`;
});
afterAll(() => application.close());

const boundary = 'a line of dashes';
const bodyOf = (objects: readonly Buffer[], type = 'application/dicom', end = '--'): Buffer =>
  Buffer.concat([
    ...objects.flatMap((object) => [Buffer.from(`\r\n--${boundary}\r\nContent-Type: ${type}\r\n\r\n`), object]),
    Buffer.from(`\r\n--${boundary}${end}\r\n`),
  ]);

const store = (body: Buffer, contentType = `multipart/related; type="application/dicom"; boundary="${boundary}"`) =>
  request(application.app)
    .post('/api/dicomweb/studies')
    .set('Authorization', `Bearer ${token}`)
    .set('Content-Type', contentType)
    .parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () => done(null, JSON.parse(Buffer.concat(chunks).toString('utf8'))));
    })
    .send(body);

it('takes objects into the inbox and names each by the identifiers that its sender gave it', async () => {
  const answer = await store(bodyOf([headFile()])).expect(200);
  expect(answer.type).toBe('application/dicom+json');
  const [stored] = answer.body['00081199'].Value;
  expect(stored['00081150']).toEqual({ vr: 'UI', Value: ['1.2.840.10008.5.1.4.1.1.4'] });
  expect(stored['00081155'].Value[0]).toMatch(/^[0-9.]+$/);
  const { inbox, push } = await pageOf(application);
  expect([inbox.total, push.received.count, push.tokens[0].lastUsedAt]).toEqual([1, 1, expect.any(String)]);
  const [row] = await application.deps.sql`select arrival, uploader_id from images`;
  expect(row).toEqual({ arrival: 'web-push', uploader_id: null });
});

it('answers 202 where some objects were refused, each with the reason as a number', async () => {
  const ct = discFile({ attributes: { modality: 'CT' } });
  const answer = await store(bodyOf([ct, headFile(), Buffer.from('no image at all'), Buffer.alloc(1_200_000)])).expect(202);
  // 0122 SOP class not supported, C000 cannot understand, A700 out of resources: the same numbers as of C-STORE.
  expect(answer.body['00081198'].Value.map((item: Record<string, { Value: number[] }>) => item['00081197']?.Value)).toEqual([[0x0122]]);
  expect(answer.body['0008119A'].Value.map((item: Record<string, { Value: number[] }>) => item['00081197']?.Value)).toEqual([
    [0xc000],
    [0xa700],
  ]);
  expect(answer.body['00081199'].Value).toHaveLength(1);
  expect((await pageOf(application)).inbox.total).toBe(1);
});

it('answers 409 where none was taken', async () => {
  const answer = await store(bodyOf([headFile().subarray(0, 9000)])).expect(409);
  expect(answer.body['00081199']).toBeUndefined();
  expect((await pageOf(application)).push.refused.last).toBe('truncated');
});

it.each<[string, () => ReturnType<typeof store>, number]>([
  ['another media type', () => store(Buffer.from('{}'), 'application/octet-stream'), 415],
  [
    'parts of another type',
    () => store(bodyOf([headFile()]), `multipart/related; type="application/dicom+xml"; boundary="${boundary}"`),
    415,
  ],
  ['no boundary', () => store(bodyOf([headFile()]), 'multipart/related; type="application/dicom"'), 400],
  ['no object', () => store(bodyOf([])), 400],
  ['a body that ends too early', () => store(bodyOf([headFile()], 'application/dicom', 'x').subarray(0, 5000)), 400],
  ['more objects than one request may hold', () => store(bodyOf(Array.from({ length: 6 }, () => Buffer.alloc(8)))), 413],
  ['more bytes than one request may hold', () => store(bodyOf([Buffer.alloc(5 * 1024 * 1024)])), 413],
])('refuses %s as a whole', async (_name, send, status) => {
  expect((await send()).status).toBe(status);
  expect((await pageOf(application)).inbox.total).toBe(0);
});

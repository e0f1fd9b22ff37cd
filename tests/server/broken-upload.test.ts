/** Uploads that break: what had come in is kept for its sender to go on from, and no object is left that no image has. */
import { createHash } from 'node:crypto';
import { createServer, request as startRequest, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { sweep } from '../../server/push/retention';
import request from 'supertest';
import { emailOf, openApplication, password, type Application } from './application';
import { discFile } from './files';

let application: Application;
let server: Server;
beforeAll(async () => {
  application = await openApplication();
  server = createServer(application.app).listen(0, '127.0.0.1');
});
afterAll(async () => {
  server.closeAllConnections();
  server.close();
  await application.close();
});

/** Pixels of its own, so that its object is nobody else's. */
const file = (rows: number) => discFile({ rows, columns: 40, uids: { study: '2.25.910', series: '2.25.911', image: `2.25.912${rows}` } });

const part = (bytes: Buffer) =>
  Buffer.concat([
    Buffer.from('--edge\r\nContent-Disposition: form-data; name="files"; filename="x"\r\nContent-Type: application/dicom\r\n\r\n'),
    bytes,
    Buffer.from('\r\n'),
  ]);

/** Objects that no image has. */
async function orphans(): Promise<string[]> {
  const rows = await application.deps.sql<{ digest: string }[]>`select values_digest as digest from images`;
  const had = new Set(rows.map(({ digest }) => digest));
  return (await application.objectNames()).filter((name) => !had.has(name));
}

it('a connection that is lost in the second file leaves the first, and its sender finds it', async () => {
  const agent = await application.as('technologist');
  const signedIn = await request(application.app)
    .post('/api/session')
    .send({ email: emailOf('technologist'), password })
    .expect(200);
  const cookie = String(signedIn.get('Set-Cookie')?.[0]).split(';')[0];
  const { port } = server.address() as AddressInfo;
  const broken = startRequest({
    ...{ host: '127.0.0.1', port, path: '/api/images', method: 'POST' },
    headers: { cookie, 'content-type': 'multipart/form-data; boundary=edge', 'content-length': 1_000_000 },
  });
  const ended = new Promise((resolve) => broken.once('error', resolve));
  broken.write(Buffer.concat([part(file(33)), part(file(34)).subarray(0, 600)]));

  const digest = createHash('sha256').update(file(33)).digest('hex');
  const find = async () =>
    (
      await agent
        .post('/api/images/sent')
        .send({ digests: [digest] })
        .expect(200)
    ).body;
  // The first file is taken while the second still comes in.
  while ((await find()).length === 0) await new Promise((resolve) => setTimeout(resolve, 20));
  broken.destroy();
  await ended;

  expect(await find()).toEqual([{ digest, imageIds: [expect.any(String)] }]);
  expect(await orphans()).toEqual([]);
});

it('values whose rows could not be stored go with the next sweep', async () => {
  const { sql } = application.deps;
  await sql`alter table images add constraint full_now check (rows <> 35) not valid`;
  const agent = await application.as('technologist');
  await agent.post('/api/images').attach('files', file(35), 'x').expect(500);
  await sql`alter table images drop constraint full_now`;
  expect(await orphans()).toHaveLength(1);
  await sweep(application.deps, 0);
  expect(await orphans()).toEqual([]);
  // What images have is still there.
  expect(await application.objectNames()).toHaveLength(1);
});

it('a slice of an inbox stays beyond its days while a neighbour of it is on a case', async () => {
  const { sql, db, objects } = application.deps;
  const agent = await application.as('technologist');
  const [onCase, beside] = [
    file(36),
    discFile({ rows: 36, columns: 40, uids: { study: '2.25.910', series: '2.25.913', image: '2.25.9141' } }),
  ];
  const sent = await agent.post('/api/images').attach('files', onCase, 'a').attach('files', beside, 'b').expect(201);
  const [kept, old] = sent.body.images.map(({ id }: { id: string }) => id);
  await sql`update images set arrival = 'scanner', uploaded_at = now() - interval '40 days' where id in (${kept}, ${old})`;
  const before = (await sql`select id from images where arrival = 'scanner'`).length;
  expect(before).toBe(2);
  const first = await agent.post('/api/images').attach('files', file(37), 'c').expect(201);
  await agent
    .post('/api/cases')
    .send({ title: 'Ghosts', images: [{ imageId: first.body.images[0].id, role: 'bad' }] })
    .expect(201);
  await sweep({ db, objects, env: application.deps.env }, 0);
  const left = await sql<{ id: string }[]>`select id from images where arrival = 'scanner'`;
  expect(left.map(({ id }) => id)).toEqual([kept]);
});

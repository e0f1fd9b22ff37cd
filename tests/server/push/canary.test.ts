/**
 * Nothing of an identity stays of what is pushed: a name stands in AE titles, in the association, in the headers of HTTP and in the files; it
 * is then looked for in the log, in every row of the database and in the objects, also in UTF-16 and base64.
 */
import { connect } from 'node:net';
import request from 'supertest';
import type { DicomNode } from '../../../server/push/dicom-node';
import { openApplication, type Application } from '../application';
import { discFile } from '../files';
import { allow, answers, openFolder, openNode, pageOf, send } from './scanner-tools';
import { associate, command, data, storeCommand } from './units';

const canary = 'QUAGGAFINCH';
let application: Application;
let node: DicomNode;
let folder: Awaited<ReturnType<typeof openFolder>>;
beforeAll(async () => {
  application = await openApplication();
  node = await openNode(application);
  folder = await openFolder();
  await allow(application);
});
afterAll(async () => {
  await node.close();
  await application.close();
  await folder.remove();
});

const named = (modality = 'MR') =>
  discFile({
    attributes: { modality },
    extra: [
      { tag: '0010,0010', vr: 'PN', value: `${canary}^ANNE` },
      { tag: '0010,0020', vr: 'LO', value: canary },
    ],
  });

/** Every row of every table as text. */
async function databaseDump(): Promise<string> {
  const { sql } = application.deps;
  const tables = await sql<{ name: string }[]>`select tablename as name from pg_tables where schemaname = 'public'`;
  const rows = await Promise.all(tables.map(({ name }) => sql`select to_jsonb(t)::text as line from ${sql(name)} t`));
  return rows
    .flat()
    .map(({ line }) => String(line))
    .join('\n');
}

const forms = [Buffer.from(canary), Buffer.from(canary, 'utf16le'), Buffer.from(Buffer.from(canary).toString('base64').slice(0, -2))];
const holdsCanary = (bytes: Buffer): boolean =>
  forms.some((form) => bytes.includes(form)) || bytes.toString('latin1').toUpperCase().includes(canary);

/** Says something as a sender and hangs up. */
const say = (...chunks: Buffer[]) =>
  new Promise<void>((resolve) => {
    const socket = connect(node.port, '127.0.0.1', () => chunks.forEach((chunk) => socket.write(chunk)));
    setTimeout(() => socket.destroy(), 1000);
    socket.on('error', () => socket.destroy());
    socket.on('close', () => resolve());
  });

it('a name planted in everything that a sender may fill is found nowhere afterwards', async () => {
  const taken = await folder.put(`${canary}.dcm`, named());
  const refused = await folder.put(`${canary}-ct.dcm`, named('CT'));
  expect(answers(await send(node, [taken])).success).toBe(1);
  await send(node, [refused]);
  await send(node, [taken], { calling: canary });
  await send(node, [taken], { called: canary });
  await say(associate('TERN3T', 'PICKGLASS', canary), command(storeCommand(1, canary)), data(1, Buffer.from(canary.repeat(50))));
  await say(associate('TERN3T'), command(Buffer.from(canary.repeat(9))));
  await say(Buffer.from(canary.repeat(9)));
  await pushOverTheWeb();

  const { inbox, push } = await pageOf(application);
  // The planting worked: images came in and refusals were noted.
  expect(inbox.total).toBeGreaterThanOrEqual(1);
  expect(push.refused.count).toBeGreaterThanOrEqual(4);
  expect(application.logged()).toContain('not let in');
  expect(holdsCanary(Buffer.from(application.logged()))).toBe(false);
  expect(holdsCanary(Buffer.from(await databaseDump()))).toBe(false);
  for (const bytes of await application.objectBytes()) expect(holdsCanary(bytes)).toBe(false);
});

async function pushOverTheWeb(): Promise<void> {
  const administrator = await application.as('administrator');
  const { token } = (await administrator.post(`/api/scanners/${application.own.scannerId}/tokens`).expect(201)).body;
  const head = `\r\n--${canary}\r\nContent-Type: application/dicom\r\nContent-Location: ${canary}\r\n\r\n`;
  const body = Buffer.concat([Buffer.from(head), named('CT'), Buffer.from(`\r\n--${canary}--`)]);
  const answer = await request(application.app)
    .post(`/api/dicomweb/studies?PatientName=${canary}`)
    .set({ Authorization: `Bearer ${token}`, 'X-Patient': canary, 'User-Agent': canary })
    .set('Content-Type', `multipart/related; type="application/dicom"; boundary=${canary}`)
    .send(body);
  expect(answer.status).toBe(409);
  expect(holdsCanary(Buffer.from(JSON.stringify(answer.body)))).toBe(false);
}

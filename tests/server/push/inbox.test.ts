/** The inbox: what a scanner sent waits there until a case takes it, somebody discards it, or it has waited too long. */
import { sweep } from '../../../server/push/retention';
import { receiveObject } from '../../../server/push/receive';
import { openApplication, type Application } from '../application';
import { discFile, uploadOne } from '../files';
import { pageOf } from './scanner-tools';

let application: Application;
beforeAll(async () => {
  application = await openApplication({ variables: { INBOX_DAYS: '14' } });
});
beforeEach(async () => {
  await application.deps.sql`delete from case_images`;
  await application.deps.sql`delete from images`;
  await sweep(application.deps, 0);
});
afterAll(() => application.close());

/** Sends discs as the scanner; each is another file. */
async function sendDiscs(...echoTimes: number[]): Promise<string[]> {
  const { scannerId, departmentId } = application.own;
  for (const echoTime of echoTimes) {
    expect(
      await receiveObject(
        application.deps,
        { scannerId, departmentId },
        discFile({ rows: 30 + echoTime, attributes: { echoTime } }),
        'scanner',
      ),
    ).toBeNull();
  }
  const { inbox } = await pageOf(application);
  return inbox.series.flatMap(({ images }: { images: { id: string }[] }) => images.map(({ id }) => id));
}

const discard = async (images: string[]) => {
  const technologist = await application.as('technologist');
  return (await technologist.post(`/api/scanners/${application.own.scannerId}/inbox/discards`).send({ images }).expect(200)).body.discarded;
};

it('an image leaves the inbox when a case takes it, and cannot be discarded from there any more', async () => {
  const ids = await sendDiscs(1, 2);
  const [taken = ''] = ids;
  const technologist = await application.as('technologist');
  await technologist
    .post('/api/cases')
    .send({ title: 'Sent', scannerId: application.own.scannerId, images: [{ imageId: taken, role: 'bad' }] })
    .expect(201);
  expect((await pageOf(application)).inbox.total).toBe(1);
  expect(await discard(ids)).toBe(1);
  expect((await pageOf(application)).inbox.total).toBe(0);
  await technologist.get(`/api/images/${taken}`).expect(200);
});

it('a series of 100 images becomes one case with one line in its timeline', async () => {
  const ids = await sendDiscs(...Array.from({ length: 100 }, (_, i) => i + 1));
  const technologist = await application.as('technologist');
  const images = ids.map((imageId) => ({ imageId, role: 'bad' }));
  const filed = await technologist.post('/api/cases').send({ title: 'Sent', scannerId: application.own.scannerId, images }).expect(201);
  expect(filed.body.images).toHaveLength(100);
  const timeline = await technologist.get(`/api/cases/${filed.body.id}/timeline`).expect(200);
  expect(JSON.stringify(timeline.body)).toContain('100 images added: bad');
  expect((await pageOf(application)).inbox.total).toBe(0);
});

it('an upload of a member is no image of an inbox and is not discarded through it', async () => {
  const image = await uploadOne(application, discFile({ rows: 50 }));
  expect(await discard([image.id])).toBe(0);
});

it('values go once they are discarded and unused, and stay while another image has the same', async () => {
  await sendDiscs(3, 4);
  const shared = await uploadOne(application, discFile({ rows: 33, attributes: { echoTime: 3, averages: 2 } }));
  const before = await application.objectNames();
  expect(await discard(await sendDiscs())).toBe(2);
  // Kept just now: a minute's grace leaves them.
  expect((await sweep(application.deps, 60_000)).objects).toBe(0);
  expect((await sweep(application.deps, 0)).objects).toBe(1);
  expect((await application.objectNames()).length).toBe(before.length - 1);
  const technologist = await application.as('technologist');
  await technologist.get(`/api/images/${shared.id}/pixels`).expect(200);
});

it('what nobody took for as long as the site says is deleted, and nothing younger', async () => {
  await sendDiscs(5, 6);
  await application.deps.sql`update images set uploaded_at = now() - interval '15 days' where rows = 35`;
  await application.deps.sql`update images set uploaded_at = now() - interval '13 days' where rows = 36`;
  expect((await sweep(application.deps)).images).toBe(1);
  expect((await pageOf(application)).inbox).toMatchObject({ total: 1, keptDays: 14 });
});

it('an AE title is one scanner’s only, and an address that is none is named', async () => {
  const settings = { aeTitle: 'SHARED', addresses: ['10.0.0.1', 'fd00::/8'] };
  const put = async (department: 'own' | 'other', body: object) =>
    (await application.as('administrator', department)).put(`/api/scanners/${application[department].scannerId}/push`).send(body);
  expect((await put('own', settings)).status).toBe(200);
  const taken = await put('other', settings);
  expect([taken.status, taken.body.issues[0].path]).toEqual([400, ['aeTitle']]);
  const wrong = await put('own', { ...settings, addresses: ['10.0.0.1', 'scanner.local'] });
  expect([wrong.status, wrong.body.issues[0].path.slice(0, 2)]).toEqual([400, ['addresses', 1]]);
});

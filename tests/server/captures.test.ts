/** A secondary capture may show a name: until whoever uploaded it has looked, it is there for them alone, and on no case. */
import type { Image } from '../../server/contract/images';
import { openApplication, type Application } from './application';
import { discFile, motionRecipe, uploadOne } from './files';

let application: Application;
beforeAll(async () => {
  application = await openApplication();
});
afterAll(() => application.close());

let nCaptures = 0;
/** Each with other pixels, so that it has an object of its own. */
const capture = (): Promise<Image> =>
  uploadOne(
    application,
    discFile({ rows: 32 + ++nCaptures, attributes: { sopClass: '1.2.840.10008.5.1.4.1.1.7', conversionType: 'WSD' } }),
  );
const at = (image: Image, rest = '') => `/api/images/${image.id}${rest}`;

it('waits to be looked at: its uploader sees it, and nobody else knows of it', async () => {
  const image = await capture();
  expect([image.use, image.confirmedNoText]).toEqual(['look-only', false]);
  const uploader = await application.as('technologist');
  const other = await application.as('physicist');
  for (const path of ['', '/pixels', '/thumbnail', '/pairs', '/slices', '/profile?fromRow=1&fromColumn=1&toRow=9&toColumn=9']) {
    await uploader.get(at(image, path)).expect(200);
    await other.get(at(image, path)).expect(404);
  }
  await other.patch(at(image)).send({ confirmedNoText: true }).expect(404);
  await other.delete(at(image)).expect(404);
});

it('cannot be put on a case, not even by its uploader', async () => {
  const image = await capture();
  const agent = await application.as('technologist');
  const filed = await agent.post('/api/cases').send({ title: 'A screen', images: [{ imageId: image.id, role: 'bad' }] });
  expect([filed.status, filed.body.issues[0].path]).toEqual([400, ['images', 0, 'imageId']]);
  const plain = await agent.post('/api/cases').send({ title: 'A screen' }).expect(201);
  const attached = await agent.post(`/api/cases/${plain.body.id}/images`).send({ imageId: image.id, role: 'bad' });
  expect([attached.status, attached.body.issues[0].message]).toEqual([400, expect.stringContaining('look at')]);
});

it('once its uploader says that it shows no text, it is there for the department and goes on a case', async () => {
  const image = await capture();
  const agent = await application.as('technologist');
  const confirmed = await agent.patch(at(image)).send({ confirmedNoText: true }).expect(200);
  expect(confirmed.body.confirmedNoText).toBe(true);
  await (await application.as('physicist')).get(at(image, '/thumbnail')).expect(200);
  await agent
    .post('/api/cases')
    .send({ title: 'A screen', images: [{ imageId: image.id, role: 'bad' }] })
    .expect(201);
});

it('cannot be confirmed as showing text, and an image that is none needs no confirmation', async () => {
  const agent = await application.as('technologist');
  await agent
    .patch(at(await capture()))
    .send({ confirmedNoText: false })
    .expect(400);
  const answer = await agent.patch(at(await uploadOne(application, discFile()))).send({ confirmedNoText: true });
  expect([answer.status, answer.body.code]).toEqual([422, 'not-computable']);
});

it('that does show text is taken away by its uploader, row and values', async () => {
  const image = await capture();
  const before = (await application.objectNames()).length;
  const agent = await application.as('technologist');
  await agent.delete(at(image)).expect(204);
  await agent.get(at(image)).expect(404);
  expect(await application.objectNames()).toHaveLength(before - 1);
});

it('keeps the values that another image has too', async () => {
  const one = await capture();
  nCaptures--;
  const two = await capture();
  const agent = await application.as('technologist');
  await agent.delete(at(one)).expect(204);
  await agent.get(at(two, '/pixels')).expect(200);
});

it('is no longer taken away once it is confirmed, and neither is any other image', async () => {
  const image = await capture();
  const agent = await application.as('technologist');
  await agent.patch(at(image)).send({ confirmedNoText: true }).expect(200);
  await agent.delete(at(image)).expect(403);
  await agent.delete(at(await uploadOne(application, discFile()))).expect(403);
});

describe('on an image that may only be looked at', () => {
  it.each([
    ['derived', { imageType: ['DERIVED', 'SECONDARY', 'MPR'] }, 'looked at'],
    ['of phase alone', { complexImageComponent: 'PHASE' }, 'magnitude'],
    ['of a real part alone', { complexImageComponent: 'REAL' }, 'imaginary part'],
  ])('%s nothing is simulated, and nothing is compared with it', async (_what, attributes, words) => {
    const looked = await uploadOne(application, discFile({ attributes }));
    const measured = await uploadOne(application, discFile());
    const agent = await application.as('technologist');
    const body = { imageId: looked.id, recipe: motionRecipe(), outputs: ['image'] };
    const run = await agent.post('/api/simulations').send(body);
    expect([run.status, run.body.code, run.body.issues[0].path]).toEqual([422, 'not-computable', ['imageId']]);
    expect(run.body.detail).toContain(words);
    const compared = await agent.post('/api/simulations').send({ ...body, imageId: measured.id, compareWith: { imageId: looked.id } });
    expect([compared.status, compared.body.issues[0].path]).toEqual([422, ['compareWith', 'imageId']]);
    await agent.get(at(looked, '/pixels')).expect(200);
  });
});

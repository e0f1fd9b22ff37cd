/** Series: slices in the order of space, whatever the order in which they were sent, and files that need not be sent again. */
import { createHash } from 'node:crypto';
import type { Image } from '../../server/contract/images';
import type { Slice } from '../../server/contract/series';
import type { Attributes } from '../../server/dicom/write';
import { openApplication, type Application } from './application';
import { discFile, uploadOne } from './files';

jest.setTimeout(60_000);

let application: Application;
beforeAll(async () => {
  application = await openApplication();
});
afterAll(() => application.close());

const transverse = [1, 0, 0, 0, 1, 0];
/** Rows run to the back and columns to the feet: the normal is −x. */
const sagittal = [0, 1, 0, 0, 0, -1];

const slice = (series: number, image: number, attributes: Attributes) =>
  discFile({ uids: { study: '2.25.700', series: `2.25.70${series}`, image: `2.25.70${series}${image}` }, attributes });

async function upload(files: Buffer[]): Promise<Image[]> {
  const images: Image[] = [];
  for (const file of files) images.push(await uploadOne(application, file));
  return images;
}

async function slicesOf(imageId: string | undefined): Promise<Slice[]> {
  const agent = await application.as('technologist');
  return (await agent.get(`/api/images/${imageId}/slices`).expect(200)).body;
}

it('lists slices by their place, not in the order in which they came', async () => {
  const places = [12, -8, 2, 7];
  const images = await upload(places.map((z, i) => slice(1, i, { imagePosition: [0, 0, z], imageOrientation: transverse })));
  const slices = await slicesOf(images[2]?.id);
  expect(slices.map(({ positionMm }) => positionMm)).toEqual([-8, 2, 7, 12]);
  expect(slices.map(({ imageId }) => imageId)).toEqual([1, 2, 3, 0].map((i) => images[i]?.id));
});

it('takes the place along the normal of the plane', async () => {
  const places = [5, -5, 0];
  const images = await upload(places.map((x, i) => slice(2, i, { imagePosition: [x, 30, 90], imageOrientation: sagittal })));
  const slices = await slicesOf(images[0]?.id);
  expect(slices.map(({ positionMm }) => positionMm)).toEqual([-5, 0, 5]);
  expect(slices.map(({ imageId }) => imageId)).toEqual([0, 2, 1].map((i) => images[i]?.id));
});

it('goes by the number in the series where no place is known', async () => {
  const images = await upload([3, 1, 2].map((instanceNumber, i) => slice(3, i, { instanceNumber })));
  expect((await slicesOf(images[0]?.id)).map(({ imageId }) => imageId)).toEqual([1, 2, 0].map((i) => images[i]?.id));
});

it('leaves out another plane of the same series, another series, and the same slice sent twice', async () => {
  const file = slice(4, 0, { imagePosition: [0, 0, 0], imageOrientation: transverse });
  const other = slice(4, 1, { imagePosition: [0, 0, 0], imageOrientation: sagittal });
  const elsewhere = slice(5, 0, { imagePosition: [0, 0, 4], imageOrientation: transverse });
  const [first, again] = await upload([file, file, other, elsewhere]);
  expect((await slicesOf(first?.id)).map(({ imageId }) => imageId)).toEqual([first?.id]);
  expect((await slicesOf(again?.id)).map(({ imageId }) => imageId)).toEqual([again?.id]);
});

it('is of one department', async () => {
  const [image] = await upload([slice(6, 0, {})]);
  const stranger = await application.as('technologist', 'other');
  await stranger.get(`/api/images/${image?.id}/slices`).expect(404);
});

describe('after a lost connection', () => {
  const file = slice(7, 0, {});
  const digest = createHash('sha256').update(file).digest('hex');
  const unsent = createHash('sha256').update('never sent').digest('hex');
  const ask = async (department?: 'own' | 'other') => {
    const agent = await application.as('technologist', department);
    return (
      await agent
        .post('/api/images/sent')
        .send({ digests: [digest, unsent] })
        .expect(200)
    ).body;
  };

  it('a client learns which files have arrived, and what became of them', async () => {
    expect(await ask()).toEqual([]);
    const [image] = await upload([file]);
    expect(await ask()).toEqual([{ digest, imageIds: [image?.id] }]);
    expect(await ask('other')).toEqual([]);
  });

  it('what is on a case already is not offered again', async () => {
    const agent = await application.as('technologist');
    const [{ imageIds }] = await ask();
    await agent
      .post('/api/cases')
      .send({ title: 'Ghosts', images: [{ imageId: imageIds[0], role: 'bad' }] })
      .expect(201);
    expect(await ask()).toEqual([]);
  });

  it('a digest that is none is refused at its place', async () => {
    const agent = await application.as('technologist');
    const answer = await agent
      .post('/api/images/sent')
      .send({ digests: ['abc'] })
      .expect(400);
    expect(answer.body.issues[0].path).toEqual(['digests', 0]);
  });
});

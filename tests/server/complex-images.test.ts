/** Complex images of two that were stored apart: magnitude and phase, or real and imaginary part. */
import type { Image } from '../../server/contract/images';
import { displayMediaType } from '../../server/contract/planes';
import { uidOf, writeDicom, type Attributes } from '../../server/dicom/write';
import { openApplication, type Application } from './application';
import { motionRecipe, scanAttributes, uploadOne } from './files';
import { binary, complexOf, planesOf } from './planes';

let application: Application;
beforeAll(async () => {
  application = await openApplication();
});
afterAll(() => application.close());

const side = 16;
const n = side * side;
const magnitudeAt = (i: number) => 200 + ((i * 37) % 400);
/** Steps of 4096 over a turn, as one maker stores it: slope 2, intercept −4096. */
const phaseStep = (i: number) => (i * 53) % 4096;
const phaseAt = (i: number) => (phaseStep(i) * 2 - 4096) * (Math.PI / 4096);

const exam = uidOf('11111111-1111-4111-8111-111111111111');
const placed: Attributes = { ...scanAttributes, imagePosition: [0, 0, 12] };
interface Part {
  readonly pixel: (i: number) => number;
  readonly attributes?: Attributes;
  readonly study?: string;
}
function upload({ pixel, attributes, study = exam }: Part): Promise<Image> {
  const pixels = Int16Array.from({ length: n }, (_, i) => pixel(i));
  const uids = { study, series: uidOf('22222222-2222-4222-8222-222222222222'), image: uidOf('33333333-3333-4333-8333-333333333333') };
  return uploadOne(
    application,
    Buffer.from(writeDicom({ rows: side, columns: side, pixels, uids, attributes: { ...placed, ...attributes } })),
  );
}

const phaseAttributes: Attributes = {
  complexImageComponent: 'PHASE',
  ...{ bitsStored: 12, highBit: 11, pixelRepresentation: 0, rescaleSlope: 2, rescaleIntercept: -4096 },
};
const magnitude = (more: Omit<Part, 'pixel'> = {}) => upload({ pixel: magnitudeAt, ...more });
const phase = ({ attributes, ...more }: Omit<Part, 'pixel'> = {}) =>
  upload({ pixel: phaseStep, attributes: { ...phaseAttributes, ...attributes }, ...more });

const post = async (body: object) => (await application.as('physicist')).post('/api/images/complex').send(body);
async function made(body: object): Promise<Image> {
  const answer = await post(body);
  expect(answer.status).toBe(201);
  return answer.body;
}
async function pixels(image: Image, query: string, accept = '*/*') {
  const agent = await application.as('physicist');
  return planesOf(await agent.get(`/api/images/${image.id}/pixels?${query}`).set('Accept', accept).buffer().parse(binary).expect(200));
}

/** How far K(−k) is from the conjugate of K(k), over the size of K. Even sides: index 0 is −N/2, its own partner. */
function hermitianDefect({ re, im }: { re: Float64Array; im: Float64Array }): number {
  let defect = 0;
  let size = 0;
  for (let y = 0; y < side; y++) {
    for (let x = 0; x < side; x++) {
      const at = y * side + x;
      const partner = ((side - y) % side) * side + ((side - x) % side);
      defect += ((re[at] ?? NaN) - (re[partner] ?? NaN)) ** 2 + ((im[at] ?? NaN) + (im[partner] ?? NaN)) ** 2;
      size += (re[at] ?? NaN) ** 2 + (im[at] ?? NaN) ** 2;
    }
  }
  return Math.sqrt(defect / size);
}

describe('magnitude and phase', () => {
  it('make M · cos φ and M · sin φ', async () => {
    const image = await made({ magnitudeId: (await magnitude()).id, phaseId: (await phase()).id });
    expect([image.component, image.kspace, image.use]).toEqual(['complex', 'derived', 'measured']);
    const [plane] = await pixels(image, 'domain=image');
    expect([plane?.header.name, plane?.header.type]).toEqual(['image', 'complex64']);
    const { re, im } = complexOf(plane);
    for (const i of [0, 1, 77, n - 1]) {
      // Phase, product and result are rounded to float32 each: 600 · 3 · 6e-8.
      expect(re[i]).toBeCloseTo(magnitudeAt(i) * Math.cos(phaseAt(i)), 3);
      expect(im[i]).toBeCloseTo(magnitudeAt(i) * Math.sin(phaseAt(i)), 3);
    }
  });

  it('have a k-space that is not Hermitian, while that of the magnitude alone is', async () => {
    const plain = await magnitude();
    const image = await made({ magnitudeId: plain.id, phaseId: (await phase()).id });
    const [ofComplex] = await pixels(image, 'domain=kspace');
    const [ofMagnitude] = await pixels(plain, 'domain=kspace');
    expect(hermitianDefect(complexOf(ofMagnitude))).toBeLessThan(1e-6);
    // The phase is scrambled: partners have nothing in common, and the defect is near √2.
    expect(hermitianDefect(complexOf(ofComplex))).toBeGreaterThan(1);
  });

  it('are shown as magnitude and phase, and the first window is that of the magnitude', async () => {
    const image = await made({ magnitudeId: (await magnitude()).id, phaseId: (await phase()).id });
    const planes = await pixels(image, 'domain=image', displayMediaType);
    expect(planes.map(({ header }) => header.name)).toEqual(['image', 'image.phase']);
    const [{ header, bytes } = { header: undefined, bytes: new ArrayBuffer(0) }] = planes;
    const levels = new Uint16Array(bytes);
    const [low, high] = [header?.low ?? NaN, header?.high ?? NaN];
    // Half of one step of 65,535, and the float32 of re and im.
    for (const i of [0, 99]) expect(low + ((levels[i] ?? NaN) / 65_535) * (high - low)).toBeCloseTo(magnitudeAt(i), 2);
    expect(image.range[0]).toBeGreaterThan(190);
    expect(image.range[1]).toBeLessThan(610);
  });

  it('can be simulated on', async () => {
    const image = await made({ magnitudeId: (await magnitude()).id, phaseId: (await phase()).id });
    const agent = await application.as('technologist');
    await agent
      .post('/api/simulations')
      .send({ imageId: image.id, recipe: motionRecipe(), outputs: ['image', 'kspace'] })
      .expect(200);
  });

  it('name one another, whichever is asked', async () => {
    const study = uidOf('44444444-4444-4444-8444-444444444444');
    const [one, two] = [await magnitude({ study }), await phase({ study })];
    await phase({ study, attributes: { imagePosition: [0, 0, 99] } });
    const agent = await application.as('technologist');
    expect((await agent.get(`/api/images/${one.id}/pairs`).expect(200)).body).toEqual([{ imageId: two.id, component: 'phase' }]);
    expect((await agent.get(`/api/images/${two.id}/pairs`).expect(200)).body).toEqual([{ imageId: one.id, component: 'magnitude' }]);
  });
});

it('real and imaginary part make what they are', async () => {
  const part = (complexImageComponent: string, offset: number) =>
    upload({ pixel: (i) => ((i * 29) % 500) - offset, attributes: { complexImageComponent } });
  const [real, imaginary] = [await part('REAL', 250), await part('IMAGINARY', 100)];
  const image = await made({ realId: real.id, imaginaryId: imaginary.id });
  const { re, im } = complexOf((await pixels(image, 'domain=image'))[0]);
  expect([re[3], im[3]]).toEqual([87 - 250, 87 - 100]);
});

describe('two images that do not belong together', () => {
  it.each<[string, () => Promise<[Image, Image]>, string]>([
    ['of two exams', async () => [await magnitude(), await phase({ study: uidOf('55555555-5555-4555-8555-555555555555') })], 'same exam'],
    ['of another place', async () => [await magnitude(), await phase({ attributes: { imagePosition: [0, 0, 13] } })], 'places'],
    ['of another plane', async () => [await magnitude(), await phase({ attributes: { imageOrientation: [1, 0, 0, 0, 0, -1] } })], 'planes'],
    ['of another pixel size', async () => [await magnitude(), await phase({ attributes: { pixelSpacing: [2, 1.9] } })], 'pixels'],
    ['of another echo', async () => [await magnitude(), await phase({ attributes: { echoTime: 13 } })], 'echoes'],
    [
      'of places that are not said',
      async () => [await magnitude({ attributes: { imagePosition: '' } }), await phase({ attributes: { imagePosition: '' } })],
      'places',
    ],
    ['of a phase in an unknown unit', async () => [await magnitude(), await phase({ attributes: { rescaleIntercept: 0 } })], 'counts in'],
    ['that are both magnitude', async () => [await magnitude(), await magnitude()], 'magnitude and phase'],
    [
      'of which one was computed',
      async () => [await magnitude({ attributes: { imageType: ['DERIVED', 'SECONDARY'] } }), await phase()],
      'computed',
    ],
  ])('%s make none, and the reason says why', async (_what, two, words) => {
    const [one, other] = await two();
    const answer = await post({ magnitudeId: one.id, phaseId: other.id });
    expect([answer.status, answer.body.code]).toEqual([422, 'not-computable']);
    expect(answer.body.detail).toContain(words);
  });

  it('in the wrong order are told apart at the field', async () => {
    const answer = await post({ magnitudeId: (await phase()).id, phaseId: (await magnitude()).id });
    expect([answer.status, answer.body.issues[0].path]).toEqual([422, ['magnitudeId']]);
  });

  it('of another department are not found', async () => {
    const agent = await application.as('physicist', 'other');
    await agent
      .post('/api/images/complex')
      .send({ magnitudeId: (await magnitude()).id, phaseId: (await phase()).id })
      .expect(404);
  });
});

test('the k-space of the magnitude of a complex image is Hermitian: the one to hold a simulated image against', async () => {
  const image = await made({ magnitudeId: (await magnitude()).id, phaseId: (await phase()).id });
  const [ofImage] = await pixels(image, 'domain=kspaceOfImage');
  expect(hermitianDefect(complexOf(ofImage))).toBeLessThan(1e-6);
});

test('a complex image takes no synthetic phase: its own was measured', async () => {
  const image = await made({ magnitudeId: (await magnitude()).id, phaseId: (await phase()).id });
  const body = { imageId: image.id, outputs: ['image'], recipe: { ...motionRecipe(), objectPhase: { range: 1.6, seed: 1 } } };
  const answer = await (await application.as('physicist')).post('/api/simulations').send(body);
  expect(answer.status).toBe(400);
  expect(answer.body.issues).toMatchObject([{ path: ['recipe', 'objectPhase'] }]);
});

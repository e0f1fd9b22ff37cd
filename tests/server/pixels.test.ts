/** Stored values and their transform over HTTP. */
import { decode } from 'fast-png';
import { inverse } from '../../recon/fourier';
import { centredGrid } from '../../recon/grid';
import { displayMediaType, planesHeader, type PlaneHeader } from '../../server/contract/planes';
import type { Image } from '../../server/contract/images';
import { openApplication, type Application } from './application';
import { discFile, headFile, uploadOne } from './files';
import { binary, complexOf, planesOf, realOf } from './planes';

let application: Application;
let head: Image;
beforeAll(async () => {
  application = await openApplication();
  head = await uploadOne(application, headFile());
});
afterAll(() => application.close());

async function pixels(image: Image, query: string, accept = '*/*') {
  const agent = await application.as('physicist');
  const answer = await agent.get(`/api/images/${image.id}/pixels?${query}`).set('Accept', accept).buffer().parse(binary).expect(200);
  return { answer, planes: planesOf(answer) };
}

describe('a real head slice', () => {
  it('has a k-space that inverse-transforms to the stored pixels', async () => {
    const [image] = (await pixels(head, 'domain=image')).planes;
    const [kspace] = (await pixels(head, 'domain=kspace')).planes;
    const stored = realOf(image);
    const back = inverse({ ...centredGrid(head.rows, head.columns, [1, 1]), ...complexOf(kspace) });
    let difference = 0;
    let size = 0;
    stored.forEach((value, i) => {
      difference += ((back.re[i] ?? NaN) - value) ** 2 + (back.im[i] ?? NaN) ** 2;
      size += value * value;
    });
    // The issue asks for 1e-5; complex64 on the wire rounds each sample to 6e-8 of itself.
    expect(Math.sqrt(difference / size)).toBeLessThan(1e-5);
    expect(Math.sqrt(difference / size)).toBeLessThan(2e-7);
  });

  it('keeps its energy in the transform (Parseval: the transform is orthonormal)', async () => {
    const stored = realOf((await pixels(head, 'domain=image')).planes[0]);
    const { re, im } = complexOf((await pixels(head, 'domain=kspace')).planes[0]);
    const energy = stored.reduce((sum, value) => sum + value * value, 0);
    const transformed = re.reduce((sum, value, i) => sum + value * value + (im[i] ?? NaN) ** 2, 0);
    // Rounding to float32 of independent sign: far below 1e-6 over 65,536 samples.
    expect(transformed / energy).toBeCloseTo(1, 6);
  });

  it('says in the header where its planes lie: millimetres, and cycles per metre', async () => {
    const { planes: imagePlanes } = await pixels(head, 'domain=image');
    const { planes: kspacePlanes } = await pixels(head, 'domain=kspace');
    const pixel = 0.859375;
    expect(imagePlanes[0]?.header).toEqual({
      ...{ name: 'image', rows: 256, columns: 256, type: 'float32' },
      spacing: [pixel, pixel],
      origin: [-128 * pixel, -128 * pixel],
    });
    const header = kspacePlanes[0]?.header as PlaneHeader;
    expect([header.name, header.type]).toEqual(['kspace', 'complex64']);
    // 1/(N·Δ) with Δ in metres, and the zero frequency at index N/2. Twelve digits are written: relative 5e-12.
    const step = 1000 / (256 * pixel);
    expect(header.spacing[0] / step).toBeCloseTo(1, 11);
    expect(header.origin[1] / (-128 * step)).toBeCloseTo(1, 11);
  });
});

describe('the display form', () => {
  it('carries the same values in 16 bits between low and high', async () => {
    const exact = realOf((await pixels(head, 'domain=image')).planes[0]);
    const { answer, planes } = await pixels(head, 'domain=image', displayMediaType);
    expect(answer.get('Content-Type')).toContain(displayMediaType);
    const [plane] = planes;
    const { low = NaN, high = NaN } = plane?.header ?? {};
    const levels = new Uint16Array(plane?.bytes ?? new ArrayBuffer(0));
    const worst = exact.reduce((most, value, i) => Math.max(most, Math.abs(low + ((levels[i] ?? NaN) / 65535) * (high - low) - value)), 0);
    // Half of one step of 65,535.
    expect(worst).toBeLessThanOrEqual((0.5001 * (high - low)) / 65535);
  });

  it('gives k-space as log magnitude below its maximum, and phase', async () => {
    const { re, im } = complexOf((await pixels(head, 'domain=kspace')).planes[0]);
    const { planes } = await pixels(head, 'domain=kspace', displayMediaType);
    expect(planes.map(({ header }) => [header.name, header.low, header.high])).toEqual([
      ['kspace.log', -8, 0],
      ['kspace.phase', -Math.PI, Math.PI],
    ]);
    const log = new Uint16Array(planes[0]?.bytes ?? new ArrayBuffer(0));
    const phase = new Uint16Array(planes[1]?.bytes ?? new ArrayBuffer(0));
    const magnitudes = Array.from(re, (value, i) => Math.hypot(value, im[i] ?? NaN));
    const largest = magnitudes.reduce((a, b) => Math.max(a, b));
    for (const i of [0, 128 * 256 + 128, 130 * 256 + 120, 40_000]) {
      // One step of 65,535 over 8 decades, and over 2π: a little more than half of it, for the float32 of the exact form.
      expect(-8 + ((log[i] ?? NaN) / 65535) * 8).toBeCloseTo(Math.log10((magnitudes[i] ?? NaN) / largest), 3.8);
      expect(-Math.PI + ((phase[i] ?? NaN) / 65535) * 2 * Math.PI).toBeCloseTo(Math.atan2(im[i] ?? NaN, re[i] ?? NaN), 3.9);
    }
  });
});

describe('what is not there', () => {
  it('is said at the field: a frame beyond the last', async () => {
    const agent = await application.as('technologist');
    const answer = await agent.get(`/api/images/${head.id}/pixels?frame=1`).expect(400);
    expect(answer.body.issues[0].path).toEqual(['frame']);
  });
  it('is not found: an image that nobody uploaded, and an address that is no identifier', async () => {
    const agent = await application.as('technologist');
    await agent.get('/api/images/1c0a4cb1-62f2-4b0e-8d5f-8a6f6b0f1111').expect(404);
    await agent.get('/api/images/7').expect(404);
    await agent.get('/api/nothing').expect(404);
  });
});

describe('a small picture', () => {
  it('is a PNG of at most 192 pixels a side with the proportions of the anatomy', async () => {
    const wide = await uploadOne(application, discFile({ rows: 100, columns: 300, attributes: { pixelSpacing: [2, 1] } }));
    const agent = await application.as('technologist');
    for (const domain of ['image', 'kspace']) {
      const answer = await agent.get(`/api/images/${wide.id}/thumbnail?domain=${domain}`).buffer().parse(binary).expect(200);
      expect(answer.get('Content-Type')).toBe('image/png');
      const { width, height, depth } = decode(answer.body);
      // 200 mm by 300 mm; k-space is drawn sample by sample.
      expect([width, height, depth]).toEqual([192, domain === 'image' ? 128 : 64, 8]);
    }
  });
});

describe('scan facts', () => {
  it('that a member sets keep what the header said beside them, and count in the implications', async () => {
    const image = await uploadOne(application, discFile());
    const agent = await application.as('technologist');
    const set = await agent.patch(`/api/images/${image.id}/facts`).send({ averages: 3, phaseEncode: 'row' }).expect(200);
    expect(set.body.acquisition.averages).toMatchObject({ value: 3, origin: 'member', headerValue: 1 });
    expect(set.body.acquisition.phaseEncode).toMatchObject({ value: 'row', origin: 'member', headerValue: 'column' });
    expect(set.body.acquisition.repetitionTimeMs).toMatchObject({ value: 500, origin: 'header' });
    const implied = await agent.get(`/api/images/${image.id}/implications?ghostFrequencyHz=0.25`).expect(200);
    const ghost = implied.body.find(({ id }: { id: string }) => id === 'ghost-fraction');
    // frac(TR · averages · f) = frac(0.5 · 3 · 0.25) (Wood & Henkelman 1985, from memory).
    expect(ghost.value).toBeCloseTo(0.375, 12);
  });

  it('that are out of range are refused at their field, and nothing is set', async () => {
    const agent = await application.as('technologist');
    const answer = await agent.patch(`/api/images/${head.id}/facts`).send({ repetitionTimeMs: -5 }).expect(400);
    expect(answer.body.issues[0].path).toEqual(['repetitionTimeMs']);
    const read = await agent.get(`/api/images/${head.id}`).expect(200);
    expect(read.body.acquisition.repetitionTimeMs.origin).toBe('header');
  });

  it('fill the initial values of the catalogue, which then says which fact did it', async () => {
    const image = await uploadOne(application, discFile({ attributes: { percentPhaseFieldOfView: 62 } }));
    const agent = await application.as('technologist');
    const fraction = async (query: string) => {
      const causes = (await agent.get(`/api/causes${query}`).expect(200)).body as { id: string; parameters: { id: string }[] }[];
      return causes.find(({ id }) => id === 'field-of-view-reduction')?.parameters.find(({ id }) => id === 'fraction');
    };
    expect(await fraction(`?imageId=${image.id}`)).toMatchObject({
      initial: 0.62,
      fromHeader: expect.stringContaining('phase field of view'),
    });
    expect(await fraction('')).not.toHaveProperty('fromHeader');
  });

  it('leave the lists of reconstructions and of corrections as they are: the latter is still empty', async () => {
    const agent = await application.as('technologist');
    const reconstructions = await agent.get('/api/reconstructions').expect(200);
    expect(reconstructions.body.map(({ id }: { id: string }) => id)).toEqual(expect.arrayContaining(['zero-filled', 'homodyne']));
    expect((await agent.get('/api/corrections').expect(200)).body).toEqual([]);
  });
});

it('the header of the planes is one line of JSON', async () => {
  const { answer } = await pixels(head, 'domain=image');
  expect(JSON.parse(String(answer.get(planesHeader)))).toHaveLength(1);
});

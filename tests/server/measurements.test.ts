/** Line profiles and regions over HTTP, on a real head slice. */
import type { Image } from '../../server/contract/images';
import type { MeasuredProfile, MeasuredStatistics } from '../../server/contract/measurements';
import { openApplication, type Application } from './application';
import { headFile, uploadOne } from './files';

let application: Application;
let head: Image;
beforeAll(async () => {
  application = await openApplication();
  head = await uploadOne(application, headFile());
});
afterAll(() => application.close());

async function get(path: string, status = 200) {
  const agent = await application.as('technologist');
  return (await agent.get(`/api/images/${head.id}/${path}`).expect(status)).body as unknown;
}

describe('a line profile', () => {
  it('has one value a pixel, with the distance in millimetres', async () => {
    const profile = (await get('profile?fromRow=128&fromColumn=28&toRow=128&toColumn=228')) as MeasuredProfile;
    expect(profile.values).toHaveLength(201);
    expect(profile.distanceMm[200]).toBeCloseTo(200 * 0.859375, 9);
    // Padded to 256 samples: from 0 to half the sampling rate.
    expect(profile.frequency).toHaveLength(129);
    expect(profile.frequency[128]).toBeCloseTo(1000 / 0.859375 / 2, 9);
    expect(profile.strongest?.periodMm).toBeCloseTo(1000 / (profile.strongest?.frequency ?? NaN), 9);
  });

  it('needs two places', async () => {
    expect(await get('profile?fromRow=1&fromColumn=1&toRow=1&toColumn=1', 422)).toMatchObject({ code: 'not-computable' });
  });
});

describe('a region', () => {
  it('of the whole image has the mean of the stored values', async () => {
    const corners = 'fromRow=0&fromColumn=0&toRow=255&toColumn=255';
    const whole = (await get(`statistics?${corners}`)) as MeasuredStatistics;
    const ellipse = (await get(`statistics?shape=ellipse&${corners}`)) as MeasuredStatistics;
    expect(whole.pixels).toBe(256 * 256);
    // The ellipse in a square leaves (1 − π/4) of it out: 51,472 pixels, within one border of 800.
    expect(Math.abs(ellipse.pixels - (Math.PI / 4) * 256 * 256)).toBeLessThan(800);
    // The corners of a head slice are air: what is left is brighter on average.
    expect(ellipse.mean).toBeGreaterThan(whole.mean);
    expect(whole.min).toBeLessThanOrEqual(whole.median);
    expect(whole.median).toBeLessThanOrEqual(whole.max);
  });

  it('outside the image, and a corner that is no number, are refused', async () => {
    expect(await get('statistics?fromRow=300&fromColumn=300&toRow=310&toColumn=310', 422)).toMatchObject({ code: 'not-computable' });
    const problem = await get('statistics?fromRow=x&fromColumn=0&toRow=1&toColumn=1', 400);
    expect(problem).toMatchObject({ code: 'invalid-input', issues: [{ path: ['fromRow'] }] });
  });
});

/** Swatches over HTTP: every cause of the catalogue on its phantom, and what is not there. */
import { decode } from 'fast-png';
import { causes } from '../../recon/causes';
import { reconstructions } from '../../recon/reconstructions';
import { openApplication, type Application } from './application';
import { binary } from './planes';

let application: Application;
let agent: Awaited<ReturnType<Application['as']>>;
beforeAll(async () => {
  application = await openApplication();
  agent = await application.as('technologist');
});
afterAll(() => application.close());

async function levelsOf(causeId: string, query: object) {
  const answer = await agent.get(`/api/causes/${causeId}/swatch`).query(query).buffer().parse(binary).expect(200);
  expect(answer.type).toBe('image/png');
  const { width, height, channels, depth, data } = decode(answer.body);
  expect([width, height, channels, depth]).toEqual([128, 128, 1, 8]);
  return data;
}

/** The most grey levels between two pictures at any pixel: a spike is one sample. */
const difference = (a: ArrayLike<number>, b: ArrayLike<number>): number =>
  Array.from(a).reduce((most, level, i) => Math.max(most, Math.abs(level - (b[i] as number))), 0);

/**
 * What leaves log |K| as it was, to within what is seen: a phase that is only turned, or one factor for all samples. Their `looks` say
 * that k-space does not show them. What is interpolated has zeros about the samples, of any number.
 */
const unseenInKspace = ['cross-talk', 'periodic-motion', 'half-field-ghost', 'line-phase-errors', 'quadrature-imbalance', 'interpolated'];
/** Ten levels of 255 are seen at an edge (common practice: two per cent of contrast is the threshold). */
const seen = 10;

describe.each([...causes, ...reconstructions].map(({ id }) => id))('the swatch of %s', (id) => {
  it.each(['image', 'half'])('is a picture of 128 pixels a side (%s), other when strong than when mild', async (domain) => {
    const mild = await levelsOf(id, { domain, strength: 0 });
    expect(difference(mild, await levelsOf(id, { domain, strength: 1 }))).toBeGreaterThan(seen);
  });

  it('shows k-space, other when strong than when mild unless it cannot be seen there', async () => {
    const mild = await levelsOf(id, { domain: 'kspace', strength: 0 });
    const change = difference(mild, await levelsOf(id, { domain: 'kspace', strength: 1 }));
    expect([id, change > seen]).toEqual([id, !unseenInKspace.includes(id)]);
  });
});

it('half is the left half of the picture, and beside it the middle half of k-space', async () => {
  const [first] = causes;
  if (!first) throw new Error('the catalogue is empty');
  const of = (domain: string) => levelsOf(first.id, { domain, strength: 0.4 });
  const [half, image, kspace] = [await of('half'), await of('image'), await of('kspace')];
  const row = (data: ArrayLike<number>, from: number, to: number) => Array.from(data).slice(64 * 128 + from, 64 * 128 + to);
  expect(row(half, 0, 64)).toEqual(row(image, 0, 64));
  expect(row(half, 64, 128)).toEqual(row(kspace, 32, 96));
});

it('is the same picture every time, and may be kept', async () => {
  const ask = () => agent.get('/api/causes/periodic-motion/swatch?strength=0.7&side=256').buffer().parse(binary).expect(200);
  const [once, again] = [await ask(), await ask()];
  expect(Buffer.compare(once.body, again.body)).toBe(0);
  expect(decode(once.body).width).toBe(256);
  expect(once.get('cache-control')).toMatch(/max-age=\d+/);
});

it('a cause that is not in the catalogue is not there', () => agent.get('/api/causes/gremlins/swatch').expect(404));

it.each(['strength=1.2', 'strength=-0.1', 'domain=wavelet', 'side=4096'])('%s is refused', (query) =>
  agent.get(`/api/causes/periodic-motion/swatch?${query}`).expect(400),
);

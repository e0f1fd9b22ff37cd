/** The demo department: what a newcomer finds at the first start. */
import { readFile, stat } from 'node:fs/promises';
import request from 'supertest';
import { decode } from 'fast-png';
import type { Trial } from '../../server/contract/case-parts';
import { caseStates, type Case, type CaseSummary } from '../../server/contract/cases';
import type { Image } from '../../server/contract/images';
import { accountsFile, readAccounts } from '../../server/demo/accounts';
import { stories, seedDemo } from '../../server/demo/seed-demo';
import { phantomIds } from '../../recon/phantoms/phantom';
import { openApplication, type Application } from './application';
import { binary } from './planes';

/** A dozen seconds on two cores of a desk; where other work shares them it takes many times as long. */
const longestSeedMs = 240_000;

let application: Application;
let agent: Awaited<ReturnType<typeof signedIn>>;
let cases: Case[];
beforeAll(async () => {
  application = await openApplication({ seeded: false });
  await seedDemo(application.deps);
  agent = await signedIn('physicist');
  const listed: CaseSummary[] = (await agent.get('/api/cases?order=number').expect(200)).body.cases;
  cases = await Promise.all(listed.map(async ({ id }): Promise<Case> => (await agent.get(`/api/cases/${id}`).expect(200)).body));
}, longestSeedMs);
afterAll(() => application.close());

async function signedIn(role: string) {
  const account = (await readAccounts(application.deps.env.dataFolder)).find((one) => one.role === role);
  const signing = request.agent(application.app);
  await signing.post('/api/session').send({ email: account?.email, password: account?.password }).expect(200);
  return signing;
}

const trialsOf = async ({ id }: Case): Promise<Trial[]> => (await agent.get(`/api/cases/${id}/trials`).expect(200)).body;
const imageOf = async (id: string): Promise<Image> => (await agent.get(`/api/images/${id}`).expect(200)).body;
const storyOf = ({ title }: Case) => {
  const story = stories.find((one) => one.title === title);
  if (story === undefined) throw new Error(`no story is called ${title}`);
  return story;
};

it('has one account per role, with passwords that were drawn and that only the owner of the data can read', async () => {
  const file = accountsFile(application.deps.env.dataFolder);
  expect((await stat(file)).mode & 0o777).toBe(0o600);
  const accounts = await readAccounts(application.deps.env.dataFolder);
  expect(accounts.map(({ role }) => role).sort()).toEqual(['administrator', 'lead-technologist', 'physicist', 'technologist']);
  expect(new Set(accounts.map(({ password }) => password)).size).toBe(4);
  for (const { email, role } of accounts) {
    expect(email).toMatch(/@alderweir\.example$/);
    await signedIn(role);
  }
});

it('has two scanners with their coils, both with open cases', async () => {
  const { body } = await agent.get('/api/scanners').expect(200);
  const described = body.map(({ name, room, coils }: Record<string, unknown>) => [
    name,
    room,
    (coils as { name: string }[]).map((coil) => coil.name).sort(),
  ]);
  expect(described).toEqual([
    ['Heron 1.5 T', 'Room 1', ['Body 18', 'Head 16']],
    ['Tern 3 T', 'Room 2', ['Body 30', 'Head 20']],
  ]);
  for (const { openCases } of body) expect(openCases).toBeGreaterThan(1);
});

it('has cases in every state, each with a title of its own, and of every phantom', () => {
  expect(new Set(cases.map(({ state }) => state))).toEqual(new Set(caseStates));
  expect(new Set(cases.map(({ title }) => title)).size).toBe(stories.length);
  expect(new Set(stories.map(({ protocol }) => protocol.phantom.id))).toEqual(new Set(phantomIds));
});

it('has closed cases that are worth reading: signed, with a cause, a lesson, and lines that were stood by', () => {
  const closed = cases.filter(({ state }) => state === 'closed');
  expect(closed.length).toBeGreaterThan(3);
  for (const { finding, signature } of closed) {
    expect(finding?.cause).toBeTruthy();
    expect(finding?.lesson).not.toBe('');
    expect(signature?.attested.some(({ stands }) => stands)).toBe(true);
  }
});

it('has a fault that came back on one coil, and one that was a question of safety first', async () => {
  const dead = cases.filter(({ title }) => title.startsWith('Dark sector'));
  expect(dead.map(({ state }) => state)).toEqual(['closed', 'under-investigation']);
  const [coil] = dead.map((one) => one.coil?.id);
  expect(coil).toBeTruthy();
  expect(dead.map((one) => one.coil?.id)).toEqual([coil, coil]);
  expect(cases.some(({ title, seen }) => title.startsWith('Safety:') && seen.includes('signal-loss'))).toBe(true);
});

it('has the case that the bench is shown with: a trial that is close, a comparison, a mark', async () => {
  const ghosts = cases.find(({ title }) => title === 'Ghosts on every T1 head since Monday');
  if (ghosts === undefined) throw new Error('the case is missing');
  expect(ghosts.state).toBe('under-investigation');
  expect(ghosts.images.map(({ role }) => role).sort()).toEqual(['bad', 'comparison']);
  expect((await trialsOf(ghosts)).map(({ number }) => number)).toEqual([1]);
  expect((await agent.get(`/api/cases/${ghosts.id}/marks`)).body).toHaveLength(1);
});

it('reproduces every fault that was tried: the best trial of a case differs from the bad image by little more than noise', async () => {
  const tried = [];
  for (const one of cases) {
    const errors = (await trialsOf(one)).map(({ metrics }) => metrics.nrmse ?? Infinity);
    if (errors.length > 0) tried.push([one.title, Math.min(...errors)] as const);
  }
  expect(tried.length).toBeGreaterThan(7);
  // Two channels' noise of 1.2 % of the brightest in both pictures, over a mean signal of a third of it, make 5 %; the first guess of
  // the ghosts is a tenth too weak and costs 2 % more.
  expect(tried.filter(([, error]) => !(error < 0.08))).toEqual([]);
});

it('says in the scan facts of each picture what the picture was made with', async () => {
  for (const one of cases) {
    const { shown } = storyOf(one);
    for (const { protocol } of shown.map(({ picture }) => picture).slice(0, 1)) {
      const { pictureImageId } = one;
      if (pictureImageId === null) throw new Error(`${one.title} has no picture`);
      const { acquisition, rows, columns, spacingMm } = await imageOf(pictureImageId);
      expect({
        phaseEncode: acquisition.phaseEncode.value,
        field: acquisition.fieldStrengthTesla.value,
        times: [acquisition.repetitionTimeMs.value, acquisition.echoTimeMs.value],
        flip: acquisition.flipAngleDegrees.value,
        train: acquisition.echoTrainLength.value,
        bandwidth: acquisition.bandwidthPerPixelHz.value,
      }).toEqual({
        phaseEncode: protocol.phaseEncode,
        field: protocol.scanner.fieldStrengthTesla,
        times: [protocol.repetitionTimeMs, protocol.echoTimeMs],
        flip: protocol.flipAngleDegrees,
        train: protocol.echoTrainLength,
        bandwidth: protocol.bandwidthPerPixelHz,
      });
      const part = (protocol.percentPhaseFieldOfView ?? 100) / 100;
      const [along, across] = protocol.phaseEncode === 'row' ? [columns, rows] : [rows, columns];
      expect([along, across]).toEqual([Math.round(protocol.matrix * part), protocol.matrix]);
      // The header holds six digits.
      expect(spacingMm?.[0]).toBeCloseTo((1000 * protocol.phantom.fieldOfView) / protocol.matrix, 4);
    }
  }
});

it('has pictures in which there is something to see, and none that is clipped', async () => {
  for (const { pictureImageId, title } of cases) {
    const thumbnail = await agent.get(`/api/images/${pictureImageId}/thumbnail`).buffer().parse(binary).expect(200);
    expect([title, Math.max(...decode(thumbnail.body).data) > 200]).toEqual([title, true]);
  }
});

it('is left alone once it is there', async () => {
  const before = await readFile(accountsFile(application.deps.env.dataFolder), 'utf8');
  await seedDemo(application.deps);
  expect(await readFile(accountsFile(application.deps.env.dataFolder), 'utf8')).toBe(before);
  expect((await agent.get('/api/cases')).body.total).toBe(stories.length);
});

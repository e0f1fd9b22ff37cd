/** The demo department: what a newcomer finds at the first start. */
import { readFile, stat } from 'node:fs/promises';
import request from 'supertest';
import { decode } from 'fast-png';
import { accountsFile, readAccounts } from '../../server/demo/accounts';
import { seedDemo } from '../../server/demo/seed-demo';
import { openApplication, type Application } from './application';
import { binary } from './planes';

let application: Application;
beforeAll(async () => {
  application = await openApplication({ seeded: false });
  await seedDemo(application.deps);
});
afterAll(() => application.close());

async function signedIn(role: string) {
  const account = (await readAccounts(application.deps.env.dataFolder)).find((one) => one.role === role);
  const agent = request.agent(application.app);
  await agent.post('/api/session').send({ email: account?.email, password: account?.password }).expect(200);
  return agent;
}

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

it('has two scanners with their coils', async () => {
  const { body } = await (await signedIn('technologist')).get('/api/scanners').expect(200);
  const described = body.map(({ name, room, coils, openCases }: Record<string, unknown>) => [
    name,
    room,
    (coils as { name: string }[]).map((coil) => coil.name),
    openCases,
  ]);
  expect(described).toEqual([
    ['Heron 1.5 T', 'Room 1', ['Body 18', 'Head 16'], 1],
    ['Tern 3 T', 'Room 2', ['Head 20'], 1],
  ]);
});

it('has one case under investigation, with a trial that is close and a mark, and one that was just reported', async () => {
  const agent = await signedIn('physicist');
  const { cases } = (await agent.get('/api/cases?order=number').expect(200)).body;
  expect(cases.map(({ title, state }: Record<string, unknown>) => [title, state])).toEqual([
    ['Ghosts on every T1 head since Monday', 'under-investigation'],
    ['Arm-side band folded onto the head', 'reported'],
  ]);
  const at = `/api/cases/${cases[0].id}`;
  const [trial] = (await agent.get(`${at}/trials`)).body;
  const still = await agent.get(`${at}`);
  expect(still.body.images.map(({ role }: { role: string }) => role).sort()).toEqual(['bad', 'comparison']);
  // The trial has nearly the swing of the fault; without one the images differ by a good deal more.
  expect(trial.metrics.nrmse).toBeLessThan(0.08);
  expect((await agent.get(`${at}/marks`)).body).toHaveLength(1);
});

it('has pictures that came through the door: scan facts from their header, and something to see', async () => {
  const agent = await signedIn('technologist');
  const { cases } = (await agent.get('/api/cases?order=number')).body;
  const facts = [];
  for (const { pictureImageId } of cases) {
    const image = (await agent.get(`/api/images/${pictureImageId}`).expect(200)).body;
    facts.push([image.acquisition.phaseEncode.value, image.acquisition.fieldStrengthTesla.value, image.rows, image.columns]);
    const thumbnail = await agent.get(`/api/images/${pictureImageId}/thumbnail`).buffer().parse(binary).expect(200);
    const levels = decode(thumbnail.body).data;
    expect(Math.max(...levels)).toBeGreaterThan(200);
  }
  expect(facts).toEqual([
    ['column', 3, 256, 256],
    ['row', 1.5, 256, 179],
  ]);
});

it('is left alone once it is there', async () => {
  const before = await readFile(accountsFile(application.deps.env.dataFolder), 'utf8');
  await seedDemo(application.deps);
  expect(await readFile(accountsFile(application.deps.env.dataFolder), 'utf8')).toBe(before);
  expect((await (await signedIn('technologist')).get('/api/cases')).body.total).toBe(2);
});

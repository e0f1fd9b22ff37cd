/** Who may call what: every route of the contract with every role, without a session, and from another department. */
import { randomUUID } from 'node:crypto';
import request from 'supertest';
import { roles, type Route } from '../../server/contract/route';
import { routes } from '../../server/contract/routes';
import { openApplication, type Application } from './application';
import { discFile, motionRecipe, uploadOne } from './files';

let application: Application;
let ids: Record<string, string>;
beforeAll(async () => {
  application = await openApplication();
  ids = await fileEverything();
});
afterAll(() => application.close());

const nameOf = ({ method, path }: Route): string => `${method.toUpperCase()} ${path}`;
/** What a route needs in its query, beyond its path. */
const queries: Record<string, string> = {
  '/api/images/:imageId/profile': '?fromRow=1&fromColumn=1&toRow=9&toColumn=9',
  '/api/images/:imageId/statistics': '?fromRow=1&fromColumn=1&toRow=9&toColumn=9',
};
const addressOf = ({ path }: Route, of: Record<string, string>): string =>
  path.replace(/:(\w+)/g, (_, name: string) => of[name] ?? randomUUID()) + (queries[path] ?? '');
const forMembers = routes.filter(({ access }) => access !== 'anyone');
const forAnyone = routes.filter(({ access }) => access === 'anyone');

/** A case with one of everything, filed by members of the own department. */
async function fileEverything(): Promise<Record<string, string>> {
  const image = await uploadOne(application, discFile());
  const technologist = await application.as('technologist');
  const filed = await technologist
    .post('/api/cases')
    .send({ title: 'Everything', images: [{ imageId: image.id, role: 'bad' }] })
    .expect(201);
  const at = `/api/cases/${filed.body.id}`;
  const trial = await technologist.post(`${at}/trials`).send({ imageId: image.id, recipe: motionRecipe() }).expect(201);
  const mark = await technologist
    .post(`${at}/marks`)
    .send({ imageId: image.id, kind: 'arrow', points: [[1, 2]] })
    .expect(201);
  return { caseId: filed.body.id, imageId: image.id, trialId: trial.body.id, markId: mark.body.id, version: filed.body.version };
}

/** A body with which the route would work for a member of the own department. */
function bodyOf(route: Route): object | undefined {
  const { imageId } = ids;
  const bodies: Record<string, object> = {
    'POST /api/simulations': { imageId, recipe: motionRecipe(), outputs: ['image'] },
    'POST /api/cases': { title: 'With a picture', images: [{ imageId, role: 'bad' }] },
    'PATCH /api/cases/:caseId': { version: ids.version, tried: 'something' },
    'POST /api/cases/:caseId/images': { imageId, role: 'comparison' },
    'POST /api/cases/:caseId/trials': { imageId, recipe: motionRecipe() },
    'POST /api/cases/:caseId/marks': { imageId, kind: 'text', points: [[3, 4]], text: 'here' },
    'POST /api/cases/:caseId/comments': { text: 'a note' },
    'POST /api/cases/:caseId/findings': { cause: null, confidence: 'not-found', text: 'nothing yet' },
    'POST /api/cases/:caseId/transitions': { action: 'assign', memberId: application.own.members.physicist },
    'PATCH /api/images/:imageId/facts': { averages: 2 },
  };
  return bodies[nameOf(route)];
}

describe('without a session', () => {
  it.each(forMembers.map((route) => [nameOf(route), route] as const))('%s asks to sign in', async (_name, route) => {
    const answer = await request(application.app)[route.method](addressOf(route, ids)).send(bodyOf(route));
    expect([answer.status, answer.body.code]).toEqual([401, 'not-signed-in']);
  });

  it.each(forAnyone.map((route) => [nameOf(route), route] as const))('%s does not', async (_name, route) => {
    const answer = await request(application.app)[route.method](addressOf(route, ids)).send({ email: 'x@y.example', password: 'x' });
    expect(answer.body.code).not.toBe('not-signed-in');
  });
});

describe.each(roles)('as %s', (role) => {
  it.each(forMembers.map((route) => [nameOf(route), route] as const))(
    '%s is open exactly when the contract says so',
    async (_name, route) => {
      const agent = await application.as(role);
      const empty = await agent[route.method](addressOf(route, {})).send({});
      const isRefused = empty.status === 403;
      expect(isRefused).toBe(!route.access.includes(role));
      if (isRefused) expect(empty.body.code).toBe('not-allowed');
    },
  );
});

describe('from another department', () => {
  /** The catalogue is the same for every department. */
  const isOfAll = (route: Route): boolean => route.path.startsWith('/api/causes/');
  /** What leads to something of the own department: by its address, or by the image in its body. */
  const leading = () =>
    forMembers.filter((route) => !isOfAll(route) && (route.path.includes(':') || JSON.stringify(bodyOf(route) ?? {}).includes('imageId')));

  it('everything that belongs to a case or an image is as if it were not there', async () => {
    const stranger = await application.as('physicist', 'other');
    for (const route of leading()) {
      const answer = await stranger[route.method](addressOf(route, ids)).send(bodyOf(route));
      // Filing a case with a strange image is a fault of that field; all else is simply not there.
      const expected = nameOf(route) === 'POST /api/cases' ? [400, 'invalid-input'] : [404, 'not-found'];
      expect([nameOf(route), answer.status, answer.body.code]).toEqual([nameOf(route), ...expected]);
    }
  });

  it('a member of the own department reaches all of it by the same requests', async () => {
    const physicist = await application.as('physicist');
    // What removes comes last.
    const inOrder = leading().sort((a, b) => Number(a.method === 'delete') - Number(b.method === 'delete'));
    for (const route of inOrder) {
      const answer = await physicist[route.method](addressOf(route, ids)).send(bodyOf(route));
      expect([nameOf(route), answer.status]).toEqual([nameOf(route), route.status]);
    }
  });

  it('lists hold only what is of the own department', async () => {
    const stranger = await application.as('lead-technologist', 'other');
    expect((await stranger.get('/api/cases').expect(200)).body.total).toBe(0);
    const scanners = await stranger.get('/api/scanners').expect(200);
    expect(scanners.body.map(({ id }: { id: string }) => id)).toEqual([application.other.scannerId]);
    const members = await stranger.get('/api/members').expect(200);
    expect(members.body.map(({ id }: { id: string }) => id).sort()).toEqual(Object.values(application.other.members).sort());
  });

  it('nobody and nothing of it can be named in a case', async () => {
    const physicist = await application.as('physicist');
    const { other } = application;
    const scanner = await physicist.post('/api/cases').send({ title: 'x', scannerId: other.scannerId }).expect(400);
    expect(scanner.body.issues[0].path).toEqual(['scannerId']);
    const coil = await physicist
      .post('/api/cases')
      .send({ title: 'x', scannerId: application.own.scannerId, coilId: other.coilId })
      .expect(400);
    expect(coil.body.issues[0].path).toEqual(['coilId']);
    const step = { action: 'assign', memberId: other.members.physicist };
    const assigned = await physicist.post(`/api/cases/${ids.caseId}/transitions`).send(step).expect(400);
    expect(assigned.body.issues[0].path).toEqual(['memberId']);
  });
});

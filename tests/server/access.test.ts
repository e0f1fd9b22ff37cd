/** Who may call what: every route of the contract with every role, without a session, and from another department. */
import { randomUUID } from 'node:crypto';
import request from 'supertest';
import { roles, type Role, type Route } from '../../server/contract/route';
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
/** Some routes need an image of their own kind: its id stands under the name of the route. */
const addressOf = (route: Route, of: Record<string, string>): string =>
  route.path.replace(/:(\w+)/g, (_, name: string) => of[nameOf(route)] ?? of[name] ?? randomUUID()) + (queries[route.path] ?? '');
const forMembers = routes.filter(({ access }) => typeof access !== 'string');
const forScanners = routes.filter(({ access }) => access === 'scanner');
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
  const { scannerId } = application.own;
  const drawn = await (await application.as('administrator')).post(`/api/scanners/${scannerId}/tokens`).expect(201);
  // Of secondary captures only whoever uploaded them may say whether they show text.
  const physicist = await application.as('physicist');
  const capture = async (rows: number): Promise<string> => {
    const file = discFile({ rows, attributes: { conversionType: 'WSD' } });
    return (await physicist.post('/api/images').attach('files', file, 'capture.dcm').expect(201)).body.images[0].id;
  };
  const captures = { 'PATCH /api/images/:imageId': await capture(33), 'DELETE /api/images/:imageId': await capture(34) };
  return {
    ...captures,
    caseId: filed.body.id,
    imageId: image.id,
    trialId: trial.body.id,
    markId: mark.body.id,
    scannerId,
    tokenId: drawn.body.push.tokens[0].id,
    version: filed.body.version,
  };
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
    'PUT /api/scanners/:scannerId/push': { aeTitle: 'TERN3T', addresses: ['10.1.2.3'] },
    'POST /api/scanners/:scannerId/inbox/discards': { images: [imageId] },
    'PATCH /api/images/:imageId': { confirmedNoText: true },
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

describe('a route for scanners', () => {
  it.each(forScanners.map((route) => [nameOf(route), route] as const))(
    '%s is open to a token, and not to a session',
    async (_name, route) => {
      const administrator = await application.as('administrator');
      const tokens = `/api/scanners/${application.own.scannerId}/tokens`;
      const drawn = await administrator.post(tokens).expect(201);
      // The newest stands first.
      const [newest] = drawn.body.push.tokens;
      const call = (authorization?: string) => {
        const asked = request(application.app)[route.method](addressOf(route, ids));
        return authorization === undefined ? asked : asked.set('Authorization', authorization);
      };
      const wrong = [undefined, 'Bearer', 'Bearer pickglass_' + 'A'.repeat(43), `Basic ${drawn.body.token}`];
      for (const authorization of wrong) {
        const answer = await call(authorization);
        expect([authorization, answer.status, answer.body.code]).toEqual([authorization, 401, 'wrong-token']);
      }
      expect((await administrator[route.method](addressOf(route, ids))).status).toBe(401);
      expect((await call(`Bearer ${drawn.body.token}`)).status).not.toBe(401);
      await administrator.delete(`${tokens}/${newest.id}`).expect(200);
      expect((await call(`Bearer ${drawn.body.token}`)).status).toBe(401);
    },
  );
});

describe.each(roles)('as %s', (role) => {
  it.each(forMembers.map((route) => [nameOf(route), route] as const))(
    '%s is open exactly when the contract says so',
    async (_name, route) => {
      const agent = await application.as(role);
      const empty = await agent[route.method](addressOf(route, {})).send({});
      const isRefused = empty.status === 403;
      expect(isRefused).toBe(typeof route.access !== 'string' && !route.access.includes(role));
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

  /** The physicist, unless the route is closed to that role. */
  const roleFor = ({ access }: Route): Role => (access.includes('physicist') ? 'physicist' : 'administrator');

  it('everything that belongs to a case or an image is as if it were not there', async () => {
    for (const route of leading()) {
      const stranger = await application.as(roleFor(route), 'other');
      const answer = await stranger[route.method](addressOf(route, ids)).send(bodyOf(route));
      // Filing a case with a strange image is a fault of that field; all else is simply not there.
      const expected = nameOf(route) === 'POST /api/cases' ? [400, 'invalid-input'] : [404, 'not-found'];
      expect([nameOf(route), answer.status, answer.body.code]).toEqual([nameOf(route), ...expected]);
    }
  });

  it('a member of the own department reaches all of it by the same requests', async () => {
    // What removes comes last.
    const inOrder = leading().sort((a, b) => Number(a.method === 'delete') - Number(b.method === 'delete'));
    for (const route of inOrder) {
      const member = await application.as(roleFor(route));
      const answer = await member[route.method](addressOf(route, ids)).send(bodyOf(route));
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

/** Whether the product is up, with a database that really goes away: its connections run through a door that the test shuts. */
import { connect, createServer, type AddressInfo, type Socket } from 'node:net';
import request from 'supertest';
import { openApplication, type Application } from './application';

let application: Application;
let door: Awaited<ReturnType<typeof openDoor>>;
beforeAll(async () => {
  door = await openDoor();
  application = await openApplication({ through: door.through });
});
afterAll(async () => {
  await application.close();
  await door.close();
});

/** Passes connections on to the database until it is shut: then nothing listens there, as when the database is stopped. */
async function openDoor() {
  const sockets = new Set<Socket>();
  let target = new URL('postgres://nowhere');
  const server = createServer((socket) => {
    const onward = connect(Number(target.port), target.hostname);
    for (const end of [socket, onward]) {
      sockets.add(end);
      end.on('error', () => end.destroy());
      end.on('close', () => [socket, onward].forEach((other) => other.destroy()));
    }
    socket.pipe(onward).pipe(socket);
  });
  const listen = (port: number) =>
    new Promise<void>((resolve) => {
      server.listen(port, '127.0.0.1', resolve);
    });
  const close = () =>
    new Promise((resolve) => {
      server.close(resolve);
      sockets.forEach((socket) => socket.destroy());
    });
  await listen(0);
  const { port } = server.address() as AddressInfo;
  return {
    through(url: string): string {
      target = new URL(url);
      const moved = new URL(url);
      moved.port = String(port);
      return moved.href;
    },
    shut: close,
    open: () => listen(port),
    close,
  };
}

it('says that server, database and workers are up', async () => {
  const answer = await request(application.app).get('/api/health').expect(200);
  expect(answer.body).toEqual({ status: 'ok', version: '0.0.0-test', database: 'ok', workers: 2 });
});

it('says that the database is away, on health and on everything that needs it, and recovers by itself', async () => {
  const agent = await application.as('technologist');
  await door.shut();
  const health = await request(application.app).get('/api/health').expect(503);
  expect(health.body.code).toBe('database-away');
  const cases = await agent.get('/api/cases').expect(503);
  expect(cases.body.code).toBe('database-away');
  await door.open();
  await request(application.app).get('/api/health').expect(200);
  await agent.get('/api/cases').expect(200);
});

describe('every answer', () => {
  it('carries the headers that protect a browser', async () => {
    const answer = await request(application.app).get('/api/health');
    const policy = String(answer.get('Content-Security-Policy'));
    expect(policy).toContain("script-src 'self' 'wasm-unsafe-eval'");
    expect(policy).toContain("img-src 'self' data: blob:");
    expect(policy).not.toMatch(/script-src[^;]*unsafe-inline/);
    expect(answer.get('X-Content-Type-Options')).toBe('nosniff');
    expect(answer.get('X-Powered-By')).toBeUndefined();
  });

  it('to a body that is no JSON, or too large, is a problem and not the parser’s own words', async () => {
    const send = (body: string) => request(application.app).post('/api/session').set('Content-Type', 'application/json').send(body);
    const broken = await send('{"email": "secret-word').expect(400);
    expect(broken.get('Content-Type')).toContain('application/problem+json');
    expect(broken.text).not.toContain('secret-word');
    const large = await send(JSON.stringify({ email: 'a'.repeat(300_000), password: 'x' })).expect(413);
    expect(large.body.code).toBe('too-large');
  });
});

describe('the interface', () => {
  it('describes itself as OpenAPI 3.1, every route with its roles', async () => {
    const { body } = await request(application.app).get('/api/openapi.json').expect(200);
    expect(body.openapi).toBe('3.1.0');
    expect(body.paths['/api/cases/{caseId}/findings'].post['x-roles']).toEqual(['lead-technologist', 'physicist']);
    expect(body.paths['/api/session'].post.security).toEqual([]);
    const createCase = body.paths['/api/cases'].post.requestBody.content['application/json'].schema;
    expect(createCase.required).toEqual(['title']);
    expect(body.paths['/api/cases/{caseId}'].get.parameters[0]).toMatchObject({ name: 'caseId', in: 'path', required: true });
  });
});

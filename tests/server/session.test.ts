import request from 'supertest';
import { SignJWT } from 'jose';
import { emailOf, openApplication, password, type Application } from './application';

let application: Application;
beforeAll(async () => {
  application = await openApplication();
});
afterAll(() => application.close());

const signIn = (email: string, secret: string) => request(application.app).post('/api/session').send({ email, password: secret });
const cookieOf = (answer: request.Response): string => String(answer.get('Set-Cookie')?.[0]);

describe('signing in', () => {
  it('answers who the member is and puts the session into a cookie that scripts and other sites cannot use', async () => {
    const answer = await signIn(emailOf('physicist').toUpperCase(), password).expect(200);
    expect(answer.body.member).toEqual({
      id: application.own.members.physicist,
      name: 'The physicist of own',
      email: emailOf('physicist'),
      role: 'physicist',
    });
    expect(cookieOf(answer)).toMatch(/HttpOnly/);
    expect(cookieOf(answer)).toMatch(/SameSite=Strict/);
  });

  it('gives a wrong password and an unknown e-mail the same answer', async () => {
    const wrong = await signIn(emailOf('technologist'), 'not it').expect(401);
    const unknown = await signIn('nobody@own.example', 'not it').expect(401);
    expect(wrong.body).toEqual(unknown.body);
    expect(wrong.body.code).toBe('wrong-credentials');
    expect(wrong.get('Content-Type')).toContain('application/problem+json');
  });

  it('marks the field that is missing', async () => {
    const answer = await request(application.app).post('/api/session').send({ email: 'a@b.example' }).expect(400);
    expect(answer.body.issues).toEqual([expect.objectContaining({ path: ['password'] })]);
  });

  it('closes the door after ten wrong passwords, also to the right one, and says for how long', async () => {
    const email = emailOf('administrator', 'other');
    for (let attempt = 1; attempt <= 10; attempt++) await signIn(email, `guess ${attempt}`).expect(401);
    const refused = await signIn(email, password).expect(429);
    expect(refused.body.code).toBe('too-many-attempts');
    // A quarter of an hour, less the seconds that the attempts took.
    expect(Number(refused.get('Retry-After'))).toBeGreaterThan(800);
    expect(Number(refused.get('Retry-After'))).toBeLessThanOrEqual(900);
    await signIn(emailOf('technologist', 'other'), password).expect(200);
  });

  it('forgets earlier failures once the right password came', async () => {
    const email = emailOf('physicist', 'other');
    for (let round = 0; round < 2; round++) {
      for (let attempt = 1; attempt <= 6; attempt++) await signIn(email, 'not it').expect(401);
      await signIn(email, password).expect(200);
    }
  });
});

describe('a session', () => {
  it('says whose it is, and is over once its member signed out, even for one who kept the cookie', async () => {
    const cookie = cookieOf(await signIn(emailOf('technologist'), password).expect(200));
    const who = await request(application.app).get('/api/session').set('Cookie', cookie).expect(200);
    expect(who.body.member.role).toBe('technologist');
    expect(who.body.department.id).toBe(application.own.departmentId);
    await request(application.app).delete('/api/session').set('Cookie', cookie).expect(204);
    const replayed = await request(application.app).get('/api/session').set('Cookie', cookie).expect(401);
    expect(replayed.body.code).toBe('not-signed-in');
  });

  it('is not opened by a token that another key signed, nor by one without a signature', async () => {
    const forged = await new SignJWT()
      .setProtectedHeader({ alg: 'HS256' })
      .setJti('9b6344e2-732c-477d-8925-f3e2f01249df')
      .setAudience('pickglass')
      .setExpirationTime('1h')
      .sign(new TextEncoder().encode('a key that is somebody else’s, long enough'));
    const unsigned = `${Buffer.from('{"alg":"none"}').toString('base64url')}.${forged.split('.')[1]}.`;
    for (const token of [forged, unsigned, 'nonsense']) {
      await request(application.app).get('/api/session').set('Cookie', `pickglass_session=${token}`).expect(401);
    }
  });

  it('ends when its time is over', async () => {
    const cookie = cookieOf(await signIn(emailOf('lead-technologist'), password).expect(200));
    await application.deps.sql`update sessions set expires_at = now() - interval '1 second'`;
    await request(application.app).get('/api/session').set('Cookie', cookie).expect(401);
  });
});

describe('requests from other sites', () => {
  it('are refused when they would change something, and answered when they only read', async () => {
    const agent = await application.as('technologist');
    const answer = await agent.post('/api/cases').set('Origin', 'https://elsewhere.example').send({ title: 'A case' }).expect(403);
    expect(answer.body.code).toBe('foreign-origin');
    await agent.get('/api/cases').set('Origin', 'https://elsewhere.example').expect(200);
  });

  it('are told from those of our own page by the address that the browser sees', async () => {
    const agent = await application.as('technologist');
    await agent.post('/api/cases').set('Host', 'bench.example').set('Origin', 'http://bench.example').send({ title: 'A case' }).expect(201);
  });
});

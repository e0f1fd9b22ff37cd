/** Filing, finding, reading and changing cases. */
import { openApplication, type Application } from './application';
import { discFile, motionRecipe, uploadOne } from './files';

let application: Application;
beforeAll(async () => {
  application = await openApplication();
});
afterAll(() => application.close());

const file = async (body: object) => (await (await application.as('technologist')).post('/api/cases').send(body).expect(201)).body;

describe('filing a case', () => {
  it('takes two taps: a title and an image are enough, and the rest can follow', async () => {
    const image = await uploadOne(application, discFile());
    const filed = await file({ title: 'Bright line', images: [{ imageId: image.id, role: 'bad' }] });
    expect(filed).toMatchObject({
      ...{ number: 1, version: 1, state: 'reported', title: 'Bright line', direction: 'unknown', pictureImageId: image.id, finding: null },
      reporter: { id: application.own.members.technologist, role: 'technologist' },
      images: [{ imageId: image.id, role: 'bad' }],
    });
    expect((await file({ title: 'Another' })).number).toBe(2);
  });

  it('gives each case its own number, also when many are filed at once', async () => {
    const filed = await Promise.all(Array.from({ length: 5 }, (_, i) => file({ title: `At once ${i}` })));
    const numbers = filed.map(({ number }) => number).sort((a, b) => a - b);
    expect(numbers).toEqual(Array.from({ length: 5 }, (_, i) => (numbers[0] ?? 0) + i));
  });

  it('keeps nothing of a case whose image is not there', async () => {
    const agent = await application.as('technologist');
    const before = (await agent.get('/api/cases')).body.total;
    const image = await uploadOne(application, discFile());
    const images = [
      { imageId: image.id, role: 'bad' },
      { imageId: '1c0a4cb1-62f2-4b0e-8d5f-8a6f6b0f1111', role: 'comparison' },
    ];
    const refused = await agent.post('/api/cases').send({ title: 'Half', images }).expect(400);
    expect(refused.body.issues[0].path).toEqual(['images', 1, 'imageId']);
    expect((await agent.get('/api/cases')).body.total).toBe(before);
  });

  it('asks for a title at its field', async () => {
    const agent = await application.as('technologist');
    const refused = await agent.post('/api/cases').send({ title: '   ' }).expect(400);
    expect(refused.body.issues).toEqual([{ path: ['title'], message: 'a case needs a title' }]);
  });
});

describe('changing a case', () => {
  it('takes the new words, raises the version and says in the timeline what was changed', async () => {
    const { own } = application;
    const filed = await file({ title: 'Shading' });
    const agent = await application.as('lead-technologist');
    const change = { version: filed.version, tried: 'Another coil', scannerId: own.scannerId, coilId: own.coilId, seen: ['shading'] };
    const changed = await agent.patch(`/api/cases/${filed.id}`).send(change).expect(200);
    expect(changed.body).toMatchObject({ version: 2, tried: 'Another coil', scanner: { name: 'Tern 3 T' }, coil: { name: 'Head 20' } });
    const timeline = await agent.get(`/api/cases/${filed.id}/timeline`).expect(200);
    expect(timeline.body[0]).toMatchObject({
      kind: 'changed',
      text: 'Changed: scanner, coil, seen, tried',
      actor: { role: 'lead-technologist' },
    });
  });

  it('is a conflict when somebody else was faster, and leaves what they wrote', async () => {
    const filed = await file({ title: 'Both at once' });
    const agent = await application.as('technologist');
    const send = (tried: string) => agent.patch(`/api/cases/${filed.id}`).send({ version: filed.version, tried });
    const answers = await Promise.all([send('first'), send('second')]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const winner = answers.find(({ status }) => status === 200);
    const loser = answers.find(({ status }) => status === 409);
    expect(loser?.body.code).toBe('version-conflict');
    expect((await agent.get(`/api/cases/${filed.id}`)).body.tried).toBe(winner?.body.tried);
  });

  it('does not take a coil of another scanner', async () => {
    const filed = await file({ title: 'Which coil', scannerId: application.own.scannerId, coilId: application.own.coilId });
    const agent = await application.as('technologist');
    const refused = await agent.patch(`/api/cases/${filed.id}`).send({ version: 1, scannerId: null }).expect(400);
    expect(refused.body.issues[0].path).toEqual(['coilId']);
  });

  it('puts an image on it, and an image that is there takes its new role', async () => {
    const filed = await file({ title: 'With images' });
    const image = await uploadOne(application, discFile());
    const agent = await application.as('technologist');
    for (const role of ['bad', 'comparison']) {
      const answer = await agent.post(`/api/cases/${filed.id}/images`).send({ imageId: image.id, role }).expect(201);
      expect(answer.body.images.map((one: { role: string }) => one.role)).toEqual([role]);
    }
  });
});

describe('finding cases', () => {
  let words: string;
  beforeAll(async () => {
    const image = await uploadOne(application, discFile());
    words = 'zeppelin';
    const one = await file({ title: `Ghosts ${words}`, protocol: 'T1 axial', seen: ['ghosts'], scannerId: application.own.scannerId });
    await file({ title: 'Fold-in', description: `An arm, ${words}, 100 % of the time`, seen: ['fold-in', 'lines'] });
    const three = await file({ title: 'Noise', tried: 'nothing' });
    const physicist = await application.as('physicist');
    await physicist
      .post(`/api/cases/${three.id}/comments`)
      .send({ text: `saw it at the ${words.toUpperCase()}` })
      .expect(201);
    await physicist
      .post(`/api/cases/${one.id}/findings`)
      .send({ cause: null, confidence: 'not-found', text: 'an owl perhaps' })
      .expect(200);
    const mark = { imageId: image.id, kind: 'text', points: [[1, 1]], text: 'heron-shaped' };
    await physicist.post(`/api/cases/${one.id}/marks`).send(mark).expect(201);
    await physicist.post(`/api/cases/${one.id}/trials`).send({ imageId: image.id, recipe: motionRecipe() }).expect(201);
    await physicist.post(`/api/cases/${three.id}/transitions`).send({ action: 'investigate' }).expect(200);
  });

  const titles = async (query: string) => {
    const agent = await application.as('technologist');
    const answer = await agent.get(`/api/cases?${query}`).expect(200);
    return answer.body.cases.map(({ title }: { title: string }) => title.split(' ')[0]);
  };

  it('looks into title, description and comments, in any case of letters', async () => {
    expect(await titles('q=Zeppelin')).toEqual(['Noise', 'Fold-in', 'Ghosts']);
  });
  it('looks into findings, marks, protocol, scanner and number, for every word of the query', async () => {
    expect(await titles('q=zeppelin%20owl')).toEqual(['Ghosts']);
    expect(await titles('q=heron-sha')).toEqual(['Ghosts']);
    expect(await titles('q=zeppelin%20tern%20t1')).toEqual(['Ghosts']);
    const agent = await application.as('technologist');
    const { number } = (await agent.get('/api/cases?q=zeppelin%20owl')).body.cases[0];
    expect(await titles(`q=%23${number}%20zeppelin`)).toEqual(['Ghosts']);
  });
  it('takes percent and underline for what they are', async () => {
    expect(await titles('q=zeppelin%20100%20%25')).toEqual(['Fold-in']);
    expect(await titles('q=zep_elin')).toEqual([]);
  });
  it('filters by sighting and scanner, and orders as asked', async () => {
    expect(await titles('q=zeppelin&seen=lines')).toEqual(['Fold-in']);
    expect(await titles(`q=zeppelin&scannerId=${application.own.scannerId}`)).toEqual(['Ghosts']);
    expect(await titles('q=zeppelin&order=title')).toEqual(['Fold-in', 'Ghosts', 'Noise']);
    expect(await titles('q=zeppelin&order=age&descending=true')).toEqual(['Ghosts', 'Fold-in', 'Noise']);
    expect(await titles('q=zeppelin&order=number&limit=1&offset=1')).toEqual(['Fold-in']);
  });
  it('filters by the cause of the finding that stands: one that was replaced does not count', async () => {
    const physicist = await application.as('physicist');
    const filed = await file({ title: 'Copies' });
    const find = (cause: string) =>
      physicist.post(`/api/cases/${filed.id}/findings`).send({ cause, confidence: 'consistent', text: 'As far apart' }).expect(200);
    await find('uniform-undersampling');
    expect(await titles('cause=uniform-undersampling')).toEqual(['Copies']);
    await find('periodic-motion');
    expect(await titles('cause=uniform-undersampling')).toEqual([]);
    expect(await titles('cause=periodic-motion')).toEqual(['Copies']);
    const { counts } = (await physicist.get('/api/cases?cause=periodic-motion').expect(200)).body;
    expect(counts).toEqual({ reported: 1, 'under-investigation': 0, 'awaiting-sign-off': 0, closed: 0 });
  });
  it('counts what there is in each state under the other filters', async () => {
    const agent = await application.as('technologist');
    const answer = await agent.get('/api/cases?q=zeppelin&state=under-investigation').expect(200);
    expect(answer.body.total).toBe(1);
    expect(answer.body.counts).toEqual({ reported: 2, 'under-investigation': 1, 'awaiting-sign-off': 0, closed: 0 });
    expect(await titles('q=zeppelin&state=open')).toHaveLength(3);
  });
});

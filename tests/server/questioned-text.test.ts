/** Free text that looks like a patient's name, date or number is questioned before it is saved, wherever one can write (common practice). */
import { questionedFields, questionOf } from '../../server/contract/questioned-text';
import { openApplication, type Application } from './application';
import { discFile, motionRecipe, uploadOne } from './files';

describe('the question', () => {
  it.each([
    ['Mrs Hale moved', /name/],
    ['QUILLFEATHER^ZENOBIA again', /name/],
    ['Dob 03.04.1961', /date/],
    ['born 1961-04-03', /date/],
    ['patient 4471203', /number/],
  ])('is asked about “%s”', (text, question) => {
    expect(questionOf(text)).toMatch(question);
  });

  it.each([
    'The patient moved',
    'TR 640 ms, matrix 512 × 512',
    'Room 3, coil head 20, serial 20-0417',
    'at 127.713 MHz',
    'MR scanner, x^2',
  ])('is not asked about “%s”', (text) => {
    expect(questionOf(text)).toBeUndefined();
  });

  it('is asked about sentences, and not about dates and identifiers in their own fields', () => {
    const body = { title: 'Mrs Hale', seenOn: '2026-02-14', imageId: '11111111-1111-4111-8111-111111111111', note: 'fine' };
    expect(questionedFields(body)).toEqual([{ field: 'title', question: 'Is this a name? Say “the patient”.' }]);
  });
});

describe('a request with such a text', () => {
  let application: Application;
  let caseId: string;
  let imageId: string;
  beforeAll(async () => {
    application = await openApplication();
    imageId = (await uploadOne(application, discFile())).id;
    const agent = await application.as('physicist');
    const filed = await agent
      .post('/api/cases')
      .send({ title: 'Ghosts', images: [{ imageId, role: 'bad' }] })
      .expect(201);
    caseId = filed.body.id;
  });
  afterAll(() => application.close());

  const name = 'Mrs Hale moved';
  const requests: [what: string, method: 'post' | 'patch', path: string, body: (version: number) => object, field: string][] = [
    ['a new case', 'post', '', () => ({ title: name }), 'title'],
    ['a change', 'patch', '/:id', (version) => ({ version, tried: name }), 'tried'],
    ['a note', 'post', '/:id/comments', () => ({ text: name }), 'text'],
    ['a mark', 'post', '/:id/marks', () => ({ imageId, kind: 'text', points: [[1, 2]], text: name }), 'text'],
    ['a trial', 'post', '/:id/trials', () => ({ imageId, recipe: motionRecipe(), note: name }), 'note'],
    ['a finding', 'post', '/:id/findings', () => ({ cause: null, confidence: 'not-found', text: name }), 'text'],
  ];

  it.each(requests)('%s is not saved until somebody was asked', async (_what, method, path, body, field) => {
    const agent = await application.as('physicist');
    const { version } = (await agent.get(`/api/cases/${caseId}`)).body;
    const address = `/api/cases${path.replace(':id', caseId)}`;
    const refused = await agent[method](address).send(body(version));
    expect([refused.status, refused.body.code, refused.body.issues[0].path]).toEqual([422, 'text-questioned', [field]]);
    const saved = await agent[method](address).send({ ...body(version), confirmedText: true });
    expect([200, 201]).toContain(saved.status);
    expect(JSON.stringify(saved.body)).toContain(name);
  });

  it('a reason for returning a case is questioned too', async () => {
    const agent = await application.as('physicist');
    await agent.post(`/api/cases/${caseId}/transitions`).send({ action: 'investigate' }).expect(200);
    await agent.post(`/api/cases/${caseId}/transitions`).send({ action: 'ask-for-sign-off' }).expect(200);
    const step = { action: 'return', reason: 'Ask about patient 4471203' };
    const refused = await agent.post(`/api/cases/${caseId}/transitions`).send(step);
    expect([refused.status, refused.body.issues[0].path]).toEqual([422, ['reason']]);
    await agent
      .post(`/api/cases/${caseId}/transitions`)
      .send({ ...step, confirmedText: true })
      .expect(200);
  });
});

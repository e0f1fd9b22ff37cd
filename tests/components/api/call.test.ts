import { ApiProblem } from '@/components/api/api-problem';
import { addressOf, call } from '@/components/api/call';
import { readUploadAnswer } from '@/components/api/images';
import { listCases } from '@/server/contract/cases';
import { signIn } from '@/server/contract/session';
import { answerWith, problem } from '../network';

const failure = async (promise: Promise<unknown>): Promise<ApiProblem> => {
  const error: unknown = await promise.then(
    () => new Error('it succeeded'),
    (reason: unknown) => reason,
  );
  if (error instanceof ApiProblem) return error;
  throw error;
};

describe('a call', () => {
  test('fills the path, and leaves out of the query what was not said', () => {
    expect(addressOf('/api/cases/:caseId', { caseId: 'a b' }, {})).toBe('/api/cases/a%20b');
    expect(addressOf('/api/cases', {}, { q: '', state: 'open', seen: undefined })).toBe('/api/cases?state=open');
  });

  test('asks with the method of its route and returns the checked answer', async () => {
    const asked = answerWith(() => ({
      json: { cases: [], total: 0, counts: { reported: 0, 'under-investigation': 0, 'awaiting-sign-off': 0, closed: 4 } },
    }));
    const found = await call(listCases, { query: { state: 'closed' } });
    expect(found.counts.closed).toBe(4);
    expect(asked).toEqual([{ method: 'GET', address: '/api/cases?state=closed', body: undefined }]);
  });

  test('that is refused is a problem with its code, its words and the field it concerns', async () => {
    answerWith(() => problem(400, 'invalid-input', 'Look at the e-mail', [{ path: ['email'], message: 'too short' }]));
    const error = await failure(call(signIn, { body: { email: 'x', password: 'y' } }));
    expect([error.code, error.status, error.message]).toEqual(['invalid-input', 400, 'Look at the e-mail']);
    expect(error.issueAt('email')).toBe('too short');
    expect(error.issueAt('password')).toBeUndefined();
  });

  test('that nobody answers says so, and that nothing typed is lost', async () => {
    answerWith(() => null);
    const error = await failure(call(listCases, {}));
    expect(error.code).toBe('no-answer');
    expect(error.message).toMatch(/still here/);
  });

  test('whose answer is not in the contract is not passed on', async () => {
    answerWith(() => ({ json: { cases: 'many' } }));
    expect((await failure(call(listCases, {}))).code).toBe('not-understood');
  });
});

describe('the answer to an upload', () => {
  const refused = { name: 'notes.dcm', code: 'not-dicom', reason: 'This is not a DICOM file.' };

  test('is read from a 422 too: nothing was taken, and each file says why', () => {
    const result = readUploadAnswer(422, JSON.stringify({ images: [], refused: [refused] }));
    expect(result).toEqual({ images: [], refused: [refused] });
  });

  test('is a problem when the server sends one', () => {
    const text = JSON.stringify(problem(413, 'too-large', 'One upload may hold 512 MB').json);
    expect(() => readUploadAnswer(413, text)).toThrow('One upload may hold 512 MB');
  });

  test('that is no JSON is not understood', () => {
    expect(() => readUploadAnswer(201, '<html>')).toThrow(/not understood/);
  });
});

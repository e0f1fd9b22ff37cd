/** The life of a case: every step from every state with every role, and what a signature holds. */
import { createHash } from 'node:crypto';
import { caseStates, type CaseState } from '../../server/contract/cases';
import { roles, type Role } from '../../server/contract/route';
import { openApplication, type Application } from './application';
import { discFile, uploadOne } from './files';

let application: Application;
let agents: Record<Role, Awaited<ReturnType<Application['as']>>>;
beforeAll(async () => {
  application = await openApplication();
  const signedIn = await Promise.all(roles.map(async (role) => [role, await application.as(role)] as const));
  agents = Object.fromEntries(signedIn) as typeof agents;
});
afterAll(() => application.close());

const finding = { cause: 'periodic-motion', confidence: 'reproduced', text: 'Breathing', lesson: 'Belt on' } as const;
const move = (role: Role, id: string, step: object) => agents[role].post(`/api/cases/${id}/transitions`).send(step);
const signOff = (caseNumber: number) => ({ action: 'sign-off', caseNumber, confidence: 'reproduced', lesson: 'Belt on', attested: [] });

/** A case with a finding, brought to `state` by a physicist. */
async function caseIn(state: CaseState) {
  const { body } = await agents.technologist
    .post('/api/cases')
    .send({ title: `To be ${state}` })
    .expect(201);
  await agents.physicist.post(`/api/cases/${body.id}/findings`).send(finding).expect(200);
  const way = [{ action: 'investigate' }, { action: 'ask-for-sign-off' }, signOff(body.number)];
  for (const step of way.slice(0, caseStates.indexOf(state))) await move('physicist', body.id, step).expect(200);
  return body as { id: string; number: number };
}

/** The rules as the product states them, written out: from which states, by whom, and where to. */
const leaders: readonly Role[] = ['lead-technologist', 'physicist'];
const rules: Record<string, { by: readonly Role[]; to: Partial<Record<CaseState, CaseState>> }> = {
  assign: {
    by: leaders,
    to: { reported: 'under-investigation', 'under-investigation': 'under-investigation', 'awaiting-sign-off': 'awaiting-sign-off' },
  },
  investigate: { by: leaders, to: { reported: 'under-investigation' } },
  'ask-for-sign-off': { by: leaders, to: { 'under-investigation': 'awaiting-sign-off' } },
  return: { by: leaders, to: { 'awaiting-sign-off': 'under-investigation' } },
  'sign-off': { by: ['physicist'], to: { 'awaiting-sign-off': 'closed' } },
  reopen: { by: leaders, to: { closed: 'under-investigation' } },
};

describe.each(caseStates)('a case that is %s', (state) => {
  it.each(roles)('takes from a %s the steps that the rules allow, says so beforehand, and refuses the others', async (role) => {
    let next = await caseIn(state);
    for (const [action, { by, to }] of Object.entries(rules)) {
      const { id, number } = next;
      const extras = { assign: { memberId: application.own.members.physicist }, 'sign-off': signOff(number) };
      const step = { action, reason: 'because', ...(action in extras ? extras[action as keyof typeof extras] : {}) };
      const said = (await agents[role].get(`/api/cases/${id}`).expect(200)).body.may.transitions.includes(action);
      const answer = await move(role, id, step);
      const expected = !by.includes(role) ? 403 : to[state] === undefined ? 409 : 200;
      expect([action, answer.status, said]).toEqual([action, expected, expected === 200]);
      const after = (await agents[role].get(`/api/cases/${id}`)).body;
      expect([action, after.state]).toEqual([action, expected === 200 ? to[state] : state]);
      // A refused step leaves the case as it was, for the next one to try.
      if (expected === 200) next = await caseIn(state);
    }
  });
});

describe('a step', () => {
  it('is written into the timeline with who, from where and where to, and its reason', async () => {
    const { id } = await caseIn('awaiting-sign-off');
    await move('lead-technologist', id, { action: 'return', reason: 'the phantom is missing' }).expect(200);
    const timeline = await agents.administrator.get(`/api/cases/${id}/timeline`).expect(200);
    expect(timeline.body[0]).toMatchObject({
      ...{ kind: 'state-changed', from: 'awaiting-sign-off', to: 'under-investigation', text: 'the phantom is missing' },
      actor: { role: 'lead-technologist' },
    });
  });

  it('back needs a reason, at its field', async () => {
    const { id } = await caseIn('awaiting-sign-off');
    const refused = await move('physicist', id, { action: 'return', reason: ' ' }).expect(400);
    expect(refused.body.issues[0]).toMatchObject({ path: ['reason'] });
  });

  it('towards a signature needs a finding', async () => {
    const { body } = await agents.technologist.post('/api/cases').send({ title: 'No finding' }).expect(201);
    await move('physicist', body.id, { action: 'investigate' }).expect(200);
    const refused = await move('physicist', body.id, { action: 'ask-for-sign-off' }).expect(409);
    expect(refused.body).toMatchObject({ code: 'transition-not-possible', detail: 'A finding must be written first' });
  });

  it('is taken once when two people take it at the same moment', async () => {
    const { id } = await caseIn('reported');
    const answers = await Promise.all([
      move('physicist', id, { action: 'investigate' }),
      move('lead-technologist', id, { action: 'investigate' }),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it('assigns the case to a member', async () => {
    const { id } = await caseIn('reported');
    const answer = await move('lead-technologist', id, { action: 'assign', memberId: application.own.members.physicist }).expect(200);
    expect(answer.body).toMatchObject({ state: 'under-investigation', assignee: { id: application.own.members.physicist } });
  });
});

describe('signing off', () => {
  it('needs the number of the case, typed, at its field', async () => {
    const { id, number } = await caseIn('awaiting-sign-off');
    const refused = await move('physicist', id, signOff(number + 1)).expect(400);
    expect(refused.body.issues[0].path).toEqual(['caseNumber']);
    expect((await agents.physicist.get(`/api/cases/${id}`)).body).toMatchObject({ state: 'awaiting-sign-off', signature: null });
  });

  it('keeps who signed, what they stood by, and a digest over the case as it was', async () => {
    const { id, number } = await caseIn('awaiting-sign-off');
    const attested = [
      { line: 'The trial matches', stands: true },
      { line: 'The phantom was scanned', stands: false },
    ];
    const signed = await move('physicist', id, { ...signOff(number), confidence: 'removed', lesson: 'Check the belt', attested }).expect(
      200,
    );
    expect(signed.body.signature).toMatchObject({
      member: { role: 'physicist' },
      attested,
      digest: expect.stringMatching(/^[0-9a-f]{64}$/),
    });
    expect(signed.body.finding).toMatchObject({ confidence: 'removed', lesson: 'Check the belt', text: finding.text });

    const [row] = await application.deps.sql<{ statement: string }[]>`select statement from signatures where case_id = ${id}`;
    const statement = row?.statement ?? '';
    expect(createHash('sha256').update(statement).digest('hex')).toBe(signed.body.signature.digest);
    expect(JSON.parse(statement)).toMatchObject({
      case: { number, title: signed.body.title },
      finding: { confidence: 'removed' },
      attested,
    });
  });

  it('closes the case to every change, until it is reopened with a reason; the signature then no longer stands', async () => {
    const image = await uploadOne(application, discFile());
    const { id } = await caseIn('closed');
    const { version } = (await agents.physicist.get(`/api/cases/${id}`)).body;
    const at = `/api/cases/${id}`;
    const changes = [
      agents.physicist.patch(at).send({ version, title: 'Other words' }),
      agents.physicist.post(`${at}/images`).send({ imageId: image.id, role: 'bad' }),
      agents.physicist.post(`${at}/marks`).send({ imageId: image.id, kind: 'arrow', points: [[1, 1]] }),
      agents.physicist.post(`${at}/comments`).send({ text: 'too late' }),
      agents.physicist.post(`${at}/findings`).send(finding),
    ];
    for (const change of changes) expect((await change).status).toBe(409);
    await move('lead-technologist', id, { action: 'reopen', reason: 'it came back' }).expect(200);
    expect((await agents.physicist.get(at)).body).toMatchObject({ state: 'under-investigation', signature: null, may: { edit: true } });
  });
});

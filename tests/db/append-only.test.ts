/** What was done, found and signed cannot be rewritten, whoever holds the connection: the database itself refuses. */
import { openApplication, type Application } from '../server/application';

let application: Application;
beforeAll(async () => {
  application = await openApplication();
  const physicist = await application.as('physicist');
  const { body } = await physicist.post('/api/cases').send({ title: 'Signed' }).expect(201);
  const at = `/api/cases/${body.id}`;
  await physicist.post(`${at}/findings`).send({ cause: null, confidence: 'not-found', text: 'as it was' }).expect(200);
  const signOff = { action: 'sign-off', caseNumber: body.number, confidence: 'not-found', lesson: '', attested: [] };
  for (const step of [{ action: 'investigate' }, { action: 'ask-for-sign-off' }, signOff]) {
    await physicist.post(`${at}/transitions`).send(step).expect(200);
  }
});
afterAll(() => application.close());

describe.each(['timeline_events', 'findings', 'signatures'])('the table %s', (table) => {
  const words = { timeline_events: 'text', findings: 'text', signatures: 'statement' }[table] ?? '';

  it.each([`update ${table} set ${words} = 'rewritten'`, `delete from ${table}`, `truncate ${table} cascade`])(
    'refuses: %s',
    async (statement) => {
      const { sql } = application.deps;
      const before = await sql.unsafe(`select * from ${table}`);
      expect(before.length).toBeGreaterThan(0);
      await expect(sql.unsafe(statement)).rejects.toMatchObject({ code: '23001', message: expect.stringContaining('append-only') });
      expect([...(await sql.unsafe(`select * from ${table}`))]).toEqual([...before]);
    },
  );
});

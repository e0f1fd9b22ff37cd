/**
 * Nobody's identity is kept, told or handed out, by whatever door a file came in. What a patient's file is full of is looked for in every
 * column of the database, every object, every line of the log, every answer and every export.
 */
import { createHash } from 'node:crypto';
import { trialFiles } from '../../../server/contract/exports';
import { openApplication, type Application } from '../application';
import { motionRecipe } from '../files';
import { binary } from '../planes';
import { canaryFile, canaryWords, examUid, givenName, inLongIntegers, patientNumber, surname } from './canary-file';
import { doors } from './doors';
import { wordsIn } from './search';

const fileName = `${surname}_${givenName}${givenName}_${patientNumber}.dcm`;
/** Whoever keeps a digest of an identifier can find it again by trying; only a keyed one is not such. */
const plainDigests = ['sha256', 'sha1', 'md5'].map((kind) => createHash(kind).update(examUid).digest('hex'));
const everyWord = [...canaryWords, ...plainDigests];

/** Every row of every table, and the bytes of every binary column. */
async function dump({ deps: { sql } }: Application): Promise<Buffer> {
  const tables = await sql<{ schema: string; name: string }[]>`
    select table_schema as schema, table_name as name from information_schema.tables
    where table_schema not in ('information_schema', 'pg_catalog') and table_type = 'BASE TABLE'`;
  const rows = await Promise.all(tables.map(({ schema, name }) => sql`select t::text as row from ${sql(schema)}.${sql(name)} t`));
  const texts = rows.flat().map(({ row }) => String(row));
  // PostgreSQL writes binary columns as hexadecimal digits.
  const binaries = texts.flatMap((text) => [...text.matchAll(/\\x([0-9a-f]{2,})/g)].map(([, digits = '']) => Buffer.from(digits, 'hex')));
  return Buffer.concat([Buffer.from(texts.join('\n')), ...binaries]);
}

/** Everything that can be asked about an image, a case with it, and a trial on it. */
async function exportsOf(application: Application, imageId: string): Promise<Map<string, Buffer>> {
  const agent = await application.as('technologist');
  const filed = await agent
    .post('/api/cases')
    .send({ title: 'Ghosts', images: [{ imageId, role: 'bad' }] })
    .expect(201);
  const at = `/api/cases/${filed.body.id}`;
  const trial = await agent.post(`${at}/trials`).send({ imageId, recipe: motionRecipe() }).expect(201);
  const addresses = [
    `/api/images/${imageId}`,
    `/api/images/${imageId}/pixels`,
    `/api/images/${imageId}/pixels?domain=kspace`,
    `/api/images/${imageId}/thumbnail`,
    `/api/images/${imageId}/implications`,
    `/api/images/${imageId}/derived.dcm`,
    ...[at, `${at}/trials`, `${at}/timeline`, `${at}/trials/${trial.body.id}/thumbnail`, '/api/cases', '/api/scanners'],
    ...trialFiles.map((file) => `${at}/trials/${trial.body.id}/${file}`),
  ];
  const found = new Map<string, Buffer>();
  for (const address of addresses) {
    const answer = await agent.get(address).buffer().parse(binary);
    expect([address, answer.status]).toEqual([address, 200]);
    found.set(address, Buffer.concat([Buffer.from(JSON.stringify(answer.headers)), answer.body]));
  }
  return found;
}

describe('the search', () => {
  it('finds each word in each form, at whatever place', () => {
    expect(wordsIn(canaryFile(), canaryWords)).toEqual(canaryWords);
    for (const word of canaryWords) {
      for (let shift = 0; shift < 3; shift++) {
        const around = Buffer.from(`${'·'.repeat(shift)}x${'y'.repeat(shift)}${word}zz`);
        expect(wordsIn(Buffer.from(around.toString('base64')), [word])).toEqual([word]);
        expect(wordsIn(Buffer.from(around.toString('latin1'), 'utf16le').swap16(), [word])).toEqual([word]);
      }
    }
    expect(wordsIn(Buffer.from('Ghosts over the liver, 512 × 512'), canaryWords)).toEqual([]);
  });
});

describe.each(doors)('a file that comes in by $title', ({ send }) => {
  let application: Application;
  let images: { id: string }[];
  beforeAll(async () => {
    application = await openApplication();
    images = await send(application, canaryFile(), fileName);
  });
  afterAll(() => application.close());

  it('becomes an image', () => {
    expect(images).toHaveLength(1);
  });

  it('tells nothing in the answer, nor in what can be asked and exported afterwards', async () => {
    expect(wordsIn(Buffer.from(JSON.stringify(images)), everyWord)).toEqual([]);
    for (const [address, bytes] of await exportsOf(application, images[0]?.id ?? '')) {
      expect([address, wordsIn(bytes, everyWord)]).toEqual([address, []]);
    }
  });

  it('leaves nothing in the database', async () => {
    const rows = await dump(application);
    expect(rows.includes(images[0]?.id ?? '')).toBe(true);
    expect(wordsIn(rows, everyWord)).toEqual([]);
  });

  it('leaves nothing in the objects, neither in their bytes nor in their names', async () => {
    const objects = await application.objectBytes();
    expect(objects.length).toBeGreaterThan(0);
    for (const bytes of objects) expect(wordsIn(bytes, everyWord)).toEqual([]);
    expect(wordsIn(Buffer.from((await application.objectNames()).join()), everyWord)).toEqual([]);
  });

  it('leaves nothing in the log', () => {
    expect(application.logged().length).toBeGreaterThan(100);
    expect(wordsIn(Buffer.from(application.logged()), everyWord)).toEqual([]);
  });

  it('leaves nothing when it is refused, but the name to whom it came from', async () => {
    const agent = await application.as('technologist');
    for (const file of [canaryFile(inLongIntegers), canaryFile().subarray(0, 3000), Buffer.from(`no image of ${surname}`)]) {
      const refused = await agent.post('/api/images').attach('files', file, fileName);
      expect([refused.status, refused.body.refused[0].name]).toEqual([422, fileName]);
      expect(wordsIn(Buffer.from(refused.body.refused[0].reason), everyWord)).toEqual([]);
    }
    const kept = Buffer.concat([await dump(application), Buffer.from(application.logged()), ...(await application.objectBytes())]);
    expect(wordsIn(kept, everyWord)).toEqual([]);
  });
});

/** Uploads through the whole door: what is refused is named with its reason, and nothing of it is kept. */
import { openApplication, type Application } from './application';
import { discFile, headFile, scanAttributes } from './files';

let application: Application;
beforeAll(async () => {
  application = await openApplication({ variables: { UPLOAD_FILE_MIB: '1', UPLOAD_TOTAL_MIB: '2', UPLOAD_FILES: '4' } });
});
afterAll(() => application.close());

/** How much there is of everything that an upload may leave behind. */
async function kept() {
  const [row] = await application.deps.sql<{ images: number; events: number }[]>`
    select (select count(*) from images)::int as images, (select count(*) from timeline_events)::int as events`;
  if (row === undefined) throw new Error('nothing was counted');
  return { ...row, objects: (await application.objectNames()).length };
}

async function upload(...files: [bytes: Buffer, name: string][]) {
  const agent = await application.as('technologist');
  const sending = agent.post('/api/images');
  for (const [bytes, name] of files) sending.attach('files', bytes, name);
  return sending;
}

/** A file whose header claims 65535 × 65535 pixels over a few thousand bytes of them. */
const claim = () =>
  discFile({
    extra: [
      { tag: '0028,0010', vr: 'US', value: 65535 },
      { tag: '0028,0011', vr: 'US', value: 65535 },
    ],
  });

describe('a file that cannot be taken', () => {
  it.each<[string, () => Buffer, string]>([
    ['that is empty', () => Buffer.alloc(0), 'empty'],
    ['that was cut off in its pixels', () => discFile().subarray(0, 1500), 'truncated'],
    ['of text under the name of an image', () => Buffer.from('TR 500 ms, TE 12 ms, and the ghosts again.\n'.repeat(9)), 'not-dicom'],
    ['that claims 65535 × 65535 pixels', claim, 'size'],
    ['without pixel data', () => discFile({ without: ['7FE0,0010'] }), 'no-pixels'],
    ['that mixes components', () => discFile({ attributes: { complexImageComponent: 'MIXED' } }), 'not-magnitude'],
    ['over the limit', () => Buffer.concat([discFile(), Buffer.alloc(1024 * 1024)]), 'too-large'],
  ])('%s is refused with its reason, and nothing is kept', async (_what, file, code) => {
    const before = await kept();
    const answer = await upload([file(), 'IM_0001.dcm']);
    expect(answer.status).toBe(422);
    expect(answer.body).toEqual({ images: [], refused: [{ name: 'IM_0001.dcm', code, reason: expect.stringMatching(/\w.{20,}/) }] });
    expect(await kept()).toEqual(before);
  });

  it('does not keep the others from being taken, in their order', async () => {
    const other = discFile({ rows: 24, columns: 40 });
    const answer = await upload([discFile(), 'a'], [Buffer.from('no'), 'b'], [other, 'c']);
    expect(answer.status).toBe(201);
    expect(answer.body.images.map(({ rows, columns }: { rows: number; columns: number }) => [rows, columns])).toEqual([
      [32, 32],
      [24, 40],
    ]);
    expect(answer.body.refused.map(({ name }: { name: string }) => name)).toEqual(['b']);
  });
});

describe('an upload that cannot be taken as a whole', () => {
  it('says so at the field when there is no file, or another field', async () => {
    const agent = await application.as('technologist');
    const none = await agent.post('/api/images').field('note', 'nothing').expect(400);
    expect(none.body.issues[0].path).toEqual(['files']);
    const elsewhere = await agent.post('/api/images').attach('picture', discFile(), 'x').expect(400);
    expect(elsewhere.body.issues[0].path).toEqual(['files']);
    const json = await agent.post('/api/images').send({ files: [] }).expect(400);
    expect(json.body.issues[0].path).toEqual(['files']);
  });

  it('is too large when there are more files than the limit, or more bytes', async () => {
    const before = await kept();
    const many = await upload(...Array.from({ length: 5 }, (_, i): [Buffer, string] => [discFile(), `${i}`]));
    expect([many.status, many.body.code]).toEqual([413, 'too-large']);
    const large = Buffer.alloc(900 * 1024);
    const heavy = await upload([large, 'a'], [large, 'b'], [large, 'c']);
    expect([heavy.status, heavy.body.code]).toEqual([413, 'too-large']);
    expect(await kept()).toEqual(before);
  });
});

describe('two uploads at once', () => {
  it('both arrive whole, and equal values are kept once', async () => {
    const before = await kept();
    const [one, two] = await Promise.all([upload([headFile(), 'a']), upload([headFile(), 'b'])]);
    expect([one.status, two.status]).toEqual([201, 201]);
    expect(one.body.images[0].id).not.toBe(two.body.images[0].id);
    const after = await kept();
    expect(after).toEqual({ ...before, images: before.images + 2, objects: before.objects + 1 });
  });
});

describe('the identity of a patient', () => {
  const planted = [
    'QUILLFEATHER^AMARANTHA',
    'PAT-7741-ZZ',
    '19610413',
    'Dr Ravensbourne',
    'ACC-55120',
    'KNEES OF MR BRAMBLEBY',
    'WARD-NINE-X',
  ];
  const [name, id, birth, physician, accession, comment, bed] = planted as [string, string, string, string, string, string, string];
  const fileName = 'Brambleby_Quillfeather_1961.dcm';

  it('is nowhere: not in the answer, the database, the objects or the log', async () => {
    const file = discFile({
      attributes: scanAttributes,
      extra: [
        { tag: '0010,0010', vr: 'PN', value: name },
        { tag: '0010,0020', vr: 'LO', value: id },
        { tag: '0010,0030', vr: 'DA', value: birth },
        { tag: '0008,0090', vr: 'PN', value: physician },
        { tag: '0008,0050', vr: 'SH', value: accession },
        { tag: '0020,4000', vr: 'LT', value: comment },
        { tag: '0009,1001', vr: 'LO', value: bed },
        { tag: '0008,0020', vr: 'DA', value: '20260214' },
      ],
    });
    // What is looked for is in the file, or the search below proves nothing.
    for (const word of planted) expect(file.includes(word)).toBe(true);

    const answer = await upload([file, fileName], [Buffer.from('no image'), `refused-${fileName}`]);
    expect(answer.status).toBe(201);
    const [image] = answer.body.images;
    expect(image.deidentification.removed).toEqual(expect.arrayContaining(['0010,0010', '0010,0020', '0010,0030', '0008,0090']));
    // A refusal names the file to the one who sent it, and to nobody else.
    expect(answer.body.refused[0].name).toBe(`refused-${fileName}`);

    const everyWord = [...planted, '20260214', 'Brambleby', 'Quillfeather'];
    const places = { images: JSON.stringify(image), database: await dump(), log: application.logged() };
    for (const [place, text] of Object.entries(places)) {
      for (const word of everyWord) {
        expect([place, word, text.includes(word)]).toEqual([place, word, false]);
      }
    }
    for (const bytes of await application.objectBytes()) {
      for (const word of everyWord) expect(bytes.includes(word)).toBe(false);
    }
    expect(places.database).toContain(image.id);
    expect(places.log).toContain('/api/images');
  });

  /** Every row of every table as text. */
  async function dump(): Promise<string> {
    const { sql } = application.deps;
    const tables = await sql<{ name: string }[]>`select table_name as name from information_schema.tables where table_schema = 'public'`;
    const rows = await Promise.all(tables.map(({ name: table }) => sql`select t::text as row from ${sql(table)} t`));
    return rows
      .flat()
      .map(({ row }) => String(row))
      .join('\n');
  }
});

/**
 * A series in an archive: its files go through the same door, and nothing of an archive is believed. Bombs after Fifield, A better zip bomb
 * (WOOT 2019): one entry that unfolds a thousandfold, many entries, entries that share their bytes, an archive in an archive.
 */
import { openApplication, type Application } from './application';
import { discFile, headFile } from './files';
import { zipOf, type FileToPack } from './zip-archive';

let application: Application;
beforeAll(async () => {
  application = await openApplication({ variables: { UPLOAD_FILE_MIB: '4' } });
});
afterAll(() => application.close());

async function send(archive: Buffer) {
  const agent = await application.as('technologist');
  return agent.post('/api/images').attach('files', archive, 'series.zip');
}

const slice = (image: number): FileToPack => ({
  name: `DICOM/S1/IM${image}`,
  bytes: discFile({ uids: { study: '2.25.800', series: '2.25.801', image: `2.25.802${image}` }, attributes: { instanceNumber: image } }),
});

const codesOf = (refused: { name: string; code: string }[]) => refused.map(({ name, code }) => [name, code]);

it('every file of an archive is taken, deflated or stored, in its order; a refused one is named like a refused file', async () => {
  const files = [
    slice(1),
    { ...slice(2), stored: true },
    { name: 'DICOM/', bytes: Buffer.alloc(0) },
    { name: 'DICOM/report.txt', bytes: Buffer.from('no') },
  ];
  const answer = await send(zipOf(files));
  expect(answer.status).toBe(201);
  expect(
    answer.body.images.map(({ acquisition }: { acquisition: { instanceNumber: { value: number } } }) => acquisition.instanceNumber.value),
  ).toEqual([1, 2]);
  expect(codesOf(answer.body.refused)).toEqual([['report.txt', 'not-dicom']]);
});

it('the same file is the same, sent alone or in an archive', async () => {
  const agent = await application.as('technologist');
  const alone = await agent.post('/api/images').attach('files', headFile(), 'one').expect(201);
  const packed = await send(zipOf([{ name: 'one', bytes: headFile() }]));
  const { id: _alone, ...first } = alone.body.images[0];
  const { id: _packed, ...second } = packed.body.images[0];
  expect(second).toEqual(first);
});

describe('names that are paths', () => {
  it('are shown by their last part and lead nowhere', async () => {
    const names = ['../../../../etc/passwd', '/etc/shadow', 'C:\\Windows\\win.ini', '..'];
    const answer = await send(zipOf(names.map((name) => ({ name, bytes: Buffer.from('no image') }))));
    expect(answer.status).toBe(422);
    expect(answer.body.refused.map(({ name }: { name: string }) => name)).toEqual(['passwd', 'shadow', 'win.ini', '..']);
  });
});

describe('a file that is not unpacked', () => {
  const good = slice(9);
  it.each<[string, () => FileToPack, string]>([
    ['because it is encrypted', () => ({ ...slice(3), encrypted: true }), 'encrypted'],
    ['because it unfolds to more than 200 times its size', () => ({ name: 'x', bytes: Buffer.alloc(3 * 1024 * 1024) }), 'archive'],
    ['because it says that it is larger than a file may be', () => ({ ...slice(3), says: { size: 5 * 1024 * 1024 } }), 'too-large'],
    ['because it is longer than it says', () => ({ ...slice(3), says: { size: 900 } }), 'archive'],
    ['because it is shorter than it says', () => ({ ...slice(3), says: { size: 3000 } }), 'archive'],
    ['because its check sum is another', () => ({ ...slice(3), says: { crc: 1 } }), 'archive'],
    ['because it is an archive', () => ({ name: 'x', bytes: zipOf([slice(3)]) }), 'archive'],
  ])('%s is refused, and the others are taken', async (_why, file, code) => {
    const objects = (await application.objectNames()).length;
    const answer = await send(zipOf([file(), good]));
    expect(answer.status).toBe(201);
    expect(answer.body.refused).toEqual([{ name: expect.any(String), code, reason: expect.stringMatching(/\w.{20,}/) }]);
    expect(answer.body.images).toHaveLength(1);
    // The good one has the same pixels each time.
    expect((await application.objectNames()).length - objects).toBeLessThanOrEqual(1);
  });
});

describe('an archive that is not opened', () => {
  const many = () => zipOf(Array.from({ length: 2001 }, (_, i) => ({ name: `${i}`, bytes: Buffer.alloc(0), stored: true })));
  const shared = () => zipOf([slice(1), { ...slice(2), says: { offset: 0 } }]);
  const whole = () => zipOf([slice(1), slice(2)]);
  const large = () => zipOf(Array.from({ length: 400 }, (_, i) => ({ ...slice(i), says: { size: 4 * 1024 * 1024 } })));
  it.each<[string, () => Buffer]>([
    ['because it lists more than 2000 files', many],
    ['because two of its files are the same bytes', shared],
    ['because it was cut off', () => whole().subarray(0, -30)],
    ['because it says that it unfolds to more than 1024 MB', large],
    ['because its list begins elsewhere', () => Buffer.concat([whole().subarray(0, 40), whole().subarray(44)])],
    ['because it is empty', () => Buffer.concat([Buffer.from('PK\u0003\u0004'), zipOf([])])],
  ])('%s is refused whole', async (_why, archive) => {
    const before = await application.objectNames();
    const answer = await send(archive());
    expect(answer.status).toBe(422);
    expect(answer.body).toEqual({
      images: [],
      refused: [{ name: 'series.zip', code: 'archive', reason: expect.stringMatching(/\w.{10,}/) }],
    });
    expect(await application.objectNames()).toEqual(before);
  });
});

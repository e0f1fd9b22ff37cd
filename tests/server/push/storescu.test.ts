/** The DICOM node with dcmtk as the scanner: what is let in, what is taken, what is refused and how that is said. */
import request from 'supertest';
import type { DicomNode } from '../../../server/push/dicom-node';
import { openApplication, type Application } from '../application';
import { discFile } from '../files';
import { allow, answers, echo, headPaths, openFolder, openNode, ownTitle, pageOf, send } from './scanner-tools';

let application: Application;
let node: DicomNode;
let folder: Awaited<ReturnType<typeof openFolder>>;

beforeAll(async () => {
  application = await openApplication({ variables: { UPLOAD_FILE_MIB: '1' } });
  node = await openNode(application);
  folder = await openFolder();
});
beforeEach(async () => {
  await application.deps.sql`delete from images`;
  await application.deps.sql`delete from scanner_push`;
  await allow(application);
});
afterAll(async () => {
  await node.close();
  await application.close();
  await folder.remove();
});

describe('a scanner that is on the list', () => {
  it('has its C-ECHO answered', async () => {
    expect((await echo(node)).text).toContain('Received Echo Response (Success)');
  });

  it('sends the 20 slices of a head into its inbox, one series, as nobody and on no case', async () => {
    const sent = await send(node, await headPaths());
    expect(answers(sent)).toEqual({ success: 20, other: 0 });
    const { inbox, push } = await pageOf(application);
    expect([inbox.total, inbox.series.length, inbox.series[0].images.length]).toEqual([20, 1, 20]);
    expect(push.received.count).toBe(20);
    expect(push.refused).toEqual({ count: 0, lastAt: null, last: null });
    const rows = await application.deps.sql`select distinct arrival, uploader_id, scanner_id from images`;
    expect([...rows]).toEqual([{ arrival: 'scanner', uploader_id: null, scanner_id: application.own.scannerId }]);
  });

  it('may send the same files again: they are not there twice', async () => {
    const paths = (await headPaths()).slice(-3);
    await send(node, paths);
    expect(answers(await send(node, paths))).toEqual({ success: 3, other: 0 });
    expect((await pageOf(application)).inbox.total).toBe(3);
  });

  it('has an object of another modality refused with status 0122 and the code in the comment', async () => {
    const path = await folder.put('ct.dcm', discFile({ attributes: { modality: 'CT' } }));
    const sent = await send(node, [path], { more: ['-d', '+II'] });
    expect(answers(sent)).toEqual({ success: 0, other: 1 });
    expect(sent.text).toContain('0x0122');
    expect(sent.text).toContain('refused: not-mr');
    const { push, inbox } = await pageOf(application);
    expect([push.refused.count, push.refused.last, inbox.total]).toEqual([1, 'not-mr', 0]);
  });

  it('has an object over the limit refused with A700, and the next one taken in the same association', async () => {
    // 800 × 800 of 16 bits are 1.28 MB; the limit is 1 MB.
    const large = await folder.put('a-large.dcm', discFile({ rows: 800, columns: 800 }));
    const [small = ''] = (await headPaths()).slice(-1);
    const sent = await send(node, [large, small], { more: ['-d', '-nh'] });
    expect(answers(sent)).toEqual({ success: 1, other: 1 });
    expect(sent.text).toContain('0xa700');
    const { push, inbox } = await pageOf(application);
    expect([push.refused.last, inbox.total]).toEqual(['too-large', 1]);
  });
});

describe('whoever is not on the list', () => {
  // PS3.8 table 9-21: source 1, reasons 3 and 7; the words are dcmtk's.
  it.each([
    [
      'with another AE title is rejected: calling AE title not recognised',
      { calling: 'STRANGER' },
      'Calling AE Title Not Recognized',
      'calling-title',
    ],
    [
      'that asks for another node is rejected: called AE title not recognised',
      { called: 'ELSEWHERE' },
      'Called AE Title Not Recognized',
      'called-title',
    ],
  ])('%s', async (_name, titles, words, code) => {
    const sent = await send(node, (await headPaths()).slice(-1), titles);
    expect(sent.code).not.toBe(0);
    expect(sent.text).toContain(words);
    const { push, inbox } = await pageOf(application);
    expect([push.refused.last, inbox.total]).toEqual([code, 0]);
  });

  it('with the right title from another address is rejected', async () => {
    await allow(application, { addresses: ['10.1.2.3', '10.9.0.0/16'] });
    expect((await echo(node)).text).toContain('Calling AE Title Not Recognized');
    expect((await pageOf(application)).push.refused.last).toBe('address');
  });

  it('is nobody at all while no address is set', async () => {
    await allow(application, { addresses: [] });
    expect((await echo(node)).text).toContain('Association Rejected');
  });
});

it('takes 200 images in one association while it answers others, and prints the pace', async () => {
  const paths: string[] = [];
  for (let i = 0; i < 200; i++) {
    paths.push(await folder.put(`${i}.dcm`, discFile({ rows: 256, columns: 256, attributes: { echoTime: 10 + i / 10 } })));
  }
  const before = performance.now();
  const sending = send(node, paths);
  let longest = 0;
  let sent = false;
  void sending.then(() => (sent = true));
  while (!sent) {
    const asked = performance.now();
    await request(application.app).get('/api/health').expect(200);
    longest = Math.max(longest, performance.now() - asked);
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
  expect(answers(await sending)).toEqual({ success: 200, other: 0 });
  const seconds = (performance.now() - before) / 1000;
  process.stderr.write(`200 images of 256 × 256 by storescu: ${(200 / seconds).toFixed(1)} images/s; health ≤ ${longest.toFixed(0)} ms\n`);
  expect((await pageOf(application)).inbox.total).toBe(200);
  // A person notices a second; two busy cores take a good part of that by themselves.
  expect(longest).toBeLessThan(1000);
});

it('leaves what was whole, and nothing else, of an association that is aborted', async () => {
  // --abort ends the association with an A-ABORT in the place of a release.
  const sent = await send(node, (await headPaths()).slice(-5), { more: ['--abort'] });
  expect(answers(sent).success).toBe(5);
  expect((await pageOf(application)).inbox.total).toBe(5);
  expect((await echo(node, { called: ownTitle })).text).toContain('Success');
});

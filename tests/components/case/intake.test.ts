/** Sending a series: batches, what is asked and sent after a lost connection, what is said of refusals, and what is proposed for the case. */
import { ApiProblem, noAnswer } from '@/components/api/api-problem';
import { batchesOf, batchLimits, sumRefusals } from '@/components/case/intake/batches';
import { groupsOf } from '@/components/case/intake/draft-images';
import { fileToSend, type FileToSend } from '@/components/case/intake/file-to-send';
import { progressSentence } from '@/components/case/intake/intake-progress';
import { propose } from '@/components/case/intake/propose';
import { sendSeries, type Line } from '@/components/case/intake/send-series';
import type { Image, Refusal } from '@/server/contract/images';
import type { Slice } from '@/server/contract/series';

const file = (name: string, size = 10): FileToSend => ({ ...fileToSend(new File([name], name)), size });
const files = (count: number): FileToSend[] => Array.from({ length: count }, (_, i) => file(`f${i}`));
const refusal = (name: string, code: Refusal['code'] = 'not-dicom'): Refusal => ({ name, code, reason: `why ${name} is not taken` });

describe('batches', () => {
  test('hold at most 16 files, in their order, and none is lost', () => {
    const batches = batchesOf(files(40));
    expect(batches.map(({ length }) => length)).toEqual([16, 16, 8]);
    expect(batches.flat().map(({ name }) => name)).toEqual(files(40).map(({ name }) => name));
  });

  test('hold at most 24 MB; a larger file goes alone', () => {
    const third = batchLimits.bytes / 3;
    const sizes = [third, third, third, third, 2 * batchLimits.bytes, 10];
    expect(batchesOf(sizes.map((size, i) => file(`${i}`, size))).map((batch) => batch.map(({ name }) => name))).toEqual([
      ['0', '1', '2'],
      ['3'],
      ['4'],
      ['5'],
    ]);
  });
});

test('refusals are summed up by reason, the most frequent first', () => {
  const refused = [refusal('DICOMDIR', 'not-mr'), refusal('a.txt'), refusal('b.txt'), refusal('c.txt')];
  expect(sumRefusals(refused)).toEqual([
    { code: 'not-dicom', count: 3, reason: 'why a.txt is not taken' },
    { code: 'not-mr', count: 1, reason: 'why DICOMDIR is not taken' },
  ]);
});

test('progress counts files that have arrived', () => {
  expect(progressSentence({ settled: 142.6, count: 200, state: 'sending' })).toBe('142 of 200 slices');
  expect(progressSentence({ settled: 142, count: 200, state: 'paused' })).toBe('142 of 200 slices, paused');
});

/** A server that keeps what it was sent under the file's name, and a line to it that breaks where a test says. */
function server(breaks: ('before' | 'after' | undefined)[] = [], { canDigest = true } = {}) {
  const kept = new Map<string, string>();
  const sent: string[][] = [];
  let waits = 0;
  const line: Line = {
    async send(lot) {
      const fault = breaks.shift();
      sent.push(lot.map(({ name }) => name));
      if (fault === 'before') throw noAnswer();
      for (const { name } of lot) kept.set(name, `image of ${name}`);
      if (fault === 'after') throw noAnswer();
      return { images: lot.map(({ name }) => ({ id: `image of ${name}` }) as Image), refused: [] };
    },
    findSent: async (digests) =>
      new Map(
        digests.flatMap((digest): [string, string[]][] => {
          const image = kept.get(digest);
          return image === undefined ? [] : [[digest, [image]]];
        }),
      ),
    digest: canDigest ? async (blob) => (blob as File).name : undefined,
    untilRetry: async () => void waits++,
    untilWanted: async () => undefined,
  };
  return { line, sent, waits: () => waits };
}

async function run(count: number, line: Line) {
  const imageIds: string[] = [];
  const refused: Refusal[] = [];
  const settled: number[] = [];
  let lost = 0;
  await sendSeries(files(count), line, {
    onProgress: (done) => settled.push(done),
    onArrived: (result) => {
      imageIds.push(...result.imageIds);
      refused.push(...result.refused);
    },
    onLost: () => lost++,
  });
  return { imageIds, refused, settled, lost };
}

const imagesOfAll = (count: number) => files(count).map(({ name }) => `image of ${name}`);

describe('after a lost connection', () => {
  test('a batch that did not arrive is sent again, by itself', async () => {
    const { line, sent, waits } = server([undefined, 'before', 'before']);
    const { imageIds, lost, settled } = await run(20, line);
    expect(imageIds).toEqual(imagesOfAll(20));
    expect(sent.map(({ length }) => length)).toEqual([16, 4, 4, 4]);
    expect([lost, waits()]).toEqual([2, 2]);
    expect(settled.at(-1)).toBe(20);
  });

  test('a batch that arrived, whose answer was lost, is not sent again', async () => {
    const { line, sent } = server(['after']);
    const { imageIds } = await run(20, line);
    expect(imageIds).toEqual(imagesOfAll(20));
    expect(sent.map(({ length }) => length)).toEqual([16, 4]);
  });

  test('after a reload, only the rest of the same folder is sent', async () => {
    const { line, sent } = server();
    await run(18, line);
    sent.length = 0;
    const { imageIds } = await run(20, line);
    expect(imageIds).toEqual(imagesOfAll(20));
    expect(sent).toEqual([['f18', 'f19']]);
  });

  test('without digests the batch is sent again', async () => {
    const { line, sent } = server(['after'], { canDigest: false });
    await run(20, line);
    expect(sent.map(({ length }) => length)).toEqual([16, 16, 4]);
  });

  test('what the server refuses as a whole is not tried again', async () => {
    const { line } = server();
    const broken: Line = { ...line, send: () => Promise.reject(new ApiProblem('too-large', 413, 'Too much was sent')) };
    await expect(run(20, broken)).rejects.toThrow('Too much was sent');
  });
});

test('a file that cannot be unpacked is refused here and does not hold up the others', async () => {
  const { line, sent } = server();
  const refused: Refusal[] = [];
  const packed: FileToSend = { name: 'x', size: 5, open: async () => refusal('x', 'encrypted') };
  await sendSeries([file('a'), packed, file('b')], line, {
    onProgress: () => undefined,
    onArrived: (result) => refused.push(...result.refused),
    onLost: () => undefined,
  });
  expect(sent).toEqual([['a', 'b']]);
  expect(refused).toEqual([refusal('x', 'encrypted')]);
});

const slices = (...imageIds: string[]): Slice[] =>
  imageIds.map((imageId, i) => ({ imageId, frame: 0, positionMm: i, timeOfDay: null, label: null }));

describe('of what came in', () => {
  const series = slices('a', 'b', 'c', 'd', 'e', 'f', 'g');
  const read = async () => series;
  const came = (...ids: string[]) =>
    ids.map((id) => ({ id, series: id === 'x' ? null : 'head', component: 'magnitude' as const, rows: 256, columns: 256 }));

  test('the middle slice of a whole series is proposed, whatever the order in which it came', async () => {
    expect(await propose(came('g', 'c', 'a', 'b', 'd', 'f', 'e'), [], read)).toEqual(['d']);
  });

  test('so it is of a series that somebody else has sent before', async () => {
    expect(await propose(came('g2', 'c2', 'a2', 'b2', 'd2', 'f2', 'e2'), [], read)).toEqual(['d']);
  });

  test('a few pictures are all meant', async () => {
    expect(await propose(came('f', 'x', 'a'), [], read)).toEqual(['f', 'a', 'x']);
  });

  test('a series of which a slice is chosen already is left as it is', async () => {
    expect(await propose(came('a', 'c', 'd', 'e', 'f', 'g'), ['b'], read)).toEqual([]);
  });
});

test('images of one series stand on one card, a single one on its own', () => {
  const series = slices('a', 'b', 'c');
  const groups = groupsOf(['b', 'x', 'a'], (id) => (id === 'x' ? slices('x') : series));
  expect(groups).toEqual([
    { slices: series, chosen: ['b', 'a'] },
    { slices: [], chosen: ['x'] },
  ]);
});

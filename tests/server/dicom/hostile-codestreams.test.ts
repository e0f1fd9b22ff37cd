/**
 * Compressed frames that are cut, damaged or lie about their size: each is refused, or gives a sound image, soon, and nothing is
 * thrown. All random choices are seeded. The time is that of the processor, so that other work on the machine does not count.
 */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { array, assert, boolean, integer, property, record } from 'fast-check';
import { refusalCodes } from '../../../server/contract/images';
import { openDecoders, type Decoders } from '../../../server/dicom/codecs/decoders';
import { joined } from '../../../server/dicom/elements';
import { parse } from '../../../server/dicom/parse';
import { readDicom, type Read } from '../../../server/dicom/read';
import { isRefused } from '../../../server/dicom/refusal';
import { encapsulatedFile, sized } from './made-encapsulated';
import { key } from './made-image';

const seed = 20261201;
jest.setTimeout(120_000);

let decoders: Decoders;
beforeEach(async () => {
  decoders = await openDecoders();
});

/** What the issue allows one file. */
const longestMicroseconds = 2_000_000;

function read(file: Uint8Array): Read {
  const before = process.cpuUsage();
  const outcome = readDicom(file, key, decoders);
  const { user, system } = process.cpuUsage(before);
  expect(user + system).toBeLessThan(longestMicroseconds);
  return outcome;
}

function expectSound(file: Uint8Array): void {
  const outcome = read(file);
  if ('refused' in outcome) {
    expect(refusalCodes).toContain(outcome.refused.code);
    return;
  }
  const [image] = outcome.accepted;
  expect(image?.values).toHaveLength(256 * 256);
  expect(image?.values.every(Number.isFinite)).toBe(true);
}

/** The codestream of a file and all that is needed to wrap a changed one. */
function codestreamOf(name: string) {
  const parsed = parse(new Uint8Array(readFileSync(join(__dirname, '../../reference/dicom', `${name}.dcm`))));
  if (isRefused(parsed)) throw new Error(parsed.refused.reason);
  const bits = parsed.dataSet.uint16('x00280101') ?? 0;
  const attributes = sized(256, 256, bits, parsed.dataSet.uint16('x00280103') === 1);
  const transferSyntax = parsed.dataSet.elements.x00020010;
  const bytes = joined((parsed.items?.fragments ?? []).map((fragment) => fragment.bytes));
  const syntax = String.fromCharCode(
    ...parsed.dataSet.byteArray.subarray(transferSyntax?.dataOffset, (transferSyntax?.dataOffset ?? 0) + (transferSyntax?.length ?? 0)),
  );
  return {
    bytes,
    wrap: (codestream: Uint8Array) => encapsulatedFile({ transferSyntax: syntax.replace(/\0/, ''), fragments: [codestream], attributes }),
  };
}

const names = [
  'rle',
  'jpeg-lossless-process-14',
  'jpeg-lossless-first-order',
  'jpeg-ls',
  'jpeg-ls-near-lossless',
  'jpeg-2000',
  'high-throughput',
  'jpeg-baseline',
];

describe.each(names)('%s', (name) => {
  const { bytes, wrap } = codestreamOf(name);

  test('whole, it is accepted', () => {
    expect(read(wrap(bytes))).toHaveProperty('accepted');
  });

  test('cut at 60 lengths, it is refused', () => {
    const law = property(integer({ min: 0, max: bytes.length - 8 }), (length) => {
      expect(read(wrap(bytes.slice(0, length)))).toHaveProperty('refused');
    });
    assert(law, { seed, numRuns: 60 });
  });

  test('cut, with an end marker behind the cut, it is refused too', () => {
    const law = property(integer({ min: 0, max: bytes.length - 8 }), (length) => {
      expect(read(wrap(joined([bytes.slice(0, length), Uint8Array.of(0xff, 0xd9)])))).toHaveProperty('refused');
    });
    assert(law, { seed, numRuns: 60 });
  });

  test('with flipped bits, in its header or anywhere, it is refused or sound', () => {
    const flips = record({
      inHeader: boolean(),
      places: array(integer({ min: 0, max: 8 * bytes.length - 1 }), { minLength: 1, maxLength: 6 }),
    });
    const law = property(flips, ({ inHeader, places }) => {
      const changed = bytes.slice();
      for (const place of places) {
        const at = inHeader ? place % 1600 : place;
        changed[at >> 3] = (changed[at >> 3] ?? 0) ^ (1 << (at & 7));
      }
      expectSound(wrap(changed));
    });
    assert(law, { seed, numRuns: 100 });
  });
});

test.each(names.filter((name) => name !== 'rle'))('%s: a header of another size is refused as size', (name) => {
  const { bytes, wrap } = codestreamOf(name);
  const file = wrap(bytes);
  // Rows (0028,0010) of 256, written as explicit little endian.
  const rows = [0x28, 0, 0x10, 0, 0x55, 0x53, 2, 0, 0, 1];
  const at = file.findIndex((_, index) => rows.every((byte, i) => file[index + i] === byte));
  file.set([0xff, 0], at + 8);
  expect(read(file)).toMatchObject({ refused: { code: 'size' } });
});

/**
 * Damaged files: cut anywhere, bits flipped, sizes and depths out of all reason. Reading never throws and never hangs; what is cut
 * is refused, and what is accepted is whole and fits the contract. All random choices are seeded.
 */
import dicomParser from 'dicom-parser';
import { array, assert, integer, property, uint8Array } from 'fast-check';
import { scanFactsSchema } from '../../../server/contract/facts';
import { refusalCodes, warningSchema } from '../../../server/contract/images';
import { encodeElements, joined, type ElementToWrite } from '../../../server/dicom/elements';
import { readDicom, type AcceptedImage } from '../../../server/dicom/read';
import { accepted, key, madeFile, refused, side } from './made-image';
import { realFile } from './real-files';

const seed = 20261201;

/** Thousands of files a test: seconds on an idle core, and other work may share it. A hang would still end here. */
jest.setTimeout(60_000);

/** An outcome is either a refusal of the closed list or an image that is consistent in itself. */
function expectSound(bytes: Uint8Array): void {
  const read = readDicom(bytes, key);
  if ('refused' in read) {
    expect(refusalCodes).toContain(read.refused.code);
    return;
  }
  expect(read.accepted.length).toBeGreaterThan(0);
  read.accepted.forEach(expectSoundImage);
}

function expectSoundImage({ rows, columns, frames, values, range, facts, frameFacts, warnings }: AcceptedImage): void {
  expect(values).toHaveLength(frames * rows * columns);
  expect(frameFacts).toHaveLength(frames);
  expect(values.every(Number.isFinite)).toBe(true);
  expect(range[1]).toBeGreaterThan(range[0]);
  scanFactsSchema.parse(facts);
  warnings.forEach((warning) => warningSchema.parse(warning));
}

/** A file with a sequence, a private group and odd texts, so that every way of reading an element is taken. */
const inner: ElementToWrite[] = [{ tag: '0008,1155', vr: 'UI', value: '2.25.9' }];
const extra: ElementToWrite[] = [
  { tag: '0008,1140', vr: 'SQ', value: [inner, [{ tag: '0040,A170', vr: 'SQ', value: [inner] }]] },
  { tag: '0009,0010', vr: 'LO', value: 'PRIVATE' },
  { tag: '0009,1001', vr: 'UN', value: Uint8Array.of(1, 2, 3) },
];
const attributes = { acquisitionMatrix: [0, 16, 16, 0], phaseEncodingDirection: 'ROW', repetitionTime: 500, pixelSpacing: [1, 1] };
const small = { explicit: madeFile({ attributes, extra }), implicit: madeFile({ attributes, extra, vrEncoding: 'implicit' }) };

describe('a file that is cut', () => {
  const codesOfCut = ['truncated', 'no-pixels', 'unreadable'];
  const nPixelBytes = 2 * side * side;

  test.each(['explicit', 'implicit'] as const)('%s VR: at no length it is accepted', (vrEncoding) => {
    const whole = small[vrEncoding];
    expectSound(whole);
    expect('accepted' in readDicom(whole, key)).toBe(true);
    for (let length = 1; length < whole.length; length++) expect(codesOfCut).toContain(refused(whole.slice(0, length)).code);
  });

  test.each(['explicit', 'implicit'] as const)('%s VR: within the pixels it is refused as truncated', (vrEncoding) => {
    const whole = small[vrEncoding];
    for (let missing = 1; missing <= nPixelBytes; missing++) expect(refused(whole.slice(0, -missing)).code).toBe('truncated');
  });

  test.each(['volume/brain_010.dcm', 'implicit_little.dcm'])('%s: at every tag boundary', (name) => {
    const whole = realFile(name);
    const boundaries = Object.values(dicomParser.parseDicom(whole).elements).map(({ dataOffset, length }) => dataOffset + length);
    expect(boundaries.length).toBeGreaterThan(80);
    for (const boundary of boundaries.filter((offset) => offset < whole.length)) {
      expect(codesOfCut).toContain(refused(whole.slice(0, boundary)).code);
    }
  });

  test('a head slice, at 200 random places', () => {
    const whole = realFile('volume/brain_010.dcm');
    const law = property(integer({ min: 1, max: whole.length - 1 }), (length) => {
      expect(codesOfCut).toContain(refused(whole.subarray(0, length)).code);
    });
    assert(law, { seed, numRuns: 200 });
  });
});

describe('bits that are flipped', () => {
  const flipped = (bytes: Uint8Array, places: readonly number[]): Uint8Array => {
    const copy = bytes.slice();
    for (const place of places) copy[place >> 3] = (copy[place >> 3] ?? 0) ^ (1 << (place & 7));
    return copy;
  };
  const flips = (bytes: Uint8Array, firstByte: number) =>
    array(integer({ min: 8 * firstByte, max: 8 * bytes.length - 1 }), { minLength: 1, maxLength: 12 });

  test.each(['explicit', 'implicit'] as const)('%s VR: anywhere behind the preamble', (vrEncoding) => {
    const law = property(flips(small[vrEncoding], 128), (places) => expectSound(flipped(small[vrEncoding], places)));
    assert(law, { seed, numRuns: 1500 });
  });

  test('a head slice: anywhere in its header', () => {
    const whole = realFile('volume/brain_010.dcm');
    const law = property(flips(whole.subarray(0, 1842), 128), (places) => expectSound(flipped(whole, places)));
    assert(law, { seed, numRuns: 150 });
  });
});

describe('bytes out of all reason', () => {
  test('noise behind a DICOM prefix', () => {
    const prefix = joined([new Uint8Array(128), new TextEncoder().encode('DICM')]);
    const law = property(uint8Array({ maxLength: 400 }), (noise) => expectSound(joined([prefix, noise])));
    assert(law, { seed, numRuns: 500 });
  });

  test('noise in place of the data set', () => {
    const meta = small.explicit.slice(0, 350);
    const law = property(uint8Array({ maxLength: 400 }), (noise) => expectSound(joined([meta, noise])));
    assert(law, { seed, numRuns: 500 });
  });

  test('fifty thousand sequences inside one another', () => {
    // Each opens a sequence and an item of undefined length and closes neither.
    const level = Uint8Array.of(0x08, 0, 0x40, 0x11, 0x53, 0x51, 0, 0, 0xff, 0xff, 0xff, 0xff, 0xfe, 0xff, 0, 0xe0, 0xff, 0xff, 0xff, 0xff);
    const meta = madeFile({ without: ['7FE0,0010'] });
    expect(['truncated', 'unreadable']).toContain(refused(joined([meta, ...Array<Uint8Array>(50_000).fill(level)])).code);
  });

  test('a sequence of undefined length that is never closed', () => {
    const open = Uint8Array.of(0x08, 0, 0x40, 0x11, 0x53, 0x51, 0, 0, 0xff, 0xff, 0xff, 0xff);
    expect(refused(joined([madeFile({ without: ['7FE0,0010'] }), open])).code).toBe('truncated');
  });

  test('pixels packed as if compressed under an uncompressed transfer syntax', () => {
    const packed = Uint8Array.of(0xe0, 0x7f, 0x10, 0, 0x4f, 0x42, 0, 0, 0xff, 0xff, 0xff, 0xff, 0xfe, 0xff, 0, 0xe0, 0, 0, 0, 0);
    const read = refused(joined([madeFile({ without: ['7FE0,0010'] }), packed]));
    expect(read).toMatchObject({ code: 'transfer-syntax', reason: expect.stringContaining('packed as if compressed') });
  });

  test('a value longer than any that a scanner writes is left out', () => {
    const imageType = (n: number) =>
      accepted(madeFile({ attributes: { imageType: Array<string>(n).fill('ORIGINAL') } })).facts.imageType.value;
    // Nine bytes a value: 113 of them end below 1024 bytes, 114 above.
    expect(imageType(113)).toContain('ORIGINAL');
    expect(imageType(114)).toBeNull();
  });

  test('a length of four gigabytes less one', () => {
    const claim = encodeElements([{ tag: '0043,1001', vr: 'OB', value: new Uint8Array(2) }]);
    claim.set([0xfe, 0xff, 0xff, 0xff], 8);
    expect(refused(joined([madeFile({ without: ['7FE0,0010'] }), claim])).code).toBe('truncated');
  });
});

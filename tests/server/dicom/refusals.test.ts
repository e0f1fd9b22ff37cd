/** What is not taken, each with the code and with a reason that says what to do. Attributes and their terms: DICOM PS3.3. */
import { joined } from '../../../server/dicom/elements';
import type { Attributes, ImageToWrite } from '../../../server/dicom/write';
import { accepted, madeFile, refused, side } from './made-image';

const text = (words: string) => new TextEncoder().encode(words);

describe('files that are no image', () => {
  test('an empty file', () => {
    expect(refused(new Uint8Array(0)).code).toBe('empty');
  });

  test.each([
    ['a short text', text('Image number 4 of the exam, see the other folder.')],
    ['a long text', text('Image number 4 of the exam. '.repeat(40))],
    ['a PNG picture', joined([Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10), new Uint8Array(200)])],
    ['zeros', new Uint8Array(500)],
  ])('%s renamed .dcm is not DICOM', (_, bytes) => {
    expect(refused(bytes).code).toBe('not-dicom');
  });

  test('a file that does not say how it is written cannot be read', () => {
    expect(refused(madeFile({ without: ['0002,0010'] })).code).toBe('unreadable');
  });

  test.each<[string, Partial<ImageToWrite>]>([
    ['a header without pixel data', { without: ['7FE0,0010'] }],
    ['pixel data of no length', { extra: [{ tag: '7FE0,0010', vr: 'OW', value: new Uint8Array(0) }] }],
  ])('%s holds no pixels', (_, changes) => {
    expect(refused(madeFile(changes)).code).toBe('no-pixels');
  });
});

describe('images of another kind', () => {
  const element = (tag: string, vr: string, value: string): Partial<ImageToWrite> => ({ extra: [{ tag, vr, value }] });
  test.each<[string, string, Attributes, Partial<ImageToWrite>?]>([
    ['not-mr', 'CT', { modality: 'CT', sopClass: '1.2.840.10008.5.1.4.1.1.2' }],
    ['not-mr', 'no modality', {}, { without: ['0008,0060'] }],
    ['not-mr', 'spectroscopy', { sopClass: '1.2.840.10008.5.1.4.1.1.4.2' }],
    ['not-mr', 'a private class of an MR scanner', { sopClass: '1.3.12.2.1107.5.9.1' }],
    ['burned-in-text', 'burned-in annotation', { burnedInAnnotation: 'YES' }],
    ['not-mr', 'a secondary capture of another modality', { modality: 'CT', sopClass: '1.2.840.10008.5.1.4.1.1.7' }],
    ['burned-in-text', 'a secondary capture with text in it', { sopClass: '1.2.840.10008.5.1.4.1.1.7', burnedInAnnotation: 'YES' }],
    [
      'colour',
      'a secondary capture in colour',
      { sopClass: '1.2.840.10008.5.1.4.1.1.7.4', photometricInterpretation: 'RGB', samplesPerPixel: 3 },
    ],
    ['not-mr', 'another modality that is no capture', { modality: 'OT' }],
    ['not-mr', 'a video of an endoscope', { modality: 'ES', sopClass: '1.2.840.10008.5.1.4.1.1.77.1.1.1' }],
    ['size', 'two frames of which one is there', { numberOfFrames: 2 }],
    ['mosaic', 'a mosaic of slices that does not say of how many', { imageType: ['ORIGINAL', 'PRIMARY', 'M', 'ND', 'MOSAIC'] }],
    ['colour', 'RGB', { photometricInterpretation: 'RGB', samplesPerPixel: 3 }],
    ['colour', 'a palette', { photometricInterpretation: 'PALETTE COLOR' }],
    ['colour', 'enhanced MR in colour', { sopClass: '1.2.840.10008.5.1.4.1.1.4.3' }],
    ['transfer-syntax', 'RLE', {}, element('0002,0010', 'UI', '1.2.840.10008.1.2.5')],
    ['transfer-syntax', 'an unknown transfer syntax', {}, element('0002,0010', 'UI', '1.2.3.4')],
    ['bit-depth', '32 bits', { bitsAllocated: 32, bitsStored: 32, highBit: 31 }],
    ['bit-depth', '1 bit', { bitsAllocated: 1, bitsStored: 1, highBit: 0 }],
    ['bit-depth', '7 bits stored', { bitsStored: 7, highBit: 6 }],
    ['bit-depth', '17 of 16 bits stored', { bitsStored: 17, highBit: 16 }],
    ['bit-depth', 'a high bit below the bits stored', { bitsStored: 12, highBit: 10 }],
    ['size', '65535 × 65535 pixels', { rows: 65535, columns: 65535 }],
    ['size', '4096 × 4096 pixels that are not there', { rows: 4096, columns: 4096 }],
    ['size', 'one row fewer than there are', { rows: side - 1 }],
    ['size', 'no rows', { rows: 0 }],
    ['size', 'silence about the rows', {}, { without: ['0028,0010'] }],
  ])('%s: %s', (code, _, attributes, changes = {}) => {
    const { code: given, reason } = refused(madeFile({ attributes, ...changes }));
    expect(given).toBe(code);
    expect(reason).toMatch(/^[A-Z].*\.$/);
  });

  test('the magnitude image itself is taken, also with the private number of a magnitude', () => {
    expect(accepted(madeFile()).component).toBe('magnitude');
    const attributes: Attributes = { imageType: ['ORIGINAL', 'PRIMARY', 'M'], complexImageComponent: 'MAGNITUDE' };
    expect(accepted(madeFile({ attributes: { ...attributes, geParametersCreator: 'GEMS_PARM_01', geImageKind: 0 } })).rows).toBe(side);
  });

  test('a 65535 × 65535 claim is refused before anything of that size is made', () => {
    const before = process.memoryUsage().arrayBuffers;
    refused(madeFile({ attributes: { rows: 65535, columns: 65535 } }));
    // The claim is 8 GB; the file itself is 1 kB.
    expect(process.memoryUsage().arrayBuffers - before).toBeLessThan(1e6);
  });
});

describe('data sets without preamble and file meta information', () => {
  const bare = (vrEncoding: 'explicit' | 'implicit') => {
    const whole = madeFile({ vrEncoding });
    const view = new DataView(whole.buffer, whole.byteOffset);
    // The group length of the meta information stands at 132 with a value of four bytes at 140.
    return whole.slice(144 + view.getUint32(140, true));
  };

  test.each(['explicit', 'implicit'] as const)('%s VR: read like the whole file', (vrEncoding) => {
    expect(accepted(bare(vrEncoding)).values).toEqual(accepted(madeFile({ vrEncoding })).values);
  });

  test('cut off, they are refused as truncated', () => {
    expect(refused(bare('implicit').slice(0, -1)).code).toBe('truncated');
  });
});

/** The writer, checked by two readers that know nothing of it: dicom-parser and daikon. */
import { Series } from 'daikon';
import dicomParser from 'dicom-parser';
import { encodeElements } from '../../../server/dicom/elements';
import { uidOf } from '../../../server/dicom/write';
import { madeFile, side, slope } from './made-image';

const attributes = {
  repetitionTime: 2300,
  echoTime: 1 / 3,
  phaseEncodingDirection: 'ROW',
  acquisitionMatrix: [0, 256, 192, 0],
  parallelReductionFactor: 2.5,
  pixelPaddingValue: -2,
  imageType: ['ORIGINAL', 'PRIMARY', 'M'],
};
const extra = [
  { tag: '0008,1140', vr: 'SQ', value: [[{ tag: '0008,1155', vr: 'UI', value: '2.25.77' }], []] },
  { tag: '0009,0010', vr: 'LO', value: 'odd' },
];

describe('read by dicom-parser', () => {
  test.each(['explicit', 'implicit'] as const)('%s VR: values, items and pixels are those that were given', (vrEncoding) => {
    const dataSet = dicomParser.parseDicom(madeFile({ attributes, extra, vrEncoding }));
    expect(dataSet.warnings).toEqual([]);
    expect(dataSet.floatString('x00180080')).toBe(2300);
    // A decimal string has 16 characters: nine digits and no more of one third.
    expect(dataSet.string('x00180081')).toBe('0.333333333');
    expect([0, 1, 2, 3].map((index) => dataSet.uint16('x00181310', index))).toEqual([0, 256, 192, 0]);
    expect(dataSet.double('x00189069')).toBe(2.5);
    expect(dataSet.int16('x00280120')).toBe(-2);
    expect(dataSet.string('x00080008')).toBe('ORIGINAL\\PRIMARY\\M');
    const items = dataSet.elements['x00081140']?.items ?? [];
    expect(items.map((item) => item.dataSet?.string('x00081155'))).toEqual(['2.25.77', undefined]);
    expect(dataSet.elements['x00090010']?.length).toBe(4);
    const pixels = dataSet.elements['x7fe00010'];
    expect(pixels?.length).toBe(2 * slope.length);
    expect(dataSet.uint16('x7fe00010', 200)).toBe(slope[200]);
  });

  test('the group length of the file meta information reaches to its end', () => {
    const file = madeFile();
    const dataSet = dicomParser.parseDicom(file);
    const groupLength = dataSet.uint32('x00020000') ?? NaN;
    expect(new DataView(file.buffer).getUint16(144 + groupLength, true)).toBe(0x0008);
    expect(dataSet.string('x00020003')).toBe(dataSet.string('x00080018'));
    expect(dataSet.string('x00020002')).toBe('1.2.840.10008.5.1.4.1.1.4');
  });
});

test('daikon decodes the pixels', () => {
  const file = madeFile({ attributes, extra });
  const image = Series.parseImage(new DataView(file.buffer));
  expect([image?.getRows(), image?.getCols()]).toEqual([side, side]);
  expect(image?.getInterpretedData(false, false)).toEqual(Float32Array.from(slope));
});

test('elements come in the order of their tags and have even lengths', () => {
  const bytes = encodeElements([
    { tag: '0018,0080', vr: 'DS', value: '1' },
    { tag: '0008,0060', vr: 'CS', value: 'MR' },
  ]);
  expect([...bytes]).toEqual([8, 0, 0x60, 0, 0x43, 0x53, 2, 0, 0x4d, 0x52, 0x18, 0, 0x80, 0, 0x44, 0x53, 2, 0, 0x31, 0x20]);
});

test('a value that the two bytes of its length cannot count is refused', () => {
  expect(() => encodeElements([{ tag: '0010,4000', vr: 'LT', value: 'x'.repeat(65536) }])).toThrow('at most 65535 bytes');
  expect(() => encodeElements([{ tag: '00104000', vr: 'LT', value: 'x' }])).toThrow('GGGG,EEEE');
});

test('a unique identifier is the value of a UUID in decimals', () => {
  // The example of DICOM PS3.5 annex B.2.
  expect(uidOf('f81d4fae-7dec-11d0-a765-00a0c91e6bf6')).toBe('2.25.329800735698586629295641978511506172918');
});

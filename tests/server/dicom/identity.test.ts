/**
 * Nobody's identity comes out of a file. Canaries are planted wherever a file can hold bytes, in several encodings, and searched
 * in all that the reader gives back. Attributes that identify: DICOM PS3.15 table E.1-1.
 */
import { allowList, type AttributeName } from '../../../server/dicom/allow-list';
import { encodeElements, joined, type ElementToWrite } from '../../../server/dicom/elements';
import { longestList } from '../../../server/dicom/deidentification';
import { isHarmless, namesNames } from '../../../server/dicom/facts/names';
import { readDicom, type Read } from '../../../server/dicom/read';
import { accepted, key, madeFile, slope } from './made-image';

const name = 'Quillfeather^Zenobia';
const number = '49120077312';
const canaryWords = ['Quillfeather', 'Zenobia', number];

const latin = (text: string) => Buffer.from(text, 'latin1');
const wide = (text: string) => Buffer.from(text, 'utf16le');
const base64 = (text: string) => latin(Buffer.from(text, 'latin1').toString('base64'));
const canary = Buffer.concat([latin(`${name} ${number} `), wide(`${name} ${number}`), base64(name), base64(number)]);

/** Every form in which a canary may show: as it is, 16-bit, and base64 at each of its three phases. */
const needles = canaryWords.flatMap((word) => [
  latin(word),
  wide(word),
  ...[0, 1, 2].map((phase) =>
    latin(
      Buffer.from(' '.repeat(phase) + word, 'latin1')
        .toString('base64')
        .slice(4, -4),
    ),
  ),
]);

function expectNoCanary(read: Read): void {
  const places = [latin(JSON.stringify(read, (key, value: unknown) => (key === 'values' ? undefined : value)))];
  for (const { values } of 'accepted' in read ? read.accepted : []) {
    places.push(Buffer.from(values.buffer), Buffer.from(Uint16Array.from(values).buffer), Buffer.from(Uint8Array.from(values)));
  }
  for (const place of places) for (const needle of needles) expect(place.includes(needle)).toBe(false);
}

const plant = (tag: string, vr: string): ElementToWrite => ({ tag, vr, value: new Uint8Array(canary) });

/** One identifying attribute of each VR at least, whatever bytes that VR may hold by rule. */
const identifying: ElementToWrite[] = [
  plant('0008,0018', 'UI'),
  plant('0008,0020', 'DA'),
  plant('0008,0030', 'TM'),
  plant('0008,0050', 'SH'),
  plant('0008,0054', 'AE'),
  plant('0008,0080', 'LO'),
  plant('0008,0081', 'ST'),
  plant('0008,0090', 'PN'),
  plant('0008,0119', 'UC'),
  plant('0008,1010', 'SH'),
  plant('0008,1070', 'PN'),
  plant('0010,0010', 'PN'),
  plant('0010,0020', 'LO'),
  plant('0010,0030', 'DA'),
  plant('0010,0040', 'CS'),
  plant('0010,1010', 'AS'),
  plant('0010,1030', 'DS'),
  plant('0010,21B0', 'LT'),
  plant('0018,1000', 'LO'),
  plant('0018,1030', 'LO'),
  plant('0018,9074', 'DT'),
  plant('0020,0012', 'IS'),
  plant('0020,4000', 'LT'),
  plant('0040,A160', 'UT'),
  plant('0040,A120', 'UR'),
  plant('0028,2000', 'OB'),
  plant('0028,1201', 'OW'),
  plant('0028,0009', 'AT'),
  plant('0028,9001', 'UL'),
  plant('0018,9219', 'SS'),
  plant('0066,0016', 'OF'),
  plant('0070,0022', 'FL'),
  plant('0018,9073', 'FD'),
  plant('0028,0303', 'UN'),
  plant('6000,3000', 'OW'),
];
const privateGroups = ['0009', '0019', '0029', '0051'].flatMap((group): ElementToWrite[] => [
  plant(`${group},0010`, 'LO'),
  plant(`${group},1010`, 'UN'),
  { tag: `${group},1020`, vr: 'SQ', value: [[plant('0010,0010', 'PN'), plant(`${group},1030`, 'OB')]] },
]);
const nested: ElementToWrite = {
  tag: '0040,0275',
  vr: 'SQ',
  value: [
    [
      plant('0010,0010', 'PN'),
      plant('0018,1250', 'SH'),
      { tag: '0008,1140', vr: 'SQ', value: [[plant('0018,0080', 'DS'), plant('0040,A123', 'PN')]] },
    ],
  ],
};
const fileMeta = [plant('0002,0013', 'SH'), plant('0002,0016', 'AE'), plant('0002,0100', 'UI'), plant('0002,0102', 'OB')];
const behind = [plant('FFFA,FFFA', 'OB'), plant('FFFC,FFFC', 'OB')];

function fileFullOfCanaries(): Uint8Array {
  const file = madeFile({ extra: [...identifying, ...privateGroups, nested, ...fileMeta] });
  file.set(canary.subarray(0, 128), 0);
  return joined([file, encodeElements(behind), canary]);
}

describe('canaries', () => {
  test('are found by the search when they are there', () => {
    const image = accepted(madeFile());
    const withText = { ...image, warnings: [{ code: 'x', text: name }] };
    expect(() => expectNoCanary({ accepted: [withText], fileKey: '' })).toThrow();
    const pixels = Uint16Array.from({ length: 256 }, (_, index) => canary[index % canary.length] ?? 0);
    expect(() => expectNoCanary({ accepted: [accepted(madeFile({ pixels }))], fileKey: '' })).toThrow();
  });

  test('in every VR, nested, private, in the file meta information, the preamble and behind the pixels come out nowhere', () => {
    const bytes = fileFullOfCanaries();
    for (const needle of [latin(number), wide(number), base64(number)]) expect(Buffer.from(bytes).includes(needle)).toBe(true);
    const read = readDicom(bytes, key);
    expect('accepted' in read).toBe(true);
    expectNoCanary(read);
    expect(accepted(bytes).values).toEqual(Float32Array.from(slope));
  });

  test.each(Object.keys(allowList) as AttributeName[])(
    'in %s, which may be read, come out neither as a fact nor in a reason',
    (attribute) => {
      expectNoCanary(readDicom(madeFile({ attributes: { [attribute]: new Uint8Array(canary) } }), key));
      expectNoCanary(readDicom(madeFile({ attributes: { [attribute]: name } }), key));
      expectNoCanary(readDicom(madeFile({ attributes: { [attribute]: number } }), key));
      // A file may give any VR; a number and a text are then read as such.
      const { tag } = allowList[attribute];
      const element = (vr: string, value: string) => [{ tag: `${tag.slice(1, 5)},${tag.slice(5)}`.toUpperCase(), vr, value }];
      expectNoCanary(readDicom(madeFile({ extra: element('IS', number) }), key));
      expectNoCanary(readDicom(madeFile({ extra: element('LO', `ORIGINAL\\${name}\\${number}`) }), key));
    },
  );

  const named: readonly AttributeName[] = namesNames;
  test.each(Object.keys(allowList).filter((attribute) => !named.some((other) => other === attribute)))(
    'in %s, nor does a plain word',
    (attribute) => {
      expectNoCanary(readDicom(madeFile({ attributes: { [attribute]: ['ORIGINAL', 'PRIMARY', 'Zenobia'] }, vrEncoding: 'implicit' }), key));
      expectNoCanary(readDicom(madeFile({ attributes: { [attribute]: 'Zenobia' } }), key));
    },
  );

  test('in the bits above those stored, where old files kept overlays, are masked away', () => {
    const pixels = slope.map((value, index) => value | ((canary[index % canary.length] ?? 0) << 12));
    expect(accepted(madeFile({ pixels, attributes: { bitsStored: 12, highBit: 11 } })).values).toEqual(Float32Array.from(slope));
  });
});

describe('texts about equipment', () => {
  test.each([
    'HEAD',
    '32Ch Head',
    'C:HE1-4',
    'syngo MR E11',
    '2.6.3\\2.6.3.6',
    '27\\LX\\MR Software release:DV26.0_R01_1725.a',
    'GE MEDICAL SYSTEMS',
    'Tern 3 T',
    '8HRBRAIN',
  ])('%s is kept', (text) => {
    expect(isHarmless(text)).toBe(true);
  });

  test.each([
    ['a person name', 'DOE^JANE'],
    ['surname, given name', 'Doe, Jane'],
    ['a form of address', 'Coil of Dr. Doe'],
    ['a run of digits', 'HEAD 123456'],
    ['a date, year first', 'HEAD 1958-04-17'],
    ['a date with points', '1995.06.26'],
    ['a date, year last', 'HEAD 17/04/1958'],
    ['a month by name', '17-Apr-1958'],
    ['a number of a person in groups', '491 200 7731'],
    ['an address', 'jane@alderweir.example'],
    ['letters beyond ASCII', 'Müller'],
    ['65 characters', 'H'.repeat(65)],
  ])('%s is left out', (_, text) => {
    expect(isHarmless(text)).toBe(false);
  });
});

test('a plain word in a coil’s name is kept: it cannot be told from a name of a coil', () => {
  expect(isHarmless('Zenobia')).toBe(true);
});

/** Of the unique identifiers of every made file a keyed hash is kept. */
const uidTags = ['0008,0018', '0020,000D', '0020,000E'];

describe('the account of what was removed', () => {
  test('names every tag that is not stored, at every depth, before and behind the pixels, once and in order', () => {
    const { removed, replaced } = accepted(fileFullOfCanaries()).deidentification;
    const planted = [...identifying, ...privateGroups, nested, ...fileMeta, ...behind].map(({ tag }) => tag);
    const told = [...removed, ...replaced];
    expect(told).toEqual(expect.arrayContaining([...planted, '0018,1250', '0040,A123', '0009,1030', '0008,0016', '0002,0010']));
    expect(removed).toEqual([...new Set(removed)].sort());
    expect(removed.every((tag) => /^[0-9A-F]{4},[0-9A-F]{4}$/.test(tag))).toBe(true);
  });

  test('does not name what is stored', () => {
    const attributes = { repetitionTime: 500, receiveCoil: 'HEAD', pixelSpacing: [1, 1], scanOptions: 'FS' };
    const { removed, replaced } = accepted(madeFile({ attributes })).deidentification;
    for (const tag of ['0018,0080', '0018,1250', '0028,0030', '0018,0022', '0028,0010', '7FE0,0010']) expect(removed).not.toContain(tag);
    expect(replaced).toEqual(uidTags);
  });

  test('names as replaced the time that a time of day was made of, and a text of which a part was kept', () => {
    const attributes = { acquisitionTime: '143415', contentTime: '150000', imageType: ['ORIGINAL', 'PRIMARY', 'SOMETHING'] };
    const { removed, replaced } = accepted(madeFile({ attributes })).deidentification;
    expect(replaced).toEqual(['0008,0008', '0008,0018', '0008,0032', '0020,000D', '0020,000E']);
    expect(removed).toContain('0008,0033');
  });

  test('names as removed a text that was left out', () => {
    expect(accepted(madeFile({ attributes: { receiveCoil: name } })).deidentification.removed).toContain('0018,1250');
  });

  test('ends at a length that a person can read', () => {
    const extra = Array.from({ length: longestList + 100 }, (_, index): ElementToWrite => {
      return { tag: `0009,${(0x1000 + index).toString(16).toUpperCase()}`, vr: 'LO', value: 'x' };
    });
    expect(accepted(madeFile({ extra })).deidentification.removed).toHaveLength(longestList);
  });
});

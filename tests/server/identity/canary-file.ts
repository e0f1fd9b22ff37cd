/**
 * An image that is taken at the door and is full of a patient who does not exist: in the VRs of DICOM PS3.5 table 6.2-1, nested, in private
 * groups, in the file meta information, in the preamble and behind the pixels; as text, as UTF-16 and as base64.
 */
import { encodeElements, joined, type ElementToWrite } from '../../../server/dicom/elements';
import { discFile } from '../files';

export const surname = 'Quillfeather';
export const givenName = 'Zenobia';
export const patientNumber = '49120077312';
export const birthDate = '19610413';
export const examDate = '20260214';
export const examUid = '1.2.826.0.7741.55120.9';
/** Short words turn up by chance in megabytes of pixels; eight bytes do not. */
export const canaryWords = [surname, givenName.repeat(2), patientNumber, birthDate, examDate, examUid];

const sentence = `${surname}^${givenName}${givenName} ${patientNumber} ${birthDate} ${examDate} ${examUid}`;
const canary = Buffer.concat([
  Buffer.from(sentence, 'latin1'),
  Buffer.from(sentence, 'utf16le'),
  Buffer.from(sentence, 'utf16le').swap16(),
  Buffer.from(Buffer.from(sentence).toString('base64'), 'latin1'),
]);

const plant = (tag: string, vr: string): ElementToWrite => ({ tag, vr, value: new Uint8Array(canary) });

/** An attribute for each VR that may hold bytes of this length, most of them of table E.1-1. */
const inEveryVr: readonly ElementToWrite[] = (
  [
    ['0008,0055', 'AE'],
    ['0010,1010', 'AS'],
    ['0028,0009', 'AT'],
    ['0010,0040', 'CS'],
    ['0010,0030', 'DA'],
    ['0010,1030', 'DS'],
    ['0018,9074', 'DT'],
    ['0018,9073', 'FD'],
    ['0070,0022', 'FL'],
    ['0020,0012', 'IS'],
    ['0010,0020', 'LO'],
    ['0010,21B0', 'LT'],
    ['0028,2000', 'OB'],
    ['7FE0,0009', 'OD'],
    ['0066,0016', 'OF'],
    ['0066,0040', 'OL'],
    ['0028,1201', 'OW'],
    ['0010,0010', 'PN'],
    ['0008,0050', 'SH'],
    ['0018,6020', 'SL'],
    ['0018,9219', 'SS'],
    ['0008,0081', 'ST'],
    ['0008,0031', 'TM'],
    ['0008,0119', 'UC'],
    ['0008,1155', 'UI'],
    ['0028,9001', 'UL'],
    ['0028,0303', 'UN'],
    ['0008,1190', 'UR'],
    ['0018,9810', 'US'],
    ['0040,A160', 'UT'],
  ] as const
).map(([tag, vr]) => plant(tag, vr));

/** The VRs of 64-bit integers. The parser takes them for short ones and loses its place, so a file with one is refused as damaged. */
export const inLongIntegers: readonly ElementToWrite[] = [plant('7FE0,0001', 'OV'), plant('0072,0082', 'SV'), plant('0072,0083', 'UV')];

/** Attributes that are read and kept where they hold what belongs there. */
const whereFactsAreRead: readonly ElementToWrite[] = [
  plant('0008,0032', 'TM'),
  plant('0008,0070', 'LO'),
  plant('0008,1090', 'LO'),
  plant('0008,1010', 'SH'),
  plant('0018,0015', 'CS'),
  plant('0018,0022', 'CS'),
  plant('0018,1000', 'LO'),
  plant('0018,1020', 'LO'),
  plant('0018,1250', 'SH'),
  plant('0018,5100', 'CS'),
  { tag: '0020,000D', vr: 'UI', value: examUid },
  { tag: '0020,000E', vr: 'UI', value: `${examUid}.1` },
  { tag: '0008,0018', vr: 'UI', value: `${examUid}.2` },
];

const nested: ElementToWrite = {
  tag: '0040,0275',
  vr: 'SQ',
  value: [[plant('0010,0010', 'PN'), { tag: '0008,1140', vr: 'SQ', value: [[plant('0040,A123', 'PN'), plant('0009,1001', 'LO')]] }]],
};
const privateGroups = ['0009', '0019', '0029', '0051'].flatMap((group): ElementToWrite[] => [
  plant(`${group},0010`, 'LO'),
  plant(`${group},1010`, 'UN'),
  { tag: `${group},1020`, vr: 'SQ', value: [[plant('0010,0010', 'PN'), plant(`${group},1030`, 'OB')]] },
]);
const fileMeta = [plant('0002,0013', 'SH'), plant('0002,0016', 'AE'), plant('0002,0100', 'UI'), plant('0002,0102', 'OB')];
const behindPixels = [plant('FFFA,FFFA', 'OB'), plant('FFFC,FFFC', 'OB')];

/** The file. Its pixels are those of a disc, and its phase-encode axis is known. */
export function canaryFile(more: readonly ElementToWrite[] = []): Buffer {
  const file = discFile({
    rows: 64,
    columns: 64,
    extra: [
      ...inEveryVr,
      ...whereFactsAreRead,
      nested,
      ...privateGroups,
      ...fileMeta,
      plant('6000,3000', 'OW'),
      plant('5000,3000', 'OW'),
      ...more,
    ],
  });
  file.set(canary.subarray(0, 128), 0);
  return Buffer.from(joined([file, encodeElements(behindPixels), canary]));
}

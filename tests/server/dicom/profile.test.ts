/**
 * The confidentiality profile: what the table says of some attributes, and that the last look stops whatever it does not permit. Actions
 * are from DICOM PS3.15 table E.1-1 (January 2025); what is planted is invented.
 */
import { allowList } from '../../../server/dicom/allow-list';
import type { ElementToWrite } from '../../../server/dicom/elements';
import { actionOf } from '../../../server/dicom/profile/actions';
import { auditAllowList } from '../../../server/dicom/profile/stored';
import { auditFile, type Permitted, ProfileViolation } from '../../../server/dicom/profile/audit';
import { tableE1 } from '../../../server/dicom/profile/table';
import { implementationClass, partTen } from '../../../server/dicom/write';

describe('the table', () => {
  it.each([
    ['0010,0010', 'Z'],
    ['0010,0020', 'Z/D'],
    ['0010,1000', 'X'],
    ['0008,0018', 'U'],
    ['0008,1140', 'X/Z/U*'],
    ['0008,0080', 'X/Z/D'],
    ['0018,9074', 'C-dates'],
    ['0008,0032', 'C-dates'],
    ['0018,1000', 'K'],
    ['0008,1010', 'K'],
    // The device's, and a date: the date decides.
    ['0018,1200', 'C-dates'],
    ['0008,0055', 'C-device'],
    ['0008,2111', 'C-descriptors'],
    ['0008,103e', 'C-descriptors'],
    // Groups that stand for many tags.
    ['5004,3000', 'X'],
    ['6002,0010', 'X'],
    ['0009,0010', 'X'],
    ['0051,1011', 'X'],
  ])('says of (%s): %s', (tag, action) => {
    expect(actionOf(tag)).toBe(action);
  });

  it.each(['0018,0080', '0028,0030', '0008,0070', '0018,1250', '0008,0008'])('leaves (%s) as it is', (tag) => {
    expect(actionOf(tag)).toBeUndefined();
  });

  it('names 400 attributes besides three groups of tags, each once', () => {
    const tags = tableE1.flatMap((row) => row.tags.trim().split(/\s+/));
    expect(tags).toHaveLength(400);
    expect(new Set(tags).size).toBe(400);
    expect(tags.every((tag) => /^[0-9A-F]{4},[0-9A-F]{4}$/.test(tag))).toBe(true);
  });

  it('is asked for tags as GGGG,EEEE', () => {
    expect(() => actionOf('x00100010')).toThrow(RangeError);
  });
});

const own = '2.25.7';
const mr = '1.2.840.10008.5.1.4.1.1.4';
const permitted: Permitted = {
  uids: new Set([own, implementationClass]),
  composed: new Map([['0008,2111', new Set(['SIMULATED. Wrap-around'])]]),
};
const sound: ElementToWrite[] = [
  { tag: '0008,0016', vr: 'UI', value: mr },
  { tag: '0008,0018', vr: 'UI', value: own },
  { tag: '0008,0020', vr: 'DA', value: '' },
  { tag: '0008,0032', vr: 'TM', value: '143415' },
  { tag: '0008,2111', vr: 'ST', value: 'SIMULATED. Wrap-around' },
  { tag: '0010,0010', vr: 'PN', value: '' },
  { tag: '0018,0080', vr: 'DS', value: 500 },
  { tag: '0018,1000', vr: 'LO', value: 'T-1184' },
  { tag: '7FE0,0010', vr: 'OW', value: Uint8Array.of(1, 2) },
];
const fileOf = (...extra: ElementToWrite[]): Uint8Array => partTen([...sound, ...extra], { sopClass: mr, sopInstance: own });

describe('the last look', () => {
  it('lets a data set pass that keeps to the profile', () => {
    expect(() => auditFile(fileOf(), permitted)).not.toThrow();
  });

  const secret = 'Quillfeather';
  const planted: [what: string, element: ElementToWrite][] = [
    ['a name of the patient', { tag: '0010,0010', vr: 'PN', value: `${secret}^Zenobia` }],
    ['a number of the patient', { tag: '0010,0020', vr: 'LO', value: 'Q-17' }],
    ['an attribute to be removed, even if it is harmless', { tag: '0010,1010', vr: 'AS', value: '' }],
    ['a name in an attribute that the table does not know', { tag: '0008,9999', vr: 'PN', value: secret }],
    ['a date that the table knows', { tag: '0008,0020', vr: 'DA', value: '20260214' }],
    ['a date that the table does not know', { tag: '0018,9999', vr: 'DT', value: '20260214120000' }],
    ['a time with a date before it', { tag: '0008,0032', vr: 'TM', value: '20260214143415' }],
    ['another derivation description', { tag: '0008,2111', vr: 'ST', value: `SIMULATED. Wrap-around of ${secret}` }],
    ['a protocol name', { tag: '0018,1030', vr: 'LO', value: 'T1 SE' }],
    ['an identifier of somebody else', { tag: '0020,000D', vr: 'UI', value: '1.2.3.4' }],
    ['an identifier in our form that was not made here', { tag: '0020,000D', vr: 'UI', value: '2.25.8' }],
    ['an identifier in the place of a class', { tag: '0008,0016', vr: 'UI', value: '1.2.3.4' }],
    ['a private attribute', { tag: '0009,1001', vr: 'LO', value: 'x' }],
    ['an overlay', { tag: '6000,3000', vr: 'OW', value: Uint8Array.of(1, 2) }],
    ['a curve', { tag: '5000,3000', vr: 'OW', value: Uint8Array.of(1, 2) }],
    ['bytes that nobody can look into', { tag: '0018,9998', vr: 'UN', value: Uint8Array.of(1, 2) }],
    ['a text that looks like a name', { tag: '0018,1250', vr: 'SH', value: 'Coil of Dr. Doe' }],
    ['a word that is none', { tag: '0018,0015', vr: 'CS', value: '19610413' }],
    ['a sequence to be removed', { tag: '0040,0275', vr: 'SQ', value: [[]] }],
    ['a station of the network', { tag: '0008,0055', vr: 'AE', value: 'MR1' }],
    ['padding', { tag: 'FFFC,FFFC', vr: 'OB', value: Uint8Array.of(0, 0) }],
  ];

  it.each(planted)('stops %s', (_what, element) => {
    expect(() => auditFile(fileOf(element), permitted)).toThrow(ProfileViolation);
  });

  it.each(planted.filter(([, { tag }]) => tag !== '0008,0016'))('stops %s two sequences deep', (_what, element) => {
    const nested: ElementToWrite = { tag: '0018,9112', vr: 'SQ', value: [[{ tag: '0018,9114', vr: 'SQ', value: [[], [element]] }]] };
    expect(() => auditFile(fileOf(nested), permitted)).toThrow(ProfileViolation);
  });

  it('names the tag and never the value', () => {
    const told = (() => {
      try {
        auditFile(fileOf({ tag: '0010,0010', vr: 'PN', value: secret }), permitted);
      } catch (error) {
        return String(error);
      }
      return '';
    })();
    expect(told).toContain('(0010,0010)');
    expect(told).not.toContain(secret);
  });

  it('stops a preamble that is not empty, and bytes behind the last element', () => {
    const withPreamble = fileOf();
    withPreamble.set(new TextEncoder().encode(secret), 3);
    expect(() => auditFile(withPreamble, permitted)).toThrow(ProfileViolation);
    expect(() => auditFile(Buffer.concat([fileOf(), Buffer.from(`${secret} was here`)]), permitted)).toThrow();
  });
});

describe('what the reader may keep', () => {
  it('comes from no attribute of the table but the device and the time of day, and hashes of identifiers', () => {
    expect(() => auditAllowList(allowList)).not.toThrow();
  });

  it.each([
    ['the protocol’s name', { tag: 'x00181030', vr: 'LO', use: 'stored' }],
    ['an identifier as it is', { tag: 'x0020000d', vr: 'UI', use: 'stored' }],
    ['a date', { tag: 'x00080032', vr: 'TM', use: 'stored' }],
    ['something made of a name', { tag: 'x00100010', vr: 'LO', use: 'replaced' }],
  ] as const)('never %s', (_what, attribute) => {
    expect(() => auditAllowList({ ...allowList, planted: attribute })).toThrow(ProfileViolation);
  });
});

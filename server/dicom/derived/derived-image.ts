/**
 * A simulated picture as a DICOM object: MR Image Storage where the header says where the source lies, else Secondary Capture, which needs no
 * place in the patient (PS3.3 A.4, A.8.1). Written anew from facts; nothing is copied from the file that came in. The device that
 * scanned stands as contributing equipment, because what made these pixels is this product (PS3.3 C.12.1.1.5).
 */
import type { ElementToWrite } from '../elements';
import { mrImageStorage } from '../kind-of-image';
import { auditFile } from '../profile/audit';
import { implementationClass, partTen } from '../write';
import { deidentificationRecord, writtenCodes } from './deidentification-record';
import type { Derivation, DerivedPicture } from './derivation';
import { planeInPatient } from './plane-in-patient';
import { contributingEquipment, scanElements } from './scan-elements';

const secondaryCaptureStorage = '1.2.840.10008.5.1.4.1.1.7';
const simulatedWords = 'SIMULATED, NOT FOR DIAGNOSIS';
/** Of VR ST. */
const longestDescription = 1024;

/** The finished file. Throws ProfileViolation where anything in it could lead to a patient. */
export function writeDerived(about: Derivation, picture: DerivedPicture): Uint8Array {
  const plane = planeInPatient(about, picture);
  const sopClass = plane === undefined ? secondaryCaptureStorage : mrImageStorage;
  const texts = composedTexts(about);
  const dataSet = [
    ...identifiers(about, sopClass),
    ...emptyIdentity,
    ...texts,
    ...deidentificationRecord,
    ...product(about),
    ...contributingEquipment(about),
    ...nature,
    ...(plane === undefined
      ? [{ tag: '0008,0064', vr: 'CS', value: 'WSD' }]
      : [...scanElements(about), ...place(about, plane.position, plane.orientation)]),
    ...pixelElements(about, picture),
  ];
  const bytes = partTen(dataSet, { sopClass, sopInstance: about.uids.image });
  auditFile(bytes, {
    uids: new Set([...Object.values(about.uids), implementationClass]),
    composed: new Map([...texts.map(({ tag, value }): [string, Set<string>] => [tag, new Set([value])]), ['0008,0100', writtenCodes]]),
  });
  return bytes;
}

const identifiers = ({ uids, instanceNumber }: Derivation, sopClass: string): ElementToWrite[] => [
  { tag: '0008,0016', vr: 'UI', value: sopClass },
  { tag: '0008,0018', vr: 'UI', value: uids.image },
  { tag: '0020,000D', vr: 'UI', value: uids.study },
  { tag: '0020,000E', vr: 'UI', value: uids.series },
  { tag: '0020,0011', vr: 'IS', value: '1' },
  { tag: '0020,0013', vr: 'IS', value: String(instanceNumber) },
];

/** The only texts in the place of identity and of descriptors, all of the product's own words. */
function composedTexts({ caseNumber, description }: Derivation): { tag: string; vr: string; value: string }[] {
  const ofCase = caseNumber === null ? [] : [{ tag: '0010,0020', vr: 'LO', value: `CASE-${caseNumber}` }];
  return [
    ...ofCase,
    { tag: '0010,0010', vr: 'PN', value: caseNumber === null ? 'SIMULATED' : `SIMULATED^CASE ${caseNumber}` },
    { tag: '0008,103E', vr: 'LO', value: simulatedWords },
    { tag: '0008,2111', vr: 'ST', value: shortened(description) },
  ];
}

const shortened = (text: string): string =>
  text.length <= longestDescription ? text : `${text.slice(0, longestDescription - 1).trimEnd()}…`;

/** Present and empty: type 2 in the standard; of most, action Z of the profile. */
const emptyIdentity: readonly ElementToWrite[] = [
  ['0008,0020', 'DA'],
  ['0008,0030', 'TM'],
  ['0008,0050', 'SH'],
  ['0008,0090', 'PN'],
  ['0010,0020', 'LO'],
  ['0010,0030', 'DA'],
  ['0010,0040', 'CS'],
  ['0020,0010', 'SH'],
  ['0020,0020', 'CS'],
  ['0020,0060', 'CS'],
].map(([tag = '', vr = '']) => ({ tag, vr, value: '' }));

const product = ({ productVersion }: Derivation): ElementToWrite[] => [
  { tag: '0008,0070', vr: 'LO', value: 'Pickglass' },
  { tag: '0008,1090', vr: 'LO', value: 'Pickglass' },
  { tag: '0018,1020', vr: 'LO', value: productVersion },
];

/**
 * Burned In Annotation asks whether the text in the pixels is enough to identify the patient and the date (PS3.3 C.7.6.1): the words burned
 * in here are the same in every picture, so NO is true.
 */
const nature: readonly ElementToWrite[] = [
  { tag: '0008,0005', vr: 'CS', value: 'ISO_IR 192' },
  { tag: '0008,0008', vr: 'CS', value: ['DERIVED', 'SECONDARY', 'OTHER'] },
  { tag: '0008,0060', vr: 'CS', value: 'MR' },
  { tag: '0018,9004', vr: 'CS', value: 'RESEARCH' },
  { tag: '0028,0301', vr: 'CS', value: 'NO' },
  { tag: '0028,2110', vr: 'CS', value: '00' },
];

const place = ({ uids, facts }: Derivation, position: readonly number[], orientation: readonly number[]): ElementToWrite[] => [
  { tag: '0020,0052', vr: 'UI', value: uids.frameOfReference },
  { tag: '0020,1040', vr: 'LO', value: '' },
  { tag: '0020,0032', vr: 'DS', value: position },
  { tag: '0020,0037', vr: 'DS', value: orientation },
  { tag: '0018,0050', vr: 'DS', value: facts.sliceThicknessMm.value ?? '' },
  { tag: '0018,5100', vr: 'CS', value: facts.patientPosition.value ?? '' },
];

function pixelElements({ window: [low, high] }: Derivation, { width, height, levels, slope, spacingMm }: DerivedPicture): ElementToWrite[] {
  const bytes = new Uint8Array(2 * levels.length);
  const view = new DataView(bytes.buffer);
  levels.forEach((level, index) => view.setUint16(2 * index, level, true));
  return [
    { tag: '0028,0002', vr: 'US', value: 1 },
    { tag: '0028,0004', vr: 'CS', value: 'MONOCHROME2' },
    { tag: '0028,0010', vr: 'US', value: height },
    { tag: '0028,0011', vr: 'US', value: width },
    { tag: '0028,0030', vr: 'DS', value: spacingMm },
    { tag: '0028,0100', vr: 'US', value: 16 },
    { tag: '0028,0101', vr: 'US', value: 16 },
    { tag: '0028,0102', vr: 'US', value: 15 },
    { tag: '0028,0103', vr: 'US', value: 0 },
    { tag: '0028,1050', vr: 'DS', value: (low + high) / 2 },
    { tag: '0028,1051', vr: 'DS', value: Math.max(1, high - low) },
    { tag: '0028,1052', vr: 'DS', value: 0 },
    { tag: '0028,1053', vr: 'DS', value: slope },
    { tag: '0028,1054', vr: 'LO', value: 'US' },
    { tag: '7FE0,0010', vr: 'OW', value: bytes },
  ];
}

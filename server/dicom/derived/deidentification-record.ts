/** How identity was removed, as PS3.15 annex E asks every such object to say: Patient Identity Removed and the codes of what was done. */
import type { ElementToWrite } from '../elements';
import { profileOptions, type ProfileOption } from '../profile/actions';

const codingScheme = 'DCM';

/** An item of a code sequence. */
export const codeItem = ({ code, meaning }: ProfileOption): ElementToWrite[] => [
  { tag: '0008,0100', vr: 'SH', value: code },
  { tag: '0008,0102', vr: 'SH', value: codingScheme },
  { tag: '0008,0104', vr: 'LO', value: meaning },
];

/** Acquisition Equipment: the purpose for which a contributing device is named. */
export const acquisitionEquipment = { code: '109101', meaning: 'Acquisition Equipment' };

/** Every code that a derived object holds: six digits, which look like a number of a person. */
export const writtenCodes: ReadonlySet<string> = new Set([...profileOptions, acquisitionEquipment].map(({ code }) => code));

export const deidentificationRecord: readonly ElementToWrite[] = [
  { tag: '0012,0062', vr: 'CS', value: 'YES' },
  { tag: '0012,0063', vr: 'LO', value: ['Rebuilt from an allow-list of scan facts', 'No dates, time of day kept', 'Device identity kept'] },
  { tag: '0012,0064', vr: 'SQ', value: profileOptions.map(codeItem) },
  // Dates are gone and the time of day stands: modified, in the terms of the standard (PS3.3 C.7.1.2, PS3.15 E.3.6).
  { tag: '0028,0303', vr: 'CS', value: 'MODIFIED' },
];

/**
 * Images that were not encoded in their own plane: captured, computed, reformatted. They may be looked at, and a warning says why no more.
 * Terms: DICOM PS3.3 C.7.6.1.1.2 (Image Type) and C.8.6.1 (Conversion Type); words beyond them are what scanners write (common practice).
 */
import type { Attributes } from '../../../server/dicom/write';
import { readMade } from './made-image';

const type = (...imageType: string[]): Attributes => ({ imageType });

test.each<[string, string, Attributes]>([
  ['secondary-capture', 'a secondary capture', { sopClass: '1.2.840.10008.5.1.4.1.1.7' }],
  ['secondary-capture', 'a multi-frame secondary capture', { sopClass: '1.2.840.10008.5.1.4.1.1.7.2' }],
  ['secondary-capture', 'a secondary capture that names no modality of its own', { sopClass: '1.2.840.10008.5.1.4.1.1.7', modality: 'OT' }],
  ['secondary-capture', 'a scanned film', { conversionType: 'DF' }],
  ['derived', 'a derived image', type('DERIVED', 'PRIMARY', 'M')],
  ['derived', 'an apparent diffusion coefficient', type('ORIGINAL', 'PRIMARY', 'ADC')],
  ['derived', 'a projection', type('DERIVED', 'SECONDARY', 'PROJECTION IMAGE', 'MIP')],
  ['derived', 'a subtraction', type('DERIVED', 'SECONDARY', 'SUBTRACTION')],
  ['derived', 'a map of the field', type('ORIGINAL', 'PRIMARY', 'B0 MAP', 'B0')],
  ['derived', 'a reformatted image that says derived', type('DERIVED', 'SECONDARY', 'MPR')],
  ['reformatted', 'a reformatted image that says no more', type('', '', 'MPR')],
])('%s: %s may be looked at only', (code, _, attributes) => {
  const image = readMade(attributes);
  expect(image.use).toBe('look-only');
  expect(image.warnings.find((warning) => warning.code === code)?.text).toContain('looked at');
  expect(image.values).toHaveLength(256);
});

test.each<[string, Attributes]>([
  ['an original', type('ORIGINAL', 'PRIMARY', 'M', 'ND')],
  ['an original of which a scanner says MPR', type('ORIGINAL', 'PRIMARY', 'MPR')],
  ['a phase map', type('ORIGINAL', 'PRIMARY', 'PHASE MAP', 'P')],
])('%s is measured', (_, attributes) => {
  expect(readMade(attributes).use).toBe('measured');
});

test('somebody must look for text in a secondary capture, and in no other image', () => {
  expect(readMade({ conversionType: 'WSD' }).confirmedNoText).toBe(false);
  expect(readMade({}).confirmedNoText).toBeNull();
  expect(readMade(type('DERIVED', 'SECONDARY', 'MPR')).confirmedNoText).toBeNull();
});

/**
 * Which device it was: a case is about a scanner, so its serial number and station name are kept, as DICOM PS3.15 annex E allows with the
 * option to retain device identity. A site can type anything there: only short codes without a space are kept, no name of a person.
 */
import type { Header } from '../header';
import { absent, fromHeader, type Fact } from './fact';

export const deviceNames = ['deviceSerial', 'stationName'] as const;
export type DeviceName = (typeof deviceNames)[number];

/** Letters, digits, hyphens, at least one digit, no run of them long enough for a patient's number (common practice: 8 and more). */
const code = /^(?=.*\d)(?!.*\d{8})[A-Za-z0-9_-]{1,16}$/;

export function screenedDevice(header: Header, name: DeviceName): { text?: string; withheld: boolean } {
  const text = header.text(name) ?? '';
  if (text === '') return { withheld: false };
  return code.test(text) ? { text, withheld: false } : { withheld: true };
}

export function deviceFact(header: Header, name: DeviceName): Fact<string> {
  const { text, withheld } = screenedDevice(header, name);
  if (withheld) return absent('The header’s text was left out: it is not a short code.');
  return text === undefined ? absent() : fromHeader(text);
}

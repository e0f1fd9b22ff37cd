/**
 * The time of day of the acquisition, `HH:MM:SS`, and never a date: trends over a day (a cold head, the air conditioning) can be
 * seen, and nothing leads back to the exam. Forms: DICOM PS3.5 section 6.2 (TM, DT) and the older ACR-NEMA form with colons.
 */
import type { AttributeName } from '../allow-list';
import type { Header } from '../header';
import { absent, doubtful, workedOut, type Fact } from './fact';

/** The first of these that has a value counts. */
const timeNames = [
  'frameAcquisitionDateTime',
  'acquisitionTime',
  'acquisitionDateTime',
  'contentTime',
] as const satisfies readonly AttributeName[];

const time = /^([01]\d|2[0-3]):?([0-5]\d):?([0-5]\d|60)?(\.\d{1,6})?$/;
const dateAndTime = /^\d{8}(\d{4,6}(?:\.\d{1,6})?)(?:[+-]\d{4})?$/;

/** The attribute that the time is taken from. */
export const timeSource = (header: Header): (typeof timeNames)[number] | undefined =>
  timeNames.find((candidate) => header.text(candidate) !== undefined);

export function timeOfDayFact(header: Header): Fact<string> {
  const name = timeSource(header);
  if (name === undefined) return absent();
  const text = header.text(name) ?? '';
  const clock = name.endsWith('DateTime') ? dateAndTime.exec(text)?.[1] : text;
  const match = time.exec(clock ?? '');
  if (match === null) return doubtful<string>(null, 'The time in the header is none.');
  return workedOut(`${match[1]}:${match[2]}:${match[3] ?? '00'}`, 'Time of day only; the date was not read.');
}

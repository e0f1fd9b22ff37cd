/**
 * Free text about equipment: maker, model, software, coils. These attributes carry no identity by rule (they are not in DICOM
 * PS3.15 table E.1-1), but a site can type anything there; so a text is kept only when nothing in it looks like a person, a
 * number of a person, or a date. A plain word cannot be told from a coil's name: that is the limit of this screen.
 */
import type { AttributeName } from '../allow-list';
import type { Header } from '../header';
import { absent, fromHeader, type Fact } from './fact';

export const namesNames = [
  'manufacturer',
  'model',
  'softwareVersions',
  'receiveCoil',
  'transmitCoil',
] as const satisfies readonly AttributeName[];
export type NamesName = (typeof namesNames)[number];

const longestText = 64;

const unprintable = /[^\x20-\x7e]/;

const identifying: readonly RegExp[] = [
  /[\^=@]/, // person name components and groups, e-mail
  /^\s*[A-Za-z'-]+,\s*[A-Za-z]/, // surname, given name
  /\b(Mr|Mrs|Ms|Miss|Dr|Prof)\.?\s+[A-Z][a-z]/, // a form of address and a name; MR is another thing
  /\d{6}/, // patient and accession numbers, dates without separators
  /\b(19|20)\d\d[-./ ]\d{1,2}[-./ ]\d{1,2}\b/, // year first
  /\b\d{1,2}[-./ ]\d{1,2}[-./ ](19|20)\d\d\b/, // year last
  /\b\d{1,2}[-/ ]?(jan|feb|mar|apr|may|jun|jul|aug|sep|oct|nov|dec)[a-z]*[-/ ]?\d{2,4}\b/i, // month by name
  /\d{3}[- ]\d{2,3}[- ]\d{3,4}/, // numbers of persons written in groups
];

/** True where a text may be kept: short, printable, and like nobody's name, number or date. */
export const isHarmless = (text: string): boolean => text.length <= longestText && !unprintable.test(text) && !looksLikeSomebody(text);

/** True where something in a text is like a person's name, number or date. */
export const looksLikeSomebody = (text: string): boolean => identifying.some((pattern) => pattern.test(text));

/** The text of an attribute, or what to say in its place. */
export function screenedName(header: Header, name: NamesName): { text?: string; withheld: boolean } {
  const text = header
    .texts(name)
    .filter((value) => value !== '')
    .join('\\');
  if (text === '') return { withheld: false };
  return isHarmless(text) ? { text, withheld: false } : { withheld: true };
}

export function nameFact(header: Header, name: NamesName): Fact<string> {
  const { text, withheld } = screenedName(header, name);
  if (withheld) return absent('The header’s text was left out: it may name a person or hold a date or a number.');
  return text === undefined ? absent() : fromHeader(text);
}

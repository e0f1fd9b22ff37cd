/**
 * The last look at a data set before it leaves: it is walked at every depth, and whatever the profile does not permit stops it. It trusts
 * nobody who made the data set, so it looks at the finished elements, also at those that table E.1-1 does not name: no date, no name of a
 * person, no identifier that was not made for this object, no text that looks like somebody (PS3.15 annex E; facts/names.ts).
 */
import dicomParser, { type DataSet, type Element } from 'dicom-parser';
import { isHarmless } from '../facts/names';
import { actionOf, type Action } from './actions';

/** What the maker of the data set answers for. */
export interface Permitted {
  /** Unique identifiers that were made for this object. */
  readonly uids: ReadonlySet<string>;
  /** Texts composed of the product's own words, by tag, `GGGG,EEEE`. */
  readonly composed: ReadonlyMap<string, ReadonlySet<string>>;
}

/** The message names the tag and the rule, never the value. */
export class ProfileViolation extends Error {
  override readonly name = 'ProfileViolation';

  constructor(
    readonly tag: string,
    rule: string,
  ) {
    super(`(${tag}) ${rule}`);
  }
}

/** Throws ProfileViolation unless `dataSet` may leave. */
export function auditOf(dataSet: DataSet, permitted: Permitted): void {
  for (const element of Object.values(dataSet.elements)) auditElement(dataSet, element, permitted);
}

/** Parses a finished file and audits it, its preamble included. */
export function auditFile(bytes: Uint8Array, permitted: Permitted): void {
  if (bytes.subarray(0, 128).some((byte) => byte !== 0)) throw new ProfileViolation('0000,0000', 'there is something in the preamble');
  const dataSet = dicomParser.parseDicom(bytes);
  if (dataSet.warnings.length > 0) throw new ProfileViolation('0000,0000', 'the data set cannot be read to its end');
  auditOf(dataSet, permitted);
}

interface Found {
  readonly tag: string;
  readonly vr: string;
  readonly isEmpty: boolean;
  readonly isComposed: boolean;
  /** Of a textual VR; padding taken off. */
  readonly values: readonly string[];
}

const pixelData = '7FE0,0010';

function auditElement(dataSet: DataSet, element: Element, permitted: Permitted): void {
  const tag = `${element.tag.slice(1, 5)},${element.tag.slice(5)}`.toUpperCase();
  const vr = element.vr ?? 'UN';
  const text = textualVrs.has(vr) ? textOf(dataSet, element) : '';
  const found: Found = {
    ...{ tag, vr, isEmpty: element.length === 0, isComposed: permitted.composed.get(tag)?.has(text) ?? false },
    values: text === '' ? [] : text.split('\\'),
  };
  const rule = tableRule(found, actionOf(tag)) ?? generalRule(found, permitted);
  if (rule !== undefined) throw new ProfileViolation(tag, rule);
  for (const item of element.items ?? []) {
    if (item.dataSet === undefined) throw new ProfileViolation(tag, 'an item of the sequence cannot be read');
    auditOf(item.dataSet, permitted);
  }
}

const textualVrs = new Set('AE AS CS DA DS DT IS LO LT PN SH ST TM UC UI UR UT'.split(' '));
/** VRs in which anything can be written: their values are looked at. */
const freeVrs = new Set('AE LO LT SH ST UC UR UT'.split(' '));

const textOf = ({ byteArray }: DataSet, { dataOffset, length }: Element): string =>
  new TextDecoder('utf-8').decode(byteArray.subarray(dataOffset, dataOffset + length)).replace(/[\0 ]+$/, '');

/** What the table says; undefined where the attribute may stand as it is. */
function tableRule({ isEmpty, isComposed, vr }: Found, action: Action | undefined): string | undefined {
  switch (action) {
    case undefined:
    case 'K':
    // The general rules are for all of these: times of day without a date, identifiers of ours, items that are audited themselves.
    case 'C-dates':
    case 'U':
    case 'X/Z/U*':
      return undefined;
    case 'C-descriptors':
    case 'Z':
    case 'Z/D':
    case 'D':
    case 'X/D':
    case 'X/Z/D':
      return isEmpty || (isComposed && vr !== 'SQ') ? undefined : 'may only hold a text that was composed for this object';
    case 'X/Z':
      return isEmpty ? undefined : 'must be empty';
    case 'X':
    case 'C-device':
      return 'must be removed';
  }
}

const generalRules: Readonly<Record<string, (value: string) => string | undefined>> = {
  AS: () => 'holds an age',
  DA: () => 'holds a date',
  DT: () => 'holds a date',
  TM: (value) => (/^([01]\d|2[0-3])[0-5]\d[0-5]\d(\.\d{1,6})?$/.test(value) ? undefined : 'holds more than a time of day'),
  CS: (value) => (/^[A-Z0-9 _]{1,16}$/.test(value) && !/\d{6}/.test(value) ? undefined : 'holds no code word'),
};

/** What holds for every attribute, in the table or not. */
function generalRule({ tag, vr, isEmpty, isComposed, values }: Found, { uids }: Permitted): string | undefined {
  if (isEmpty || isComposed) return undefined;
  if (vr === 'UN') return 'has no VR, so that nobody can look into it';
  if (vr === 'OB' || vr === 'OW') return tag === pixelData || tag === '0002,0001' ? undefined : 'holds bytes that nobody can look into';
  if (vr === 'PN') return 'holds a name';
  if (vr === 'UI') return values.every((uid) => isOurs(tag, uid, uids)) ? undefined : 'holds an identifier that was not made here';
  if (freeVrs.has(vr)) return values.every(isHarmless) ? undefined : 'holds a text that looks like a name, a date or a number of a person';
  return values.map((value) => generalRules[vr]?.(value)).find((rule) => rule !== undefined);
}

/** Attributes that hold an identifier of the standard itself: a class, a syntax. */
const classTags = new Set(['0002,0002', '0002,0010', '0008,0016']);

const isOurs = (tag: string, uid: string, uids: ReadonlySet<string>): boolean =>
  classTags.has(tag) ? /^1\.2\.840\.10008\.[0-9.]{1,30}$/.test(uid) : /^2\.25\.(0|[1-9]\d{0,38})$/.test(uid) && uids.has(uid);

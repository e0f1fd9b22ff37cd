/**
 * What the profile does with one attribute, under the options that this product uses: the device's identity is kept, because a case is
 * about a scanner; dates go and the time of day stays; descriptors are written anew from the product's own words.
 * Source: DICOM PS3.15 annex E, January 2025: table E.1-1 and section E.3.
 */
import { tableE1, type BasicAction, type TableRow } from './table';

export type Action = BasicAction | 'K' | 'C-dates' | 'C-descriptors' | 'C-device';

export interface ProfileOption {
  /** Code of coding scheme DCM, for De-identification Method Code Sequence (PS3.16 context group 7050). */
  readonly code: string;
  readonly meaning: string;
}

/** What is written into (0012,0064) of everything that is exported. */
export const profileOptions: readonly ProfileOption[] = [
  { code: '113100', meaning: 'Basic Application Confidentiality Profile' },
  { code: '113105', meaning: 'Clean Descriptors Option' },
  { code: '113107', meaning: 'Retain Longitudinal Temporal Information Modified Dates Option' },
  { code: '113109', meaning: 'Retain Device Identity Option' },
];

/** The time of day is no date: an attribute that is both the device's and a date is treated as a date. */
const actionOfRow = ({ basic, device, dates, descriptors }: TableRow): Action => {
  if (dates !== undefined) return 'C-dates';
  if (device !== undefined) return device === 'K' ? 'K' : 'C-device';
  return descriptors === undefined ? basic : 'C-descriptors';
};

const actions: ReadonlyMap<string, Action> = new Map(
  tableE1.flatMap((row) =>
    row.tags
      .trim()
      .split(/\s+/)
      .map((tag): [string, Action] => [tag, actionOfRow(row)]),
  ),
);

/** The action for an attribute, `GGGG,EEEE`; undefined where the profile leaves it as it is. */
export function actionOf(tag: string): Action | undefined {
  const group = parseInt(tag.slice(0, 4), 16);
  if (Number.isNaN(group)) throw new RangeError(`tag must be written as GGGG,EEEE, got ${tag}`);
  if (isPrivate(group) || isCurve(group) || isOverlay(group)) return 'X';
  return actions.get(tag.toUpperCase());
}

const isPrivate = (group: number): boolean => group % 2 === 1;
const isCurve = (group: number): boolean => group >> 8 === 0x50;
/** The table names overlay data and comments; without these the rest of the group means nothing, and goes too. */
const isOverlay = (group: number): boolean => group >> 8 === 0x60;

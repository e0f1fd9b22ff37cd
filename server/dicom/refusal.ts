/** Why a file is not taken: a code of the contract's closed list and a reason that tells a technologist what to do about it. */
import type { RefusalCode } from '../contract/images';

export interface Refused {
  readonly refused: { readonly code: RefusalCode; readonly reason: string };
}

export const refuse = (code: RefusalCode, reason: string): Refused => ({ refused: { code, reason } });

export const isRefused = (outcome: object): outcome is Refused => 'refused' in outcome;

export const cut = refuse(
  'truncated',
  'The file ends in the middle of an element: it was cut off while it was copied, or a length in it is damaged. Export it again.',
);

/** A number of the header in words for a reason: only a count that DICOM can mean is repeated, for anything may stand there. */
export const count = (value: number | undefined): string =>
  value !== undefined && Number.isInteger(value) && value >= 0 && value <= 65_535 ? String(value) : 'an impossible number of';
